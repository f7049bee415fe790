/** A flat board beside a medium-wave receiver: interleaving, height, the false zero at D = 1/5. */
import type { Sweep } from '../spaces.ts';
import { type Statement, stated } from '../statement.ts';
import { touches, unequalPhases } from './questions.ts';

/** What its row says; each side search may spend `evaluations`. */
export function winch(found: Sweep, evaluations: number): Statement[] {
  const name = 'buoy-winch';
  const phases = found.members.map((member) => found.problem.record(member.genes).genes.phases);
  const several = phases.filter((count) => count > 1).length;
  const heights = found.members.flatMap((member) =>
    found.problem.assess(member.genes).parts.map((part) => part.height),
  );
  const inside = found.members.filter((member) => touches(found, member, 530e3, 1710e3)).length;
  return [
    stated(
      name,
      'interleaved designs are on the front',
      `${several} of ${phases.length} with two phases or more`,
      several > 0,
      'the sheet',
    ),
    stated(
      name,
      'nothing stands above 3.5 mm',
      `${(1e3 * Math.max(...heights)).toFixed(2)} mm`,
      Math.max(...heights) <= 3.5e-3,
      'the sheet',
    ),
    stated(
      name,
      'medium wave is left empty, oscillator tolerance and all',
      `${inside} of ${phases.length} inside`,
      inside === 0,
      'the sheet',
    ),
    unequalPhases(name, 5, evaluations),
  ];
}
