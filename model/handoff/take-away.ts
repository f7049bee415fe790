/** The files that a chosen design leaves as: one list for the command line and the page, so that both give the same bytes. */
import type { RailProblem } from '../problem.ts';
import { writeSpec } from '../write-spec.ts';
import { markdown } from './document.ts';
import { magneticsSheet } from './magnetics.ts';
import { stageNetlist } from './netlist/stage-netlist.ts';
import { designNote, type HandoffContext } from './note.ts';
import { partsCsv } from './parts-csv.ts';
import { fullLoad, solveAt } from './solved-point.ts';

/** A text with the name of its file. */
export interface NamedFile {
  readonly name: string;
  readonly text: string;
}

/** spec.json, stage.cir, parts.csv, magnetics.md and note.md of the design of `genes`, snapped first in a copy. */
export function takeAway(problem: RailProblem, genes: Float64Array, context: HandoffContext = {}): NamedFile[] {
  const snapped = Float64Array.from(genes);
  problem.snap(snapped);
  const spec = writeSpec(problem, snapped, context.hashes);
  return [
    { name: 'spec.json', text: `${JSON.stringify(spec, undefined, 2)}\n` },
    { name: 'stage.cir', text: stageNetlist(problem, spec.id, solveAt(problem, snapped, fullLoad(problem.rail))).text },
    { name: 'parts.csv', text: partsCsv(problem, snapped) },
    { name: 'magnetics.md', text: magneticsSheet(problem, snapped) },
    { name: 'note.md', text: markdown(designNote(problem, snapped, context)) },
  ];
}
