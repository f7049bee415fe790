/** Transformer stages: worked examples and winding currents. Their choke is a buck's at the rectified wave. */
import { capacitiveRipple } from '../../model/capacitors/ripple.ts';
import { fluxSwing } from '../../model/magnetics/flux.ts';
import { leakageInductance } from '../../model/magnetics/leakage.ts';
import { rms } from '../../model/waveform/moments.ts';
import { type CaseGroup, type Common, make } from './case.ts';
import { chain, choke } from './stage-figures.ts';

const FORWARD: Common = {
  source: 'hart-2011',
  place: 'example 7-4, forward',
  unit: 'A',
  mark: 'from memory',
  tolerance: 5e-3,
};
const forward = () => choke(48 / 1.5 - 12.8, 12.8, 1.28, 0.4e-3, 35e3, true);
const PUSH: Common = { ...FORWARD, place: 'example 7-6, push-pull', tolerance: 1e-3 };
const push = () => choke(15 - 9, 9, 1.5, 0.5e-3, 20e3, true);
const hart = [
  make({ ...FORWARD, unit: '1' }, 'duty for 12.8 V', 0.4, () => forward().dutyCycle),
  make(FORWARD, 'ripple', 0.549, () => forward().ripple),
  make(FORWARD, 'largest current', 1.55, () => forward().current + forward().ripple / 2),
  make(FORWARD, 'smallest current', 1.01, () => forward().current - forward().ripple / 2),
  make({ ...FORWARD, tolerance: 0.005 }, 'magnetizing peak: 48 V for 0.4/35 kHz on 5 mH', 0.11, () =>
    fluxSwing(48, 0.4 / 35e3, 1, 5e-3),
  ),
  make(
    { ...FORWARD, unit: '1' },
    'relative output ripple',
    0.00153,
    () => capacitiveRipple(forward().ripple, 35e3, 1e-4) / 12.8,
  ),
  make({ ...PUSH, unit: '1' }, 'duty of the rectified wave for 9 V', 0.6, () => push().dutyCycle),
  make(PUSH, 'ripple', 0.36, () => push().ripple),
  make(PUSH, 'largest current', 1.68, () => push().current + push().ripple / 2),
  make(PUSH, 'smallest current', 1.32, () => push().current - push().ripple / 2),
  make({ ...PUSH, unit: '1' }, 'relative output ripple', 0.005, () => capacitiveRipple(0.36, 20e3, 50e-6) / 9),
];

const BRIDGE: Common = {
  source: 'hart-2011',
  place: 'chapter 7, bridge formulas; figures of a public homework sheet, answers computed',
  unit: 'H',
  mark: 'computed',
  tolerance: 1e-3,
};
const bridges = [
  make(BRIDGE, 'half bridge 400 V to 12 V, 150 W, 300 kHz: L for 10 %', 1.6e-6, () => {
    const s = choke(200 / 15 - 12, 12, 12.5, 1e-6, 600e3);
    return (s.ripple / 1.25) * 1e-6;
  }),
  make({ ...BRIDGE, unit: 'F' }, 'half bridge: C for 1 %', 2.17e-6, () => capacitiveRipple(1.25, 600e3, 0.12)),
  make(BRIDGE, 'full bridge 100 V to 24 V, 250 W, 200 kHz: L for 10 %', 5.76e-6, () => {
    const s = choke(100 / 3.75 - 24, 24, 250 / 24, 1e-6, 400e3);
    return (s.ripple / (25 / 24)) * 1e-6;
  }),
  make({ ...BRIDGE, unit: 'F' }, 'full bridge: C for 1 %', 1.3563e-6, () => capacitiveRipple(25 / 24, 400e3, 0.24)),
];

const RMS: Common = {
  source: 'erickson-maksimovic-2001',
  place: 'chapter 6, winding currents',
  unit: 'A',
  mark: 'computed',
  tolerance: 1e-6,
};
const windings = [
  make(RMS, 'centre-tap half, freewheel shared: Io 20, D 0.35', 13.038405, () =>
    rms(chain([0.35, 20, 20], [0.15, 10, 10], [0.35, 0, 0], [0.15, 10, 10])),
  ),
  make(RMS, 'centre-tap half, freewheel in one half', 14.142136, () => rms(chain([0.5, 20, 20], [0.5, 0, 0]))),
  make(RMS, 'current doubler secondary', 8.3666, () =>
    rms(chain([0.35, 10, 10], [0.15, 0, 0], [0.35, -10, -10], [0.15, 0, 0])),
  ),
];

const LEAK: Common = {
  source: 'snelling-1988',
  place: 'chapter 11, by hand',
  unit: 'H',
  mark: 'computed',
  tolerance: 1e-4,
};
const leakage = [
  // µ0·100·0.05 m/0.02 m·(1 mm + 0.1 mm) = 3.14159e-4·1.1e-3 H
  make(LEAK, '10 turns, 50 mm turn, 20 mm breadth, 3 mm of copper, 0.1 mm gap', 3.45575e-7, () =>
    leakageInductance(10, 0.05, 0.02, 3e-3, 1e-4, 1),
  ),
];

const FLUX: Common = {
  source: 'ltc1698',
  place: 'page 16, B = Vin·DC/(2·Np·Ae·f)',
  unit: 'T',
  mark: 'computed',
  tolerance: 1e-9,
};
const flux = [
  make(
    FLUX,
    '48 V, duty 0.48, 200 kHz, 6 turns, 80 mm²: amplitude',
    0.12,
    () => fluxSwing(48, 0.48 / 200e3, 6, 8e-5) / 2,
  ),
];

export const TRANSFORMER: readonly CaseGroup[] = [
  { title: 'Forward and push-pull: worked examples', cases: hart },
  { title: 'Bridges: L and C', cases: bridges },
  { title: 'Transformer: winding currents', cases: windings },
  { title: 'Transformer: leakage and flux', cases: [...leakage, ...flux] },
];
