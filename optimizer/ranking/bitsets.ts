/**
 * Fronts of three and four objectives by sets of bits (after Moreno, Rodriguez, Nebro, Lozano 2021, "Merge nondominated sorting algorithm for
 * many-objective optimization", IEEE Trans. Cybern. 51(12)): the fastest way for up to a thousand or two distinct rows, as 32 comparisons
 * cost one machine operation. O(m N² / 32). Kernel: long on purpose.
 */

/** Ranks distinct rows that stand in lexicographic order; owns its scratch. */
export interface BitsetRanking {
  /**
   * `columns[c]` holds, for objectives 1 … m − 1 (counting from 0), the dense rank of each of the `n` rows, `sorted[c]` the rows in ascending order of it.
   * Writes `ranks`, returns the number of fronts.
   */
  rank(columns: readonly Int32Array[], sorted: readonly Int32Array[], n: number, ranks: Int32Array): number;
}

/** A ranking for up to `capacity` rows; holds capacity² / 32 words twice. */
export function createBitsetRanking(capacity: number): BitsetRanking {
  const width = (capacity + 31) >> 5;
  /** Row i: the rows that are no worse than i in the objectives handled so far, among rows before i. */
  const dominators = new Int32Array(capacity * width);
  /** Row f: the members of front f. */
  const fronts = new Int32Array(capacity * width);
  const seen = new Int32Array(width);
  return {
    rank(columns, sorted, n, ranks) {
      const words = (n + 31) >> 5;
      for (let c = 1; c < columns.length; c++) {
        intersect(columns[c], sorted[c], n, words, seen, dominators, c === 1);
      }
      return assign(dominators, fronts, n, words, ranks);
    },
  };
}

/** Cuts every row's dominators down to those no worse in one objective, walking the rows from best to worst in it. */
function intersect(
  column: Int32Array,
  sorted: Int32Array,
  n: number,
  words: number,
  seen: Int32Array,
  dominators: Int32Array,
  first: boolean,
): void {
  seen.fill(0, 0, words);
  for (let from = 0; from < n; ) {
    const value = column[sorted[from]];
    let to = from;
    while (to < n && column[sorted[to]] === value) {
      const row = sorted[to++];
      seen[row >> 5] |= 1 << (row & 31);
    }
    for (; from < to; from++) {
      const row = sorted[from];
      const last = row >> 5;
      const at = row * words;
      if (first) for (let w = 0; w <= last; w++) dominators[at + w] = seen[w];
      else for (let w = 0; w <= last; w++) dominators[at + w] &= seen[w];
    }
  }
}

/** Puts each row, in order, into the first front that holds none of its dominators: all fronts before it hold one, so bisection finds it. */
function assign(dominators: Int32Array, fronts: Int32Array, n: number, words: number, ranks: Int32Array): number {
  let count = 0;
  for (let row = 0; row < n; row++) {
    const last = row >> 5;
    const at = row * words;
    dominators[at + last] &= (1 << (row & 31)) - 1;
    let low = 0;
    let high = count;
    while (low < high) {
      const middle = (low + high) >> 1;
      const front = middle * words;
      let w = last;
      while (w >= 0 && (dominators[at + w] & fronts[front + w]) === 0) w--;
      if (w >= 0) low = middle + 1;
      else high = middle;
    }
    if (low === count) {
      fronts.fill(0, count * words, count * words + words);
      count++;
    }
    fronts[low * words + last] |= 1 << (row & 31);
    ranks[row] = low;
  }
  return count;
}
