/**
 * Steady state of one choke between two voltages: continuous, discontinuous, pulse skipping. One set of equations serves
 * both directions of power: the rising interval is the one in which the source drives the choke.
 */
import type { StageState } from './stages/state.ts';
import { MODE, pauses } from './stages/state.ts';

/** What the choke sees, and what the mode solver answers. Reused, never allocated in the hot path. */
export class ChokeSteadyState {
  /** Voltage across the choke while its current's size grows, V, above 0. */
  rise = 0.5;
  /** Voltage across it while the size shrinks, V, above 0. */
  fall = 0.5;
  /** Mean current, A, ≥ 0. */
  current = 0.5;
  /** H. */
  inductance = 0.5;
  /** Set switching frequency, Hz. */
  frequency = 0.5;
  /** Whether the current may not cross zero (diode or diode emulation). */
  blocking = false;
  /** Shortest time of the growing interval, s; 0 where pulses are never skipped. */
  shortestRise = 0.5;

  mode = 0;
  /** Share of the effective period in which the current's size grows and shrinks. */
  riseShare = 0.5;
  fallShare = 0.5;
  /** Time of the growing interval over the set period. */
  dutyCycle = 0.5;
  /** Peak to peak, A. */
  ripple = 0.5;
  /** Effective switching frequency, Hz. */
  effectiveFrequency = 0.5;
}

/**
 * Solves `s`. Continuous: D = fall/(rise + fall), ΔI = rise·D/(L·f). Discontinuous where blocking and I < ΔI/2:
 * D² = 2·L·f·I·fall/(rise·(rise + fall)) (Erickson & Maksimović, Fundamentals of Power Electronics, ch. 5, with drops).
 * Below the shortest on-time pulses keep their size and come at I/(charge of a pulse). All three meet without a jump.
 * Source id: erickson-maksimovic-2001.
 */
export function solveChoke(s: ChokeSteadyState): void {
  const total = s.rise + s.fall;
  const duty = s.fall / total;
  const ripple = (s.rise * duty) / (s.inductance * s.frequency);
  s.effectiveFrequency = s.frequency;
  if (!s.blocking || s.current >= 0.5 * ripple) {
    s.mode = s.blocking || s.current >= 0.5 * ripple ? MODE.continuous : MODE.forced;
    s.riseShare = duty;
    s.fallShare = 1 - duty;
    s.dutyCycle = duty;
    s.ripple = ripple;
    return;
  }
  s.mode = MODE.discontinuous;
  const asked = Math.sqrt((2 * s.inductance * s.frequency * s.current * s.fall) / (s.rise * total));
  const least = s.shortestRise * s.frequency;
  const set = asked < least ? Math.min(least, duty) : asked;
  if (set > asked) {
    s.mode = s.current > 0 ? MODE.skipping : MODE.off;
    s.effectiveFrequency = s.frequency * ((asked * asked) / (set * set));
  }
  const stretch = s.effectiveFrequency / s.frequency;
  s.dutyCycle = set;
  s.riseShare = set * stretch;
  s.fallShare = (set * stretch * s.rise) / s.fall;
  s.ripple = (s.rise * set) / (s.inductance * s.frequency);
}

/** Copies the solution for power from input to output into `state`. */
export function applyForward(s: ChokeSteadyState, state: StageState): void {
  state.mode = s.mode;
  state.highShare = s.riseShare;
  state.lowShare = s.fallShare;
  const blocked = pauses(s.mode);
  state.valleyCurrent = blocked ? 0 : s.current - 0.5 * s.ripple;
  state.peakCurrent = blocked ? s.ripple : s.current + 0.5 * s.ripple;
  shared(s, state);
}

/** Copies the solution for power from output to input: the low switch drives, the high switch returns. */
export function applyReverse(s: ChokeSteadyState, state: StageState): void {
  state.mode = s.mode === MODE.continuous || s.mode === MODE.forced ? MODE.reverse : s.mode;
  state.highShare = s.fallShare;
  state.lowShare = s.riseShare;
  const blocked = pauses(s.mode);
  state.valleyCurrent = blocked ? -s.ripple : -s.current - 0.5 * s.ripple;
  state.peakCurrent = blocked ? 0 : -s.current + 0.5 * s.ripple;
  shared(s, state);
}

function shared(s: ChokeSteadyState, state: StageState): void {
  state.dutyCycle = s.dutyCycle;
  state.rippleCurrent = s.ripple;
  state.frequency = s.effectiveFrequency;
}
