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
  /**
   * Drops of body diodes over those of their switches, V, each times the share of the set period that one gap takes: of the device
   * that carries the falling interval, and of the one that carries the rising one.
   */
  gapFall = 0;
  gapRise = 0;
  /** The same for each ampere of valley current that must turn round before the current grows, Ω. */
  gapTurn = 0;
  /** Current that moves the node from rail to rail within a gap, A, above 0. */
  gapCurrent = 1;
  /** The same where the node waits for its charge before an edge that its own current brings about; 0 where it moves at once. */
  waitCurrent = 0;
  /** Mean voltage that the gaps take off the node over a set period, V; `settleGaps` takes it from the ripple last solved. */
  gapVolts = 0;
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
 * Solves `s`. Continuous: D = (fall + g)/(rise + fall), g what the gaps take, ΔI = rise·D/(L·f). Discontinuous where blocking and
 * I < ΔI/2: D² = 2·L·f·I·fall/(rise·(rise + fall)) without gaps; with them the volt-seconds rise·D = fall·D2 + g and
 * I = ΔI·(D + D2)/2 give the root of a quadratic.
 * Below the shortest on-time pulses keep their size and come at I/(charge of a pulse). All three meet without a jump.
 * @source erickson-maksimovic-2001, chapter 5, with drops
 * @valid rise, fall, inductance and frequency above 0; current ≥ 0
 */
export function solveChoke(s: ChokeSteadyState): void {
  const total = s.rise + s.fall;
  const duty = (s.fall + s.gapVolts) / total;
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
  const charge = (2 * s.inductance * s.frequency * s.current * s.fall) / s.rise;
  // A pulse loses at most half of its own volt-seconds in a gap.
  const gap = Math.min(s.gapVolts, 0.5 * s.rise * Math.sqrt(charge / total));
  const asked = (gap + Math.sqrt(gap * gap + 4 * total * charge)) / (2 * total);
  const least = s.shortestRise * s.frequency;
  const set = asked < least ? Math.min(least, duty) : asked;
  if (set > asked) {
    s.mode = s.current > 0 ? MODE.skipping : MODE.off;
    s.effectiveFrequency = (s.frequency * charge) / (set * (set * total - gap));
  }
  const stretch = s.effectiveFrequency / s.frequency;
  s.dutyCycle = set;
  s.riseShare = set * stretch;
  s.fallShare = (stretch * (set * s.rise - gap)) / s.fall;
  s.ripple = (s.rise * set) / (s.inductance * s.frequency);
}

/**
 * Takes what the gaps between the switches cost in voltage from the ripple that `s` holds: each edge's body diode by its current's sign.
 * Before a hard edge it conducts through the gap (a current too small to move the node counts in proportion, so that nothing jumps
 * where it turns round), before a soft one only once the node has arrived.
 * @derivation each edge's body diode conducts in the gap until the node has moved: its drop over the switch times that share
 * @valid gap short beside the period
 */
export function settleGaps(s: ChokeSteadyState): void {
  const half = 0.5 * s.ripple;
  const rests = pauses(s.mode);
  const valley = rests ? 0 : s.current - half;
  const peak = rests ? s.ripple : s.current + half;
  // Share of a gap in which the body diode conducts: before a hard edge, before a soft one.
  const first =
    valley >= 0
      ? s.gapFall * Math.min(1, valley / s.gapCurrent)
      : -s.gapRise * (-valley > s.waitCurrent ? 1 + s.waitCurrent / valley : 0);
  const second =
    peak >= 0
      ? s.gapFall * (peak > s.waitCurrent ? 1 - s.waitCurrent / peak : 0)
      : -s.gapRise * Math.min(1, -peak / s.gapCurrent);
  // Half of what drives the choke at most: so duties stay between 0 and 1 where hardly anything does, and broken limits tell the rest.
  const most = (0.5 * s.rise * s.fall) / (s.rise + s.fall);
  s.gapVolts = Math.max(-most, Math.min(most, first + second + s.gapTurn * Math.max(0, valley)));
}

/**
 * Copies the solution for power from input to output into `state`.
 * @derivation a triangle's ends lie half its swing from the mean; from rest it rises by the whole swing
 * @valid straight segments
 */
export function applyForward(s: ChokeSteadyState, state: StageState): void {
  state.mode = s.mode;
  state.highShare = s.riseShare;
  state.lowShare = s.fallShare;
  const blocked = pauses(s.mode);
  state.valleyCurrent = blocked ? 0 : s.current - 0.5 * s.ripple;
  state.peakCurrent = blocked ? s.ripple : s.current + 0.5 * s.ripple;
  shared(s, state);
}

/**
 * Copies the solution for power from output to input: the low switch drives, the high switch returns.
 * @derivation as forward, mirrored in sign and in the intervals' order
 * @valid straight segments
 */
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
