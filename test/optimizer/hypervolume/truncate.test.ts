import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createHypervolume, createTruncation } from '../../../optimizer/hypervolume/index.ts';
import { allRows, sphere, toRows } from '../oracles/points.ts';
import { plainContributions } from '../oracles/volume.ts';

/** Drops the least contributor, the last among equals, until `keep` remain; kept in order, then the dropped, last dropped first. */
function plainTruncation(rows: number[][], keep: number, reference: number[]): number[] {
  const left = rows.map((_, i) => i);
  const dropped: number[] = [];
  while (left.length > keep) {
    const values = plainContributions(
      left.map((i) => rows[i]),
      reference,
    );
    const at = values.lastIndexOf(Math.min(...values));
    dropped.unshift(...left.splice(at, 1));
  }
  return [...left, ...dropped];
}

describe.each([2, 3, 4])('truncation in %i objectives', (m) => {
  const reference = new Array<number>(m).fill(5);

  it('drops least contributors one by one, ties from the end, for whole numbers (no rounding)', () => {
    const value = fc.integer({ min: 0, max: 6 });
    const rows = fc.array(fc.array(value, { minLength: m, maxLength: m }), { maxLength: 12 });
    fc.assert(
      fc.property(rows, fc.nat(12), (points, keep) => {
        const n = points.length;
        const order = allRows(n);
        const kept = createTruncation(n, m).truncate(
          Float64Array.from(points.flat()),
          order,
          n,
          keep,
          Float64Array.from(reference),
        );
        expect(kept).toBe(Math.min(keep, n));
        expect(Array.from(order)).toEqual(plainTruncation(points, keep, reference));
      }),
      { numRuns: 300 },
    );
  });

  it('names the row it would drop first', () => {
    const points = sphere(30, m, 4);
    const corner = new Float64Array(m).fill(1.1);
    const order = allRows(30);
    const truncation = createTruncation(30, m);
    const least = truncation.least(points, order, 30, corner);
    truncation.truncate(points, order, 30, 29, corner);
    expect(order[29]).toBe(least);
    const values = plainContributions(toRows(points, m).slice(0, 30), Array.from(corner));
    expect(least).toBe(values.indexOf(Math.min(...values)));
  });

  it('leaves more hypervolume than the same number of points in a row', () => {
    const n = m === 4 ? 60 : 200;
    const points = sphere(n, m, 6);
    const corner = new Float64Array(m).fill(1.1);
    const order = allRows(n);
    createTruncation(n, m).truncate(points, order, n, n / 2, corner);
    const measure = createHypervolume(n, m);
    expect(measure.volume(points, order, n / 2, corner)).toBeGreaterThan(
      measure.volume(points, allRows(n), n / 2, corner),
    );
  });

  it('refuses what is not finite with −1, rows untouched', () => {
    const points = Float64Array.from([...new Array(2 * m - 1).fill(1), Number.NaN]);
    const order = Int32Array.of(1, 0);
    const truncation = createTruncation(2, m);
    expect(truncation.truncate(points, order, 2, 1, Float64Array.from(reference))).toBe(-1);
    expect(truncation.least(points, order, 2, Float64Array.from(reference))).toBe(-1);
    expect(Array.from(order)).toEqual([1, 0]);
  });
});
