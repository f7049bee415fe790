/** What the model says a simulation of the netlist will show, and how each figure is read off it. */
import { LOSS_SLOTS } from '../../ledger.ts';
import { MEAN, MEAN_SQUARE, measure, PEAK, VALLEY } from '../../waveform/index.ts';
import type { SolvedPoint } from '../solved-point.ts';
import { meanDraw } from './surroundings.ts';

/** How a figure is read from one or several vectors: their mean, peak to peak, or root mean square (of several: root of the mean of squares). */
export type Reading = 'mean' | 'peak-to-peak' | 'rms';

/** One predicted figure. */
export interface Prediction {
  readonly name: string;
  readonly unit: string;
  /** What the model says, SI. */
  readonly value: number;
  /** Largest relative difference that counts as agreement. */
  readonly band: number;
  /** Difference, in the unit, that never counts: far below what the sheet allows. */
  readonly floor?: number;
  /** Whether the figure is an upper bound: then a smaller simulated one agrees with it. */
  readonly bound?: boolean;
  readonly reading: Reading;
  /** Vectors of the simulation, such as `v(out)`. */
  readonly vectors: readonly string[];
}

/** A part of the conduction loss: `count` elements of `resistance` Ω (and `drop` V) that carry the current of `vectors`. */
export interface LossTerm {
  readonly name: string;
  readonly resistance: number;
  readonly drop: number;
  readonly count: number;
  readonly vectors: readonly string[];
}

/** Bands of agreement: stated once. */
export const BANDS = { mean: 0.01, ripple: 0.05, rms: 0.02, conduction: 0.03, input: 0.03, bank: 0.05 } as const;

/** Share of an allowed ripple below which a difference is of no matter (series inductance of the input bank is not in the netlist). */
const FLOOR = 0.05;

/** What is predicted of `point`. */
export function predictionsOf(point: SolvedPoint): Prediction[] {
  const { state, solver, rail } = point;
  const choke = new Float64Array(4);
  measure(state.choke, choke);
  const { form } = point.design.stage;
  const side = form?.doubler === true ? 'a' : '';
  // How two groups share a jump is up to their series inductances, which this circuit leaves out.
  const twoInputs = point.input.c2 > 0;
  const list: Prediction[] = [
    one('mean output voltage', 'V', state.outputVoltage, BANDS.mean, 'mean', 'v(out)'),
    one('output ripple', 'V', besideLoad(point), BANDS.ripple, 'peak-to-peak', 'v(out)'),
    {
      ...one('input ripple', 'V', solver.inputRipple.ripple, BANDS.ripple, 'peak-to-peak', 'v(in)'),
      floor: FLOOR * (rail.input.ripple ?? 0),
      bound: twoInputs,
    },
    one('mean input current', 'A', meanDraw(point), BANDS.input, 'mean', 'i(vmsource)'),
    one('choke ripple', 'A', choke[PEAK] - choke[VALLEY], BANDS.ripple, 'peak-to-peak', `i(vmc${side}0)`),
    one('choke rms', 'A', Math.sqrt(choke[MEAN_SQUARE]), BANDS.rms, 'rms', `i(vmc${side}0)`),
    one('mean choke current', 'A', choke[MEAN], BANDS.rms, 'mean', `i(vmc${side}0)`),
    one('high switch rms', 'A', Math.sqrt(state.highMeanSquare), BANDS.rms, 'rms', 'i(vmh0)'),
    { ...one('', 'A', Math.sqrt(state.lowMeanSquare), BANDS.rms, 'rms', ''), ...lowPosition(point) },
    {
      ...one('output ceramic rms', 'A', Math.sqrt(solver.outputRipple.meanSquare1), BANDS.bank, 'rms', 'i(vmo1)'),
      floor: FLOOR * point.design.outputCeramic.rippleRating * point.design.outputCeramicCount,
    },
    {
      ...one('input ceramic rms', 'A', Math.sqrt(solver.inputRipple.meanSquare1), BANDS.bank, 'rms', 'i(vmi1)'),
      floor: FLOOR * point.design.inputCeramic.rippleRating * point.design.inputCeramicCount,
      bound: twoInputs,
    },
  ];
  if (form !== undefined) {
    list.push(one('primary rms', 'A', Math.sqrt(state.primaryMeanSquare), BANDS.rms, 'rms', 'i(vmp0)'));
  }
  return list;
}

/**
 * Output ripple with the load of the netlist, V. The model's load draws a current and leaves all ripple to the bank; the netlist's
 * is a resistance, so that its filter is damped, and takes its share of a current divider, the bank as large as ripple over current.
 * @derivation current divider of load resistance and bank
 * @valid bank's impedance taken as ripple over swing
 */
function besideLoad({ state, solver }: SolvedPoint): number {
  const { ripple } = solver.outputRipple;
  const summed = new Float64Array(4);
  measure(solver.summed, summed);
  const swing = summed[PEAK] - summed[VALLEY];
  const load = Math.abs(state.outputVoltage / state.loadCurrent);
  return swing > 0 ? ripple / (1 + ripple / (swing * load)) : ripple;
}

function lowPosition(point: SolvedPoint): { name: string; vectors: string[] } {
  if (point.design.diode !== undefined) return { name: 'diode rms', vectors: ['i(vml0)'] };
  if (point.design.stage.form === undefined) return { name: 'low switch rms', vectors: ['i(vml0)'] };
  return { name: 'rectifier rms', vectors: ['i(vmla0)', 'i(vmlb0)'] };
}

function one(name: string, unit: string, value: number, band: number, reading: Reading, vector: string): Prediction {
  return { name, unit, value, band, reading, vectors: [vector] };
}

/**
 * Conduction loss that a circuit of ideal switches can show, W: the model's figure.
 * @derivation sum of the I²·R slots
 * @valid ideal switches
 */
export function conductionOf(point: SolvedPoint): number {
  const effects = new Set(['conduction', 'winding', 'copper', 'seriesResistance']);
  return LOSS_SLOTS.reduce((sum, [, effect], i) => sum + (effects.has(effect) ? point.solver.ledger[i] : 0), 0);
}

/** The same as terms that a simulation measures. */
export function lossTerms(point: SolvedPoint): LossTerm[] {
  const { state, design, output, input } = point;
  const n = state.activePhases;
  const { form } = design.stage;
  const side = form?.doubler === true ? 'a' : '';
  const term = (name: string, resistance: number, count: number, ...vectors: string[]): LossTerm => ({
    name,
    resistance,
    drop: 0,
    count,
    vectors,
  });
  const terms = [
    term('high switches', state.highResistance, n * state.highDevices, 'i(vmh0)'),
    {
      ...term('low position', state.lowResistance, n * state.lowDevices, ...lowPosition(point).vectors),
      drop: design.diode === undefined ? 0 : design.diodeDrop(state.lowTemperature),
    },
    term('chokes and board', state.pathResistance, n * state.chokes, `i(vmc${side}0)`),
    term('output ceramic', output.r1, 1, 'i(vmo1)'),
    term('input ceramic', input.r1, 1, 'i(vmi1)'),
  ];
  if (output.c2 > 0) terms.push(term('output bulk', output.r2, 1, 'i(vmo2)'));
  if (input.c2 > 0) terms.push(term('input bulk', input.r2, 1, 'i(vmi2)'));
  if (form === undefined) return terms;
  terms.push(term('primary windings', state.primaryResistance, n, 'i(vmp0)'));
  if (form.centreTap) terms.push(term('secondary windings', state.secondaryResistance, 2 * n, 'i(vmla0)', 'i(vmlb0)'));
  else terms.push(term('secondary windings', state.secondaryResistance, n, 'i(vms0)'));
  return terms;
}

/** Whether `simulated` agrees with `prediction`. */
export function agreesWith(
  prediction: Pick<Prediction, 'value' | 'band' | 'floor' | 'bound'>,
  simulated: number,
): boolean {
  const { value, band, floor = 0, bound = false } = prediction;
  if (Math.abs(value / simulated - 1) <= band || Math.abs(value - simulated) <= floor) return true;
  return bound && simulated < value;
}
