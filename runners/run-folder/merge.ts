/**
 * Joining what several runs found: one after the other, so memory is bounded by the front and not by their number. Archives
 * depend on the set of designs shown to them and not on its order, so any order, and any repetition, gives the same bytes.
 */
import { createMerger } from '../../optimizer/index.ts';
import type { Problem } from '../../optimizer/problem.ts';
import type { Found } from './found.ts';
import { createSourceList } from './sources.ts';

/** Takes in findings one at a time. */
export interface Joiner {
  /** Returns whether the findings held a ring of islands that was not known, or not as far on. */
  add(found: Found): boolean;
  /** All that was added, joined. */
  joined(): Omit<Found, 'railHash' | 'partsHash'>;
}

/** A joiner for findings of that problem. */
export function createJoiner(problem: Problem): Joiner {
  const merger = createMerger(problem);
  const sources = createSourceList();
  return {
    add(found): boolean {
      merger.add(found);
      return found.sources.map((source) => sources.add(source)).includes(true);
    },
    joined: () => ({
      sources: sources.list(),
      archive: merger.archive(),
      nearMisses: merger.nearMisses(),
      sample: merger.sample(),
    }),
  };
}
