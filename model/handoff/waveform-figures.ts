/** Key figures of the currents that a person checks on the bench: what a phase's choke, switches and input carry. */
import { MEAN, MEAN_SQUARE, measure, PEAK, VALLEY, type Waveform } from '../waveform/index.ts';
import type { SolvedPoint } from './solved-point.ts';

/** Mean, rms and extremes of one current. */
export interface WaveformFigures {
  readonly name: string;
  readonly unit: string;
  readonly mean: number;
  readonly rms: number;
  readonly peak: number;
  readonly valley: number;
}

/** Figures of choke, summed chokes, input draw of all phases, and one switch of each position. */
export function waveformFigures({ state, solver, design }: SolvedPoint): WaveformFigures[] {
  const { valleyCurrent: valley, peakCurrent: peak } = state;
  const position = (name: string, mean: number, square: number, scale: number): WaveformFigures => ({
    name,
    unit: 'A',
    mean,
    rms: Math.sqrt(square),
    peak: peak * scale,
    valley: valley * scale,
  });
  const ratio = design.stage.form === undefined ? 1 : 1 / design.transformer.ratio;
  return [
    figuresOf('choke', state.choke),
    figuresOf('summed chokes', solver.summed),
    figuresOf('input', solver.drawn),
    position('high switch', state.highMean, state.highMeanSquare, ratio),
    position('low position', state.lowMean, state.lowMeanSquare, 1),
  ];
}

function figuresOf(name: string, w: Waveform): WaveformFigures {
  const m = new Float64Array(4);
  measure(w, m);
  return { name, unit: 'A', mean: m[MEAN], rms: Math.sqrt(m[MEAN_SQUARE]), peak: m[PEAK], valley: m[VALLEY] };
}
