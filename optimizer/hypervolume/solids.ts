/**
 * A list of points in three objectives ascending in the third, and the volume one more point would add to what they dominate: the step
 * that four-objective hypervolumes, truncation and subset selection are built from. Kernel: long on purpose.
 */

/** Points ascending in z; equal z in any order. */
export class Solids {
  /** Number of points. */
  count = 0;
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly z: Float64Array;
  /** Whose point each is. */
  readonly owner: Int32Array;
  /** Scratch: the staircase inside the asked point's quadrant, x rising, y falling. */
  private readonly stairX: Float64Array;
  private readonly stairY: Float64Array;
  private stairs = 0;

  constructor(capacity: number) {
    this.x = new Float64Array(capacity);
    this.y = new Float64Array(capacity);
    this.z = new Float64Array(capacity);
    this.owner = new Int32Array(capacity);
    this.stairX = new Float64Array(capacity + 1);
    this.stairY = new Float64Array(capacity + 1);
  }

  /** Adds the point points[at … at + 3) behind those of equal z. O(count). */
  insert(points: Float64Array, at: number, owner: number): void {
    const z = points[at + 2];
    let i = this.count++;
    for (; i > 0 && this.z[i - 1] > z; i--) {
      this.x[i] = this.x[i - 1];
      this.y[i] = this.y[i - 1];
      this.z[i] = this.z[i - 1];
      this.owner[i] = this.owner[i - 1];
    }
    this.x[i] = points[at];
    this.y[i] = points[at + 1];
    this.z[i] = z;
    this.owner[i] = owner;
  }

  /** Index of the point with that owner, which must be there. */
  find(owner: number): number {
    const owners = this.owner;
    let i = 0;
    while (owners[i] !== owner) i++;
    return i;
  }

  /** Removes the `index`th point. */
  removeAt(index: number): void {
    const end = this.count--;
    this.x.copyWithin(index, index + 1, end);
    this.y.copyWithin(index, index + 1, end);
    this.z.copyWithin(index, index + 1, end);
    this.owner.copyWithin(index, index + 1, end);
  }

  /** Removes every point that points[at … at + 3) weakly dominates. O(count). */
  removeDominated(points: Float64Array, at: number): void {
    const { x, y, z, owner } = this;
    const px = points[at];
    const py = points[at + 1];
    const pz = points[at + 2];
    let kept = 0;
    for (let i = 0; i < this.count; i++) {
      if (x[i] >= px && y[i] >= py && z[i] >= pz) continue;
      if (kept < i) {
        x[kept] = x[i];
        y[kept] = y[i];
        z[kept] = z[i];
        owner[kept] = owner[i];
      }
      kept++;
    }
    this.count = kept;
  }

  /**
   * Writes to `volume[0]` what the point points[at … at + 3) dominates alone, below `reference`, if the `skip`th point of the list (−1: none)
   * were not there: a sweep upwards from the point's own z, over the staircase that the others cut into its quadrant. O(count × stairs).
   */
  exclusive(points: Float64Array, at: number, reference: Float64Array, skip: number, volume: Float64Array): void {
    const { x, y, z, stairX, stairY, count } = this;
    const px = points[at];
    const py = points[at + 1];
    const pz = points[at + 2];
    let endX = reference[0];
    let endY = reference[1];
    let first = 0;
    for (; first < count && z[first] <= pz; first++) {
      if (first === skip) continue;
      if (x[first] <= px) {
        if (y[first] <= py) {
          volume[0] = 0;
          return;
        }
        if (y[first] < endY) endY = y[first];
      } else if (y[first] <= py && x[first] < endX) endX = x[first];
    }
    this.stairs = 0;
    for (let i = 0; i < first; i++) {
      if (x[i] < endX && y[i] < endY && x[i] > px && y[i] > py && i !== skip) this.step(x[i], y[i]);
    }
    let area = areaLeft(stairX, stairY, this.stairs, px, py, endX, endY);
    let level = pz;
    let total = 0;
    for (let i = first; i < count; i++) {
      const qx = x[i];
      const qy = y[i];
      if (qx >= endX || qy >= endY || i === skip) continue;
      if (qx > px && qy > py) {
        if (!this.step(qx, qy)) continue;
        total += area * (z[i] - level);
      } else {
        total += area * (z[i] - level);
        if (qx <= px && qy <= py) {
          volume[0] = total;
          return;
        }
        if (qx <= px) endY = qy;
        else endX = qx;
        this.trim(endX, endY);
      }
      level = z[i];
      area = areaLeft(stairX, stairY, this.stairs, px, py, endX, endY);
    }
    volume[0] = total + area * (reference[2] - level);
  }

  /** Adds a corner to the staircase; false when it lies behind one already there. */
  private step(cornerX: number, cornerY: number): boolean {
    const { stairX, stairY } = this;
    const stairs = this.stairs;
    let at = stairs;
    while (at > 0 && stairX[at - 1] > cornerX) at--;
    if (at > 0 && stairY[at - 1] <= cornerY) return false;
    if (at > 0 && stairX[at - 1] === cornerX) at--;
    let end = at;
    while (end < stairs && stairY[end] >= cornerY) end++;
    const shift = end - at - 1;
    if (shift < 0) {
      for (let k = stairs; k > at; k--) {
        stairX[k] = stairX[k - 1];
        stairY[k] = stairY[k - 1];
      }
    } else if (shift > 0) {
      for (let k = end; k < stairs; k++) {
        stairX[k - shift] = stairX[k];
        stairY[k - shift] = stairY[k];
      }
    }
    this.stairs = stairs - shift;
    stairX[at] = cornerX;
    stairY[at] = cornerY;
    return true;
  }

  /** Drops the corners outside the shrunken quadrant. */
  private trim(endX: number, endY: number): void {
    const { stairX, stairY } = this;
    let end = this.stairs;
    while (end > 0 && stairX[end - 1] >= endX) end--;
    let start = 0;
    while (start < end && stairY[start] >= endY) start++;
    if (start > 0) {
      for (let k = start; k < end; k++) {
        stairX[k - start] = stairX[k];
        stairY[k - start] = stairY[k];
      }
    }
    this.stairs = end - start;
  }
}

/** Area of the box (px, py)–(endX, endY) that lies before the staircase. */
function areaLeft(
  stairX: Float64Array,
  stairY: Float64Array,
  stairs: number,
  px: number,
  py: number,
  endX: number,
  endY: number,
): number {
  let area = 0;
  let left = px;
  let top = endY;
  for (let k = 0; k < stairs; k++) {
    area += (stairX[k] - left) * (top - py);
    left = stairX[k];
    top = stairY[k];
  }
  return area + (endX - left) * (top - py);
}
