import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createRowOrder } from '../../../optimizer/ranking/order.ts';
import { clouds } from '../oracles/clouds.ts';
import { cube } from '../oracles/points.ts';

function sorted(points: Float64Array, m: number, column: number): number[] {
  const n = points.length / m;
  const order = new Int32Array(n);
  createRowOrder(Math.max(1, n)).sort(points, m, column, n, order);
  return Array.from(order);
}

function plainSorted(points: Float64Array, m: number, column: number): number[] {
  const key = (row: number, k: number): number => points[row * m + ((column + k) % m)];
  return Array.from({ length: points.length / m }, (_, i) => i).sort((a, b) => {
    for (let k = 0; k < m; k++) if (key(a, k) !== key(b, k)) return key(a, k) - key(b, k);
    return a - b;
  });
}

describe('row order', () => {
  it('is by the column, then the columns after it, then row number', () => {
    fc.assert(
      fc.property(clouds(3, 120), fc.integer({ min: 0, max: 2 }), (rows, column) => {
        const points = Float64Array.from(rows.flat());
        expect(sorted(points, 3, column)).toEqual(plainSorted(points, 3, column));
      }),
    );
  });

  it.each([
    ['even values', (x: number) => x],
    ['values crowded near zero', (x: number) => x ** 40],
    ['one outlier of 1e300', (x: number) => (x > 0.9999 ? 1e300 : x)],
    ['both ends of the doubles', (x: number) => (2 * x - 1) * 1.7e308],
    ['denormal values', (x: number) => x * 1e-310],
    ['ten distinct values', (x: number) => Math.floor(10 * x)],
  ])('holds for 5000 rows of %s', (_, shape) => {
    const points = cube(5000, 2, 3).map(shape);
    expect(sorted(points, 2, 0)).toEqual(plainSorted(points, 2, 0));
  });
});
