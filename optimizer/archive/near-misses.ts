/**
 * The archive of near misses: designs that break exactly one limit by a little. They tell what a requirement costs. It holds, for each
 * limit, band of violation and fixed direction of compromise, the one best design shown to it, so archives merge in any order to the same bytes.
 */
import type { Designs, NearMissDesigns, Widths } from './designs.ts';
import { DirectionSlots } from './direction-slots.ts';
import { gatherRows, rowIsFinite } from './rows.ts';

/** What fixes an archive of near misses. It comes from the problem, never from values found. */
export interface NearMissGrid extends Widths {
  /** Scale of the objectives: `ideal` counts as 0, `reference` as 1. One value an objective each. */
  readonly ideal: Float64Array;
  readonly reference: Float64Array;
  /** Largest violation, as a fraction of the limit, that still counts as near: 0.5 keeps what misses by half. */
  readonly share: number;
}

/** Best designs that break exactly one limit. At most limits × 3 bands × directions (15 for 2 and 3 objectives, 20 for 4). */
export interface NearMisses {
  readonly grid: NearMissGrid;
  /**
   * Shows row `row` to the archive. Returns 1 when the archive changed, 0 when not: feasible, more than one limit broken, broken by more than
   * `share`, not finite, or no better than what is held. Copies what it keeps.
   */
  insert(genes: Float64Array, objectives: Float64Array, violations: Float64Array, row: number): number;
  /** Forgets all. */
  clear(): void;
  /** All near misses held, each design once, in canonical order: by limit, then objectives, violations and genes. */
  pack(): NearMissDesigns;
}

/** Bands of violation, as parts of `share`; each band holds the best designs that miss by at most that much. */
const BANDS = [0.1, 0.4, 1] as const;
/** Steps along an edge of the lattice of directions, by number of objectives: 15 directions for 2 and 3, 20 for 4. */
const LATTICE = [0, 0, 14, 4, 3] as const;

/** An empty archive of near misses. */
export function createNearMisses(grid: NearMissGrid): NearMisses {
  const directions = latticeDirections(grid.objectives, LATTICE[grid.objectives]);
  const perLimit = BANDS.length * directions.length;
  const slots = new DirectionSlots(grid, grid.violations * perLimit);
  return {
    grid,
    insert(genes, objectives, violations, row) {
      if (!rowIsFinite(objectives, row, grid.objectives) || !rowIsFinite(genes, row, grid.genes)) return 0;
      const limit = brokenLimit(grid, violations, row);
      if (limit < 0) return 0;
      const part = violations[row * grid.violations + limit] / grid.share;
      let changed = 0;
      for (let d = 0; d < directions.length; d++) {
        slots.merit[0] = meritAlong(grid, directions[d], objectives, row);
        for (let band = 0; band < BANDS.length; band++) {
          if (part > BANDS[band]) continue;
          changed |= slots.offer(limit * perLimit + d * BANDS.length + band, genes, objectives, violations, row);
        }
      }
      return changed;
    },
    clear: () => slots.clear(),
    pack: () => slots.pack(perLimit),
  };
}

/** All near misses held, each design once, in canonical order: by limit, then objectives, violations and genes. */
export function packNearMisses(near: NearMisses): NearMissDesigns {
  return near.pack();
}

/** The near misses that no design of `front` dominates or equals in objectives: those that show what their limit costs. */
export function selectNearMisses(near: NearMisses, front: Designs): NearMissDesigns {
  const { genes: g, objectives: m, violations: v } = near.grid;
  const all = near.pack();
  const rows = Array.from({ length: all.count }, (_, i) => i).filter(
    (i) => !weaklyDominated(all.objectives, i, front, m),
  );
  return {
    count: rows.length,
    genes: gatherRows(all.genes, rows, g),
    objectives: gatherRows(all.objectives, rows, m),
    violations: gatherRows(all.violations, rows, v),
    limit: Int32Array.from(rows, (row) => all.limit[row]),
  };
}

/** Shows every design to the archive; returns how many changed it. Merging is `insertAllNearMisses(into, packNearMisses(from))`. */
export function insertAllNearMisses(near: NearMisses, designs: Designs): number {
  let changed = 0;
  for (let i = 0; i < designs.count; i++) {
    changed += near.insert(designs.genes, designs.objectives, designs.violations, i);
  }
  return changed;
}

/** Index of the one limit that the row breaks, by at most `share`; −1 when there is no such one. */
function brokenLimit(grid: NearMissGrid, violations: Float64Array, row: number): number {
  let limit = -1;
  for (let k = 0; k < grid.violations; k++) {
    const violation = violations[row * grid.violations + k];
    if (violation <= 0) continue;
    if (limit >= 0 || !(violation <= grid.share)) return -1;
    limit = k;
  }
  return limit;
}

/** Weights of the simplex lattice (Das, Dennis 1998) with `steps` steps an edge, kept off zero so that no objective is forgotten. */
function latticeDirections(m: number, steps: number): Float64Array[] {
  const found: Float64Array[] = [];
  const walk = (left: number, parts: number[]): void => {
    if (parts.length === m - 1) found.push(Float64Array.from([...parts, left], (part) => part / steps + 0.01));
    else for (let part = 0; part <= left; part++) walk(left - part, [...parts, part]);
  };
  walk(steps, []);
  return found;
}

/** Augmented weighted Chebyshev value (Steuer, Choo 1983) of a row: the smaller, the better along that direction. */
function meritAlong(grid: NearMissGrid, weights: Float64Array, objectives: Float64Array, row: number): number {
  let worst = Number.NEGATIVE_INFINITY;
  let sum = 0;
  for (let c = 0; c < weights.length; c++) {
    const scaled = (objectives[row * weights.length + c] - grid.ideal[c]) / (grid.reference[c] - grid.ideal[c]);
    worst = Math.max(worst, weights[c] * scaled);
    sum += scaled;
  }
  return worst + 0.001 * sum;
}

function weaklyDominated(objectives: Float64Array, row: number, front: Designs, m: number): boolean {
  for (let i = 0; i < front.count; i++) {
    let c = 0;
    while (c < m && front.objectives[i * m + c] <= objectives[row * m + c]) c++;
    if (c === m) return true;
  }
  return false;
}
