/** The terminal voltage of a bank over one period, for plots. */
import { exp } from '../../optimizer/maths/index.ts';
import type { Waveform } from '../waveform/waveform.ts';
import type { Bank } from './bank.ts';
import { findVoltage } from './bank-extremes.ts';
import { isPair, pairTrace } from './bank-pair.ts';
import { walkState } from './bank-state.ts';
import { beginWalk, enterSegment, walk } from './bank-walk.ts';

/** One period of a bank's terminal voltage: times in s, volts about their mean over the points. */
export interface BankTrace {
  readonly time: readonly number[];
  readonly value: readonly number[];
}

/**
 * Terminal voltage of the bank over one period of `current` at `points` times in every segment and at both its ends: allocates.
 * @derivation as `bankRipple`; its extremes lie between those of a fine trace and of the exact solution
 * @valid as `bankRipple`; points ≥ 1
 */
export function bankTrace(bank: Bank, current: Waveform, points: number): BankTrace {
  if (isPair(bank)) return centred(pairTrace(bank, current));
  beginWalk(bank, current);
  const time: number[] = [];
  const value: number[] = [];
  let start = 0;
  for (let i = 0; i < current.count; i++) {
    const d = current.duration[i];
    if (!(d > 0)) continue;
    enterSegment(current, i);
    for (let p = 0; p <= points + 1; p++) {
      walkState.t = (d * p) / (points + 1);
      walkState.et = walkState.tau > 0 ? exp(-walkState.t / walkState.tau) : 0;
      time.push(start + walkState.t);
      findVoltage();
      value.push(walkState.v);
    }
    walk(bank, current, i, false);
    start += d;
  }
  return centred({ time, value });
}

/** The same with its values about their mean. */
function centred({ time, value }: BankTrace): BankTrace {
  const middle = value.reduce((sum, v) => sum + v, 0) / value.length;
  return { time, value: value.map((v) => v - middle) };
}
