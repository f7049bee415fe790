/** Designs that break exactly one limit by a little, as people see them: what they break, what they have, what is allowed. */
import { frontFile, type RailProblem } from '../../model/index.ts';
import type { NearMiss } from '../../viz/data.ts';
import { rowsOf } from '../sweep/grid.ts';
import type { Found } from './found.ts';
import { nearMissesWith, type Restarts } from './restarts.ts';

/** The near misses of the sweep and of the short searches, by what each breaks. */
export function nearMissesOf(
  problem: RailProblem,
  found: Pick<Found, 'archive' | 'nearMisses'>,
  restarts: Restarts | undefined,
): NearMiss[] {
  const nearMisses = nearMissesWith(problem, found, restarts);
  const genes = rowsOf(nearMisses, problem.genes.length);
  const designs = new Map(frontFile(problem, genes).designs.map((design) => [design.id, design]));
  return genes.flatMap((row, i) => {
    const limit = problem.limits[nearMisses.limit[i] ?? -1] ?? '';
    const figure = problem.assess(row).limits.find((one) => one.name === limit);
    const design = designs.get(problem.id(row));
    if (figure === undefined || design === undefined) return [];
    const { value, allowed, violation } = figure;
    return [{ limit, value, allowed, violation, design }];
  });
}
