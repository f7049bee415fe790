/**
 * Infeasibility-driven selection (Ray, Singh, Isaacs, Smith, "Infeasibility driven evolutionary algorithm for constrained optimization",
 * 2009; from memory): a stated small share of the population may miss limits, and only while the rest meets them.
 */
import { describe, expect, it } from 'vitest';
import {
  createPlan,
  type Designs,
  type Island,
  NO_DESIGNS,
  type Problem,
  startIslands,
  step,
} from '../../optimizer/index.ts';
import { BOLD_SHARE } from '../../optimizer/settings.ts';
import { osyczkaKundu, tanaka } from './problems/constrained.ts';
import { zdt1 } from './problems/zdt.ts';

const POPULATION = 20;

/** One island after some epochs, families no longer tried by themselves. */
function evolved(problem: Problem, seed: number, epochs: number): Island {
  const plan = createPlan(problem, { seed, islands: 1, population: POPULATION, epochGenerations: 5, trialEpochs: 1 });
  let [island] = startIslands(problem, plan);
  for (let epoch = 0; epoch < epochs; epoch++) island = step(problem, island, NO_DESIGNS);
  return island;
}

/** How many of some designs miss a limit. */
function missing(designs: Designs): number {
  const limits = designs.violations.length / designs.count;
  const row = (i: number) => designs.violations.subarray(i * limits, (i + 1) * limits);
  return Array.from({ length: designs.count }, (_, i) => row(i).some((violation) => violation > 0)).filter(Boolean)
    .length;
}

describe.each([osyczkaKundu().problem, tanaka().problem])('designs that miss limits of $name', (problem) => {
  const populations = [1, 2, 3, 4, 5, 6].map((seed) => evolved(problem, seed, 4).population);

  it('take at most their share of a population that knows designs within the limits', () => {
    for (const population of populations) expect(missing(population)).toBeLessThanOrEqual(BOLD_SHARE * POPULATION);
  });

  it('do take it: the way along a limit leads outside of it too', () => {
    expect(populations.some((population) => missing(population) > 0)).toBe(true);
  });

  it('never enter the archive', () => {
    const archives = [1, 2, 3].map((seed) => evolved(problem, seed, 4).archive);
    expect(archives.map(missing)).toEqual([0, 0, 0]);
    expect(archives.every(({ count }) => count > 0)).toBe(true);
  });
});

it('a problem without limits keeps its whole population', () => {
  const { population } = evolved(zdt1(6).problem, 1, 3);
  expect(population.count).toBe(POPULATION);
  expect(missing(population)).toBe(0);
});
