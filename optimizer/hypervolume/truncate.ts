/** Environmental truncation: shrinks a front by dropping, one after the other, the design whose loss costs least hypervolume. */
import { createContributions } from './contributions.ts';

/** Drops least contributors; owns its scratch. */
export interface Truncation {
  readonly capacity: number;
  readonly m: number;
  /**
   * Removes least contributors, contributions updated after each removal, until `keep` of the first `count` entries of `rows` remain.
   * Reorders `rows` in place: the kept come first, in their old order; the removed follow, the last removed first. Among equal contributions
   * the one that stands last in `rows` goes first. Rows not better than `reference` contribute 0, so choose a reference beyond the
   * front's worst values to hold its ends. Returns `keep` (or `count` if that is smaller), or −1 (rows untouched) when a value is not finite.
   */
  truncate(objectives: Float64Array, rows: Int32Array, count: number, keep: number, reference: Float64Array): number;
  /** Position in `rows` of the least contributor, by the same rule, or −1 when `count` is 0 or a value is not finite. */
  least(objectives: Float64Array, rows: Int32Array, count: number, reference: Float64Array): number;
}

/** A truncation for up to `capacity` rows of `m` objectives (2 to 4). */
export function createTruncation(capacity: number, m: number): Truncation {
  const contributions = createContributions(capacity, m);
  const values = new Float64Array(capacity);
  function least(objectives: Float64Array, rows: Int32Array, count: number, reference: Float64Array): number {
    if (!contributions.measure(objectives, rows, count, reference, values)) return -1;
    let at = -1;
    for (let i = 0; i < count; i++) if (at < 0 || values[i] <= values[at]) at = i;
    return at;
  }
  return {
    capacity,
    m,
    least,
    truncate(objectives, rows, count, keep, reference) {
      for (let left = count; left > keep; left--) {
        const at = least(objectives, rows, left, reference);
        if (at < 0) return -1;
        const row = rows[at];
        rows.copyWithin(at, at + 1, left);
        rows[left - 1] = row;
      }
      return Math.min(keep, count);
    },
  };
}
