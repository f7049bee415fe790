/**
 * x^y by a logarithm in extra precision, the same to the last bit on every engine. Upper parts are split off by Veltkamp's
 * product instead of by masking words: as exact, and free of slow partial stores.
 * The algorithm and its constants are those of fdlibm (Sun Microsystems, 1993: permission to use, copy, modify and
 * distribute freely granted, provided this notice is preserved), written anew here.
 */
import { double, HIGH, LOWEST_POWER, POWERS, SPLIT, words } from './bits.ts';

const L1 = 0.5999999999999946;
const L2 = 0.4285714285785502;
const L3 = 0.33333332981837743;
const L4 = 0.272728123808534;
const L5 = 0.23066074577556175;
const L6 = 0.20697501780033842;
const P1 = 0.16666666666666602;
const P2 = -0.0027777777777015593;
const P3 = 0.00006613756321437934;
const P4 = -0.0000016533902205465252;
const P5 = 4.1381367970572385e-8;
const LN2 = Math.LN2;
const LN2_HIGH = 0.6931471824645996;
const LN2_LOW = -1.904654299957768e-9;
/** 2/(3 ln 2) and its two parts. */
const CP = 0.9617966939259756;
const CP_HIGH = 0.9617967009544373;
const CP_LOW = -7.028461650952758e-9;
/** log₂ 1.5 in two parts. */
const DP_HIGH = 0.5849624872207642;
const DP_LOW = 1.350039202129749e-8;
/** −(1024 − log₂(largest double + half an ulp)). */
const OVERFLOW_TAIL = 8.008566259537294e-17;
const TWO_54 = 18014398509481984;
/** Beyond this every x but ±1 over- or underflows. */
const HUGE = 73786976294838210000;

const scratch = new Float64Array(2);

/** x^y; error under 1 ulp; edge cases as IEEE 754 pow (1^y = 1, x^0 = 1). NaN for x < 0 with fractional y. */
export function pow(x: number, y: number): number {
  scratch[0] = x;
  scratch[1] = y;
  powAt(scratch, 0);
  return scratch[0];
}

/** Replaces `a[i]` by `a[i]` to the power `a[i + 1]`: `pow` without a double crossing a call. */
export function powAt(a: Float64Array, i: number): void {
  const x = a[i];
  const y = a[i + 1];
  if (x > 0 && x < Number.POSITIVE_INFINITY && y !== 0 && Math.abs(y) < HUGE) positivePowAt(a, i);
  else edgePowAt(a, i);
}

/** Every case that is not a positive finite base with a moderate exponent. */
function edgePowAt(a: Float64Array, i: number): void {
  const x = a[i];
  const y = a[i + 1];
  const size = Math.abs(x);
  const whole = Math.floor(y) === y;
  const odd = whole && Math.abs(y) < 9007199254740992 && Math.floor(y / 2) * 2 !== y;
  const negative = odd && (x < 0 || (x === 0 && 1 / x < 0));
  if (y === 0 || x === 1) a[i] = 1;
  else if (Number.isNaN(x) || Number.isNaN(y)) a[i] = Number.NaN;
  else if (size === 1 && Math.abs(y) === Number.POSITIVE_INFINITY) a[i] = 1;
  else if (x < 0 && !whole && size < Number.POSITIVE_INFINITY) a[i] = Number.NaN;
  else if (size === 0 || size === Number.POSITIVE_INFINITY) a[i] = size > 1 === y > 0 ? Number.POSITIVE_INFINITY : 0;
  else if (size !== 1 && Math.abs(y) >= HUGE) a[i] = size > 1 === y > 0 ? Number.POSITIVE_INFINITY : 0;
  else {
    a[i] = size;
    positivePowAt(a, i);
  }
  if (negative) a[i] = -a[i];
}

/** Kernel: log₂ x as t1 + t2, times y as high + low, then 2 to that power. */
function positivePowAt(a: Float64Array, i: number): void {
  const x = a[i];
  const y = a[i + 1];
  const subnormal = x < 2.2250738585072014e-308;
  const scaled = subnormal ? x * TWO_54 : x;
  double[0] = scaled;
  const bits = words[HIGH];
  const significand = bits & 0xfffff;
  // Three intervals around 1, 1.5 and 2 keep (m − b)/(m + b) small.
  const upper = significand >= 0xbb67a ? 1 : 0;
  const middle = significand > 0x3988e && upper === 0;
  const exponent = (bits >> 20) - 1023 + upper;
  const m = scaled * POWERS[-exponent - LOWEST_POWER];
  const b = middle ? 1.5 : 1;
  const n = subnormal ? exponent - 54 : exponent;

  const u = m - b;
  const v = 1 / (m + b);
  const ss = u * v;
  let c = ss * SPLIT;
  const hs = c - (c - ss);
  c = (m + b) * SPLIT;
  const ht0 = c - (c - (m + b));
  const lt0 = m - (ht0 - b);
  const ls = v * (u - hs * ht0 - hs * lt0);
  let s2 = ss * ss;
  let r = s2 * s2 * (L1 + s2 * (L2 + s2 * (L3 + s2 * (L4 + s2 * (L5 + s2 * L6)))));
  r += ls * (hs + ss);
  s2 = hs * hs;
  c = (3 + s2 + r) * SPLIT;
  const ht = c - (c - (3 + s2 + r));
  const lt = r - (ht - 3 - s2);
  const uu = hs * ht;
  const vv = ls * ht + lt * ss;
  c = (uu + vv) * SPLIT;
  const hp = c - (c - (uu + vv));
  const lp = vv - (hp - uu);
  const hz = CP_HIGH * hp;
  const lz = CP_LOW * hp + lp * CP + (middle ? DP_LOW : 0);
  const dp = middle ? DP_HIGH : 0;
  const sum = hz + lz + dp + n;
  c = sum * SPLIT;
  const t1 = c - (c - sum);
  const t2 = lz - (t1 - n - dp - hz);

  c = y * SPLIT;
  const y1 = c - (c - y);
  const low = (y - y1) * t1 + y * t2;
  let high = y1 * t1;
  const z = low + high;
  if (z >= 1024 && (z > 1024 || low + OVERFLOW_TAIL > z - high)) {
    a[i] = Number.POSITIVE_INFINITY;
    return;
  }
  if (z <= -1075 && (z < -1075 || low <= z - high)) {
    a[i] = 0;
    return;
  }
  const k = Math.floor(z + 0.5) | 0;
  high -= k;
  c = (low + high) * SPLIT;
  const t = c - (c - (low + high));
  const p = t * LN2_HIGH;
  const q = (low - (t - high)) * LN2 + t * LN2_LOW;
  const e = p + q;
  const w = q - (e - p);
  const ee = e * e;
  const f = e - ee * (P1 + ee * (P2 + ee * (P3 + ee * (P4 + ee * P5))));
  const result = 1 - ((e * f) / (f - 2) - (w + e * w) - e);
  if (k < -1021) a[i] = result * POWERS[k + 1000 - LOWEST_POWER] * POWERS[-1000 - LOWEST_POWER];
  else if (k === 1024) a[i] = result * 2 * POWERS[1023 - LOWEST_POWER];
  else a[i] = result * POWERS[k - LOWEST_POWER];
}
