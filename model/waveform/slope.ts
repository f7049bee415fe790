/** Integrals of the slope: what core loss and proximity loss see of a waveform. */
import { powAt } from '../../optimizer/maths/index.ts';
import type { Waveform } from './waveform.ts';

const power = new Float64Array(2);

/**
 * (1/T)·∫|dx/dt|^α dt: Σ |b − a|^α · d^(1 − α) / T over the segments, in (unit/s)^α.
 * Segments of no length are left out: a jump in flux does not exist.
 * @source igse-2002, equation for piecewise-linear flux
 * @valid α from 0 to 3
 */
export function slopePowerMean(w: Waveform, alpha: number): number {
  let sum = 0;
  for (let i = 0; i < w.count; i++) {
    const d = w.duration[i];
    const rise = Math.abs(w.end[i] - w.start[i]);
    if (d > 0 && rise > 0) {
      power[0] = rise / d;
      power[1] = alpha;
      powAt(power, 0);
      sum += power[0] * d;
    }
  }
  return sum / w.period;
}

/**
 * Mean square of the slope, in (unit/s)²; segments of no length are left out, so give jumps their finite edges first.
 * @source hurley-2000, section II (rms of the derivative)
 * @valid period above 0
 */
export function slopeMeanSquare(w: Waveform): number {
  measureSlope(w, power);
  return power[0];
}

/**
 * The same, written to `into[0]` without garbage: the hot path's form.
 * @source hurley-2000, section II (rms of the derivative)
 * @valid period above 0
 */
export function measureSlope(w: Waveform, into: Float64Array): void {
  let sum = 0;
  for (let i = 0; i < w.count; i++) {
    const rise = w.end[i] - w.start[i];
    if (w.duration[i] > 0) sum += (rise * rise) / w.duration[i];
  }
  into[0] = sum / w.period;
}
