/** Times whole searches on cheap objectives: where the time goes that is not the model's. */
import { createPlan, NO_DESIGNS, type Problem, startIslands, step } from '../../optimizer/index.ts';
import { dtlz2 } from '../optimizer/problems/dtlz.ts';
import { zdt1 } from '../optimizer/problems/zdt.ts';
import type { Row } from './kernels.ts';
import { runNsga2, runPlainNsga2 } from './nsga2.ts';
import { EVALUATIONS } from './quality.ts';

/** Whole searches, each beside a plain NSGA-II of the same budget in the same process. */
export function timeRuns(): Row[] {
  const two = zdt1().problem;
  const three = dtlz2().problem;
  const plain = median(3, () => runPlainNsga2(two, EVALUATIONS));
  const kernels = median(5, () => runNsga2(two, EVALUATIONS));
  const plainThree = median(3, () => runPlainNsga2(three, EVALUATIONS));
  return [
    {
      work: 'whole NSGA-II, 25,000 evaluations, population 100, two objectives (ZDT1)',
      ms: kernels,
      plainMs: plain,
      ratio: plain / kernels,
      target: 120,
    },
    row('whole search, 25,000 evaluations, two objectives (ZDT1)', two, plain, 500),
    row('whole search, 25,000 evaluations, three objectives (DTLZ2)', three, plainThree, 500),
  ];
}

/** Microseconds an evaluation that an island of 200 spends outside a three-objective model. */
export function overheadAt200(): number {
  const { problem } = dtlz2();
  const run = (): number => {
    const plan = createPlan(problem, { seed: 1, islands: 1, population: 200, epochGenerations: 50 });
    const spent = { variation: 0, model: 0, ranking: 0, archive: 0 };
    let [island] = startIslands(problem, plan);
    const start = performance.now();
    for (let epoch = 0; epoch < 2; epoch++) {
      island = step(problem, island, NO_DESIGNS, { now: () => performance.now(), spent });
    }
    return (performance.now() - start - spent.model) / island.counters.evaluations;
  };
  run();
  return 1000 * run();
}

function row(work: string, problem: Problem, plainMs: number, target: number): Row {
  const plan = createPlan(problem, { seed: 1, evaluations: EVALUATIONS });
  const ms = median(5, () => {
    let [island] = startIslands(problem, plan);
    for (let epoch = 0; epoch < plan.epochs; epoch++) island = step(problem, island);
  });
  return { work, ms, plainMs, ratio: plainMs / ms, target };
}

/** Median time after one run to warm up, milliseconds. */
function median(repeats: number, run: () => void): number {
  run();
  const times = Array.from({ length: repeats }, () => {
    const start = performance.now();
    run();
    return performance.now() - start;
  });
  return times.sort((a, b) => a - b)[Math.floor(repeats / 2)];
}
