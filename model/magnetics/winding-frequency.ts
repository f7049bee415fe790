/** A laid winding at one frequency and temperature: what depends on the design alone, and its loss under any current. */
import { harmonics } from '../waveform/harmonic.ts';
import { MEAN, MEAN_SQUARE, measure } from '../waveform/moments.ts';
import { slopeMeanSquare } from '../waveform/slope.ts';
import type { Waveform } from '../waveform/waveform.ts';
import { copperResistivity, skinDepth, wireResistance } from './copper.ts';
import { dowellHarmonics } from './dowell.ts';
import type { Winding } from './winding-layout.ts';
import { harmonicLoss, WINDING_AC } from './winding-loss.ts';

/** Harmonics summed one by one; the rest is bounded. */
export const WINDING_HARMONICS = 12;

/** Figures of a winding at one frequency. Filled once a design. */
export interface WindingAtFrequency {
  /** Dc resistance at the temperature it was prepared for, Ω. */
  resistance: number;
  /** Hz of the fundamental. */
  frequency: number;
  /** Dowell's x at the fundamental. */
  x1: number;
  /** Dowell's m. */
  layers: number;
  /** F at harmonics 1 … WINDING_HARMONICS. */
  readonly factors: Float64Array;
}

/** One to be filled. */
export function createWindingAtFrequency(): WindingAtFrequency {
  return { resistance: 1, frequency: 1, x1: 0, layers: 1, factors: new Float64Array(WINDING_HARMONICS) };
}

/**
 * Fills `into` for `winding` with mean turn `turnLength` m, `frequency` Hz of the current's period, conductor `temperature` K.
 * @source dowell-1966
 * @valid as `dowellAt`
 */
export function prepareWinding(
  winding: Winding,
  turnLength: number,
  frequency: number,
  temperature: number,
  into: WindingAtFrequency,
): void {
  const resistivity = copperResistivity(temperature);
  into.resistance = wireResistance(resistivity, winding.turns * turnLength, winding.copperArea);
  into.frequency = frequency;
  into.x1 = winding.dowellThickness / skinDepth(resistivity, frequency);
  into.layers = winding.dowellLayers;
  dowellHarmonics(into.x1, into.layers, WINDING_HARMONICS, into.factors);
}

const moments = new Float64Array(4);
const coefficients = new Float64Array(2 * WINDING_HARMONICS);
const loss = new Float64Array(2);

/**
 * Writes to `into[0]` the winding loss, W, under `current` (A, one period at the prepared frequency): R·(mean² + Σ½c_k²·F_k + tail's bound).
 * An upper figure: see `harmonicLoss`. Free of garbage.
 * @source dowell-1966 for each harmonic; tail by the derivation in `tailBound`
 * @valid finite edges: a jump's slope is left out of the tail, so give it its real duration
 */
export function windingLossAt(winding: WindingAtFrequency, current: Waveform, into: Float64Array): void {
  measure(current, moments);
  harmonics(current, WINDING_HARMONICS, coefficients);
  const average = moments[MEAN];
  harmonicLoss(
    coefficients,
    winding.factors,
    WINDING_HARMONICS,
    moments[MEAN_SQUARE] - average * average,
    slopeMeanSquare(current),
    winding.frequency,
    winding.x1,
    winding.layers,
    loss,
  );
  into[0] = winding.resistance * (average * average + loss[WINDING_AC]);
}
