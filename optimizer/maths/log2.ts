/**
 * Logarithms to the bases 2 and 10 in extra precision, the same to the last bit on every engine.
 * The algorithm and its constants are those of fdlibm (Sun Microsystems, 1993: permission to use, copy, modify and
 * distribute freely granted, provided this notice is preserved), written anew here.
 */
import { double, HIGH, LOWEST_POWER, POWERS, SPLIT, words } from './bits.ts';

const INV_LN2_HIGH = 1.4426950407214463;
const INV_LN2_LOW = 1.6751713164886512e-10;
const INV_LN10_HIGH = 0.4342944818781689;
const INV_LN10_LOW = 2.5082946711645275e-11;
const LOG10_2_HIGH = 0.30102999566361177;
const LOG10_2_LOW = 3.694239077158931e-13;
const TWO_54 = 18014398509481984;

/** What `split` leaves: the power of two taken out, then ln of the rest as an upper and a lower part. */
const parts = new Float64Array(3);

/** log₂ x; error under 1 ulp, exact for powers of two. log₂ 0 = −∞, NaN below zero. */
export function log2(x: number): number {
  if (!(x > 0 && x < Number.POSITIVE_INFINITY)) return edge(x);
  split(x);
  const high = parts[1] * INV_LN2_HIGH;
  const low = (parts[2] + parts[1]) * INV_LN2_LOW + parts[2] * INV_LN2_HIGH;
  const sum = parts[0] + high;
  return low + (parts[0] - sum + high) + sum;
}

/** log₁₀ x; error under 1 ulp. log₁₀ 0 = −∞, NaN below zero. */
export function log10(x: number): number {
  if (!(x > 0 && x < Number.POSITIVE_INFINITY)) return edge(x);
  split(x);
  const high = parts[1] * INV_LN10_HIGH;
  const low = parts[0] * LOG10_2_LOW + (parts[2] + parts[1]) * INV_LN10_LOW + parts[2] * INV_LN10_HIGH;
  const power = parts[0] * LOG10_2_HIGH;
  const sum = power + high;
  return low + (power - sum + high) + sum;
}

/** Logarithm of what has no finite one. */
function edge(x: number): number {
  if (x === 0) return Number.NEGATIVE_INFINITY;
  return x > 0 ? x : Number.NaN;
}

/** Splits x into a power of two and a factor near 1, and takes the logarithm of the factor in two parts. */
function split(x: number): void {
  const subnormal = x < 2.2250738585072014e-308;
  const scaled = subnormal ? x * TWO_54 : x;
  double[0] = scaled;
  const bits = words[HIGH];
  const shift = (bits >> 20) - 1023 + (((bits & 0xfffff) + 0x95f64) >> 20);
  const f = scaled * POWERS[-shift - LOWEST_POWER] - 1;
  const square = 0.5 * f * f;
  const s = f / (2 + f);
  const z = s * s;
  const w = z * z;
  const even = z * (0.6666666666666735 + w * (0.2857142874366239 + w * (0.1818357216161805 + w * 0.14798198605116586)));
  const odd = w * (0.3999999999940942 + w * (0.22222198432149784 + w * 0.15313837699209373));
  const c = (f - square) * SPLIT;
  const high = c - (c - (f - square));
  parts[0] = subnormal ? shift - 54 : shift;
  parts[1] = high;
  parts[2] = f - high - square + s * (square + (even + odd));
}
