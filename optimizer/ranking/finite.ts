/** The kernels' one check of their input: infinities and NaN are refused, as no order or volume can be had of them. */

/** Whether the first `count` values are all finite. */
export function allFinite(values: Float64Array, count: number): boolean {
  for (let i = 0; i < count; i++) {
    const value = values[i];
    if (value - value !== 0) return false;
  }
  return true;
}
