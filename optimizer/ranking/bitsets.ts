/**
 * Fronts of three and four objectives by sets of bits (after Moreno, Rodriguez, Nebro, Lozano 2021, "Merge nondominated sorting algorithm for
 * many-objective optimization", IEEE Trans. Cybern. 51(12)): the fastest way for up to a thousand or two distinct rows, as 32 comparisons
 * cost one machine operation. O(m N² / 32). Kernel: long on purpose.
 */

/** Ranks distinct rows that stand in lexicographic order; owns its scratch. */
export interface BitsetRanking {
  /**
   * `columns[c]` holds, for objectives 1 and up (counting from 0), a whole number for each of the `n` rows that orders them as the objective
   * does; `sorted[c]` the rows in ascending order of it. Raises `ranks`: they begin at 0, or at the front that dominators outside these rows
   * already force, and spread over at most `spread`.
   */
  raise(columns: readonly Int32Array[], sorted: readonly Int32Array[], n: number, ranks: Int32Array): void;
}

/** A ranking for up to `capacity` rows whose first ranks spread over at most `spread`; holds (2 capacity + spread) · capacity / 32 words. */
export function createBitsetRanking(capacity: number, spread: number): BitsetRanking {
  const width = (capacity + 31) >> 5;
  /** Row i: the rows that are no worse than i in the objectives handled so far, among rows before i. */
  const dominators = new Int32Array(capacity * width);
  /** Row f: the members of front f, counted from the least first rank. */
  const fronts = new Int32Array((capacity + spread) * width);
  const seen = new Int32Array(width);
  return {
    raise(columns, sorted, n, ranks) {
      const words = (n + 31) >> 5;
      for (let c = 1; c < columns.length; c++) {
        intersect(columns[c], sorted[c], n, words, seen, dominators, c === 1);
      }
      assign(dominators, fronts, n, words, ranks);
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

/**
 * Puts each row, in order, into the first front from its first rank on that holds none of its dominators. All fronts before that one hold one: a
 * dominator's front is either forced from outside, then so is the row's, or by a dominator of the front before, which dominates the row too. So bisection
 * finds it.
 */
function assign(dominators: Int32Array, fronts: Int32Array, n: number, words: number, ranks: Int32Array): void {
  let base = ranks[0];
  for (let row = 1; row < n; row++) if (ranks[row] < base) base = ranks[row];
  let count = 0;
  for (let row = 0; row < n; row++) {
    const last = row >> 5;
    const at = row * words;
    dominators[at + last] &= (1 << (row & 31)) - 1;
    let low = ranks[row] - base;
    let high = count;
    while (low < high) {
      const middle = (low + high) >> 1;
      const front = middle * words;
      let w = last;
      while (w >= 0 && (dominators[at + w] & fronts[front + w]) === 0) w--;
      if (w >= 0) low = middle + 1;
      else high = middle;
    }
    if (low >= count) {
      fronts.fill(0, count * words, (low + 1) * words);
      count = low + 1;
    }
    fronts[low * words + last] |= 1 << (row & 31);
    ranks[row] = base + low;
  }
}
