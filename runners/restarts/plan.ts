/** Which limits are relaxed once a sweep has ended, by how much, and how many evaluations each short search gets. */
import { type RailProblem, RELAXED_BY } from '../../model/index.ts';
import { type Designs, mergeNearMisses, type Restart } from '../../optimizer/index.ts';
import type { Found } from '../run-folder/found.ts';
import { chooseFront } from '../sweep/grid.ts';

/** The middle step comes first, so that a short sweep has at least that one for every limit. */
const STEPS: readonly number[] = [...RELAXED_BY.slice(1, 2), ...RELAXED_BY.slice(0, 1), ...RELAXED_BY.slice(2)];
/** Evaluations of all short searches together, as a part of those of the sweep; and the most of them. */
const BUDGET = { share: 0.1, most: 300_000 } as const;
/** Fewest evaluations of one search that say anything. */
const FEWEST = 400;
/** A limit that leaves less than this of what it allows nearly binds. */
const NEARLY = 0.05;
/** Limits relaxed at most, those that hold most designs back first. */
const LIMITS = 12;
/** Designs that a search starts from: an island breeds from so many. */
const SEEDS = 50;

/** The short searches of a run. */
export interface RestartPlan {
  readonly seeds: readonly Float64Array[];
  /** The first is on level ground: nothing relaxed. */
  readonly searches: readonly Restart[];
}

/** The plan; no searches where the sweep was too short for any or no limit holds the front back. */
export function planRestarts(
  problem: RailProblem,
  found: Pick<Found, 'archive' | 'nearMisses'>,
  run: { readonly seed: string; readonly evaluations: number },
): RestartPlan {
  const seeds = chooseFront(problem, found.archive, SEEDS);
  const binding = bindingLimits(problem, seeds, found);
  const total = Math.min(BUDGET.most, Math.floor(run.evaluations * BUDGET.share));
  const most = Math.floor(total / FEWEST) - 1;
  const relaxed = STEPS.flatMap((share) => binding.map((limit) => ({ limit, share }))).slice(0, Math.max(0, most));
  if (relaxed.length === 0) return { seeds, searches: [] };
  const evaluations = Math.floor(total / (relaxed.length + 1));
  const searches = [{ limit: -1, share: 0 }, ...relaxed].map(({ limit, share }) => ({
    limit,
    share,
    evaluations,
    seed: `${run.seed}, ${problem.limits[limit] ?? 'level'} ${share}`,
  }));
  return { seeds, searches };
}

/**
 * Places of the limits that bind or nearly bind one of `designs`, or that near misses break; those that count whole things
 * cannot be relaxed by a fraction.
 */
function bindingLimits(
  problem: RailProblem,
  designs: readonly Float64Array[],
  { archive, nearMisses }: Pick<Found, 'archive' | 'nearMisses'>,
): number[] {
  const held = new Int32Array(problem.limits.length);
  for (const place of mergeNearMisses(problem, [nearMisses], archive as Designs).limit) held[place] += 1;
  for (const genes of designs) {
    for (const { name, slack } of problem.assess(genes).limits) {
      if (slack < NEARLY) held[problem.limits.indexOf(name)] += 1;
    }
  }
  return problem.limitDefinitions
    .map(({ whole }, place) => ({ place, count: whole === true ? 0 : (held[place] ?? 0) }))
    .filter(({ count }) => count > 0)
    .sort((a, b) => b.count - a.count || a.place - b.place)
    .slice(0, LIMITS)
    .map(({ place }) => place);
}
