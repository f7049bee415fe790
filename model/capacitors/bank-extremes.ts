/** Terminal voltage within one segment of a bank's walk, and its extremes there. A kernel: it speaks through one record. */
import { expAt, logAt } from '../../optimizer/maths/index.ts';
import { walkState } from './bank-state.ts';

const scratch = new Float64Array(1);

/**
 * Writes the terminal voltage at `walkState.t`, where e^(−t/τ) is `walkState.et`, to `walkState.v`, V over the reference level.
 * @derivation the network of `bankRipple`
 * @valid as there
 */
export function findVoltage(): void {
  const { t, a, s } = walkState;
  const difference = walkState.base + walkState.drift * t + walkState.k * walkState.et;
  const q = walkState.q + (a + 0.5 * s * t) * t;
  walkState.v =
    q / walkState.total + walkState.share * difference + walkState.parallel * (a + s * t) + walkState.esl * s;
}

/**
 * Takes the terminal voltage at `walkState.t` into the extremes.
 * @derivation the network of `bankRipple`
 * @valid as there
 */
export function extend(): void {
  findVoltage();
  const { v } = walkState;
  if (v > walkState.highest) walkState.highest = v;
  if (v < walkState.lowest) walkState.lowest = v;
}

/**
 * Extremes inside a segment: v' is monotone on each side of its own turning point, so each side holds at most one zero.
 * @derivation the network of `bankRipple`
 * @valid as there
 */
export function turns(): void {
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
