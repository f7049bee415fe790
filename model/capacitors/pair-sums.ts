/** What one crossed segment of a pair adds: mean squares of both currents, and the extremes of the voltage. Kernels. */
import { CURRENT, counts, FORCED, KEPT, kept, pair, STEP } from './pair-state.ts';

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

/**
 * Takes the voltages of segment `i` into the extremes, step by step with everything in local variables: the hottest loop of the
 * model. The voltage is a parabola plus a ringing e whose values in equal steps obey e″ = trace·e′ − det·e (Cayley and
 * Hamilton); a turn between steps is met by the parabola through three voltages.
 * @derivation the network of `pair`
 * @valid a crossed segment
 */
export function addExtremes(i: number): void {
  const at = KEPT * i;
  const n = counts[i];
  const { d, z, u, bulkShare, r, r1, l1, perTotal, jump: share } = pair;
  const a = kept[at + CURRENT];
  const s = kept[at + CURRENT + 1];
  const w0 = kept[at + FORCED];
  const w1 = kept[at + FORCED + 1];
  const y0 = kept[at + FORCED + 2];
  const y1 = kept[at + FORCED + 3];
  const m00 = kept[at + STEP];
  const m01 = kept[at + STEP + 1];
  const m10 = kept[at + STEP + 2];
  const m11 = kept[at + STEP + 3];
  const h = d / n;
  // Voltage at time t: p0 + p1·t + p2·t² + cz·z + cu·u.
  const p0 = pair.q * perTotal + bulkShare * w0 + r1 * (a - y0) + l1 * s - share * (w0 + r1 * a + l1 * s - r * y0);
  const p1 = a * perTotal + bulkShare * w1 + r1 * (s - y1) - share * (w1 + r1 * s - r * y1);
  const p2 = 0.5 * s * perTotal;
  const cz = bulkShare - share;
  const cu = share * r - r1;
  const trace = m00 + m11;
  const det = m00 * m11 - m01 * m10;
  let before = cz * z + cu * u;
  let ringing = cz * (m00 * z + m01 * u) + cu * (m10 * z + m11 * u);
  let v0 = p0 + before;
  let v1 = p0 + (p1 + p2 * h) * h + ringing;
  let { highest, lowest } = pair;
  if (v0 > highest) highest = v0;
  if (v0 < lowest) lowest = v0;
  if (v1 > highest) highest = v1;
  if (v1 < lowest) lowest = v1;
  for (let k = 2; k <= n; k++) {
    const next = trace * ringing - det * before;
    before = ringing;
    ringing = next;
    const t = k * h;
    const v = p0 + (p1 + p2 * t) * t + ringing;
    if (v > highest) highest = v;
    if (v < lowest) lowest = v;
    if ((v1 - v0) * (v1 - v) > 0) {
      const top = v1 + ((v0 - v) * (v0 - v)) / (8 * (2 * v1 - v0 - v));
      if (top > highest) highest = top;
      if (top < lowest) lowest = top;
    }
    v0 = v1;
    v1 = v;
  }
  pair.highest = highest;
  pair.lowest = lowest;
}
