/**
 * Two capacitor groups that both have series inductance, solved exactly: the bulk's inductance rings with the ceramics'
 * capacitance after every corner of the current, and no split by capacitance and resistance shows that.
 */
import type { Waveform } from '../waveform/waveform.ts';
import type { Bank, BankRipple } from './bank.ts';
import { addExtremes } from './pair-extremes.ts';
import { crossSegment, prepareSegment } from './pair-segment.ts';
import {
  CURRENT,
  counts,
  FORCED,
  KEPT,
  kept,
  pair,
  STEP,
  setAverage,
  setBefore,
  setPair,
  WHOLE,
} from './pair-state.ts';
import { addSquares } from './pair-sums.ts';

/** Fewest and most steps that a segment is drawn in. */
const DRAWN = 16;
const DRAWN_MOST = 1024;

/**
 * Whether `bank` is such a pair.
 * @derivation two groups, one of them with inductance
 * @valid any bank
 */
export function isPair(bank: Bank): boolean {
  return bank.c2 > 0 && bank.l1 + bank.l2 > 0;
}

/**
 * Periodic steady state under the ac part of `current`: fills `into`; voltages stay 0 where only currents are wanted.
 * @derivation the network of `pair`, closed form in every segment, extremes where its slope is zero: the ripple is met to 0.1 %, as a dense walk shows, and is no less than that where ringing outlasts 4096 steps
 * @valid a pair (`isPair`) with resistance; at most 256 segments
 */
export function pairRipple(bank: Bank, current: Waveform, voltages: boolean, into: BankRipple): void {
  setPair(bank);
  setAverage(current);
  findPeriodic(current);
  walkAll(current, voltages, true);
  into.highest = voltages ? pair.highest : 0;
  into.lowest = voltages ? pair.lowest : 0;
  into.ripple = into.highest - into.lowest;
  // A group that hardly carries current is left with rounding, of either sign.
  into.meanSquare1 = Math.max(0, pair.square1 / current.period);
  into.meanSquare2 = Math.max(0, pair.square2 / current.period);
}

/**
 * Response from rest to the current `pulse` drawn once: fills the extremes of `into`, V about the start.
 * @derivation as `pairRipple`
 * @valid as `pairRipple`
 */
export function pairTransient(bank: Bank, pulse: Waveform, into: BankRipple): void {
  setPair(bank);
  pair.average = 0;
  for (let i = 0; i < pulse.count; i++) if (pulse.duration[i] > 0) prepareSegment(pulse, i);
  pair.w = 0;
  pair.y = 0;
  pair.before = 0;
  walkAll(pulse, true, false);
  into.highest = pair.highest;
  into.lowest = pair.lowest;
  into.ripple = pair.highest - pair.lowest;
}

/**
 * One period of the terminal voltage, each segment in 16 equal steps or in as many more as its ringing needs, up to 1024: allocates, for plots.
 * @derivation as `pairRipple`
 * @valid as `pairRipple`
 */
export function pairTrace(bank: Bank, current: Waveform): { time: number[]; value: number[] } {
  setPair(bank);
  pair.fewest = DRAWN;
  setAverage(current);
  findPeriodic(current);
  pair.q = 0;
  const time: number[] = [];
  const value: number[] = [];
  let start = 0;
  for (let i = 0; i < current.count; i++) {
    if (!(current.duration[i] > 0)) continue;
    crossSegment(current, i);
    traceSegment(i, start, time, value);
    addCharge(i);
    start += pair.d;
  }
  return { time, value };
}

/** Appends times and voltages of the crossed segment `i`, which starts at `start` s. */
function traceSegment(i: number, start: number, time: number[], value: number[]): void {
  let step: readonly number[] = [...kept.subarray(KEPT * i + STEP, KEPT * i + STEP + 4)];
  let steps = counts[i];
  for (; steps > DRAWN_MOST; steps /= 2) step = squared(step);
  const [w0, w1, y0, y1, a, s] = kept.subarray(KEPT * i + FORCED, KEPT * i + CURRENT + 2);
  const { r, r1, l, l1, c2, perTotal } = pair;
  let { z, u } = pair;
  for (let k = 0; k <= steps; k++) {
    const t = (k * pair.d) / steps;
    const w = z + w0 + w1 * t;
    const y = u + y0 + y1 * t;
    const drawn = a + s * t;
    const rise = (w + r1 * drawn + l1 * s - r * y) / l;
    time.push(start + t);
    value.push((pair.q + (a + 0.5 * s * t) * t + c2 * w) * perTotal + r1 * (drawn - y) + l1 * (s - rise));
    [z, u] = [step[0] * z + step[1] * u, step[2] * z + step[3] * u];
  }
}

/** The matrix of two steps of `m`, by rows. */
function squared([a, b, c, d]: readonly number[]): readonly number[] {
  return [a * a + b * c, b * (a + d), c * (a + d), d * d + b * c];
}

/** The state at time 0 that comes back after one period: each segment is an affine map, and so is their chain. */
function findPeriodic(current: Waveform): void {
  let p00 = 1;
  let p01 = 0;
  let p10 = 0;
  let p11 = 1;
  pair.w = 0;
  pair.y = 0;
  setBefore(current);
  for (let i = 0; i < current.count; i++) {
    if (!(current.duration[i] > 0)) continue;
    prepareSegment(current, i);
    crossSegment(current, i);
    const at = KEPT * i + WHOLE;
    const a = kept[at] * p00 + kept[at + 1] * p10;
    const b = kept[at] * p01 + kept[at + 1] * p11;
    p10 = kept[at + 2] * p00 + kept[at + 3] * p10;
    p11 = kept[at + 2] * p01 + kept[at + 3] * p11;
    p00 = a;
    p01 = b;
  }
  const determinant = (1 - p00) * (1 - p11) - p01 * p10;
  const w = ((1 - p11) * pair.w + p01 * pair.y) / determinant;
  pair.y = (p10 * pair.w + (1 - p00) * pair.y) / determinant;
  pair.w = w;
  setBefore(current);
}

/** Walks all segments from the state that stands, and sums what is wanted. */
function walkAll(current: Waveform, voltages: boolean, squares: boolean): void {
  pair.q = 0;
  pair.highest = Number.NEGATIVE_INFINITY;
  pair.lowest = Number.POSITIVE_INFINITY;
  pair.square1 = 0;
  pair.square2 = 0;
  for (let i = 0; i < current.count; i++) {
    if (!(current.duration[i] > 0)) continue;
    crossSegment(current, i);
    if (squares) addSquares(i);
    if (voltages) addExtremes(i);
    addCharge(i);
  }
}

function addCharge(i: number): void {
  const at = KEPT * i + CURRENT;
  pair.q += (kept[at] + 0.5 * kept[at + 1] * pair.d) * pair.d;
}
