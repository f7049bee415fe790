/**
 * Sum of copies of a waveform, each shifted in time: what interleaved phases put into the output and take from the input.
 * Every breakpoint of a copy becomes an event with a change of slope and of value; events are sorted and walked once.
 * Cost: count · copies for the start value, plus the sort of the events.
 */
import type { Waveform } from './waveform.ts';

/** Most events one sum may hold: 8 copies of 32 segments. */
const CAPACITY = 256;
/** Breakpoints closer than this fraction of the window are one breakpoint. */
const SAME = 1e-9;

const when = new Float64Array(CAPACITY);
const bend = new Float64Array(CAPACITY);
const jump = new Float64Array(CAPACITY);
const EQUAL = new Float64Array(64).fill(1);

/** The sum at hand, told to the functions below through a record so that no double crosses a call. */
class Sum {
  /** Shift between copies and the window, s. */
  shift = 0.5;
  window = 0.5;
  /** What is added to the sum of the copies. */
  offset = 0.5;
  events = 0;
}

const sum = new Sum();
/** Change of slope and of value at each breakpoint of the source. */
const bends = new Float64Array(CAPACITY);
const jumps = new Float64Array(CAPACITY);

/**
 * Makes `into` the sum of `copies` copies of `source` shifted by period/copies each, over its own shorter period/copies.
 * `into` needs room for source.count + 1 segments. copies 1 … 32; source.count · copies ≤ 256.
 * @derivation the sum of all shifted copies repeats after one shift, so one window of that length holds it
 * @valid copies ≥ 1
 */
export function sumShifted(source: Waveform, copies: number, into: Waveform): void {
  const window = source.period / copies;
  findBreaks(source);
  sum.shift = window;
  sum.window = window;
  sum.offset = 0;
  sum.events = 0;
  let time = 0;
  for (let i = 0; i < source.count; i++) {
    when[sum.events] = time - Math.floor(time / window) * window;
    insert(i, EQUAL, 0);
    time += source.duration[i];
  }
  chain(source, copies, EQUAL, into);
}

/**
 * Makes `into` the sum over one full period of copies shifted by period/copies whose deviation from the mean is scaled:
 * mean + scales[j]·(source − mean) for copy j. With unequal inductances the scales are L/L_j: ripple no longer cancels.
 * `into` needs room for source.count · copies + 1 segments; source.count · copies ≤ 256.
 * @derivation superposition of the copies' breakpoints
 * @valid copies ≥ 1, scales[0 … copies − 1] > 0
 */
export function sumUnequal(source: Waveform, copies: number, scales: Float64Array, into: Waveform): void {
  const window = source.period;
  const shift = window / copies;
  findBreaks(source);
  sum.shift = shift;
  sum.window = window;
  sum.offset = 0;
  sum.events = 0;
  let area = 0;
  for (let i = 0; i < source.count; i++) area += source.duration[i] * (source.start[i] + source.end[i]);
  const average = (0.5 * area) / source.period;
  for (let j = 0; j < copies; j++) sum.offset += average * (1 - scales[j]);
  let time = 0;
  for (let i = 0; i < source.count; i++) {
    for (let j = 0; j < copies; j++) {
      const t = time - j * shift;
      when[sum.events] = t < 0 ? t + window : t;
      insert(i, scales, j);
    }
    time += source.duration[i];
  }
  chain(source, copies, scales, into);
}

/** Works out the change of slope and of value at each breakpoint of the source. */
function findBreaks(w: Waveform): void {
  let before = w.count - 1;
  let slopeBefore = slopeOf(w, before);
  for (let i = 0; i < w.count; i++) {
    const slope = slopeOf(w, i);
    bends[i] = slope - slopeBefore;
    // A segment of no length is a jump from the end before it to its own end.
    jumps[i] = (w.duration[i] > 0 ? w.start[i] : w.end[i]) - w.end[before];
    slopeBefore = slope;
    before = i;
  }
}

function slopeOf(w: Waveform, i: number): number {
  return w.duration[i] > 0 ? (w.end[i] - w.start[i]) / w.duration[i] : 0;
}

/** Adds breakpoint `i` of the source, of copy `j`, whose time stands in the next free place, to the events in order of time. */
function insert(i: number, scales: Float64Array, j: number): void {
  let place = sum.events;
  const t = when[place];
  while (place > 0 && when[place - 1] > t) {
    when[place] = when[place - 1];
    bend[place] = bend[place - 1];
    jump[place] = jump[place - 1];
    place--;
  }
  when[place] = t;
  bend[place] = scales[j] * bends[i];
  jump[place] = scales[j] * jumps[i];
  sum.events++;
}

/** Walks the events of one window from its start value on and writes the segments. */
function chain(source: Waveform, copies: number, scales: Float64Array, into: Waveform): void {
  const { shift, window, events } = sum;
  const tiny = SAME * window;
  let first = 0;
  while (first < events && when[first] <= tiny) first++;
  const next = first < events ? Math.min(when[first], window) : window;
  // Value and slope are taken in the middle of the first piece, away from every breakpoint, and carried back to 0.
  const probe = 0.5 * next;
  let slope = 0;
  let value = sum.offset;
  let segment = 0;
  let from = 0;
  for (let j = 0; j < copies; j++) {
    const t = probe + j * shift;
    while (segment < source.count - 1 && t >= from + source.duration[segment]) {
      from += source.duration[segment];
      segment++;
    }
    const s = (source.end[segment] - source.start[segment]) / source.duration[segment];
    slope += scales[j] * s;
    value += scales[j] * (source.start[segment] + s * (t - from));
  }
  value -= slope * probe;
  let count = 0;
  let time = 0;
  for (let e = first; e <= events; e++) {
    const until = e < events ? when[e] : window;
    const d = until - time;
    if (d > tiny && until < window - tiny) {
      into.duration[count] = d;
      into.start[count] = value;
      value += slope * d;
      into.end[count] = value;
      count++;
      time = until;
    }
    if (e < events && until < window - tiny) {
      value += jump[e];
      slope += bend[e];
    }
  }
  into.duration[count] = window - time;
  into.start[count] = value;
  into.end[count] = value + slope * (window - time);
  into.count = count + 1;
  into.period = window;
}
