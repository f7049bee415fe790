/** What runs in each thread of a spread: builds the problem it was born with, then draws blocks of samples. */
import { workerData } from 'node:worker_threads';
import workerpool from 'workerpool';
import { drawSamples, type RailProblem } from '../../model/index.ts';
import type { CreateProblem, WorkerBirth } from '../engines/protocol.ts';
import { reasonOf } from '../errors.ts';
import type { Block, Drawn } from './blocks.ts';

const birth: WorkerBirth = workerData;
const { createProblem }: { createProblem: CreateProblem } = await import(birth.module);
const problem = createProblem(birth.source) as RailProblem;

function draw({ genes, seed, from, to }: Block): Drawn {
  try {
    return { ok: true, rows: drawSamples(problem, Float64Array.from(genes), seed, from, to) };
  } catch (error) {
    return { ok: false, reason: reasonOf(error) };
  }
}

workerpool.worker({ draw });
