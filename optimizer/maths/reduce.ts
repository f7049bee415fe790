/**
 * Reduction of an angle to −π/4 … π/4 and a quadrant, for sine, cosine and tangent. Up to 2²⁰·π/2 by Cody and Waite's
 * subtraction in three stages, beyond that exactly with whole numbers and a long π.
 * The algorithm and its constants are those of fdlibm (Sun Microsystems, 1993: permission to use, copy, modify and
 * distribute freely granted, provided this notice is preserved), written anew here.
 */
import { double, HIGH, LOW, words } from './bits.ts';

const TWO_OVER_PI = 0.6366197723675814;
const QUARTER_PI = 0.7853981633974483;
const LIMIT = 1647099.3291652855;
/** π/2 in stages of 33 bits, each with the rest that follows it. */
const PIO2_1 = 1.5707963267341256;
const PIO2_1_REST = 6.077100506506192e-11;
const PIO2_2 = 6.077100506303966e-11;
const PIO2_2_REST = 2.0222662487959506e-21;
const PIO2_3 = 2.0222662487111665e-21;
const PIO2_3_REST = 8.4784276603689e-32;

/** The reduced angle as a sum of two doubles: index 0 the leading one. */
export const reduced: Float64Array = new Float64Array(2);

/** Reduces `a[i]` into `reduced` and returns the quadrant 0 … 3. NaN for infinite angles. */
export function reduceAt(a: Float64Array, i: number): number {
  const x = a[i];
  const size = Math.abs(x);
  if (size <= QUARTER_PI) {
    reduced[0] = x;
    reduced[1] = 0;
    return 0;
  }
  if (!(size < LIMIT)) return reduceLarge(x);
  const n = Math.floor(x * TWO_OVER_PI + 0.5);
  let r = x - n * PIO2_1;
  let w = n * PIO2_1_REST;
  let y = r - w;
  if (Math.abs(y) < size * 1.52587890625e-5) {
    let before = r;
    w = n * PIO2_2;
    r = before - w;
    w = n * PIO2_2_REST - (before - r - w);
    y = r - w;
    if (Math.abs(y) < size * 1.7763568394002505e-15) {
      before = r;
      w = n * PIO2_3;
      r = before - w;
      w = n * PIO2_3_REST - (before - r - w);
      y = r - w;
    }
  }
  reduced[0] = y;
  reduced[1] = r - y - w;
  return n & 3;
}

/** Fraction bits of the long π: 1024 for the largest exponent, the rest for cancellation and the result's own digits. */
const FRACTION_BITS = 1280n;
const TWO_320 = 2.13598703592091e96;
let halfPi = 0n;

/** Exact reduction of a large angle. */
function reduceLarge(x: number): number {
  if (!(Math.abs(x) < Number.POSITIVE_INFINITY)) {
    reduced[0] = Number.NaN;
    reduced[1] = Number.NaN;
    return 0;
  }
  if (halfPi === 0n) halfPi = 2n * (4n * inverseTangent(5n) - inverseTangent(239n));
  double[0] = Math.abs(x);
  const exponent = (words[HIGH] >> 20) - 1075;
  const significand = (BigInt((words[HIGH] & 0xfffff) | 0x100000) << 32n) | BigInt(words[LOW] >>> 0);
  const fixed = (significand << FRACTION_BITS) << BigInt(Math.max(0, exponent));
  const angle = exponent < 0 ? fixed >> BigInt(-exponent) : fixed;
  const turns = (2n * angle + halfPi) / (2n * halfPi);
  const rest = angle - turns * halfPi;
  const high = fixedToNumber(rest);
  const low = fixedToNumber(rest - numberToFixed(high));
  reduced[0] = x < 0 ? -high : high;
  reduced[1] = x < 0 ? -low : low;
  const quadrant = Number(turns & 3n);
  return x < 0 ? (4 - quadrant) & 3 : quadrant;
}

/** arctan(1/n) in fixed point by its power series (Machin's formula for π uses n = 5 and 239). */
function inverseTangent(n: bigint): bigint {
  let power = (1n << FRACTION_BITS) / n;
  let sum = 0n;
  for (let odd = 1n; power !== 0n; odd += 4n) {
    sum += power / odd;
    power /= n * n;
    sum -= power / (odd + 2n);
    power /= n * n;
  }
  return sum;
}

/** A fixed-point fraction as a double (its upper 320 fraction bits are far more than enough). */
function fixedToNumber(value: bigint): number {
  return Number(value >> (FRACTION_BITS - 320n)) / TWO_320;
}

/** A double below 1 in size as a fixed-point fraction. */
function numberToFixed(value: number): bigint {
  return BigInt(value * TWO_320) << (FRACTION_BITS - 320n);
}
