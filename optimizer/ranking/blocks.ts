/** Ranks a list of rows out of a larger set by sets of bits: where divide and conquer hands over once its pieces are small. */
import { createBitsetRanking } from './bitsets.ts';

/** Bits of one digit of the counting sort; two digits number four million rows. */
const DIGIT = 11;
/** Most fronts over which the first ranks of a piece may spread. */
const SPREAD = 256;

/** Ranks pieces of a set of rows; owns its scratch. */
export interface BlockRanking {
  /**
   * Raises `ranks` of the rows rows[from … to), ascending, by comparing them among themselves in objectives 1 … columns.length − 1; the columns
   * hold whole numbers below 2²² by row. The first ranks tell what all dominators outside the piece force. Returns false, nothing done, when
   * they spread too far.
   */
  raise(columns: readonly Int32Array[], rows: Int32Array, from: number, to: number, ranks: Int32Array): boolean;
}

/** A ranking for pieces of up to `capacity` rows of `m` objectives. */
export function createBlockRanking(capacity: number, m: number): BlockRanking {
  const bitsets = createBitsetRanking(capacity, SPREAD);
  const local = Array.from({ length: m }, () => new Int32Array(capacity));
  const sorted = Array.from({ length: m }, () => new Int32Array(capacity));
  /** The columns of the first `count` objectives, by count. */
  const columnsOf = Array.from({ length: m + 1 }, (_, count) => local.slice(0, count));
  const localRanks = new Int32Array(capacity);
  const spare = new Int32Array(capacity);
  const counts = new Int32Array(1 << DIGIT);
  return {
    raise(columns, rows, from, to, ranks) {
      const n = to - from;
      let least = ranks[rows[from]];
      let most = least;
      for (let i = 0; i < n; i++) {
        const rank = ranks[rows[from + i]];
        if (rank < least) least = rank;
        else if (rank > most) most = rank;
        localRanks[i] = rank;
      }
      if (most - least > SPREAD) return false;
      for (let c = 1; c < columns.length; c++) {
        for (let i = 0; i < n; i++) {
          local[c][i] = columns[c][rows[from + i]];
          sorted[c][i] = i;
        }
        sortByDigit(local[c], 0, n, sorted[c], spare, counts);
        sortByDigit(local[c], DIGIT, n, spare, sorted[c], counts);
      }
      bitsets.raise(columnsOf[columns.length], sorted, n, localRanks);
      for (let i = 0; i < n; i++) ranks[rows[from + i]] = localRanks[i];
      return true;
    },
  };
}

/** One stable counting pass over the digit that starts at bit `shift`. */
function sortByDigit(
  values: Int32Array,
  shift: number,
  n: number,
  order: Int32Array,
  into: Int32Array,
  counts: Int32Array,
): void {
  const mask = (1 << DIGIT) - 1;
  counts.fill(0);
  for (let i = 0; i < n; i++) counts[(values[i] >> shift) & mask]++;
  let sum = 0;
  for (let digit = 0; digit <= mask; digit++) {
    const count = counts[digit];
    counts[digit] = sum;
    sum += count;
  }
  for (let k = 0; k < n; k++) {
    const i = order[k];
    into[counts[(values[i] >> shift) & mask]++] = i;
  }
}
