/**
 * Joining runs: a matter of sets. Any order, any grouping, any repetition gives the same bytes, and what is held does not grow with the number of shards but for a
 * line each. Shards here are synthetic: 1,000 designs around a curved front of the toy problem.
 */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Found } from '../../runners/run-folder/found.ts';
import { createJoiner } from '../../runners/run-folder/merge.ts';
import { createSourceList, listSources, type Source } from '../../runners/run-folder/sources.ts';
import { trustOfSources } from '../../runners/run-folder/trust.ts';
import { syntheticFound } from './synthetic.ts';
import { createToy } from './toy.ts';

const problem = createToy();
const HASHES = { railHash: 'r', partsHash: 'p' };
const found = (shard: number, designs = 60): Found =>
  syntheticFound(problem, { shard, shards: 8, designs, epochs: 40 });
const joined = (parts: readonly Found[]): Found => {
  const joiner = createJoiner(problem);
  for (const part of parts) joiner.add(part);
  return { ...HASHES, ...joiner.joined() };
};

describe('joining findings', () => {
  const shards = Array.from({ length: 6 }, (_, shard) => found(shard));
  const whole = joined(shards);

  it('has something to join', () => {
    expect(whole.archive.count).toBeGreaterThan(5);
    expect(whole.sample.count).toBeGreaterThan(200);
    expect(whole.nearMisses.count).toBeGreaterThan(3);
    expect(whole.sources.map((source) => source.shard)).toEqual([0, 1, 2, 3, 4, 5]);
  });

  it('gives the same in any order, in any grouping, with any repetition', () => {
    const order = fc.shuffledSubarray([0, 1, 2, 3, 4, 5], { minLength: 6 });
    fc.assert(
      fc.property(order, fc.integer({ min: 1, max: 5 }), fc.nat(5), (indices, cut, again) => {
        const parts = indices.flatMap((i) => shards[i] ?? []);
        expect(joined(parts)).toEqual(whole);
        expect(joined([joined(parts.slice(0, cut)), joined(parts.slice(cut))])).toEqual(whole);
        expect(joined([...parts, ...parts.slice(again), whole])).toEqual(whole);
      }),
      { numRuns: 20 },
    );
  });

  it('knows whether a run brought anything new', () => {
    const joiner = createJoiner(problem);
    expect([0, 1, 0].map((i) => joiner.add(found(i)))).toEqual([true, true, false]);
    expect(joiner.add(whole)).toBe(true);
    expect(joiner.add(whole)).toBe(false);
  });

  it('of 300 shards of 1,000 designs holds no more than the grid, the bound of the sample and a line a shard', () => {
    const joiner = createJoiner(problem);
    for (let shard = 0; shard < 300; shard++) {
      joiner.add(syntheticFound(problem, { shard, shards: 300, designs: 1000, epochs: 200 }));
    }
    const { archive, sample, sources, nearMisses } = joiner.joined();
    // Two objectives from 0 to 2 with a resolution of 0.02: a front crosses at most 2 · 100 cells.
    expect(archive.count).toBeLessThanOrEqual(202);
    expect(sample.count).toBe(50_000);
    // One limit, three bands, 15 directions.
    expect(nearMisses.count).toBeLessThanOrEqual(45);
    expect(sources.length).toBe(300);
    // 8,000 rows of history together, and each shard's last.
    expect(sources.reduce((rows, source) => rows + source.history.length, 0)).toBeLessThanOrEqual(8300);
  });
});

describe('the list of sources', () => {
  const source = (shard: number, epoch = 100): Source => {
    const [one] = syntheticFound(problem, { shard, shards: 64, designs: 1, epochs: epoch }).sources;
    if (one === undefined) throw new Error('no source');
    return one;
  };

  it('takes the further of two states of a ring', () => {
    expect(listSources([source(0, 10), source(0, 30), source(0, 20)]).map((one) => one.epoch)).toEqual([30]);
  });

  it('thins histories alike whatever was listed before, and keeps each last row', () => {
    const many = Array.from({ length: 200 }, (_, shard) => source(shard));
    const whole = listSources(many);
    expect(listSources([...listSources(many.slice(0, 90)), ...listSources(many.slice(90))].reverse())).toEqual(whole);
    expect(listSources([...whole, ...many])).toEqual(whole);
    for (const one of whole) expect(one.history.at(-1)?.epoch).toBe(100);
    expect(whole.reduce((rows, one) => rows + one.history.length, 0)).toBeLessThanOrEqual(8200);
    const few = createSourceList();
    few.add(source(0));
    expect(few.list()[0]?.history).toHaveLength(100);
  });
});

describe('the trust record of joined runs', () => {
  it('adds up counts, averages shares by islands, and sets each ring against the whole', () => {
    const sources = [found(0), found(1)].flatMap((part) => part.sources);
    const [a, b] = sources;
    const trust = trustOfSources(sources, 0.9, [{ model: 3, ranking: 1 }, { model: 4 }]);
    expect(trust.duplicates).toBe((a?.went?.duplicates ?? Number.NaN) + (b?.went?.duplicates ?? Number.NaN));
    expect(trust.timeSplit).toEqual({ model: 7, ranking: 1 });
    expect(trust.operatorShares).toEqual({ crossover: 0.5, differential: 0.5 });
    const ends = sources.map((one) => one.history.at(-1)?.hypervolume ?? Number.NaN);
    expect(trust.agreement).toEqual(ends.map((end) => end / 0.9));
  });
});
