/**
 * Tangent, the same to the last bit on every engine.
 * The algorithm and its constants are those of fdlibm (Sun Microsystems, 1993: permission to use, copy, modify and
 * distribute freely granted, provided this notice is preserved), written anew here.
 */
import { SPLIT } from './bits.ts';
import { reduceAt, reduced } from './reduce.ts';

const QUARTER_PI = 0.7853981633974483;
const QUARTER_PI_REST = 3.061616997868383e-17;
const FOLD = 0.6743316650390625;
const T0 = 0.3333333333333341;

const scratch = new Float64Array(1);

/** tan x for x in radians; error under 1 ulp for every finite x, NaN for infinite x. */
export function tan(x: number): number {
  if (x === 0) return x;
  scratch[0] = x;
  const odd = (reduceAt(scratch, 0) & 1) === 1;
  return tangent(reduced[0], reduced[1], odd);
}

/** tan(x + y), or −1/tan(x + y) for an odd quadrant, on |x| ≤ π/4 with its rest y. */
function tangent(x: number, y: number, odd: boolean): number {
  const folded = Math.abs(x) >= FOLD;
  if (!folded) return odd ? minusInverse(x, rest(x, y)) : x + rest(x, y);
  // Near π/4 the tangent of the complement is better: tan x = (1 − tan(π/4 − x)) / (1 + tan(π/4 − x)).
  const sign = x < 0 ? -1 : 1;
  const complement = QUARTER_PI - sign * x + (QUARTER_PI_REST - sign * y);
  const r = rest(complement, 0);
  const w = complement + r;
  const one = odd ? -1 : 1;
  return sign * (one - 2 * (complement - ((w * w) / (w + one) - r)));
}

/** tan(x + y) − x. */
function rest(x: number, y: number): number {
  const z = x * x;
  const w = z * z;
  const odd =
    0.13333333333320124 +
    w *
      (0.021869488294859542 +
        w *
          (0.0035920791075913124 +
            w * (0.0005880412408202641 + w * (0.00007817944429395571 + w * -0.000018558637485527546))));
  const even =
    0.05396825397622605 +
    w *
      (0.0088632398235993 +
        w *
          (0.0014562094543252903 +
            w * (0.0002464631348184699 + w * (0.00007140724913826082 + w * 0.00002590730518636337))));
  const s = z * x;
  return y + z * (s * (odd + z * even) + y) + T0 * s;
}

/** −1/(x + r) without losing the last bits. */
function minusInverse(x: number, r: number): number {
  const w = x + r;
  let c = w * SPLIT;
  const z = c - (c - w);
  const v = r - (z - x);
  const a = -1 / w;
  c = a * SPLIT;
  const t = c - (c - a);
  return t + a * (1 + t * z + t * v);
}
