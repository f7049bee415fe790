import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createHypervolume } from '../../../optimizer/hypervolume/index.ts';
import { clouds } from '../oracles/clouds.ts';
import { allRows, cube, sphere } from '../oracles/points.ts';
import { countedVolume, plainVolume } from '../oracles/volume.ts';

function volume(points: ArrayLike<number>, m: number, reference: number[]): number {
  const n = points.length / m;
  return createHypervolume(n, m).volume(Float64Array.from(points), allRows(n), n, Float64Array.from(reference));
}

describe.each([2, 3, 4])('hypervolume of %i objectives', (m) => {
  const reference = new Array<number>(m).fill(4);

  it('is that of the definition, with ties, duplicates and points beyond the reference', () => {
    fc.assert(
      fc.property(clouds(m, 12), (rows) => {
        const expected = plainVolume(rows, reference);
        expect(volume(rows.flat(), m, reference)).toBeCloseTo(expected, 9);
      }),
      { numRuns: 300 },
    );
  });

  it('counts the unit cells that whole-number points dominate, exactly', () => {
    const value = fc.integer({ min: 0, max: 5 });
    fc.assert(
      fc.property(fc.array(fc.array(value, { minLength: m, maxLength: m }), { maxLength: 30 }), (rows) => {
        expect(volume(rows.flat(), m, reference)).toBe(countedVolume(rows, reference));
      }),
    );
  });

  it('is 0 for no points, and the box of a single one', () => {
    expect(volume([], m, reference)).toBe(0);
    expect(volume(new Array(m).fill(1), m, reference)).toBe(3 ** m);
    expect(volume(new Array(m).fill(4), m, reference)).toBe(0);
  });

  it('is not changed by order, by duplicates or by dominated points', () => {
    const points = Array.from(sphere(300, m, 2));
    const behind = points.map((value) => value + 0.01);
    const reversed = Array.from({ length: 300 }, (_, i) => points.slice((299 - i) * m, (300 - i) * m)).flat();
    const once = volume(points, m, reference);
    expect(volume([...reversed, ...behind, ...points], m, reference)).toBeCloseTo(once, 10);
  });

  it.each([Number.NaN, Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY])(
    'is NaN when a value or the reference is %d',
    (bad) => {
      expect(volume([...new Array(m).fill(1), ...new Array(m - 1).fill(1), bad], m, reference)).toBeNaN();
      expect(volume(new Array(m).fill(1), m, [...reference.slice(1), bad])).toBeNaN();
    },
  );

  it('reads only the rows that are named', () => {
    const points = Float64Array.from([
      ...new Array(m).fill(0),
      ...new Array(m).fill(2),
      ...new Array(m).fill(Number.NaN),
    ]);
    expect(createHypervolume(3, m).volume(points, Int32Array.of(1, 2), 1, Float64Array.from(reference))).toBe(2 ** m);
  });
});

describe('hypervolume of fronts known in closed form, reference 1.1', () => {
  // A smooth front lies between two staircases on a grid: one of corners it dominates, one of corners that dominate it.
  // The volume that the front x_m = height(x_1 … x_(m−1)) leaves is closed in between.
  function bracket(m: number, steps: number, height: (x: number[]) => number): [number, number] {
    const inner: number[] = [];
    const outer: number[] = [];
    const visit = (cell: number[]): void => {
      if (cell.length < m - 1) {
        for (let at = 0; at <= steps; at++) visit([...cell, at]);
        return;
      }
      const low = cell.map((at) => at / steps);
      const high = cell.map((at) => (at + 1) / steps);
      if (!cell.includes(steps)) outer.push(...low, height(high));
      inner.push(...low, height(low));
    };
    visit([]);
    const reference = new Array<number>(m).fill(1.1);
    return [volume(inner, m, reference), volume(outer, m, reference)];
  }
  const ball = (x: number[]): number => Math.sqrt(Math.max(0, 1 - x.reduce((sum, v) => sum + v * v, 0)));
  const plane = (x: number[]): number => Math.max(0, 1 - x.reduce((sum, v) => sum + v, 0));

  // 1.1^m less the orthant of the unit ball (π/4, π/6, π²/32) or the simplex (1/2, 1/6, 1/24). ZDT and DTLZ values to six
  // digits: 0.876667, 0.543333 (Zitzler, Deb, Thiele 2000: the areas under 1 − √x and 1 − x²), 0.807401 and 1.164333 (Deb et al. 2002).
  it.each([
    ['ZDT1, m = 2', 2, 20000, ([x]: number[]) => 1 - Math.sqrt(x), 0.876667],
    ['ZDT2, m = 2', 2, 20000, ([x]: number[]) => 1 - x * x, 0.543333],
    ['DTLZ2, m = 2', 2, 20000, ball, 1.21 - Math.PI / 4],
    ['DTLZ2, m = 3', 3, 300, ball, 0.807401],
    ['DTLZ1, m = 3', 3, 300, plane, 1.164333],
    ['DTLZ2, m = 4', 4, 16, ball, 1.4641 - Math.PI ** 2 / 32],
    ['DTLZ1, m = 4', 4, 16, plane, 1.4641 - 1 / 24],
  ] as const)('%s', (_, m, steps, height, exact) => {
    const [low, high] = bracket(m, steps, height);
    expect(low).toBeLessThanOrEqual(exact + 5e-7);
    expect(high).toBeGreaterThanOrEqual(exact - 5e-7);
    expect(high - low).toBeLessThan(3.5 / steps);
  });
});

describe('hypervolume of 100,000 points', () => {
  it.each([2, 3])('grows from half of them to all, and is theirs in any order, m = %i', (m) => {
    const n = 100_000;
    const points = sphere(n, m, 5);
    const reference = new Float64Array(m).fill(1.1);
    const measure = createHypervolume(n, m);
    const whole = measure.volume(points, allRows(n), n, reference);
    expect(measure.volume(points, allRows(n), n / 2, reference)).toBeLessThan(whole);
    expect(measure.volume(points, allRows(n).reverse(), n, reference)).toBeCloseTo(whole, 10);
    expect(whole).toBeLessThan(1.1 ** m - (m === 2 ? Math.PI / 4 : Math.PI / 6));
    expect(whole).toBeGreaterThan(0.99 * (1.1 ** m - (m === 2 ? Math.PI / 4 : Math.PI / 6)));
  });

  it('is the same in both directions for 1,500 points of four objectives', () => {
    const m = 4;
    const n = 1500;
    const points = cube(n, m, 9);
    const reference = new Float64Array(m).fill(1);
    const measure = createHypervolume(n, m);
    const orders = [allRows(n), allRows(n).reverse()];
    const [forward, backward] = orders.map((rows) => measure.volume(points, rows, n, reference));
    expect(forward).toBeCloseTo(backward, 12);
  });
});
