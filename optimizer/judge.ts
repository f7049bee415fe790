/** Judging children: evaluation, counting, archives. */
import { computable, type World } from './world.ts';

/** Scratch rows handed to the problem, so that it never sees the search's own arrays. */
export interface Bench {
  readonly genes: Float64Array;
  readonly objectives: Float64Array;
  readonly violations: Float64Array;
}

/** Scratch for `judge`. */
export function createBench(world: World): Bench {
  return {
    genes: new Float64Array(world.n),
    objectives: new Float64Array(world.m),
    violations: new Float64Array(world.limits),
  };
}

/** Evaluates rows `from … to − 1`, counts them and shows them to the archives. */
export function judge(world: World, bench: Bench, from: number, to: number): void {
  const { watch } = world;
  const start = watch === undefined ? 0 : watch.now();
  for (let row = from; row < to; row++) evaluateRow(world, bench, row);
  const middle = watch === undefined ? 0 : watch.now();
  for (let row = from; row < to; row++) {
    countRow(world, row);
    showRow(world, row);
  }
  if (watch === undefined) return;
  watch.spent.model += middle - start;
  watch.spent.archive += watch.now() - middle;
}

/** Sets every row's total violation anew, each limit divided by its mean violation so far, each part held below 1. */
export function weighViolations(world: World, from: number, to: number): void {
  const { limits, violations, violationSum, violationCount, total } = world;
  for (let row = from; row < to; row++) {
    if (total[row] === Number.POSITIVE_INFINITY) continue;
    let sum = 0;
    for (let k = 0; k < limits; k++) {
      const v = violations[row * limits + k];
      if (!(v > 0)) continue;
      const mean = violationCount[k] > 0 ? violationSum[k] / violationCount[k] : 1;
      sum += v < Number.POSITIVE_INFINITY ? v / (v + mean) : 1;
    }
    total[row] = sum;
  }
}

function evaluateRow(world: World, bench: Bench, row: number): void {
  const { n, m, limits, genes, objectives, violations } = world;
  for (let g = 0; g < n; g++) bench.genes[g] = genes[row * n + g];
  world.problem.evaluate(bench.genes, bench.objectives, bench.violations);
  for (let c = 0; c < m; c++) objectives[row * m + c] = bench.objectives[c];
  for (let k = 0; k < limits; k++) violations[row * limits + k] = bench.violations[k];
}

/** Credit of an archive entry that dominates its parent, beside 1 for any other: progress counts above spread. */
const DOMINATING = 5;

/** Largest violation that enters a mean, so that one wild value does not silence a limit. */
const MOST = 10;

function countRow(world: World, row: number): void {
  const { m, limits, genes, objectives, violations, violationSum, violationCount, record, counters, family } = world;
  const f = family[row];
  counters.evaluations++;
  record.evaluated[f]++;
  let broken = 0;
  for (let k = 0; k < limits; k++) {
    const v = violations[row * limits + k];
    if (!(v > 0)) continue;
    broken++;
    record.violated[f * limits + k]++;
    violationSum[k] += Math.min(v, MOST);
    violationCount[k]++;
  }
  const finite = computable(world, row);
  world.total[row] = finite ? 0 : Number.POSITIVE_INFINITY;
  if (!finite) counters.notComputable++;
  if (!finite || broken > 0) return;
  counters.feasible++;
  crown(world, row);
  world.sample.offer(genes, objectives, family, row);
  record.feasible[f]++;
  for (let c = 0; c < m; c++) {
    if (objectives[row * m + c] < record.best[f * m + c]) record.best[f * m + c] = objectives[row * m + c];
  }
}

/** Makes the row champion of each objective in which it beats the present one. */
function crown(world: World, row: number): void {
  const { n, m, capacity, objectives, coordinates, stride } = world;
  for (let c = 0; c < m; c++) {
    const champion = capacity + c;
    if (!(objectives[row * m + c] < objectives[champion * m + c])) continue;
    objectives.copyWithin(champion * m, row * m, row * m + m);
    coordinates.copyWithin(champion * n, row * n, row * n + n);
    stride.copyWithin(champion * n, row * n, row * n + n);
  }
}

function showRow(world: World, row: number): void {
  const { genes, objectives, violations, archive, near, maker, limits } = world;
  if (!(world.total[row] < Number.POSITIVE_INFINITY)) return;
  const entered = archive.insert(genes, objectives, violations, row);
  world.entries += entered;
  if (limits > 0 && entered === 0) near.insert(genes, objectives, violations, row);
  const operator = maker[row];
  if (operator < 0) return;
  world.tried[operator]++;
  if (entered === 1) world.earned[operator] += dominates(world, row, world.parent[row]) ? DOMINATING : 1;
}

function dominates(world: World, a: number, b: number): boolean {
  const { m, objectives, total } = world;
  if (total[a] > total[b]) return false;
  for (let c = 0; c < m; c++) if (objectives[a * m + c] > objectives[b * m + c]) return false;
  return true;
}
