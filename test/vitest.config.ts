import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    root: new URL('..', import.meta.url).pathname,
    include: ['test/**/*.test.ts'],
    globalSetup: ['test/support/temporary.ts'],
    setupFiles: ['test/support/seeded.ts'],
    // One more than the default on two cores, so that one long file does not hold up all others.
    maxWorkers: 2,
    // Far above what any test takes by itself: two busy cores must not make one fail.
    testTimeout: 300_000,
    hookTimeout: 300_000,
  },
});
