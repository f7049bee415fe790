/**
 * Sorting row numbers by one column, ties by the columns after it: the step every kernel starts with, so it does without comparator
 * calls. Kernel: long on purpose.
 *
 * A value is scaled to a whole number of up to 22 bits, which keeps order but may merge near values; two counting passes sort by it, and each
 * run of equal numbers is then sorted by the values themselves (by insertion if short, by merging if long). O(N) for values spread
 * evenly, O(N log N) for any.
 */

import { highestBit } from './word-bits.ts';

/** Sorts row numbers; owns its scratch. */
export interface RowOrder {
  /**
   * Writes to `order` the row numbers 0 … n − 1 of `points` (row-major, `m` columns, finite values) in ascending order of column `column`, ties by
   * the columns that follow it (cyclically), full ties by row number.
   */
  sort(points: Float64Array, m: number, column: number, n: number, order: Int32Array): void;
}

/** Below this many rows insertion alone is fastest. */
const SHORT = 24;

/** An order for up to `capacity` rows. */
export function createRowOrder(capacity: number): RowOrder {
  const codes = new Int32Array(capacity);
  const spare = new Int32Array(capacity);
  const low = new Int32Array(2048);
  const high = new Int32Array(2048);
  return {
    sort(points, m, column, n, order) {
      const half = n <= SHORT ? 0 : encode(points, m, column, n, codes);
      if (half === 0) {
        for (let i = 0; i < n; i++) order[i] = i;
        sortRun(points, m, column, order, spare, 0, n);
        return;
      }
      countingPasses(codes, n, half, low, high, spare, order);
      for (let from = 0; from < n; ) {
        const code = codes[order[from]];
        let to = from + 1;
        while (to < n && codes[order[to]] === code) to++;
        if (to - from > 1) sortRun(points, m, column, order, spare, from, to);
        from = to;
      }
    },
  };
}

/** Scales the column to codes of 2 × the returned number of bits; 0 when its range cannot be scaled. */
function encode(points: Float64Array, m: number, column: number, n: number, codes: Int32Array): number {
  let least = points[column];
  let most = least;
  for (let i = 1, at = m + column; i < n; i++, at += m) {
    const value = points[at];
    if (value < least) least = value;
    else if (value > most) most = value;
  }
  const half = Math.min(11, Math.max(5, highestBit(n) - 1));
  const scale = ((1 << (2 * half)) - 1) / (most - least);
  if (!(scale > 0 && scale < 1e300)) return 0;
  for (let i = 0, at = column; i < n; i++, at += m) codes[i] = ((points[at] - least) * scale) | 0;
  return half;
}

/** Least-significant-digit sort of 0 … n − 1 by code, two digits of `half` bits. */
function countingPasses(
  codes: Int32Array,
  n: number,
  half: number,
  low: Int32Array,
  high: Int32Array,
  spare: Int32Array,
  order: Int32Array,
): void {
  const size = 1 << half;
  const mask = size - 1;
  low.fill(0, 0, size);
  high.fill(0, 0, size);
  for (let i = 0; i < n; i++) {
    const code = codes[i];
    low[code & mask]++;
    high[code >> half]++;
  }
  let lowSum = 0;
  let highSum = 0;
  for (let digit = 0; digit < size; digit++) {
    const lowCount = low[digit];
    low[digit] = lowSum;
    lowSum += lowCount;
    const highCount = high[digit];
    high[digit] = highSum;
    highSum += highCount;
  }
  for (let i = 0; i < n; i++) spare[low[codes[i] & mask]++] = i;
  for (let k = 0; k < n; k++) {
    const i = spare[k];
    order[high[codes[i] >> half]++] = i;
  }
}

/** Sorts order[from … to) by value: insertion in runs of SHORT, then merging passes. */
function sortRun(
  points: Float64Array,
  m: number,
  column: number,
  order: Int32Array,
  spare: Int32Array,
  from: number,
  to: number,
): void {
  for (let start = from; start < to; start += SHORT) {
    const end = Math.min(start + SHORT, to);
    for (let i = start + 1; i < end; i++) {
      const row = order[i];
      let j = i - 1;
      while (j >= start && comesBefore(points, m, column, row, order[j])) {
        order[j + 1] = order[j];
        j--;
      }
      order[j + 1] = row;
    }
  }
  for (let width = SHORT; width < to - from; width *= 2) {
    for (let start = from; start + width < to; start += 2 * width) {
      merge(points, m, column, order, spare, start, start + width, Math.min(start + 2 * width, to));
    }
  }
}

/** Merges the sorted order[from … middle) and order[middle … to). */
function merge(
  points: Float64Array,
  m: number,
  column: number,
  order: Int32Array,
  spare: Int32Array,
  from: number,
  middle: number,
  to: number,
): void {
  for (let i = from; i < middle; i++) spare[i] = order[i];
  let left = from;
  let right = middle;
  let at = from;
  while (left < middle && right < to) {
    order[at++] = comesBefore(points, m, column, order[right], spare[left]) ? order[right++] : spare[left++];
  }
  while (left < middle) order[at++] = spare[left++];
}

function comesBefore(points: Float64Array, m: number, column: number, a: number, b: number): boolean {
  const rowA = a * m;
  const rowB = b * m;
  for (let k = 0, c = column; k < m; k++) {
    const x = points[rowA + c];
    const y = points[rowB + c];
    if (x !== y) return x < y;
    c = c + 1 === m ? 0 : c + 1;
  }
  return a < b;
}
