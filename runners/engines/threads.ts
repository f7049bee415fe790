/** The engine of one machine: a pool of worker threads (see protocol.ts for what is said to them). */
import { existsSync } from 'node:fs';
import workerpool from 'workerpool';
import { reasonOf, refusal } from '../errors.ts';
import { showDuration } from '../terminal/duration.ts';
import type { Engine, EpochResult, EpochTask, WorkerBirth } from './protocol.ts';

/** How the pool is set up. */
export interface ThreadsOptions {
  /** Path of the compiled worker program. */
  readonly worker: string;
  readonly birth: WorkerBirth;
  readonly threads: number;
  /** Longest time an epoch may take, s; a worker above it is killed. */
  readonly epochSeconds: number;
  /** Most heap of a worker, MB. */
  readonly heapMegabytes: number;
}

/** Defaults that suit a sweep. */
export const THREAD_LIMITS = { epochSeconds: 120, heapMegabytes: 512 } as const;

/** A pool of `threads` workers. Throws the refusal `worker-missing` where the worker program is not built. */
export function threadsEngine(options: ThreadsOptions): Engine {
  if (!existsSync(options.worker)) throw refusal('worker-missing', { path: options.worker });
  const pool = workerpool.pool(options.worker, {
    workerType: 'thread',
    maxWorkers: options.threads,
    workerTerminateTimeout: 100,
    workerThreadOpts: {
      workerData: options.birth,
      resourceLimits: { maxOldGenerationSizeMb: options.heapMegabytes },
    },
  });
  const run = async (task: EpochTask): Promise<EpochResult> => {
    try {
      return await pool.exec('epoch', [task]).timeout(1000 * options.epochSeconds);
    } catch (error) {
      return { ok: false, reason: describeLoss(error, options) };
    }
  };
  const close = async (): Promise<void> => {
    await pool.terminate(true);
  };
  return { width: options.threads, run, close };
}

function describeLoss(error: unknown, options: ThreadsOptions): string {
  if (error instanceof workerpool.Promise.TimeoutError) return `no answer within ${showDuration(options.epochSeconds)}`;
  const reason = reasonOf(error);
  if (/memory/i.test(reason)) return 'its memory ran out';
  if (/terminated unexpectedly/i.test(reason)) return 'its thread ended by itself';
  return reason;
}
