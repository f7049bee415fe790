/** Runs the short searches of a plan, several at once, and joins what they found: the same bytes in whatever order they end. */
import { existsSync } from 'node:fs';
import workerpool from 'workerpool';
import type { RailProblem } from '../../model/index.ts';
import {
  chooseSubset,
  createMerger,
  type Designs,
  mergeArchives,
  NO_SAMPLE,
  type Restart,
  type Restarted,
  restart,
} from '../../optimizer/index.ts';
import type { WorkerBirth } from '../engines/protocol.ts';
import { reasonOf, refusal } from '../errors.ts';
import { rowsOf } from '../sweep/grid.ts';
import type { RestartPlan } from './plan.ts';

/** One search as a worker gets it. */
export interface RestartTask {
  readonly seeds: readonly Float64Array[];
  readonly search: Restart;
}

/** What became of it; failures are data, for the class of an error does not survive the way between threads. */
export type RestartDone =
  | { readonly ok: true; readonly found: Restarted }
  | { readonly ok: false; readonly reason: string };

/** Runs searches, several at once. */
export interface Restarter {
  run(task: RestartTask): Promise<RestartDone>;
  close(): Promise<void>;
}

/** Longest time of one search, s. */
const LONGEST = 120;

/** Runs them in this thread. */
export function inlineRestarter(problem: RailProblem): Restarter {
  const run = async ({ seeds, search }: RestartTask): Promise<RestartDone> => ({
    ok: true,
    found: restart(problem, seeds, search),
  });
  return { run, close: async () => {} };
}

/** Runs them in `threads` workers; `worker` is the path of the compiled worker. Throws the refusal `worker-missing`. */
export function threadRestarter(worker: string, birth: WorkerBirth, threads: number): Restarter {
  if (!existsSync(worker)) throw refusal('worker-missing', { path: worker });
  const pool = workerpool.pool(worker, {
    workerType: 'thread',
    maxWorkers: threads,
    workerThreadOpts: { workerData: birth },
  });
  const run = async (task: RestartTask): Promise<RestartDone> => {
    try {
      return await pool.exec('search', [task]).timeout(1000 * LONGEST);
    } catch (error) {
      return { ok: false, reason: reasonOf(error) };
    }
  };
  const close = async (): Promise<void> => {
    await pool.terminate(true);
  };
  return { run, close };
}

/** Designs that keep every limit which are told of at most. */
const LEVEL = 100;

/** Runs `plan` and joins what was found beside `archive`. Throws an `Error` where a search failed. */
export async function runRestarts(
  restarter: Restarter,
  problem: RailProblem,
  plan: RestartPlan,
  archive: Designs,
): Promise<Restarted> {
  const { seeds, searches } = plan;
  const ended = await Promise.all(searches.map((search) => restarter.run({ seeds, search })));
  const merger = createMerger(problem);
  for (const one of ended) {
    if (!one.ok) throw new Error(one.reason);
    merger.add({ archive: one.found.level, nearMisses: one.found.misses, sample: NO_SAMPLE });
  }
  return { level: chooseSubset(beside(problem, archive, merger.archive()), LEVEL), misses: merger.nearMisses() };
}

/** Those of `found` that hold a place in an archive with `archive` and do not stand in it already. */
function beside(problem: RailProblem, archive: Designs, found: Designs): Designs {
  const width = problem.genes.length;
  const known = new Set(rowsOf(archive, width).map(String));
  const whole = mergeArchives(problem, [archive, found]);
  const rows = Array.from({ length: whole.count }, (_, row) => row);
  const fresh = rows.filter((row) => !known.has(String(whole.genes.subarray(row * width, (row + 1) * width))));
  const pick = (from: Float64Array, each: number): Float64Array =>
    Float64Array.from(fresh.flatMap((row) => [...from.subarray(row * each, (row + 1) * each)]));
  return {
    count: fresh.length,
    genes: pick(whole.genes, width),
    objectives: pick(whole.objectives, problem.objectives.length),
    violations: pick(whole.violations, problem.limits.length),
  };
}
