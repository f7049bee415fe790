/** The charge that the ac part of a current moves into and out of a capacitor each period. */
import { mean } from './moments.ts';
import type { Waveform } from './waveform.ts';

/**
 * Peak to peak of the integral of (w − its mean), in the waveform's unit times s: charge swing in C for a current in A.
 * Within a segment a→b of length d the integral is q + a·t + (b − a)·t²/(2d), with an extreme a²·d/(2·(a − b)) where
 * the segment crosses zero. Divided by C it is the ripple of an ideal capacitor; for a triangle it is ΔI/(8·f).
 * @source slva057, section 5.1 (ΔV = ΔI/(8·f·C))
 * @valid period above 0
 */
export function chargeSwing(w: Waveform): number {
  const average = mean(w);
  let charge = 0;
  let highest = 0;
  let lowest = 0;
  for (let i = 0; i < w.count; i++) {
    const a = w.start[i] - average;
    const b = w.end[i] - average;
    const d = w.duration[i];
    if (a * b < 0) {
      const turn = charge + (0.5 * a * a * d) / (a - b);
      if (turn > highest) highest = turn;
      if (turn < lowest) lowest = turn;
    }
    charge += 0.5 * (a + b) * d;
    if (charge > highest) highest = charge;
    if (charge < lowest) lowest = charge;
  }
  return highest - lowest;
}
