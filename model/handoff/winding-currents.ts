/** Currents of each winding over one period, for whoever winds the part: moments and harmonics. */
import { type IsolatedForm, leakageTurns } from '../stages/isolated.ts';
import {
  addSegment,
  clearWaveform,
  createWaveform,
  harmonics,
  MEAN,
  MEAN_SQUARE,
  measure,
  PEAK,
  VALLEY,
  type Waveform,
} from '../waveform/index.ts';
import type { SolvedPoint } from './solved-point.ts';

/** Harmonics that are listed. */
export const LISTED = 7;

/** Straight pieces of a decay. */
const PIECES = 16;

/** One winding's current. */
export interface WindingCurrent {
  readonly name: string;
  /** A. */
  readonly mean: number;
  readonly rms: number;
  readonly peak: number;
  readonly valley: number;
  /** Hz, of the first harmonic. */
  readonly frequency: number;
  /** A rms of harmonics 1 … LISTED. */
  readonly harmonics: readonly number[];
}

/** The current of one choke. */
export function chokeCurrent({ state }: SolvedPoint): WindingCurrent {
  return figures('winding', state.choke);
}

/**
 * Currents of primary and secondary: pulses that ramp with the choke; in the primary with the magnetizing current on top and with the
 * ramps in the leakage around them. What circulates in a shifted bridge between pulses is listed for the primary only.
 * @source erickson-maksimovic-2001, chapter 6
 * @source balogh-dn63 for the doubler
 * @valid straight segments
 */
export function transformerCurrents(point: SolvedPoint): WindingCurrent[] {
  const { state } = point;
  const { form } = point.design.stage;
  if (form === undefined) return [];
  const primary = primaryWave(point, form);
  if (!form.centreTap) {
    return [figures('primary', primary), figures('secondary', pulseWave(point, form.doubleEnded))];
  }
  const half = createWaveform(8);
  const period = 1 / state.frequency;
  const { valleyCurrent: a, peakCurrent: b, highShare: h, lowShare: l } = state;
  const rest = (1 - h - l) * period;
  clearWaveform(half);
  addSegment(half, h * period, a, b);
  addSegment(half, l * period, 0.5 * b, 0.5 * a);
  if (rest > 0) addSegment(half, rest, 0, 0);
  addSegment(half, h * period, 0, 0);
  addSegment(half, l * period, 0.5 * b, 0.5 * a);
  if (rest > 0) addSegment(half, rest, 0, 0);
  return [figures('primary', primary), figures('each secondary half', half)];
}

/**
 * The primary's current: a ramp in the leakage up to what a pulse starts with, the pulse with the magnetizing current on top, and a ramp
 * down again. In a shifted bridge the current dies away between the two in the shorted primary.
 * @derivation the choke's rising segment and the ramps of `leakageTurns` over n; a decay in straight pieces of equal ratio
 * @valid straight segments; decays of a few time constants; the reset of a single-ended stage left out
 */
function primaryWave({ design, state }: SolvedPoint, form: IsolatedForm): Waveform {
  const w = createWaveform(2 * (PIECES + 3));
  const repeat = (form.doubleEnded ? 0.5 : 1) * (design.stage.chokeMultiple / state.frequency);
  const pulse = state.highShare / state.frequency;
  const { magnetizing, start, back, pace } = leakageTurns(form, design, state);
  const n = design.transformer.ratio;
  const from = (state.valleyCurrent - magnetizing) / n;
  const to = (state.peakCurrent + magnetizing) / n + (form.doubleEnded ? 0 : state.magnetizingPeak);
  const rest = repeat - pulse - pace * (start + back);
  // Four roots: the ratio of each of the sixteen pieces.
  const left = design.phaseShifted && to > 0 ? Math.sqrt(Math.sqrt(Math.sqrt(Math.sqrt(back / n / to)))) : 0;
  const dies = design.phaseShifted && rest > 0;
  clearWaveform(w);
  for (const sign of form.doubleEnded ? [1, -1] : [1]) {
    addSegment(w, pace * start, 0, (sign * start) / n);
    addSegment(w, pulse, sign * from, sign * to);
    let now = sign * to;
    for (let piece = 0; dies && piece < PIECES; piece++) {
      addSegment(w, rest / PIECES, now, now * left);
      now *= left;
    }
    addSegment(w, pace * back, (sign * back) / n, 0);
    if (!dies) addSegment(w, rest, 0, 0);
  }
  return w;
}

/**
 * Pulses of the secondary, which ramp with the choke.
 * @derivation the choke's rising segment, one sign or both
 * @valid straight segments, magnetizing current left out
 */
function pulseWave({ design, state }: SolvedPoint, both: boolean): Waveform {
  const w = createWaveform(4);
  const period = design.stage.chokeMultiple / state.frequency;
  const pulse = state.highShare / state.frequency;
  const repeat = both ? 0.5 * period : period;
  clearWaveform(w);
  for (const sign of both ? [1, -1] : [1]) {
    addSegment(w, pulse, sign * state.valleyCurrent, sign * state.peakCurrent);
    addSegment(w, repeat - pulse, 0, 0);
  }
  return w;
}

function figures(name: string, w: Waveform): WindingCurrent {
  const m = new Float64Array(4);
  measure(w, m);
  const coefficients = new Float64Array(2 * LISTED);
  harmonics(w, LISTED, coefficients);
  const sizes = Array.from({ length: LISTED }, (_, k) => {
    const [c, s] = [coefficients[2 * k], coefficients[2 * k + 1]];
    return Math.sqrt(0.5 * (c * c + s * s));
  });
  return {
    name,
    mean: m[MEAN],
    rms: Math.sqrt(m[MEAN_SQUARE]),
    peak: m[PEAK],
    valley: m[VALLEY],
    frequency: 1 / w.period,
    harmonics: sizes,
  };
}
