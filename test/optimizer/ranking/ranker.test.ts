import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createBitsetRanking } from '../../../optimizer/ranking/bitsets.ts';
import { createDivideRanking } from '../../../optimizer/ranking/divide.ts';
import { createRanker } from '../../../optimizer/ranking/index.ts';
import { clouds } from '../oracles/clouds.ts';
import { dominates, plainFronts } from '../oracles/fronts.ts';
import { cube, generator, sphere } from '../oracles/points.ts';

const OBJECTIVES = [2, 3, 4] as const;

function rank(points: ArrayLike<number>, m: number): { ranks: number[]; fronts: number } {
  const n = points.length / m;
  const ranks = new Int32Array(n);
  const fronts = createRanker(Math.max(1, n), m).rank(Float64Array.from(points), n, ranks);
  return { ranks: Array.from(ranks), fronts };
}

describe.each(OBJECTIVES)('fronts of %i objectives', (m) => {
  it('are those of the definition, with ties, duplicates, single fronts and values of any size', () => {
    fc.assert(
      fc.property(clouds(m, 40), (rows) => {
        const { ranks, fronts } = rank(rows.flat(), m);
        const expected = plainFronts(rows.flat(), m, rows.length);
        expect(ranks).toEqual(expected);
        expect(fronts).toBe(1 + Math.max(-1, ...expected));
      }),
      { numRuns: 400 },
    );
  });

  it('are those of the definition for 400 points of the cube', () => {
    const points = cube(400, m, 7);
    expect(rank(points, m).ranks).toEqual(plainFronts(points, m, 400));
  });

  it('number one for no rows at all, and one for a single row', () => {
    expect(rank([], m)).toEqual({ ranks: [], fronts: 0 });
    expect(rank(new Array(m).fill(3), m)).toEqual({ ranks: [0], fronts: 1 });
  });

  it('are one when all points lie on one front', () => {
    expect(rank(sphere(2000, m, 3), m).fronts).toBe(1);
  });

  it('are as many as the points of a chain, first to last', () => {
    const chain = Array.from({ length: 500 * m }, (_, k) => Math.floor(k / m));
    expect(rank(chain, m).ranks).toEqual(Array.from({ length: 500 }, (_, i) => i));
  });

  it('are shared by equal rows', () => {
    const rows = Array.from(cube(100, m, 5));
    const { ranks } = rank([...rows, ...rows, ...rows], m);
    for (let i = 0; i < 100; i++) expect([ranks[i + 100], ranks[i + 200]]).toEqual([ranks[i], ranks[i]]);
  });

  it.each([Number.NaN, Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY])(
    'refuse %d with −1 and leave the ranks alone',
    (bad) => {
      const points = cube(10, m, 1);
      points[10 * m - 1] = bad;
      const ranks = new Int32Array(10).fill(77);
      expect(createRanker(10, m).rank(points, 10, ranks)).toBe(-1);
      expect(Array.from(ranks)).toEqual(new Array(10).fill(77));
    },
  );

  it('do not depend on the order of the rows', () => {
    const points = cube(5000, m, 11);
    const reversed = points.slice();
    for (let i = 0; i < 5000; i++) reversed.set(points.subarray(i * m, i * m + m), (4999 - i) * m);
    expect(rank(reversed, m).ranks).toEqual(rank(points, m).ranks.toReversed());
  });

  it('hold the law of fronts for 100,000 points: beaten by one of the front before, by none of its own', () => {
    const n = 100_000;
    const points = cube(n, m, 13);
    const { ranks, fronts } = rank(points, m);
    const members = Array.from({ length: fronts }, () => [] as number[]);
    ranks.forEach((front, i) => {
      members[front].push(i);
    });
    expect(members.every((front) => front.length > 0)).toBe(true);
    const draw = generator(17);
    for (let k = 0; k < 300; k++) {
      const i = Math.floor(draw() * n);
      const own = members[ranks[i]].some((j) => dominates(points, m, j, i));
      const before = ranks[i] === 0 || members[ranks[i] - 1].some((j) => dominates(points, m, j, i));
      expect({ own, before }).toEqual({ own: false, before: true });
    }
  });
});

describe('the two ways to rank three and four objectives', () => {
  it.each([3, 4])('agree on 3000 distinct rows with many equal coordinates, m = %i', (m) => {
    const n = 3000;
    const draw = generator(m);
    const rows = new Set<string>();
    while (rows.size < n) rows.add(Array.from({ length: m }, () => String(10 + Math.floor(draw() * 30))).join());
    const sorted = [...rows].sort().map((row) => row.split(',').map(Number));
    const columns = Array.from({ length: m }, (_, c) => Int32Array.from(sorted, (row) => row[c]));
    const orders = columns.map((column) => Int32Array.from(sorted.keys()).sort((a, b) => column[a] - column[b]));
    const byBits = new Int32Array(n);
    const byHalves = new Int32Array(n);
    createBitsetRanking(n, 0).raise(columns, orders, n, byBits);
    createDivideRanking(n, m).raise(columns, n, byHalves);
    expect(Array.from(byHalves)).toEqual(Array.from(byBits));
  });
});
