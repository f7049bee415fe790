/** Exact periodic steady state of a capacitor bank under a piecewise-linear current: ripple voltage and group currents. */
import type { Waveform } from '../waveform/waveform.ts';
import type { Bank, BankRipple } from './bank.ts';
import { isPair, pairRipple } from './bank-pair.ts';
import { walkState } from './bank-state.ts';
import { beginWalk, walk } from './bank-walk.ts';

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
 * Two groups with inductance ring against each other: those go by `pairRipple`.
 * @valid c1 > 0
 */
export function bankRipple(bank: Bank, current: Waveform, into: BankRipple): void {
  if (isPair(bank)) {
    pairRipple(bank, current, true, into);
    return;
  }
  walkPeriod(bank, current, true);
  into.highest = walkState.highest;
  into.lowest = walkState.lowest;
  into.ripple = walkState.highest - walkState.lowest;
  into.meanSquare1 = walkState.square1 / current.period;
  into.meanSquare2 = walkState.square2 / current.period;
}

/**
 * The mean square currents of `bankRipple` alone: no extremes are sought, so it is the cheaper one where only heat is asked.
 * Leaves the voltages of `into` at 0.
 * @derivation as `bankRipple`, whose currents it equals to the bit
 * @valid as `bankRipple`
 */
export function bankCurrents(bank: Bank, current: Waveform, into: BankRipple): void {
  if (isPair(bank)) {
    pairRipple(bank, current, false, into);
    return;
  }
  walkPeriod(bank, current, false);
  into.highest = 0;
  into.lowest = 0;
  into.ripple = 0;
  into.meanSquare1 = walkState.square1 / current.period;
  into.meanSquare2 = walkState.square2 / current.period;
}

/** Walks all segments of one period. */
function walkPeriod(bank: Bank, current: Waveform, extremes: boolean): void {
  beginWalk(bank, current);
  for (let i = 0; i < current.count; i++) {
    if (current.duration[i] > 0) walk(bank, current, i, extremes);
  }
}
