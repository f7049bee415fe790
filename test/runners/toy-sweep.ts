/**
 * A program that sweeps the toy problem into a folder, for tests that start, stop and kill real processes. One argument: what
 * to do, as JSON. Writes `front.csv` from the archive; exits as `chopfront sweep` does.
 */
import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { inlineEngine } from '../../runners/engines/inline.ts';
import { threadsEngine } from '../../runners/engines/threads.ts';
import { explain } from '../../runners/main.ts';
import { jsonReporter } from '../../runners/progress/lines.ts';
import { lookAt, prepareFolder } from '../../runners/run-folder/folder.ts';
import type { Found } from '../../runners/run-folder/found.ts';
import { historyCsv } from '../../runners/run-folder/history-csv.ts';
import { readRecord } from '../../runners/run-folder/record.ts';
import { runSweep } from '../../runners/sweep/run.ts';
import { listenForStop, SIGNALS } from '../../runners/sweep/stop.ts';
import { createToy, type ToySource } from './toy.ts';

/** What to do. */
export interface ToyOrder {
  readonly folder: string;
  readonly evaluations: number;
  /** 0: without threads. */
  readonly threads: number;
  readonly source?: ToySource;
  readonly resume?: boolean;
  readonly shards?: number;
  readonly shard?: number;
  /** s. */
  readonly checkpoint?: number;
  /** s. */
  readonly epochLimit?: number;
  readonly seed?: string;
}

const order: ToyOrder = JSON.parse(process.argv[2] ?? '{}');
try {
  process.exitCode = await sweepToy(order);
} catch (error) {
  process.exitCode = explain(error);
}

async function sweepToy({ folder, source = {}, threads, ...rest }: ToyOrder): Promise<number> {
  const known = rest.resume === true && lookAt(folder) === 'run' ? readRecord(folder) : undefined;
  prepareFolder(folder, known !== undefined);
  const problem = createToy(source);
  const stop = listenForStop(() => {});
  const end = await runSweep({
    folder,
    identity: {
      version: '0',
      rail: 'toy',
      railHash: 'r',
      partsHash: 'p',
      seed: rest.seed ?? '1',
      shards: rest.shards ?? 1,
      shard: rest.shard,
      tables: [],
    },
    problem,
    settings: { islands: 4, population: 20, epochGenerations: 5 },
    budget: { evaluations: rest.evaluations },
    threads: Math.max(1, threads),
    engine: () => (threads === 0 ? inlineEngine(problem) : pool(source, threads, rest.epochLimit ?? 60)),
    reporter: jsonReporter((text) => process.stderr.write(text)),
    stop,
    checkpoints: { seconds: rest.checkpoint ?? 0.05, share: 1 },
    describeBest: (values) => values.map(String),
    snapshot: () => writeFileSync(join(folder, 'rail.yaml'), 'toy\n'),
    refresh: () => {},
    refreshCost: () => 0,
    publish: async (found) => publish(folder, found),
  });
  stop.dispose();
  return end.ending === 'stopped' && stop.signal !== undefined ? SIGNALS[stop.signal] : 0;
}

function pool(source: ToySource, threads: number, epochSeconds: number) {
  return threadsEngine({
    worker: new URL('../../runners/engines/worker.js', import.meta.url).pathname,
    birth: { module: new URL('./toy.js', import.meta.url).href, source },
    threads,
    epochSeconds,
    heapMegabytes: 64,
  });
}

function publish(folder: string, found: Found): void {
  const { count, genes, objectives } = found.archive;
  const lines = Array.from({ length: count }, (_, i) =>
    [...genes.subarray(4 * i, 4 * i + 4), ...objectives.subarray(2 * i, 2 * i + 2)].join(','),
  );
  writeFileSync(join(folder, 'front.csv'), `${lines.join('\n')}\n`);
  writeFileSync(join(folder, 'history.csv'), historyCsv(found.sources));
}
