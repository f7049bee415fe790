/** Samples of a spread over threads: blocks of samples, each a pure function of its numbers, put together in order. */
import { existsSync } from 'node:fs';
import workerpool from 'workerpool';
import { drawSamples, type RailProblem, type Spread, summarise } from '../../model/index.ts';
import type { WorkerBirth } from '../engines/protocol.ts';
import { reasonOf, refusal } from '../errors.ts';

/** Samples `from` … `to − 1` of one design. */
export interface Block {
  readonly genes: Float64Array;
  readonly seed: string;
  readonly from: number;
  readonly to: number;
}

/** What became of a block; failures are data, for the class of an error does not survive the way between threads. */
export type Drawn =
  | { readonly ok: true; readonly rows: Float64Array }
  | { readonly ok: false; readonly reason: string };

/** Draws blocks, several at once. */
export interface Drawer {
  draw(block: Block): Promise<Drawn>;
  close(): Promise<void>;
}

/** Samples of one block. */
const SIZE = 250;

/** Draws in this thread. */
export function inlineDrawer(problem: RailProblem): Drawer {
  const draw = async ({ genes, seed, from, to }: Block): Promise<Drawn> => ({
    ok: true,
    rows: drawSamples(problem, genes, seed, from, to),
  });
  return { draw, close: async () => {} };
}

/** Draws in `threads` workers; `worker` is the path of the compiled worker. Throws the refusal `worker-missing`. */
export function threadDrawer(worker: string, birth: WorkerBirth, threads: number): Drawer {
  if (!existsSync(worker)) throw refusal('worker-missing', { path: worker });
  const pool = workerpool.pool(worker, {
    workerType: 'thread',
    maxWorkers: threads,
    workerThreadOpts: { workerData: birth },
  });
  const draw = async (block: Block): Promise<Drawn> => {
    try {
      return await pool.exec('draw', [block]);
    } catch (error) {
      return { ok: false, reason: reasonOf(error) };
    }
  };
  const close = async (): Promise<void> => {
    await pool.terminate(true);
  };
  return { draw, close };
}

/** The spread of one design. Throws an `Error` where a block could not be drawn. */
export async function drawSpread(
  drawer: Drawer,
  problem: RailProblem,
  genes: Float64Array,
  samples: number,
  seed: string,
): Promise<Spread> {
  const blocks = Array.from({ length: Math.ceil(samples / SIZE) }, (_, i) => ({
    genes,
    seed,
    from: i * SIZE,
    to: Math.min(samples, (i + 1) * SIZE),
  }));
  const drawn = await Promise.all(blocks.map((block) => drawer.draw(block)));
  const parts = drawn.map((one) => {
    if (one.ok) return one.rows;
    throw new Error(one.reason);
  });
  const rows = new Float64Array(parts.reduce((sum, part) => sum + part.length, 0));
  let at = 0;
  for (const part of parts) {
    rows.set(part, at);
    at += part.length;
  }
  return summarise(problem, genes, rows, seed);
}
