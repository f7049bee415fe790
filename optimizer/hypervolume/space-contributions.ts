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

  /** Measures the area of the outer point's quadrant that neither its neighbours nor its inner corners reach. */
  function remeasure(position: number): void {
    const end = outer.after(position);
    const low = y[position];
    let top = y[outer.before(position)];
    let from = x[position];
    let own = 0;
    for (let d = inner.after(position); d < end; d = inner.after(d)) {
      own += (x[d] - from) * (top - low);
      from = x[d];
      top = y[d];
    }
    area[position] = own + (x[end] - from) * (top - low);
  }

  /** A point inside some outer quadrant: inside one only, it becomes that one's inner corner; inside two it changes nothing. */
  function addInner(position: number, owner: number): void {
    const level = y[position];
    if (y[outer.before(owner)] <= level) return;
    const d = inner.before(position);
    if (d > owner && y[d] <= level) return;
    book(owner, position);
    const end = outer.after(owner);
    for (let behind = inner.after(position); behind < end && y[behind] >= level; behind = inner.after(behind)) {
      inner.remove(behind);
    }
    inner.add(position);
    remeasure(owner);
  }

  /** A point outside the outer staircase: the outer points it covers become its inner corners, all corners they had are covered twice. */
  function addOuter(position: number, before: number): void {
    const level = y[position];
    let after = outer.after(position);
    while (y[after] >= level) after = outer.after(after);
    for (let d = inner.after(position); d < after; d = inner.after(d)) inner.remove(d);
    for (let covered = outer.after(position); covered < after; covered = outer.after(covered)) {
      book(covered, position);
      outer.remove(covered);
      inner.add(covered);
    }
    outer.add(position);
    since[position] = z[position];
    remeasure(position);
    if (before > 0) {
      book(before, position);
      remeasure(before);
    }
    if (after <= loaded) {
      book(after, position);
      const end = outer.after(after);
      for (let d = inner.after(after); d < end && y[d] >= level; d = inner.after(d)) inner.remove(d);
      remeasure(after);
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
      outer.clear(loaded + 2);
      inner.clear(loaded + 2);
      outer.add(0);
      outer.add(loaded + 1);
      inner.add(0);
      inner.add(loaded + 1);
      for (let k = 0; k < loaded; k++) {
        const position = rising[k];
        volume[position] = 0;
        const before = outer.before(position);
        if (y[before] <= y[position]) addInner(position, before);
        else addOuter(position, before);
      }
      z[0] = ceiling;
      for (let position = outer.after(0); position <= loaded; position = outer.after(position)) book(position, 0);
      for (let k = 0; k < loaded; k++) contribution[pointAt[rising[k]]] = volume[rising[k]];
    },
  };
}
