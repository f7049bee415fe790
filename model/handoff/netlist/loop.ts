/**
 * The averaged stage with its compensator under the sheet's load step: what the closed loop leaves of the excursion. The
 * switching cell is a source of duty times voltage behind the chokes; ripple is not in it.
 */
import type { RailProblem } from '../../problem.ts';
import { MODEL_VERSION } from '../../version.ts';
import { type Loop, loopAt, sourceBehind } from '../loop.ts';
import type { SolvedPoint } from '../solved-point.ts';
import { Lines, numberText } from './lines.ts';

/** Output of the error amplifier beyond the ramp, V to either side. */
const HEADROOM = 0.2;
/** Loop periods (1/crossover) before, between and after the steps. */
const REST = 4;
const BETWEEN = 30;

/** A netlist of the load step with the times at which to look. */
export interface StepNetlist {
  readonly text: string;
  readonly loop: Loop;
  /** s: the first step begins; the second; the end. */
  readonly up: number;
  readonly down: number;
  readonly end: number;
}

/** The load step of `problem`'s sheet at `point`, a worst-case point at full load; undefined where the sheet has none. */
export function stepNetlist(problem: RailProblem, id: string, point: SolvedPoint): StepNetlist | undefined {
  const { step, output } = problem.rail;
  if (step === undefined) return undefined;
  const loop = loopAt(point);
  if (!Number.isFinite(loop.crossover)) return undefined;
  const unit = 1 / loop.crossover;
  const ramp = step.current / step.slew;
  const up = REST * unit;
  const down = up + ramp + BETWEEN * unit;
  const end = down + ramp + BETWEEN * unit;
  const lines = new Lines();
  lines.parameter('tunit', unit, 's', 'one over the crossover');
  writeStage(lines, point);
  writeCompensator(lines, loop, point);
  const low = Math.max(0, output.current - step.current);
  const times = [0, low, up, low, up + ramp, low + step.current, down, low + step.current, down + ramp, low];
  lines.comment('load');
  lines.element(`Iload out 0 PWL(${times.map(numberText).join(' ')})`);
  lines.keep('v(out)');
  lines.keep('v(d)');
  const title = `chopfront ${MODEL_VERSION}: averaged loop and load step, design ${id} for ${problem.rail.name}`;
  const text = lines.text(
    title,
    ['Units are SI base units. Averaged: no ripple. Worst-case bank.'],
    [
      `.nodeset v(out)=${numberText(point.state.outputVoltage)} v(inv)=${numberText(point.state.outputVoltage)}`,
      '.options method=gear reltol=1e-4 abstol=1e-6 vntol=1e-6',
      `.tran {tunit/200} ${numberText(end)} 0 {tunit/200}`,
    ],
  );
  return { text, loop, up, down, end };
}

function writeStage(lines: Lines, point: SolvedPoint): void {
  const { state, design, output } = point;
  const copies = design.phases * design.stage.chokes;
  const { stage } = design;
  const longest = Math.min(
    stage.highestDuty,
    1 - design.frequency * stage.chokeMultiple * design.controller.minimumOffTime,
  );
  lines.parameter('vsource', sourceBehind(point), 'V', 'voltage behind the chokes at a duty of one');
  lines.parameter('dmax', Math.max(0, longest), '', 'longest duty');
  lines.parameter('lall', state.effectiveInductance / copies, 'H', 'all chokes together');
  lines.parameter('rall', (state.pathResistance + state.lowResistance) / copies, 'ohm', 'their path');
  lines.element('Bd d 0 V=min(dmax,max(0,v(late)))'.replace('dmax', '{dmax}'));
  lines.element('Ecell cell 0 d 0 {vsource}');
  lines.element('Lall cell path {lall}');
  lines.element('Rall path out {rall}');
  group(lines, '1', output.c1, output.r1, output.l1);
  if (output.c2 > 0) group(lines, '2', output.c2, output.r2, output.l2);
}

function group(lines: Lines, name: string, farads: number, ohms: number, henries: number): void {
  lines.element(`Lo${name} out oa${name} ${numberText(Math.max(henries, 1e-12))}`);
  lines.element(`Ro${name} oa${name} ob${name} ${numberText(Math.max(ohms, 1e-6))}`);
  lines.element(`Co${name} ob${name} 0 ${numberText(farads)}`);
}

function writeCompensator(lines: Lines, loop: Loop, point: SolvedPoint): void {
  const { r1, r2, r3, c1, c2, c3 } = loop.parts;
  for (const [name, value] of Object.entries({ r1, r2, r3 })) lines.parameter(name, value, 'ohm', 'compensator');
  for (const [name, value] of Object.entries({ c1, c2, c3 })) lines.parameter(name, value, 'F', 'compensator');
  lines.parameter('vref', point.state.outputVoltage, 'V', 'reference, taken as the output voltage');
  lines.parameter('tlate', loop.plant.delay, 's', 'delay of the modulator');
  lines.comment('type-III amplifier: R1 with R3-C3 beside it, R2-C1 with C2 beside it in feedback; ramp 1 V');
  lines.element('Rc1 out inv {r1}');
  lines.element('Rc3 out inva {r3}');
  lines.element('Cc3 inva inv {c3}');
  lines.element('Rc2 inv comx {r2}');
  lines.element('Cc1 comx com {c1}');
  lines.element('Cc2 inv com {c2}');
  lines.element(`Bamp com 0 V=min(${1 + HEADROOM},max(-${HEADROOM},5000*({vref}-v(inv))))`);
  lines.comment('first-order all-pass for the delay');
  lines.element('Rlate com lag 1');
  lines.element('Clate lag 0 {tlate/2}');
  lines.element('Blate late 0 V=2*v(lag)-v(com)');
}
