/** Laws of heat: balances close, more cooling is cooler, runaway is told apart. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  boardConductance,
  fixedPoint,
  mixedFixedPoint,
  parallelResistance,
  sinkCost,
  sinkMass,
  sinkVolume,
  surfaceCoefficient,
  surfacePower,
  surfaceRise,
  volumetricResistance,
} from '../../../model/heat/index.ts';

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });

describe('A surface', () => {
  it('takes the rise at which it gives off the power', () => {
    fc.assert(
      fc.property(between(0.05, 10), between(5e-4, 2e-2), between(0, 5), (power, area, speed) => {
        const rise = surfaceRise(power, area, Math.sqrt(area), speed, 313.15);
        if (rise > 200) return; // outside the stated range
        expect(surfacePower(rise, area, Math.sqrt(area), speed, 313.15) / power).toBeCloseTo(1, 5);
      }),
    );
  });
  it('is cooler with more air, never by a jump', () => {
    fc.assert(
      fc.property(between(0.1, 5), between(0, 5), (power, speed) => {
        const at = (v: number) => surfaceRise(power, 3e-3, 0.05, v, 313.15);
        expect(at(speed + 0.1)).toBeLessThanOrEqual(at(speed) * (1 + 1e-6));
        expect(Math.abs(at(speed) - at(speed + 1e-5)) / at(speed)).toBeLessThan(1e-3);
      }),
    );
  });
  it('without power stays at ambient', () => expect(surfaceRise(0, 1e-3, 0.03, 0, 300)).toBe(0));
  it('in still air at 40 K carries between 8 and 16 W/(m²·K), as textbooks say', () => {
    expect(surfaceCoefficient(40, 0.05, 0, 313.15)).toBeGreaterThan(8);
    expect(surfaceCoefficient(40, 0.05, 0, 313.15)).toBeLessThan(16);
  });
  it('of a board carries more with area and air, less than in proportion to area', () => {
    expect(boardConductance(5e-3, 0) / boardConductance(2.5e-3, 0)).toBeGreaterThan(1.7);
    expect(boardConductance(5e-3, 0) / boardConductance(2.5e-3, 0)).toBeLessThan(2);
    expect(boardConductance(5e-3, 2)).toBeGreaterThan(boardConductance(5e-3, 0));
  });
});

describe('A fixed point', () => {
  it('reproduces its own loss', () => {
    fc.assert(
      fc.property(between(260, 340), between(1, 60), between(0, 2), between(0, 2), (ambient, r, constant, growing) => {
        const t = mixedFixedPoint(ambient, r, constant, growing, 0.005);
        if (!Number.isFinite(t)) {
          expect(r * growing * 0.005).toBeGreaterThanOrEqual(1);
          return;
        }
        const loss = constant + growing * (1 + 0.005 * (t - 298.15));
        expect(ambient + r * loss).toBeCloseTo(t, 6);
      }),
    );
  });
  it('is runaway when resistance × loss × coefficient reaches one', () => {
    expect(fixedPoint(313, 100, 2, 0.005)).toBe(Number.POSITIVE_INFINITY);
    expect(fixedPoint(313, 99, 2, 0.005)).toBeGreaterThan(313);
  });
  it('of two paths side by side is cooler than either', () => {
    expect(parallelResistance(30, 60)).toBeCloseTo(20, 12);
    expect(parallelResistance(30, Number.POSITIVE_INFINITY)).toBeCloseTo(30, 12);
  });
});

describe('A sink', () => {
  it('stays inside the published bands at the three air speeds and between them has no jump', () => {
    const bands = [
      [0, 500e-6, 800e-6],
      [1, 150e-6, 250e-6],
      [2.5, 80e-6, 150e-6],
    ];
    for (const [v, low, high] of bands) {
      expect(volumetricResistance(v)).toBeGreaterThanOrEqual(low);
      expect(volumetricResistance(v)).toBeLessThanOrEqual(high);
    }
    fc.assert(
      fc.property(between(0, 3), (v) => {
        expect(volumetricResistance(v + 1e-6)).toBeLessThanOrEqual(volumetricResistance(v) + 1e-15);
        expect(volumetricResistance(v) - volumetricResistance(v + 1e-6)).toBeLessThan(1e-9);
      }),
    );
  });
  it('is none where none is needed, and costs and weighs in proportion', () => {
    expect(sinkVolume(Number.POSITIVE_INFINITY, 0)).toBe(0);
    expect(sinkMass(2e-4) / sinkMass(1e-4)).toBeCloseTo(2, 12);
    expect(sinkCost(2e-4) / sinkCost(1e-4)).toBeCloseTo(2, 12);
  });
});
