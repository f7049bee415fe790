/** Switch losses: worked examples and the square-root charge law. */

import { mixedFixedPoint } from '../../model/heat/resistance.ts';
import {
  chargeCapacitance,
  conductionLoss,
  deadTimeEnergy,
  edgeTime,
  energyCapacitance,
  gateLoss,
  hardEdgeEnergy,
  OUTPUT_CHARGE,
  OUTPUT_ENERGY,
  onResistance,
  outputAt,
  overlapEnergy,
  partialEdgeEnergyAt,
  zeroVoltageCurrent,
} from '../../model/switches/index.ts';
import { type CaseGroup, type Common, make } from './case.ts';

const ROHM: Common = { source: 'rohm-aek59', place: 'worked example', unit: 'W', mark: 'seen', tolerance: 1e-9 };
const NOTE: Common = { ...ROHM, source: 'rohm-64an035e', place: 'loss equations, with the figures of AEK59' };
const high = () => conductionLoss(9 * (5 / 12), 0.1);
const low = () => conductionLoss(9 * (7 / 12), 0.07);
const overlap = () => overlapEnergy(12, 3, 10e-9) * 2e6;
const dead = () => 2 * deadTimeEnergy(0.5, 3, 30e-9, 0) * 2e6;
const gate = () => 2 * gateLoss(1e-9, 5, 2e6);
const rohm = [
  make(ROHM, 'high-side conduction', 0.375, high),
  make(ROHM, 'low-side conduction', 0.3675, low),
  make(NOTE, 'overlap', 0.36, overlap),
  make(NOTE, 'dead time', 0.18, dead),
  make(NOTE, 'gate drive', 0.02, gate),
  make({ ...ROHM, tolerance: 5e-3 }, 'all losses with 12 mW of the controller', 1.31, () =>
    [high(), low(), overlap(), dead(), gate(), 12e-3].reduce((a, b) => a + b),
  ),
];

const TPS43340: Common = {
  source: 'slvsb16b',
  place: 'page 29, equations 31 and 32',
  unit: 'W',
  mark: 'seen',
  tolerance: 0.01,
};
const tps43340 = [
  make(TPS43340, 'high side', 0.58, () => {
    const square = 2.2 ** 2 * (1.8 / 5);
    return conductionLoss(square, 0.28) + overlapEnergy(5, 2.2, 40e-9) * 400e3;
  }),
  make(TPS43340, 'low side', 0.89, () => {
    const square = 2.2 ** 2 * (1 - 1.8 / 5);
    return conductionLoss(square, 0.28) + 2 * deadTimeEnergy(0.6, 2.2, 20e-9, 0) * 400e3;
  }),
];

/** C0/√V with C0 = 1e-9 F·√V at 48 V. */
const ROOT = { outputCharge: 13.85641e-9, outputEnergy: 221.7025e-9, outputTestVoltage: 48 };
const out = new Float64Array(2);
const CHARGE: Common = {
  source: 'kasper-2016',
  place: 'square-root capacitance, integrated by hand',
  unit: 'J',
  mark: 'computed',
  tolerance: 1e-6,
};
const quarter = (index: number) => {
  outputAt(ROOT, 12, out);
  return out[index];
};
const charge = [
  make(CHARGE, 'hard edge of two equal devices: Qoss·V', 665.1075e-9, () =>
    hardEdgeEnergy(ROOT.outputCharge, ROOT.outputEnergy, ROOT.outputEnergy, 48),
  ),
  make({ ...CHARGE, unit: 'C' }, 'charge at a quarter of the voltage: half', 6.928205e-9, () => quarter(OUTPUT_CHARGE)),
  make(CHARGE, 'energy at a quarter of the voltage: an eighth', 27.7128125e-9, () => quarter(OUTPUT_ENERGY)),
  make(
    { ...CHARGE, source: 'jedec-coss', place: 'definition', unit: 'F' },
    'charge-equivalent capacitance',
    288.6751e-12,
    () => chargeCapacitance(ROOT.outputCharge, 48),
  ),
  make(
    { ...CHARGE, source: 'jedec-coss', place: 'definition', unit: 'F' },
    'energy-equivalent capacitance',
    192.4501e-12,
    () => energyCapacitance(ROOT.outputEnergy, 48),
  ),
  make({ ...CHARGE, tolerance: 1e-9 }, 'edge after a full swing', 0, () => {
    partialEdgeEnergyAt(ROOT, 1, ROOT, 1, 48, 1, out);
    return out[0];
  }),
  make(
    { ...CHARGE, unit: 'A', tolerance: 1e-3 },
    'full swing by energy, 1 µH, 48 V to 12 V: √(2·13.856 nC·24 V/1 µH)',
    0.8155,
    () => zeroVoltageCurrent(ROOT.outputCharge, 48, 12, 1e-6),
  ),
];

const REN: Common = {
  source: 'ren-2006',
  place: 'gate loop with common-source inductance, integrated step by step',
  unit: 's',
  mark: 'computed',
  tolerance: 2e-3,
};
const edges = [
  // 2 nC + 3 nC, 2 V over the plateau, 2 Ω: 5 ns; with 0.1 nH and 20 A the gate loop of the current rise needs 1 ns more.
  make(REN, '5 nC through 2 Ω at 2 V', 5e-9, () => edgeTime(2e-9, 3e-9, 2, 2, 0, 20)),
  make(REN, 'the same with 0.1 nH and 20 A', 6e-9, () => edgeTime(2e-9, 3e-9, 2, 2, 0.1e-9, 20)),
];

const HOT: Common = {
  source: 'ltc3729',
  place: 'page 14, 0.005 per kelvin; fixed point by algebra',
  unit: 'K',
  mark: 'computed',
  tolerance: 1e-9,
};
const heat = [
  make({ ...HOT, unit: 'Ω' }, '10 mΩ at 125 °C', 0.015, () => onResistance(0.01, 0.005, 1, 398.15, 1)),
  // T = 313.15 + 40·(0.5 + 1·(1 + 0.005·(T − 298.15))), so 0.8·T = 313.15 + 60 − 59.63.
  make(HOT, 'half a watt constant and one growing, 40 K/W, 40 °C', 391.9, () =>
    mixedFixedPoint(313.15, 40, 0.5, 1, 0.005),
  ),
];

export const SWITCHES: readonly CaseGroup[] = [
  { title: 'Switch losses: 12 V to 5 V, 3 A, 2 MHz', cases: rohm },
  { title: 'Switch losses: 5 V to 1.8 V, 2.2 A, 400 kHz', cases: tps43340 },
  { title: 'Switch losses: output charge', cases: charge },
  { title: 'Switch losses: edge time', cases: edges },
  { title: 'Switch losses: temperature', cases: heat },
];
