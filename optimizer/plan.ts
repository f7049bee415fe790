/** What is fixed before a search starts: seed, ring, sizes. The same plan and the same number of epochs give the same front, to the bit. */
import type { Problem } from './problem.ts';
import { EPOCH_GENERATIONS, EVALUATIONS_PER_ISLAND, MOST_ISLANDS, POPULATION, TRIAL_EPOCHS } from './settings.ts';

/** A plan as plain data; keep it with the run, resuming needs the same one. */
export interface Plan {
  readonly seed: number | string;
  /** Which closed ring this is, 0 … shards − 1. */
  readonly shard: number;
  /** Number of rings that do not exchange designs. */
  readonly shards: number;
  /** Islands in this ring. */
  readonly islands: number;
  /** Designs an island breeds from. */
  readonly population: number;
  /** Generations of `population` evaluations in an epoch. */
  readonly epochGenerations: number;
  /** First epochs, in which families are searched by themselves. */
  readonly trialEpochs: number;
  /** Epochs to run for the wanted number of evaluations; 0 when none was given. */
  readonly epochs: number;
}

/** Wishes that differ from the rules of `settings.ts`. */
export interface PlanOptions {
  /** Default 1. */
  readonly seed?: number | string;
  /** Default 0 of 1. */
  readonly shard?: number;
  readonly shards?: number;
  /** Evaluations wanted of this ring; sets `islands`, `epochs` and `trialEpochs` where they are not given. */
  readonly evaluations?: number;
  readonly islands?: number;
  readonly population?: number;
  readonly epochGenerations?: number;
  readonly trialEpochs?: number;
}

/**
 * Makes a plan. By rule: one island for every 25,000 evaluations, 1 … 16 (4 when no budget is given); an epoch of 50 generations, fewer
 * when the budget would not fill four epochs; a fifth of the epochs to try families one by one, none when there is only one.
 */
export function createPlan(problem: Problem, options: PlanOptions = {}): Plan {
  const { seed = 1, shard = 0, shards = 1, evaluations } = options;
  const population = options.population ?? POPULATION;
  const islands = options.islands ?? islandsFor(evaluations);
  const generations = evaluations === undefined ? Number.POSITIVE_INFINITY : evaluations / (islands * population);
  const epochGenerations =
    options.epochGenerations ?? Math.max(1, Math.min(EPOCH_GENERATIONS, Math.ceil(generations / 4)));
  const epochs = evaluations === undefined ? 0 : Math.max(1, Math.ceil(generations / epochGenerations));
  const several = problem.families.names.length > 1;
  const trial = evaluations === undefined ? TRIAL_EPOCHS : Math.max(1, Math.round(epochs / 5));
  const trialEpochs = options.trialEpochs ?? (several ? trial : 0);
  return { seed, shard, shards, islands, population, epochGenerations, trialEpochs, epochs };
}

function islandsFor(evaluations: number | undefined): number {
  if (evaluations === undefined) return 4;
  return Math.max(1, Math.min(MOST_ISLANDS, Math.floor(evaluations / EVALUATIONS_PER_ISLAND)));
}
