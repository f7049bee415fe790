/** Mean squares of the two groups' currents in one segment of a bank's walk. A kernel: it speaks through one record. */
import type { Bank } from './bank.ts';
import { walkState } from './bank-state.ts';

const scratch = new Float64Array(1);

/**
 * Adds the segment's ∫i1² and ∫i2²; i1 = (R2·i − w)/(R1 + R2), i2 = i − i1.
 * @derivation the network of `bankRipple`
 * @valid as there
 */
export function squares(bank: Bank): void {
  const { a, s, sum } = walkState;
  let p = a;
  let r = s;
  let f = 0;
  if (walkState.tau > 0) {
    p = (bank.r2 * a - walkState.base) / sum;
    r = (bank.r2 * s - walkState.drift) / sum;
    f = -walkState.k / sum;
  } else if (bank.c2 > 0) {
    p = (a * bank.c1) / walkState.total;
    r = (s * bank.c1) / walkState.total;
  }
  walkState.p = p;
  walkState.r = r;
  walkState.f = f;
  scratch[0] = 0;
  addSquare();
  walkState.square1 += scratch[0];
  walkState.p = a - p;
  walkState.r = s - r;
  walkState.f = -f;
  scratch[0] = 0;
  addSquare();
  walkState.square2 += scratch[0];
}

/**
 * Adds ∫(p + r·t + f·e^(−t/τ))² dt over the segment to `scratch[0]`: closed form; by Simpson's rule where the segment is so
 * short against τ that the closed form would cancel (its error is below 1e-8 there).
 */
function addSquare(): void {
  const { p, r, f, d, e, tau } = walkState;
  const end = p + r * d;
  if (f === 0) {
    scratch[0] += (d * (p * p + p * end + end * end)) / 3;
  } else if (d < 0.05 * tau) {
    const first = p + f;
    const middle = p + 0.5 * r * d + f * Math.sqrt(e);
    const last = end + f * e;
    scratch[0] += (d * (first * first + 4 * middle * middle + last * last)) / 6;
  } else {
    const line = (d * (p * p + p * end + end * end)) / 3;
    const cross = 2 * f * tau * (p - end * e + r * tau * (1 - e));
    scratch[0] += line + cross + 0.5 * f * f * tau * (1 - e * e);
  }
}
