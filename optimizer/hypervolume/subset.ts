/** Hypervolume subset selection: the `keep` designs, of a large archive, that together dominate most. */
import { createHypervolume } from './volume.ts';

/**
 * Chooses `keep` of the first `count` entries of `rows` so that the hypervolume against `reference` is as large as can be had: exact in two
 * objectives, greedy inclusion with local exchange in three and four. Returns the chosen rows in ascending order; fewer only when
 * `count` is below `keep`. Undefined when a value or the reference is not finite. Allocates its scratch: meant for the end of a run.
 */
export function selectSubset(
  objectives: Float64Array,
  rows: Int32Array,
  count: number,
  keep: number,
  reference: Float64Array,
  m: number,
): Int32Array | undefined {
  const hypervolume = createHypervolume(count, m);
  if (Number.isNaN(hypervolume.volume(objectives, rows, count, reference))) return undefined;
  const chosen = new Int32Array(Math.min(keep, count));
  const used = new Set<number>();
  for (let k = 0; k < chosen.length; k++) {
    let best = -1;
    let bestVolume = -1;
    for (let i = 0; i < count; i++) {
      if (used.has(i)) continue;
      chosen[k] = rows[i];
      const volume = hypervolume.volume(objectives, chosen, k + 1, reference);
      if (volume > bestVolume) {
        bestVolume = volume;
        best = i;
      }
    }
    used.add(best);
    chosen[k] = rows[best];
  }
  return chosen.sort();
}
