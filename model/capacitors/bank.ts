/**
 * A capacitor bank: one or two groups of equal parts in parallel (ceramic, and bulk beside it), and its exact periodic
 * steady state under a piecewise-linear current.
 */
import { expAt, logAt } from '../../optimizer/maths/index.ts';
import { mean } from '../waveform/moments.ts';
import type { Waveform } from '../waveform/waveform.ts';

/** Two parallel groups, each a capacitance in series with a resistance; a group of 0 F is absent. Filled in place. */
export interface Bank {
  /** F, of the whole first group; above 0. */
  c1: number;
  /** Ω, of the whole first group. */
  r1: number;
  /** H, of the whole first group. */
  l1: number;
  /** F, of the whole second group; 0 where there is none. */
  c2: number;
  /** Ω. */
  r2: number;
  /** H. */
  l2: number;
}

/** What the steady state of a bank shows. Filled in place. */
export interface BankRipple {
  /** Highest terminal voltage over its mean level, V. */
  highest: number;
  /** Lowest, V. */
  lowest: number;
  /** highest − lowest: the ripple, V peak to peak. */
  ripple: number;
  /** Mean square current of the first group, A². */
  meanSquare1: number;
  /** Mean square current of the second group, A². */
  meanSquare2: number;
}

/** A bank to be filled: all zero. */
export function createBank(): Bank {
  return { c1: 0, r1: 0, l1: 0, c2: 0, r2: 0, l2: 0 };
}

/** A result to be filled: all zero. */
export function createBankRipple(): BankRipple {
  return { highest: 0, lowest: 0, ripple: 0, meanSquare1: 0, meanSquare2: 0 };
}

/**
 * Group 1 of `count` equal parts: `capacitance` F, `resistance` Ω, `inductance` H of one part. Capacitances add, the rest divides.
 * @derivation equal parts in parallel carry equal currents
 * @valid count ≥ 1
 */
export function setGroup1(
  bank: Bank,
  count: number,
  capacitance: number,
  resistance: number,
  inductance: number,
): void {
  bank.c1 = count * capacitance;
  bank.r1 = resistance / count;
  bank.l1 = inductance / count;
}

/** Group 2, as `setGroup1`; count 0 leaves the group out. */
export function setGroup2(
  bank: Bank,
  count: number,
  capacitance: number,
  resistance: number,
  inductance: number,
): void {
  bank.c2 = count * capacitance;
  bank.r2 = count > 0 ? resistance / count : 0;
  bank.l2 = count > 0 ? inductance / count : 0;
}

const scratch = new Float64Array(1);
/** e^(−d/τ) by segment: at most 256 segments. */
const decay = new Float64Array(256);
/** What the walk over the segments needs of the bank, and where it stands. */
const state = {
  total: 0,
  tau: 0,
  h: 0,
  parallel: 0,
  share: 0,
  sum: 0,
  esl: 0,
  w: 0,
  q: 0,
  highest: 0,
  lowest: 0,
  square1: 0,
  square2: 0,
  slope: 0,
  beta: 0,
  gamma: 0,
  time: 0,
  /** Of the segment at hand: current at its start and slope; difference: line, drift, exponential part; length, decay. */
  a: 0,
  s: 0,
  base: 0,
  drift: 0,
  k: 0,
  d: 0,
  e: 0,
};

/**
 * Solves the bank under the ac part of `current` (its mean is taken off) and fills `into`.
 *
 * Charge q = C1·v1 + C2·v2 follows ∫i exactly. The difference w = v1 − v2 obeys w' = (h·i − w)/τ with
 * τ = (R1 + R2)·C1·C2/(C1 + C2) and h = (R2·C2 − R1·C1)/(C1 + C2); in a segment i = a + s·t it is
 * w = h·(a − s·τ) + h·s·t + K·e^(−t/τ), one exponential a segment, and the start value of the period is the one that
 * returns. Terminal voltage (q + C2·w)/C + R1·(R2·i − w)/(R1 + R2) + Lp·s, where Lp = L1‖L2 adds a step at each corner.
 * Extremes: both ends of every segment, and inside it wherever the derivative (a line plus an exponential) crosses zero.
 * Reference level: the mean charge of the walk starts at 0, so only differences of `highest` and `lowest` mean anything.
 * @derivation the two-capacitor network above, solved in closed form; checked against ΔI/(8·f·C) and the exact table for C and series resistance
 * @valid c1 > 0; two groups with inductance: the current is split by capacitance and resistance, not by inductance
 */
export function bankRipple(bank: Bank, current: Waveform, into: BankRipple): void {
  prepare(bank);
  const average = mean(current);
  findStart(current, average);
  state.q = 0;
  state.highest = Number.NEGATIVE_INFINITY;
  state.lowest = Number.POSITIVE_INFINITY;
  state.square1 = 0;
  state.square2 = 0;
  for (let i = 0; i < current.count; i++) {
    if (current.duration[i] > 0) walk(bank, current, i, average, true);
  }
  into.highest = state.highest;
  into.lowest = state.lowest;
  into.ripple = state.highest - state.lowest;
  into.meanSquare1 = state.square1 / current.period;
  into.meanSquare2 = state.square2 / current.period;
}

/**
 * The mean square currents of `bankRipple` alone: no extremes are sought, so it is the cheaper one where only heat is asked.
 * Leaves the voltages of `into` at 0.
 * @derivation as `bankRipple`, whose currents it equals to the bit
 * @valid as `bankRipple`
 */
export function bankCurrents(bank: Bank, current: Waveform, into: BankRipple): void {
  prepare(bank);
  const average = mean(current);
  findStart(current, average);
  state.q = 0;
  state.square1 = 0;
  state.square2 = 0;
  for (let i = 0; i < current.count; i++) {
    if (current.duration[i] > 0) walk(bank, current, i, average, false);
  }
  into.highest = 0;
  into.lowest = 0;
  into.ripple = 0;
  into.meanSquare1 = state.square1 / current.period;
  into.meanSquare2 = state.square2 / current.period;
}

/** One period of a bank's terminal voltage, for plots: times in s, volts about their mean over the points. */
export interface BankTrace {
  readonly time: readonly number[];
  readonly value: readonly number[];
}

/**
 * Terminal voltage of the bank over one period of `current` at `points` times in every segment and at both its ends, for plots: allocates.
 * @derivation as `bankRipple`; its extremes lie between those of a fine trace and of the exact solution
 * @valid as `bankRipple`; points ≥ 1
 */
export function bankTrace(bank: Bank, current: Waveform, points: number): BankTrace {
  prepare(bank);
  const average = mean(current);
  findStart(current, average);
  state.q = 0;
  const time: number[] = [];
  const value: number[] = [];
  let start = 0;
  for (let i = 0; i < current.count; i++) {
    const d = current.duration[i];
    if (!(d > 0)) continue;
    for (let p = 0; p <= points + 1; p++) {
      const t = (d * p) / (points + 1);
      time.push(start + t);
      value.push(voltageAt(current, i, average, t));
    }
    walk(bank, current, i, average, false);
    start += d;
  }
  const middle = value.reduce((sum, v) => sum + v, 0) / value.length;
  return { time, value: value.map((v) => v - middle) };
}

/** Terminal voltage at time `t` of segment `i`, whose start the walk has reached, V over the reference level. */
function voltageAt(current: Waveform, i: number, average: number, t: number): number {
  const a = current.start[i] - average;
  const s = (current.end[i] - average - a) / current.duration[i];
  const base = state.h * (a - s * state.tau);
  let e = 0;
  if (state.tau > 0) {
    scratch[0] = -t / state.tau;
    expAt(scratch, 0);
    e = scratch[0];
  }
  const w = base + state.h * s * t + (state.w - base) * e;
  const q = state.q + (a + 0.5 * s * t) * t;
  return q / state.total + state.share * w + state.parallel * (a + s * t) + state.esl * s;
}

/** Constants of the network. Without a second group, or without resistance, there is no difference to follow: h = 0. */
function prepare(bank: Bank): void {
  const total = bank.c1 + bank.c2;
  const sum = bank.r1 + bank.r2;
  const two = bank.c2 > 0 && sum > 0;
  state.total = total;
  state.sum = sum;
  state.tau = two ? (sum * bank.c1 * bank.c2) / total : 0;
  state.h = two ? (bank.r2 * bank.c2 - bank.r1 * bank.c1) / total : 0;
  state.parallel = two ? (bank.r1 * bank.r2) / sum : bank.c2 > 0 ? 0 : bank.r1;
  state.share = two ? bank.c2 / total - bank.r1 / sum : 0;
  const inductances = bank.l1 + bank.l2;
  state.esl = bank.c2 > 0 ? (inductances > 0 ? (bank.l1 * bank.l2) / inductances : 0) : bank.l1;
}

/** Difference at time 0 that comes back after one period; fills `decay`. */
function findStart(current: Waveform, average: number): void {
  const tau = state.tau;
  const h = state.h;
  let forced = 0;
  let kept = 1;
  for (let i = 0; i < current.count; i++) {
    const d = current.duration[i];
    let e = 0;
    if (tau > 0) {
      scratch[0] = -d / tau;
      expAt(scratch, 0);
      e = scratch[0];
    }
    decay[i] = e;
    if (d > 0 && tau > 0) {
      const s = (current.end[i] - current.start[i]) / d;
      const a = h * (current.start[i] - average - s * tau);
      forced = forced * e + a * (1 - e) + h * s * d;
      kept *= e;
    }
  }
  state.w = tau > 0 && kept < 1 ? forced / (1 - kept) : 0;
}

/** Follows one segment: extremes, mean squares, and the state at its end. */
function walk(bank: Bank, current: Waveform, i: number, average: number, extremes: boolean): void {
  const d = current.duration[i];
  const a = current.start[i] - average;
  const b = current.end[i] - average;
  const s = (b - a) / d;
  const e = decay[i];
  const base = state.h * (a - s * state.tau);
  const k = state.w - base;
  const drift = state.h * s;
  state.a = a;
  state.s = s;
  state.base = base;
  state.drift = drift;
  state.k = k;
  state.d = d;
  state.e = e;
  if (extremes) {
    // v'(t) = slope + beta·t + gamma·e^(−t/τ)
    state.slope = a / state.total + state.share * drift + state.parallel * s;
    state.beta = s / state.total;
    state.gamma = state.tau > 0 ? (-state.share * k) / state.tau : 0;
    extend(0, 1);
    extend(d, e);
    turns();
  }
  squares(bank);
  state.q += 0.5 * (a + b) * d;
  state.w = base + drift * d + k * e;
}

/** Takes the terminal voltage at time `t` of the segment, where e^(−t/τ) is `e`, into the extremes. */
function extend(t: number, e: number): void {
  const i = state.a + state.s * t;
  const q = state.q + (state.a + 0.5 * state.s * t) * t;
  const w = state.base + state.drift * t + state.k * e;
  const v = q / state.total + state.share * w + state.parallel * i + state.esl * state.s;
  if (v > state.highest) state.highest = v;
  if (v < state.lowest) state.lowest = v;
}

/** Extremes inside a segment: v' is monotone on each side of its own turning point, so each side holds at most one zero. */
function turns(): void {
  const first = state.slope + state.gamma;
  const last = state.slope + state.beta * state.d + state.gamma * state.e;
  if (state.gamma === 0) {
    if (first * last < 0) extend(-state.slope / state.beta, 0);
    return;
  }
  // v'' = beta − (gamma/τ)·e^(−t/τ) is zero where e^(−t/τ) = beta·τ/gamma
  const ratio = (state.beta * state.tau) / state.gamma;
  if (ratio > state.e && ratio < 1) {
    scratch[0] = ratio;
    logAt(scratch, 0);
    const middle = -state.tau * scratch[0];
    const value = state.slope + state.beta * middle + state.gamma * ratio;
    if (first * value < 0) zero(0, middle, first);
    if (value * last < 0) zero(middle, state.d, value);
  } else if (first * last < 0) zero(0, state.d, first);
}

/** Finds the zero of v' between two times by Newton kept inside the bracket, and takes the voltage there. */
function zero(from: number, to: number, atFrom: number): void {
  let low = from;
  let high = to;
  let t = from + ((to - from) * atFrom) / (atFrom - atTo);
  let e = 0;
  for (let round = 0; round < 40; round++) {
    scratch[0] = -t / state.tau;
    expAt(scratch, 0);
    e = scratch[0];
    const value = state.slope + state.beta * t + state.gamma * e;
    if (value * atFrom > 0) low = t;
    else high = t;
    const bend = state.beta - (state.gamma * e) / state.tau;
    const step = bend !== 0 ? t - value / bend : low;
    const next = step > low && step < high ? step : 0.5 * (low + high);
    // The voltage is flat at its extreme: a time good to 1e-4 of the segment gives it to 1e-8 of the segment's swing.
    if (Math.abs(next - t) <= 1e-4 * (to - from)) break;
    t = next;
  }
  extend(t, e);
}

/** Adds the segment's ∫i1² and ∫i2²; i1 = (R2·i − w)/(R1 + R2), i2 = i − i1. */
function squares(bank: Bank): void {
  const { a, s, base, drift, k, d, e } = state;
  let p = a;
  let r = s;
  let f = 0;
  if (state.tau > 0) {
    p = (bank.r2 * a - base) / state.sum;
    r = (bank.r2 * s - drift) / state.sum;
    f = -k / state.sum;
  } else if (bank.c2 > 0) {
    p = (a * bank.c1) / state.total;
    r = (s * bank.c1) / state.total;
  }
  const end = p + r * d;
  if (f === 0) {
    state.square1 += (d * (p * p + p * end + end * end)) / 3;
    const p2 = a - p;
    const end2 = a + s * d - end;
    state.square2 += (d * (p2 * p2 + p2 * end2 + end2 * end2)) / 3;
  } else if (d < 0.05 * state.tau) {
    state.square1 += simpson(p, r, f, d, e);
    state.square2 += simpson(a - p, s - r, -f, d, e);
  } else {
    state.square1 += squareOf(p, r, f, d, e);
    state.square2 += squareOf(a - p, s - r, -f, d, e);
  }
}

/** ∫(p + r·t + f·e^(−t/τ))² dt over 0 … d, closed form. */
function squareOf(p: number, r: number, f: number, d: number, e: number): number {
  const tau = state.tau;
  const end = p + r * d;
  const line = (d * (p * p + p * end + end * end)) / 3;
  const cross = 2 * f * tau * (p - end * e + r * tau * (1 - e));
  return line + cross + 0.5 * f * f * tau * (1 - e * e);
}

/** The same by Simpson's rule, for segments so short against τ that the closed form would cancel; error below 1e-8. */
function simpson(p: number, r: number, f: number, d: number, e: number): number {
  const half = Math.sqrt(e);
  const x0 = p + f;
  const x1 = p + 0.5 * r * d + f * half;
  const x2 = p + r * d + f * e;
  return (d * (x0 * x0 + 4 * x1 * x1 + x2 * x2)) / 6;
}
