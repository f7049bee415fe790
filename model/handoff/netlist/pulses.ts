/** When the pulses of a transformer stage come and what flows at time 0: what its netlist is timed by. */
import { turnPace } from '../../stages/isolated.ts';
import { pauses } from '../../stages/state.ts';
import { sample } from '../../waveform/index.ts';
import type { SolvedPoint } from '../solved-point.ts';

/** Times of one phase whose first pulse begins at 0, s. */
export interface PulseTimes {
  /** Period of the transformer. */
  readonly period: number;
  /** Length of a pulse at the primary. */
  readonly pulse: number;
  /** Part of it that turns the current round in the leakage, before the secondary drives anything. */
  readonly commutation: number;
  readonly gap: number;
}

/**
 * The pulses of `point`, a transformer stage.
 * @source sabate-1990: the current turns round at V/Llk before the secondary drives
 * @valid commutation short beside the pulse
 */
export function pulseTimes(point: SolvedPoint): PulseTimes {
  const { design, state } = point;
  const { stage, transformer, driver } = design;
  const { form } = stage;
  const choke = 1 / state.frequency;
  const period = stage.chokeMultiple * choke;
  if (form === undefined) return { period, pulse: 0, commutation: 0, gap: 0 };
  const gap = driver.deadTime;
  // From rest to the valley that a pulse begins with; the magnetizing current, which the secondary carries between pulses, is on its
  // way already. A shifted bridge must first stop the peak of the last pulse, and wait out the gap.
  const pace = turnPace(form, design, state);
  const ahead = form.doubleEnded && !design.phaseShifted ? transformer.ratio * state.magnetizingPeak : 0;
  const start = pace * Math.max(0, state.valleyCurrent - ahead);
  const commutation = design.phaseShifted ? Math.max(gap, pace * Math.max(0, state.peakCurrent)) + start : start;
  const longest = form.doubleEnded ? 0.5 * period - 2 * gap : 0.5 * period;
  const pulse = Math.min(longest, state.highShare * choke + commutation);
  return { period, pulse, commutation, gap };
}

/** Currents at time 0 of a phase whose cycle began `ago` s earlier. */
export interface StartCurrents {
  /** Primary and magnetizing current, A. */
  readonly primary: number;
  readonly magnetizing: number;
  /** Choke currents; the second of a doubler, else 0. */
  readonly first: number;
  readonly second: number;
  /** Current out of the secondary's dotted end, by what the turns ratio says. */
  readonly winding: number;
}

/**
 * Currents of `point` at `ago` s into the cycle.
 * @derivation the model's straight segments at one instant, carried through the turns ratio
 * @valid steady state
 */
export function startCurrents(point: SolvedPoint, times: PulseTimes, ago: number): StartCurrents {
  const { design, state } = point;
  const { form } = design.stage;
  const n = design.transformer.ratio;
  const first = sample(state.choke, ago);
  const second = form?.doubler === true ? sample(state.choke, ago + 0.5 * times.period) : 0;
  const magnetizing = magnetizingAt(point, times, ago);
  const half = 0.5 * times.period;
  const positive = ago < half;
  const into = positive ? ago : ago - half;
  const driven = into > times.commutation && into < times.pulse;
  const single = form?.doubleEnded !== true;
  // Before the first pulse has turned the current round, a shifted bridge still carries the last one's.
  const after = into >= times.pulse ? positive : !positive;
  const sign = single ? (positive ? 1 : 0) : driven ? (positive ? 1 : -1) : after ? 1 : -1;
  const chokeNow = form?.doubler === true && sign < 0 ? second : first;
  if (driven || (design.phaseShifted && !pauses(state.mode))) {
    return { primary: (sign * chokeNow) / n + magnetizing, magnetizing, first, second, winding: sign * chokeNow };
  }
  // Forward: the primary goes on with the magnetizing current through the clamp diodes. Bridges: the secondary carries it.
  const primary = single ? magnetizing : 0;
  return { primary, magnetizing, first, second, winding: n * (primary - magnetizing) };
}

/**
 * Magnetizing current at `ago` s into the cycle, A.
 * @derivation linear in the volt-seconds: up over the pulse, flat between, or down by the clamp diodes
 * @valid linear core
 */
function magnetizingAt(point: SolvedPoint, times: PulseTimes, ago: number): number {
  const peak = point.state.magnetizingPeak;
  const { pulse, period } = times;
  if (point.design.stage.form?.doubleEnded !== true) {
    if (ago < pulse) return (peak * ago) / pulse;
    return Math.max(0, peak * (2 - ago / pulse));
  }
  const half = 0.5 * period;
  const sign = ago < half ? 1 : -1;
  const into = ago < half ? ago : ago - half;
  return sign * peak * Math.min(1, (2 * into) / pulse - 1);
}
