/**
 * Fronts of two objectives by the patience sweep (Jensen 2003, "Reducing the run-time complexity of multiobjective EAs", IEEE Trans.
 * Evol. Comput. 7(5), section III): O(N log F) after the sort, F the number of fronts.
 */

/**
 * Ranks `n` rows of two objectives in lexicographic `order`; equal rows share a front. `tails` is scratch for n values. In a front the last row taken has
 * the least second objective, so a row belongs to the first front whose tail is above its own. Returns the number of fronts.
 */
export function rankByPatience(
  objectives: Float64Array,
  order: Int32Array,
  n: number,
  tails: Float64Array,
  ranks: Int32Array,
): number {
  let fronts = 0;
  let previousFirst = Number.NaN;
  let previousSecond = Number.NaN;
  let front = 0;
  for (let k = 0; k < n; k++) {
    const row = order[k];
    const first = objectives[2 * row];
    const second = objectives[2 * row + 1];
    if (first !== previousFirst || second !== previousSecond) {
      let low = 0;
      let high = fronts;
      while (low < high) {
        const middle = (low + high) >> 1;
        if (tails[middle] <= second) low = middle + 1;
        else high = middle;
      }
      front = low;
      if (front === fronts) fronts++;
      tails[front] = second;
      previousFirst = first;
      previousSecond = second;
    }
    ranks[row] = front;
  }
  return fronts;
}
