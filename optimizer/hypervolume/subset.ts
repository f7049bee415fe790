/** Hypervolume subset selection: the `keep` designs, of a large archive, that together dominate most. */
import { createRowOrder } from '../ranking/order.ts';
import { createChosenSet } from './chosen-set.ts';
import { gatherInside } from './inside.ts';
import { chooseExactly } from './subset-exact.ts';
import { exchange } from './subset-exchange.ts';
import { chooseGreedily } from './subset-greedy.ts';

/** Single contributions that exchange may measure, by number of objectives; about half a second to a second. */
const BUDGET = [0, 0, 0, 400_000, 60_000] as const;

/**
 * Chooses `keep` of the first `count` entries of `rows` so that the hypervolume against `reference` (m values) is as large as can be had: exact
 * in two objectives (O(keep · N log N)); lazy greedy inclusion, then exchange, in three and four (100 of 5,000 in under a second). Returns the chosen rows in
 * ascending order; fewer than `keep` only when `count` is. Rows that add nothing (dominated, or not better than the reference) are chosen last,
 * in the order of `rows`. Undefined when a value or the reference is not finite. Allocates its scratch: meant for the end of a run.
 */
export function selectSubset(
  objectives: Float64Array,
  rows: Int32Array,
  count: number,
  keep: number,
  reference: Float64Array,
  m: number,
): Int32Array | undefined {
  const points = new Float64Array(count * m + m);
  const entryOf = new Int32Array(count + 1);
  const inside = gatherInside(objectives, rows, count, reference, m, points, entryOf);
  if (inside < 0) return undefined;
  const chosen = new Uint8Array(inside);
  if (m === 2) chooseInPlane(points, inside, keep, reference, chosen);
  else chooseInSpace(points.subarray(0, inside * m), m, inside, keep, reference, chosen);
  const taken = new Uint8Array(count);
  let left = Math.max(0, Math.min(keep, count));
  for (let k = 0; k < inside; k++) {
    if (chosen[k] === 0) continue;
    taken[entryOf[k]] = 1;
    left--;
  }
  for (let i = 0; i < count && left > 0; i++) {
    if (taken[i] === 1) continue;
    taken[i] = 1;
    left--;
  }
  return rows
    .slice(0, count)
    .filter((_, i) => taken[i] === 1)
    .sort();
}

function chooseInPlane(
  points: Float64Array,
  n: number,
  keep: number,
  reference: Float64Array,
  chosen: Uint8Array,
): void {
  const order = new Int32Array(n);
  createRowOrder(n).sort(points, 2, 0, n, order);
  let steps = 0;
  for (let k = 0; k < n; k++) {
    if (steps === 0 || points[2 * order[k] + 1] < points[2 * order[steps - 1] + 1]) order[steps++] = order[k];
  }
  const wanted = Math.min(keep, steps);
  if (wanted > 0) chooseExactly(points, order, steps, wanted, reference, chosen);
}

function chooseInSpace(
  points: Float64Array,
  m: number,
  n: number,
  keep: number,
  reference: Float64Array,
  chosen: Uint8Array,
): void {
  const wanted = Math.min(keep, n);
  const set = createChosenSet(points, m, wanted + 1, reference);
  chooseGreedily(set, n, wanted, chosen);
  if (wanted < n && wanted > 0) exchange(set, points, n, m, chosen, BUDGET[m]);
}
