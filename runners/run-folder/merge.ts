/**
 * Joining what several runs found: one after the other, so memory is bounded by the front and not by their number. Archives
 * depend on the set of designs shown to them and not on its order, so any order, and any repetition, gives the same bytes.
 */
import {
  createArchive,
  createNearMisses,
  insertAll,
  insertAllNearMisses,
  packArchive,
  packNearMisses,
} from '../../optimizer/index.ts';
import type { Problem } from '../../optimizer/problem.ts';
import { archiveGrid, nearMissGrid } from '../sweep/grid.ts';
import type { Found, Source } from './found.ts';

/** Takes in findings one at a time. */
export interface Joiner {
  add(found: Found): void;
  /** All that was added, joined. */
  joined(): Pick<Found, 'sources' | 'archive' | 'nearMisses'>;
}

/** A joiner for findings of that problem. */
export function createJoiner(problem: Problem): Joiner {
  const archive = createArchive(archiveGrid(problem));
  const misses = createNearMisses(nearMissGrid(problem));
  const sources = new Map<string, Source>();
  return {
    add(found: Found): void {
      insertAll(archive, found.archive);
      insertAllNearMisses(misses, found.nearMisses);
      for (const source of found.sources) addSource(sources, source);
    },
    joined: () => ({
      sources: [...sources.values()].sort(bySource),
      archive: packArchive(archive),
      nearMisses: packNearMisses(misses),
    }),
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
