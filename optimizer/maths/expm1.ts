/**
 * e^x − 1 without cancellation near zero, the same to the last bit on every engine.
 * The algorithm and its constants are those of fdlibm (Sun Microsystems, 1993: permission to use, copy, modify and
 * distribute freely granted, provided this notice is preserved), written anew here.
 */
import { LOWEST_POWER, POWERS } from './bits.ts';

const LN2_HIGH = 0.6931471803691238;
const LN2_LOW = 1.9082149292705877e-10;
const LOG2_E = Math.LOG2E;
const OVERFLOW = 709.782712893384;
const ALL_MINUS_ONE = -38.816242111356935;
const HALF_LN2 = 0.34657359027997264;
const THREE_HALVES_LN2 = 1.0397207708399179;
const TINY = 5.551115123125783e-17;
const Q1 = -0.03333333333333313;
const Q2 = 0.0015873015872548146;
const Q3 = -0.0000793650757867488;
const Q4 = 0.000004008217827329362;
const Q5 = -2.0109921818362437e-7;

/** e^x − 1; error under 1 ulp, also for small x. */
export function expm1(x: number): number {
  if (x > OVERFLOW) return Number.POSITIVE_INFINITY;
  if (x <= ALL_MINUS_ONE) return -1;
  const size = Math.abs(x);
  if (!(size >= TINY)) return x;
  if (size <= HALF_LN2) return unscaled(x, 0, 0);
  let k = (LOG2_E * x + (x < 0 ? -0.5 : 0.5)) | 0;
  if (size < THREE_HALVES_LN2) k = x < 0 ? -1 : 1;
  const high = x - k * LN2_HIGH;
  const low = k * LN2_LOW;
  const r = high - low;
  return unscaled(r, high - r - low, k);
}

/** e^(x + c) · 2^k − 1 for |x| up to about ln(2)/2 and a correction c. */
function unscaled(x: number, c: number, k: number): number {
  const half = 0.5 * x;
  const z = x * half;
  const r1 = 1 + z * (Q1 + z * (Q2 + z * (Q3 + z * (Q4 + z * Q5))));
  const t = 3 - r1 * half;
  let e = z * ((r1 - t) / (6 - x * t));
  if (k === 0) return x - (x * e - z);
  e = x * (e - c) - c - z;
  if (k === -1) return 0.5 * (x - e) - 0.5;
  if (k === 1) return x < -0.25 ? -2 * (e - (x + 0.5)) : 1 + 2 * (x - e);
  if (k === 1024) return (1 - (e - x)) * 2 * POWERS[1023 - LOWEST_POWER] - 1;
  const scale = POWERS[k - LOWEST_POWER];
  if (k <= -2 || k > 56) return (1 - (e - x)) * scale - 1;
  const inverse = POWERS[-k - LOWEST_POWER];
  return k < 20 ? (1 - inverse - (e - x)) * scale : (x - (e + inverse) + 1) * scale;
}
