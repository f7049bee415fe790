/** Non-dominated sorting read off its definition: peel the rows that nobody left dominates, again and again. O(m N² · fronts). */

/** Whether row a dominates row b: nowhere worse, somewhere better. */
export function dominates(objectives: ArrayLike<number>, m: number, a: number, b: number): boolean {
  let better = false;
  for (let c = 0; c < m; c++) {
    if (objectives[a * m + c] > objectives[b * m + c]) return false;
    if (objectives[a * m + c] < objectives[b * m + c]) better = true;
  }
  return better;
}

/** Front of each row. */
export function plainFronts(objectives: ArrayLike<number>, m: number, n: number): number[] {
  const front = new Array<number>(n).fill(-1);
  let left = Array.from({ length: n }, (_, i) => i);
  for (let level = 0; left.length > 0; level++) {
    const free = left.filter((i) => !left.some((j) => dominates(objectives, m, j, i)));
    for (const i of free) front[i] = level;
    left = left.filter((i) => front[i] < 0);
  }
  return front;
}
