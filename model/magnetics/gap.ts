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
 * Gap, m, at which `turns` on the core give `inductance` (H): the root of lg = F(lg)·(µ0·N²·Ae/L − le/µi); 0 where even the
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
  wanted[BARE] = (MU0 * turns * turns * area) / inductance - length / permeability;
  wanted[ROOT_AREA] = Math.sqrt(area);
  wanted[HEIGHT] = windingHeight;
  gapAt(wanted);
  return wanted[0];
}

const wanted = new Float64Array(3);
/** Where `gapAt` reads: the gap that would do without fringing, m, the root of the core's area, m, and the winding's height, m. */
export const BARE = 0;
export const ROOT_AREA = 1;
export const HEIGHT = 2;
/** Most rounds of Newton's method, and the share of the gap by which the last one moved it. */
const ROUNDS = 30;
const MOVED = 1e-9;

/**
 * Puts the gap with fringing, m, in the place of that without, `given[0]`: no double crosses the call. lg − b·F(lg) is convex and below 0
 * at no gap, so that from a point where it is above 0 Newton's method falls onto its one root.
 * @source mclyman-2004, chapter 8, solved for the gap
 * @valid as `gapFor`
 */
export function gapAt(given: Float64Array): void {
  const bare = given[BARE];
  const height = given[HEIGHT];
  const most = 0.5 * height;
  const share = bare / given[ROOT_AREA];
  given[0] = 0;
  if (!(bare > 0)) return;
  let gap = most;
  for (let round = 0; round < ROUNDS; round++) {
    scratch[0] = (2 * height) / gap;
    logAt(scratch, 0);
    const over = gap - bare - share * gap * scratch[0];
    // Below the root even at the longest gap: it is cut there.
    if (!(over > 0)) break;
    const moved = over / (1 - share * (scratch[0] - 1));
    gap -= moved;
    if (moved <= MOVED * gap) break;
  }
  given[0] = gap;
}
