/**
 * Joining what islands and shards found, one after the other: memory is bounded by the front, the near misses and the sample, not by how many
 * are joined. The order does not matter and twice is the same as once.
 */
import {
  createArchive,
  createNearMisses,
  createSampler,
  type DesignSample,
  type Designs,
  insertAll,
  insertAllNearMisses,
  type NearMissDesigns,
  packArchive,
  packNearMisses,
} from './archive/index.ts';
import type { Island } from './island.ts';
import type { Problem } from './problem.ts';
import { WHOLE_SAMPLE } from './settings.ts';
import { archiveGrid, nearMissGrid } from './world.ts';

/** What islands found: an island itself, or several joined. */
export type Findings = Pick<Island, 'archive' | 'nearMisses' | 'sample'>;

/** Takes in findings one at a time. */
export interface Merger {
  add(findings: Findings): void;
  /** The front of all, in canonical order. */
  archive(): Designs;
  /** All near misses; which of them beat the front is asked with `mergeNearMisses`. */
  nearMisses(): NearMissDesigns;
  /** At most 50,000 of the feasible designs evaluated, a fair sample of them. */
  sample(): DesignSample;
}

/** A merger for findings of that problem. */
export function createMerger(problem: Problem): Merger {
  const archive = createArchive(archiveGrid(problem));
  const near = createNearMisses(nearMissGrid(problem));
  const sampler = createSampler(problem.genes.length, problem.objectives.length, WHOLE_SAMPLE);
  return {
    add(findings) {
      insertAll(archive, findings.archive);
      insertAllNearMisses(near, findings.nearMisses);
      sampler.addAll(findings.sample);
    },
    archive: () => packArchive(archive),
    nearMisses: () => packNearMisses(near),
    sample: () => sampler.pack(),
  };
}
