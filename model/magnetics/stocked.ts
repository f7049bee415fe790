/** A stocked inductor: its losses from the row of a parts table. What depends on the design alone is taken once. */

import { expAt, logAt, powAt } from '../../optimizer/maths/index.ts';
import type { Inductor } from '../parts/inductor.ts';
import { COPPER_TEMPCO, copperResistivity, skinDepth } from './copper.ts';
import { dowellHarmonicsAt } from './dowell.ts';

/** Harmonics summed one by one; the rest is bounded. */
export const RIPPLE_HARMONICS = 6;

/** Frequency-dependent figures of an inductor at one switching frequency. Filled once a design. */
export interface InductorAtFrequency {
  /** Hz of the ripple, and skin depth of the hot conductor at 1 Hz, m·√Hz: it falls as 1/√f. */
  frequency: number;
  depth: number;
  /** k·f^α, W at 1 A of swing. */
  coreScale: number;
  /** Layer thickness over skin depth at the fundamental. */
  x1: number;
  layers: number;
  /** Dowell's factor at harmonics 1 … RIPPLE_HARMONICS. */
  readonly factors: Float64Array;
}

const power = new Float64Array(2);

/** An empty one. */
export function createInductorAtFrequency(): InductorAtFrequency {
  return {
    frequency: 0.5,
    depth: 0.5,
    coreScale: 0.5,
    x1: 0.5,
    layers: 1,
    factors: new Float64Array(RIPPLE_HARMONICS),
  };
}

/**
 * Fills `into` for `row` at `frequency` (Hz) of its ripple and conductor `temperature` (K).
 * @source dowell-1966
 * @valid row's conductor thickness and layers describe a layered winding
 */
export function prepareInductor(
  row: Inductor,
  frequency: number,
  temperature: number,
  into: InductorAtFrequency,
): void {
  into.frequency = frequency;
  into.depth = skinDepth(copperResistivity(temperature), 1);
  prepareInductorAt(row, into);
}

/**
 * The same for the frequency and depth that stand in `into`: no double crosses the call.
 * @source dowell-1966
 * @valid as `prepareInductor`
 */
export function prepareInductorAt(row: Inductor, into: InductorAtFrequency): void {
  power[0] = into.frequency;
  power[1] = row.coreFrequencyExponent;
  powAt(power, 0);
  into.coreScale = row.coreCoefficient * power[0];
  into.x1 = (row.conductorThickness * Math.sqrt(into.frequency)) / into.depth;
  into.layers = row.layers;
  dowellHarmonicsAt(into, RIPPLE_HARMONICS, into.factors);
}

/**
 * Writes to `into[0]` the core loss, W, of a triangle of `swing` A peak to peak rising for `duty` of the period:
 * k·f^α·ΔI^β·[D^(1 − α) + (1 − D)^(1 − α)]/2^α. `at` from `prepareInductor`. No loss without swing.
 * @source igse-2002, applied to a triangle
 * @valid 0 < duty < 1
 */
export function stockedCoreLoss(
  row: Inductor,
  at: InductorAtFrequency,
  swing: number,
  duty: number,
  into: Float64Array,
): void {
  into[0] = swing;
  into[1] = duty;
  stockedCoreLossAt(row, at, into);
}

/**
 * The same for the swing in `into[0]` and the duty in `into[1]`: no double crosses the call.
 * @source igse-2002, applied to a triangle
 * @valid as `stockedCoreLoss`
 */
export function stockedCoreLossAt(row: Inductor, at: InductorAtFrequency, into: Float64Array): void {
  const duty = into[1];
  if (!(into[0] > 0)) {
    into[0] = 0;
    return;
  }
  const less = 1 - row.coreFrequencyExponent;
  logAt(into, 0);
  const base = row.coreSwingExponent * into[0] - row.coreFrequencyExponent * Math.LN2;
  into[0] = duty;
  into[1] = 1 - duty;
  logAt(into, 0);
  logAt(into, 1);
  into[0] = base + less * into[0];
  into[1] = base + less * into[1];
  expAt(into, 0);
  expAt(into, 1);
  into[0] = at.coreScale * (into[0] + into[1]);
}

/**
 * Dc resistance at a temperature, Ω: R25·(1 + 0.00393·(T − 293.15))/(1 + 0.00393·5). `resistance25` Ω at 25 °C, `temperature` K.
 * @source iec-60028, temperature coefficient of copper
 * @valid copper windings
 * @example windingResistance(0.01, 298.15) = 0.01
 */
export function windingResistance(resistance25: number, temperature: number): number {
  return (resistance25 * (1 + COPPER_TEMPCO * (temperature - 293.15))) / (1 + COPPER_TEMPCO * 5);
}

/**
 * Thermal resistance of the part to its surroundings, K/W, from its rated current: rise/(I²·R(hot)), hot = 25 °C + rise.
 * `ratedCurrent` A, `ratedRise` K, `resistance25` Ω at 25 °C.
 * @derivation the rated current is the dc current that makes the rated rise; all loss is then I²·R
 * @valid rating given in still air at 25 °C
 * @example inductorThermalResistance(10, 40, 0.005) = 69.314
 */
export function inductorThermalResistance(ratedCurrent: number, ratedRise: number, resistance25: number): number {
  return ratedRise / (ratedCurrent * ratedCurrent * windingResistance(resistance25, 298.15 + ratedRise));
}
