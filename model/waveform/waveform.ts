/**
 * The piecewise-linear periodic waveform: the one idea that carries the model. Every current, voltage and flux of a
 * switched converter's steady state is, to first order, a periodic chain of straight segments.
 */

/** One period as `count` straight segments, one after the other from time 0. Typed arrays of fixed capacity: no garbage. */
export interface Waveform {
  /** s; equals the sum of the first `count` durations. */
  period: number;
  /** Segments in use. */
  count: number;
  /** Length of each segment, s; 0 is allowed and carries a jump. */
  readonly duration: Float64Array;
  /** Value at the start of each segment, in the waveform's unit. */
  readonly start: Float64Array;
  /** Value at the end of each segment; where it differs from the next start the waveform jumps. */
  readonly end: Float64Array;
}

/** An empty waveform that can hold `capacity` segments, 1 or more. */
export function createWaveform(capacity: number): Waveform {
  return {
    period: 0,
    count: 0,
    duration: new Float64Array(capacity),
    start: new Float64Array(capacity),
    end: new Float64Array(capacity),
  };
}

/** Empties `w`, so that `addSegment` starts a new period. */
export function clearWaveform(w: Waveform): void {
  w.period = 0;
  w.count = 0;
}

/** Writes segment `i` (0 … capacity − 1): `duration` in s, ≥ 0, and the values at its ends. `count` and `period` stay. */
export function setSegment(w: Waveform, i: number, duration: number, start: number, end: number): void {
  w.duration[i] = duration;
  w.start[i] = start;
  w.end[i] = end;
}

/** Appends a segment and lengthens the period by it. Beyond the capacity nothing is written (typed arrays ignore it). */
export function addSegment(w: Waveform, duration: number, start: number, end: number): void {
  const i = w.count;
  w.duration[i] = duration;
  w.start[i] = start;
  w.end[i] = end;
  w.count = i + 1;
  w.period += duration;
}

/**
 * Makes `into` factor · w + offset, segment by segment; `into` may be `w` itself.
 * @derivation an affine map keeps straight segments straight
 * @valid `into` has room for w.count segments
 */
export function affine(w: Waveform, factor: number, offset: number, into: Waveform): void {
  into.count = w.count;
  into.period = w.period;
  for (let i = 0; i < w.count; i++) {
    into.duration[i] = w.duration[i];
    into.start[i] = factor * w.start[i] + offset;
    into.end[i] = factor * w.end[i] + offset;
  }
}
