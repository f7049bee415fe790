/**
 * Hyperbolic sine, cosine and tangent, the same to the last bit on every engine.
 * The algorithm and its constants are those of fdlibm (Sun Microsystems, 1993: permission to use, copy, modify and
 * distribute freely granted, provided this notice is preserved), written anew here.
 */
import { exp } from './exp.ts';
import { expm1 } from './expm1.ts';

/** Above this e^−x no longer shows beside e^x. */
const ONE_SIDED = 22;
/** ln of the largest double, where e^x itself overflows but half of it does not. */
const LAST_EXP = 709.782712893384;

/** sinh x; error under 2 ulp. */
export function sinh(x: number): number {
  const size = Math.abs(x);
  if (!(size > 3.725290298461914e-9)) return x;
  const half = x < 0 ? -0.5 : 0.5;
  if (size >= LAST_EXP) return halfOfHuge(size) * (2 * half);
  if (size >= ONE_SIDED) return half * exp(size);
  const t = expm1(size);
  return size < 1 ? half * (2 * t - (t * t) / (t + 1)) : half * (t + t / (t + 1));
}

/** cosh x; error under 2 ulp. */
export function cosh(x: number): number {
  const size = Math.abs(x);
  if (size >= LAST_EXP) return halfOfHuge(size);
  if (size >= ONE_SIDED) return 0.5 * exp(size);
  if (size < 0.34657359027997264) {
    const t = expm1(size);
    return 1 + (t * t) / (2 * (1 + t));
  }
  const t = exp(size);
  return 0.5 * t + 0.5 / t;
}

/** tanh x; error under 2 ulp. */
export function tanh(x: number): number {
  const size = Math.abs(x);
  if (!(size > 2.7755575615628914e-17)) return x;
  const sign = x < 0 ? -1 : 1;
  if (size >= ONE_SIDED) return sign;
  if (size >= 1) return sign * (1 - 2 / (expm1(2 * size) + 2));
  const t = expm1(-2 * size);
  return sign * (-t / (t + 2));
}

/** e^x / 2 where e^x overflows. */
function halfOfHuge(x: number): number {
  const root = exp(0.5 * x);
  return 0.5 * root * root;
}
