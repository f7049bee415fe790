/**
 * A few places of the population for designs that miss limits by a little and would be good if they did not (infeasibility-driven selection, Ray, Singh,
 * Isaacs, Smith 2009): the best designs lie where limits meet, and the way from one of them to the next leads through such.
 */
import { referenceOf } from './reference.ts';
import { BOLD_MISS, BOLD_SHARE } from './settings.ts';
import type { World } from './world.ts';

/** Scratch of `keepBold`. */
export interface Bold {
  /** Rows that miss limits by little, with their objectives and totals. */
  readonly candidates: Int32Array;
  readonly objectives: Float64Array;
  readonly total: Float64Array;
  readonly ranks: Int32Array;
  readonly front: Int32Array;
  readonly reference: Float64Array;
}

/** Scratch for a world. */
export function createBold(world: World): Bold {
  return {
    candidates: new Int32Array(world.capacity),
    objectives: new Float64Array(world.capacity * world.m),
    total: new Float64Array(world.capacity),
    ranks: new Int32Array(world.capacity),
    front: new Int32Array(world.capacity),
    reference: new Float64Array(world.m),
  };
}

/**
 * Marks in `kept` the bold among the first `size` entries of `rows`, at most a tenth of `keep`, takes them out of that list and returns its new
 * length. Does nothing while no row meets all limits.
 */
export function keepBold(
  world: World,
  scratch: Bold,
  rows: Int32Array,
  size: number,
  keep: number,
  kept: Uint8Array,
): number {
  const quota = Math.round(BOLD_SHARE * keep);
  if (world.limits === 0 || quota === 0) return size;
  const count = listCandidates(world, scratch, rows, size, quota);
  if (count === 0) return size;
  const { candidates, objectives, total, ranks, front, reference } = scratch;
  const fronts = world.ranker.rank(objectives, total, 0, count, ranks);
  let left = Math.min(quota, count);
  for (let f = 0; f < fronts && left > 0; f++) {
    let members = 0;
    for (let i = 0; i < count; i++) if (ranks[i] === f) front[members++] = i;
    if (members > left) {
      referenceOf(objectives, front, members, world.m, reference);
      world.truncation.truncate(objectives, front, members, left, reference);
      members = left;
    }
    for (let k = 0; k < members; k++) {
      kept[candidates[front[k]]] = 1;
      world.rank[candidates[front[k]]] = 0;
    }
    left -= members;
  }
  let rest = 0;
  for (let i = 0; i < size; i++) if (kept[rows[i]] === 0) rows[rest++] = rows[i];
  return rest;
}

/** Lists the rows that miss least, about twice the quota, with their objectives; returns their number. */
function listCandidates(world: World, scratch: Bold, rows: Int32Array, size: number, quota: number): number {
  const { m, total } = world;
  let feasible = 0;
  let near = 0;
  for (let i = 0; i < size; i++) {
    const miss = total[rows[i]];
    if (miss === 0) feasible++;
    else if (miss < BOLD_MISS) scratch.total[near++] = miss;
  }
  if (feasible === 0 || near === 0) return 0;
  const bound = scratch.total.subarray(0, near).sort()[Math.min(near - 1, 2 * quota)];
  let count = 0;
  for (let i = 0; i < size; i++) {
    const row = rows[i];
    if (total[row] === 0 || total[row] > bound) continue;
    for (let c = 0; c < m; c++) scratch.objectives[count * m + c] = world.objectives[row * m + c];
    scratch.candidates[count++] = row;
  }
  scratch.total.fill(0, 0, count);
  return count;
}
