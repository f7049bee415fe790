/** The demo sheet's front, and the facts of the trade on it (common practice, no source). The full budget is in the evidence. */
import { beforeAll, describe, expect, it } from 'vitest';
import { need } from '../model/support.ts';
import { dominates } from './high-ratio.ts';
import { type Sweep, shippedRail, spaceOf, sweep } from './spaces.ts';
import { chosenFrequencies, lossShares, shareWithin } from './trade.ts';

let found: Sweep;
beforeAll(() => {
  found = sweep(spaceOf(shippedRail('buoy-sensors')), 60_000);
});

describe('the front of the demo sheet', () => {
  it('keeps every limit in every row', () => {
    expect(found.members.length).toBeGreaterThan(0);
    for (const { genes } of found.members) {
      const judged = found.problem.judge(genes);
      expect(judged.feasible).toBe(true);
      expect(Math.min(...Object.values(judged.margins))).toBeGreaterThanOrEqual(0);
    }
  });

  it('has no row that another dominates', () => {
    for (const one of found.members)
      for (const other of found.members) expect(dominates(other.objectives, one.objectives)).toBe(false);
  });

  it('has unique ids', () => {
    const ids = found.members.map(({ genes }) => found.problem.id(genes));
    expect(new Set(ids).size).toBe(ids.length);
  });

  it('comes out the same, to the last digit, when a design is read back from its record and assessed', () => {
    for (const { genes, objectives } of found.members.slice(0, 40)) {
      const record = found.problem.record(genes);
      const written: unknown = JSON.parse(JSON.stringify(record));
      expect(written).toEqual(record);
      const again = need(found.problem.genesFrom(record));
      expect(found.problem.assess(again).objectives.map(({ value }) => value)).toEqual(objectives);
    }
  });

  it('comes out the same from the same seed, and differs from another', () => {
    const space = spaceOf(shippedRail('buoy-sensors'));
    const objectives = (seed: string): number[] => [...sweep(space, 1500, seed).front.objectives];
    expect(objectives('one')).toEqual(objectives('one'));
    expect(objectives('one')).not.toEqual(objectives('two'));
  });
});

describe('common practice, no source', () => {
  it('the best-efficiency and the balanced design lose less than a tenth at half load and above', () => {
    const { best, balanced } = lossShares(found);
    expect(best).toBeLessThan(0.1);
    expect(balanced).toBeLessThan(0.1);
  });

  it('most of a hypervolume-chosen subset of the front lies between 100 kHz and 1 MHz', () => {
    const frequencies = chosenFrequencies(found, 40);
    expect(shareWithin(frequencies, 100e3, 1e6)).toBeGreaterThan(0.5);
  });
});
