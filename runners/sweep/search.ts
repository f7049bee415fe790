/** The optimizer as a sweep uses it: islands as bytes in, counts, measures and findings out. */
import {
  createPlan,
  type Designs,
  hypervolumeOf,
  type Island,
  joinDesigns,
  mergeArchives,
  mergeNearMisses,
  type NearMissDesigns,
  NO_DESIGNS,
  OPERATORS,
  type Plan,
  packIsland,
  startIslands,
  unpackIsland,
} from '../../optimizer/index.ts';
import type { Problem } from '../../optimizer/problem.ts';
import { measureDesigns } from './grid.ts';
import type { Measure } from './measure.ts';
import type { IslandState } from './ring.ts';

/** What a sheet says of the search; an absent setting follows the optimizer's rules. */
export interface SearchSettings {
  readonly islands?: number;
  readonly population?: number;
  readonly epochGenerations?: number;
}

/** Counts of a packed island. */
export type Tally = Omit<IslandState, 'bytes'>;

/** How a sweep deals with islands that it holds as bytes. */
export interface Search {
  /** The islands of a ring before anything was evaluated. */
  start(plan: Plan): IslandState[];
  /** Islands from which island i of n takes immigrants. */
  neighbours(island: number, islands: number): readonly number[];
  tally(bytes: Uint8Array): Tally;
  measure(islands: readonly IslandState[]): Measure;
  /** All that is to be said of islands together. */
  survey(islands: readonly IslandState[]): Survey;
  /** How much of each family was tried, in the problem's order. */
  families(islands: readonly IslandState[]): FamilyTally[];
  /** All designs that the islands hold, feasible or not. */
  atHand(islands: readonly IslandState[]): Designs;
}

/** Designs of one family that were evaluated, and those of them that keep every limit. */
export interface FamilyTally {
  readonly evaluated: number;
  readonly feasible: number;
}

/** What islands have found together. */
export interface Survey {
  readonly archive: Designs;
  readonly nearMisses: NearMissDesigns;
  readonly measure: Measure;
  /** How well the islands agree, what was avoided, which operators feed the archive. */
  readonly trust: Readonly<Record<string, unknown>>;
}

/** The search of a problem. */
export function createSearch(problem: Problem): Search {
  const open = (islands: readonly IslandState[]): Island[] => islands.map((state) => unpackIsland(state.bytes));
  return {
    start: (plan) => startIslands(problem, plan).map((island) => stateOf(packIsland(island))),
    neighbours: ringNeighbours,
    tally,
    measure: (islands) => measureDesigns(problem, mergeArchives(problem, open(islands))),
    survey: (islands) => {
      const opened = open(islands);
      const archive = mergeArchives(problem, opened);
      const measure = measureDesigns(problem, archive);
      // All of them: which of them beat the front is decided when the front is final.
      const nearMisses = mergeNearMisses(problem, opened, NO_DESIGNS);
      return { archive, nearMisses, measure, trust: trustOf(problem, opened, measure.hypervolume) };
    },
    families: (islands) => familiesOf(problem, open(islands)),
    atHand: (islands) => joinDesigns(open(islands).map((island) => island.population)),
  };
}

/** The plan of a ring: the evaluations wanted of it fix how many islands it has and how long an epoch is. */
export function planRing(
  problem: Problem,
  ring: { readonly seed: string; readonly shard: number; readonly shards: number; readonly evaluations?: number },
  settings: SearchSettings,
): Plan {
  const { islands, population, epochGenerations } = settings;
  return createPlan(problem, { ...ring, islands, population, epochGenerations });
}

function stateOf(bytes: Uint8Array): IslandState {
  return { bytes, ...tally(bytes) };
}

function tally(bytes: Uint8Array): Tally {
  const { evaluations, feasible } = unpackIsland(bytes).counters;
  return { evaluations, feasible };
}

function ringNeighbours(island: number, islands: number): readonly number[] {
  return [...new Set([(island + islands - 1) % islands, (island + 1) % islands])].filter((other) => other !== island);
}

function familiesOf(problem: Problem, islands: readonly Island[]): FamilyTally[] {
  const sum = (pick: (island: Island) => number): number => islands.reduce((total, island) => total + pick(island), 0);
  return problem.families.names.map((_, i) => ({
    evaluated: sum((island) => island.record.evaluated[i] ?? 0),
    feasible: sum((island) => island.record.feasible[i] ?? 0),
  }));
}

function trustOf(problem: Problem, islands: readonly Island[], whole: number): Survey['trust'] {
  const sum = (pick: (island: Island) => number): number => islands.reduce((total, island) => total + pick(island), 0);
  const own = islands.map((island) => (island.archive.count === 0 ? 0 : hypervolumeOf(problem, island.archive)));
  const shares = OPERATORS.map((name, i) => [name, sum((island) => island.shares[i] ?? 0) / islands.length]);
  return {
    agreement: own.map((hypervolume) => (whole > 0 ? Math.min(1, hypervolume / whole) : 0)),
    operatorShares: Object.fromEntries(shares),
    duplicates: sum((island) => island.counters.duplicates),
    restarts: sum((island) => island.counters.restarts),
    notComputable: sum((island) => island.counters.notComputable),
  };
}
