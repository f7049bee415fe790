import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    root: new URL('..', import.meta.url).pathname,
    include: ['test/**/*.test.ts'],
    // Far above what any test takes by itself: two busy cores must not make one fail.
    testTimeout: 300_000,
    hookTimeout: 300_000,
  },
});
