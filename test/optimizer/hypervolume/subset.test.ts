import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createHypervolume, selectSubset } from '../../../optimizer/hypervolume/index.ts';
import { clouds } from '../oracles/clouds.ts';
import { allRows, sphere } from '../oracles/points.ts';
import { plainBestSubset, plainVolume } from '../oracles/volume.ts';

function chosen(rows: number[][], keep: number, reference: number[]): number[][] {
  const m = reference.length;
  const n = rows.length;
  const picked = selectSubset(Float64Array.from(rows.flat()), allRows(n), n, keep, Float64Array.from(reference), m);
  expect(picked).toHaveLength(Math.min(keep, n));
  return Array.from(picked ?? [], (row) => rows[row]);
}

describe('subset selection', () => {
  it('is exact in two objectives', () => {
    fc.assert(
      fc.property(clouds(2, 11), fc.integer({ min: 1, max: 6 }), (rows, keep) => {
        const volume = plainVolume(chosen(rows, keep, [4, 4]), [4, 4]);
        expect(volume).toBeCloseTo(plainBestSubset(rows, keep, [4, 4]), 9);
      }),
    );
  });

  it.each([3, 4])('reaches at least 1 − 1/e of the best in %i objectives, and all of it in most small cases', (m) => {
    // The bound of greedy inclusion for a submodular set function: Nemhauser, Wolsey, Fisher 1978.
    const reference = new Array<number>(m).fill(4);
    let exact = 0;
    let cases = 0;
    fc.assert(
      fc.property(clouds(m, 8), fc.integer({ min: 1, max: 4 }), (rows, keep) => {
        const best = plainBestSubset(rows, keep, reference);
        const volume = plainVolume(chosen(rows, keep, reference), reference);
        expect(volume).toBeGreaterThanOrEqual((1 - 1 / Math.E) * best - 1e-9);
        cases++;
        if (volume >= best * (1 - 1e-9)) exact++;
      }),
      { numRuns: 60 },
    );
    expect(exact / cases).toBeGreaterThan(0.9);
  });

  it('chooses 100 points of the ZDT1 front with 0.9948 of its hypervolume', () => {
    // 0.9948 is the most that any 100 points can have; 0.876667 the front's own hypervolume at reference 1.1.
    const rows = Array.from({ length: 2001 }, (_, i) => [i / 2000, 1 - Math.sqrt(i / 2000)]);
    const picked = chosen(rows, 100, [1.1, 1.1]);
    const volume = createHypervolume(100, 2).volume(
      Float64Array.from(picked.flat()),
      allRows(100),
      100,
      Float64Array.of(1.1, 1.1),
    );
    expect(volume / 0.876667).toBeGreaterThanOrEqual(0.9948);
    expect(volume / 0.876667).toBeLessThan(0.995);
  });

  it('chooses 100 points of the DTLZ2 front with 0.9385 of its hypervolume', () => {
    // 0.9390 is the most that any 100 points can have; 0.807401 the front's own hypervolume at reference 1.1. A quarter of the 4000 candidates lie
    // on the front's edges, where the best choices put many.
    const n = 4000;
    const points = sphere(n, 3, 1);
    for (let i = 0; i < n / 4; i++) {
      const row = points.subarray(3 * i, 3 * i + 3);
      row[i % 3] = 0;
      const length = Math.sqrt(row.reduce((sum, v) => sum + v * v, 0));
      for (let c = 0; c < 3; c++) row[c] /= length;
    }
    const reference = new Float64Array(3).fill(1.1);
    const picked = selectSubset(points, allRows(n), n, 100, reference, 3) ?? new Int32Array(0);
    const share = createHypervolume(n, 3).volume(points, picked, 100, reference) / 0.807401;
    expect(share).toBeGreaterThanOrEqual(0.9385);
    expect(share).toBeLessThan(0.9395);
  });

  it('fills up with rows that add nothing, in their order, and is the same every time', () => {
    expect(
      chosen(
        [
          [9, 9],
          [1, 1],
          [2, 2],
        ],
        2,
        [4, 4],
      ),
    ).toEqual([
      [9, 9],
      [1, 1],
    ]);
    expect(chosen([[1, 1, 1]], 3, [4, 4, 4])).toEqual([[1, 1, 1]]);
    expect(chosen([], 3, [4, 4, 4])).toEqual([]);
    const points = sphere(400, 3, 8);
    const reference = new Float64Array(3).fill(1.1);
    const twice = [0, 1].map(() => selectSubset(points, allRows(400), 400, 20, reference, 3));
    expect(twice[0]).toEqual(twice[1]);
  });

  it('is undefined when a value is not finite', () => {
    const points = Float64Array.of(1, 1, Number.POSITIVE_INFINITY, 0);
    expect(selectSubset(points, allRows(2), 2, 1, Float64Array.of(4, 4), 2)).toBeUndefined();
  });
});
