/** What one crossed segment of a pair adds to the mean squares of both currents. A kernel. */
import { CURRENT, FORCED, KEPT, kept, pair } from './pair-state.ts';

/**
 * Adds ∫i1² and ∫i2² over segment `i`, both in closed form. Of the ringing part z' = −g·u, L·u' = z − R·u the ends say it all:
 * ∫u = −Δz/g, ∫t·u = (∫z − d·z)/g with ∫z = L·Δu + R·∫u, and ∫u² = −Δ(z²/g + L·u²)/(2·R), the energy that was burnt.
 * @derivation integrals of the network's equations, as above; checked against an independent integration
 * @valid a crossed segment, resistance above 0
 */
export function addSquares(i: number): void {
  const at = KEPT * i;
  const { d, z, u, zEnd, uEnd, perG, perR, r, l } = pair;
  const y0 = kept[at + FORCED + 2];
  const y1 = kept[at + FORCED + 3];
  const whole = (z - zEnd) * perG;
  const weighted = (l * (uEnd - u) + r * whole - d * zEnd) * perG;
  const square = 0.5 * perR * ((z * z - zEnd * zEnd) * perG + l * (u * u - uEnd * uEnd));
  const end = y0 + y1 * d;
  pair.square2 += square + 2 * (y0 * whole + y1 * weighted) + (d * (y0 * y0 + y0 * end + end * end)) / 3;
  const p0 = kept[at + CURRENT] - y0;
  const p1 = kept[at + CURRENT + 1] - y1;
  const last = p0 + p1 * d;
  pair.square1 += square - 2 * (p0 * whole + p1 * weighted) + (d * (p0 * p0 + p0 * last + last * last)) / 3;
}
