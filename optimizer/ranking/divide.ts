/**
 * Fronts of three and four objectives by divide and conquer (Jensen 2003; Fortin, Grenier, Parizeau 2013; Buzdalov, Shalyto 2014):
 * O(N log^(m−1) N) for any input, a single front too. Kernel: long on purpose.
 *
 * Rows are distinct and numbered in lexicographic order, so whoever dominates stands before the dominated and the first objective never needs a
 * look. Sets are ascending lists of row numbers in one stack of whole numbers. The other objectives are dense ranks, halved by value
 * instead of by median: no selection step, and a depth of at most log2 N in each objective.
 */

import { createBlockRanking } from './blocks.ts';

/** Ranks distinct rows that stand in lexicographic order; owns its scratch. */
export interface DivideRanking {
  /** `columns[c]` holds, for objectives 1 … m − 1, the dense rank of each of the `n` rows. Raises `ranks`, which are 0 to begin with. */
  raise(columns: readonly Int32Array[], n: number, ranks: Int32Array): void;
}

/** Up to this many rows, or pairs of rows, comparing them all is cheaper than splitting. */
const FEW_ROWS = 48;
const FEW_PAIRS = 2500;
/** Up to this many rows, sets of bits are cheaper than splitting, by the last objective looked at. */
const BLOCK_ROWS = [0, 0, 1000, 2500] as const;

/** A ranking for up to `capacity` rows of `m` objectives (3 or 4). */
export function createDivideRanking(capacity: number, m: number): DivideRanking {
  let stack = new Int32Array(capacity * 8 + 64);
  const stairValue = new Int32Array(capacity + 1);
  const stairRank = new Int32Array(capacity + 1);
  const empty = new Int32Array(0);
  let second: Int32Array = empty;
  let third: Int32Array = empty;
  let fourth: Int32Array = empty;
  let ranks: Int32Array = empty;
  const blocks = createBlockRanking(Math.min(capacity, BLOCK_ROWS[m - 1]), m);
  let columnsUpTo: readonly (readonly Int32Array[])[] = [];

  /** Ranks the rows stack[from … to) among themselves, looking at objectives 1 … c; `free` is where the stack is unused. */
  function sortSet(from: number, to: number, c: number, free: number): void {
    if (to - from <= FEW_ROWS) {
      compareWithin(from, to, c);
      return;
    }
    if (c === 1) {
      sweepWithin(from, to);
      return;
    }
    if (to - from <= BLOCK_ROWS[c] && blocks.raise(columnsUpTo[c], stack, from, to, ranks)) return;
    const column = c === 2 ? third : fourth;
    let least = column[stack[from]];
    let most = least;
    for (let i = from + 1; i < to; i++) {
      const value = column[stack[i]];
      if (value < least) least = value;
      else if (value > most) most = value;
    }
    if (least === most) {
      sortSet(from, to, c - 1, free);
      return;
    }
    const cut = (least + most) >> 1;
    const split = divide(column, from, to, cut, free);
    const end = free + to - from;
    sortSet(free, split, c, end);
    updateSet(free, split, split, end, c - 1, end);
    sortSet(split, end, c, end);
  }

  /** Copies stack[from … to) to stack[free …): first the rows with value ≤ cut, then the others. Returns where the others start. */
  function divide(column: Int32Array, from: number, to: number, cut: number, free: number): number {
    const end = free + to - from;
    if (end > stack.length) grow(end);
    const rows = stack;
    let low = free;
    for (let i = from; i < to; i++) if (column[rows[i]] <= cut) rows[low++] = rows[i];
    let high = low;
    for (let i = from; high < end; i++) if (column[rows[i]] > cut) rows[high++] = rows[i];
    return low;
  }

  function grow(needed: number): void {
    const larger = new Int32Array(Math.max(needed, 2 * stack.length));
    larger.set(stack);
    stack = larger;
  }

  /** Raises the ranks of rows H = stack[h0 … h1) that rows L = stack[l0 … l1), already ranked, dominate in objectives 1 … c. */
  function updateSet(l0: number, l1: number, h0: number, h1: number, c: number, free: number): void {
    if (l0 === l1 || h0 === h1) return;
    if ((l1 - l0) * (h1 - h0) <= FEW_PAIRS) {
      compareAcross(l0, l1, h0, h1, c);
      return;
    }
    if (c === 1) {
      sweepAcross(l0, l1, h0, h1);
      return;
    }
    const column = c === 2 ? third : fourth;
    let lowMin = column[stack[l0]];
    let lowMax = lowMin;
    for (let i = l0 + 1; i < l1; i++) {
      const value = column[stack[i]];
      if (value < lowMin) lowMin = value;
      else if (value > lowMax) lowMax = value;
    }
    let highMin = column[stack[h0]];
    let highMax = highMin;
    for (let i = h0 + 1; i < h1; i++) {
      const value = column[stack[i]];
      if (value < highMin) highMin = value;
      else if (value > highMax) highMax = value;
    }
    if (lowMax <= highMin) {
      updateSet(l0, l1, h0, h1, c - 1, free);
      return;
    }
    if (lowMin > highMax) return;
    let cut = (Math.max(lowMin, highMin) + Math.min(lowMax, highMax)) >> 1;
    // Some row must fall above the cut, or the halves would be the whole again.
    if (cut === Math.max(lowMax, highMax)) cut--;
    const lowSplit = divide(column, l0, l1, cut, free);
    const middle = free + l1 - l0;
    const highSplit = divide(column, h0, h1, cut, middle);
    const end = middle + h1 - h0;
    updateSet(free, lowSplit, middle, highSplit, c, end);
    updateSet(free, lowSplit, highSplit, end, c - 1, end);
    updateSet(lowSplit, middle, highSplit, end, c, end);
  }

  // The differences of dense ranks are or-ed: the sign tells in one well-predicted branch whether any of them is negative.

  function compareWithin(from: number, to: number, c: number): void {
    for (let i = from + 1; i < to; i++) compareOne(stack[i], from, i, c);
  }

  function compareAcross(l0: number, l1: number, h0: number, h1: number, c: number): void {
    let end = l0;
    for (let i = h0; i < h1; i++) {
      const row = stack[i];
      while (end < l1 && stack[end] < row) end++;
      compareOne(row, l0, end, c);
    }
  }

  function compareOne(row: number, from: number, to: number, c: number): void {
    const x = second[row];
    let rank = ranks[row];
    if (c === 1) {
      for (let j = from; j < to; j++) {
        const other = stack[j];
        if (((x - second[other]) | (ranks[other] - rank)) >= 0) rank = ranks[other] + 1;
      }
    } else if (c === 2) {
      const y = third[row];
      for (let j = from; j < to; j++) {
        const other = stack[j];
        if (((x - second[other]) | (y - third[other]) | (ranks[other] - rank)) >= 0) rank = ranks[other] + 1;
      }
    } else {
      const y = third[row];
      const z = fourth[row];
      for (let j = from; j < to; j++) {
        const other = stack[j];
        const sign = (x - second[other]) | (y - third[other]) | (z - fourth[other]) | (ranks[other] - rank);
        if (sign >= 0) rank = ranks[other] + 1;
      }
    }
    ranks[row] = rank;
  }

  function sweepWithin(from: number, to: number): void {
    let stairs = 0;
    for (let i = from; i < to; i++) {
      const row = stack[i];
      const value = second[row];
      const at = stairBelow(value, stairs);
      if (at >= 0 && stairRank[at] >= ranks[row]) ranks[row] = stairRank[at] + 1;
      stairs = addStair(value, ranks[row], at, stairs);
    }
  }

  function sweepAcross(l0: number, l1: number, h0: number, h1: number): void {
    let stairs = 0;
    let l = l0;
    for (let i = h0; i < h1; i++) {
      const row = stack[i];
      while (l < l1 && stack[l] < row) {
        const other = stack[l++];
        const value = second[other];
        stairs = addStair(value, ranks[other], stairBelow(value, stairs), stairs);
      }
      const at = stairBelow(second[row], stairs);
      if (at >= 0 && stairRank[at] >= ranks[row]) ranks[row] = stairRank[at] + 1;
    }
  }

  /** The stairs hold rising values with rising ranks. Last stair with a value of at most `value`, or −1. */
  function stairBelow(value: number, stairs: number): number {
    let low = 0;
    let high = stairs;
    while (low < high) {
      const middle = (low + high) >> 1;
      if (stairValue[middle] <= value) low = middle + 1;
      else high = middle;
    }
    return low - 1;
  }

  /** Adds a stair after position `at` unless one at least as high lies before it, and drops those after it that are no higher. */
  function addStair(value: number, rank: number, at: number, stairs: number): number {
    if (at >= 0 && stairRank[at] >= rank) return stairs;
    const start = at >= 0 && stairValue[at] === value ? at : at + 1;
    let end = start;
    while (end < stairs && stairRank[end] <= rank) end++;
    if (end === start) {
      for (let k = stairs; k > start; k--) {
        stairValue[k] = stairValue[k - 1];
        stairRank[k] = stairRank[k - 1];
      }
      stairs++;
    } else if (end > start + 1) {
      const gone = end - start - 1;
      for (let k = end; k < stairs; k++) {
        stairValue[k - gone] = stairValue[k];
        stairRank[k - gone] = stairRank[k];
      }
      stairs -= gone;
    }
    stairValue[start] = value;
    stairRank[start] = rank;
    return stairs;
  }

  return {
    raise(columns, n, into) {
      second = columns[1];
      third = columns[2];
      fourth = m > 3 ? columns[3] : empty;
      columnsUpTo = [[], [], columns.slice(0, 3), columns];
      ranks = into;
      for (let i = 0; i < n; i++) stack[i] = i;
      sortSet(0, n, m - 1, n);
    },
  };
}
