/** The plain versions that kernels are timed beside: what one writes first, on the same flat arrays. */

/**
 * Non-dominated sorting as in Deb et al. 2002, section III-A: every pair compared to count how many dominate each row, then front by front the counts lowered.
 * O(m N²). The rows a row dominates are compared anew instead of listed: the lists would take N² / 4 numbers.
 */
export function sortPlainly(objectives: Float64Array, m: number, n: number, ranks: Int32Array): void {
  const beatenBy = new Int32Array(n);
  for (let i = 0; i < n; i++) {
    for (let j = i + 1; j < n; j++) {
      const order = compare(objectives, m, i, j);
      if (order < 0) beatenBy[j]++;
      else if (order > 0) beatenBy[i]++;
    }
  }
  ranks.fill(-1, 0, n);
  let front = Array.from(beatenBy.keys()).filter((i) => beatenBy[i] === 0);
  for (let level = 0; front.length > 0; level++) {
    const next: number[] = [];
    for (const i of front) ranks[i] = level;
    for (const i of front) {
      for (let j = 0; j < n; j++) {
        if (ranks[j] < 0 && compare(objectives, m, i, j) < 0 && --beatenBy[j] === 0) next.push(j);
      }
    }
    front = next;
  }
}

/** −1 when row i dominates row j, 1 when j dominates i, else 0. */
function compare(objectives: Float64Array, m: number, i: number, j: number): number {
  let less = false;
  let more = false;
  for (let c = 0; c < m; c++) {
    const difference = objectives[i * m + c] - objectives[j * m + c];
    if (difference < 0) less = true;
    else if (difference > 0) more = true;
  }
  return less === more ? 0 : less ? -1 : 1;
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
