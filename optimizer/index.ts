/**
 * The search engine as a library. It searches any `Problem` (problem.ts): real, logarithmic, whole-number and choice genes, two to four
 * objectives, limits as violations.
 *
 * In one thread (test/optimizer/example.test.ts runs a whole one):
 *
 *     const problem: Problem = {
 *       name: 'can',
 *       genes: [
 *         { name: 'radius', unit: 'cm', kind: 'real', low: 1, high: 10 },
 *         { name: 'height', unit: 'cm', kind: 'log', low: 1, high: 100 },
 *       ],
 *       objectives: [
 *         { name: 'metal', unit: 'cm²', resolution: 0.1, ideal: 0, reference: 1000 },
 *         { name: 'height', unit: 'cm', resolution: 0.01, ideal: 0, reference: 100 },
 *       ],
 *       limits: ['volume'],
 *       families: ONE_FAMILY,
 *       seeds: [],
 *       snap: () => {},
 *       evaluate: ([radius, height], objectives, violations) => {
 *         objectives[0] = 2 * Math.PI * radius * (radius + height);
 *         objectives[1] = height;
 *         violations[0] = Math.max(0, 1 - (Math.PI * radius * radius * height) / 330);
 *       },
 *     };
 *     const { front } = search(problem, { evaluations: 25_000, seed: 1, keep: 100 });
 *
 * Over threads or machines, each island is plain data and an epoch a pure function, so anyone may run it:
 *
 *     const plan = createPlan(problem, { seed: 1, shard: 0, shards: 1, evaluations: 200_000 });  // plain data: store it
 *     let islands = startIslands(problem, plan);                                    // nothing evaluated yet
 *     for (let epoch = 0; epoch < plan.epochs; epoch++) {
 *       const before = islands;                                                     // all of epoch e − 1
 *       islands = before.map((island, i) => step(problem, island, immigrantsFor(before, i)));  // in any order, anywhere
 *     }
 *     const front = mergeArchives(problem, islands);                                // any order: same bytes
 *
 *     createPlan(problem: Problem, options?: PlanOptions): Plan
 *     startIslands(problem: Problem, plan: Plan): Island[]
 *     immigrantsFor(islands: readonly Island[], i: number): Designs
 *     step(problem: Problem, island: Island, immigrants?: Designs, watch?: Watch): Island
 *     createStepper(problem): (island, immigrants, watch?) => Island                 // `step` in one memory: pack the island before the next step
 *     packIsland(island, room?): Uint8Array         unpackIsland(bytes: Uint8Array): Island      (throws on damage)
 *     packDesigns(designs: Designs): Uint8Array     unpackDesigns(bytes: Uint8Array): Designs
 *     mergeArchives(problem, parts: readonly (Island | Designs)[]): Designs
 *     mergeNearMisses(problem, parts: readonly (Island | Designs)[], front: Designs): NearMissDesigns
 *     createMerger(problem): Merger                            // joins islands one by one: front, near misses, a sample of what was evaluated
 *     restart(problem, seeds, { limit, share, evaluations, seed }): Restarted        // what one limit, relaxed by a little, stands in the way of
 *     chooseSubset(front: Designs, count: number, reference?: Float64Array): Designs
 *     hypervolumeOf(problem, front: Designs): number                                 // 0 … 1
 *     createMeasure(problem): (front: Designs) => number                             // the same, for many fronts
 *     mergeRecords(islands): FamilyRecord                                            // family by family, over all islands
 *     agreementOf(problem, islands, front: Designs): number[]                        // island by island, 0 … 1
 *
 * An epoch takes `plan.epochGenerations × plan.population` evaluations an island; `Island.counters`, `.record` (family by family), `.shares` (of
 * `OPERATORS`) tell how it goes. `watch` = { now, spent: { variation, model, ranking, archive } } adds up where the time went.
 */
export { type DesignSample, type Designs, type NearMissDesigns, NO_SAMPLE } from './archive/index.ts';
export {
  agreementOf,
  chooseSubset,
  createMeasure,
  hypervolumeOf,
  mergeArchives,
  mergeNearMisses,
  mergeRecords,
} from './front.ts';
export { type Counters, type FamilyRecord, type Island, OPERATORS, startIslands } from './island.ts';
export { createMerger, type Findings, type Merger } from './merger.ts';
export { PACK_VERSION, packDesigns, packIsland, unpackDesigns, unpackIsland } from './pack.ts';
export { createPlan, type Plan, type PlanOptions } from './plan.ts';
export { type Families, type Gene, type GeneKind, type Objective, ONE_FAMILY, type Problem } from './problem.ts';
export { type Restart, type Restarted, relaxedProblem, restart } from './relaxed.ts';
export { immigrantsFor, joinDesigns, NO_DESIGNS } from './ring.ts';
export { type SearchOptions, type SearchResult, search } from './search.ts';
export { createStepper, type Stepper, step } from './step.ts';
export type { TimeSplit, Watch } from './world.ts';
