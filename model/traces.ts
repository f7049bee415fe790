/** Waveforms of a solved point for plots: phase current, summed current, input draw, output and input ripple. */
import type { Trace } from './assessment.ts';
import { type Bank, bankTrace } from './capacitors/index.ts';
import type { Flavour } from './flavour.ts';
import type { PointSolver } from './point-solver.ts';
import type { Waveform } from './waveform/index.ts';

/** Times inside a segment at which a ripple voltage is drawn. */
const POINTS = 12;

/** The traces of the point that `solver` holds, under `flavour`. */
export function tracesOf(solver: PointSolver, flavour: Flavour): Trace[] {
  return [
    traceOf('phaseCurrent', solver.state.choke),
    traceOf('summedCurrent', solver.summed),
    traceOf('inputCurrent', solver.drawn),
    rippleOf('outputRipple', flavour.output, solver.summed, 1),
    rippleOf('inputRipple', flavour.input, solver.drawn, -1),
  ];
}

/** A current as points: both ends of every segment. */
function traceOf(name: string, w: Waveform): Trace {
  const time: number[] = [];
  const value: number[] = [];
  let t = 0;
  for (let i = 0; i < w.count; i++) {
    if (i === 0 || w.start[i] !== w.end[i - 1]) {
      time.push(t);
      value.push(w.start[i]);
    }
    t += w.duration[i];
    time.push(t);
    value.push(w.end[i]);
  }
  return { name, unit: 'A', period: w.period, time, value };
}

/** The bank's voltage about its mean; the input bank gives what the stage draws, so its sign turns. */
function rippleOf(name: string, bank: Bank, current: Waveform, sign: number): Trace {
  const { time, value } = bankTrace(bank, current, POINTS);
  return { name, unit: 'V', period: current.period, time, value: value.map((v) => sign * v) };
}
