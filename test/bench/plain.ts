/** The plain versions that kernels are timed beside: what one writes first, on the same flat arrays. */

/**
 * Non-dominated sorting by comparing every row with every row before it in lexicographic order, O(m N²): a row lies one front behind the last front that
 * holds one of its dominators.
 */
export function sortPlainly(objectives: Float64Array, m: number, n: number, ranks: Int32Array): void {
  const order = Int32Array.from({ length: n }, (_, i) => i).sort((a, b) => {
    let c = 0;
    while (c < m - 1 && objectives[a * m + c] === objectives[b * m + c]) c++;
    return objectives[a * m + c] - objectives[b * m + c];
  });
  for (let k = 0; k < n; k++) {
    const row = order[k] * m;
    let front = 0;
    for (let j = 0; j < k; j++) {
      const other = order[j] * m;
      let c = 0;
      let better = false;
      while (c < m && objectives[other + c] <= objectives[row + c]) {
        if (objectives[other + c] < objectives[row + c]) better = true;
        c++;
      }
      if (c === m && better && ranks[order[j]] >= front) front = ranks[order[j]] + 1;
    }
    ranks[order[k]] = front;
  }
}

/**
 * Hypervolume by slicing: a sweep in the first two objectives for every level of the third and, in four, of the fourth; O(N^(m−1)). All points lie below
 * `reference` in every objective.
 */
export function volumePlainly(points: Float64Array, m: number, n: number, reference: number): number {
  const order = (c: number): Int32Array =>
    Int32Array.from({ length: n }, (_, i) => i * m).sort((a, b) => points[a + c] - points[b + c]);
  const byFirst = order(0);
  const plane = (third: number, fourth: number): number => {
    let total = 0;
    let top = reference;
    for (let k = 0; k < n; k++) {
      const at = byFirst[k];
      if (points[at + 1] >= top || (m > 2 && points[at + 2] > third) || (m > 3 && points[at + 3] > fourth)) continue;
      total += (reference - points[at]) * (top - points[at + 1]);
      top = points[at + 1];
    }
    return total;
  };
  const levels = (c: number, area: (level: number) => number): number => {
    const rising = order(c);
    let total = 0;
    for (let k = 0; k < n; k++) {
      const level = points[rising[k] + c];
      const depth = (k + 1 < n ? points[rising[k + 1] + c] : reference) - level;
      if (depth > 0) total += depth * area(level);
    }
    return total;
  };
  if (m === 2) return plane(0, 0);
  if (m === 3) return levels(2, (third) => plane(third, 0));
  return levels(3, (fourth) => levels(2, (third) => plane(third, fourth)));
}

/** An archive as a list: every design against every member, on a grid of cells. Returns the number of members. */
export function archivePlainly(objectives: Float64Array, m: number, n: number, resolution: number): number {
  let members: Float64Array[] = [];
  for (let i = 0; i < n; i++) {
    const cell = objectives.slice(i * m, i * m + m).map((value) => Math.floor(value / resolution));
    if (members.some((other) => other.every((value, c) => value <= cell[c]))) continue;
    members = members.filter((other) => !other.every((value, c) => value >= cell[c]));
    members.push(cell);
  }
  return members.length;
}
