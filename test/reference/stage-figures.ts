/** Our figures of one choke between two voltages and of the currents around it, as the cases ask for them. */
import { ChokeSteadyState, solveChoke } from '../../model/modes.ts';
import { meanSquare } from '../../model/waveform/moments.ts';
import { addSegment, createWaveform, type Waveform } from '../../model/waveform/waveform.ts';

/** Steady state of a choke that sees `rise` V while the source drives it and `fall` V while it gives back. */
function choke(
  rise: number,
  fall: number,
  current: number,
  inductance: number,
  frequency: number,
  blocking = false,
): ChokeSteadyState {
  const s = new ChokeSteadyState();
  Object.assign(s, { rise, fall, current, inductance, frequency, blocking, shortestRise: 0 });
  solveChoke(s);
  return s;
}

/** Ideal buck. */
export function buck(vin: number, vo: number, io: number, l: number, f: number, blocking = false): ChokeSteadyState {
  return choke(vin - vo, vo, io, l, f, blocking);
}

/** Segments as [share of a period of 1 s, start, end]. */
export function chain(...segments: readonly (readonly [number, number, number])[]): Waveform {
  const w = createWaveform(segments.length);
  for (const [duration, start, end] of segments) addSegment(w, duration, start, end);
  return w;
}

/** The choke current: a triangle about `io`, rising for `duty`. */
export function triangle(io: number, swing: number, duty: number): Waveform {
  const [low, high] = [io - swing / 2, io + swing / 2];
  return chain([duty, low, high], [1 - duty, high, low]);
}

/** Rms of the current in the switch that conducts while the choke rises. */
export function highRms(io: number, swing: number, duty: number): number {
  return Math.sqrt(meanSquare(chain([duty, io - swing / 2, io + swing / 2], [1 - duty, 0, 0])));
}

/** Rms of the current in the other switch. */
export function lowRms(io: number, swing: number, duty: number): number {
  return Math.sqrt(meanSquare(chain([duty, 0, 0], [1 - duty, io + swing / 2, io - swing / 2])));
}

/** Conversion ratio of an ideal buck at duty D and K = 2·L·f/R with R = 1 Ω: the Vo at which the mode solver asks for D. */
export function ratioAt(duty: number, k: number): number {
  let low = 0;
  let high = 1;
  for (let round = 0; round < 80; round++) {
    const middle = 0.5 * (low + high);
    if (buck(1, middle, middle, k / 2, 1, true).dutyCycle < duty) low = middle;
    else high = middle;
  }
  return 0.5 * (low + high);
}
