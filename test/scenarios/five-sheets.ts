/** What the row of each shipped sheet says that the sheet shows, asked of a sweep of that sheet. */
import type { PointReport } from '../../model/assessment.ts';
import { hasTransformer } from '../../model/catalogue.ts';
import { cautionsOf } from '../../model/cautions.ts';
import { explainRail } from '../../model/explain.ts';
import type { Architecture } from '../../model/rail/rail.ts';
import { need } from '../model/support.ts';
import {
  builtInTables,
  least,
  type Member,
  objectiveIndex,
  type Sweep,
  searching,
  shippedRail,
  spaceOf,
  sweep,
} from './spaces.ts';
import { median, percent, type Statement, stated, tally } from './statement.ts';

/** Names of the shipped sheets with what is asked of each. */
export const SHEETS: Readonly<Record<string, (found: Sweep, evaluations: number) => readonly Statement[]>> = {
  'buoy-sensors': sensors,
  'buoy-processor': processor,
  'hut-link': link,
  'hut-shelf': shelf,
  'buoy-winch': winch,
};

/** The statements about one sheet: those of its row, and that it has designs. `evaluations` are spent on each side search. */
export function sheetStatements(name: string, found: Sweep, evaluations: number): readonly Statement[] {
  const families = tally(found.members.map((member) => member.family));
  const feasible = stated(name, 'has designs that keep every limit', families, found.members.length > 0, 'the sheet');
  return [feasible, ...SHEETS[name](found, evaluations)];
}

function sensors(found: Sweep, evaluations: number): Statement[] {
  const name = 'buoy-sensors';
  const { rail } = found.problem;
  const { baseline } = need(explainRail(rail, builtInTables()));
  // 3.3/12.8 of the power arrives; 26.4 W · (12.8/3.3 − 1) stays behind.
  const series = Math.abs(baseline.efficiency - 0.2578) < 1e-4 && Math.abs(baseline.loss - 76.0) < 0.05;
  const light = modesAt(found, 0.02);
  const fast = sweep(spaceOf(searching(rail, { frequency: { minimum: 1.5e6, maximum: 5e6 } })), evaluations);
  const skipping = modesAt(fast, 0.02);
  const open = sweep(spaceOf({ ...rail, avoid: [] }), evaluations);
  const inside = (of: Sweep): number => of.members.filter((member) => touches(of, member, 485e3, 525e3)).length;
  return [
    stated(
      name,
      'a series regulator reaches 25.8 % and turns 76.0 W into heat',
      `${percent(baseline.efficiency)}, ${baseline.loss.toFixed(1)} W`,
      series,
    ),
    ...diodeAgainstSynchronous(found),
    stated(name, 'runs discontinuous at 2 % load', tally(light), light.includes('discontinuous'), 'the sheet'),
    stated(
      name,
      'skips pulses at 2 % load where it switches fast (1.5 MHz and up)',
      tally(skipping),
      skipping.includes('pulse-skipping'),
      'the sheet',
    ),
    stated(
      name,
      'leaves the avoided band empty, oscillator tolerance and all',
      `${inside(found)} of ${found.members.length} inside`,
      inside(found) === 0,
      'the sheet',
    ),
    stated(
      name,
      'would use that band if it might',
      `${inside(open)} of ${open.members.length} inside without it`,
      inside(open) > 0,
      'the sheet',
    ),
  ];
}

function diodeAgainstSynchronous(found: Sweep): Statement[] {
  const name = 'buoy-sensors';
  const synchronous = bestOf(found, 'buck-synchronous', 'loss');
  const diode = bestOf(found, 'buck-diode', 'loss');
  const ours = `synchronous ${(1e3 * synchronous).toFixed(0)} mW, diode ${(1e3 * diode).toFixed(0)} mW`;
  return [
    stated(name, 'a diode stage keeps every limit too', ours, Number.isFinite(diode), 'the sheet'),
    stated(
      name,
      'a synchronous stage loses less than a diode stage',
      ours,
      synchronous < diode,
      'common practice, no source',
    ),
  ];
}

/** Smallest feasible value of an objective that the sweep met in an architecture. */
function bestOf(found: Sweep, architecture: Architecture, objective: string): number {
  const { problem, record } = found;
  const m = problem.objectives.length;
  const place = objectiveIndex(problem, objective);
  const values = problem.families.names.flatMap((family, k) =>
    family.startsWith(`${architecture} `) ? [record.best[k * m + place]] : [],
  );
  return Math.min(...values);
}

function modesAt(found: Sweep, load: number): string[] {
  return pointsOf(found, (point) => Math.abs(point.load - load) < 1e-9).map((point) => point.mode);
}

function pointsOf(found: Sweep, wanted: (point: PointReport) => boolean): PointReport[] {
  return found.members.flatMap((member) => found.problem.assess(member.genes).points.filter(wanted));
}

/** Whether the frequency of `member`, with the oscillator's tolerance, reaches into a band. */
function touches(found: Sweep, member: Member, from: number, to: number): boolean {
  const frequency = found.problem.record(member.genes).genes.frequency;
  const { oscillator } = found.problem.rail.tolerances;
  return frequency * (1 + oscillator) > from && frequency * (1 - oscillator) < to;
}

function processor(found: Sweep, evaluations: number): Statement[] {
  const name = 'buoy-processor';
  const { rail } = found.problem;
  // At 85 % the duty is at most 1 V/(0.85 · 57 V); 50 ns of it make a period of 2.42 µs.
  const fast = searching(rail, { architectures: ['buck-synchronous'], frequency: { minimum: 413e3, maximum: 2e6 } });
  const bucks = sweep(spaceOf(fast), evaluations);
  const kept = bucks.record.feasible.reduce((sum, count) => sum + count, 0);
  const isolated = found.members.filter((member) => !member.family.startsWith('buck')).length;
  const mixed = found.members.filter((member) => found.problem.record(member.genes).genes.outputBulkCount > 0).length;
  return [
    stated(
      name,
      'with 50 ns and 85 % no plain buck runs above 1 V/(0.85 · 57 V · 50 ns) = 413 kHz',
      `${kept} of ${bucks.evaluations} designs from there on`,
      kept === 0,
    ),
    stated(
      name,
      'transformer stages carry most of the front',
      `${isolated} of ${found.members.length}`,
      2 * isolated > found.members.length,
      'the sheet',
    ),
    turnsNear(name, 'half-bridge-current-doubler', 6, evaluations),
    turnsNear(name, 'full-bridge-current-doubler', 12, evaluations),
    stated(
      name,
      'ceramic and bulk capacitors share the output',
      `${mixed} of ${found.members.length}`,
      mixed > 0,
      'the sheet',
    ),
  ];
}

/** The turns ratio that a transformer stage settles on when it has the sheet to itself, within a third of what the row names. */
function turnsNear(name: string, architecture: Architecture, expected: number, evaluations: number): Statement {
  const alone = searching(shippedRail(name), { architectures: [architecture], phases: { minimum: 1, maximum: 1 } });
  const found = sweep(spaceOf(alone), evaluations);
  const ratios = found.members.map((member) => {
    const { primaryTurns, secondaryTurns } = found.problem.record(member.genes).genes;
    return primaryTurns / secondaryTurns;
  });
  const middle = median(ratios);
  const ours = `${middle.toFixed(1)} (${Math.min(...ratios).toFixed(1)} to ${Math.max(...ratios).toFixed(1)})`;
  const holds = Math.abs(middle - expected) <= expected / 3;
  return stated(name, `${architecture}: turns ratio near ${expected}`, ours, holds, 'ratio of the sheet');
}

function link(found: Sweep, evaluations: number): Statement[] {
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

/**
 * Output ripple at D = 1/N with N equal phases, where the ideal is none, and with the unequal ones that limits are judged with.
 * The input is set to N times the output, so that the nominal point lies on the zero.
 */
function unequalPhases(name: string, phases: number, evaluations: number): Statement {
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

function shelf(found: Sweep, evaluations: number): Statement[] {
  const name = 'hut-shelf';
  const { rail } = found.problem;
  const shock = cautionsOf(rail).filter((caution) => /60 V/.test(caution));
  return [
    turnsNear(name, 'two-switch-forward', 11, evaluations),
    turnsNear(name, 'half-bridge-centre-tap', 11, evaluations),
    turnsNear(name, 'full-bridge-centre-tap', 22, evaluations),
    leakageCostsDuty(found),
    stated(name, 'the sheet cautions above 60 V', `${shock.length} caution`, shock.length === 1, 'the sheet'),
  ];
}

/** Duty that the leakage of the balanced design takes, beside the duty that the output needs. */
function leakageCostsDuty(found: Sweep): Statement {
  const member = found.members.find(({ family }) => hasTransformer(family.split(' ')[0] as Architecture));
  if (member === undefined) return stated('hut-shelf', 'leakage costs duty', 'no transformer stage', false);
  const { limits, points } = found.problem.assess(member.genes);
  const limit = limits.find(({ name }) => name === 'transformerDuty');
  const { corner } = limit ?? {};
  const at = points.find((p) => p.share === 0 && p.load === corner?.load && p.inputVoltage === corner.inputVoltage);
  const lost = (limit?.value ?? Number.NaN) - (at?.dutyCycle ?? Number.NaN);
  return stated('hut-shelf', 'leakage costs duty', percent(lost), lost > 1e-4 && lost < 0.2);
}

function winch(found: Sweep, evaluations: number): Statement[] {
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
