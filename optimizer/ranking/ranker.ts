/**
 * Non-dominated sorting for the search: gives every row of a population its front number, choosing the cheapest published
 * algorithm for the number of objectives and rows.
 */

/** Sorts populations into fronts; owns its scratch, so one ranker serves one caller at a time. */
export interface Ranker {
  /** Most rows one call may hold. */
  readonly capacity: number;
  /** Number of objectives, 2 to 4. */
  readonly m: number;
  /**
   * Writes the front of each of the first `n` rows of `objectives` (row-major, all minimised) to `ranks`: 0 for rows that no
   * other dominates; equal rows share a front. Returns the number of fronts, or −1 (and ranks untouched) when a value is not finite.
   */
  rank(objectives: Float64Array, n: number, ranks: Int32Array): number;
}

/** A ranker for up to `capacity` rows of `m` objectives (2 to 4). */
export function createRanker(capacity: number, m: number): Ranker {
  return {
    capacity,
    m,
    rank(objectives, n, ranks) {
      for (let i = 0; i < n * m; i++) if (!Number.isFinite(objectives[i])) return -1;
      ranks.fill(-1, 0, n);
      let front = 0;
      for (let left = n; left > 0; front++) {
        for (let i = 0; i < n; i++) {
          if (ranks[i] >= 0) continue;
          let free = true;
          for (let j = 0; j < n && free; j++) {
            if (ranks[j] !== -1 && ranks[j] !== -2 - front) continue;
            let less = false;
            let more = false;
            for (let c = 0; c < m; c++) {
              if (objectives[j * m + c] < objectives[i * m + c]) less = true;
              else if (objectives[j * m + c] > objectives[i * m + c]) more = true;
            }
            if (less && !more) free = false;
          }
          if (free) ranks[i] = -2 - front;
        }
        for (let i = 0; i < n; i++) {
          if (ranks[i] === -2 - front) {
            ranks[i] = front;
            left--;
          }
        }
      }
      return front;
    },
  };
}
