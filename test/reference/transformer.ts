/** Transformer stages: worked examples, winding currents, stresses and lost duty, each through the architecture's own stage. */
import { capacitiveRipple } from '../../model/capacitors/ripple.ts';
import { fluxSwing } from '../../model/magnetics/flux.ts';
import { leakageInductance } from '../../model/magnetics/leakage.ts';
import type { Architecture } from '../../model/stages/list.ts';
import type { StageState } from '../../model/stages/state.ts';
import { mean, meanSquare, peak } from '../../model/waveform/moments.ts';
import { sumShifted } from '../../model/waveform/superpose.ts';
import { createWaveform } from '../../model/waveform/waveform.ts';
import { type CaseGroup, type Common, make } from './case.ts';
import { type Example, solvedExample, swing, together } from './ideal-stage.ts';

const FORWARD: Common = {
  source: 'hart-2011',
  place: 'example 7-4, forward',
  unit: 'A',
  mark: 'from memory',
  tolerance: 5e-3,
};
const forward = () =>
  solvedExample({
    architecture: 'two-switch-forward',
    frequency: 35e3,
    input: 48,
    output: 12.8,
    current: 1.28,
    ratio: 1.5,
    inductance: 0.4e-3,
    magnetizing: 5e-3,
  });
const PUSH: Common = { ...FORWARD, place: 'example 7-6, push-pull; a full bridge sees the same', tolerance: 1e-3 };
const push = () =>
  solvedExample({
    architecture: 'full-bridge-centre-tap',
    frequency: 10e3,
    input: 30,
    output: 9,
    current: 1.5,
    ratio: 2,
    inductance: 0.5e-3,
  });
const hart = [
  make({ ...FORWARD, unit: '1' }, 'duty for 12.8 V', 0.4, () => forward().dutyCycle),
  make(FORWARD, 'ripple', 0.549, () => forward().rippleCurrent),
  make(FORWARD, 'largest current', 1.55, () => forward().peakCurrent),
  make(FORWARD, 'smallest current', 1.01, () => forward().valleyCurrent),
  make(FORWARD, 'magnetizing peak: 48 V for 0.4/35 kHz on 5 mH', 0.11, () => forward().magnetizingPeak),
  make(
    { ...FORWARD, unit: '1' },
    'relative output ripple',
    0.00153,
    () => capacitiveRipple(forward().rippleCurrent, 35e3, 1e-4) / 12.8,
  ),
  make({ ...PUSH, unit: '1' }, 'duty of the rectified wave for 9 V', 0.6, () => push().dutyCycle),
  make(PUSH, 'ripple', 0.36, () => push().rippleCurrent),
  make(PUSH, 'largest current', 1.68, () => push().peakCurrent),
  make(PUSH, 'smallest current', 1.32, () => push().valleyCurrent),
  make(
    { ...PUSH, unit: '1' },
    'relative output ripple',
    0.005,
    () => capacitiveRipple(push().rippleCurrent, 1 / push().choke.period, 50e-6) / 9,
  ),
];

const BRIDGE: Common = {
  source: 'hart-2011',
  place: 'chapter 7, bridge formulas; figures of a public homework sheet, answers computed',
  unit: 'H',
  mark: 'computed',
  tolerance: 1e-3,
};
/** The bridges of two public homework sheets, with 1 µH in place of the choke that is asked for. */
const halfBridge: Example = {
  architecture: 'half-bridge-centre-tap',
  frequency: 300e3,
  input: 400,
  output: 12,
  current: 12.5,
  ratio: 15,
  inductance: 1e-6,
};
const fullBridge: Example = {
  architecture: 'full-bridge-centre-tap',
  frequency: 200e3,
  input: 100,
  output: 24,
  current: 250 / 24,
  ratio: 3.75,
  inductance: 1e-6,
};
const bridges = [
  make({ ...BRIDGE, unit: '1' }, 'half bridge 400 V to 12 V, turns 15: duty of one switch', 0.45, () => {
    return 0.5 * solvedExample(halfBridge).dutyCycle;
  }),
  make(BRIDGE, 'half bridge 400 V to 12 V, 150 W, 300 kHz: L for 10 %', 1.6e-6, () => {
    return (solvedExample(halfBridge).rippleCurrent / 1.25) * 1e-6;
  }),
  make({ ...BRIDGE, unit: 'F' }, 'half bridge: C for 1 %', 2.17e-6, () =>
    capacitiveRipple(1.25, 1 / solvedExample(halfBridge).choke.period, 0.12),
  ),
  make({ ...BRIDGE, unit: '1' }, 'full bridge 100 V to 24 V, turns 3.75: duty of one switch', 0.45, () => {
    return 0.5 * solvedExample(fullBridge).dutyCycle;
  }),
  make(BRIDGE, 'full bridge 100 V to 24 V, 250 W, 200 kHz: L for 10 %', 5.76e-6, () => {
    return (solvedExample(fullBridge).rippleCurrent / (25 / 24)) * 1e-6;
  }),
  make({ ...BRIDGE, unit: 'F' }, 'full bridge: C for 1 %', 1.3563e-6, () =>
    capacitiveRipple(25 / 24, 1 / solvedExample(fullBridge).choke.period, 0.24),
  ),
];

/** 20 A at a duty of 0.35 of one switch, turns 4, no ripple: 48 V on the primary of every architecture. */
function windingAt(architecture: Architecture, over: Partial<Example> = {}): StageState {
  const half = architecture.startsWith('half');
  const twice = architecture.endsWith('centre-tap') ? 2 : 1;
  return solvedExample({
    architecture,
    frequency: 200e3,
    input: half ? 96 : 48,
    output: (twice * 0.35 * 48) / 4,
    current: 20,
    ratio: 4,
    ...over,
  });
}

const RMS: Common = {
  source: 'erickson-maksimovic-2001',
  place: 'chapter 6, winding currents at Io 20 A, D 0.35, turns 4',
  unit: 'A',
  mark: 'computed',
  tolerance: 1e-5,
};
const root = Math.sqrt;
const windings = [
  ...(['half-bridge-centre-tap', 'full-bridge-centre-tap'] as const).flatMap((name) => [
    make(RMS, `${name}: half of the secondary, freewheel shared, (Io/2)·√(1 + 2D)`, 13.038405, () =>
      root(windingAt(name).secondaryMeanSquare),
    ),
    make(RMS, `${name}: primary, (Io/n)·√(2D)`, 4.1833, () => root(windingAt(name).primaryMeanSquare)),
    make(RMS, `${name}: one switch, (Io/n)·√D`, 2.95804, () => root(windingAt(name).highMeanSquare)),
  ]),
  make(RMS, 'shifted bridge: freewheel in one half alone, Io·√(1/2)', 14.142136, () =>
    root(windingAt('full-bridge-centre-tap', { shifted: true, leakage: 1e-9 }).secondaryMeanSquare),
  ),
  make(RMS, 'forward: primary and its switches, (Io/n)·√D', 2.95804, () =>
    root(windingAt('two-switch-forward').highMeanSquare),
  ),
  make(RMS, 'forward: secondary, Io·√D', 11.83216, () => root(windingAt('two-switch-forward').secondaryMeanSquare)),
];

const DOUBLER: Common = {
  source: 'balogh-dn63',
  place: 'waveforms of the rectifier (head of the note seen, formulas from memory)',
  unit: 'A',
  mark: 'from memory',
  tolerance: 1e-5,
};
/** 48 V on the primary, turns 4, D 0.35: 4.2 V, with 1 µH in each choke. */
const doubled = (name: 'half-bridge-current-doubler' | 'full-bridge-current-doubler') =>
  windingAt(name, { current: 40, inductance: 1e-6 });
const doublers = (['half-bridge-current-doubler', 'full-bridge-current-doubler'] as const).flatMap((name) => [
  make({ ...DOUBLER, unit: '1' }, `${name}: duty of one switch, Vo·n/Vpri`, 0.35, () => doubled(name).dutyCycle),
  make(DOUBLER, `${name}: each choke carries half of 40 A`, 20, () => doubled(name).meanCurrent),
  // 4.2 V·0.65/(1 µH·200 kHz) and 4.2 V·0.3/(1 µH·200 kHz)
  make(DOUBLER, `${name}: ripple of one choke, Vo·(1 − D)/(L·f)`, 13.65, () => doubled(name).rippleCurrent),
  make(DOUBLER, `${name}: ripple of both, Vo·(1 − 2D)/(L·f)`, 6.3, () => swing(together(doubled(name)))),
  make({ ...DOUBLER, unit: 'Hz' }, `${name}: both together ripple at twice the frequency`, 400e3, () => {
    return 1 / together(doubled(name)).period;
  }),
  make(DOUBLER, `${name}: secondary, (Io/2)·√(2D) at 20 A`, 8.3666, () => root(windingAt(name).secondaryMeanSquare)),
  make({ ...DOUBLER, unit: 'V' }, `${name}: a rectifier blocks the secondary alone`, 12, () => {
    return doubled(name).rectifierVoltage;
  }),
]);

const STRESS: Common = {
  source: 'hart-2011',
  place: 'chapter 7, voltage across a blocking rectifier at 48 V, turns 4',
  unit: 'V',
  mark: 'from memory',
  tolerance: 1e-9,
};
const stresses = [
  make(STRESS, 'full bridge, centre tap: 2·Vi/n', 24, () => windingAt('full-bridge-centre-tap').rectifierVoltage),
  make(STRESS, 'half bridge, centre tap: Vi/n at 96 V', 24, () => windingAt('half-bridge-centre-tap').rectifierVoltage),
  make(STRESS, 'two-switch forward: Vi/n', 12, () => windingAt('two-switch-forward').rectifierVoltage),
];

const LOST: Common = {
  source: 'sabate-1990',
  place: 'duty lost to leakage, at 1 µH, 200 kHz, 20 A, turns 4, 48 V on the primary',
  unit: '1',
  mark: 'from memory',
  tolerance: 1e-4,
};
const lost = (architecture: Architecture, shifted = false) =>
  windingAt(architecture, { leakage: 1e-6, shifted }).lostDuty;
const leaks = [
  // 2·1 µH·200 kHz·20 A/(4·48 V) of the rectified wave, twice that where the current turns round from −Io/n.
  make(LOST, 'shifted full bridge: 4·Llk·f·Io/(n·Vi)', 0.083333, () => lost('full-bridge-centre-tap', true)),
  make(LOST, 'hard-switched full bridge: from rest, half of it', 0.041667, () => lost('full-bridge-centre-tap')),
  make(LOST, 'half bridge: from rest, with half the input', 0.041667, () => lost('half-bridge-centre-tap')),
  // A doubler's winding carries half the load; its duty is that of one switch, half of the rectified wave's.
  make(LOST, 'shifted doubler: Llk·f·Io/(n·Vi) of the duty of one switch', 0.020833, () =>
    lost('full-bridge-current-doubler', true),
  ),
];

const WAVE: Common = {
  source: 'slus660h',
  place: 'equation 57 with the chokes of all phases, at the duty of one',
  unit: '1',
  mark: 'computed',
  tolerance: 1e-5,
};
/** Ripple of all chokes together over that of one: N phases at the rectified wave's duty, or 2N chokes of doublers at one switch's. */
const shares: readonly (readonly [Architecture, number, number, number])[] = [
  ['two-switch-forward', 2, 0.3, 0.571429],
  ['two-switch-forward', 3, 0.4, 0.222222],
  ['half-bridge-centre-tap', 2, 0.4, 0.333333],
  ['half-bridge-centre-tap', 3, 0.9, 0.777778],
  ['full-bridge-centre-tap', 2, 0.9, 0.888889],
  ['full-bridge-centre-tap', 4, 0.3, 0.190476],
  ['half-bridge-current-doubler', 1, 0.3, 0.571429],
  ['half-bridge-current-doubler', 2, 0.3, 0.190476],
  ['full-bridge-current-doubler', 2, 0.4, 0.25],
  ['full-bridge-current-doubler', 3, 0.15, 0.117647],
];
/** A stage of `phases` at the duty of one choke, on 48 V at the primary, turns 4. */
function phasesAt(architecture: Architecture, phases: number, duty: number, over: Partial<Example> = {}): StageState {
  const output = (duty * 48) / 4;
  return windingAt(architecture, { phases, output, current: 20 * phases, inductance: 1e-5, ...over });
}
const interleaved = shares.flatMap(([architecture, phases, duty, share]) => [
  make(WAVE, `${architecture} ×${phases}, D ${duty}: summed ripple over one choke's`, share, () => {
    const state = phasesAt(architecture, phases, duty);
    return swing(together(state)) / state.rippleCurrent;
  }),
  make(
    { ...WAVE, unit: 'Hz', place: 'section 6.2: summed ripple at N·f, at 2N·f behind a rectified wave' },
    `${architecture} ×${phases}: frequency of the summed ripple at 200 kHz`,
    (architecture === 'two-switch-forward' ? 1 : 2) * phases * 200e3,
    () => 1 / together(phasesAt(architecture, phases, duty)).period,
  ),
]);

const DRAWN: Common = {
  source: 'isl6366',
  place: 'page 38, equations 49 to 51, with the pulses of all primaries',
  unit: '1',
  mark: 'computed',
  tolerance: 1e-5,
};
/** Input capacitor's rms over the sum of the pulses' heights, without ripple: N trains of pulses, at T or behind T/2. */
const inputs = (
  [
    ['two-switch-forward', 2, 0.3, 0.244949],
    ['two-switch-forward', 3, 0.4, 0.133333],
    ['half-bridge-centre-tap', 2, 0.4, 0.2],
    ['full-bridge-centre-tap', 3, 0.3, 0.1],
    // A doubler's primary is driven twice in a period of its choke.
    ['full-bridge-current-doubler', 2, 0.2, 0.2],
    ['half-bridge-current-doubler', 3, 0.15, 0.1],
  ] as const
).map(([architecture, phases, duty, share]) =>
  make(DRAWN, `${architecture} ×${phases}, D ${duty}: input capacitor`, share, () => {
    const state = phasesAt(architecture, phases, duty, { inductance: 1 });
    const sum = createWaveform(64);
    sumShifted(state.draw, state.drawCopies, sum);
    return Math.sqrt(meanSquare(sum) - mean(sum) ** 2) / (phases * peak(state.draw));
  }),
);

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
const core = { frequency: 200e3, ratio: 6, primaryTurns: 6, area: 8e-5, current: 20 };
const flux = [
  make(
    FLUX,
    '48 V, duty 0.48, 200 kHz, 6 turns, 80 mm²: amplitude',
    0.12,
    () => fluxSwing(48, 0.48 / 200e3, 6, 8e-5) / 2,
  ),
  ...(
    [
      ['two-switch-forward', 48, 1],
      ['half-bridge-centre-tap', 96, 2],
      ['half-bridge-current-doubler', 96, 1],
      ['full-bridge-centre-tap', 48, 2],
      ['full-bridge-current-doubler', 48, 1],
    ] as const
  ).map(([architecture, input, twice]) =>
    make({ ...FLUX, tolerance: 1e-6 }, `the same core in the stage ${architecture}`, 0.12, () => {
      return solvedExample({ ...core, architecture, input, output: (twice * 0.48 * 48) / 6 }).fluxSwing / 2;
    }),
  ),
];

export const TRANSFORMER: readonly CaseGroup[] = [
  { title: 'Forward and push-pull: worked examples', cases: hart },
  { title: 'Bridges: L and C', cases: bridges },
  { title: 'Transformer: winding currents', cases: windings },
  { title: 'Transformer: current doubler', cases: doublers },
  { title: 'Transformer: interleaved stages', cases: [...interleaved, ...inputs] },
  { title: 'Transformer: rectifier stress and duty lost to leakage', cases: [...stresses, ...leaks] },
  { title: 'Transformer: leakage and flux', cases: [...leakage, ...flux] },
];
