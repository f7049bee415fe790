/** The air gap: McLyman's fringing factor, and the gap that gives a wanted inductance. */
import { logAt } from '../../optimizer/maths/index.ts';
import { MU0 } from './copper.ts';

const scratch = new Float64Array(1);

/**
 * Fringing factor: 1 + (lg/√Ae)·ln(2·G/lg). `gap` lg m, `area` Ae m², `windingHeight` G m (length of the window along the leg).
 * 1 for no gap, and never below 1.
 * @source mclyman-2004, chapter 8 (fringing flux factor)
 * @valid gap in one leg, small against the winding height
 * @example fringingFactor(1e-3, 6.3e-5, 0.0108) = 1.3871
 */
export function fringingFactor(gap: number, area: number, windingHeight: number): number {
  if (gap <= 0) return 1;
  scratch[0] = (2 * windingHeight) / gap;
  logAt(scratch, 0);
  return Math.max(1, 1 + (gap / Math.sqrt(area)) * scratch[0]);
}

/**
 * Gap, m, at which `turns` on the core give `inductance` (H), by fixed rounds of lg = F(lg)·(µ0·N²·Ae/L − le/µi); 0 where even the
 * ungapped core gives less. `area` m², `length` m, `permeability` µi, `windingHeight` m.
 * @source mclyman-2004, chapter 8, solved for the gap
 * @valid gaps below half the winding height: longer ones are cut there
 * @example gapFor(1.575e-5, 10, 6.3e-5, 0.0384, 1600, 0.0108) = 6.0985e-4
 */
export function gapFor(
  inductance: number,
  turns: number,
  area: number,
  length: number,
  permeability: number,
  windingHeight: number,
): number {
  const bare = (MU0 * turns * turns * area) / inductance - length / permeability;
  if (!(bare > 0)) return 0;
  // lg/F(lg) rises with lg up to the winding height, so bisection between 0 and half of it finds the one root.
  let low = 0;
  let high = 0.5 * windingHeight;
  for (let round = 0; round < 50; round++) {
    const middle = 0.5 * (low + high);
    if (middle / fringingFactor(middle, area, windingHeight) < bare) low = middle;
    else high = middle;
  }
  return 0.5 * (low + high);
}
