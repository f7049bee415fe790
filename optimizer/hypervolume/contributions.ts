/** Exclusive hypervolume contributions: what each design adds that no other design of the set dominates. */
import { createHypervolume } from './volume.ts';

/** Measures all contributions of a set at once; owns its scratch. */
export interface Contributions {
  readonly capacity: number;
  readonly m: number;
  /**
   * Writes to `contribution[i]` the hypervolume that only row `rows[i]` dominates, for the first `count` entries of `rows`. Rows that are
   * dominated, twice present or not better than `reference` in every objective get 0. Returns false (nothing written) when a value
   * or the reference is not finite.
   */
  measure(
    objectives: Float64Array,
    rows: Int32Array,
    count: number,
    reference: Float64Array,
    contribution: Float64Array,
  ): boolean;
}

/** A contribution measure for up to `capacity` rows of `m` objectives (2 to 4). */
export function createContributions(capacity: number, m: number): Contributions {
  const hypervolume = createHypervolume(capacity, m);
  const others = new Int32Array(capacity);
  return {
    capacity,
    m,
    measure(objectives, rows, count, reference, contribution) {
      const whole = hypervolume.volume(objectives, rows, count, reference);
      if (Number.isNaN(whole)) return false;
      for (let i = 0; i < count; i++) {
        let k = 0;
        for (let j = 0; j < count; j++) if (j !== i) others[k++] = rows[j];
        contribution[i] = Math.max(0, whole - hypervolume.volume(objectives, others, k, reference));
      }
      return true;
    },
  };
}
