/** Large sets of points for kernels, the same in every run. */

/** A small generator of doubles in [0, 1) (mulberry32), so that large clouds are the same in every run. */
export function generator(seed: number): () => number {
  let state = seed | 0;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
}

/** n points spread evenly in the unit cube. */
export function cube(n: number, m: number, seed: number): Float64Array {
  return Float64Array.from({ length: n * m }, generator(seed));
}

/** n points on the part of the unit sphere with no negative coordinate: none dominates another. */
export function sphere(n: number, m: number, seed: number): Float64Array {
  const points = cube(n, m, seed);
  for (let i = 0; i < n; i++) {
    const row = points.subarray(i * m, i * m + m);
    const length = Math.sqrt(row.reduce((sum, v) => sum + v * v, 0));
    for (let c = 0; c < m; c++) row[c] /= length;
  }
  return points;
}

/** Rows 0 … n − 1. */
export function allRows(n: number): Int32Array {
  return Int32Array.from({ length: n }, (_, i) => i);
}

/** Splits a flat array into rows. */
export function toRows(flat: Float64Array, m: number): number[][] {
  return Array.from({ length: flat.length / m }, (_, i) => Array.from(flat.subarray(i * m, i * m + m)));
}
