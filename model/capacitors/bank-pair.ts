/**
 * Two capacitor groups that both have series inductance, solved exactly: the bulk's inductance rings with the ceramics'
 * capacitance after every corner of the current, and no split by capacitance and resistance shows that. A kernel: it speaks
 * through one record of numbers and walks each segment in equal steps with one small matrix, so a step costs a few products.
 */
import { expAt, sincosAt } from '../../optimizer/maths/index.ts';
import { mean } from '../waveform/moments.ts';
import type { Waveform } from '../waveform/waveform.ts';
import type { Bank, BankRipple } from './bank.ts';

/** Segments whose step matrices can be held. */
const SEGMENTS = 256;
/** Fewest steps of a segment where there are two of them, and where there are more and so each is short. */
const FEWEST = 8;
const FEWEST_OF_MANY = 4;
/** Most steps of a segment, and the angle of ringing that one may turn through (of a decay, one time constant). */
const MOST = 32;
const TURN = 0.7;

const scratch = new Float64Array(2);
/** Step matrix of each segment, row by row, and its number of steps. */
const steps = new Float64Array(4 * SEGMENTS);
const counts = new Int32Array(SEGMENTS);
/** Product of a segment's steps. */
const whole = new Float64Array(4);

/**
 * The network: difference w = v1 − v2 and bulk current y obey w' = (i − y)/C1 − y/C2 and L·y' = w + R1·i + L1·i' − R·y, with
 * R = R1 + R2 and L = L1 + L2.
 */
const pair = {
  c1: 0.5,
  c2: 0.5,
  r1: 0.5,
  l1: 0.5,
  total: 0.5,
  // g = 1/C1 + 1/C2; half of the damping α = −R/(2·L).
  g: 0.5,
  r: 0.5,
  l: 0.5,
  alpha: 0.5,
  average: 0.5,
  // The state.
  w: 0.5,
  y: 0.5,
  q: 0.5,
  // The segment: current a + s·t for d s; a solution that the state rings about, w0 + w1·t and y0 + y1·t.
  a: 0.5,
  s: 0.5,
  d: 0.5,
  w0: 0.5,
  w1: 0.5,
  y0: 0.5,
  y1: 0.5,
  // A time in the segment.
  t: 0.5,
  highest: 0.5,
  lowest: 0.5,
  square1: 0.5,
  square2: 0.5,
};

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
 * @derivation the network above, closed form in every segment; extremes at its steps and by the parabola through three, so a ringing peak is met to about 1 %
 * @valid a pair (`isPair`) with resistance; at most 256 segments
 */
export function pairRipple(bank: Bank, current: Waveform, voltages: boolean, into: BankRipple): void {
  begin(bank, mean(current));
  findPeriodic(current);
  walkAll(current, voltages, lastEnd(current));
  into.highest = voltages ? pair.highest : 0;
  into.lowest = voltages ? pair.lowest : 0;
  into.ripple = into.highest - into.lowest;
  into.meanSquare1 = pair.square1 / current.period;
  into.meanSquare2 = pair.square2 / current.period;
}

/**
 * Response from rest to the current `pulse` drawn once: fills the extremes of `into`, V about the start.
 * @derivation as `pairRipple`
 * @valid as `pairRipple`
 */
export function pairTransient(bank: Bank, pulse: Waveform, into: BankRipple): void {
  begin(bank, 0);
  for (let i = 0; i < pulse.count; i++) if (pulse.duration[i] > 0) prepareSteps(pulse, i);
  pair.w = 0;
  pair.y = 0;
  walkAll(pulse, true, 0);
  into.highest = pair.highest;
  into.lowest = pair.lowest;
  into.ripple = pair.highest - pair.lowest;
}

/**
 * One period of the terminal voltage at the steps of the walk: allocates, for plots.
 * @derivation as `pairRipple`
 * @valid as `pairRipple`
 */
export function pairTrace(bank: Bank, current: Waveform): { time: number[]; value: number[] } {
  begin(bank, mean(current));
  findPeriodic(current);
  const time: number[] = [];
  const value: number[] = [];
  let start = 0;
  let before = lastEnd(current);
  for (let i = 0; i < current.count; i++) {
    if (!(current.duration[i] > 0)) continue;
    enter(current, i, before);
    const h = pair.d / counts[i];
    for (let k = 0; k <= counts[i]; k++) {
      pair.t = k * h;
      time.push(start + pair.t);
      value.push(voltage());
      if (k < counts[i]) advance(i, h);
    }
    leave();
    start += pair.d;
    before = current.end[i];
  }
  return { time, value };
}

/** Value of the waveform at the end of its last segment that lasts. */
function lastEnd(current: Waveform): number {
  let i = current.count - 1;
  while (i > 0 && !(current.duration[i] > 0)) i--;
  return current.end[i];
}

function begin(bank: Bank, average: number): void {
  pair.c1 = bank.c1;
  pair.c2 = bank.c2;
  pair.r1 = bank.r1;
  pair.l1 = bank.l1;
  pair.total = bank.c1 + bank.c2;
  pair.g = 1 / bank.c1 + 1 / bank.c2;
  pair.r = bank.r1 + bank.r2;
  pair.l = bank.l1 + bank.l2;
  pair.alpha = (-0.5 * pair.r) / pair.l;
  pair.average = average;
}

/** Step matrix e^(A·h) of segment `i`, A − α·1 = [[−α, −g], [1/L, α]]: ringing or, with more damping, two decays. */
function prepareSteps(current: Waveform, i: number): void {
  const d = current.duration[i];
  const { alpha, g, l } = pair;
  const bend = alpha * alpha - g / l;
  const omega = bend < 0 ? Math.sqrt(-bend) : 0;
  let n = current.count > 3 ? FEWEST_OF_MANY : FEWEST;
  const fastest = Math.max(omega / TURN, -alpha);
  while (n < MOST && fastest * d > n) n *= 2;
  counts[i] = n;
  const h = d / n;
  let even = 0;
  let odd = 0;
  if (bend < 0) {
    scratch[0] = alpha * h;
    expAt(scratch, 0);
    const e = scratch[0];
    scratch[0] = omega * h;
    sincosAt(scratch, 0);
    odd = (e * scratch[0]) / omega;
    even = e * scratch[1];
  } else {
    const beta = Math.sqrt(bend);
    // α + β by its twin, for the sum itself would cancel.
    scratch[0] = (g / l / (alpha - beta)) * h;
    scratch[1] = (alpha - beta) * h;
    expAt(scratch, 0);
    expAt(scratch, 1);
    even = 0.5 * (scratch[0] + scratch[1]);
    odd = beta * h > 1e-9 ? (scratch[0] - scratch[1]) / (2 * beta) : h * scratch[0];
  }
  steps[4 * i] = even - alpha * odd;
  steps[4 * i + 1] = -g * odd;
  steps[4 * i + 2] = odd / l;
  steps[4 * i + 3] = even + alpha * odd;
}

/** The state at time 0 that comes back after one period: each segment is an affine map, and so is their chain. */
function findPeriodic(current: Waveform): void {
  let p00 = 1;
  let p01 = 0;
  let p10 = 0;
  let p11 = 1;
  pair.w = 0;
  pair.y = 0;
  let before = lastEnd(current);
  for (let i = 0; i < current.count; i++) {
    if (!(current.duration[i] > 0)) continue;
    prepareSteps(current, i);
    multiplySteps(i);
    const m00 = whole[0];
    const m01 = whole[1];
    const m10 = whole[2];
    const m11 = whole[3];
    enter(current, i, before);
    const z = pair.w - pair.w0;
    const u = pair.y - pair.y0;
    pair.w = m00 * z + m01 * u + pair.w0 + pair.w1 * pair.d;
    pair.y = m10 * z + m11 * u + pair.y0 + pair.y1 * pair.d;
    const a = m00 * p00 + m01 * p10;
    const b = m00 * p01 + m01 * p11;
    p10 = m10 * p00 + m11 * p10;
    p11 = m10 * p01 + m11 * p11;
    p00 = a;
    p01 = b;
    before = current.end[i];
  }
  const determinant = (1 - p00) * (1 - p11) - p01 * p10;
  const w = ((1 - p11) * pair.w + p01 * pair.y) / determinant;
  pair.y = (p10 * pair.w + (1 - p00) * pair.y) / determinant;
  pair.w = w;
}

/** Writes the matrix of the whole segment `i` to `whole`: its steps are a power of two, so it is squared. */
function multiplySteps(i: number): void {
  let a = steps[4 * i];
  let b = steps[4 * i + 1];
  let c = steps[4 * i + 2];
  let d = steps[4 * i + 3];
  for (let n = counts[i]; n > 1; n /= 2) {
    const bc = b * c;
    const sum = a + d;
    a = a * a + bc;
    b *= sum;
    c *= sum;
    d = d * d + bc;
  }
  whole[0] = a;
  whole[1] = b;
  whole[2] = c;
  whole[3] = d;
}

/** Takes up segment `i`: a jump of the current from `before` splits by inductance; then what the state rings about. */
function enter(current: Waveform, i: number, before: number): void {
  const { g, r, r1, l, l1, c1 } = pair;
  pair.y += ((current.start[i] - before) * l1) / l;
  const d = current.duration[i];
  const a = current.start[i] - pair.average;
  const s = (current.end[i] - pair.average - a) / d;
  pair.a = a;
  pair.s = s;
  pair.d = d;
  pair.y1 = s / (g * c1);
  pair.w1 = r * pair.y1 - r1 * s;
  pair.y0 = (a / c1 - pair.w1) / g;
  pair.w0 = l * pair.y1 - r1 * a - l1 * s + r * pair.y0;
}

/** One step of segment `i` from `pair.t`, `h` s long. */
function advance(i: number, h: number): void {
  const z = pair.w - pair.w0 - pair.w1 * pair.t;
  const u = pair.y - pair.y0 - pair.y1 * pair.t;
  const t = pair.t + h;
  pair.w = steps[4 * i] * z + steps[4 * i + 1] * u + pair.w0 + pair.w1 * t;
  pair.y = steps[4 * i + 2] * z + steps[4 * i + 3] * u + pair.y0 + pair.y1 * t;
}

function leave(): void {
  pair.q += (pair.a + 0.5 * pair.s * pair.d) * pair.d;
}

/** Terminal voltage at `pair.t`, V over the reference level. */
function voltage(): number {
  const { t, a, s, w, y, r, r1, l, l1 } = pair;
  const i = a + s * t;
  const q = pair.q + (a + 0.5 * s * t) * t;
  const rise = (w + r1 * i + l1 * s - r * y) / l;
  return (q + pair.c2 * w) / pair.total + r1 * (i - y) + l1 * (s - rise);
}

/** Walks all segments from the state that stands; extremes where wanted, and ∫i1², ∫i2² by Simpson's rule over the steps. */
function walkAll(current: Waveform, voltages: boolean, before: number): void {
  pair.q = 0;
  pair.highest = Number.NEGATIVE_INFINITY;
  pair.lowest = Number.POSITIVE_INFINITY;
  pair.square1 = 0;
  pair.square2 = 0;
  let end = before;
  for (let i = 0; i < current.count; i++) {
    if (!(current.duration[i] > 0)) continue;
    enter(current, i, end);
    walkSegment(i, voltages);
    leave();
    end = current.end[i];
  }
}

/**
 * Walks segment `i` step by step with everything in local variables: the hottest loop of the model. Extremes where wanted, a turn
 * between steps by the parabola through three voltages; ∫i1² and ∫i2² by Simpson's rule.
 */
function walkSegment(i: number, voltages: boolean): void {
  const n = counts[i];
  const { a, s, d, w0, w1, y0, y1, total, c2, r, r1, l, l1 } = pair;
  const m00 = steps[4 * i];
  const m01 = steps[4 * i + 1];
  const m10 = steps[4 * i + 2];
  const m11 = steps[4 * i + 3];
  const h = d / n;
  let { highest, lowest } = pair;
  let z = pair.w - w0;
  let u = pair.y - y0;
  let sum1 = 0;
  let sum2 = 0;
  let v0 = 0;
  let v1 = 0;
  let t = 0;
  for (let k = 0; k <= n; k++) {
    t = k * h;
    const y = u + y0 + y1 * t;
    const drawn = a + s * t;
    const other = drawn - y;
    const weight = k === 0 || k === n ? 1 : 2 + 2 * (k & 1);
    sum1 += weight * other * other;
    sum2 += weight * y * y;
    if (voltages) {
      const w = z + w0 + w1 * t;
      const q = pair.q + (a + 0.5 * s * t) * t;
      const v = (q + c2 * w) / total + r1 * other + l1 * (s - (w + r1 * drawn + l1 * s - r * y) / l);
      if (v > highest) highest = v;
      if (v < lowest) lowest = v;
      if (k >= 2 && (v1 - v0) * (v1 - v) > 0) {
        const top = v1 + ((v0 - v) * (v0 - v)) / (8 * (2 * v1 - v0 - v));
        if (top > highest) highest = top;
        if (top < lowest) lowest = top;
      }
      v0 = v1;
      v1 = v;
    }
    if (k < n) {
      const turned = m00 * z + m01 * u;
      u = m10 * z + m11 * u;
      z = turned;
    }
  }
  pair.w = z + w0 + w1 * t;
  pair.y = u + y0 + y1 * t;
  pair.highest = highest;
  pair.lowest = lowest;
  pair.square1 += (sum1 * h) / 3;
  pair.square2 += (sum2 * h) / 3;
}
