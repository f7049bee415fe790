/** Crowding distance, the tie-breaker inside one front (Deb, Pratap, Agarwal, Meyarivan 2002, section III-B). */

/** Measures how alone each member of a front is; owns its scratch. */
export interface Crowding {
  /**
   * Writes to `distance[i]` the crowding distance of row `rows[i]`, for the first `count` entries of `rows`: the sum over objectives of
   * the gap between its two neighbours over the front's range; Infinity at the ends of each objective with a range. An objective
   * without range adds nothing. O(m N log N).
   */
  measure(objectives: Float64Array, rows: Int32Array, count: number, distance: Float64Array): void;
}

/** A crowding measure for fronts of up to `capacity` rows of `m` objectives. */
export function createCrowding(_capacity: number, m: number): Crowding {
  return {
    measure(objectives, rows, count, distance) {
      distance.fill(0, 0, count);
      for (let c = 0; c < m; c++) {
        const order = Array.from({ length: count }, (_, i) => i).sort(
          (a, b) => objectives[rows[a] * m + c] - objectives[rows[b] * m + c] || a - b,
        );
        if (count === 0) return;
        const low = objectives[rows[order[0]] * m + c];
        const span = objectives[rows[order[count - 1]] * m + c] - low;
        if (!(span > 0)) continue;
        distance[order[0]] = Number.POSITIVE_INFINITY;
        distance[order[count - 1]] = Number.POSITIVE_INFINITY;
        for (let k = 1; k < count - 1; k++) {
          const gap = objectives[rows[order[k + 1]] * m + c] - objectives[rows[order[k - 1]] * m + c];
          distance[order[k]] += gap / span;
        }
      }
    },
  };
}
