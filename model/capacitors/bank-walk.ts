/**
 * The walk over a bank's periodic state, segment by segment: the kernel behind `bankRipple`, which states the equations.
 * Its functions speak through one record instead of arguments.
 */
import { expAt } from '../../optimizer/maths/index.ts';
import type { Waveform } from '../waveform/waveform.ts';
import type { Bank } from './bank.ts';
import { extend, turns } from './bank-extremes.ts';
import { squares } from './bank-squares.ts';
import { walkState } from './bank-state.ts';

const scratch = new Float64Array(1);
/** e^(−d/τ) by segment: at most 256 segments. */
const decay = new Float64Array(256);
/**
 * Makes ready for the first segment: constants of the bank, the difference that comes back after one period, empty sums.
 * @derivation the network of `bankRipple`
 * @valid as there
 */
export function beginWalk(bank: Bank, current: Waveform): void {
  prepare(bank);
  let area = 0;
  for (let i = 0; i < current.count; i++) area += current.duration[i] * (current.start[i] + current.end[i]);
  walkState.average = (0.5 * area) / current.period;
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
