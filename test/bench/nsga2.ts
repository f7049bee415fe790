/**
 * NSGA-II (Deb, Pratap, Agarwal, Meyarivan 2002) put together from the search's kernels and variation, as the yardstick of whole-run times: once with the
 * kernels, once with the plain sort.
 */

import type { Problem } from '../../optimizer/index.ts';
import { restoreRandom, seedRandom } from '../../optimizer/random.ts';
import { createCrowding, createRanker } from '../../optimizer/ranking/index.ts';
import { contain, createSpace, crossover, mutate, toGenes } from '../../optimizer/variation/index.ts';
import { sortPlainly } from './plain.ts';

/** Population, as in the table of search.md's anchors. */
const SIZE = 100;

/** Writes fronts of `n` rows to `ranks`. */
type Sort = (objectives: Float64Array, n: number, ranks: Int32Array) => void;

/** A run with the kernels. */
export function runNsga2(problem: Problem, evaluations: number): Float64Array {
  const ranker = createRanker(2 * SIZE, problem.objectives.length);
  return run(problem, evaluations, (objectives, n, ranks) => ranker.rank(objectives, n, ranks));
}

/** The same run with the plain sort. */
export function runPlainNsga2(problem: Problem, evaluations: number): Float64Array {
  const m = problem.objectives.length;
  return run(problem, evaluations, (objectives, n, ranks) => sortPlainly(objectives, m, n, ranks));
}

/** Runs and returns the last population's objectives. Problems without limits only. */
function run(problem: Problem, evaluations: number, sort: Sort): Float64Array {
  const space = createSpace(problem.genes);
  const { n } = space;
  const m = problem.objectives.length;
  const random = restoreRandom(seedRandom(1, 0, 0));
  const pool = new Float64Array(2 * SIZE * n).map(() => random.uniform());
  const objectives = new Float64Array(2 * SIZE * m);
  const ranks = new Int32Array(2 * SIZE);
  const distance = new Float64Array(2 * SIZE);
  const gene = new Float64Array(n);
  const value = new Float64Array(m);
  const none = new Float64Array(0);
  const parents = new Int32Array(3);
  const evaluate = (row: number): void => {
    toGenes(space, pool, row * n, gene, 0);
    problem.evaluate(gene, value, none);
    objectives.set(value, row * m);
  };
  const crowding = createCrowding(2 * SIZE, m);
  const rows = new Int32Array(2 * SIZE);
  const spread = new Float64Array(2 * SIZE);
  const measure = (all: number): number => {
    sort(objectives, all, ranks);
    let held = 0;
    for (let front = 0; held < all; front++) {
      let count = 0;
      for (let row = 0; row < all; row++) if (ranks[row] === front) rows[count++] = row;
      crowding.measure(objectives, rows, count, spread);
      for (let k = 0; k < count; k++) distance[rows[k]] = spread[k];
      held += count;
    }
    return held;
  };
  const better = (a: number, b: number): boolean =>
    ranks[a] < ranks[b] || (ranks[a] === ranks[b] && distance[a] > distance[b]);
  const pick = (): number => {
    const a = random.whole(SIZE);
    const b = random.whole(SIZE);
    return better(b, a) ? b : a;
  };
  for (let row = 0; row < SIZE; row++) evaluate(row);
  measure(SIZE);
  for (let spent = SIZE; spent < evaluations; spent += SIZE) {
    for (let row = SIZE; row < 2 * SIZE; row++) {
      parents[0] = pick();
      parents[1] = pick();
      crossover(space, pool, parents, pool, row * n, random);
      mutate(space, pool, row * n, 1 / n, random);
      contain(space, pool, parents[0], pool, row * n, random);
      evaluate(row);
    }
    measure(2 * SIZE);
    const order = Array.from({ length: 2 * SIZE }, (_, row) => row).sort((a, b) =>
      better(a, b) ? -1 : better(b, a) ? 1 : a - b,
    );
    const kept = order.slice(0, SIZE);
    const next = kept.map((row) => [pool.slice(row * n, row * n + n), objectives.slice(row * m, row * m + m)] as const);
    const standing = kept.map((row) => [ranks[row], distance[row]] as const);
    next.forEach(([genes, values], row) => {
      pool.set(genes, row * n);
      objectives.set(values, row * m);
      [ranks[row], distance[row]] = standing[row];
    });
  }
  return objectives.slice(0, SIZE * m);
}
