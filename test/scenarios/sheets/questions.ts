/** Questions that several sheets are asked of a sweep. */
import type { PointReport } from '../../../model/assessment.ts';
import type { Architecture } from '../../../model/stages/list.ts';
import { least, type Member, type Sweep, searching, shippedRail, spaceOf, sweep } from '../spaces.ts';
import { median, type Statement, stated } from '../statement.ts';

/** The operating points of all members that are wanted. */
export function pointsOf(found: Sweep, wanted: (point: PointReport) => boolean): PointReport[] {
  return found.members.flatMap((member) => found.problem.assess(member.genes).points.filter(wanted));
}

/** Whether the frequency of `member`, with the oscillator's tolerance, reaches into a band. */
export function touches(found: Sweep, member: Member, from: number, to: number): boolean {
  const frequency = found.problem.record(member.genes).genes.frequency;
  const { oscillator } = found.problem.rail.tolerances;
  return frequency * (1 + oscillator) > from && frequency * (1 - oscillator) < to;
}

/** The turns ratio that a transformer stage settles on when it has the sheet to itself, within a quarter of what the row names. */
export function turnsNear(name: string, architecture: Architecture, expected: number, evaluations: number): Statement {
  const alone = searching(shippedRail(name), { architectures: [architecture], phases: { minimum: 1, maximum: 1 } });
  const found = sweep(spaceOf(alone), 2 * evaluations);
  const ratios = found.members.map((member) => {
    const { primaryTurns, secondaryTurns } = found.problem.record(member.genes).genes;
    return primaryTurns / secondaryTurns;
  });
  const middle = median(ratios);
  const ours = `${middle.toFixed(1)} (${Math.min(...ratios).toFixed(1)} to ${Math.max(...ratios).toFixed(1)})`;
  const holds = Math.abs(middle - expected) <= expected / 4;
  return stated(
    name,
    `${architecture}: turns ratio within a quarter of ${expected}`,
    ours,
    holds,
    'ratio of the sheet',
  );
}

/**
 * Output ripple at D = 1/N with N equal phases, where the ideal is none, and with the unequal ones that limits are judged with.
 * The input is set to N times the output, so that the nominal point lies on the zero.
 */
export function unequalPhases(name: string, phases: number, evaluations: number): Statement {
  const sheet = shippedRail(name);
  const volts = phases * sheet.output.nominal;
  const input = { ...sheet.input, minimum: volts, nominal: volts, maximum: volts };
  const output = { ...sheet.output, minimum: sheet.output.nominal, maximum: sheet.output.nominal };
  const rail = searching({ ...sheet, input, output }, { phases: { minimum: phases, maximum: phases } });
  const found = sweep(spaceOf(rail), evaluations);
  const { points } = found.problem.assess(least(found, 'volume').genes);
  const ripple = (usual: boolean): number =>
    Math.max(...points.filter((p) => p.load === 1 && p.share > 0 === usual).map((p) => p.outputRipple));
  const ours = `${(1e3 * ripple(true)).toPrecision(2)} mV with equal phases, ${(1e3 * ripple(false)).toPrecision(2)} mV with unequal ones`;
  const says = `the zero of ${phases} phases at D = 1/${phases} is not believed: unequal phases leave twice the ripple or more`;
  return stated(name, says, ours, ripple(false) > 2 * ripple(true));
}
