/**
 * Adaptive shares of the operators: probability matching (Goldberg 1990; Thierens 2005) on the credit of each operator's children
 * for entering the archive, with a floor so that none dies and a ceiling for those that only polish.
 */

/** Smallest share an operator keeps. */
const FLOOR = 0.1;
/** Weight of one generation's record when it is mixed into the memory. */
const LEARNING = 0.1;

/** Draws an operator by its share with one uniform draw u. */
export function drawOperator(shares: Float64Array, u: number): number {
  let sum = 0;
  for (let k = 0; k < shares.length - 1; k++) {
    sum += shares[k];
    if (u < sum) return k;
  }
  return shares.length - 1;
}

/**
 * Learns from a batch: `tried` children of each operator and the credit they `earned`. Updates `quality` (the remembered credit a child) and
 * `shares` in place; shares add up to 1, none above its `ceilings`.
 */
export function learn(
  shares: Float64Array,
  quality: Float64Array,
  tried: Float64Array,
  earned: Float64Array,
  ceilings: readonly number[],
): void {
  const count = shares.length;
  let total = 0;
  for (let k = 0; k < count; k++) {
    if (tried[k] > 0) quality[k] += LEARNING * (earned[k] / tried[k] - quality[k]);
    total += quality[k];
  }
  let over = 0;
  let free = 0;
  for (let k = 0; k < count; k++) {
    const fair = total > 0 ? quality[k] / total : 1 / count;
    const share = FLOOR + (1 - count * FLOOR) * fair;
    shares[k] = Math.min(share, ceilings[k]);
    over += share - shares[k];
    if (share < ceilings[k]) free++;
  }
  // What a ceiling cuts off goes to the others in equal parts.
  for (let k = 0; k < count && free > 0; k++) if (shares[k] < ceilings[k]) shares[k] += over / free;
}
