/** Hypervolume subset selection in two objectives, exact, by dynamic programming along the front (Bader 2009; Kuhn et al. 2016). */

/**
 * Marks in `chosen` the `keep` points, of `n` in two objectives, that dominate most below `reference`. `order` names the front from left to right: first objective
 * strictly rising, second strictly falling, all inside the reference; `keep` at most n. O(keep · n · log n) time, keep · n whole numbers of memory.
 *
 * best[j][i], the most that j points ending at i can dominate, is the largest best[j − 1][p] + (r₁ − x_i)(y_p − y_i) over p before i; the
 * p that gives it never moves left as i moves right, so each row is filled by halving.
 */
export function chooseExactly(
  points: Float64Array,
  order: Int32Array,
  n: number,
  keep: number,
  reference: Float64Array,
  chosen: Uint8Array,
): void {
  const width = Float64Array.from({ length: n }, (_, i) => reference[0] - points[2 * order[i]]);
  const height = Float64Array.from({ length: n }, (_, i) => points[2 * order[i] + 1]);
  const from = new Int32Array(keep * n);
  let best = Float64Array.from({ length: n }, (_, i) => width[i] * (reference[1] - height[i]));
  let next = new Float64Array(n);
  for (let j = 1; j < keep; j++) {
    fillRow(best, next, width, height, from, j * n, j, n - 1, j - 1, n - 1);
    [best, next] = [next, best];
  }
  let at = keep - 1;
  for (let i = keep; i < n; i++) if (best[i] > best[at]) at = i;
  for (let j = keep - 1; j >= 0; j--) {
    chosen[order[at]] = 1;
    at = from[j * n + at];
  }
}

/** Fills next[first … last], whose best predecessors lie in low … high. */
function fillRow(
  best: Float64Array,
  next: Float64Array,
  width: Float64Array,
  height: Float64Array,
  from: Int32Array,
  row: number,
  first: number,
  last: number,
  low: number,
  high: number,
): void {
  if (first > last) return;
  const middle = (first + last) >> 1;
  const end = Math.min(middle - 1, high);
  let top = Number.NEGATIVE_INFINITY;
  let at = low;
  for (let p = low; p <= end; p++) {
    const value = best[p] + width[middle] * (height[p] - height[middle]);
    if (value > top) {
      top = value;
      at = p;
    }
  }
  next[middle] = top;
  from[row + middle] = at;
  fillRow(best, next, width, height, from, row, first, middle - 1, low, at);
  fillRow(best, next, width, height, from, row, middle + 1, last, at, high);
}
