/**
 * The sample of evaluated designs: a set of the k smallest hashes, so it knows neither order nor repetition (bottom-k sampling, Cohen, Kaplan, PODC 2007), and
 * merging samples is the same as sampling everything.
 */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createSampler, type DesignSample } from '../../../optimizer/archive/index.ts';

const BOUND = 20;
/** Designs of two genes; objectives and family follow from the genes, as they do in a problem. */
const designs = fc.array(fc.tuple(fc.integer({ min: 0, max: 60 }), fc.integer({ min: -3, max: 3 })), {
  maxLength: 120,
});
type Rows = readonly (readonly [number, number])[];

function sampleOf(rows: Rows, bound = BOUND): DesignSample {
  const sampler = createSampler(2, 2, bound);
  for (const [a, b] of rows) {
    sampler.offer(Float64Array.of(a, b), Float64Array.of(a + b, a - b), Int32Array.of(a % 4), 0);
  }
  return sampler.pack();
}

function join(samples: readonly DesignSample[], bound = BOUND): DesignSample {
  const sampler = createSampler(2, 2, bound);
  for (const sample of samples) sampler.addAll(sample);
  return sampler.pack();
}

describe('a sample', () => {
  it('depends on the set of designs alone: not on order, not on repetition', () => {
    fc.assert(
      fc.property(designs, (rows) => {
        expect(sampleOf([...rows].reverse())).toEqual(sampleOf(rows));
        expect(sampleOf([...rows, ...rows])).toEqual(sampleOf(rows));
      }),
    );
  });

  it('of parts joined, in any order, with repetition, is the sample of the whole', () => {
    fc.assert(
      fc.property(designs, designs, designs, (a, b, c) => {
        const whole = sampleOf([...a, ...b, ...c]);
        const [x, y, z] = [a, b, c].map((rows) => sampleOf(rows));
        expect(join([x, y, z])).toEqual(whole);
        expect(join([z, y, x, y])).toEqual(whole);
        expect(join([join([x, z]), y])).toEqual(whole);
        expect(join([whole, whole])).toEqual(whole);
      }),
    );
  });

  it('is as new once it has forgotten all', () => {
    fc.assert(
      fc.property(designs, designs, (a, b) => {
        const sampler = createSampler(2, 2, BOUND);
        sampler.addAll(sampleOf(a));
        sampler.clear();
        sampler.addAll(sampleOf(b));
        expect(sampler.view()).toEqual(sampleOf(b));
        expect(sampler.pack()).toEqual(sampleOf(b));
      }),
    );
  });

  it('holds every distinct design while there is room, and never more than its bound', () => {
    fc.assert(
      fc.property(designs, (rows) => {
        const distinct = new Set(rows.map(([a, b]) => `${a + b} ${a - b}`));
        const { count, keys, objectives } = sampleOf(rows);
        expect(count).toBe(Math.min(BOUND, distinct.size));
        expect([...keys]).toEqual([...new Set(keys)].sort((p, q) => p - q));
        for (let k = 0; k < count; k++) expect(distinct).toContain(`${objectives[2 * k]} ${objectives[2 * k + 1]}`);
      }),
    );
  });

  it('takes a negative zero for zero', () => {
    expect(sampleOf([[-0, 1]])).toEqual(sampleOf([[0, 1]]));
  });

  it('is fair: of 20,000 designs in a row, a sample of 2,000 has half in the first half', () => {
    const rows: [number, number][] = Array.from({ length: 20_000 }, (_, i) => [i, 0]);
    const { objectives } = sampleOf(rows, 2000);
    const first = Array.from({ length: 2000 }, (_, k) => objectives[2 * k]).filter((value) => value < 10_000).length;
    // Hypergeometric: standard deviation √(2000 · ¼ · 0.9) = 21.
    expect(Math.abs(first - 1000)).toBeLessThan(4 * 21.3);
  });
});
