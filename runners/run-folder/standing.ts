/** Where a design stands against the front of a run. */
import type { Assessment } from '../../model/index.ts';
import { refusal } from '../errors.ts';
import { dominates, readFront } from './front.ts';

/** Ids of the front's designs that dominate the assessed one, in the front's order. Throws `objectives-differ`. */
export function dominatedBy(folder: string, assessment: Assessment): string[] {
  const front = readFront(folder);
  const names = front.objectives.map((objective) => objective.name).join(', ');
  const ours = assessment.objectives.map((objective) => objective.name).join(', ');
  if (names !== ours) throw refusal('objectives-differ', { folder, names, ours });
  const values = assessment.objectives.map((objective) => objective.value);
  return front.designs.filter((design) => dominates(design.objectives, values)).map((design) => design.id);
}
