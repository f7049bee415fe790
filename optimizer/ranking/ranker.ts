/**
 * Non-dominated sorting for the search: gives every row of a population its front number, choosing the cheapest published
 * algorithm for the number of objectives and rows.
 */
import { type BitsetRanking, createBitsetRanking } from './bitsets.ts';
import { createDivideRanking } from './divide.ts';
import { allFinite } from './finite.ts';
import { createRowOrder, type RowOrder } from './order.ts';
import { rankByPatience } from './patience.ts';

/** Sorts populations into fronts; owns its scratch, so one ranker serves one caller at a time. */
export interface Ranker {
  /** Most rows one call may hold. */
  readonly capacity: number;
  /** Number of objectives, 2 to 4. */
  readonly m: number;
  /**
   * Writes the front of each of the first `n` rows of `objectives` (row-major, all minimised) to `ranks`: 0 for rows that no
   * other dominates; equal rows share a front. Returns the number of fronts, or −1 (and ranks untouched) when a value is not finite.
   *
   * Two objectives: O(N log N), Jensen's sweep. Three and four: O(m N²/32) by sets of bits while that is cheapest, above it O(N log^(m−1) N)
   * by divide and conquer.
   */
  rank(objectives: Float64Array, n: number, ranks: Int32Array): number;
}

/** Most distinct rows ranked by sets of bits, by number of objectives; where the two ways cost the same (bench). */
const BITSET_ROWS = [0, 0, 0, 1500, 4000] as const;

/** A ranker for up to `capacity` rows of `m` objectives (2 to 4). */
export function createRanker(capacity: number, m: number): Ranker {
  const order = createRowOrder(capacity);
  const sorted = new Int32Array(capacity);
  return m === 2 ? createPlaneRanker(capacity, order, sorted) : createSpaceRanker(capacity, m, order, sorted);
}

function createPlaneRanker(capacity: number, order: RowOrder, sorted: Int32Array): Ranker {
  const tails = new Float64Array(capacity);
  return {
    capacity,
    m: 2,
    rank(objectives, n, ranks) {
      if (!allFinite(objectives, 2 * n)) return -1;
      order.sort(objectives, 2, 0, n, sorted);
      return rankByPatience(objectives, sorted, n, tails, ranks);
    },
  };
}

function createSpaceRanker(capacity: number, m: number, order: RowOrder, sorted: Int32Array): Ranker {
  const distinctOf = new Int32Array(capacity);
  const columns = Array.from({ length: m }, () => new Int32Array(capacity));
  const columnOrders = Array.from({ length: m }, () => new Int32Array(capacity));
  const distinctRanks = new Int32Array(capacity);
  const divide = createDivideRanking(capacity, m);
  const few = Math.min(capacity, BITSET_ROWS[m]);
  let bitsets: BitsetRanking | undefined;
  return {
    capacity,
    m,
    rank(objectives, n, ranks) {
      if (!allFinite(objectives, m * n)) return -1;
      order.sort(objectives, m, 0, n, sorted);
      const distinct = numberDistinct(objectives, m, n, sorted, distinctOf);
      for (let c = 1; c < m; c++) {
        order.sort(objectives, m, c, n, sorted);
        numberColumn(objectives, m, c, n, sorted, distinctOf, columns[c], columnOrders[c]);
      }
      distinctRanks.fill(0, 0, distinct);
      if (distinct <= few) {
        bitsets ??= createBitsetRanking(few, 0);
        bitsets.raise(columns, columnOrders, distinct, distinctRanks);
      } else divide.raise(columns, distinct, distinctRanks);
      let last = -1;
      for (let i = 0; i < n; i++) {
        ranks[i] = distinctRanks[distinctOf[i]];
        if (ranks[i] > last) last = ranks[i];
      }
      return last + 1;
    },
  };
}

/** Numbers the distinct rows in lexicographic order; `distinctOf` tells each row its number. Returns how many there are. */
function numberDistinct(
  objectives: Float64Array,
  m: number,
  n: number,
  sorted: Int32Array,
  distinctOf: Int32Array,
): number {
  let count = 0;
  for (let k = 0; k < n; k++) {
    const row = sorted[k];
    let c = 0;
    if (k > 0) {
      const before = sorted[k - 1];
      while (c < m && objectives[row * m + c] === objectives[before * m + c]) c++;
    }
    if (c < m) count++;
    distinctOf[row] = count - 1;
  }
  return count;
}

/** Writes one objective of the distinct rows as dense ranks, and the distinct rows in ascending order of it. */
function numberColumn(
  objectives: Float64Array,
  m: number,
  c: number,
  n: number,
  sorted: Int32Array,
  distinctOf: Int32Array,
  column: Int32Array,
  columnOrder: Int32Array,
): void {
  let dense = 0;
  let count = 0;
  let before = -1;
  for (let k = 0; k < n; k++) {
    const row = sorted[k];
    const distinct = distinctOf[row];
    // Equal rows are neighbours in every column's order, as ties go by all the other columns.
    if (distinct === before) continue;
    if (k > 0 && objectives[row * m + c] !== objectives[sorted[k - 1] * m + c]) dense++;
    column[distinct] = dense;
    columnOrder[count++] = distinct;
    before = distinct;
  }
}
