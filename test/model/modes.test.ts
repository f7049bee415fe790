/** The steady state of one choke: continuous, discontinuous, pulse skipping, against printed values. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { ChokeSteadyState, settleGaps, solveChoke } from '../../model/modes.ts';
import { MODE } from '../../model/stages/state.ts';

function solved(over: Partial<ChokeSteadyState>): ChokeSteadyState {
  const s = Object.assign(new ChokeSteadyState(), { blocking: false, shortestRise: 0 }, over);
  solveChoke(s);
  return s;
}

/** A buck of 1 V, 1 H, 1 Hz that gives M from a load with K = 2·L·f/R, so that I = M/R = M·K/2. */
function normalised(m: number, k: number): ChokeSteadyState {
  return solved({ rise: 1 - m, fall: m, current: (m * k) / 2, inductance: 1, frequency: 1, blocking: true });
}

describe('discontinuous conversion ratio M(D, K) = 2/(1 + √(1 + 4K/D²)), K = 2L/(R·T)', () => {
  // TI SLVA057 (1999), section 2.2, page 10, seen; Erickson & Maksimović ch. 5, from memory. Values computed from the printed formula.
  const K = [0.01, 0.05, 0.1, 0.2, 0.4, 0.6];
  const table: [number, (number | undefined)[]][] = [
    [0.2, [0.828427, 0.579796, 0.463325, 0.358258, 0.270156, 0.227008]],
    [0.3, [0.908327, 0.715549, 0.6, 0.482549, 0.375, 0.319493]],
    [0.4, [0.944272, 0.8, 0.696663, 0.579796, 0.463325, undefined]],
    [0.5, [0.962912, 0.854102, 0.765564, 0.655869, undefined, undefined]],
    [0.7, [0.980385, 0.914637, 0.851893, undefined, undefined, undefined]],
  ];
  const cells = table.flatMap(([duty, row]) => row.flatMap((m, i) => (m === undefined ? [] : [{ duty, k: K[i], m }])));

  it.each(cells)('D $duty, K $k gives M $m', ({ duty, k, m }) => {
    const s = normalised(m, k);
    expect(s.mode).toBe(MODE.discontinuous);
    // The table's M has six digits; near M = 1 the duty that belongs to it moves 20 times as much as M does.
    expect(s.dutyCycle).toBeCloseTo(duty, 4);
  });

  it.each([
    [0.4, 0.6],
    [0.5, 0.5],
    [0.5, 0.6],
    [0.7, 0.4],
  ])('D %d, K %d is at or beyond the boundary: M = D', (duty, k) => {
    const s = normalised(duty, k);
    expect(s.dutyCycle).toBeCloseTo(duty, 12);
    expect(s.riseShare + s.fallShare).toBeCloseTo(1, 12);
  });
});

describe('boundary K = 1 − M (SLVA057 section 2.3, seen; Erickson ch. 5, from memory)', () => {
  it.each([0.1, 0.25, 0.5, 0.9])('M = %d', (m) => {
    expect(normalised(m, 1.001 * (1 - m)).mode).toBe(MODE.continuous);
    expect(normalised(m, 0.999 * (1 - m)).mode).toBe(MODE.discontinuous);
  });
});

describe('Hart, Power Electronics, example 6-9 (from memory, arithmetic re-verified): a discontinuous buck', () => {
  it('24 V, D 0.4, 200 µH, 10 kHz, 20 Ω: 13.9 V, D2 0.29, peak 2.017 A', () => {
    const volts = 13.9151;
    const s = solved({
      rise: 24 - volts,
      fall: volts,
      current: volts / 20,
      inductance: 200e-6,
      frequency: 10e3,
      blocking: true,
    });
    expect(s.mode).toBe(MODE.discontinuous);
    expect(s.dutyCycle).toBeCloseTo(0.4, 4);
    expect(s.fallShare).toBeCloseTo(0.289898, 4);
    expect(s.ripple).toBeCloseTo(2.017, 3);
  });
});

describe('laws of every mode', () => {
  const point = fc.record({
    rise: fc.double({ min: 0.1, max: 400, noNaN: true }),
    fall: fc.double({ min: 0.1, max: 400, noNaN: true }),
    current: fc.double({ min: 1e-6, max: 100, noNaN: true }),
    inductance: fc.double({ min: 1e-7, max: 1e-4, noNaN: true }),
    frequency: fc.double({ min: 3e4, max: 5e6, noNaN: true }),
    blocking: fc.boolean(),
    shortestRise: fc.double({ min: 0, max: 3e-7, noNaN: true }),
  });

  it('volt-seconds of rise and fall cancel, and the swing is what the voltage drives', () => {
    fc.assert(
      fc.property(point, (p) => {
        const s = solved(p);
        expect((s.rise * s.riseShare) / (s.fall * s.fallShare)).toBeCloseTo(1, 9);
        const swing = (s.rise * s.riseShare) / (s.inductance * s.effectiveFrequency);
        expect(s.ripple / swing).toBeCloseTo(1, 9);
      }),
    );
  });

  it('with gaps the fall has so much less to do: rise share · rise = fall share · fall + what the gaps take of each pulse', () => {
    fc.assert(
      fc.property(point, fc.double({ min: -0.2, max: 0.2, noNaN: true }), (p, share) => {
        const s = solved({ ...p, gapVolts: (share * p.rise * p.fall) / (p.rise + p.fall) });
        const rests = s.mode === MODE.discontinuous || s.mode === MODE.skipping;
        // A short pulse loses half of itself at most; those are left to the laws above and below.
        fc.pre(!rests || s.gapVolts < 0.4 * s.rise * s.dutyCycle);
        const stretch = s.effectiveFrequency / s.frequency;
        const left = s.rise * s.riseShare - s.gapVolts * stretch;
        expect((s.fall * s.fallShare) / left).toBeCloseTo(1, 9);
        if (rests) expect((0.5 * s.ripple * (s.riseShare + s.fallShare)) / s.current).toBeCloseTo(1, 9);
      }),
    );
  });

  it('gaps of 2 % of the period with 0.8 V take 32 mV from both edges of a current that never turns round', () => {
    const s = solved({ rise: 9, fall: 3, current: 10, inductance: 1e-6, frequency: 1e6 });
    Object.assign(s, { gapFall: 0.02 * 0.8, gapRise: 0.02 * 0.9, gapCurrent: 0.1, waitCurrent: 0 });
    settleGaps(s);
    expect(s.gapVolts).toBeCloseTo(0.032, 12);
    solveChoke(s);
    expect(s.riseShare).toBeCloseTo(3.032 / 12, 12);
    // Round a mean of nothing the drops of both edges have opposite signs: what is left is the difference of the two diodes.
    s.current = 0;
    solveChoke(s);
    settleGaps(s);
    expect(s.gapVolts).toBeCloseTo(-0.002, 12);
  });

  it('a triangle with a pause carries the load: I = ΔI/2 · (rise + fall share)', () => {
    fc.assert(
      fc.property(point, (p) => {
        const s = solved(p);
        if (s.mode !== MODE.discontinuous && s.mode !== MODE.skipping) return;
        expect((0.5 * s.ripple * (s.riseShare + s.fallShare)) / s.current).toBeCloseTo(1, 9);
        expect(s.riseShare + s.fallShare).toBeLessThanOrEqual(1 + 1e-12);
      }),
    );
  });

  it('no blocked current is negative, and no skipped pulse is shorter than the shortest on-time allows', () => {
    fc.assert(
      fc.property(point, (p) => {
        const s = solved({ ...p, blocking: true });
        if (s.mode === MODE.continuous) expect(s.current - 0.5 * s.ripple).toBeGreaterThanOrEqual(-1e-9 * s.ripple);
        if (s.mode !== MODE.skipping) return;
        const duty = s.fall / (s.rise + s.fall);
        expect(s.dutyCycle / s.frequency).toBeGreaterThanOrEqual(
          Math.min(s.shortestRise, duty / s.frequency) * (1 - 1e-12),
        );
        expect(s.effectiveFrequency).toBeLessThanOrEqual(s.frequency);
      }),
    );
  });

  it('below the shortest on-time a lighter load only lowers the frequency, in proportion to the load', () => {
    const at = (current: number) =>
      solved({ rise: 9, fall: 3, current, inductance: 1e-6, frequency: 1e6, blocking: true, shortestRise: 1e-7 });
    const full = at(0.02);
    const half = at(0.01);
    expect(full.mode).toBe(MODE.skipping);
    expect(half.ripple).toBe(full.ripple);
    expect(half.effectiveFrequency / full.effectiveFrequency).toBeCloseTo(0.5, 12);
  });
});
