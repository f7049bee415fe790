/** Laws of the operators: children stay in range and on their kind, spreads are those of the sources, shares add up. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Gene } from '../../../optimizer/index.ts';
import { restoreRandom, seedRandom } from '../../../optimizer/random.ts';
import {
  contain,
  createSpace,
  crossover,
  differential,
  drawOperator,
  graft,
  learn,
  mutate,
  proportion,
  refineMember,
  toCoordinates,
  toGenes,
} from '../../../optimizer/variation/index.ts';

const gene = fc.oneof(
  fc
    .tuple(fc.double({ min: -1e6, max: 1e6, noNaN: true }), fc.double({ min: 0, max: 1e6, noNaN: true }))
    .map(([low, span]): Gene => ({ name: 'r', unit: '', kind: 'real', low, high: low + span })),
  fc
    .tuple(fc.double({ min: 1e-12, max: 1e6, noNaN: true }), fc.double({ min: 1, max: 1e9, noNaN: true }))
    .map(([low, ratio]): Gene => ({ name: 'l', unit: '', kind: 'log', low, high: low * ratio })),
  fc
    .tuple(fc.integer({ min: -50, max: 50 }), fc.nat(100))
    .map(([low, span]): Gene => ({ name: 'w', unit: '', kind: 'whole', low, high: low + span })),
  fc.nat(9).map((high): Gene => ({ name: 'c', unit: '', kind: 'choice', low: 0, high })),
);
const genes = fc.array(gene, { minLength: 1, maxLength: 6 });
const stream = (seed: number) => restoreRandom(seedRandom(seed, 0, 0));

describe('every operator', () => {
  it('gives, contained, a child inside its ranges, whole where it must be', () => {
    fc.assert(
      fc.property(genes, fc.nat(), fc.constantFrom(0, 1, 2, 3, 4), (list, seed, kind) => {
        const space = createSpace(list);
        const { n } = space;
        const random = stream(seed);
        const pool = new Float64Array(4 * n);
        for (let row = 0; row < 3; row++) {
          const design = Float64Array.from(list, ({ low, high, kind: k }) =>
            k === 'real' || k === 'log' ? low + (high - low) * random.uniform() : low + random.whole(high - low + 1),
          );
          toCoordinates(space, design, 0, pool, row * n);
        }
        const parents = Int32Array.of(0, 1, 2);
        if (kind === 2) refineMember(space, pool, pool, 0, pool, 3 * n, random);
        else {
          const operator = [crossover, differential, differential, graft, proportion][kind];
          operator(space, pool, parents, pool, 3 * n, random);
        }
        mutate(space, pool, 3 * n, 0.5, random);
        contain(space, pool, 0, pool, 3 * n, random);
        const child = new Float64Array(n);
        toGenes(space, pool, 3 * n, child, 0);
        list.forEach(({ low, high, kind: k }, g) => {
          expect(child[g]).toBeGreaterThanOrEqual(low);
          expect(child[g]).toBeLessThanOrEqual(high);
          if (k === 'whole' || k === 'choice') expect(Number.isInteger(child[g])).toBe(true);
        });
      }),
    );
  });

  it('goes there and back between genes and coordinates', () => {
    const space = createSpace([
      { name: 'a', unit: '', kind: 'real', low: -3, high: 5 },
      { name: 'b', unit: '', kind: 'log', low: 1e-9, high: 1e-3 },
      { name: 'c', unit: '', kind: 'whole', low: 2, high: 7 },
    ]);
    const there = new Float64Array(3);
    const back = new Float64Array(3);
    toCoordinates(space, Float64Array.of(1, 1e-6, 4), 0, there, 0);
    expect([there[0], there[2]]).toEqual([0.5, 4]);
    // Half-way along six decades.
    expect(there[1]).toBeCloseTo(0.5, 14);
    toGenes(space, there, 0, back, 0);
    expect(back[1] / 1e-6).toBeCloseTo(1, 13);
  });
});

describe('spread', () => {
  const line = createSpace([{ name: 'x', unit: '', kind: 'real', low: 0, high: 1 }]);

  it('of simulated binary crossover: children keep the mean of the parents, half of the moved ones lie between', () => {
    const random = stream(1);
    const pool = Float64Array.of(0.4, 0.6, 0);
    let sum = 0;
    let moved = 0;
    let between = 0;
    for (let k = 0; k < 40_000; k++) {
      const first = k % 2;
      crossover(line, pool, Int32Array.of(first, 1 - first), pool, 2, random);
      sum += pool[2];
      if (pool[2] === pool[first]) continue;
      moved++;
      if (pool[2] > 0.4 && pool[2] < 0.6) between++;
    }
    // Deb, Agrawal 1995: contracting and expanding crossovers are equally likely.
    expect(sum / 40_000).toBeCloseTo(0.5, 2);
    expect(between / moved).toBeCloseTo(0.5, 1);
  });

  it('of differential variation: nothing moves without difference', () => {
    const pool = Float64Array.of(0.3, 0.7, 0.7, 9);
    differential(line, pool, Int32Array.of(0, 1, 2), pool, 3, stream(2));
    expect(pool[3]).toBe(0.3);
  });

  it('of mutation: one gene in n on average, every option of a choice alike', () => {
    const space = createSpace(
      Array.from({ length: 10 }, () => ({ name: 'c', unit: '', kind: 'choice' as const, low: 0, high: 4 })),
    );
    const random = stream(3);
    const counts = [0, 0, 0, 0, 0];
    for (let k = 0; k < 10_000; k++) {
      const child = new Float64Array(10).fill(2);
      mutate(space, child, 0, 0.1, random);
      for (const option of child) counts[option]++;
    }
    const changed = 100_000 - counts[2];
    expect(changed / 10_000).toBeCloseTo(1, 1);
    for (const option of [0, 1, 3, 4]) expect(counts[option] / changed).toBeCloseTo(0.25, 1);
  });
});

describe('coupled moves', () => {
  const space = createSpace([
    { name: 'frequency', unit: 'Hz', kind: 'log', low: 1e4, high: 1e6 },
    { name: 'inductance', unit: 'H', kind: 'log', low: 1e-7, high: 1e-4 },
    { name: 'fixed', unit: '', kind: 'whole', low: 3, high: 3 },
    { name: 'count', unit: '', kind: 'whole', low: 1, high: 20 },
    { name: 'part', unit: '', kind: 'whole', low: 0, high: 9, options: Array.from({ length: 10 }, (_, k) => `p${k}`) },
  ]);
  const pool = Float64Array.of(0.2, 0.4, 3, 10, 2, 0.7, 0.9, 3, 15, 8, 0, 0, 0, 0, 0);
  const at = 10;

  it('of grafting: every gene comes from one of the parents, those of the second in one run of genes that can vary', () => {
    const random = stream(4);
    let some = 0;
    for (let k = 0; k < 2000; k++) {
      graft(space, pool, Int32Array.of(0, 1, 1), pool, at, random);
      const fromSecond = [0, 1, 3, 4].map((g) => pool[at + g] === pool[5 + g]);
      fromSecond.forEach((second, i) => {
        if (!second) expect(pool[at + [0, 1, 3, 4][i]]).toBe(pool[[0, 1, 3, 4][i]]);
      });
      // Round the circle of live genes, second-parent genes begin at most once.
      const starts = fromSecond.filter((second, i) => second && !fromSecond[(i + 3) % 4]).length;
      expect(starts).toBeLessThanOrEqual(1);
      if (starts === 1) some++;
    }
    expect(some).toBeGreaterThan(1000);
  });

  it('of proportion: quantities that move do so by one common factor, up or down', () => {
    const random = stream(5);
    let together = 0;
    let opposite = 0;
    for (let k = 0; k < 2000; k++) {
      proportion(space, pool, Int32Array.of(0, 1, 1), pool, at, random);
      const first = (pool[at] - pool[0]) * space.span[0];
      const second = (pool[at + 1] - pool[1]) * space.span[1];
      expect(pool[at + 2]).toBe(3);
      if (first === 0 || second === 0) continue;
      together++;
      if (first * second < 0) opposite++;
      expect(Math.abs(first)).toBeCloseTo(Math.abs(second), 10);
      expect(Math.abs(first)).toBeLessThan(0.68);
    }
    expect(together / 2000).toBeCloseTo(0.25, 1);
    expect(opposite / together).toBeCloseTo(0.5, 1);
  });
});

describe('operator shares', () => {
  it('add up to one, with a floor, a ceiling and more for the better', () => {
    const shares = new Float64Array(4).fill(0.25);
    const quality = new Float64Array(4).fill(0.5);
    for (let k = 0; k < 100; k++) {
      learn(shares, quality, new Float64Array(4).fill(10), Float64Array.of(8, 0, 1, 9), [1, 1, 1, 0.12]);
    }
    expect(shares.reduce((sum, share) => sum + share, 0)).toBeCloseTo(1, 12);
    expect(shares[3]).toBeLessThanOrEqual(0.12);
    expect(shares[1]).toBeGreaterThanOrEqual(0.1);
    expect(shares[0]).toBeGreaterThan(shares[2]);
    expect(shares[2]).toBeGreaterThan(shares[1]);
  });

  it('are drawn in proportion', () => {
    const shares = Float64Array.of(0.2, 0.5, 0.3);
    expect([0, 0.19, 0.21, 0.69, 0.71, 0.999].map((u) => drawOperator(shares, u))).toEqual([0, 0, 1, 1, 2, 2]);
  });
});
