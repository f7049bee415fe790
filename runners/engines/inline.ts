/** The engine without threads: epochs run one after the other where they are asked for. For tests and one-core machines. */
import type { Problem } from '../../optimizer/problem.ts';
import { reasonOf } from '../errors.ts';
import { epochRunner } from './epoch.ts';
import type { Engine, EpochResult, EpochTask } from './protocol.ts';

/** An engine that runs every task in this thread. */
export function inlineEngine(problem: Problem): Engine {
  const runEpoch = epochRunner(problem);
  const run = async (task: EpochTask): Promise<EpochResult> => {
    await new Promise((done) => setImmediate(done));
    try {
      return runEpoch(task);
    } catch (error) {
      return { ok: false, reason: reasonOf(error) };
    }
  };
  return { width: 1, run, close: async () => {} };
}
