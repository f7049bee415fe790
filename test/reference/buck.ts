/** Published buck examples and the exact forms around them. */
import { bankRipple, createBank, createBankRipple, inputMeanSquare } from '../../model/capacitors/index.ts';
import { capacitiveRipple } from '../../model/capacitors/ripple.ts';
import { slewedExcursion, stepExcursion } from '../../model/control/load-step.ts';
import { conductionLoss, deadTimeEnergy } from '../../model/switches/index.ts';
import { mean, meanSquare, rms } from '../../model/waveform/moments.ts';
import { affine } from '../../model/waveform/waveform.ts';
import { type CaseGroup, type Common, make, type ReferenceCase } from './case.ts';
import { buck, chain, highRms, lowRms, ratioAt, triangle } from './stage-figures.ts';

const TPS40140: Common = {
  source: 'slus660h',
  place: 'section 6.1, pages 43 to 45',
  unit: '',
  mark: 'seen',
  tolerance: 0.01,
};
const LOW_RMS_8 = () => lowRms(20, 2.6591, 0.125) ** 2;

const tps40140: ReferenceCase[] = [
  make(
    { ...TPS40140, unit: 'H' },
    'least L for 15 % ripple at 13.2 V',
    0.89e-6,
    () => (buck(13.2, 1.5, 20, 1e-6, 5e5).ripple / 3) * 1e-6,
  ),
  make(
    { ...TPS40140, unit: 'A', tolerance: 0.005 },
    'ripple current, 1 µH, 13.2 V',
    2.66,
    () => buck(13.2, 1.5, 20, 1e-6, 5e5).ripple,
  ),
  make({ ...TPS40140, unit: 'A' }, 'input capacitor rms, D = 0.125', 6.6, () =>
    Math.sqrt(inputMeanSquare(1, 0.125, 20, 0)),
  ),
  make({ ...TPS40140, unit: 'Ω', tolerance: 0.02 }, 'input ESR for 50 mV at the peak current', 2.3e-3, () => {
    const s = buck(13.2, 1.5, 20, 1e-6, 5e5);
    return 0.05 / (s.current + s.ripple / 2);
  }),
  make({ ...TPS40140, unit: 'A', tolerance: 0.003 }, 'high-side rms, D = 0.125', 7.07, () =>
    highRms(20, 2.6591, 0.125),
  ),
  make({ ...TPS40140, unit: 'A', tolerance: 0.003 }, 'low-side rms, D = 0.125', 18.7, () => lowRms(20, 2.6591, 0.125)),
  make({ ...TPS40140, unit: 'W' }, 'low-side conduction, two switches of 4 mΩ', 0.7, () =>
    conductionLoss(LOW_RMS_8(), 2e-3),
  ),
  make({ ...TPS40140, unit: 'W', mark: 'computed' }, 'high-side conduction, implied 13.0 mΩ', 0.65, () =>
    conductionLoss(highRms(20, 2.6591, 0.125) ** 2, 13e-3),
  ),
  make(
    { ...TPS40140, unit: 'W', mark: 'computed' },
    'low-side diode, implied 38.5 ns·V',
    0.77,
    () => 2 * deadTimeEnergy(1, 20, 38.5e-9, 0) * 5e5,
  ),
];

const TPS40303: Common = { source: 'slus964a', place: 'page 15', unit: 'A', mark: 'seen', tolerance: 0.001 };
const RASHID: Common = {
  source: 'rashid-2014',
  place: 'example 5.5, public companion file',
  unit: '',
  mark: 'seen',
  tolerance: 0.001,
};
const HART1: Common = { source: 'hart-2011', place: 'example 6-1', unit: '', mark: 'from memory', tolerance: 0.001 };
const HART2: Common = { ...HART1, place: 'examples 6-2 and 6-3', tolerance: 0.005 };
const HART9: Common = { ...HART1, place: 'examples 6-7 and 6-9', tolerance: 0.002 };
const hart1 = () => buck(50, 20, 1, 400e-6, 20e3, true);
const hart2 = () => buck(48, 18, 1.8, 97.66e-6, 40e3, true);
const hart9Ratio = () => ratioAt(0.4, (2 * 200e-6 * 10e3) / 20);
const hart9 = () => buck(24, 24 * hart9Ratio(), (24 * hart9Ratio()) / 20, 200e-6, 10e3, true);

const worked: ReferenceCase[] = [
  make(TPS40303, 'inductor rms, 10 A and 3.5 A ripple', 10.05, () => rms(triangle(10, 3.5, 0.15))),
  make(
    { ...TPS40303, unit: 'F', tolerance: 0.02 },
    'output C for 100 mV at a 4 A step, form without the half',
    35e-6,
    () => (2 * stepExcursion(4, 400e-9, 1.8, 35.56e-6, 0) * 35.56e-6) / 0.1,
  ),
  make({ ...RASHID, unit: '1' }, 'duty, 12 V to 5 V', 0.4167, () => buck(12, 5, 1, 1e-3, 25e3).dutyCycle),
  make(
    { ...RASHID, unit: 'H' },
    'L for 0.8 A ripple',
    145.83e-6,
    () => (buck(12, 5, 1, 1e-3, 25e3).ripple / 0.8) * 1e-3,
  ),
  make({ ...RASHID, unit: 'F' }, 'C for 20 mV ripple', 200e-6, () => capacitiveRipple(0.8, 25e3, 0.02)),
  make(
    { ...RASHID, unit: 'H' },
    'critical L at 500 Ω',
    5.83e-3,
    () => (buck(12, 5, 0.01, 1e-3, 25e3).ripple / 0.02) * 1e-3,
  ),
  make({ ...RASHID, unit: 'F' }, 'critical C', 0.4e-6, () => capacitiveRipple(0.8, 25e3, 2 * 5)),
  make({ ...HART1, unit: 'V' }, 'output, D = 0.4', 20, () => 50 * ratioAt(0.4, (2 * 400e-6 * 20e3) / 20)),
  make({ ...HART1, unit: 'A' }, 'ripple', 1.5, () => hart1().ripple),
  make({ ...HART1, unit: 'A' }, 'largest current', 1.75, () => hart1().current + hart1().ripple / 2),
  make({ ...HART1, unit: 'A' }, 'smallest current', 0.25, () => hart1().current - hart1().ripple / 2),
  make({ ...HART1, unit: '1' }, 'relative output ripple', 0.00469, () => capacitiveRipple(1.5, 20e3, 100e-6) / 20),
  make({ ...HART2, unit: '1' }, 'duty', 0.375, () => hart2().dutyCycle),
  make(
    { ...HART2, unit: 'H' },
    'least L for continuous current',
    78e-6,
    () => (buck(48, 18, 1.8, 1e-4, 40e3).ripple / 3.6) * 1e-4,
  ),
  make({ ...HART2, unit: 'A' }, 'ripple', 2.88, () => hart2().ripple),
  make({ ...HART2, unit: 'A' }, 'largest current', 3.24, () => hart2().current + hart2().ripple / 2),
  make({ ...HART2, unit: 'A' }, 'inductor rms', 1.98, () => rms(triangle(1.8, hart2().ripple, 0.375))),
  make({ ...HART2, unit: 'F' }, 'C for 0.5 % ripple', 100e-6, () => capacitiveRipple(2.88, 40e3, 0.09)),
  make({ ...HART2, unit: 'A' }, 'capacitor rms', 0.83, () => rms(triangle(0, hart2().ripple, 0.375))),
  make({ ...HART9, unit: 'V' }, 'discontinuous output', 13.9, () => 24 * hart9Ratio()),
  make({ ...HART9, unit: '1' }, 'second interval', 0.29, () => hart9().fallShare),
  make({ ...HART9, unit: 'A' }, 'peak current', 2.017, () => hart9().ripple),
];

const RMS: Common = {
  source: 'slva057',
  place: 'rms forms of section 5; direct integration of the waveform',
  unit: 'A',
  mark: 'computed',
  tolerance: 1e-6,
};
const rmsChecks: ReferenceCase[] = [
  make(RMS, 'high side: 12 V, 1.8 V, 10 A, 3 A ripple', 3.88748, () => highRms(10, 3, 0.15)),
  make(RMS, 'low side', 9.254053, () => lowRms(10, 3, 0.15)),
  make(RMS, 'inductor', 10.03743, () => rms(triangle(10, 3, 0.15))),
  make(RMS, 'input capacitor with ripple', 3.586433, () => {
    const w = chain([0.15, 8.5, 11.5], [0.85, 0, 0]);
    affine(w, 1, -mean(w), w);
    return Math.sqrt(meanSquare(w));
  }),
  make(RMS, 'output capacitor', 0.866025, () => rms(triangle(0, 3, 0.15))),
];

const RATIO: Common = {
  source: 'slva057',
  place: 'section 2.2, page 10, ratio in discontinuous operation',
  unit: '1',
  mark: 'computed',
  tolerance: 1e-6,
};
/** Rows D, columns K = 0.01, 0.05, 0.1, 0.2, 0.4, 0.6. */
const RATIOS: readonly (readonly number[])[] = [
  [0.2, 0.828427, 0.579796, 0.463325, 0.358258, 0.270156, 0.227008],
  [0.3, 0.908327, 0.715549, 0.6, 0.482549, 0.375, 0.319493],
  [0.4, 0.944272, 0.8, 0.696663, 0.579796, 0.463325, 0.4],
  [0.5, 0.962912, 0.854102, 0.765564, 0.655869, 0.537592, 0.5],
  [0.7, 0.980385, 0.914637, 0.851893, 0.762618, 0.7, 0.7],
];
const K = [0.01, 0.05, 0.1, 0.2, 0.4, 0.6];
const ratios = RATIOS.flatMap(([duty, ...values]) =>
  values.map((value, i) =>
    make({ ...RATIO, tolerance: 1e-6 / value }, `Vo/Vi at D = ${duty}, K = ${K[i]}`, value, () => ratioAt(duty, K[i])),
  ),
);

/** ΔI, D, f, C, ESR, ESL, ripple in V. */
const RIPPLES: readonly (readonly number[])[] = [
  [2, 0.4, 500e3, 100e-6, 0, 0, 5e-3],
  [2, 0.4, 500e3, 100e-6, 2e-3, 0, 5.83333e-3],
  [2, 0.25, 500e3, 47e-6, 5e-3, 0, 13.77163e-3],
  [2, 0.1, 300e3, 470e-6, 10e-3, 0, 20e-3],
  [3, 0.15, 1e6, 22e-6, 3e-3, 0, 19.37487e-3],
  [3, 0.5, 200e3, 22e-6, 20e-3, 0, 95.78727e-3],
  [1, 0.3, 400e3, 10e-6, 60e-3, 0, 62.16071e-3],
  [2, 0.4, 500e3, 100e-6, 2e-3, 1e-9, 8.16665e-3],
];
/** Ripple of one R–C–L group under a triangle. */
function rippleOf([swing, duty, f, c1, r1, l1]: readonly number[]): number {
  const bank = Object.assign(createBank(), { c1, r1, l1 });
  const result = createBankRipple();
  bankRipple(bank, chain([duty / f, -swing / 2, swing / 2], [(1 - duty) / f, swing / 2, -swing / 2]), result);
  return result.ripple;
}
const ripples = RIPPLES.map((row) =>
  make(
    {
      source: 'slva057',
      place: 'section 5.1, exact form for C with ESR and ESL',
      unit: 'V',
      mark: 'computed',
      tolerance: 1e-4,
    },
    `output ripple: ${row[0]} A, D ${row[1]}, ${row[2] / 1e3} kHz, ${row[3] * 1e6} µF, ${row[4] * 1e3} mΩ, ${row[5] * 1e9} nH`,
    row[6],
    () => rippleOf(row),
  ),
);

/** L, C, ESR, Vo, ΔI, excursion in V. */
const STEPS: readonly (readonly number[])[] = [
  [1e-6, 833e-6, 0, 1.5, 10, 40.016e-3],
  [1e-6, 833e-6, 1.25e-3, 1.5, 10, 40.9922e-3],
  [400e-9, 35e-6, 0, 1.8, 4, 50.7937e-3],
  [400e-9, 35e-6, 7e-3, 1.8, 4, 54.6524e-3],
  [0.2e-6, 370e-6, 0, 1.8, 10, 15.015e-3],
  [2.2e-6, 470e-6, 8e-3, 3.3, 5, 40e-3],
];
const steps = STEPS.flatMap(([l, c, r, vo, step, dv]) => {
  const common: Common = {
    source: 'slus660h',
    place: 'equation 22 with the half that the page leaves out',
    unit: 'V',
    mark: 'computed',
    tolerance: 1e-5,
  };
  const what = `release of ${step} A: ${l * 1e6} µH, ${c * 1e6} µF, ${r * 1e3} mΩ, ${vo} V`;
  return [
    make(common, `${what}, closed form`, dv, () => stepExcursion(step, l, vo, c, r)),
    make(common, `${what}, integrated`, dv, () =>
      slewedExcursion(step, Number.POSITIVE_INFINITY, vo / l, 0, c, r, 0, 0),
    ),
  ];
});

const ON_TIME: Common = {
  source: 'ltc3728',
  place: 'page 28, Vo/(Vi·f)',
  unit: 's',
  mark: 'computed',
  tolerance: 0.003,
};
const onTimes = [
  make(ON_TIME, 'on-time, 48 V to 1 V at 1 MHz', 20.8e-9, () => buck(48, 1, 10, 1e-6, 1e6).dutyCycle / 1e6),
  make(ON_TIME, 'on-time, 48 V to 1 V at 300 kHz', 69.4e-9, () => buck(48, 1, 10, 1e-6, 3e5).dutyCycle / 3e5),
];

export const BUCK: readonly CaseGroup[] = [
  { title: 'Buck: a published 12 V to 1.5 V, 20 A design', cases: tps40140 },
  { title: 'Buck: other worked examples', cases: worked },
  { title: 'Buck: rms currents', cases: rmsChecks },
  { title: 'Buck: discontinuous ratio', cases: ratios },
  { title: 'Output ripple with ESR and ESL', cases: ripples },
  { title: 'Load step', cases: steps },
  { title: 'On-time at a high ratio', cases: onTimes },
];
