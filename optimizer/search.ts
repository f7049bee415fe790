/** The search without threads: a plan, its islands stepped one after the other, and what came out. */
import type { Designs, NearMissDesigns } from './archive/index.ts';
import { chooseSubset, hypervolumeOf, mergeArchives, mergeNearMisses } from './front.ts';
import { type Island, startIslands } from './island.ts';
import { packIsland, unpackIsland } from './pack.ts';
import { createPlan, type PlanOptions } from './plan.ts';
import type { Problem } from './problem.ts';
import { immigrantsFor } from './ring.ts';
import { createStepper } from './step.ts';

/** What to search with. */
export interface SearchOptions extends PlanOptions {
  /** Evaluations to spend; rounded up to whole epochs. Default 25,000. */
  readonly evaluations?: number;
  /** Members wanted of the front. Default: all. */
  readonly keep?: number;
}

/** What a search found. */
export interface SearchResult {
  /** Feasible non-dominated designs. */
  readonly front: Designs;
  /** Designs that break exactly one limit by a little and beat the front. */
  readonly nearMisses: NearMissDesigns;
  /** Hypervolume of the whole front, as a part of the box between the problem's ideal and reference values. */
  readonly hypervolume: number;
  readonly evaluations: number;
  /** The islands as they ended: `step` goes on from them. */
  readonly islands: readonly Island[];
}

/** Searches a problem in the calling thread. */
export function search(problem: Problem, options: SearchOptions = {}): SearchResult {
  const plan = createPlan(problem, { ...options, evaluations: options.evaluations ?? 25_000 });
  const step = createStepper(problem);
  let islands = startIslands(problem, plan);
  for (let epoch = 0; epoch < plan.epochs; epoch++) {
    const before = islands;
    islands = before.map((island, i) => unpackIsland(packIsland(step(island, immigrantsFor(before, i)))));
  }
  const all = mergeArchives(problem, islands);
  return {
    front: options.keep === undefined ? all : chooseSubset(all, options.keep),
    nearMisses: mergeNearMisses(problem, islands, all),
    hypervolume: hypervolumeOf(problem, all),
    evaluations: islands.reduce((sum, island) => sum + island.counters.evaluations, 0),
    islands,
  };
}
