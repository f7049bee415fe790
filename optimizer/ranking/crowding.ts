/** Crowding distance, the tie-breaker inside one front (Deb, Pratap, Agarwal, Meyarivan 2002, section III-B). */
import { allFinite } from './finite.ts';
import { createRowOrder } from './order.ts';

/** Measures how alone each member of a front is; owns its scratch. */
export interface Crowding {
  /**
   * Writes to `distance[i]` the crowding distance of row `rows[i]`, for the first `count` entries of `rows`: the sum over objectives of
   * the gap between its two neighbours over the front's range; Infinity for one row at each end of each objective with a range. An objective
   * without range adds nothing. Returns false (nothing written) when a value is not finite. O(m N log N).
   */
  measure(objectives: Float64Array, rows: Int32Array, count: number, distance: Float64Array): boolean;
}

/** A crowding measure for fronts of up to `capacity` rows of `m` objectives. */
export function createCrowding(capacity: number, m: number): Crowding {
  const order = createRowOrder(capacity);
  const points = new Float64Array(capacity * m);
  const sorted = new Int32Array(capacity);
  return {
    measure(objectives, rows, count, distance) {
      for (let i = 0; i < count; i++) {
        for (let c = 0; c < m; c++) points[i * m + c] = objectives[rows[i] * m + c];
      }
      if (!allFinite(points, count * m)) return false;
      distance.fill(0, 0, count);
      for (let c = 0; c < m && count > 0; c++) {
        order.sort(points, m, c, count, sorted);
        addGaps(points, m, c, count, sorted, distance);
      }
      return true;
    },
  };
}

function addGaps(
  points: Float64Array,
  m: number,
  c: number,
  count: number,
  sorted: Int32Array,
  distance: Float64Array,
): void {
  const span = points[sorted[count - 1] * m + c] - points[sorted[0] * m + c];
  if (!(span > 0)) return;
  distance[sorted[0]] = Number.POSITIVE_INFINITY;
  distance[sorted[count - 1]] = Number.POSITIVE_INFINITY;
  for (let k = 1; k < count - 1; k++) {
    distance[sorted[k]] += (points[sorted[k + 1] * m + c] - points[sorted[k - 1] * m + c]) / span;
  }
}
