import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createConstrainedRanker } from '../../../optimizer/ranking/index.ts';
import { clouds } from '../oracles/clouds.ts';
import { dominates } from '../oracles/fronts.ts';

function rank(rows: number[][], violation: number[], epsilon: number): { ranks: number[]; fronts: number } {
  const m = 2;
  const ranks = new Int32Array(rows.length).fill(-7);
  const ranker = createConstrainedRanker(Math.max(1, rows.length), m);
  const fronts = ranker.rank(Float64Array.from(rows.flat()), Float64Array.from(violation), epsilon, rows.length, ranks);
  return { ranks: Array.from(ranks), fronts };
}

describe('constrained fronts', () => {
  it('peel off by constraint domination: feasible before infeasible, less violation before more (Deb et al. 2002, section VI)', () => {
    const cases = clouds(2, 24).chain((rows) =>
      fc.record({
        rows: fc.constant(rows),
        violation: fc.array(fc.constantFrom(0, 0, 0.1, 0.2, 0.3, 2), {
          minLength: rows.length,
          maxLength: rows.length,
        }),
        epsilon: fc.constantFrom(0, 0.1, 0.25),
      }),
    );
    fc.assert(
      fc.property(cases, ({ rows, violation, epsilon }) => {
        const beats = (a: number, b: number): boolean => {
          const [holdsA, holdsB] = [violation[a] <= epsilon, violation[b] <= epsilon];
          if (holdsA && holdsB) return dominates(rows.flat(), 2, a, b);
          return holdsA !== holdsB ? holdsA : violation[a] < violation[b];
        };
        const { ranks } = rank(rows, violation, epsilon);
        for (let a = 0; a < rows.length; a++) {
          for (let b = 0; b < rows.length; b++) if (beats(a, b)) expect(ranks[a]).toBeLessThan(ranks[b]);
          if (ranks[a] === 0) continue;
          expect(rows.some((_, b) => ranks[b] === ranks[a] - 1 && beats(b, a))).toBe(true);
        }
      }),
    );
  });

  it('do not read the objectives of infeasible rows, and put an infinite violation last', () => {
    const rows = [
      [1, 1],
      [Number.NaN, 0],
      [0, 2],
      [9, 9],
    ];
    expect(rank(rows, [0, Number.POSITIVE_INFINITY, 0, 0.5], 0)).toEqual({ ranks: [0, 2, 0, 1], fronts: 3 });
  });

  it('refuse a NaN violation or a feasible row that is not finite with −1, ranks untouched', () => {
    const untouched = { ranks: [-7, -7], fronts: -1 };
    expect(
      rank(
        [
          [1, 1],
          [2, 2],
        ],
        [0, Number.NaN],
        0,
      ),
    ).toEqual(untouched);
    expect(
      rank(
        [
          [1, 1],
          [2, Number.NaN],
        ],
        [0, 0],
        0,
      ),
    ).toEqual(untouched);
  });
});
