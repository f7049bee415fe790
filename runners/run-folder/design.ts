/** Opening one design of a run: its problem and its genes, from the snapshot and the front. */
import type { DesignRecord, RailProblem } from '../../model/index.ts';
import { problemOf, take } from '../inputs.ts';
import { type FrontDesign, findDesign, readFront } from './front.ts';
import { readRecord } from './record.ts';
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
  const design = findDesign(folder, readFront(folder), id);
  const problem = problemOf(readSnapshot(folder, record));
  return { problem, design, genes: take(problem.genesFrom(recordOf(design))) };
}

/** The design record that a row of the front stands for. */
export function recordOf(design: FrontDesign): DesignRecord {
  const architecture = design.family.split(' ')[0] as DesignRecord['architecture'];
  return { architecture, genes: design.genes, parts: design.parts };
}
