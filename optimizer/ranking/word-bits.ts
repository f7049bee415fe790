/**
 * Where the highest bit of a word stands, by multiplication with a de Bruijn sequence (Leiserson, Prokop, Randall 1998). `Math.clz32`
 * is not among the few functions of `Math` that the pure rooms use.
 */

const SEQUENCE = 0x07c4acdd;
const HIGHEST = highestOfProducts();

/** Index, 0 … 31, of the highest bit that is set in `word`, which is not 0. */
export function highestBit(word: number): number {
  let below = word | (word >>> 1);
  below |= below >>> 2;
  below |= below >>> 4;
  below |= below >>> 8;
  below |= below >>> 16;
  return HIGHEST[Math.imul(below, SEQUENCE) >>> 27];
}

/** The words of 1, 2 … 32 ones, multiplied with the sequence, differ in their upper five bits: which tell the number of ones less one. */
function highestOfProducts(): Int32Array {
  const found = new Int32Array(32);
  for (let bit = 0; bit < 32; bit++) {
    const ones = bit === 31 ? -1 : (2 << bit) - 1;
    found[Math.imul(ones, SEQUENCE) >>> 27] = bit;
  }
  return found;
}
