/**
 * Cube root and hypotenuse, the same to the last bit on every engine.
 * The algorithm and its constants are those of fdlibm (Sun Microsystems, 1993: permission to use, copy, modify and
 * distribute freely granted, provided this notice is preserved), written anew here.
 */
import { double, HIGH, LOW, words } from './bits.ts';

const TWO_54 = 18014398509481984;
/** 2^600 and 2^−600. */
const HUGE = 4.149515568880993e180;
const TINY = 2.409919865102884e-181;
/** Guess of the root's exponent bits: a third of the argument's, shifted by these. */
const NORMAL = 715094163;
const SUBNORMAL = 696219795;

/** ∛x; error under 1 ulp. */
export function cbrt(x: number): number {
  const size = Math.abs(x);
  if (!(size > 0 && size < Number.POSITIVE_INFINITY)) return x;
  const subnormal = size < 2.2250738585072014e-308;
  double[0] = subnormal ? size * TWO_54 : size;
  words[HIGH] = ((words[HIGH] / 3) | 0) + (subnormal ? SUBNORMAL : NORMAL);
  words[LOW] = 0;
  let t = double[0];
  let r = t * t * (t / size);
  t *=
    1.87595182427177 +
    r * (-1.8849797954337717 + r * (1.6214297201053545 + r * (-0.758397934778766 + r * 0.14599619288661245)));
  // Few enough bits that t · t is exact in the Newton step.
  const c = t * 1073741825;
  t = c - (c - t);
  r = size / (t * t);
  t += t * ((r - t) / (t + t + r));
  return x < 0 ? -t : t;
}

/** √(x² + y²) without overflow on the way; error under 1 ulp. */
export function hypot(x: number, y: number): number {
  const long = Math.max(Math.abs(x), Math.abs(y));
  const short = Math.min(Math.abs(x), Math.abs(y));
  if (Math.abs(x) === Number.POSITIVE_INFINITY || Math.abs(y) === Number.POSITIVE_INFINITY) {
    return Number.POSITIVE_INFINITY;
  }
  if (!(long > 0)) return long;
  const scale = long > 1e150 ? TINY : short < 1e-150 && long < 1e-100 ? HUGE : 1;
  return Math.sqrt(long * scale * (long * scale) + short * scale * (short * scale)) / scale;
}
