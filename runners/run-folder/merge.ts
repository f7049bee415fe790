/**
 * Joining what several runs found: one after the other, so memory is bounded by the front and not by their number. Archives
 * depend on the set of designs shown to them and not on its order, so any order, and any repetition, gives the same bytes.
 */
import {
  type Designs,
  mergeArchives,
  mergeNearMisses,
  type NearMissDesigns,
  NO_DESIGNS,
} from '../../optimizer/index.ts';
import type { Problem } from '../../optimizer/problem.ts';
import type { Found, Source } from './found.ts';

/** Takes in findings one at a time. */
export interface Joiner {
  add(found: Found): void;
  /** All that was added, joined. */
  joined(): Pick<Found, 'sources' | 'archive' | 'nearMisses'>;
}

/** A joiner for findings of that problem. */
export function createJoiner(problem: Problem): Joiner {
  let archive: Designs = NO_DESIGNS;
  let nearMisses: NearMissDesigns = mergeNearMisses(problem, [], NO_DESIGNS);
  const sources = new Map<string, Source>();
  return {
    add(found: Found): void {
      archive = mergeArchives(problem, [archive, found.archive]);
      nearMisses = mergeNearMisses(problem, [nearMisses, found.nearMisses], NO_DESIGNS);
      for (const source of found.sources) addSource(sources, source);
    },
    joined: () => ({ sources: [...sources.values()].sort(bySource), archive, nearMisses }),
  };
}

// The same ring may come twice, once further than the other: the further one tells how much was done.
function addSource(sources: Map<string, Source>, source: Source): void {
  const key = JSON.stringify([source.seed, source.shards, source.shard]);
  const known = sources.get(key);
  if (known === undefined || known.epoch < source.epoch) sources.set(key, source);
}

function bySource(a: Source, b: Source): number {
  if (a.seed !== b.seed) return a.seed < b.seed ? -1 : 1;
  return a.shards - b.shards || a.shard - b.shard;
}
