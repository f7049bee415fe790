/**
 * The archive of near misses: designs that break exactly one limit by a little. They tell what a requirement costs. It holds, for each
 * limit, band of violation and fixed direction of compromise, the one best design shown to it, so archives merge in any order to the same bytes.
 */
import type { Designs, Widths } from './designs.ts';

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
}

/** Near misses with the limit each breaks. */
export interface NearMissDesigns extends Designs {
  /** Index of the broken limit of each design. */
  readonly limit: Int32Array;
}

/** Bands of violation, as parts of `share`; each band holds the best design that misses by at most that much. */
const BANDS = [0.1, 0.4, 1] as const;
/** Steps along an edge of the lattice of directions, by number of objectives. */
const LATTICE = [0, 0, 14, 4, 3] as const;

/** An empty archive of near misses. */
export function createNearMisses(grid: NearMissGrid): NearMisses {
  const directions = latticeDirections(grid.objectives, LATTICE[grid.objectives]);
  const slots = createSlots(grid, grid.violations * BANDS.length * directions.length);
  const near: NearMisses = {
    grid,
    insert(genes, objectives, violations, row) {
      const limit = brokenLimit(grid, objectives, violations, row);
      if (limit < 0) return 0;
      let changed = 0;
      for (let band = 0; band < BANDS.length; band++) {
        if (violations[row * grid.violations + limit] > BANDS[band] * grid.share) continue;
        for (let d = 0; d < directions.length; d++) {
          const slot = (limit * BANDS.length + band) * directions.length + d;
          const merit = meritAlong(grid, directions[d], objectives, row);
          changed |= offer(slots, slot, merit, genes, objectives, violations, row);
        }
      }
      return changed;
    },
  };
  held.set(near, slots);
  return near;
}

/** All near misses held, each design once, in canonical order: by limit, then objectives, then genes. */
export function packNearMisses(near: NearMisses): NearMissDesigns {
  return collect(near, () => true);
}

/** The near misses that no design of `front` dominates or equals in objectives: those that show what their limit costs. */
export function selectNearMisses(near: NearMisses, front: Designs): NearMissDesigns {
  const m = near.grid.objectives;
  return collect(near, (objectives, row) => !weaklyDominated(objectives, row, front, m));
}

/** Shows every design to the archive; returns how many changed it. Merging is `insertAllNearMisses(into, packNearMisses(from))`. */
export function insertAllNearMisses(near: NearMisses, designs: Designs): number {
  let changed = 0;
  for (let i = 0; i < designs.count; i++)
    changed += near.insert(designs.genes, designs.objectives, designs.violations, i);
  return changed;
}

interface Slots extends Widths {
  readonly filled: Uint8Array;
  readonly merit: Float64Array;
  readonly geneRows: Float64Array;
  readonly objectiveRows: Float64Array;
  readonly violationRows: Float64Array;
}

const held = new WeakMap<NearMisses, Slots>();

function createSlots(widths: Widths, count: number): Slots {
  return {
    genes: widths.genes,
    objectives: widths.objectives,
    violations: widths.violations,
    filled: new Uint8Array(count),
    merit: new Float64Array(count),
    geneRows: new Float64Array(count * widths.genes),
    objectiveRows: new Float64Array(count * widths.objectives),
    violationRows: new Float64Array(count * widths.violations),
  };
}

/** Index of the one limit that row breaks by at most `share`, or −1. */
function brokenLimit(grid: NearMissGrid, objectives: Float64Array, violations: Float64Array, row: number): number {
  const m = grid.objectives;
  for (let c = 0; c < m; c++) if (!Number.isFinite(objectives[row * m + c])) return -1;
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

/** Takes the row into the slot if it comes before what is there: by merit, then objectives, violations and genes. */
function offer(
  slots: Slots,
  slot: number,
  merit: number,
  genes: Float64Array,
  objectives: Float64Array,
  violations: Float64Array,
  row: number,
): number {
  if (slots.filled[slot] === 1) {
    const order =
      merit - slots.merit[slot] ||
      compareRows(objectives, row, slots.objectiveRows, slot, slots.objectives) ||
      compareRows(violations, row, slots.violationRows, slot, slots.violations) ||
      compareRows(genes, row, slots.geneRows, slot, slots.genes);
    if (!(order < 0)) return 0;
  }
  slots.filled[slot] = 1;
  slots.merit[slot] = merit;
  copyRow(genes, row, slots.geneRows, slot, slots.genes);
  copyRow(objectives, row, slots.objectiveRows, slot, slots.objectives);
  copyRow(violations, row, slots.violationRows, slot, slots.violations);
  return 1;
}

function compareRows(a: Float64Array, i: number, b: Float64Array, j: number, width: number): number {
  for (let k = 0; k < width; k++) {
    const x = a[i * width + k];
    const y = b[j * width + k];
    if (x !== y) return x < y ? -1 : 1;
  }
  return 0;
}

/** Copies a row; adding 0 turns −0 into 0, so that equal designs have equal bytes. */
function copyRow(from: Float64Array, i: number, to: Float64Array, j: number, width: number): void {
  for (let k = 0; k < width; k++) to[j * width + k] = from[i * width + k] + 0;
}

function weaklyDominated(objectives: Float64Array, row: number, front: Designs, m: number): boolean {
  for (let i = 0; i < front.count; i++) {
    let c = 0;
    while (c < m && front.objectives[i * m + c] <= objectives[row * m + c]) c++;
    if (c === m) return true;
  }
  return false;
}

function collect(near: NearMisses, wanted: (objectives: Float64Array, row: number) => boolean): NearMissDesigns {
  const slots = held.get(near);
  if (!slots)
    return {
      count: 0,
      genes: new Float64Array(0),
      objectives: new Float64Array(0),
      violations: new Float64Array(0),
      limit: new Int32Array(0),
    };
  const perLimit = slots.filled.length / Math.max(1, slots.violations);
  const chosen: number[] = [];
  for (let slot = 0; slot < slots.filled.length; slot++) {
    if (slots.filled[slot] === 1 && wanted(slots.objectiveRows, slot)) chosen.push(slot);
  }
  const limitOf = (slot: number): number => Math.floor(slot / perLimit);
  const order = (a: number, b: number): number =>
    limitOf(a) - limitOf(b) ||
    compareRows(slots.objectiveRows, a, slots.objectiveRows, b, slots.objectives) ||
    compareRows(slots.violationRows, a, slots.violationRows, b, slots.violations) ||
    compareRows(slots.geneRows, a, slots.geneRows, b, slots.genes);
  chosen.sort(order);
  const distinct = chosen.filter((slot, i) => i === 0 || order(chosen[i - 1], slot) !== 0);
  const gather = (from: Float64Array, width: number): Float64Array => {
    const to = new Float64Array(distinct.length * width);
    distinct.forEach((slot, i) => {
      to.set(from.subarray(slot * width, slot * width + width), i * width);
    });
    return to;
  };
  return {
    count: distinct.length,
    genes: gather(slots.geneRows, slots.genes),
    objectives: gather(slots.objectiveRows, slots.objectives),
    violations: gather(slots.violationRows, slots.violations),
    limit: Int32Array.from(distinct, limitOf),
  };
}
