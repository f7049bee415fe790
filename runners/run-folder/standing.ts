/** Where a design stands against the front of a run. */
import { type RailProblem, type Standing, standingOf } from '../../model/index.ts';
import { refusal } from '../errors.ts';
import { readFront } from './front.ts';

/** The standing of the design of snapped `genes` against the front in `folder`. Throws `objectives-differ`. */
export function standingIn(folder: string, problem: RailProblem, genes: Float64Array): Standing {
  const front = readFront(folder);
  const names = front.objectives.map((objective) => objective.name).join(', ');
  const ours = problem.objectives.map((objective) => objective.name).join(', ');
  if (names !== ours) throw refusal('objectives-differ', { folder, names, ours });
  return standingOf(problem, genes, front.designs);
}
