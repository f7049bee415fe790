/** Where an incumbent stands, what requirements cost, and a design as a plain list. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  bestGainOf,
  createRailProblem,
  freeLimits,
  gainOf,
  howPriced,
  readPlainDesign,
  requirementPrices,
  standingOf,
} from '../../model/index.ts';
import { NO_TABLES } from '../support/tables.ts';
import { handMade, need, plainRail } from './support.ts';

describe('requirement prices', () => {
  const front = {
    objectives: [
      { name: 'loss', unit: 'W' },
      { name: 'volume', unit: 'm³' },
    ],
    limits: [{ name: 'outputRipple', unit: 'V' }],
    designs: [
      { id: 'a', family: 'f', objectives: [10, 4] },
      { id: 'b', family: 'f', objectives: [5, 8] },
    ],
  };
  /** A design that has `value` of ripple where 20 mV is allowed. */
  const miss = (id: string, value: number, objectives: number[]) => ({
    limit: 'outputRipple',
    value,
    allowed: 0.02,
    violation: value / 0.02 - 1,
    design: { id, family: 'f', objectives },
  });

  it('a limit relaxed by a tenth buys two fifths of the volume at no more loss', () => {
    const [line] = requirementPrices(front, [miss('m', 0.022, [6, 4.8])]);
    expect(line?.relaxation).toBeCloseTo(0.1, 12);
    // At a loss of at most 6 W the front's least volume is 8; the near miss has 4.8.
    const volume = line?.gains[1];
    expect(volume === undefined ? 0 : gainOf(volume)).toBeCloseTo(0.4, 12);
    expect(volume?.best).toBe(4);
    expect(line?.gains[0]?.relaxed).toBe(5);
  });

  it('a near miss that the front beats costs nothing and is not listed', () => {
    expect(requirementPrices(front, [miss('m', 0.022, [11, 9])])).toEqual([]);
  });

  it('each step of 2.5, 10 and 25 % has a line where it changes a best value, and says how far the limit must move for it', () => {
    const lines = requirementPrices(front, [
      miss('m', 0.0204, [4.5, 9]),
      miss('n', 0.0218, [4, 9]),
      miss('o', 0.024, [9, 3]),
    ]);
    const told = lines.map(({ relaxedTo, gains }) => [relaxedTo, ...gains.map(({ relaxed }) => relaxed)]);
    expect(told).toEqual([
      [0.0204, 4.5, 4],
      [0.0218, 4, 4],
      [0.024, 4, 3],
    ]);
    expect(lines[1]?.gains.map(bestGainOf)).toEqual([0.2, 0]);
  });

  it('a step that gains nothing more has no line', () => {
    expect(requirementPrices(front, [miss('m', 0.0204, [4, 9]), miss('n', 0.024, [4, 9])])).toHaveLength(1);
  });

  it('what searching on gives with every limit kept is no price of a limit', () => {
    const level = [{ id: 'l', family: 'f', objectives: [4, 9] }];
    const made = { steps: [0.1], limits: ['outputRipple', 'loadStep'], evaluations: 1000, level };
    const misses = [miss('m', 0.022, [4, 9])];
    expect(requirementPrices(front, misses)).toHaveLength(1);
    expect(requirementPrices(front, misses, made)).toEqual([]);
    expect(freeLimits(requirementPrices(front, misses), made)).toEqual(['loadStep']);
    expect(howPriced(made)).toContain('2 limits were relaxed, one at a time, by 10 % of what is allowed');
    expect(howPriced(made)).toContain('1000 evaluations');
  });

  it('relaxing a limit further never makes a best value worse, nor anything at all the best of the front', () => {
    const design = fc.record({
      value: fc.double({ min: 0.0201, max: 0.025, noNaN: true }),
      objectives: fc.array(fc.double({ min: 1, max: 12, noNaN: true }), { minLength: 2, maxLength: 2 }),
    });
    const law = (designs: readonly { value: number; objectives: number[] }[]): void => {
      const lines = requirementPrices(
        front,
        designs.map(({ value, objectives }, i) => miss(`m${i}`, value, objectives)),
      );
      for (const [i, line] of lines.entries()) {
        for (const [k, { best, relaxed }] of line.gains.entries()) {
          expect(relaxed).toBeLessThanOrEqual(best);
          if (i > 0) expect(relaxed).toBeLessThanOrEqual(lines[i - 1]?.gains[k]?.relaxed ?? 0);
        }
      }
    };
    fc.assert(fc.property(fc.array(design, { maxLength: 12 }), law));
  });
});

/** A switch with some charge: without any, the ringing of its loop has no size. */
const CHARGED = {
  onResistance: 1e-3,
  outputCharge: 1e-8,
  gateChargeSwitch: 1e-9,
  gateResistance: 1,
  voltageRating: 100,
};

describe('standing', () => {
  const rail = plainRail({ input: 12, output: 3.3, current: 5 });
  const { problem, genes } = handMade({ frequency: 3e5, high: CHARGED, outputCount: 9 }, rail);
  const own = problem.judge(genes).objectives;

  it('names who dominates it and how far the front is at no more of the others', () => {
    const front = [
      { id: 'better', family: 'f', objectives: own.map((value) => 0.9 * value) },
      { id: 'other', family: 'f', objectives: own.map((value, k) => (k === 0 ? 2 : 0.5) * value) },
    ];
    const { dominatedBy, distances } = standingOf(problem, genes, front);
    expect(dominatedBy).toEqual(['better']);
    expect(distances[0]?.front).toBeCloseTo(0.9 * own[0], 12);
  });

  it('offers the cheapest single change that helps: nine capacitors where fewer do', () => {
    const { change } = standingOf(problem, genes, []);
    expect(change?.costAfter).toBeLessThan(change?.costBefore ?? 0);
    expect(change?.objectives.every((value, k) => value <= own[k] * 1.001)).toBe(true);
  });

  it('incumbents become seeds of the search; one that cannot stand here is refused by name', () => {
    const tables = {
      ...NO_TABLES,
      switches: problem.catalogue.highSwitches,
      diodes: problem.catalogue.diodes,
      inductors: problem.catalogue.inductorSeries.flatMap(({ rows }) => rows),
      ceramics: [...problem.catalogue.outputCeramics, ...problem.catalogue.inputCeramics],
      controllers: problem.catalogue.controllers,
    };
    const unique = { ...tables, ceramics: [...new Map(tables.ceramics.map((row) => [row.name, row])).values()] };
    const record = problem.record(genes);
    const seeded = need(createRailProblem(problem.rail, unique, [record]));
    expect(seeded.seeds).toHaveLength(1);
    expect(seeded.id(seeded.seeds[0])).toBe(problem.id(genes));
    const strange = { ...record, parts: { ...record.parts, controller: 'unheard of' } };
    const refused = createRailProblem(problem.rail, unique, [strange]);
    expect(refused.ok ? [] : refused.findings.map(({ found }) => found)).toEqual(['unheard of']);
  });
});

describe('a design as a plain list', () => {
  it('reads values with units, counts and parts', () => {
    const record = need(
      readPlainDesign('# old\narchitecture: buck-diode\nphases: 2\nfrequency: 400 kHz\ndiode: D-1 x\n', 'old.txt'),
    );
    expect(record).toEqual({
      architecture: 'buck-diode',
      genes: { phases: 2, frequency: 4e5 },
      parts: { diode: 'D-1 x' },
    });
  });

  it('names the line that it cannot read', () => {
    const outcome = readPlainDesign('architecture: buck-diode\nfrequency: fast\nnonsense\n', 'old.txt');
    expect(outcome.ok ? [] : outcome.findings.map(({ line }) => line)).toEqual([2, 3]);
  });
});
