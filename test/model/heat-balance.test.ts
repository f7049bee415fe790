/** The heat balance of one point: it solves its own equations, and runs away where print says so. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { HeatBalance, HOT_PARTS, solveHeat } from '../../model/heat-balance.ts';

/** A balance with nothing in it but `over`. */
function balance(over: { conductance: number; ambient: number }): HeatBalance {
  const h = new HeatBalance();
  h.constant.fill(0);
  h.slope.fill(0);
  h.resistance.fill(0);
  h.faces.fill(0);
  h.allowed.fill(1e4);
  h.boardConstant = 0;
  h.boardSlope = 0;
  h.boardAllowed = 1e4;
  return Object.assign(h, over);
}

describe('fixed point of one part: Tj = (Ta + Rth·P0·(1 − 25·a))/(1 − Rth·P0·a) (LTC3728/LTC3729, seen; algebra computed)', () => {
  // The part on an ideal board: 2 W at 25 °C, 20 K/W, 0.005 per kelvin, 40 °C ambient: (40 + 40·0.875)/(1 − 0.2) = 93.75 °C.
  const part = (watts: number, resistance: number): HeatBalance => {
    const h = balance({ conductance: 1e12, ambient: 313.15 });
    h.slope[0] = watts * 0.005;
    h.constant[0] = watts * (1 - 0.005 * 298.15);
    h.resistance[0] = resistance;
    solveHeat(h);
    return h;
  };

  it('2 W through 20 K/W settles at 93.75 °C with a loop gain of 0.2', () => {
    const h = part(2, 20);
    expect(h.temperature[0] - 273.15).toBeCloseTo(93.75, 9);
    expect(h.runaway).toBeCloseTo(0.2, 9);
  });

  it('runs away where Rth·P0·a reaches 1: 10 W through 20 K/W', () => {
    expect(part(9.9, 20).runaway).toBeLessThan(1);
    expect(part(10, 20).runaway).toBeGreaterThanOrEqual(1);
    expect(part(100, 20).runaway).toBeCloseTo(10, 9);
    expect(Number.isFinite(part(100, 20).temperature[0])).toBe(true);
  });
});

describe('any balance', () => {
  const drawn = fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { minLength: 40, maxLength: 40 });

  /** Losses up to 5 W and 10 mW/K a part, up to 20 K/W to a board of 0.2 W/K to 1.2 W/K. */
  function draw(shares: readonly number[]): HeatBalance {
    const h = balance({ conductance: 0.2 + shares[0], ambient: 280 + 50 * shares[1] });
    for (let i = 0; i < HOT_PARTS; i++) {
      h.slope[i] = 0.01 * shares[2 + i];
      // A part's loss is what it is at the ambient; its line goes through zero somewhere below.
      h.constant[i] = 5 * shares[10 + i] - h.slope[i] * h.ambient;
      h.resistance[i] = 20 * shares[18 + i];
      // Half of the parts have faces of their own, of up to 0.1 W/K.
      h.faces[i] = Math.max(0, 0.2 * shares[26 + i] - 0.1);
    }
    h.boardSlope = 0.005 * shares[31];
    h.boardConstant = shares[30] - h.boardSlope * h.ambient;
    solveHeat(h);
    return h;
  }

  it('solves its own equations: part over board by what its faces leave, board over ambient by all that reaches it', () => {
    fc.assert(
      fc.property(drawn, (shares) => {
        const h = draw(shares);
        fc.pre(h.runaway < 0.9);
        let board = h.boardConstant + h.boardSlope * h.boardTemperature;
        let total = board;
        for (let i = 0; i < HOT_PARTS; i++) {
          const watts = h.constant[i] + h.slope[i] * h.temperature[i];
          const rest = watts - h.faces[i] * (h.temperature[i] - h.ambient);
          expect(h.temperature[i] - h.boardTemperature).toBeCloseTo(h.resistance[i] * rest, 6);
          board += rest;
          total += watts;
        }
        expect(h.total).toBeCloseTo(total, 6);
        expect(h.boardTemperature - h.ambient).toBeCloseTo(board / h.conductance, 6);
      }),
    );
  });

  it('a better way to the air cools every part', () => {
    fc.assert(
      fc.property(drawn, (shares) => {
        const warm = draw(shares);
        fc.pre(warm.runaway < 0.9 && warm.total > 0.1);
        const cool = draw([Math.min(1, shares[0] + 0.2), ...shares.slice(1)]);
        for (let i = 0; i < HOT_PARTS; i++) expect(cool.temperature[i]).toBeLessThanOrEqual(warm.temperature[i] + 1e-9);
      }),
    );
  });

  it('faces that give more to the air cool every part and the board', () => {
    fc.assert(
      fc.property(drawn, (shares) => {
        const bare = draw([
          ...shares.slice(0, 26),
          ...Array<number>(HOT_PARTS).fill(0),
          ...shares.slice(26 + HOT_PARTS),
        ]);
        fc.pre(bare.runaway < 0.9);
        const faced = draw(shares);
        expect(faced.boardTemperature).toBeLessThanOrEqual(bare.boardTemperature + 1e-9);
        for (let i = 0; i < HOT_PARTS; i++)
          expect(faced.temperature[i]).toBeLessThanOrEqual(bare.temperature[i] + 1e-9);
      }),
    );
  });

  it('the heat sink that it asks for is enough: with it every part keeps its limit', () => {
    fc.assert(
      fc.property(drawn, (shares) => {
        const h = draw(shares);
        // Short paths and a poor board: what is too hot is so for the board's sake, which a sink can mend.
        for (let i = 0; i < HOT_PARTS; i++) h.resistance[i] *= 0.2;
        h.allowed.fill(h.ambient + 70);
        h.conductance *= 0.2;
        solveHeat(h);
        fc.pre(h.sinkNeeded > 0);
        h.conductance += h.sinkNeeded;
        solveHeat(h);
        for (let i = 0; i < HOT_PARTS; i++) expect(h.temperature[i]).toBeLessThanOrEqual(h.allowed[i] + 1e-9);
        expect(h.sinkNeeded).toBe(0);
      }),
    );
  });
});
