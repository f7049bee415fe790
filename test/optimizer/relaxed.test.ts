/** Relaxing one limit: the laws of the short search, on a converter-free space whose price of a limit is known on paper. */
import { describe, expect, it } from 'vitest';
import { ONE_FAMILY, type Problem, relaxedProblem, restart, search } from '../../optimizer/index.ts';

/**
 * A beam of width a and depth b (0.1 … 10): weight a·b and depth are to be small, stiffness a·b³ must reach 8 and the width may be
 * 4 at most. At full width the least depth is (8/4)^(1/3) and the weight there is the largest of the front.
 */
const BEAM: Problem = {
  name: 'beam',
  genes: [
    { name: 'width', unit: 'cm', kind: 'real', low: 0.1, high: 10 },
    { name: 'depth', unit: 'cm', kind: 'real', low: 0.1, high: 10 },
  ],
  objectives: [
    { name: 'weight', unit: 'kg', resolution: 0.01, ideal: 0, reference: 20 },
    { name: 'depth', unit: 'cm', resolution: 0.005, ideal: 0, reference: 10 },
  ],
  limits: ['stiffness', 'width'],
  families: ONE_FAMILY,
  seeds: [],
  snap: () => {},
  evaluate: ([width, depth], objectives, violations) => {
    objectives[0] = width * depth;
    objectives[1] = depth;
    violations[0] = Math.max(0, 1 - (width * depth * depth * depth) / 8);
    violations[1] = Math.max(0, width / 4 - 1);
  },
};

const { front } = search(BEAM, { evaluations: 4000, seed: 1 });
/** Fifty designs spread over the front, both ends among them. */
const seeds = Array.from({ length: 50 }, (_, i) => {
  const row = Math.round((i * (front.count - 1)) / 49);
  return front.genes.slice(2 * row, 2 * row + 2);
});
const leastDepth = (objectives: Float64Array): number => {
  const depths = Array.from({ length: objectives.length / 2 }, (_, row) => objectives[2 * row + 1] ?? Infinity);
  return Math.min(...depths);
};
const depthOf = (rows: readonly Float64Array[]): number => Math.min(...rows.map(([, depth]) => depth ?? Infinity));

describe('a short search with one limit relaxed', () => {
  it('finds most of what the limit costs on paper, where the least depth falls with the cube root of the width allowed', () => {
    const paper = (share: number): number => (8 / (4 * (1 + share))) ** (1 / 3);
    for (const share of [0.1, 0.25]) {
      const { misses } = restart(BEAM, seeds, { limit: 1, share, evaluations: 2000, seed: 'a' });
      const gain = paper(0) - leastDepth(misses.objectives);
      expect(gain).toBeLessThanOrEqual(paper(0) - paper(share) + 1e-9);
      expect(gain).toBeGreaterThan(0.8 * (paper(0) - paper(share)));
    }
  });

  it('never makes the best worse than the designs it started from', () => {
    for (const limit of [-1, 0, 1]) {
      const { level, misses } = restart(BEAM, seeds, { limit, share: 0.1, evaluations: 500, seed: 'b' });
      const found = Math.min(leastDepth(level.objectives), leastDepth(misses.objectives));
      expect(found).toBeLessThanOrEqual(depthOf(seeds));
    }
  });

  it('gives designs that miss the relaxed limit by at most the share and keep every other, and designs that keep all', () => {
    const { level, misses } = restart(BEAM, seeds, { limit: 0, share: 0.1, evaluations: 2000, seed: 'c' });
    expect(misses.count).toBeGreaterThan(5);
    expect(level.violations.every((violation) => violation === 0)).toBe(true);
    for (let row = 0; row < misses.count; row++) {
      expect(misses.limit[row]).toBe(0);
      expect(misses.violations[2 * row]).toBeGreaterThan(0);
      expect(misses.violations[2 * row]).toBeLessThanOrEqual(0.1);
      expect(misses.violations[2 * row + 1]).toBe(0);
    }
  });

  it('relaxes nothing on level ground', () => {
    expect(restart(BEAM, seeds, { limit: -1, share: 0, evaluations: 500, seed: 'd' }).misses.count).toBe(0);
  });

  it('is the same for the same seed', () => {
    const one = { limit: 1, share: 0.25, evaluations: 800, seed: 'e' };
    expect(restart(BEAM, seeds, one)).toEqual(restart(BEAM, seeds, one));
  });
});

describe('a relaxed problem', () => {
  it('counts what is missed beyond the share, of that limit alone', () => {
    const objectives = new Float64Array(2);
    const violations = new Float64Array(2);
    // Width 5 misses its limit by a quarter, stiffness 5·1³ its own by three eighths.
    relaxedProblem(BEAM, 1, 0.1).evaluate(Float64Array.of(5, 1), objectives, violations);
    expect([...violations]).toEqual([0.375, 0.15]);
    relaxedProblem(BEAM, 1, 0.25).evaluate(Float64Array.of(5, 1), objectives, violations);
    expect([...violations]).toEqual([0.375, 0]);
  });
});
