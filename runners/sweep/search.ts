/** The optimizer as a sweep uses it: islands as bytes in, counts, measures and findings out. */
import {
  createMeasure,
  createMerger,
  createPlan,
  type DesignSample,
  type Designs,
  type Island,
  joinDesigns,
  mergeArchives,
  mergeRecords,
  type NearMissDesigns,
  OPERATORS,
  type Plan,
  packIsland,
  startIslands,
  unpackIsland,
} from '../../optimizer/index.ts';
import type { Problem } from '../../optimizer/problem.ts';
import type { RingWent, Source } from '../run-folder/sources.ts';
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
  /** Hypervolume of each island by itself. */
  apart(islands: readonly IslandState[]): number[];
  /** How much of each family was tried, in the problem's order, and how the search of a ring went. */
  went(islands: readonly IslandState[]): Required<Pick<Source, 'families' | 'went'>>;
  /** All designs that the islands hold, feasible or not. */
  atHand(islands: readonly IslandState[]): Designs;
}

/** What islands have found together. */
export interface Survey {
  readonly archive: Designs;
  readonly nearMisses: NearMissDesigns;
  readonly sample: DesignSample;
  readonly measure: Measure;
  /** How well the islands agree, what was avoided, which operators feed the archive. */
  readonly trust: Readonly<Record<string, unknown>>;
}

/** The search of a problem. */
export function createSearch(problem: Problem): Search {
  const openBytes = openedOnce();
  const open = (islands: readonly IslandState[]): Island[] => islands.map((state) => openBytes(state.bytes));
  const volumeOf = createMeasure(problem);
  const apart = (islands: readonly Island[]): number[] => islands.map(({ archive }) => frontVolume(volumeOf, archive));
  const measure = measuredOnce((islands) => measureDesigns(problem, mergeArchives(problem, open(islands)), volumeOf));
  return {
    start: (plan) =>
      startIslands(problem, plan).map((island) => {
        const bytes = packIsland(island);
        return { bytes, ...tallyOf(island) };
      }),
    neighbours: ringNeighbours,
    tally: (bytes) => tallyOf(openBytes(bytes)),
    measure,
    survey: (islands) => {
      const opened = open(islands);
      const merger = createMerger(problem);
      for (const island of opened) merger.add(island);
      const archive = merger.archive();
      const measured = measureDesigns(problem, archive, volumeOf);
      const trust = trustOf(opened, apart(opened), measured.hypervolume);
      return { archive, nearMisses: merger.nearMisses(), sample: merger.sample(), measure: measured, trust };
    },
    apart: (islands) => apart(open(islands)),
    went: (islands) => {
      const opened = open(islands);
      return { families: familiesOf(problem, opened), went: wentOf(opened) };
    },
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

/** Opens packed islands, each once for as long as its bytes are held. */
function openedOnce(): (bytes: Uint8Array) => Island {
  const opened = new WeakMap<Uint8Array, Island>();
  return (bytes) => {
    const island = opened.get(bytes) ?? unpackIsland(bytes);
    opened.set(bytes, island);
    return island;
  };
}

/** Measures islands; the same ones again, as progress and history ask for, only once. */
function measuredOnce(measure: (islands: readonly IslandState[]) => Measure): Search['measure'] {
  let last: { readonly islands: readonly IslandState[]; readonly measure: Measure } | undefined;
  return (islands) => {
    const same = last?.islands.length === islands.length && islands.every((state, i) => state === last?.islands[i]);
    if (last === undefined || !same) last = { islands: [...islands], measure: measure(islands) };
    return last.measure;
  };
}

function tallyOf(island: Island): Tally {
  const { evaluations, feasible } = island.counters;
  return { evaluations, feasible };
}

function ringNeighbours(island: number, islands: number): readonly number[] {
  return [...new Set([(island + islands - 1) % islands, (island + 1) % islands])].filter((other) => other !== island);
}

function familiesOf(problem: Problem, islands: readonly Island[]): NonNullable<Source['families']> {
  const { evaluated, feasible, best, violated } = mergeRecords(islands);
  const [m, limits] = [problem.objectives.length, problem.limits.length];
  return problem.families.names.map((_, i) => ({
    evaluated: evaluated[i] ?? 0,
    feasible: feasible[i] ?? 0,
    best: [...best.subarray(i * m, (i + 1) * m)].filter(Number.isFinite),
    violated: [...violated.subarray(i * limits, (i + 1) * limits)],
  }));
}

function frontVolume(volumeOf: (front: Designs) => number, front: Designs): number {
  return front.count === 0 ? 0 : volumeOf(front);
}

function wentOf(islands: readonly Island[]): RingWent {
  const sum = (pick: (island: Island) => number): number => islands.reduce((total, island) => total + pick(island), 0);
  const shares = OPERATORS.map((name, i) => [name, sum((island) => island.shares[i] ?? 0) / islands.length]);
  return {
    islands: islands.length,
    duplicates: sum((island) => island.counters.duplicates),
    restarts: sum((island) => island.counters.restarts),
    notComputable: sum((island) => island.counters.notComputable),
    operatorShares: Object.fromEntries(shares),
  };
}

function trustOf(islands: readonly Island[], volumes: readonly number[], whole: number): Survey['trust'] {
  const { islands: _, ...went } = wentOf(islands);
  const agreement = volumes.map((volume) => (whole > 0 ? Math.min(1, volume / whole) : 0));
  return { agreement, ...went };
}
