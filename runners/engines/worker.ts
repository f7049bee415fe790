/** What runs in each worker thread: builds the problem it was born with, then answers tasks (see protocol.ts). */
import { workerData } from 'node:worker_threads';
import workerpool from 'workerpool';
import { reasonOf } from '../errors.ts';
import { epochRunner } from './epoch.ts';
import type { CreateProblem, EpochResult, EpochTask, WorkerBirth } from './protocol.ts';

const birth: WorkerBirth = workerData;
const { createProblem }: { createProblem: CreateProblem } = await import(birth.module);
const runEpoch = epochRunner(createProblem(birth.source));

function epoch(task: EpochTask): EpochResult {
  try {
    return runEpoch(task);
  } catch (error) {
    return { ok: false, reason: reasonOf(error) };
  }
}

workerpool.worker({ epoch });
