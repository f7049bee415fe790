/** Power both ways between bus and battery: efficiency, phases that are never equal, a heat sink. */
import type { Member, Sweep } from '../spaces.ts';
import { percent, type Statement, stated } from '../statement.ts';
import { pointsOf, unequalPhases } from './questions.ts';

/** What its row says; each side search may spend `evaluations`. */
export function link(found: Sweep, evaluations: number): Statement[] {
  const name = 'hut-link';
  const half = pointsOf(found, (point) => Math.abs(point.load) === 0.5 && point.share > 0);
  const worst = (sign: number): number =>
    Math.min(...half.filter((p) => Math.sign(p.load) === sign).map((p) => p.efficiency));
  const sinks = found.members.filter((member) => heatSink(found, member) > 0).length;
  return [
    stated(name, '96 % or more at half load, charging', percent(worst(1)), worst(1) >= 0.96, 'the sheet'),
    stated(name, '96 % or more at half load, giving back', percent(worst(-1)), worst(-1) >= 0.96, 'the sheet'),
    unequalPhases(name, 4, evaluations),
    stated(
      name,
      'hot designs need a heat sink, cool ones do not',
      `${sinks} of ${found.members.length}`,
      sinks > 0 && sinks < found.members.length,
      'the sheet',
    ),
  ];
}

/** Volume of the heat sink of a member, m³. */
function heatSink(found: Sweep, member: Member): number {
  return found.problem.assess(member.genes).volumes.find(({ name }) => name === 'heatSink')?.value ?? 0;
}
