/**
 * Sum of copies of a waveform, each shifted in time: what interleaved phases put into the output and take from the input.
 * Every breakpoint of a copy becomes an event with a change of slope and of value; events are sorted and walked once.
 * Cost: count · copies for the start value, plus the sort of the events.
 */
import { mean } from './moments.ts';
import type { Waveform } from './waveform.ts';

/** Most events one sum may hold: 8 copies of 32 segments. */
const CAPACITY = 256;
/** Breakpoints closer than this fraction of the window are one breakpoint. */
const SAME = 1e-9;

const when = new Float64Array(CAPACITY);
const bend = new Float64Array(CAPACITY);
const jump = new Float64Array(CAPACITY);
const EQUAL = new Float64Array(64).fill(1);

/**
 * Makes `into` the sum of `copies` copies of `source` shifted by period/copies each, over its own shorter period/copies.
 * `into` needs room for source.count + 1 segments. copies 1 … 32; source.count · copies ≤ 256.
 * @derivation the sum of all shifted copies repeats after one shift, so one window of that length holds it
 * @valid copies ≥ 1
 */
export function sumShifted(source: Waveform, copies: number, into: Waveform): void {
  const window = source.period / copies;
  let events = 0;
  let time = 0;
  for (let i = 0; i < source.count; i++) {
    events = addEvent(source, i, time - Math.floor(time / window) * window, 1, events);
    time += source.duration[i];
  }
  chain(source, copies, window, window, EQUAL, 0, events, into);
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
  let events = 0;
  let time = 0;
  let offset = 0;
  const average = mean(source);
  for (let j = 0; j < copies; j++) offset += average * (1 - scales[j]);
  for (let i = 0; i < source.count; i++) {
    for (let j = 0; j < copies; j++) {
      const t = time - j * shift;
      events = addEvent(source, i, t < 0 ? t + window : t, scales[j], events);
    }
    time += source.duration[i];
  }
  chain(source, copies, shift, window, scales, offset, events, into);
}

/** Adds breakpoint `i` of the source at time `t` of the window, in order of time; returns the new number of events. */
function addEvent(w: Waveform, i: number, t: number, scale: number, events: number): number {
  const before = i === 0 ? w.count - 1 : i - 1;
  const slope = w.duration[i] > 0 ? (w.end[i] - w.start[i]) / w.duration[i] : 0;
  const slopeBefore = w.duration[before] > 0 ? (w.end[before] - w.start[before]) / w.duration[before] : 0;
  // A segment of no length is a jump from the end before it to its own end.
  const step = (w.duration[i] > 0 ? w.start[i] : w.end[i]) - w.end[before];
  let place = events;
  while (place > 0 && when[place - 1] > t) {
    when[place] = when[place - 1];
    bend[place] = bend[place - 1];
    jump[place] = jump[place - 1];
    place--;
  }
  when[place] = t;
  bend[place] = scale * (slope - slopeBefore);
  jump[place] = scale * step;
  return events + 1;
}

/** Walks the events of one window from its start value on and writes the segments. */
function chain(
  source: Waveform,
  copies: number,
  shift: number,
  window: number,
  scales: Float64Array,
  offset: number,
  events: number,
  into: Waveform,
): void {
  const tiny = SAME * window;
  let first = 0;
  while (first < events && when[first] <= tiny) first++;
  const next = first < events ? Math.min(when[first], window) : window;
  // Value and slope are taken in the middle of the first piece, away from every breakpoint, and carried back to 0.
  const probe = 0.5 * next;
  let slope = 0;
  let value = offset;
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
