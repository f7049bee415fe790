/** The library face on a problem that is no converter, as one would write it: cans that hold a third of a litre. */
import { expect, it } from 'vitest';
import { chooseSubset, ONE_FAMILY, type Problem, search } from '../../optimizer/index.ts';

/** Height and radius in centimetres; sheet metal and stacking height are to be small; at least 330 cm³. */
const can: Problem = {
  name: 'can',
  genes: [
    { name: 'radius', unit: 'cm', kind: 'real', low: 1, high: 10 },
    { name: 'height', unit: 'cm', kind: 'log', low: 1, high: 100 },
  ],
  objectives: [
    { name: 'metal', unit: 'cm²', resolution: 0.1, ideal: 0, reference: 1000 },
    { name: 'height', unit: 'cm', resolution: 0.01, ideal: 0, reference: 100 },
  ],
  limits: ['volume'],
  families: ONE_FAMILY,
  seeds: [Float64Array.of(3.3, 11.5)],
  snap: () => {},
  evaluate: ([radius, height], objectives, violations) => {
    objectives[0] = 2 * Math.PI * radius * (radius + height);
    objectives[1] = height;
    violations[0] = Math.max(0, 1 - (Math.PI * radius * radius * height) / 330);
  },
};

it('finds the can of least metal, whose height is its diameter', () => {
  const { front, evaluations } = search(can, { evaluations: 10_000, seed: 1 });
  expect(evaluations).toBe(10_000);
  expect(chooseSubset(front, 50).count).toBe(50);
  // Designs come in the order of their first objective, the least metal first.
  const [metal] = front.objectives;
  const [radius, height] = front.genes.subarray(0, 2);
  // Calculus: least metal for a volume V at r = ∛(V / 2π), h = 2r, metal 6πr² = 264.36 for 330 cm³.
  expect(metal).toBeGreaterThan(264.35);
  // A quarter of a per cent: near its end the front is flat.
  expect(metal).toBeLessThan(265.02);
  expect(Math.abs(height / (2 * radius) - 1)).toBeLessThan(0.16);
});
