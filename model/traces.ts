/** Waveforms of a solved point for plots: phase current, summed current, input draw. */
import type { Trace } from './assessment.ts';
import type { Flavour } from './flavour.ts';
import type { PointSolver } from './point.ts';
import type { Waveform } from './waveform/index.ts';

/** The traces of the point that `solver` holds. */
export function tracesOf(solver: PointSolver, flavour: Flavour): Trace[] {
  void flavour;
  return [
    traceOf('phaseCurrent', 'A', solver.state.choke),
    traceOf('summedCurrent', 'A', solver.summed),
    traceOf('inputCurrent', 'A', solver.drawn),
  ];
}

/** A waveform as points: both ends of every segment. */
function traceOf(name: string, unit: string, w: Waveform): Trace {
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
  return { name, unit, period: w.period, time, value };
}
