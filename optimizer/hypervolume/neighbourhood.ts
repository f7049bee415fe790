/** Who lies near whom in the objectives, each scaled by its range: where subset selection looks for exchanges. */

/** Candidates kept for each point: its nearest. */
const NEAREST = 24;
/** Most points whose nearest are remembered, which bounds the memory to 10 MB. */
const REMEMBERED = 100_000;

/** Distances among the `n` points of a set, `m` objectives each. */
export class Neighbourhood {
  /** The nearest found by the last call of `among`, nearest first, and their squared distances. */
  readonly near = new Int32Array(NEAREST);
  readonly distance = new Float64Array(NEAREST);
  private readonly points: Float64Array;
  private readonly n: number;
  private readonly m: number;
  private readonly scale: Float64Array;
  private readonly neighbours = new Map<number, Int32Array>();

  constructor(points: Float64Array, n: number, m: number) {
    this.points = points;
    this.n = n;
    this.m = m;
    this.scale = inverseRanges(points, n, m);
  }

  /** Whether the nearest of the point are at hand. */
  knows(point: number): boolean {
    return this.neighbours.has(point);
  }

  /** The points nearest to `point`, nearest first, worked out once. */
  of(point: number): Int32Array {
    const known = this.neighbours.get(point);
    if (known !== undefined) return known;
    let count = 0;
    for (let other = 0; other < this.n; other++) {
      if (other !== point) count = this.rankNear(other, this.squares(other, point), count, NEAREST);
    }
    const found = this.near.slice(0, count);
    if (this.neighbours.size < REMEMBERED) this.neighbours.set(point, found);
    return found;
  }

  /**
   * Fills `near` and `distance` with the `most` (up to 24) of the first `count` candidates that are nearest to `point`, nearest first; returns how
   * many there are.
   */
  among(candidates: Int32Array, count: number, point: number, most: number): number {
    let found = 0;
    for (let k = 0; k < count; k++) {
      found = this.rankNear(candidates[k], this.squares(candidates[k], point), found, most);
    }
    return found;
  }

  /** Squared distance in objectives scaled by their range. */
  squares(a: number, b: number): number {
    const { points, scale, m } = this;
    let sum = 0;
    for (let c = 0; c < m; c++) {
      const step = (points[a * m + c] - points[b * m + c]) * scale[c];
      sum += step * step;
    }
    return sum;
  }

  /** Takes a point into the `count` nearest known, which hold `most` at most; returns the new count. */
  private rankNear(point: number, squares: number, count: number, most: number): number {
    const { near, distance } = this;
    if (count === most && squares >= distance[count - 1]) return count;
    let at = count < most ? count : most - 1;
    for (; at > 0 && distance[at - 1] > squares; at--) {
      distance[at] = distance[at - 1];
      near[at] = near[at - 1];
    }
    distance[at] = squares;
    near[at] = point;
    return Math.min(count + 1, most);
  }
}

function inverseRanges(points: Float64Array, n: number, m: number): Float64Array {
  const scale = new Float64Array(m);
  for (let c = 0; c < m; c++) {
    let low = Number.POSITIVE_INFINITY;
    let high = Number.NEGATIVE_INFINITY;
    for (let i = 0; i < n; i++) {
      low = Math.min(low, points[i * m + c]);
      high = Math.max(high, points[i * m + c]);
    }
    scale[c] = high > low ? 1 / (high - low) : 0;
  }
  return scale;
}
