/**
 * What one limit stands in the way of: a short search from known designs in which that limit may be missed by a little. Without a limit to
 * relax it is the same search on level ground, so that what more searching alone gives is not taken for the price of a limit.
 */
import {
  createArchive,
  createNearMisses,
  type Designs,
  insertAll,
  type NearMissDesigns,
  packArchive,
  packNearMisses,
} from './archive/index.ts';
import type { Problem } from './problem.ts';
import { search } from './search.ts';
import { archiveGrid, nearMissGrid } from './world.ts';

/** One short search. */
export interface Restart {
  /** Place of the limit in `problem.limits`; −1 relaxes none. */
  readonly limit: number;
  /** By which fraction the limit may be missed, as violations count; at most the share of a near miss (0.25). */
  readonly share: number;
  /** Evaluations; rounded up to whole epochs. */
  readonly evaluations: number;
  readonly seed: string;
}

/** What it found. */
export interface Restarted {
  /** Designs that keep every limit; none beats another. */
  readonly level: Designs;
  /** Designs that miss the relaxed limit, by at most `share`, and no other. */
  readonly misses: NearMissDesigns;
}

/** Searches `problem` from `seeds` (gene vectors, the first 50 count) with one limit relaxed. Same arguments, same result. */
export function restart(problem: Problem, seeds: readonly Float64Array[], one: Restart): Restarted {
  const { limit, share, evaluations, seed } = one;
  const relaxed = relaxedProblem(problem, limit, share, seeds);
  const { front } = search(relaxed, { evaluations, seed, islands: 1, trialEpochs: 0 });
  const n = problem.genes.length;
  const level = createArchive(archiveGrid(problem));
  const misses = createNearMisses(nearMissGrid(problem));
  const objectives = new Float64Array(problem.objectives.length);
  const violations = new Float64Array(problem.limits.length);
  for (let row = 0; row < front.count; row++) {
    const genes = front.genes.slice(row * n, row * n + n);
    problem.evaluate(genes, objectives, violations);
    if (violations.every((violation) => violation === 0)) {
      insertAll(level, { count: 1, genes, objectives, violations });
    } else misses.insert(genes, objectives, violations, 0);
  }
  return { level: packArchive(level), misses: packNearMisses(misses) };
}

/** The problem in which the limit at place `limit` may be missed by `share`, its search starting from `seeds`. */
export function relaxedProblem(
  problem: Problem,
  limit: number,
  share: number,
  seeds: readonly Float64Array[] = problem.seeds,
): Problem {
  const { name, genes, objectives, limits, families } = problem;
  return {
    name,
    genes,
    objectives,
    limits,
    families,
    seeds,
    snap: (design) => problem.snap(design),
    evaluate(design, values, violations) {
      problem.evaluate(design, values, violations);
      if (limit >= 0) violations[limit] = violations[limit] > share ? violations[limit] - share : 0;
    },
  };
}
