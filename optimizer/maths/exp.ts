/**
 * e^x, the same to the last bit on every engine.
 * The algorithm and its constants are those of fdlibm (Sun Microsystems, 1993: permission to use, copy, modify and
 * distribute freely granted, provided this notice is preserved), written anew here.
 */
import { LOWEST_POWER, POWERS } from './bits.ts';

const LN2_HIGH = 0.6931471803691238;
const LN2_LOW = 1.9082149292705877e-10;
const LOG2_E = Math.LOG2E;
const OVERFLOW = 709.782712893384;
const UNDERFLOW = -745.1332191019411;
const P1 = 0.16666666666666602;
const P2 = -0.0027777777777015593;
const P3 = 0.00006613756321437934;
const P4 = -0.0000016533902205465252;
const P5 = 4.1381367970572385e-8;

const scratch = new Float64Array(1);

/** e^x; error under 1 ulp. e^−∞ = 0, e^∞ = ∞, NaN stays NaN. */
export function exp(x: number): number {
  scratch[0] = x;
  expAt(scratch, 0);
  return scratch[0];
}

/** Replaces `a[i]` by its exponential: `exp` without a double crossing a call. */
export function expAt(a: Float64Array, i: number): void {
  const x = a[i];
  if (!(x <= OVERFLOW && x >= UNDERFLOW)) {
    a[i] = x > OVERFLOW ? Number.POSITIVE_INFINITY : x < UNDERFLOW ? 0 : x;
    return;
  }
  const k = (LOG2_E * x + (x < 0 ? -0.5 : 0.5)) | 0;
  const high = x - k * LN2_HIGH;
  const low = k * LN2_LOW;
  const r = high - low;
  const t = r * r;
  const c = r - t * (P1 + t * (P2 + t * (P3 + t * (P4 + t * P5))));
  const y = 1 - (low - (r * c) / (2 - c) - high);
  if (k < -1021) a[i] = y * POWERS[k + 1000 - LOWEST_POWER] * POWERS[-1000 - LOWEST_POWER];
  else if (k === 1024) a[i] = y * 2 * POWERS[1023 - LOWEST_POWER];
  else a[i] = y * POWERS[k - LOWEST_POWER];
}
