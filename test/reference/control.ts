/** Control room: slewed load steps, compensator, input filter. */
import { compensatorParts, designCompensator, loopMargin, plantResponse } from '../../model/control/index.ts';
import { dampedPeak, dampingResistance, filterCorner, filterImpedanceLimit } from '../../model/control/input-filter.ts';
import { crossoverLimit, rightHalfPlaneZero, slewedExcursion } from '../../model/control/load-step.ts';
import { type CaseGroup, type Common, make } from './case.ts';

const STEP: Common = {
  source: 'slus660h',
  place: 'bank current of equation 22 with slew and delay, integrated in 2 million steps in another program',
  unit: 'V',
  mark: 'computed',
  tolerance: 1e-4,
};
const steps = [
  make(STEP, '20 A at 100 A/µs, phases 5 A/µs after 0.5 µs, 1 mF 0.5 mΩ 0.1 nH, 3 A offset', 0.062525, () =>
    slewedExcursion(20, 100e6, 5e6, 0.5e-6, 1e-3, 0.5e-3, 0.1e-9, 3),
  ),
  make(STEP, '4 A at 5 A/µs, phases 2 A/µs after 1 µs, 200 µF 3 mΩ 0.5 nH, 0.5 A offset', 0.04061251, () =>
    slewedExcursion(4, 5e6, 2e6, 1e-6, 200e-6, 3e-3, 0.5e-9, 0.5),
  ),
];

const PLANT = {
  gain: 12,
  inductance: 1e-6,
  capacitance: 500e-6,
  seriesResistance: 2e-3,
  loadResistance: 0.15,
  pathResistance: 3e-3,
  delay: 1e-6,
};
const LOOP: Common = {
  source: 'venable-1983',
  place: 'k-factor at 50 kHz and 60°, complex arithmetic in another program',
  unit: '1',
  mark: 'computed',
  tolerance: 1e-6,
};
const compensator = designCompensator(PLANT, 50e3, Math.PI / 3);
const loops = [
  make(LOOP, 'plant magnitude at 50 kHz', 0.25632776, () => plantResponse(PLANT, 2 * Math.PI * 50e3).magnitude),
  make(
    { ...LOOP, unit: '°' },
    'plant phase at 50 kHz',
    -177.187645,
    () => (plantResponse(PLANT, 2 * Math.PI * 50e3).phase * 180) / Math.PI,
  ),
  make({ ...LOOP, unit: 'Hz' }, 'zeros', 7207.8616, () => compensator.zero1 / (2 * Math.PI)),
  make({ ...LOOP, unit: 'Hz' }, 'poles', 346843.507, () => compensator.pole1 / (2 * Math.PI)),
  make(
    { ...LOOP, unit: 'Hz' },
    'crossover of the loop',
    50e3,
    () => loopMargin(PLANT, compensator, 1e3, 5e5).crossover,
  ),
  make(
    { ...LOOP, unit: '°' },
    'phase margin of the loop',
    60,
    () => (loopMargin(PLANT, compensator, 1e3, 5e5).phaseMargin * 180) / Math.PI,
  ),
  make(
    { ...LOOP, unit: 'F' },
    'input capacitor C3 = (1 − z/p)/(z·R1)',
    2.162188e-9,
    () => compensatorParts(compensator, 1e4).c3,
  ),
  make(
    { ...LOOP, source: 'erickson-maksimovic-2001', place: 'chapter 8, R·D²/L at R = Vi²/P', unit: 'rad/s' },
    'zero of reverse flow, 12 V side, 120 W, 1 µH',
    1.2e6,
    () => rightHalfPlaneZero(12, -120, 1e-6),
  ),
  make(
    { ...LOOP, source: 'qiu-2004', place: 'sideband limit f/3', unit: 'Hz' },
    'crossover, 300 kHz, four phases, k 0.1',
    1e5,
    () => crossoverLimit(3e5, 4, 0.1),
  ),
];

const FILTER: Common = {
  source: 'erickson-maksimovic-2001',
  place: 'chapter 10, least peak impedance found by search in another program',
  unit: '1',
  mark: 'computed',
  tolerance: 1e-3,
};
const filters = [
  make(FILTER, 'best damping resistance, n 1', 1.4490947, () => dampingResistance(1, 1)),
  make(FILTER, 'peak there, n 1', 2.4494866, () => dampedPeak(1, 1)),
  make(FILTER, 'best damping resistance, n 4', 0.61212, () => dampingResistance(1, 4)),
  make(FILTER, 'peak there, n 4', 0.8660254, () => dampedPeak(1, 4)),
  make(
    { ...FILTER, source: 'middlebrook-1976', place: 'a third of Vi²/P', unit: 'Ω', tolerance: 1e-9 },
    '36 V, 100 W',
    4.32,
    () => filterImpedanceLimit(36, 100),
  ),
  make(
    { ...FILTER, source: 'middlebrook-1976', place: 'corner 1/(2π·√(L·C))', unit: 'Hz', tolerance: 1e-6 },
    '1 µH, 100 µF',
    15915.494,
    () => filterCorner(1e-6, 1e-4),
  ),
];

export const CONTROL: readonly CaseGroup[] = [
  { title: 'Load step with slew and delay', cases: steps },
  { title: 'Compensator and loop', cases: loops },
  { title: 'Input filter', cases: filters },
];
