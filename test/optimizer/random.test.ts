/** The search's random numbers: resumable at any draw, unrelated between islands, of the right spread. */
import { describe, expect, it } from 'vitest';
import { restoreRandom, seedRandom } from '../../optimizer/random.ts';
import { hashRow, remember } from '../../optimizer/seen.ts';

describe('random streams', () => {
  it('go on from a saved state, also through JSON', () => {
    const random = restoreRandom(seedRandom(7, 0, 3));
    for (let k = 0; k < 1000; k++) random.normal();
    const state = random.state();
    const ahead = Array.from({ length: 50 }, () => random.uniform());
    const again = restoreRandom(JSON.parse(JSON.stringify(state)));
    expect(Array.from({ length: 50 }, () => again.uniform())).toEqual(ahead);
  });

  it('differ by seed, shard and island', () => {
    const starts = [
      [1, 0, 0],
      [2, 0, 0],
      [1, 1, 0],
      [1, 0, 1],
      [11, 0, 0],
    ].map(([seed, shard, island]) => restoreRandom(seedRandom(seed, shard, island)).uniform());
    expect(new Set(starts).size).toBe(5);
  });

  it('have the moments of their distributions', () => {
    const random = restoreRandom(seedRandom(1, 0, 0));
    const count = 100_000;
    let sum = 0;
    let squares = 0;
    const wholes = new Float64Array(5);
    for (let k = 0; k < count; k++) {
      const x = random.normal();
      sum += x;
      squares += x * x;
      wholes[random.whole(5)]++;
    }
    // Four standard errors of the mean and of the variance of a standard normal: 0.013 and 0.018.
    expect(Math.abs(sum / count)).toBeLessThan(0.013);
    expect(Math.abs(squares / count - 1)).toBeLessThan(0.018);
    for (const share of wholes) expect(Math.abs(share / count - 0.2)).toBeLessThan(0.006);
  });
});

describe('memory of designs seen', () => {
  it('knows what it was shown and nothing else', () => {
    const seen = new Uint32Array(1 << 12);
    const gene = new Float64Array(3);
    const words = new Uint32Array(gene.buffer);
    const hash = new Uint32Array(2);
    const show = (k: number): boolean => {
      gene.set([k, -k / 3, 1e9 * k]);
      hashRow(words, hash);
      return remember(seen, hash);
    };
    for (let k = 0; k < 500; k++) expect(show(k)).toBe(false);
    // 500 designs in 1024 buckets of four: a bucket overflows with a chance of 1e−4 (Poisson, mean 0.49).
    for (let k = 0; k < 500; k++) expect(show(k)).toBe(true);
    expect(show(499.5)).toBe(false);
  });
});
