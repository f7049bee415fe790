/** What runs in each thread of the short searches: builds the problem it was born with, then searches. */
import { workerData } from 'node:worker_threads';
import workerpool from 'workerpool';
import { restart } from '../../optimizer/index.ts';
import type { CreateProblem, WorkerBirth } from '../engines/protocol.ts';
import { reasonOf } from '../errors.ts';
import type { RestartDone, RestartTask } from './run.ts';

const birth: WorkerBirth = workerData;
const { createProblem }: { createProblem: CreateProblem } = await import(birth.module);
const problem = createProblem(birth.source);

function search(task: RestartTask): RestartDone {
  try {
    return { ok: true, found: restart(problem, task.seeds, task.search) };
  } catch (error) {
    return { ok: false, reason: reasonOf(error) };
  }
}

workerpool.worker({ search });
