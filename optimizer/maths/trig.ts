/**
 * Sine and cosine, the same to the last bit on every engine.
 * The algorithm and its constants are those of fdlibm (Sun Microsystems, 1993: permission to use, copy, modify and
 * distribute freely granted, provided this notice is preserved), written anew here.
 */
import { reduceAt, reduced } from './reduce.ts';

/** Above it an angle is reduced first. */
const QUARTER_PI = 0.7853981633974483;
const S1 = -0.16666666666666632;
const S2 = 0.00833333333332249;
const S3 = -0.0001984126982985795;
const S4 = 0.0000027557313707070068;
const S5 = -2.5050760253406863e-8;
const S6 = 1.58969099521155e-10;
const C1 = 0.0416666666666666;
const C2 = -0.001388888888887411;
const C3 = 0.00002480158728947673;
const C4 = -2.7557314351390663e-7;
const C5 = 2.087572321298175e-9;
const C6 = -1.1359647557788195e-11;

const scratch = new Float64Array(2);

/** sin x for x in radians; error under 1 ulp for every finite x, NaN for infinite x. */
export function sin(x: number): number {
  scratch[0] = x;
  sinAt(scratch, 0);
  return scratch[0];
}

/** cos x for x in radians; error under 1 ulp for every finite x, NaN for infinite x. */
export function cos(x: number): number {
  scratch[0] = x;
  cosAt(scratch, 0);
  return scratch[0];
}

/** Replaces `a[i]` by its sine. */
export function sinAt(a: Float64Array, i: number): void {
  if (a[i] !== 0) fromQuadrant(a, i, reduceAt(a, i));
}

/** Replaces `a[i]` by its cosine. */
export function cosAt(a: Float64Array, i: number): void {
  fromQuadrant(a, i, reduceAt(a, i) + 1);
}

/** Replaces `a[i]` by its sine and writes its cosine to `a[i + 1]`: one reduction for both. */
export function sincosAt(a: Float64Array, i: number): void {
  if (Math.abs(a[i]) <= QUARTER_PI) smallSincosAt(a, i);
  else largeSincosAt(a, i);
}

/** The kernels of both without a reduction: the same to the last bit. */
function smallSincosAt(a: Float64Array, i: number): void {
  const x = a[i];
  const z = x * x;
  const w = z * z;
  const half = 0.5 * z;
  const near = 1 - half;
  const even = z * (C1 + z * (C2 + z * C3)) + w * w * (C4 + z * (C5 + z * C6));
  a[i + 1] = near + (1 - near - half + z * even);
  if (x === 0) return;
  const odd = S2 + z * (S3 + z * S4) + z * w * (S5 + z * S6);
  const v = z * x;
  a[i] = x + (z * (v * odd) + v * S1);
}

function largeSincosAt(a: Float64Array, i: number): void {
  const quadrant = reduceAt(a, i);
  fromQuadrant(a, i + 1, quadrant + 1);
  if (a[i] !== 0) fromQuadrant(a, i, quadrant);
}

/** Writes sin(reduced angle + quadrant · π/2) to `a[i]`. */
function fromQuadrant(a: Float64Array, i: number, quadrant: number): void {
  if ((quadrant & 1) === 0) sineAt(a, i);
  else cosineAt(a, i);
  if ((quadrant & 2) !== 0) a[i] = -a[i];
}

function sineAt(a: Float64Array, i: number): void {
  const x = reduced[0];
  const y = reduced[1];
  const z = x * x;
  const w = z * z;
  const r = S2 + z * (S3 + z * S4) + z * w * (S5 + z * S6);
  const v = z * x;
  a[i] = x - (z * (0.5 * y - v * r) - y - v * S1);
}

function cosineAt(a: Float64Array, i: number): void {
  const x = reduced[0];
  const z = x * x;
  const w = z * z;
  const r = z * (C1 + z * (C2 + z * C3)) + w * w * (C4 + z * (C5 + z * C6));
  const half = 0.5 * z;
  const v = 1 - half;
  a[i] = v + (1 - v - half + (z * r - x * reduced[1]));
}
