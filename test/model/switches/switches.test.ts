/** Laws of switch losses: never negative, proportional to frequency where they should be, continuous where the search would park. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  chargeExponent,
  deadTimeEnergy,
  diodeChargeEnergy,
  diodeForwardLoss,
  diodeLeakageLoss,
  edgeTime,
  gateChargeAfterSwing,
  hardEdgeEnergy,
  onResistance,
  outputAt,
  overlapEnergy,
  partialEdgeEnergyAt,
  recoveryCharge,
  recoveryLoss,
  recoveryLossTriangle,
  swingFraction,
  transitionTime,
  zeroVoltageCurrent,
} from '../../../model/switches/index.ts';

const positive = (max: number) => fc.double({ min: max * 1e-3, max, noNaN: true });
/** A row whose energy lies between a superjunction's and a linear capacitor's. */
const row = fc
  .record({
    outputCharge: positive(1e-7),
    ratio: fc.double({ min: 0.05, max: 0.5, noNaN: true }),
    outputTestVoltage: positive(400),
  })
  .map(({ outputCharge, ratio, outputTestVoltage }) => ({
    outputCharge,
    outputTestVoltage,
    outputEnergy: ratio * outputCharge * outputTestVoltage,
  }));
const out = new Float64Array(2);

describe('Output charge', () => {
  it('returns the row at its own test point, and nothing at no voltage', () => {
    fc.assert(
      fc.property(row, (r) => {
        outputAt(r, r.outputTestVoltage, out);
        expect(out[0] / r.outputCharge).toBeCloseTo(1, 12);
        expect(out[1] / r.outputEnergy).toBeCloseTo(1, 12);
        outputAt(r, 0, out);
        expect([...out]).toEqual([0, 0]);
      }),
    );
  });
  it('keeps E = ∫V dQ at every voltage', () => {
    const next = new Float64Array(2);
    fc.assert(
      fc.property(row, fc.double({ min: 0.1, max: 1, noNaN: true }), (r, share) => {
        const v = share * r.outputTestVoltage;
        outputAt(r, v, out);
        outputAt(r, v * 1.0001, next);
        expect((next[1] - out[1]) / (next[0] - out[0]) / v).toBeCloseTo(1.00005, 6);
      }),
    );
  });
  it('has exponent 1 for a linear capacitance and 1/2 for the square-root law', () => {
    expect(chargeExponent(1e-8, 0.5 * 1e-8 * 20, 20)).toBeCloseTo(1, 12);
    expect(chargeExponent(1e-8, (1e-8 * 20) / 3, 20)).toBeCloseTo(0.5, 12);
  });
  it('costs Qoss·V a hard edge with equal dice, whatever the law', () => {
    fc.assert(
      fc.property(row, (r) => {
        const energy = hardEdgeEnergy(r.outputCharge, r.outputEnergy, r.outputEnergy, r.outputTestVoltage);
        expect(energy / (r.outputCharge * r.outputTestVoltage)).toBeCloseTo(1, 12);
      }),
    );
  });
});

describe('An edge after a partial swing', () => {
  const energyAt = (r: Parameters<typeof outputAt>[0], fraction: number) => {
    partialEdgeEnergyAt(r, 1, r, 1, r.outputTestVoltage, fraction, out);
    return out[0];
  };
  it('costs the hard edge at no swing, nothing at a full one, and falls between', () => {
    fc.assert(
      fc.property(row, positive(0.999), (r, fraction) => {
        const hard = r.outputCharge * r.outputTestVoltage;
        expect(energyAt(r, 0) / hard).toBeCloseTo(1, 10);
        expect(energyAt(r, 1)).toBe(0);
        expect(energyAt(r, fraction)).toBeLessThanOrEqual(energyAt(r, fraction * 0.9) * (1 + 1e-9));
        expect(energyAt(r, fraction)).toBeGreaterThanOrEqual(0);
      }),
    );
  });
  it('comes to nothing without a jump for the square-root law', () => {
    const r = { outputCharge: 1e-8, outputEnergy: 1.6e-7, outputTestVoltage: 48 };
    expect(energyAt(r, 1 - 1e-9) / energyAt(r, 0)).toBeLessThan(1e-6);
  });
});

describe('The swing that a valley current makes', () => {
  const point = fc.record({
    inductance: positive(1e-4),
    charge: positive(1e-7),
    bus: positive(400),
    share: fc.double({ min: 0.02, max: 0.98, noNaN: true }),
    dead: positive(2e-7),
  });
  it('is 0 for positive current, never above 1, and grows with the size of a negative one', () => {
    fc.assert(
      fc.property(point, positive(50), (p, i) => {
        const at = (valley: number) => swingFraction(valley, p.inductance, p.charge, p.bus, p.share * p.bus, p.dead);
        expect(at(i)).toBe(0);
        expect(at(-i)).toBeGreaterThanOrEqual(at(-0.9 * i));
        expect(at(-i)).toBeLessThanOrEqual(1);
      }),
    );
  });
  it('has no jump anywhere: it changes by less than any share as the current does', () => {
    fc.assert(
      fc.property(point, fc.double({ min: -30, max: 1, noNaN: true }), (p, i) => {
        const at = (valley: number) => swingFraction(valley, p.inductance, p.charge, p.bus, p.share * p.bus, p.dead);
        const slope = p.dead / p.charge + Math.sqrt(p.inductance / (p.charge * p.bus));
        expect(Math.abs(at(i) - at(i + 1e-6))).toBeLessThanOrEqual(1e-6 * slope * 1.01 + 1e-12);
      }),
    );
  });
  it('is whole at the published condition ½·L·I² = Qoss·(Vi − 2·Vo), given time', () => {
    const current = zeroVoltageCurrent(1e-8, 48, 12, 1e-6);
    expect(swingFraction(-current, 1e-6, 2e-8, 48, 12, 1)).toBeCloseTo(1, 12);
    expect(swingFraction(-0.9 * current, 1e-6, 2e-8, 48, 12, 1)).toBeLessThan(1);
  });
  it('never needs energy where Vo is at least half of Vi', () =>
    expect(zeroVoltageCurrent(1e-8, 48, 24, 1e-6)).toBe(0));
  it('takes at most the gap, and charge over current otherwise', () => {
    expect(transitionTime(2e-8, 0, 1e-7)).toBe(1e-7);
    expect(transitionTime(2e-8, 4, 1e-7)).toBeCloseTo(5e-9, 15);
  });
  it('saves the gate its drain charge in proportion', () => {
    expect(gateChargeAfterSwing(5e-9, 1e-9, 0)).toBe(5e-9);
    expect(gateChargeAfterSwing(5e-9, 1e-9, 0.5)).toBeCloseTo(4.5e-9, 15);
  });
});

describe('Edges and gaps', () => {
  it('never lose less than nothing, and nothing at reversed current', () => {
    fc.assert(
      fc.property(fc.double({ min: -50, max: 50, noNaN: true }), positive(1e-7), (i, t) => {
        expect(overlapEnergy(48, i, t)).toBeGreaterThanOrEqual(0);
        expect(recoveryCharge(1e-8, 10, false, 0, i)).toBeGreaterThanOrEqual(0);
        expect(deadTimeEnergy(0.8, i, t, 2 * t)).toBe(0);
      }),
    );
    expect([overlapEnergy(48, -1, 1e-8), recoveryCharge(1e-8, 10, false, 0, -1)]).toEqual([0, 0]);
  });
  it('take longer with current through a common source inductance, and not without it', () => {
    expect(edgeTime(2e-9, 3e-9, 2, 2, 1e-10, 30)).toBeGreaterThan(edgeTime(2e-9, 3e-9, 2, 2, 1e-10, 10));
    expect(edgeTime(2e-9, 3e-9, 2, 2, 0, 30)).toBe(edgeTime(2e-9, 3e-9, 2, 2, 0, 10));
  });
  it('count a recovery charge that already holds the output charge only once', () => {
    expect(recoveryCharge(4e-8, 20, true, 1e-8, 20)).toBeCloseTo(3e-8, 15);
    expect(recoveryCharge(1e-8, 20, true, 4e-8, 20)).toBe(0);
  });
  it('lose the same by charge as by the triangle of that charge', () => {
    expect(recoveryLoss(12, 0.5 * 2 * 1e-8, 1e6)).toBeCloseTo(recoveryLossTriangle(12, 2, 1e-8, 1e6), 15);
  });
});

describe('Resistance and diodes', () => {
  it('parallel dice share: n dice have 1/n of the resistance', () => {
    expect(onResistance(0.01, 0.005, 1, 350, 4)).toBeCloseTo(onResistance(0.01, 0.005, 1, 350, 1) / 4, 15);
  });
  it('a Schottky loses less hot by its drop and more by its leakage, which doubles as its row says', () => {
    expect(diodeForwardLoss(0.4, -1e-3, 0.02, 5, 30, 350)).toBeLessThan(diodeForwardLoss(0.4, -1e-3, 0.02, 5, 30, 300));
    expect(diodeLeakageLoss(30, 1e-4, 12, 1, 362) / diodeLeakageLoss(30, 1e-4, 12, 1, 350)).toBeCloseTo(2, 12);
  });
  it('charging a junction by the square-root law burns two thirds of Q·V', () => {
    expect(diodeChargeEnergy(1e-8, 40, 40)).toBeCloseTo((2 / 3) * 1e-8 * 40, 18);
  });
});
