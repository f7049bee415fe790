/** One line on each family of designs after a search: why it is on the front, or why it lost. */
import type { FrontDesign } from './front-file.ts';
import type { RailProblem } from './problem.ts';
import { formatQuantity } from './quantity/index.ts';

/** What the search counted of one family. */
export interface FamilyTally {
  /** Designs evaluated, and those among them that kept every limit. */
  readonly evaluated: number;
  readonly feasible: number;
  /** Smallest feasible value of each objective, in the problem's order, SI; Infinity where none. */
  readonly best: ArrayLike<number>;
  /** How often each limit was missed, in the problem's order. */
  readonly violated: ArrayLike<number>;
}

/** Limits named in a line. */
const NAMED = 2;

/** Why `family` is on the front of `designs`, or lost. */
export function familyReason(
  problem: RailProblem,
  family: string,
  tally: FamilyTally,
  designs: readonly FrontDesign[],
): string {
  const own = designs.filter((design) => design.family === family).length;
  if (own > 0) return `${own} of ${designs.length} designs of the front`;
  if (tally.evaluated === 0) return 'not tried: the budget ended before its turn';
  if (tally.feasible === 0) return `no design of ${tally.evaluated} kept every limit; ${mostBroken(problem, tally)}`;
  return beaten(problem, tally, designs);
}

/** The limits that were missed most often, with their share of the designs. */
function mostBroken(problem: RailProblem, tally: FamilyTally): string {
  const counted = problem.limits.map((name, i) => ({ name, share: (tally.violated[i] ?? 0) / tally.evaluated }));
  const worst = counted
    .filter(({ share }) => share > 0)
    .sort((a, b) => b.share - a.share || (a.name < b.name ? -1 : 1));
  if (worst.length === 0) return 'a figure could not be computed';
  const listed = worst.slice(0, NAMED).map(({ name, share }) => `${name} by ${(100 * share).toFixed(0)} %`);
  return `missed most often: ${listed.join(', ')}`;
}

/** Best figures of the family against the front's. */
function beaten(problem: RailProblem, tally: FamilyTally, designs: readonly FrontDesign[]): string {
  const figures = problem.objectives.map(({ name, unit }, i) => {
    const best = Math.min(...designs.map((design) => design.objectives[i] ?? Number.POSITIVE_INFINITY));
    return `${name} ${formatQuantity(tally.best[i] ?? 0, unit)} against ${formatQuantity(best, unit)}`;
  });
  return `kept every limit ${tally.feasible} times but was always beaten; its best ${figures.join(', ')}`;
}
