import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  createNearMisses,
  type Designs,
  insertAllNearMisses,
  type NearMissDesigns,
  type NearMisses,
  type NearMissGrid,
  packNearMisses,
  selectNearMisses,
} from '../../../optimizer/archive/index.ts';
import { dominates } from '../oracles/fronts.ts';
import { generator } from '../oracles/points.ts';

const GRID: NearMissGrid = {
  genes: 1,
  objectives: 2,
  violations: 3,
  ideal: Float64Array.of(0, 0),
  reference: Float64Array.of(4, 4),
  share: 0.5,
};

interface Shown {
  readonly genes: number[];
  readonly objectives: number[];
  readonly violations: number[];
}

function designsOf(list: readonly Shown[]): Designs {
  return {
    count: list.length,
    genes: Float64Array.from(list.flatMap((d) => d.genes)),
    objectives: Float64Array.from(list.flatMap((d) => d.objectives)),
    violations: Float64Array.from(list.flatMap((d) => d.violations)),
  };
}

function filled(list: readonly Shown[]): NearMisses {
  const near = createNearMisses(GRID);
  insertAllNearMisses(near, designsOf(list));
  return near;
}

function bytes(near: NearMisses): string {
  const { genes, objectives, violations, limit } = packNearMisses(near);
  return [genes, objectives, violations, limit]
    .map((a) => Buffer.from(a.buffer, a.byteOffset, a.byteLength).toString('hex'))
    .join('|');
}

const value = fc.constantFrom(-0, 0, 0.5, 1, 2, 3, 3.5);
const violation = fc.constantFrom(0, 0, 0, 0.02, 0.1, 0.3, 0.5, 0.6);
const shown = fc.array(
  fc.record({
    genes: fc.array(value, { minLength: 1, maxLength: 1 }),
    objectives: fc.array(value, { minLength: 2, maxLength: 2 }),
    violations: fc.array(violation, { minLength: 3, maxLength: 3 }),
  }),
  { maxLength: 40 },
);

function rowsOf(held: NearMissDesigns): { limit: number; objectives: number[]; violation: number }[] {
  return Array.from(held.limit, (limit, i) => ({
    limit,
    objectives: Array.from(held.objectives.subarray(2 * i, 2 * i + 2)),
    violation: held.violations[3 * i + limit],
  }));
}

describe('near misses', () => {
  it('are the same bytes whatever the order of arrival or merging', () => {
    const shuffles = shown.chain((list) =>
      fc.tuple(fc.constant(list), fc.shuffledSubarray(list, { minLength: list.length }), fc.nat(list.length)),
    );
    fc.assert(
      fc.property(shuffles, ([list, shuffled, cut]) => {
        const whole = bytes(filled(list));
        expect(bytes(filled(shuffled))).toBe(whole);
        const parts = [filled(list.slice(cut)), filled(list.slice(0, cut)), filled(list)];
        const merged = createNearMisses(GRID);
        for (const part of parts) insertAllNearMisses(merged, packNearMisses(part));
        expect(bytes(merged)).toBe(whole);
      }),
      { numRuns: 300 },
    );
  });

  it('break exactly the one limit they are filed under, by at most the share', () => {
    fc.assert(
      fc.property(shown, (list) => {
        const held = packNearMisses(filled(list));
        for (let i = 0; i < held.count; i++) {
          const violations = Array.from(held.violations.subarray(3 * i, 3 * i + 3));
          expect(violations.flatMap((v, k) => (v > 0 ? [k] : []))).toEqual([held.limit[i]]);
          expect(violations[held.limit[i]]).toBeLessThanOrEqual(0.5);
        }
      }),
    );
  });

  it('never hold a design that another one shown beats without missing by more', () => {
    fc.assert(
      fc.property(shown, (list) => {
        for (const held of rowsOf(packNearMisses(filled(list)))) {
          const beaten = list.some((d) => {
            const broken = d.violations.flatMap((v, k) => (v > 0 ? [k] : []));
            if (broken.length !== 1 || broken[0] !== held.limit || d.violations[held.limit] > held.violation)
              return false;
            return dominates([...d.objectives, ...held.objectives], 2, 0, 1);
          });
          expect(beaten).toBe(false);
        }
      }),
    );
  });

  it('spread along the trade-off of each limit, up to its ends', () => {
    const draw = generator(5);
    const list = Array.from({ length: 2000 }, (_, i) => {
      // A quarter circle, its points spread about evenly.
      const t = draw();
      const worse = 1 + 0.1 * draw();
      return {
        genes: [i],
        objectives: [(4 * worse * (1 - t * t)) / (1 + t * t), (4 * worse * 2 * t) / (1 + t * t)],
        violations: [0, 1, 2].map((k) => (k === i % 3 ? 0.5 * draw() + 1e-6 : 0)),
      };
    });
    const held = rowsOf(packNearMisses(filled(list)));
    for (const limit of [0, 1, 2]) {
      const own = held.filter((d) => d.limit === limit);
      // Three bands of fifteen directions.
      expect(own.length).toBeLessThanOrEqual(45);
      expect(own.length).toBeGreaterThan(15);
      for (const c of [0, 1]) {
        // The outermost directions weigh the other objective at a hundredth, so an end is met to some hundredths of the range of 4.
        expect(Math.min(...own.map((d) => d.objectives[c]))).toBeLessThan(0.12);
      }
    }
  });

  it('are told apart by what the feasible front already reaches', () => {
    const near = filled([
      { genes: [1], objectives: [1, 1], violations: [0.1, 0, 0] },
      { genes: [2], objectives: [0.2, 3], violations: [0, 0.1, 0] },
    ]);
    const front = designsOf([{ genes: [9], objectives: [1, 0.5], violations: [0, 0, 0] }]);
    const left = selectNearMisses(near, front);
    expect([left.count, Array.from(left.genes), Array.from(left.limit)]).toEqual([1, [2], [1]]);
    expect(selectNearMisses(near, designsOf([])).count).toBe(2);
  });

  it.each([
    ['a feasible design', [1, 1], [0, 0, 0]],
    ['two broken limits', [1, 1], [0.1, 0.1, 0]],
    ['a limit missed by more than the share', [1, 1], [0.51, 0, 0]],
    ['a violation that is NaN', [1, 1], [0.1, Number.NaN, 0]],
    ['an infinite violation', [1, 1], [Number.POSITIVE_INFINITY, 0, 0]],
    ['an objective that is not finite', [1, Number.POSITIVE_INFINITY], [0.1, 0, 0]],
  ])('do not take %s', (_, objectives, violations) => {
    expect(packNearMisses(filled([{ genes: [0], objectives, violations }])).count).toBe(0);
  });
});
