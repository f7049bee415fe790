/** Hypervolume, contributions, truncation and subset choice read off their definitions, as slowly as that takes. */

/** Hypervolume of points against a reference: slice along the last objective, recurse on each slice. O(N^m). */
export function plainVolume(points: readonly (readonly number[])[], reference: readonly number[]): number {
  const m = reference.length;
  const inside = points.filter((p) => p.every((value, c) => value < reference[c]));
  if (m === 1) return inside.reduce((most, p) => Math.max(most, reference[0] - p[0]), 0);
  const rising = [...inside].sort((a, b) => a[m - 1] - b[m - 1]);
  let total = 0;
  for (let i = 0; i < rising.length; i++) {
    const top = i + 1 < rising.length ? rising[i + 1][m - 1] : reference[m - 1];
    const depth = top - rising[i][m - 1];
    if (depth === 0) continue;
    const slice = rising.slice(0, i + 1).map((p) => p.slice(0, m - 1));
    total += depth * plainVolume(slice, reference.slice(0, m - 1));
  }
  return total;
}

/** Hypervolume of points with whole-number coordinates from 0: count the unit cells that some point dominates. */
export function countedVolume(points: readonly (readonly number[])[], reference: readonly number[]): number {
  const visit = (cell: number[]): number => {
    if (cell.length === reference.length) return points.some((p) => p.every((value, c) => value <= cell[c])) ? 1 : 0;
    let count = 0;
    for (let at = 0; at < reference[cell.length]; at++) count += visit([...cell, at]);
    return count;
  };
  return visit([]);
}

/** What each point adds that no other dominates: the whole less the whole without it. */
export function plainContributions(points: readonly (readonly number[])[], reference: readonly number[]): number[] {
  const whole = plainVolume(points, reference);
  return points.map((_, i) => whole - plainVolume(points.toSpliced(i, 1), reference));
}

/** Largest hypervolume of any `keep` points: try every subset. */
export function plainBestSubset(
  points: readonly (readonly number[])[],
  keep: number,
  reference: readonly number[],
): number {
  const pick = (from: number, taken: readonly (readonly number[])[]): number => {
    if (taken.length === keep || from === points.length) return plainVolume(taken, reference);
    return Math.max(pick(from + 1, [...taken, points[from]]), pick(from + 1, taken));
  };
  return pick(0, []);
}
