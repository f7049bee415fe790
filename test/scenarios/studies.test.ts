/** High ratios, heat against frequency, and the price of a ripple limit, at budgets of seconds; the evidence spends more. */
import { describe, expect, it } from 'vitest';
import { smallestAt } from './heat-sink.ts';
import { handSheet, handSweep, ratioGain, TRANSFORMER_FAMILIES } from './high-ratio.ts';
import { wholeAndQuarter } from './ripple-limit.ts';
import { type Sweep, searching, shippedRail, spaceOf, sweep } from './spaces.ts';

const BUCK = ['buck-synchronous'] as const;

describe('60 V to 1 V at 400 kHz and up', () => {
  const missedOnTime = (found: Sweep): number => {
    const { limits, families } = found.problem;
    const place = limits.indexOf('minimumOnTime');
    return families.names.reduce((sum, _, family) => sum + found.record.violated[family * limits.length + place], 0);
  };

  it('asks 41.7 ns of a plain buck, so that 50 ns leave none: nearly every design misses it', () => {
    expect(1 / (60 * 400e3)).toBeCloseTo(41.7e-9, 10);
    const found = handSweep(BUCK, 50e-9, 5000);
    expect(found.members).toHaveLength(0);
    expect(missedOnTime(found) / found.evaluations).toBeGreaterThan(0.95);
  });

  it('leaves transformer stages, whose turns lengthen the pulse', () => {
    expect(handSweep(TRANSFORMER_FAMILIES, 50e-9, 5000).members.length).toBeGreaterThan(0);
  });

  it('gives the plain buck back when pulses may be as short as they like', () => {
    expect(handSweep(BUCK, 0, 5000).members.length).toBeGreaterThan(0);
  });

  it('keeps all else: only the shortest on-time differs between the three', () => {
    expect(handSheet(BUCK)).toEqual({ ...handSheet(TRANSFORMER_FAMILIES), search: handSheet(BUCK).search });
  });
});

describe('what transformer families gain in hypervolume at 48 V and 60 W', () => {
  it('is near nothing at 3.6 to 1 and much at 48 to 1', () => {
    // Fewer designs than this end while the transformer stages are still looking for their first good ones.
    const low = ratioGain(3.6, 10_000);
    const high = ratioGain(48, 10_000);
    expect(low.gain).toBeLessThan(0.02);
    expect(high.gain).toBeGreaterThan(0.1);
    expect(high.gain).toBeGreaterThan(low.gain);
  });
});

describe('a 12 V to 3.3 V rail', () => {
  it('chooses the plain buck where every family is allowed', () => {
    const sheet = shippedRail('buoy-sensors');
    const architectures = [...BUCK, ...TRANSFORMER_FAMILIES];
    const found = sweep(spaceOf(searching(sheet, { architectures })), 20_000);
    expect(found.problem.architectures.length).toBeGreaterThan(1);
    expect(found.members.length).toBeGreaterThan(0);
    for (const { family } of found.members) expect(family).toMatch(/^buck-synchronous/);
  });
});

describe('48 V to 12 V, 500 W, still air', () => {
  it('is smallest between 50 kHz and 3.2 MHz, and the heat sink takes most of the volume at the top', () => {
    const [low, middle, high] = [50e3, 297e3, 3.2e6].map((f) => smallestAt(f, 8000, ['a', 'b']));
    expect(middle.volume).toBeLessThan(low.volume);
    expect(middle.volume).toBeLessThan(high.volume);
    expect(high.chokes).toBeLessThan(low.chokes);
    expect(high.sink / high.volume).toBeGreaterThan(low.sink / low.volume);
    expect(high.sink / high.volume).toBeGreaterThan(middle.sink / middle.volume);
  });
});

describe('a ripple limit cut to a quarter', () => {
  it('costs phases, capacitance or volume, and hypervolume', () => {
    const [whole, quarter] = wholeAndQuarter(8_000);
    const dearer = [
      quarter.phases > whole.phases,
      quarter.capacitance > whole.capacitance,
      quarter.volume > whole.volume,
    ];
    expect(dearer).toContain(true);
    expect(quarter.hypervolume).toBeLessThan(whole.hypervolume);
  });
});
