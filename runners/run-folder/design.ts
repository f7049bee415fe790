/** Opening one design of a run, of its front or its near misses: its problem and its genes. */
import type { DesignRecord, RailProblem } from '../../model/index.ts';
import { problemOf, take } from '../inputs.ts';
import { readFound } from './found.ts';
import { type FrontDesign, findDesign, readFront } from './front.ts';
import { nearMissesOf } from './near-misses.ts';
import { readRecord } from './record.ts';
import { readRestarts } from './restarts.ts';
import { readSnapshot } from './snapshot.ts';

/** A design with the problem that judges it. */
export interface OpenDesign {
  readonly problem: RailProblem;
  readonly genes: Float64Array;
  readonly design: FrontDesign;
}

/** Opens the design of `folder` whose id is, or begins with, `id`. Throws refusals. */
export function openDesign(folder: string, id: string): OpenDesign {
  const record = readRecord(folder);
  const front = readFront(folder);
  const problem = problemOf(readSnapshot(folder, record));
  const design = findDesign(folder, front, id, () => missDesigns(folder, problem));
  return { problem, design, genes: take(problem.genesFrom(recordOf(design))) };
}

/** The near misses of a run, as its page has them. Throws refusals. */
export function missDesigns(folder: string, problem: RailProblem): FrontDesign[] {
  const found = readFound(folder);
  return nearMissesOf(problem, found, readRestarts(folder, found.archive)).map(({ design }) => design);
}

/** The design record that a row of the front stands for. */
export function recordOf(design: FrontDesign): DesignRecord {
  const architecture = design.family.split(' ')[0] as DesignRecord['architecture'];
  return { architecture, genes: design.genes, parts: design.parts };
}
