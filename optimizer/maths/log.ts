/**
 * Natural logarithm, the same to the last bit on every engine.
 * The algorithm and its constants are those of fdlibm (Sun Microsystems, 1993: permission to use, copy, modify and
 * distribute freely granted, provided this notice is preserved), written anew here.
 */
import { double, HIGH, LOWEST_POWER, POWERS, words } from './bits.ts';

const LN2_HIGH = 0.6931471803691238;
const LN2_LOW = 1.9082149292705877e-10;
const TWO_54 = 18014398509481984;
const L1 = 0.6666666666666735;
const L2 = 0.3999999999940942;
const L3 = 0.2857142874366239;
const L4 = 0.22222198432149784;
const L5 = 0.1818357216161805;
const L6 = 0.15313837699209373;
const L7 = 0.14798198605116586;

const scratch = new Float64Array(1);

/** ln x; error under 1 ulp. ln 0 = −∞, NaN below zero. */
export function log(x: number): number {
  scratch[0] = x;
  logAt(scratch, 0);
  return scratch[0];
}

/** Replaces `a[i]` by its natural logarithm: `log` without a double crossing a call. */
export function logAt(a: Float64Array, i: number): void {
  let x = a[i];
  if (!(x > 0 && x < Number.POSITIVE_INFINITY)) {
    a[i] = x === 0 ? Number.NEGATIVE_INFINITY : x > 0 ? x : Number.NaN;
    return;
  }
  let k = 0;
  if (x < 2.2250738585072014e-308) {
    k = -54;
    x *= TWO_54;
  }
  double[0] = x;
  const bits = words[HIGH];
  const significand = bits & 0xfffff;
  const shift = (bits >> 20) - 1023 + ((significand + 0x95f64) >> 20);
  k += shift;
  const f = x * POWERS[-shift - LOWEST_POWER] - 1;
  const s = f / (2 + f);
  const z = s * s;
  const w = z * z;
  const even = z * (L1 + w * (L3 + w * (L5 + w * L7)));
  const odd = w * (L2 + w * (L4 + w * L6));
  const square = 0.5 * f * f;
  a[i] = k * LN2_HIGH - (square - (s * (square + (even + odd)) + k * LN2_LOW) - f);
}
