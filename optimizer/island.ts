/** An island: everything one population of the search knows, as plain data. */
import { type DesignSample, type Designs, type NearMissDesigns, NO_SAMPLE } from './archive/index.ts';
import type { Plan } from './plan.ts';
import type { Problem } from './problem.ts';
import { type RandomState, seedRandom } from './random.ts';
import { SEEN_SLOTS } from './settings.ts';

/** Counts since the island began. */
export interface Counters {
  /** Designs evaluated. */
  readonly evaluations: number;
  /** Of these, those that met every limit. */
  readonly feasible: number;
  /** Of these, those with a value that could not be computed. */
  readonly notComputable: number;
  /** Children not evaluated because they had been seen. */
  readonly duplicates: number;
  readonly restarts: number;
}

/** What became of each family, indexed as `problem.families.names`. */
export interface FamilyRecord {
  readonly evaluated: Float64Array;
  readonly feasible: Float64Array;
  /** Smallest feasible value of each objective, family by family; Infinity where none. */
  readonly best: Float64Array;
  /** How often each limit was violated, family by family. */
  readonly violated: Float64Array;
}

/** One island. Plain data: may be copied, sent to a thread, packed to bytes. Never changed in place. */
export interface Island {
  /** The plan it belongs to and its place in the ring. */
  readonly plan: Plan;
  readonly index: number;
  /** Epochs done. */
  readonly epoch: number;
  readonly random: RandomState;
  /** Families it tries in the first epochs, all when empty. */
  readonly families: Int32Array;
  readonly population: Designs;
  /** Coordinates of the population, genes that play no part included; empty before the first epoch. */
  readonly coordinates: Float64Array;
  /** ε-grid archive of feasible non-dominated designs, packed. */
  readonly archive: Designs;
  readonly nearMisses: NearMissDesigns;
  /** A sample of all feasible designs evaluated. */
  readonly sample: DesignSample;
  /** Hashes of designs evaluated, one to a slot. */
  readonly seen: Uint32Array;
  /** Share of each operator, in the order of `OPERATORS`, and its remembered rate of archive entries. */
  readonly shares: Float64Array;
  readonly quality: Float64Array;
  /** Sum and number of the violations seen, limit by limit: their mean normalises. */
  readonly violationSum: Float64Array;
  readonly violationCount: Float64Array;
  /** ε of the relaxed start, as it began, and generations left of it. */
  readonly relaxation: number;
  readonly relaxedGenerations: number;
  /** Generations since a child last entered the archive. */
  readonly stalled: number;
  readonly counters: Counters;
  readonly record: FamilyRecord;
}

/** Names of the operators whose shares an island adapts. */
export const OPERATORS = ['crossover', 'differential', 'neighbours', 'refinement', 'graft', 'proportion'] as const;

/** Most that each operator's share may be: refinement polishes, and must not crowd out those that explore. */
export const CEILINGS: readonly number[] = [1, 1, 1, 0.12, 1, 1];

/** The islands of a ring before anything was evaluated. */
export function startIslands(problem: Problem, plan: Plan): Island[] {
  return Array.from({ length: plan.islands }, (_, index) => startIsland(problem, plan, index));
}

function startIsland(problem: Problem, plan: Plan, index: number): Island {
  const families = problem.families.names.length;
  const m = problem.objectives.length;
  const limits = problem.limits.length;
  const none = {
    count: 0,
    genes: new Float64Array(0),
    objectives: new Float64Array(0),
    violations: new Float64Array(0),
  };
  return {
    plan,
    index,
    epoch: 0,
    random: seedRandom(plan.seed, plan.shard, index),
    families: ownFamilies(families, plan.islands, index),
    population: none,
    coordinates: new Float64Array(0),
    archive: none,
    nearMisses: { ...none, limit: new Int32Array(0) },
    sample: NO_SAMPLE,
    seen: new Uint32Array(SEEN_SLOTS),
    shares: new Float64Array(OPERATORS.length).fill(1 / OPERATORS.length),
    quality: new Float64Array(OPERATORS.length).fill(0.5),
    violationSum: new Float64Array(limits),
    violationCount: new Float64Array(limits),
    relaxation: -1,
    relaxedGenerations: 0,
    stalled: 0,
    counters: { evaluations: 0, feasible: 0, notComputable: 0, duplicates: 0, restarts: 0 },
    record: {
      evaluated: new Float64Array(families),
      feasible: new Float64Array(families),
      best: new Float64Array(families * m).fill(Number.POSITIVE_INFINITY),
      violated: new Float64Array(families * limits),
    },
  };
}

/** Families dealt out over the islands; with more islands than families, several islands share one. */
function ownFamilies(families: number, islands: number, index: number): Int32Array {
  if (islands >= families) return Int32Array.of(index % families);
  return Int32Array.from(
    Array.from({ length: families }, (_, family) => family).filter((family) => family % islands === index),
  );
}
