/** Interleaving: what shifted phases leave of the ripple, and what they take from the input capacitor. */
import { inputMeanSquare } from '../../model/capacitors/ripple.ts';
import { mean, meanSquare, peak, valley } from '../../model/waveform/moments.ts';
import { sumShifted } from '../../model/waveform/superpose.ts';
import { createWaveform, type Waveform } from '../../model/waveform/waveform.ts';
import { type CaseGroup, type Common, make, type ReferenceCase } from './case.ts';
import { buck, chain, triangle } from './stage-figures.ts';

/** Rows D, columns N = 1 … 6. */
const CANCELLATION: readonly (readonly number[])[] = [
  [0.05, 1, 0.947368, 0.894737, 0.842105, 0.789474, 0.736842],
  [0.1, 1, 0.888889, 0.777778, 0.666667, 0.555556, 0.444444],
  [0.125, 1, 0.857143, 0.714286, 0.571429, 0.428571, 0.285714],
  [0.15, 1, 0.823529, 0.647059, 0.470588, 0.294118, 0.117647],
  [0.2, 1, 0.75, 0.5, 0.25, 0, 0.166667],
  [0.25, 1, 0.666667, 0.333333, 0, 0.2, 0.222222],
  [0.3, 1, 0.571429, 0.142857, 0.190476, 0.238095, 0.126984],
  [1 / 3, 1, 0.5, 0, 0.25, 0.2, 0],
  [0.4, 1, 0.333333, 0.222222, 0.25, 0, 0.166667],
  [0.45, 1, 0.181818, 0.306397, 0.161616, 0.151515, 0.141414],
  [0.5, 1, 0, 0.333333, 0, 0.2, 0],
  [0.75, 1, 0.666667, 0.333333, 0, 0.2, 0.222222],
  [0.9, 1, 0.888889, 0.777778, 0.666667, 0.555556, 0.444444],
];

/** Input rms over Io without ripple current; rows D, columns N = 1 … 6. */
const INPUT_PLAIN: readonly (readonly number[])[] = [
  [0.05, 0.217945, 0.15, 0.119024, 0.1, 0.086603, 0.076376],
  [0.1, 0.3, 0.2, 0.152753, 0.122474, 0.1, 0.08165],
  [0.125, 0.330719, 0.216506, 0.161374, 0.125, 0.096825, 0.072169],
  [0.15, 0.357071, 0.229129, 0.165831, 0.122474, 0.086603, 0.05],
  [0.2, 0.4, 0.244949, 0.163299, 0.1, 0, 0.066667],
  [0.25, 0.433013, 0.25, 0.144338, 0, 0.086603, 0.083333],
  [0.3, 0.458258, 0.244949, 0.1, 0.1, 0.1, 0.066667],
  [0.4, 0.489898, 0.2, 0.133333, 0.122474, 0, 0.08165],
  [0.5, 0.5, 0, 0.166667, 0, 0.1, 0],
  [0.75, 0.433013, 0.25, 0.144338, 0, 0.086603, 0.083333],
];

/** The same with a ripple of 0.3·Io in each phase. */
const INPUT_RIPPLE: readonly (readonly number[])[] = [
  [0.05, 0.218804, 0.15248, 0.123659, 0.107238, 0.096825, 0.089907],
  [0.1, 0.301247, 0.203715, 0.159948, 0.134164, 0.11726, 0.105672],
  [0.125, 0.332133, 0.220794, 0.169865, 0.139194, 0.118585, 0.104083],
  [0.15, 0.358643, 0.233987, 0.175713, 0.139642, 0.114564, 0.096177],
  [0.2, 0.401871, 0.250998, 0.176541, 0.126491, 0.086603, 0.08531],
  [0.25, 0.435172, 0.257391, 0.16266, 0.086603, 0.099121, 0.095015],
  [0.3, 0.460706, 0.253969, 0.129422, 0.113284, 0.109924, 0.095936],
  [0.4, 0.49295, 0.214476, 0.143566, 0.133112, 0.086603, 0.092421],
  [0.5, 0.503736, 0.086603, 0.172804, 0.086603, 0.109316, 0.086603],
  [0.75, 0.43946, 0.254133, 0.153433, 0.086603, 0.105712, 0.094035],
];

/** Sum of `n` copies of one phase's current. */
function summed(phase: Waveform, n: number): Waveform {
  const into = createWaveform(phase.count + 1);
  sumShifted(phase, n, into);
  return into;
}

function summedRipple(duty: number, n: number, swing: number): number {
  const sum = summed(triangle(0, swing, duty), n);
  return peak(sum) - valley(sum);
}

function inputRms(duty: number, n: number, swing: number): number {
  const sum = summed(chain([duty, 1 / n - swing / 2, 1 / n + swing / 2], [1 - duty, 0, 0]), n);
  return Math.sqrt(Math.max(0, meanSquare(sum) - mean(sum) ** 2));
}

/** Six printed decimals: an absolute 1e-6, as a share of the expected value. */
function sixDecimals(expected: number): number {
  return expected === 0 ? 2e-6 : 1e-6 / expected;
}

const CANCEL: Common = {
  source: 'slus660h',
  place: 'equation 57, ratio of summed to phase ripple',
  unit: '1',
  mark: 'computed',
  tolerance: 0,
};
const cancellations = CANCELLATION.flatMap(([duty, ...row]) =>
  row.map((value, i) =>
    make({ ...CANCEL, tolerance: sixDecimals(value) }, `D ${duty.toPrecision(3)}, N ${i + 1}`, value, () =>
      summedRipple(duty, i + 1, 1),
    ),
  ),
);

const INPUT: Common = {
  source: 'isl6366',
  place: 'page 38, equations 49 to 51',
  unit: '1',
  mark: 'computed',
  tolerance: 0,
};
/** The waveform way for every entry, and the closed form for those with ripple. */
function inputCases(table: readonly (readonly number[])[], swing: number): ReferenceCase[] {
  return table.flatMap(([duty, ...row]) =>
    row.map((value, i) =>
      make(
        { ...INPUT, tolerance: sixDecimals(value) },
        `input rms over Io: D ${duty}, N ${i + 1}, ΔI ${swing} Io, from the waveform`,
        value,
        () => inputRms(duty, i + 1, swing),
      ),
    ),
  );
}
const closed = INPUT_RIPPLE.flatMap(([duty, ...row]) =>
  row.map((value, i) =>
    make(
      { ...INPUT, tolerance: sixDecimals(value) },
      `input rms over Io: D ${duty}, N ${i + 1}, ΔI 0.3 Io, closed form`,
      value,
      () => Math.sqrt(inputMeanSquare(i + 1, duty, 1, 0.3)),
    ),
  ),
);

const SLUS: Common = {
  source: 'slus660h',
  place: 'section 6.2, pages 50 and 51',
  unit: 'A',
  mark: 'seen',
  tolerance: 0.01,
};
const LTC: Common = { source: 'ltc3729', place: 'page 15', unit: '1', mark: 'seen', tolerance: 1e-5 };
const worked: ReferenceCase[] = [
  make(SLUS, 'two phases, 10.8 V to 1.5 V, 32 A: input rms', 7.2, () => 32 * inputRms(1.5 / 10.8, 2, 0)),
  make({ ...SLUS, unit: '1', tolerance: 0.04 }, 'saving against one phase', 0.34, () => {
    const duty = 1.5 / 10.8;
    return 1 - inputRms(duty, 2, 0) / inputRms(duty, 1, 0);
  }),
  make({ ...SLUS, tolerance: 0.005 }, 'two phases, 13.2 V: summed ripple at the implied 0.530 µH', 4.374, () =>
    summedRipple(1.5 / 13.2, 2, buck(13.2, 1.5, 20, 0.53e-6, 5e5).ripple),
  ),
  ...[0.5, 0.25, 0.166667, 0.125, 0.1, 0.083333].map((value, i) =>
    make(LTC, `peak of the input rms, N ${i + 1}`, value, () => inputRms(1 / (2 * (i + 1)), i + 1, 0)),
  ),
];

export const MULTIPHASE: readonly CaseGroup[] = [
  { title: 'Interleaving: summed ripple over one phase', cases: cancellations },
  { title: 'Interleaving: input capacitor without ripple', cases: inputCases(INPUT_PLAIN, 0) },
  { title: 'Interleaving: input capacitor with ripple', cases: [...inputCases(INPUT_RIPPLE, 0.3), ...closed] },
  { title: 'Interleaving: worked examples', cases: worked },
];
