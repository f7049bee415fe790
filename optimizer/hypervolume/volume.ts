/** Hypervolume: how much of the objective space below the reference a set of designs dominates. */

/** Measures hypervolumes; owns its scratch. */
export interface Hypervolume {
  readonly capacity: number;
  readonly m: number;
  /**
   * Hypervolume of the first `count` rows named in `rows`, all objectives minimised, against `reference` (m values), in the product of
   * the objectives' units. Rows that do not beat the reference in every objective are ignored; dominated and equal rows add nothing.
   * NaN when a value or the reference is not finite.
   */
  volume(objectives: Float64Array, rows: Int32Array, count: number, reference: Float64Array): number;
}

/** A hypervolume measure for up to `capacity` rows of `m` objectives (2 to 4). */
export function createHypervolume(capacity: number, m: number): Hypervolume {
  return {
    capacity,
    m,
    volume(objectives, rows, count, reference) {
      const points: number[][] = [];
      for (let c = 0; c < m; c++) if (!Number.isFinite(reference[c])) return Number.NaN;
      for (let i = 0; i < count; i++) {
        const row = Array.from(objectives.subarray(rows[i] * m, rows[i] * m + m));
        if (!row.every(Number.isFinite)) return Number.NaN;
        points.push(row);
      }
      return slice(points, Array.from(reference.subarray(0, m)), m);
    },
  };
}

function slice(points: number[][], reference: number[], m: number): number {
  const inside = points.filter((p) => p.every((v, c) => c >= m || v < reference[c]));
  if (m === 1) return inside.reduce((best, p) => Math.max(best, reference[0] - p[0]), 0);
  inside.sort((a, b) => a[m - 1] - b[m - 1]);
  let total = 0;
  for (let i = 0; i < inside.length; i++) {
    const next = i + 1 < inside.length ? inside[i + 1][m - 1] : reference[m - 1];
    if (next > inside[i][m - 1]) total += (next - inside[i][m - 1]) * slice(inside.slice(0, i + 1), reference, m - 1);
  }
  return total;
}
