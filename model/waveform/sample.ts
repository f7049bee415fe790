/** The value of a waveform at one time: for plots and for checks against a circuit simulator. */
import type { Waveform } from './waveform.ts';

/**
 * Value at time `t` in s, any real number (the waveform repeats). At a jump: the value after it. NaN when empty.
 * @derivation linear interpolation in the segment that holds t
 * @valid period above 0
 */
export function sample(w: Waveform, t: number): number {
  let rest = t - Math.floor(t / w.period) * w.period;
  let last = Number.NaN;
  for (let i = 0; i < w.count; i++) {
    const d = w.duration[i];
    if (rest < d) return w.start[i] + ((w.end[i] - w.start[i]) * rest) / d;
    rest -= d;
    last = w.end[i];
  }
  return last;
}
