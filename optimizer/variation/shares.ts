/**
 * Adaptive shares of the operators: probability matching (Goldberg 1990; Thierens 2005) on the part of each operator's children that
 * entered the archive, with a floor so that none dies.
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
 * Learns from a generation: `tried` children and `entered` archive entries of each operator. Updates `quality` (the remembered
 * success rate of each) and `shares` in place; shares add up to 1.
 */
export function learn(shares: Float64Array, quality: Float64Array, tried: Float64Array, entered: Float64Array): void {
  const count = shares.length;
  let total = 0;
  for (let k = 0; k < count; k++) {
    if (tried[k] > 0) quality[k] += LEARNING * (entered[k] / tried[k] - quality[k]);
    total += quality[k];
  }
  for (let k = 0; k < count; k++) {
    const fair = total > 0 ? quality[k] / total : 1 / count;
    shares[k] = FLOOR + (1 - count * FLOOR) * fair;
  }
}
