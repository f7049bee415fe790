/** Currents of each winding over one period, for whoever winds the part: moments and harmonics. */
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
 * Currents of primary and secondary: pulses that ramp with the choke, magnetizing current left out.
 * @source erickson-maksimovic-2001, chapter 6
 * @source balogh-dn63 for the doubler
 * @valid straight segments, magnetizing current left out
 */
export function transformerCurrents(point: SolvedPoint): WindingCurrent[] {
  const { design, state } = point;
  const { form } = design.stage;
  if (form === undefined) return [];
  const n = design.transformer.ratio;
  const primary = pulseWave(point, 1 / n, form.doubleEnded);
  if (!form.centreTap) {
    return [figures('primary', primary), figures('secondary', pulseWave(point, 1, form.doubleEnded))];
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
 * Pulses that ramp with the choke, times `scale`.
 * @derivation the choke's rising segment, one sign or both
 * @valid straight segments
 */
function pulseWave({ design, state }: SolvedPoint, scale: number, both: boolean): Waveform {
  const w = createWaveform(4);
  const period = design.stage.chokeMultiple / state.frequency;
  const pulse = state.highShare / state.frequency;
  const repeat = both ? 0.5 * period : period;
  clearWaveform(w);
  for (const sign of both ? [1, -1] : [1]) {
    addSegment(w, pulse, sign * scale * state.valleyCurrent, sign * scale * state.peakCurrent);
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
