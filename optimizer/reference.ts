/** Where the hypervolume of a front is measured from during selection. */
import { REFERENCE_MARGIN } from './settings.ts';

/** Writes to `reference` a point beyond the worst values of the first `count` rows of `front` by a part of their range, so that its ends count. */
export function referenceOf(
  objectives: Float64Array,
  front: Int32Array,
  count: number,
  m: number,
  reference: Float64Array,
): void {
  for (let c = 0; c < m; c++) {
    let low = Number.POSITIVE_INFINITY;
    let high = Number.NEGATIVE_INFINITY;
    for (let k = 0; k < count; k++) {
      const value = objectives[front[k] * m + c];
      if (value < low) low = value;
      if (value > high) high = value;
    }
    const range = high - low;
    reference[c] = high + (range > 0 ? REFERENCE_MARGIN * range : 1e-9 * Math.abs(high) + 1e-300);
  }
}
