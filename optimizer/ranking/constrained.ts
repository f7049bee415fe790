/**
 * Non-dominated sorting under constraint domination (Deb, Pratap, Agarwal, Meyarivan 2002, section VI): feasible rows come first, sorted by
 * their objectives; the others follow, the smaller total violation the better.
 */
import { createRanker } from './ranker.ts';

/** Sorts populations with violations; owns its scratch. */
export interface ConstrainedRanker {
  readonly capacity: number;
  readonly m: number;
  /**
   * Writes the front of each of the first `n` rows to `ranks`. A row counts as feasible when `violation[i]` (its total, 0 or more)
   * is at most `epsilon`; feasible rows are ranked by `objectives`, the others come behind them, one front for each
   * distinct total. Returns the number of fronts, or −1 (ranks untouched) when an objective of a feasible row is not finite
   * or a violation is NaN. Objectives of infeasible rows are never read; an infinite violation comes last.
   */
  rank(objectives: Float64Array, violation: Float64Array, epsilon: number, n: number, ranks: Int32Array): number;
}

/** A constrained ranker for up to `capacity` rows of `m` objectives (2 to 4). */
export function createConstrainedRanker(capacity: number, m: number): ConstrainedRanker {
  const ranker = createRanker(capacity, m);
  const rows = new Int32Array(capacity);
  const packed = new Float64Array(capacity * m);
  const packedRanks = new Int32Array(capacity);
  const totals = new Float64Array(capacity);
  return {
    capacity,
    m,
    rank(objectives, violation, epsilon, n, ranks) {
      let feasible = 0;
      let infeasible = 0;
      for (let i = 0; i < n; i++) {
        const total = violation[i];
        if (total <= epsilon) {
          rows[feasible] = i;
          for (let c = 0; c < m; c++) packed[feasible * m + c] = objectives[i * m + c];
          feasible++;
        } else if (total > epsilon) totals[infeasible++] = total;
        else return -1;
      }
      const fronts = ranker.rank(packed, feasible, packedRanks);
      if (fronts < 0) return -1;
      for (let i = 0; i < feasible; i++) ranks[rows[i]] = packedRanks[i];
      const distinct = sortedDistinct(totals, infeasible);
      for (let i = 0; i < n; i++) {
        if (violation[i] > epsilon) ranks[i] = fronts + positionOf(totals, distinct, violation[i]);
      }
      return fronts + distinct;
    },
  };
}

function sortedDistinct(values: Float64Array, count: number): number {
  values.subarray(0, count).sort();
  let distinct = 0;
  for (let i = 0; i < count; i++) {
    if (i === 0 || values[i] !== values[i - 1]) values[distinct++] = values[i];
  }
  return distinct;
}

function positionOf(sorted: Float64Array, count: number, value: number): number {
  let low = 0;
  let high = count - 1;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (sorted[middle] < value) low = middle + 1;
    else high = middle;
  }
  return low;
}
