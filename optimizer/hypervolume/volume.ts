/** Hypervolume: how much of the objective space below the reference a set of designs dominates. */
import { createRowOrder } from '../ranking/order.ts';
import { gatherInside } from './inside.ts';
import { PositionSet } from './positions.ts';
import { Solids } from './solids.ts';

/** Measures hypervolumes; owns its scratch. */
export interface Hypervolume {
  readonly capacity: number;
  readonly m: number;
  /**
   * Hypervolume of the first `count` rows named in `rows`, all objectives minimised, against `reference` (m values), in the product of
   * the objectives' units. Rows that do not beat the reference in every objective are ignored; dominated and equal rows add nothing.
   * NaN when a value or the reference is not finite.
   *
   * Two and three objectives O(N log N): a sweep, in three over a staircase (Fonseca, Paquete, López-Ibáñez 2006; Beume et al. 2009). Four
   * O(N²) for the fronts met in practice: each row in turn adds its slab (the scheme of Guerreiro, Fonseca 2018).
   */
  volume(objectives: Float64Array, rows: Int32Array, count: number, reference: Float64Array): number;
}

/** A hypervolume measure for up to `capacity` rows of `m` objectives (2 to 4). */
export function createHypervolume(capacity: number, m: number): Hypervolume {
  const points = new Float64Array(capacity * m + m);
  const from = new Int32Array(capacity + 1);
  const sweep = m === 2 ? createPlaneSweep(capacity) : m === 3 ? createSpaceSweep(capacity) : createSlabSweep(capacity);
  return {
    capacity,
    m,
    volume(objectives, rows, count, reference) {
      const inside = gatherInside(objectives, rows, count, reference, m, points, from);
      return inside < 0 ? Number.NaN : sweep(points, inside, reference);
    },
  };
}

/** Volume of `n` points, all inside the reference. */
type Sweep = (points: Float64Array, n: number, reference: Float64Array) => number;

function createPlaneSweep(capacity: number): Sweep {
  const order = createRowOrder(capacity);
  const sorted = new Int32Array(capacity);
  return (points, n, reference) => {
    order.sort(points, 2, 0, n, sorted);
    let top = reference[1];
    let total = 0;
    for (let k = 0; k < n; k++) {
      const at = 2 * sorted[k];
      if (points[at + 1] >= top) continue;
      total += (reference[0] - points[at]) * (top - points[at + 1]);
      top = points[at + 1];
    }
    return total;
  };
}

/** Rising z; the staircase in x and y, by position in x order, between two guards. */
function createSpaceSweep(capacity: number): Sweep {
  const order = createRowOrder(capacity);
  const sorted = new Int32Array(capacity);
  const positionOf = new Int32Array(capacity);
  const x = new Float64Array(capacity + 2);
  const y = new Float64Array(capacity + 2);
  const stairs = new PositionSet(capacity + 2);
  return (points, n, reference) => {
    order.sort(points, 3, 0, n, sorted);
    for (let k = 0; k < n; k++) {
      const point = sorted[k];
      positionOf[point] = k + 1;
      x[k + 1] = points[3 * point];
      y[k + 1] = points[3 * point + 1];
    }
    y[0] = reference[1];
    x[n + 1] = reference[0];
    y[n + 1] = Number.NEGATIVE_INFINITY;
    stairs.reset(n + 1);
    order.sort(points, 3, 2, n, sorted);
    let area = 0;
    let level = 0;
    let total = 0;
    for (let k = 0; k < n; k++) {
      const position = positionOf[sorted[k]];
      const low = y[position];
      const before = stairs.before(position);
      let top = y[before];
      if (top <= low) continue;
      const z = points[3 * sorted[k] + 2];
      total += area * (z - level);
      level = z;
      let left = x[position];
      let next = stairs.next[before];
      while (y[next] >= low) {
        area += (x[next] - left) * (top - low);
        left = x[next];
        top = y[next];
        stairs.remove(next);
        next = stairs.next[next];
      }
      area += (x[next] - left) * (top - low);
      stairs.insertAfter(position, before);
    }
    return total + area * (reference[2] - level);
  };
}

/** Rising w; every point adds a slab from its w to the reference over what it alone dominates in x, y and z. */
function createSlabSweep(capacity: number): Sweep {
  const order = createRowOrder(capacity);
  const sorted = new Int32Array(capacity);
  const solids = new Solids(capacity);
  const exclusive = new Float64Array(1);
  return (points, n, reference) => {
    order.sort(points, 4, 3, n, sorted);
    solids.count = 0;
    let total = 0;
    for (let k = 0; k < n; k++) {
      const at = 4 * sorted[k];
      solids.exclusive(points, at, reference, -1, exclusive);
      if (exclusive[0] === 0) continue;
      total += exclusive[0] * (reference[3] - points[at + 3]);
      solids.removeDominated(points, at);
      solids.insert(points, at, 0);
    }
    return total;
  };
}
