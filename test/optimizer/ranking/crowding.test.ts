import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createCrowding } from '../../../optimizer/ranking/index.ts';
import { allRows } from '../oracles/points.ts';

function crowding(points: number[][], rows = Array.from(points.keys())): number[] {
  const distance = new Float64Array(rows.length);
  const m = points[0]?.length ?? 2;
  createCrowding(Math.max(1, rows.length), m).measure(
    Float64Array.from(points.flat()),
    Int32Array.from(rows),
    rows.length,
    distance,
  );
  return Array.from(distance);
}

describe('crowding distance', () => {
  it('is the gap of the neighbours over the range, summed over objectives; the ends are infinite', () => {
    // Worked by hand: objective 1 spans 10 and objective 2 spans 10; the second row has neighbours (0, 10) and (6, 3).
    expect(
      crowding([
        [0, 10],
        [2, 5],
        [6, 3],
        [10, 0],
      ]),
    ).toEqual([Number.POSITIVE_INFINITY, 6 / 10 + 7 / 10, 8 / 10 + 5 / 10, Number.POSITIVE_INFINITY]);
  });

  it('reads only the rows that are named', () => {
    const points = [
      [99, 99],
      [0, 2],
      [1, 1],
      [50, 50],
      [2, 0],
    ];
    expect(crowding(points, [2, 1, 4])).toEqual([2, Number.POSITIVE_INFINITY, Number.POSITIVE_INFINITY]);
  });

  it('is 0 where all rows are equal, and for none or one', () => {
    expect(
      crowding([
        [1, 2, 3],
        [1, 2, 3],
        [1, 2, 3],
      ]),
    ).toEqual([0, 0, 0]);
    expect(crowding([])).toEqual([]);
    expect(crowding([[4, 4]])).toEqual([0]);
  });

  it('of a front in two objectives adds up, ends aside, to at most 4', () => {
    // Each gap between neighbours is counted by the two rows beside it, in each of the two objectives, and the gaps of one make up its range.
    fc.assert(
      fc.property(fc.uniqueArray(fc.double({ min: 0, max: 1, noNaN: true }), { minLength: 3, maxLength: 40 }), (xs) => {
        const inner = crowding(xs.map((x) => [x, 1 - x])).filter(Number.isFinite);
        expect(inner.reduce((sum, d) => sum + d, 0)).toBeLessThanOrEqual(4 + 1e-9);
      }),
    );
  });

  it('refuses what is not finite', () => {
    const distance = new Float64Array(2).fill(5);
    expect(createCrowding(2, 2).measure(Float64Array.of(0, 1, Number.NaN, 2), allRows(2), 2, distance)).toBe(false);
    expect(Array.from(distance)).toEqual([5, 5]);
  });
});
