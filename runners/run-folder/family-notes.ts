/** One line on each family of designs after a search: why it is on the front, or why it lost. */
import {
  type ArchitectureVerdict,
  type FamilyTally,
  type FrontDesign,
  familyReason,
  type RailProblem,
} from '../../model/index.ts';
import type { FamilyNote } from '../../viz/data.ts';
import type { Source } from './sources.ts';

/** The notes in the order of the problem's families. */
export function familyNotes(
  problem: RailProblem,
  sources: readonly Source[],
  designs: readonly FrontDesign[],
  architectures: readonly ArchitectureVerdict[],
): FamilyNote[] {
  return problem.families.names.map((family, i) => {
    const tally = tallyOf(problem, sources, i);
    const front = designs.filter((design) => design.family === family).length;
    const impossible = architectures.find((one) => family.startsWith(`${one.name} `) && !one.possible);
    const reason = impossible?.reason ?? familyReason(problem, family, tally, designs);
    return { family, evaluated: tally.evaluated, feasible: tally.feasible, front, reason };
  });
}

/** What all rings together counted of family number `i`. */
function tallyOf(problem: RailProblem, sources: readonly Source[], i: number): FamilyTally {
  const best = new Float64Array(problem.objectives.length).fill(Number.POSITIVE_INFINITY);
  const violated = new Float64Array(problem.limits.length);
  let evaluated = 0;
  let feasible = 0;
  for (const source of sources) {
    const one = source.families?.[i];
    if (one === undefined) continue;
    evaluated += one.evaluated;
    feasible += one.feasible;
    one.best.forEach((value, k) => {
      best[k] = Math.min(best[k] ?? value, value);
    });
    one.violated.forEach((times, k) => {
      violated[k] = (violated[k] ?? 0) + times;
    });
  }
  return { evaluated, feasible, best, violated };
}
