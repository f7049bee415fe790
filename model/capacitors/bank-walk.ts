/**
 * The walk over a bank's periodic state, segment by segment: the kernel behind `bankRipple`, which states the equations.
 * Marked as a kernel: its functions speak through one record instead of arguments.
 */
import { expAt, logAt } from '../../optimizer/maths/index.ts';
import { mean } from '../waveform/moments.ts';
import type { Waveform } from '../waveform/waveform.ts';
import type { Bank } from './bank.ts';

const scratch = new Float64Array(1);
/** e^(−d/τ) by segment: at most 256 segments. */
const decay = new Float64Array(256);
/**
 * What the walk over the segments needs of the bank, and where it stands. One record of numbers written in place, so that no
 * double crosses a call (a double that does is boxed: garbage).
 */
export const walkState = {
  // The bank.
  total: 0.5,
  tau: 0.5,
  h: 0.5,
  parallel: 0.5,
  share: 0.5,
  sum: 0.5,
  esl: 0.5,
  // The walk.
  average: 0.5,
  w: 0.5,
  q: 0.5,
  highest: 0.5,
  lowest: 0.5,
  square1: 0.5,
  square2: 0.5,
  // The segment: current a + s·t for d s, e = e^(−d/τ), difference base + drift·t + k·e^(−t/τ).
  a: 0.5,
  s: 0.5,
  d: 0.5,
  e: 0.5,
  base: 0.5,
  drift: 0.5,
  k: 0.5,
  // v'(t) = slope + beta·t + gamma·e^(−t/τ), and its values at the ends of the bracket that a zero is sought in.
  slope: 0.5,
  beta: 0.5,
  gamma: 0.5,
  from: 0.5,
  to: 0.5,
  atFrom: 0.5,
  atTo: 0.5,
  // A time in the segment and its e^(−t/τ).
  t: 0.5,
  et: 0.5,
  // A group's current p + r·t + f·e^(−t/τ).
  p: 0.5,
  r: 0.5,
  f: 0.5,
};

/**
 * Makes ready for the first segment: constants of the bank, the difference that comes back after one period, empty sums.
 * @derivation the network of `bankRipple`
 * @valid as there
 */
export function beginWalk(bank: Bank, current: Waveform): void {
  prepare(bank);
  walkState.average = mean(current);
  findStart(current);
  walkState.q = 0;
  walkState.highest = Number.NEGATIVE_INFINITY;
  walkState.lowest = Number.POSITIVE_INFINITY;
  walkState.square1 = 0;
  walkState.square2 = 0;
}

/** Constants of the network. Without a second group, or without resistance, there is no difference to follow: h = 0. */
function prepare(bank: Bank): void {
  const total = bank.c1 + bank.c2;
  const sum = bank.r1 + bank.r2;
  const two = bank.c2 > 0 && sum > 0;
  walkState.total = total;
  walkState.sum = sum;
  walkState.tau = two ? (sum * bank.c1 * bank.c2) / total : 0;
  walkState.h = two ? (bank.r2 * bank.c2 - bank.r1 * bank.c1) / total : 0;
  walkState.parallel = two ? (bank.r1 * bank.r2) / sum : bank.c2 > 0 ? 0 : bank.r1;
  walkState.share = two ? bank.c2 / total - bank.r1 / sum : 0;
  const inductances = bank.l1 + bank.l2;
  walkState.esl = bank.c2 > 0 ? (inductances > 0 ? (bank.l1 * bank.l2) / inductances : 0) : bank.l1;
}

/** Difference at time 0 that comes back after one period; fills `decay`. */
function findStart(current: Waveform): void {
  const { tau, h, average } = walkState;
  let forced = 0;
  let kept = 1;
  for (let i = 0; i < current.count; i++) {
    const d = current.duration[i];
    decay[i] = 0;
    if (d > 0 && tau > 0) {
      scratch[0] = -d / tau;
      expAt(scratch, 0);
      const e = scratch[0];
      decay[i] = e;
      const s = (current.end[i] - current.start[i]) / d;
      const a = h * (current.start[i] - average - s * tau);
      forced = forced * e + a * (1 - e) + h * s * d;
      kept *= e;
    }
  }
  walkState.w = tau > 0 && kept < 1 ? forced / (1 - kept) : 0;
}

/**
 * Enters segment `i`: its current and the parts of its solution.
 * @derivation the network of `bankRipple`
 * @valid as there
 */
export function enterSegment(current: Waveform, i: number): void {
  const d = current.duration[i];
  const a = current.start[i] - walkState.average;
  const s = (current.end[i] - current.start[i]) / d;
  walkState.a = a;
  walkState.s = s;
  walkState.d = d;
  walkState.e = decay[i];
  walkState.base = walkState.h * (a - s * walkState.tau);
  walkState.drift = walkState.h * s;
  walkState.k = walkState.w - walkState.base;
}

/**
 * Follows segment `i`: extremes where asked, mean squares, and the state at its end. Segments of no length are left out.
 * @derivation the network of `bankRipple`
 * @valid as there
 */
export function walk(bank: Bank, current: Waveform, i: number, extremes: boolean): void {
  enterSegment(current, i);
  const { a, s, d } = walkState;
  walkState.slope = a / walkState.total + walkState.share * walkState.drift + walkState.parallel * s;
  walkState.beta = s / walkState.total;
  walkState.gamma = walkState.tau > 0 ? (-walkState.share * walkState.k) / walkState.tau : 0;
  if (extremes) {
    walkState.t = 0;
    walkState.et = 1;
    extend();
    walkState.t = d;
    walkState.et = walkState.e;
    extend();
    turns();
  }
  squares(bank);
  walkState.q += (a + 0.5 * s * d) * d;
  walkState.w = walkState.base + walkState.drift * d + walkState.k * walkState.e;
}

/**
 * Terminal voltage at `walkState.t`, where e^(−t/τ) is `walkState.et`, V over the reference level.
 * @derivation the network of `bankRipple`
 * @valid as there
 */
export function voltageThere(): number {
  const { t, a, s } = walkState;
  const difference = walkState.base + walkState.drift * t + walkState.k * walkState.et;
  const q = walkState.q + (a + 0.5 * s * t) * t;
  return q / walkState.total + walkState.share * difference + walkState.parallel * (a + s * t) + walkState.esl * s;
}

/** Takes the terminal voltage at `walkState.t` into the extremes. */
function extend(): void {
  const v = voltageThere();
  if (v > walkState.highest) walkState.highest = v;
  if (v < walkState.lowest) walkState.lowest = v;
}

/** Extremes inside a segment: v' is monotone on each side of its own turning point, so each side holds at most one zero. */
function turns(): void {
  const { slope, beta, gamma, d, e } = walkState;
  walkState.from = 0;
  walkState.to = d;
  walkState.atFrom = slope + gamma;
  walkState.atTo = slope + beta * d + gamma * e;
  // v'' = beta − (gamma/τ)·e^(−t/τ) is zero where e^(−t/τ) = beta·τ/gamma
  const ratio = gamma !== 0 ? (beta * walkState.tau) / gamma : 0;
  if (ratio > e && ratio < 1) {
    scratch[0] = ratio;
    logAt(scratch, 0);
    const middle = -walkState.tau * scratch[0];
    const value = slope + beta * middle + gamma * ratio;
    const last = walkState.atTo;
    walkState.to = middle;
    walkState.atTo = value;
    if (walkState.atFrom * value < 0) zero();
    walkState.from = middle;
    walkState.to = d;
    walkState.atFrom = value;
    walkState.atTo = last;
  }
  if (walkState.atFrom * walkState.atTo < 0) zero();
}

/** Finds the zero of v' in the bracket by Newton kept inside it, from the secant on, and takes the voltage there. */
function zero(): void {
  const { slope, beta, gamma, tau, from, to, atFrom } = walkState;
  let low = from;
  let high = to;
  let t = from + ((to - from) * atFrom) / (atFrom - walkState.atTo);
  for (let round = 0; gamma !== 0 && round < 60; round++) {
    scratch[0] = -t / tau;
    expAt(scratch, 0);
    const value = slope + beta * t + gamma * scratch[0];
    if (value * atFrom > 0) low = t;
    else high = t;
    const step = t - value / (beta - (gamma * scratch[0]) / tau);
    const next = step >= low && step <= high ? step : 0.5 * (low + high);
    const moved = Math.abs(next - t);
    t = next;
    // A last step of 1e-3 leaves about 1e-6 (Newton squares it), and the voltage is flat there: it is good to 1e-12.
    if (moved <= 1e-3 * (to - from)) break;
  }
  scratch[0] = gamma !== 0 ? -t / tau : 0;
  expAt(scratch, 0);
  walkState.t = t;
  walkState.et = gamma !== 0 ? scratch[0] : 0;
  extend();
}

/** Adds the segment's ∫i1² and ∫i2²; i1 = (R2·i − w)/(R1 + R2), i2 = i − i1. */
function squares(bank: Bank): void {
  const { a, s, sum } = walkState;
  let p = a;
  let r = s;
  let f = 0;
  if (walkState.tau > 0) {
    p = (bank.r2 * a - walkState.base) / sum;
    r = (bank.r2 * s - walkState.drift) / sum;
    f = -walkState.k / sum;
  } else if (bank.c2 > 0) {
    p = (a * bank.c1) / walkState.total;
    r = (s * bank.c1) / walkState.total;
  }
  walkState.p = p;
  walkState.r = r;
  walkState.f = f;
  scratch[0] = 0;
  addSquare();
  walkState.square1 += scratch[0];
  walkState.p = a - p;
  walkState.r = s - r;
  walkState.f = -f;
  scratch[0] = 0;
  addSquare();
  walkState.square2 += scratch[0];
}

/**
 * Adds ∫(p + r·t + f·e^(−t/τ))² dt over the segment to `scratch[0]`: closed form; by Simpson's rule where the segment is so
 * short against τ that the closed form would cancel (its error is below 1e-8 there).
 */
function addSquare(): void {
  const { p, r, f, d, e, tau } = walkState;
  const end = p + r * d;
  if (f === 0) {
    scratch[0] += (d * (p * p + p * end + end * end)) / 3;
  } else if (d < 0.05 * tau) {
    const first = p + f;
    const middle = p + 0.5 * r * d + f * Math.sqrt(e);
    const last = end + f * e;
    scratch[0] += (d * (first * first + 4 * middle * middle + last * last)) / 6;
  } else {
    const line = (d * (p * p + p * end + end * end)) / 3;
    const cross = 2 * f * tau * (p - end * e + r * tau * (1 - e));
    scratch[0] += line + cross + 0.5 * f * f * tau * (1 - e * e);
  }
}
