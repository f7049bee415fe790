/** Capacitor banks of two groups, life, cost: values from outside the model's own solution. */
import {
  type BankRipple,
  bankRipple,
  createBank,
  createBankRipple,
  electrolyticCost,
  electrolyticLife,
  filmCost,
  inputChargeRipple,
} from '../../model/capacitors/index.ts';
import type { Waveform } from '../../model/waveform/waveform.ts';
import { type CaseGroup, type Common, make } from './case.ts';
import { chain } from './stage-figures.ts';

const BANK: Common = {
  source: 'erickson-maksimovic-2001',
  place: 'network of two capacitors with series resistance, Runge-Kutta to its periodic state in another program',
  unit: '',
  mark: 'computed',
  tolerance: 1e-8,
};
function solve(c1: number, r1: number, c2: number, r2: number, current: Waveform): BankRipple {
  const result = createBankRipple();
  bankRipple(Object.assign(createBank(), { c1, r1, c2, r2 }), current, result);
  return result;
}
const BANKS = [
  {
    name: '44 µF 1 mΩ beside 220 µF 12 mΩ, triangle 4 A, D 0.25, 500 kHz',
    solve: () => solve(44e-6, 1e-3, 220e-6, 12e-3, chain([0.25 / 5e5, -2, 2], [0.75 / 5e5, 2, -2])),
    values: [0.01804739389, 0.9091071378, 0.5162483715],
  },
  {
    name: '20 µF 1 mΩ beside 200 µF 15 mΩ, three slopes, 300 kHz',
    solve: () => solve(20e-6, 1e-3, 200e-6, 15e-3, chain([0.3 / 3e5, -2, 2], [0.2 / 3e5, 2, 1], [0.5 / 3e5, 1, -2])),
    values: [0.04112865428, 0.5633922565, 0.9155257341],
  },
  {
    name: 'input: 40 µF 1.5 mΩ beside 300 µF 30 mΩ, pulses of 18 to 22 A, D 0.12, 200 kHz',
    solve: () => solve(40e-6, 1.5e-3, 300e-6, 30e-3, chain([0.12 / 2e5, 18, 22], [0.88 / 2e5, 0, 0])),
    values: [0.2457181186, 5.7958373677, 2.0797863972],
  },
];
const banks = BANKS.flatMap(({ name, solve: run, values }) => [
  // The other program looks for extremes on its grid only.
  make({ ...BANK, unit: 'V', tolerance: 1e-6 }, `${name}: ripple`, values[0], () => run().ripple),
  make({ ...BANK, unit: 'A' }, `${name}: rms of the first`, values[1], () => Math.sqrt(run().meanSquare1)),
  make({ ...BANK, unit: 'A' }, `${name}: rms of the second`, values[2], () => Math.sqrt(run().meanSquare2)),
]);

const COST: Common = {
  source: 'burkart-kolar-2013',
  place: 'coefficients as public code that cites the paper has them',
  unit: 'EUR',
  mark: 'computed',
  tolerance: 3e-5,
};
const other = [
  make(
    { source: 'ncp5314', place: 'page 20: life halves each 10 K', unit: '1', mark: 'seen', tolerance: 1e-12 },
    'life 20 K below rating over rated life',
    4,
    () => electrolyticLife(1, 378.15, 358.15),
  ),
  make(COST, 'electrolytic, 470 µF 450 V', 3.0029, () => electrolyticCost(470e-6, 450)),
  make(COST, 'film, 10 µF 1000 V', 1.9536, () => filmCost(10e-6, 1000)),
  make(
    {
      source: 'slus660h',
      place: 'equation 25 with the 1 − D that the page leaves out',
      unit: 'V',
      mark: 'computed',
      tolerance: 1e-9,
    },
    'input charge ripple, 20 A, D 0.125, 500 kHz, 50 µF',
    0.0875,
    () => inputChargeRipple(20, 0.125, 5e5, 50e-6),
  ),
];

export const CAPACITORS: readonly CaseGroup[] = [
  { title: 'Capacitors: banks of two groups', cases: banks },
  { title: 'Capacitors: life and cost', cases: other },
];
