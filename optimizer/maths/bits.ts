/**
 * Bits of doubles: the shared views and the table of powers of two on which the portable functions of this folder stand.
 * Nothing here depends on the byte order of the machine.
 */

/** One double, to be looked at through `words`. */
export const double: Float64Array = new Float64Array(1);

/** The two 32-bit halves of `double[0]`. */
export const words: Int32Array = new Int32Array(double.buffer);

/** Index in `words` of the half with sign and exponent. */
export const HIGH: 0 | 1 = new Uint8Array(new Uint16Array([1]).buffer)[0] === 1 ? 1 : 0;

/** Index in `words` of the other half. */
export const LOW: 0 | 1 = HIGH === 1 ? 0 : 1;

/** Smallest exponent of two that a double can hold. */
export const LOWEST_POWER = -1074;

/** `POWERS[k − LOWEST_POWER]` is 2^k exactly, for k = −1074 … 1023. */
export const POWERS: Float64Array = powersOfTwo();

/** Factor 2^32 + 1 of Veltkamp's splitting: `c = x · SPLIT; high = c − (c − x)` keeps the upper 21 bits of x. */
export const SPLIT = 4294967297;

function powersOfTwo(): Float64Array {
  const powers = new Float64Array(1024 - LOWEST_POWER);
  let power = 1;
  for (let k = 0; k < 1024; k++, power *= 2) powers[k - LOWEST_POWER] = power;
  power = 0.5;
  for (let k = -1; k >= LOWEST_POWER; k--, power /= 2) powers[k - LOWEST_POWER] = power;
  return powers;
}
