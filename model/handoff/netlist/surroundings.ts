/** What every stage has around it: source and its impedance, capacitor banks, load. */
import { type Bank, bankTrace } from '../../capacitors/index.ts';
import type { Waveform } from '../../waveform/index.ts';
import type { SolvedPoint } from '../solved-point.ts';
import type { Lines } from './lines.ts';

/** Least resistance and inductance of the source that is written: a wire of a few centimetres. */
const LEAST_OHMS = 1e-6;
const LEAST_HENRIES = 1e-9;

/**
 * Mean current drawn from the input by all phases, A.
 * @derivation phases draw alike
 * @valid steady state
 */
export function meanDraw(point: SolvedPoint): number {
  return point.state.activePhases * point.state.highMean;
}

/** Source, its impedance, the input bank at node `in`. */
export function writeInput(lines: Lines, point: SolvedPoint): void {
  const { rail, state, input, solver } = point;
  const draw = meanDraw(point);
  const ohms = Math.max(LEAST_OHMS, rail.input.sourceResistance);
  lines.parameter('vbus', state.inputVoltage, 'V', 'mean voltage at the input terminals');
  lines.parameter('ibus', draw, 'A', 'mean input current that the model expects, controller and drivers not counted');
  lines.parameter('rsource', ohms, 'ohm', 'resistance of the source');
  lines.parameter('lsource', Math.max(LEAST_HENRIES, rail.input.sourceInductance), 'H', 'inductance of the source');
  lines.comment('source: lifted by its own drop, so that the terminals see vbus');
  lines.element('Vsource src 0 DC {vbus+ibus*rsource}');
  lines.element('Rsource src srcl {rsource}');
  lines.element('Lsource srcl srcm {lsource} IC={ibus}');
  lines.meter('msource', 'srcm', 'in');
  lines.comment('input bank without its series inductance: edges here are instant, the loop is a matter of layout');
  const start = -firstRipple(input, solver.drawn);
  writeGroup(lines, 'i1', 'in', input.c1, input.r1, 0, `vbus+${wrap(start)}`, 'input ceramic group');
  if (input.c2 > 0) writeGroup(lines, 'i2', 'in', input.c2, input.r2, 0, 'vbus', 'input bulk group');
  lines.keep('v(in)');
}

/** Output bank and load at node `out`. */
export function writeOutput(lines: Lines, point: SolvedPoint): void {
  const { state, output, solver } = point;
  const start = firstRipple(output, solver.summed);
  lines.parameter('vout', state.outputVoltage, 'V', 'output voltage');
  lines.parameter('iout', state.loadCurrent, 'A', 'load current');
  writeGroup(
    lines,
    'o1',
    'out',
    output.c1,
    output.r1,
    output.l1,
    `vout+${wrap(output.l1 > 0 ? 0 : start)}`,
    'output ceramic group',
  );
  if (output.c2 > 0) {
    writeGroup(lines, 'o2', 'out', output.c2, output.r2, output.l2, 'vout', 'output bulk group');
  }
  if (state.loadCurrent > 0) {
    lines.comment('load');
    lines.element('Rload out 0 {vout/iout}');
  } else {
    lines.comment('the output feeds: a current source with a resistance that damps the filter');
    lines.element('Rload out 0 {vout/abs(iout)}');
    lines.element('Iload 0 out DC {-iout+vout/(vout/abs(iout))}');
  }
  lines.keep('v(out)');
}

/**
 * Ripple voltage at time 0 about the mean, V.
 * @derivation value at time 0 less the mean, by trapezoids of the trace
 * @valid trace of straight pieces
 */
function firstRipple(bank: Bank, current: Waveform): number {
  const { time, value } = bankTrace(bank, current, 12);
  let area = 0;
  for (let i = 1; i < time.length; i++) area += 0.5 * (time[i] - time[i - 1]) * (value[i] + value[i - 1]);
  return value[0] - area / current.period;
}

function wrap(value: number): string {
  return `(${value})`.replace('e+', 'e');
}

/** One group of a bank: capacitance, series resistance and, where `inductance` is above 0, series inductance. */
function writeGroup(
  lines: Lines,
  name: string,
  node: string,
  capacitance: number,
  resistance: number,
  inductance: number,
  start: string,
  meaning: string,
): void {
  lines.parameter(`c_${name}`, capacitance, 'F', `${meaning}: capacitance at bias`);
  lines.parameter(`r_${name}`, Math.max(LEAST_OHMS, resistance), 'ohm', `${meaning}: series resistance`);
  lines.comment(meaning);
  lines.meter(`m${name}`, node, `${name}a`);
  if (inductance > 0) {
    lines.parameter(`l_${name}`, inductance, 'H', `${meaning}: series inductance`);
    lines.element(`L${name} ${name}a ${name}b {l_${name}} IC=0`);
  }
  lines.element(`R${name} ${inductance > 0 ? `${name}b` : `${name}a`} ${name}c {r_${name}}`);
  lines.element(`C${name} ${name}c 0 {c_${name}} IC={${start}}`);
}
