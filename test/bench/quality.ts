/**
 * The search's quality on published problems: hypervolume of the best 100 points over that of the true front, 25,000 evaluations, reference 1.1 in
 * objectives normalised by the true front, over 11 seeds. All problems are searched alike: the only inputs are the problem, the seed and the budget.
 */
import { createHypervolume } from '../../optimizer/hypervolume/index.ts';
import { chooseSubset, type Designs, search } from '../../optimizer/index.ts';
import { dtlz1, dtlz2, dtlz7 } from '../optimizer/problems/dtlz.ts';
import type { Published } from '../optimizer/problems/make.ts';
import { zdt1, zdt2, zdt3, zdt4, zdt6 } from '../optimizer/problems/zdt.ts';

/** One line of the quality table. */
export interface QualityRow {
  readonly problem: string;
  /** Median and worst of the seeds. */
  readonly median: number;
  readonly worst: number;
  /** What the median must reach and no seed fall below. */
  readonly target: number;
  readonly floor: number;
  /** Most that any 100 points can have. */
  readonly ceiling: number;
  /** Median time of one search, milliseconds. */
  readonly ms: number;
}

/** Evaluations of one search. */
export const EVALUATIONS = 25_000;
/** Points that count. */
const POINTS = 100;

/** Problem, exact hypervolume of its front at 1.1, target, floor, ceiling. */
const BARS: readonly (readonly [Published, number, number, number, number])[] = [
  [zdt1(), 0.876667, 0.9946, 0.994, 0.9948],
  [zdt2(), 0.543333, 0.9913, 0.99, 0.9918],
  [zdt3(), 0.727453, 0.9978, 0.997, 0.998],
  [zdt4(), 0.876667, 0.9935, 0.985, 0.9948],
  [zdt6(), 0.616408, 0.99, 0.98, 0.992],
  [dtlz1(), 1.164333, 0.964, 0.955, 0.965],
  [dtlz2(), 0.807401, 0.9385, 0.937, 0.939],
  [dtlz7(), 0.602062, 0.958, 0.945, 0.9591],
];

/** Searches every problem with seeds 1 … `seeds`. */
export function measureQuality(seeds = 11): QualityRow[] {
  return BARS.map(([published, exact, target, floor, ceiling]) => {
    const values: number[] = [];
    const times: number[] = [];
    for (let seed = 1; seed <= seeds; seed++) {
      const start = performance.now();
      const { front } = search(published.problem, { evaluations: EVALUATIONS, seed });
      times.push(performance.now() - start);
      values.push(share(published, front) / exact);
    }
    values.sort((a, b) => a - b);
    times.sort((a, b) => a - b);
    const { name } = published.problem;
    const middle = Math.floor(seeds / 2);
    return { problem: name, median: values[middle], worst: values[0], target, floor, ceiling, ms: times[middle] };
  });
}

/** Hypervolume of the best 100 points in objectives normalised by the true front. */
function share({ ideal, nadir }: Published, front: Designs): number {
  const m = ideal.length;
  const objectives = front.objectives.map((value, k) => (value - ideal[k % m]) / (nadir[k % m] - ideal[k % m]));
  const reference = new Float64Array(m).fill(1.1);
  const chosen = chooseSubset({ ...front, objectives }, POINTS, reference);
  const rows = Int32Array.from({ length: chosen.count }, (_, row) => row);
  return createHypervolume(Math.max(1, chosen.count), m).volume(chosen.objectives, rows, chosen.count, reference);
}
