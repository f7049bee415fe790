/**
 * Where the lowest and the highest bit of a word stand, by multiplication with a de Bruijn sequence (Leiserson, Prokop, Randall 1998). `Math.clz32`
 * is not among the few functions of `Math` that the pure rooms use.
 */

const LOWEST = table(0x077cb531, (bit) => 1 << bit);
const HIGHEST = table(0x07c4acdd, (bit) => (bit === 31 ? -1 : (2 << bit) - 1));

/** Index, 0 … 31, of the lowest bit that is set in `word`, which is not 0. */
export function lowestBit(word: number): number {
  return LOWEST[Math.imul(word & -word, 0x077cb531) >>> 27];
}

/** Index, 0 … 31, of the highest bit that is set in `word`, which is not 0. */
export function highestBit(word: number): number {
  let below = word | (word >>> 1);
  below |= below >>> 2;
  below |= below >>> 4;
  below |= below >>> 8;
  below |= below >>> 16;
  return HIGHEST[Math.imul(below, 0x07c4acdd) >>> 27];
}

/** For each of the 32 words `of(bit)`, whose products with the sequence differ in their upper five bits: the bit. */
function table(sequence: number, of: (bit: number) => number): Int32Array {
  const found = new Int32Array(32);
  for (let bit = 0; bit < 32; bit++) found[Math.imul(of(bit), sequence) >>> 27] = bit;
  return found;
}
