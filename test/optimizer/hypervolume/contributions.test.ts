import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createContributions, createHypervolume } from '../../../optimizer/hypervolume/index.ts';
import { clouds } from '../oracles/clouds.ts';
import { allRows, generator, sphere } from '../oracles/points.ts';
import { plainContributions } from '../oracles/volume.ts';

function contributions(rows: number[][], m: number, reference: number[]): number[] {
  const out = new Float64Array(rows.length);
  const measure = createContributions(rows.length, m);
  const points = Float64Array.from(rows.flat());
  expect(measure.measure(points, allRows(rows.length), rows.length, Float64Array.from(reference), out)).toBe(true);
  return Array.from(out);
}

describe.each([2, 3, 4])('contributions in %i objectives', (m) => {
  const reference = new Array<number>(m).fill(4);

  it('are the whole less the whole without the point, dominated and equal points among them', () => {
    fc.assert(
      fc.property(clouds(m, m === 4 ? 9 : 14), (rows) => {
        const expected = plainContributions(rows, reference);
        contributions(rows, m, reference).forEach((value, i) => {
          expect(value).toBeCloseTo(expected[i], 9);
        });
      }),
      { numRuns: 300 },
    );
  });

  it('are exact, ties included, for whole numbers', () => {
    const value = fc.integer({ min: 0, max: 5 });
    fc.assert(
      fc.property(fc.array(fc.array(value, { minLength: m, maxLength: m }), { maxLength: 12 }), (rows) => {
        expect(contributions(rows, m, reference)).toEqual(plainContributions(rows, reference));
      }),
    );
  });

  it('are nil for both of two equal points and for what does not beat the reference', () => {
    const one = new Array<number>(m).fill(1);
    const beyond = [4, ...new Array<number>(m - 1).fill(0)];
    expect(contributions([one, beyond, one], m, reference)).toEqual([0, 0, 0]);
    expect(contributions([one, beyond], m, reference)).toEqual([3 ** m, 0]);
  });

  it('are above zero for every member of a front, and together at most the whole', () => {
    const n = m === 4 ? 100 : 1000;
    const points = sphere(n, m, 21);
    const out = new Float64Array(n);
    const corner = new Float64Array(m).fill(1.1);
    createContributions(n, m).measure(points, allRows(n), n, corner, out);
    expect(Math.min(...out)).toBeGreaterThan(0);
    const whole = createHypervolume(n, m).volume(points, allRows(n), n, corner);
    expect(out.reduce((sum, value) => sum + value, 0)).toBeLessThan(whole);
  });

  it.each([Number.NaN, Number.POSITIVE_INFINITY])('refuse %d and write nothing', (bad) => {
    const out = new Float64Array(2).fill(8);
    const points = Float64Array.from([...new Array(2 * m - 1).fill(1), bad]);
    const measure = createContributions(2, m);
    expect(measure.measure(points, allRows(2), 2, Float64Array.from(reference), out)).toBe(false);
    expect(Array.from(out)).toEqual([8, 8]);
  });
});

describe('contributions of 100,000 points', () => {
  it('are, for a few drawn from them, what the whole loses without the point', () => {
    const [n, m] = [100_000, 3];
    const points = sphere(n, m, 31);
    const reference = new Float64Array(m).fill(1.1);
    const out = new Float64Array(n);
    createContributions(n, m).measure(points, allRows(n), n, reference, out);
    const measure = createHypervolume(n, m);
    const whole = measure.volume(points, allRows(n), n, reference);
    const draw = generator(3);
    for (let k = 0; k < 5; k++) {
      const point = Math.floor(draw() * n);
      const others = allRows(n).filter((row) => row !== point);
      expect(out[point]).toBeCloseTo(whole - measure.volume(points, others, n - 1, reference), 11);
    }
  });
});
