/** What a pause in the choke's current leaves of its ripple losses, and what a bulk capacitor's own current heats it by. */
import { describe, expect, it } from 'vitest';
import { assessMade, type HandMade, plainRail, pointOf, watts } from './support.ts';

/** A choke whose only losses are those of its ripple. */
const CHOKE = { inductance: 2.2e-6, conductorThickness: 3e-4, layers: 3, dcResistance: 5e-3, coreCoefficient: 1e-9 };
const made = (frequency: number, minimumOnTime = 0): HandMade => ({
  frequency,
  inductor: CHOKE,
  controller: { minimumOnTime },
});
const rail = { lightLoad: 'diode-emulation', coolingArea: 100 } as const;
const at = (frequency: number, current: number, minimumOnTime = 0) =>
  pointOf(made(frequency, minimumOnTime), { input: 12, output: 3.3, current }, rail);

describe('ripple losses of a choke', () => {
  it('go with the number of pulses where pulses are skipped: half the load, half of both', () => {
    const [whole, half] = [at(500e3, 0.02, 3e-7), at(500e3, 0.01, 3e-7)];
    expect([whole.mode, half.mode]).toEqual(['pulse-skipping', 'pulse-skipping']);
    expect(whole.rippleCurrent / half.rippleCurrent).toBeCloseTo(1, 3);
    for (const effect of ['core', 'windingAc']) {
      expect(watts(whole.losses, 'inductor', effect)).toBeGreaterThan(0);
      expect(watts(half.losses, 'inductor', effect) / watts(whole.losses, 'inductor', effect), effect).toBeCloseTo(
        0.5,
        2,
      );
    }
  });

  it('of a triangle with a pause are those of the same triangle without one, at its own frequency, for its share of the time', () => {
    // In discontinuous operation I = ΔI/2 · s, s the share of rise and fall; without the pause the pulses come at f/s and carry ΔI/2.
    const current = 0.6;
    const paused = at(500e3, current);
    const share = (2 * current) / paused.rippleCurrent;
    expect(paused.mode).toBe('discontinuous');
    expect(share).toBeLessThan(0.8);
    const place = { input: 12, output: 3.3, current: 0.5 * paused.rippleCurrent };
    const whole = pointOf(made(500e3 / share), place, { ...rail, lightLoad: 'forced-continuous' });
    expect(whole.valleyCurrent).toBeCloseTo(0, 2);
    expect(whole.rippleCurrent / paused.rippleCurrent).toBeCloseTo(1, 2);
    const core = watts(paused.losses, 'inductor', 'core') / watts(whole.losses, 'inductor', 'core');
    expect(core / share).toBeCloseTo(1, 2);
  });
});

describe('a bulk capacitor', () => {
  const bulk = {
    name: 'bulk',
    technology: 'polymer',
    capacitance: 470e-6,
    tolerance: 0,
    voltageRating: 10,
    seriesResistance: 0.02,
    seriesInductance: 0,
    rippleRating: 2,
    ratedRise: 15,
    ratedLife: 7.2e6,
    maximumTemperature: 378.15,
    ...{ length: 1e-3, width: 1e-3, height: 1e-3, mass: 1e-6, prices: [] },
  } as const;

  it.each([1, 3])(
    'stands over the board by its rated rise times the square of current over rating (%d pieces)',
    (count) => {
      const place = { input: 12, output: 3.3, current: 8 };
      const design: HandMade = { frequency: 500e3, inductor: CHOKE, outputBulk: bulk, outputBulkCount: count };
      const { limits } = assessMade({ ...design, outputCeramic: { capacitance: 1e-6 } }, plainRail(place));
      const worst = (name: string): number => limits.find((limit) => limit.name === name)?.value ?? Number.NaN;
      const share = worst('outputBulkCurrent') / 2;
      expect(share).toBeGreaterThan(0.05);
      expect((worst('bulkTemperature') - worst('boardTemperature')) / (15 * share * share)).toBeCloseTo(1, 6);
    },
  );
});
