/**
 * The record that the solution of two inductive capacitor groups speaks through, so that no double crosses a call (one that
 * does is boxed: garbage).
 */
import type { Waveform } from '../waveform/waveform.ts';
import type { Bank } from './bank.ts';

/** Most segments of a current. */
const SEGMENTS = 256;
/** Doubles that one segment keeps, and their places: step matrix, the matrix of the whole segment, forced solution, current. */
export const KEPT = 16;
export const STEP = 0;
export const WHOLE = 4;
export const FORCED = 8;
export const CURRENT = 12;

/** What each segment keeps between the search for the periodic state and the walk. */
export const kept = new Float64Array(KEPT * SEGMENTS);
/** Number of steps of each segment. */
export const counts = new Int32Array(SEGMENTS);

/**
 * The network: difference w = v1 − v2 and bulk current y obey w' = (i − y)/C1 − y/C2 and L·y' = w + R1·i + L1·i' − R·y, with
 * R = R1 + R2 and L = L1 + L2. In a segment i = a + s·t the state rings about a forced solution w0 + w1·t, y0 + y1·t.
 */
export const pair = {
  c2: 0.5,
  r1: 0.5,
  l1: 0.5,
  r: 0.5,
  l: 0.5,
  // Share of the bulk's branch in a jump of the current, L1/L; g = 1/C1 + 1/C2, 1/g, 1/(C1 + C2), and C2/(C1 + C2).
  jump: 0.5,
  g: 0.5,
  perG: 0.5,
  perTotal: 0.5,
  bulkShare: 0.5,
  // Half of the damping α = −R/(2·L); √|α² − g/L|, an angular frequency where the pair rings and a rate where it does not; 1/R.
  alpha: 0.5,
  omega: 0.5,
  rings: false,
  perR: 0.5,
  // Fewest steps of a segment, a power of two.
  fewest: 1,
  average: 0.5,
  // The state, and the charge that has flowed.
  w: 0.5,
  y: 0.5,
  q: 0.5,
  // The segment's length, and the current where the segment before ended.
  d: 0.5,
  before: 0.5,
  // The state's distance from the forced solution where the segment starts and ends.
  z: 0.5,
  u: 0.5,
  zEnd: 0.5,
  uEnd: 0.5,
  highest: 0.5,
  lowest: 0.5,
  square1: 0.5,
  square2: 0.5,
};

/**
 * Takes up `bank` and the level `average` that its current is seen from.
 * @derivation the network above
 * @valid a pair
 */
export function setPair(bank: Bank): void {
  pair.c2 = bank.c2;
  pair.r1 = bank.r1;
  pair.l1 = bank.l1;
  pair.r = bank.r1 + bank.r2;
  pair.l = bank.l1 + bank.l2;
  pair.jump = pair.l1 / pair.l;
  pair.g = 1 / bank.c1 + 1 / bank.c2;
  pair.perG = 1 / pair.g;
  pair.perTotal = 1 / (bank.c1 + bank.c2);
  pair.bulkShare = bank.c2 * pair.perTotal;
  pair.perR = 1 / pair.r;
  pair.fewest = 1;
  pair.alpha = (-0.5 * pair.r) / pair.l;
  const bend = pair.alpha * pair.alpha - pair.g / pair.l;
  pair.rings = bend < 0;
  pair.omega = Math.sqrt(Math.abs(bend));
}

/** Takes the mean of `current` as the level that it is seen from. */
export function setAverage(current: Waveform): void {
  let sum = 0;
  for (let i = 0; i < current.count; i++) sum += current.duration[i] * (current.start[i] + current.end[i]);
  pair.average = (0.5 * sum) / current.period;
}

/** Takes the end of the last segment that lasts as the current before the first one. */
export function setBefore(current: Waveform): void {
  let i = current.count - 1;
  while (i > 0 && !(current.duration[i] > 0)) i--;
  pair.before = current.end[i];
}
