/** What every hypervolume kernel does first: refuse values that are not finite and set aside the rows that do not beat the reference. */
import { allFinite } from '../ranking/finite.ts';

/**
 * Copies the rows better than `reference` in all `m` objectives to `points`, close together, and notes in `from` which entry of `rows` each was.
 * Returns how many, or −1 when a value of a named row or of the reference is not finite.
 */
export function gatherInside(
  objectives: Float64Array,
  rows: Int32Array,
  count: number,
  reference: Float64Array,
  m: number,
  points: Float64Array,
  from: Int32Array,
): number {
  if (!allFinite(reference, m)) return -1;
  let inside = 0;
  for (let i = 0; i < count; i++) {
    const row = rows[i] * m;
    const at = inside * m;
    let better = true;
    for (let c = 0; c < m; c++) {
      const value = objectives[row + c];
      if (value - value !== 0) return -1;
      if (!(value < reference[c])) better = false;
      points[at + c] = value;
    }
    if (better) from[inside++] = i;
  }
  return inside;
}
