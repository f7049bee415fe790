/**
 * All exclusive contributions of two or three objectives in one sweep (after HVC3D of Guerreiro, Fonseca 2018, "Computing and updating
 * hypervolume contributions in up to four dimensions", IEEE Trans. Evol. Comput. 22(3)). Kernel: long on purpose.
 *
 * Rising in the third objective, the sweep keeps two staircases in the first two: the outer one bounds what at least one point dominates, the inner
 * corners, each inside exactly one outer point's quadrant, bound what at least two dominate. Between them lies every outer point's own area, which is
 * multiplied by the height over which it stays as it is. Points are known by position in the order of the first objective;
 * a guard stands at each end. Two objectives are three with a flat third.
 */
import { createRowOrder } from '../ranking/order.ts';
import { PositionSet } from './positions.ts';

/** Contributions of points that all lie inside the reference. */
export interface SpaceContributions {
  /**
   * Takes `n` points, row-major, `m` objectives (2 or 3), all better than `reference`, and sorts them. O(N log N).
   */
  load(points: Float64Array, n: number, m: number, reference: Float64Array): void;
  /** The `k`th point of the last load, rising in the third objective. */
  risingPoint(k: number): number;
  /** Writes the contribution of every point to contribution[point]. O(N) steps over the staircases. */
  measure(contribution: Float64Array): void;
}

/** Contributions of up to `capacity` points. */
export function createSpaceContributions(capacity: number): SpaceContributions {
  const order = createRowOrder(capacity);
  const sorted = new Int32Array(capacity);
  const pointAt = new Int32Array(capacity + 2);
  const positionOf = new Int32Array(capacity);
  const x = new Float64Array(capacity + 2);
  const y = new Float64Array(capacity + 2);
  const z = new Float64Array(capacity + 2);
  /** Positions of the points in the set, rising in z. */
  const rising = new Int32Array(capacity);
  const outer = new PositionSet(capacity + 2);
  const inner = new PositionSet(capacity + 2);
  const area = new Float64Array(capacity + 2);
  const since = new Float64Array(capacity + 2);
  const volume = new Float64Array(capacity + 2);
  let loaded = 0;
  let ceiling = 0;

  /** Books the volume that the outer point's area has swept up to level z[at]. */
  function book(position: number, at: number): void {
    volume[position] += area[position] * (z[at] - since[position]);
    since[position] = z[at];
  }

  /** Measures the area of the outer point's quadrant that neither its neighbours nor its inner corners, from `corner` on, reach. */
  function remeasure(position: number, corner: number): void {
    const end = outer.next[position];
    const low = y[position];
    let top = y[outer.previous[position]];
    let from = x[position];
    let own = 0;
    for (let d = corner; d < end; d = inner.next[d]) {
      own += (x[d] - from) * (top - low);
      from = x[d];
      top = y[d];
    }
    area[position] = own + (x[end] - from) * (top - low);
  }

  /** A point inside some outer quadrant: inside one only, it becomes that one's inner corner; inside two it changes nothing. */
  function addInner(position: number, owner: number): void {
    const level = y[position];
    if (y[outer.previous[owner]] <= level) return;
    const before = inner.before(position);
    if (before > owner && y[before] <= level) return;
    book(owner, position);
    const end = outer.next[owner];
    for (let d = inner.next[before]; d < end && y[d] >= level; d = inner.next[d]) inner.remove(d);
    inner.insertAfter(position, before);
    remeasure(owner, inner.next[before < owner ? before : inner.before(owner)]);
  }

  /** A point outside the outer staircase: the outer points it covers become its inner corners, all corners they had are covered twice. */
  function addOuter(position: number, before: number): void {
    const level = y[position];
    let after = outer.next[before];
    while (y[after] >= level) after = outer.next[after];
    const innerBefore = inner.before(position);
    for (let d = inner.next[innerBefore]; d < after; d = inner.next[d]) inner.remove(d);
    let corner = innerBefore;
    for (let covered = outer.next[before]; covered < after; covered = outer.next[covered]) {
      book(covered, position);
      outer.remove(covered);
      inner.insertAfter(covered, corner);
      corner = covered;
    }
    outer.insertAfter(position, before);
    since[position] = z[position];
    remeasure(position, inner.next[innerBefore]);
    if (before > 0) {
      book(before, position);
      remeasure(before, inner.next[innerBefore < before ? innerBefore : inner.before(before)]);
    }
    if (after <= loaded) {
      book(after, position);
      const end = outer.next[after];
      while (inner.next[corner] < end && y[inner.next[corner]] >= level) inner.remove(inner.next[corner]);
      remeasure(after, inner.next[corner]);
    }
  }

  return {
    load(points, n, m, reference) {
      loaded = n;
      order.sort(points, m, 0, n, sorted);
      for (let k = 0; k < n; k++) {
        const point = sorted[k];
        const position = k + 1;
        pointAt[position] = point;
        positionOf[point] = position;
        x[position] = points[m * point];
        y[position] = points[m * point + 1];
        z[position] = m === 2 ? 0 : points[m * point + 2];
      }
      if (m > 2) order.sort(points, m, 2, n, sorted);
      for (let k = 0; k < n; k++) rising[k] = positionOf[sorted[k]];
      y[0] = reference[1];
      x[n + 1] = reference[0];
      y[n + 1] = Number.NEGATIVE_INFINITY;
      ceiling = m === 2 ? 1 : reference[2];
    },
    risingPoint: (k) => pointAt[rising[k]],
    measure(contribution) {
      outer.reset(loaded + 1);
      inner.reset(loaded + 1);
      for (let k = 0; k < loaded; k++) {
        const position = rising[k];
        volume[position] = 0;
        const before = outer.before(position);
        if (y[before] <= y[position]) addInner(position, before);
        else addOuter(position, before);
      }
      z[0] = ceiling;
      for (let position = outer.next[0]; position <= loaded; position = outer.next[position]) book(position, 0);
      for (let k = 0; k < loaded; k++) contribution[pointAt[rising[k]]] = volume[rising[k]];
    },
  };
}
