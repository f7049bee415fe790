/** Mean, mean square, rms and extremes of a waveform: what heats a resistance and what saturates a core. */
import type { Waveform } from './waveform.ts';

/** Where `measure` writes. */
export const MEAN = 0;
export const MEAN_SQUARE = 1;
export const PEAK = 2;
export const VALLEY = 3;

/**
 * Writes mean, mean square, peak and valley of `w` to `into[0 … 3]` without garbage: the hot path's form.
 * Mean square of one segment a→b of length d: d·(a² + ab + b²)/3, over the period.
 * @source erickson-maksimovic-2001, appendix A (rms values of piecewise waveforms)
 * @valid any waveform with a period above 0
 */
export function measure(w: Waveform, into: Float64Array): void {
  let sum = 0;
  let square = 0;
  let peak = Number.NEGATIVE_INFINITY;
  let valley = Number.POSITIVE_INFINITY;
  for (let i = 0; i < w.count; i++) {
    const a = w.start[i];
    const b = w.end[i];
    const d = w.duration[i];
    sum += 0.5 * d * (a + b);
    square += (d * (a * a + a * b + b * b)) / 3;
    if (a > peak) peak = a;
    if (b > peak) peak = b;
    if (a < valley) valley = a;
    if (b < valley) valley = b;
  }
  into[MEAN] = sum / w.period;
  into[MEAN_SQUARE] = square / w.period;
  into[PEAK] = peak;
  into[VALLEY] = valley;
}

/**
 * Mean over the period, in the waveform's unit.
 * @source erickson-maksimovic-2001, appendix A
 * @valid period above 0
 */
export function mean(w: Waveform): number {
  let sum = 0;
  for (let i = 0; i < w.count; i++) sum += w.duration[i] * (w.start[i] + w.end[i]);
  return (0.5 * sum) / w.period;
}

/**
 * Mean of the square over the period, in the waveform's unit squared.
 * @source erickson-maksimovic-2001, appendix A
 * @valid period above 0
 */
export function meanSquare(w: Waveform): number {
  let sum = 0;
  for (let i = 0; i < w.count; i++) {
    const a = w.start[i];
    const b = w.end[i];
    sum += w.duration[i] * (a * a + a * b + b * b);
  }
  return sum / (3 * w.period);
}

/**
 * Root of the mean square, in the waveform's unit.
 * @source erickson-maksimovic-2001, appendix A
 * @valid period above 0
 */
export function rms(w: Waveform): number {
  return Math.sqrt(meanSquare(w));
}

/**
 * Largest value at any end of a segment; −∞ for an empty waveform.
 * @derivation a straight segment has its extremes at its ends
 * @valid any waveform
 */
export function peak(w: Waveform): number {
  let largest = Number.NEGATIVE_INFINITY;
  for (let i = 0; i < w.count; i++) largest = Math.max(largest, w.start[i], w.end[i]);
  return largest;
}

/**
 * Smallest value at any end of a segment; ∞ for an empty waveform.
 * @derivation a straight segment has its extremes at its ends
 * @valid any waveform
 */
export function valley(w: Waveform): number {
  let smallest = Number.POSITIVE_INFINITY;
  for (let i = 0; i < w.count; i++) smallest = Math.min(smallest, w.start[i], w.end[i]);
  return smallest;
}
