/** Steps on rows of flat arrays that the archives share. */

/** Lexicographic order of row `i` of `a` against row `j` of `b`: −1, 0 or 1. */
export function compareRows(a: Float64Array, i: number, b: Float64Array, j: number, width: number): number {
  for (let k = 0; k < width; k++) {
    const x = a[i * width + k];
    const y = b[j * width + k];
    if (x !== y) return x < y ? -1 : 1;
  }
  return 0;
}

/** Copies row `i` to row `j`; adding 0 turns −0 into 0, so that equal designs have equal bytes. */
export function copyRow(from: Float64Array, i: number, to: Float64Array, j: number, width: number): void {
  for (let k = 0; k < width; k++) to[j * width + k] = from[i * width + k] + 0;
}

/** Whether all values of row `i` are finite. */
export function rowIsFinite(values: Float64Array, i: number, width: number): boolean {
  for (let k = i * width; k < (i + 1) * width; k++) {
    if (values[k] - values[k] !== 0) return false;
  }
  return true;
}

/** The named rows, one after the other in a new array. */
export function gatherRows(from: Float64Array, rows: readonly number[], width: number): Float64Array {
  const to = new Float64Array(rows.length * width);
  rows.forEach((row, i) => {
    to.set(from.subarray(row * width, row * width + width), i * width);
  });
  return to;
}
