/**
 * Two groups with series inductance against an independent integration of their network (classical Runge–Kutta of fourth order,
 * on the three-state equations, from rest until the start no longer shows) and against the limits that textbooks know.
 */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  type Bank,
  bankCurrents,
  bankRipple,
  bankTrace,
  createBankRipple,
  pairTransient,
} from '../../../model/capacitors/index.ts';
import { addSegment, clearWaveform, createWaveform, type Waveform } from '../../../model/waveform/index.ts';
import { denseRipple } from './pair-oracle.ts';

const pairs = fc.record({
  c1: fc.double({ min: 2e-6, max: 100e-6, noNaN: true }),
  r1: fc.double({ min: 1e-3, max: 10e-3, noNaN: true }),
  l1: fc.double({ min: 0.02e-9, max: 1e-9, noNaN: true }),
  c2: fc.double({ min: 50e-6, max: 1000e-6, noNaN: true }),
  r2: fc.double({ min: 4e-3, max: 60e-3, noNaN: true }),
  l2: fc.double({ min: 0.3e-9, max: 6e-9, noNaN: true }),
});

/** A triangle about zero: `swing` A peak to peak, rising for `duty` of a period of `period` s. */
function triangle(period: number, duty: number, swing: number): Waveform {
  const w = createWaveform(4);
  addSegment(w, duty * period, -swing / 2, swing / 2);
  addSegment(w, (1 - duty) * period, swing / 2, -swing / 2);
  return w;
}

/** Terminal voltage over the last of `periods` by Runge–Kutta in `steps` a segment, with group currents squared. */
function integrate(bank: Bank, w: Waveform, periods: number, steps: number) {
  const l = bank.l1 + bank.l2;
  let v1 = 0;
  let v2 = 0;
  let y = 0;
  let highest = -Infinity;
  let lowest = Infinity;
  let square2 = 0;
  for (let p = 0; p < periods; p++) {
    for (let k = 0; k < w.count; k++) {
      const h = w.duration[k] / steps;
      const s = (w.end[k] - w.start[k]) / w.duration[k];
      const slope = (i: number, a: number, b: number, c: number): [number, number, number] => [
        (i - c) / bank.c1,
        c / bank.c2,
        (a - b + bank.r1 * i + bank.l1 * s - (bank.r1 + bank.r2) * c) / l,
      ];
      for (let n = 0; n < steps; n++) {
        const at = (x: number): number => w.start[k] + s * h * (n + x);
        if (p === periods - 1) {
          const rate = slope(at(0), v1, v2, y)[2];
          const v = v1 + bank.r1 * (at(0) - y) + bank.l1 * (s - rate);
          highest = Math.max(highest, v);
          lowest = Math.min(lowest, v);
          square2 += y * y * h;
        }
        const k1 = slope(at(0), v1, v2, y);
        const k2 = slope(at(0.5), v1 + (h / 2) * k1[0], v2 + (h / 2) * k1[1], y + (h / 2) * k1[2]);
        const k3 = slope(at(0.5), v1 + (h / 2) * k2[0], v2 + (h / 2) * k2[1], y + (h / 2) * k2[2]);
        const k4 = slope(at(1), v1 + h * k3[0], v2 + h * k3[1], y + h * k3[2]);
        v1 += (h / 6) * (k1[0] + 2 * k2[0] + 2 * k3[0] + k4[0]);
        v2 += (h / 6) * (k1[1] + 2 * k2[1] + 2 * k3[1] + k4[1]);
        y += (h / 6) * (k1[2] + 2 * k2[2] + 2 * k3[2] + k4[2]);
      }
    }
  }
  return { ripple: highest - lowest, meanSquare2: square2 / w.period };
}

describe('a pair of groups with inductance', () => {
  it('ripples as its network does, integrated independently', () => {
    fc.assert(
      fc.property(pairs, fc.double({ min: 0.1, max: 0.9, noNaN: true }), (bank, duty) => {
        const w = triangle(2e-6, duty, 4);
        const ours = createBankRipple();
        bankRipple(bank, w, ours);
        const settle =
          Math.ceil((20 * (bank.l1 + bank.l2)) / (bank.r1 + bank.r2) / w.period) +
          20 * Math.ceil(((bank.r1 + bank.r2) * bank.c1) / w.period);
        const theirs = integrate(bank, w, Math.min(400, settle + 5), 400);
        expect(Math.abs(ours.ripple / theirs.ripple - 1)).toBeLessThan(0.02);
        expect(Math.abs(ours.meanSquare2 / theirs.meanSquare2 - 1)).toBeLessThan(0.03);
      }),
      { numRuns: 25, seed: 7 },
    );
  });

  it('is the pair without inductance where the inductance is next to nothing', () => {
    const bank = { c1: 40e-6, r1: 2e-3, l1: 0, c2: 300e-6, r2: 15e-3, l2: 0 };
    const w = triangle(2e-6, 0.3, 4);
    const without = createBankRipple();
    const hardly = createBankRipple();
    bankRipple(bank, w, without);
    bankRipple({ ...bank, l1: 1e-15, l2: 1e-15 }, w, hardly);
    expect(Math.abs(hardly.ripple / without.ripple - 1)).toBeLessThan(0.005);
    expect(hardly.meanSquare1 / without.meanSquare1).toBeCloseTo(1, 4);
    expect(hardly.meanSquare2 / without.meanSquare2).toBeCloseTo(1, 2);
  });

  it('rings: the inductance of the bulk raises the ripple of the ceramics (the network integrated gives the same)', () => {
    const quiet = { c1: 6e-6, r1: 1e-3, l1: 0.1e-9, c2: 300e-6, r2: 8e-3, l2: 0.1e-9 };
    const w = triangle(2e-6, 0.3, 4);
    const low = createBankRipple();
    const high = createBankRipple();
    bankRipple(quiet, w, low);
    bankRipple({ ...quiet, l2: 3e-9 }, w, high);
    expect(high.ripple).toBeGreaterThan(1.2 * low.ripple);
  });

  it('gives the same currents with and without voltages, and a trace inside its extremes', () => {
    const bank = { c1: 20e-6, r1: 2e-3, l1: 0.2e-9, c2: 200e-6, r2: 10e-3, l2: 2e-9 };
    const w = triangle(2e-6, 0.4, 4);
    const all = createBankRipple();
    const heat = createBankRipple();
    bankRipple(bank, w, all);
    bankCurrents(bank, w, heat);
    expect(heat.meanSquare1).toBe(all.meanSquare1);
    expect(heat.meanSquare2).toBe(all.meanSquare2);
    const { value } = bankTrace(bank, w, 10);
    const shown = Math.max(...value) - Math.min(...value);
    expect(shown).toBeLessThanOrEqual(all.ripple * (1 + 1e-12));
    expect(shown).toBeGreaterThan(0.98 * all.ripple);
  });
});

/** Any pair with resistance, from one that fades at once to one that rings through the whole period. */
const anyPair = fc.record({
  c1: decades(0.5e-6, 200e-6),
  r1: decades(1e-5, 20e-3),
  l1: fc.oneof(fc.constant(0), decades(1e-12, 3e-9)),
  c2: decades(5e-6, 2e-3),
  r2: decades(1e-4, 0.1),
  l2: decades(1e-12, 10e-9),
});

/** One to six segments of unequal lengths, some after a jump, over 0.2 to 20 µs. */
const anyCurrent = fc
  .tuple(
    decades(2e-7, 2e-5),
    fc.array(fc.tuple(decades(0.01, 1), level(), level(), fc.boolean()), { minLength: 1, maxLength: 6 }),
  )
  .map(([period, pieces]) => {
    const total = pieces.reduce((sum, [length]) => sum + length, 0);
    const w = createWaveform(8);
    let at = 0;
    for (const [length, to, from, jumps] of pieces) {
      addSegment(w, (period * length) / total, jumps ? from : at, to);
      at = to;
    }
    return w;
  });

function decades(min: number, max: number) {
  return fc.double({ min: Math.log10(min), max: Math.log10(max), noNaN: true }).map((exponent) => 10 ** exponent);
}

function level() {
  return fc.double({ min: 0, max: 10, noNaN: true });
}

describe('its ripple', () => {
  it('is met to 0.1 % whatever rings, beside every voltage of a dense walk through the same network', () => {
    fc.assert(
      fc.property(anyPair, anyCurrent, (bank, current) => {
        const l = bank.l1 + bank.l2;
        const turns = current.period * Math.max(1 / Math.sqrt(bank.c1 * l), (bank.r1 + bank.r2) / l);
        // A dense walk through more would take minutes, which ours does not; a current that stands still has no ripple to compare.
        const values = [...current.start.subarray(0, current.count), ...current.end.subarray(0, current.count)];
        fc.pre(turns < 2000 && Math.max(...values) - Math.min(...values) > 0.01);
        const ours = createBankRipple();
        bankRipple(bank, current, ours);
        expect(Math.abs(ours.ripple / denseRipple(bank, current) - 1)).toBeLessThan(1e-3);
      }),
      { numRuns: 200, seed: 11 },
    );
  });

  it('counts ringing that outlasts every other part: a pair with hardly any resistance', () => {
    const bank = { c1: 10e-6, r1: 1e-6, l1: 0.1e-9, c2: 200e-6, r2: 4e-5, l2: 1e-9 };
    const w = createWaveform(4);
    addSegment(w, 2e-6, -3, 3);
    addSegment(w, 18e-6, 3, -3);
    const ours = createBankRipple();
    bankRipple(bank, w, ours);
    expect(Math.abs(ours.ripple / denseRipple(bank, w) - 1)).toBeLessThan(1e-3);
  });
});

describe('its response from rest', () => {
  it('ends on charge over capacitance, and a large bulk with no resistance holds it to that (charge conservation)', () => {
    const pulse = createWaveform(4);
    clearWaveform(pulse);
    addSegment(pulse, 1e-9, 0, 10);
    addSegment(pulse, 5e-6, 10, 0);
    const response = createBankRipple();
    pairTransient({ c1: 50e-6, r1: 1e-6, l1: 1e-12, c2: 450e-6, r2: 1e-6, l2: 1e-12 }, pulse, response);
    // ½·10 A·5 µs over 500 µF.
    expect(response.highest).toBeCloseTo(0.05, 3);
  });

  it('is that of the ceramics alone where the bulk cannot answer in time', () => {
    const pulse = createWaveform(4);
    addSegment(pulse, 1e-9, 0, 4);
    addSegment(pulse, 2e-6, 4, 0);
    const response = createBankRipple();
    pairTransient({ c1: 40e-6, r1: 1e-6, l1: 1e-12, c2: 1e-3, r2: 5, l2: 1e-9 }, pulse, response);
    // ½·4 A·2 µs over 40 µF.
    expect(Math.abs(response.highest / 0.1 - 1)).toBeLessThan(0.02);
  });
});
