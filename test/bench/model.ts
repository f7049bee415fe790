/**
 * How fast the model judges a design: two stated reference evaluations (designs drawn once, judged in turn), on one thread and
 * on more, with the count of elementary-function calls as the figure that no machine changes, and the garbage left behind.
 */
import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { Worker } from 'node:worker_threads';
import { build, type Plugin } from 'esbuild';
import { packagePath } from '../../runners/package-path.ts';

/** The reference evaluations: three line × three load points each, with the tolerance corners of the limits. */
const REFERENCES = ['two-phase synchronous buck', 'half-bridge with current doubler'] as const;

/** One reference evaluation's figures. */
export interface ModelTiming {
  readonly reference: string;
  /** Designs judged a second on one thread. */
  readonly perSecond: number;
  /** The same per second of processor time: what a quiet machine would do. */
  readonly perProcessorSecond: number;
  /** On `threads` threads at once, together. */
  readonly threads: number;
  readonly perSecondTogether: number;
  /** Calls of each elementary function per evaluation, and all together: no machine changes these. */
  readonly calls: Readonly<Record<string, number>>;
  readonly callsTogether: number;
  /** Bytes of garbage per evaluation, over 10⁵. */
  readonly garbage: number;
  /** Processor time of an evaluation over the bare time of its elementary-function calls, timed in the same run. */
  readonly overFloor: number;
}

/** Code is compiled when it is due, not when a busy machine comes to it: what is measured is the settled code. */
const SETTLED = ['--no-concurrent-recompilation'];

/** Times every reference evaluation. Takes about ten seconds each. */
export async function timeModel(threads = 2): Promise<ModelTiming[]> {
  const folder = mkdtempSync(join(tmpdir(), 'model-bench-'));
  try {
    // Timed is what a sweep runs: the built files, module by module. Only what counts calls is bundled, with the counters in it.
    const plain = packagePath('dist', 'test', 'bench', 'reference.js');
    const counted = join(folder, 'counted.mjs');
    await bundle(counted, [countedMaths]);
    const timings: ModelTiming[] = [];
    for (const reference of REFERENCES) timings.push(await timeReference(reference, plain, counted, threads));
    return timings;
  } finally {
    rmSync(folder, { recursive: true });
  }
}

async function timeReference(reference: string, plain: string, counted: string, threads: number): Promise<ModelTiming> {
  const alone = ask<{ perSecond: number; perProcessorSecond: number }>(plain, reference, 'time');
  const bare = ask<Record<string, number>>(plain, reference, 'floor');
  const calls = ask<Record<string, number>>(counted, reference, 'count');
  const { bytes } = ask<{ bytes: number }>(plain, reference, 'garbage', SETTLED);
  const each = await Promise.all(Array.from({ length: threads }, () => inThread(plain, reference)));
  const floor = Object.entries(calls).reduce((sum, [name, n]) => sum + n * (bare[name] ?? bare.pow), 0);
  return {
    reference,
    ...alone,
    threads,
    perSecondTogether: each.reduce((sum, one) => sum + one, 0),
    calls,
    callsTogether: Object.values(calls).reduce((sum, n) => sum + n, 0),
    garbage: bytes,
    overFloor: 1e9 / alone.perProcessorSecond / floor,
  };
}

function ask<T>(script: string, reference: string, work: string, flags: readonly string[] = []): T {
  const task = JSON.stringify({ root: packagePath(), reference, work });
  const { status, stdout, stderr } = spawnSync(process.execPath, [...flags, script, task], { encoding: 'utf8' });
  if (status !== 0) throw new Error(`the bench's child failed: ${stderr}`);
  return JSON.parse(stdout) as T;
}

function inThread(script: string, reference: string): Promise<number> {
  return new Promise((resolve, reject) => {
    const worker = new Worker(script, { workerData: { root: packagePath(), reference, work: 'time' } });
    worker.once('message', ({ perSecond }: { perSecond: number }) => resolve(perSecond));
    worker.once('error', reject);
  });
}

async function bundle(outfile: string, plugins: Plugin[]): Promise<void> {
  await build({
    entryPoints: [packagePath('test', 'bench', 'reference.ts')],
    outfile,
    bundle: true,
    platform: 'node',
    format: 'esm',
    target: 'node20',
    logLevel: 'error',
    banner: {
      js: `import { createRequire } from 'node:module'; const require = createRequire(${JSON.stringify(packagePath('package.json'))});`,
    },
    plugins,
  });
}

/** Puts a counter around every function of the portable maths that another room calls; calls among themselves are their own. */
const countedMaths: Plugin = {
  name: 'counted-maths',
  setup(building) {
    building.onResolve({ filter: /maths\/index\.ts$/ }, ({ path, resolveDir, namespace }) =>
      namespace === 'counted' ? undefined : { path: join(resolveDir, path), namespace: 'counted' },
    );
    building.onLoad({ filter: /.*/, namespace: 'counted' }, async ({ path }) => {
      const names = Object.keys((await import('../../optimizer/maths/index.ts')) as object);
      const count = `const calls = (globalThis.elementaryCalls ??= {});\n`;
      const wrapped = names.map(
        (name) =>
          `calls.${name} = 0;\nexport const ${name} = (...given) => { calls.${name}++; return bare.${name}(...given); };`,
      );
      const contents = `import * as bare from ${JSON.stringify(path)};\n${count}${wrapped.join('\n')}\n`;
      return { contents, loader: 'js', resolveDir: dirname(path) };
    });
  },
};
