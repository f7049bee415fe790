/**
 * Switching losses of transformer stages, watt by watt, at a place where each is a product of round numbers: 48 V on the primary, turns 4,
 * 20 A, 200 kHz, no ripple; 10 nC at 50 V of a linear output capacitance, edges of 20 ns and 10 ns. Expected values are worked by hand from the
 * printed forms: ½·V·I·t·f, Q·V·f (ROHM AEK59-D1-0065-2, seen), ½·L·I² against Q·V (Sabaté 1990, from memory).
 */
import { describe, expect, it } from 'vitest';
import { prepareEdges } from '../../model/edge-figures.ts';
import { LOSS_SLOTS } from '../../model/ledger.ts';
import type { Driver } from '../../model/parts/power-stage.ts';
import type { Architecture } from '../../model/stages/list.ts';
import { solvedDesign } from '../reference/ideal-stage.ts';
import { idealSwitch } from './support.ts';

/** t = Q·R/V: 10 nC through 5 Ω at 2.5 V above the plateau on, through 2.5 Ω at 2.5 V below it off. */
const ROW = idealSwitch({
  gateCharge: 20e-9,
  gateChargeSwitch: 10e-9,
  outputCharge: 10e-9,
  outputEnergy: 0.5 * 10e-9 * 50,
  outputTestVoltage: 50,
  recoveryCharge: 20e-9,
  recoveryCurrent: 10,
  bodyDrop: 0.8,
});
const DRIVER: Driver = {
  driveVoltage: 5,
  linearDriveSupply: true,
  driverSourceResistance: 5,
  driverSinkResistance: 2.5,
  deadTime: 50e-9,
};

/** Loss by slot, W. */
function losses(architecture: Architecture, over: { leakage?: number; shifted?: boolean } = {}): Map<string, number> {
  const half = architecture.startsWith('half');
  const twice = architecture.endsWith('centre-tap') ? 2 : 1;
  const { design, state } = solvedDesign({
    architecture,
    frequency: 200e3,
    input: half ? 96 : 48,
    output: (twice * 0.35 * 48) / 4,
    current: 20,
    ratio: 4,
    ...over,
  });
  design.driver = DRIVER;
  for (const edges of [design.highEdges, design.lowEdges]) prepareEdges(edges, ROW, 1, DRIVER);
  const watts = new Float64Array(LOSS_SLOTS.length);
  design.stage.addEdgeLosses(design, state, watts);
  return new Map(LOSS_SLOTS.map(([part, effect], i) => [`${part}.${effect}`, watts[i] ?? Number.NaN]));
}

/** Expects each of `wanted`, to the ripple that one henry leaves. */
function expectLosses(found: Map<string, number>, wanted: Readonly<Record<string, number>>): void {
  for (const [slot, watts] of Object.entries(wanted)) {
    if (watts === 0) expect(found.get(slot), slot).toBe(0);
    else expect((found.get(slot) ?? Number.NaN) / watts, slot).toBeCloseTo(1, 5);
  }
}

describe('a full bridge with a centre tap: four switches, two rectifiers', () => {
  it('hard switched: each switch turns on 5 A from half the input and off against the whole', () => {
    expectLosses(losses('full-bridge-centre-tap'), {
      // 4·200 kHz·½·5 A·(24 V·20 ns + 48 V·10 ns)
      'highSwitch.overlap': 1.92,
      // 4·200 kHz·(4.8 nC·24 V): the charge of equal dice at half the input
      'highSwitch.outputCharge': 0.09216,
      // 4·200 kHz·20 nC·5 V
      'highSwitch.gate': 0.08,
      'lowSwitch.gate': 0.04,
      // 6 gates of 20 nC from 48 V in all: (48 − 5) V
      'controller.driveSupply': 6 * 200e3 * 20e-9 * 43,
      // 2·200 kHz·4.8 nC·24 V: what rings at the secondary, twice 12 V
      'lowSwitch.outputCharge': 0.04608,
      // Half of 20 A commutates in each: 2·200 kHz·24 V·20 nC
      'lowSwitch.recovery': 0.192,
      // 2·200 kHz·0.8 V·(10 A·50 ns, before and after)
      'lowSwitch.deadTime': 0.32,
    });
  });

  it('shifted: no overlap at turn-on, and the lagging leg pays for the swing that its leakage cannot make', () => {
    // 9.6 nC·48 V = 460.8 nJ against ½·L·(5 A)²: half of it with 18.432 nH, all of it with twice that.
    expectLosses(losses('full-bridge-centre-tap', { shifted: true, leakage: 18.432e-9 }), {
      'highSwitch.overlap': 0.96,
      // Two of four switches, half of 460.8 nJ each
      'highSwitch.outputCharge': 2 * 200e3 * 0.5 * 460.8e-9,
    });
    expectLosses(losses('full-bridge-centre-tap', { shifted: true, leakage: 36.87e-9 }), {
      'highSwitch.outputCharge': 0,
    });
  });
});

describe('the other stages differ by what they have', () => {
  it('half bridge on 96 V: two switches turn on from 48 V and off against 96 V', () => {
    expectLosses(losses('half-bridge-centre-tap'), {
      // 2·200 kHz·½·5 A·(48 V·20 ns + 96 V·10 ns)
      'highSwitch.overlap': 1.92,
      // 2·200 kHz·9.6 nC·48 V
      'highSwitch.outputCharge': 2 * 200e3 * 460.8e-9,
      'lowSwitch.recovery': 0.192,
    });
  });

  it('two-switch forward: clamp diodes stand where a leg has its partner, so only the own energy burns', () => {
    expectLosses(losses('two-switch-forward'), {
      // 2·200 kHz·½·5 A·(24 V·20 ns + 48 V·10 ns)
      'highSwitch.overlap': 0.96,
      // ½·4.8 nC·24 V
      'highSwitch.outputCharge': 2 * 200e3 * 57.6e-9,
      // 20 A in each of two rectifiers, on 12 V
      'lowSwitch.recovery': 2 * 200e3 * 12 * 40e-9,
    });
  });

  it('current doubler: each rectifier commutates the current of one choke, on the secondary alone', () => {
    expectLosses(losses('full-bridge-current-doubler'), {
      // The primary carries 10 A/4
      'highSwitch.overlap': 0.96,
      // 2·200 kHz·2.4 nC·12 V
      'lowSwitch.outputCharge': 2 * 200e3 * 2.4e-9 * 12,
      // 2·200 kHz·12 V·20 nC
      'lowSwitch.recovery': 0.096,
      'lowSwitch.deadTime': 0.32,
    });
  });
});
