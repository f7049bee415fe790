/** The buck stage, interleaved, with a switch or a diode in the low position. */
import type { Design } from '../design.ts';
import { addEdgeLosses } from '../edges.ts';
import { applyForward, applyReverse, ChokeSteadyState, settleGaps, solveChoke } from '../modes.ts';
import type { Rail } from '../rail/rail.ts';
import { addSegment, clearWaveform } from '../waveform/index.ts';
import { solveBentChoke } from './choke.ts';
import type { Stage } from './contract.ts';
import { MODE, pauses, type StageState } from './state.ts';

const steady = new ChokeSteadyState();

/** What makes the drops: in a record, so that no double crosses a call. */
class Flow {
  /** A. */
  current = 0.5;
  /** Drop of the diode itself, V. */
  drop = 0.5;
}

const flow = new Flow();

/** What both rectifiers share. */
const BUCK = {
  control: 'buck',
  highDevices: 1,
  lowDevices: 1,
  chokes: 1,
  chokeMultiple: 1,
  highestDuty: 1,
  idealDuty: buckDuty,
  lowBlocking: buckBlocking,
  solve: solveBuck,
  addEdgeLosses,
} as const;

export const buckSynchronous: Stage<'buck-synchronous'> = {
  ...BUCK,
  architecture: 'buck-synchronous',
  words: 'synchronous buck',
  twoWay: true,
  diode: false,
  packagedLegs: true,
  refusal: stepsDown,
};

export const buckDiode: Stage<'buck-diode'> = {
  ...BUCK,
  architecture: 'buck-diode',
  words: 'diode buck',
  twoWay: false,
  diode: true,
  packagedLegs: false,
  refusal: (rail) => {
    if (rail.profile.some((point) => point.fraction < 0)) return 'a diode carries no current back from output to input';
    if (rail.output.battery && rail.input.takesPower) return "a diode cannot return the battery's energy to the input";
    return stepsDown(rail);
  },
};

/**
 * Ideal duty of a buck: Vo = D·Vi. `inputVoltage` V, `outputVoltage` V.
 * @source slva057, section 2.1
 * @valid continuous operation, no drops, 0 < Vo ≤ Vi
 * @example buckDuty(12, 3.3) = 0.275
 */
export function buckDuty(inputVoltage: number, outputVoltage: number): number {
  return outputVoltage / inputVoltage;
}

/**
 * Volts that the low device of a buck blocks: the whole input, for the node stands there while the high switch conducts. V.
 * @derivation Kirchhoff, no drop in the high switch
 * @valid no ringing: a limit adds that
 * @example buckBlocking(48) = 48
 */
export function buckBlocking(inputVoltage: number): number {
  return inputVoltage;
}

function stepsDown(rail: Rail): string | undefined {
  if (rail.output.maximum < rail.input.minimum) return undefined;
  return `the highest output, ${rail.output.maximum} V, is not below the lowest input, ${rail.input.minimum} V`;
}

/**
 * Solves one operating point of a buck; see `Stage.solve`.
 * @source slva057, sections 2.1 and 2.2, with drops; in reverse the same choke run as a boost from the output
 * @valid steady state; straight segments
 */
function solveBuck(design: Design, state: StageState): void {
  const current = state.loadCurrent / state.activePhases;
  state.meanCurrent = current;
  steady.frequency = design.frequency;
  steady.current = Math.abs(current);
  if (current >= 0) solveForward(design, state);
  else solveReverse(design, state);
  state.effectiveInductance = steady.inductance;
  writeCurrents(state);
}

/**
 * Duty, ripple and mode while power runs from input to output.
 * @source slva057, section 2.1: Vo = D·(Vi − drops) − (1 − D)·drops
 * @valid load current ≥ 0; drops small beside the voltages
 */
function solveForward(design: Design, state: StageState): void {
  const { current } = steady;
  steady.blocking = design.stage.diode || design.emulates;
  steady.shortestRise = design.shortestOnTime;
  flow.current = current;
  flow.drop = 0;
  if (design.stage.diode) flow.drop = design.diodeDrop(state.lowTemperature);
  forwardVoltages(state);
  gaps(design);
  steady.gapFall *= design.low.bodyDrop - current * state.lowResistance;
  steady.gapRise *= design.high.bodyDrop;
  solveBentChoke(design, state, steady);
  // With gaps the drops follow the current that flows while it flows: the geometric mean of load and boundary current,
  // which is half the peak of an ideal discontinuous triangle and equals the load at the boundary itself.
  if (steady.mode !== MODE.continuous && steady.mode !== MODE.forced) {
    flow.current = 0.5 * steady.ripple;
    forwardVoltages(state);
    settleGaps(steady);
    solveChoke(steady);
  }
  applyForward(steady, state);
}

/**
 * Volts across the choke in both intervals.
 * @source slva057, section 2.1: Vi − Vds − Io·RL − Vo and Vo + Vd + Io·RL
 * @valid drops taken at one current for the whole interval
 */
function forwardVoltages(state: StageState): void {
  const { current, drop } = flow;
  steady.rise = state.inputVoltage - state.outputVoltage - current * (state.highResistance + state.pathResistance);
  steady.fall = state.outputVoltage + drop + current * (state.lowResistance + state.pathResistance);
  keepDriving(state);
}

/**
 * Gaps before both edges, V for each volt that the body diode which the current's sign chooses drops more than its switch.
 * @derivation a body diode takes its drop over the switch for the share gap·f of the period
 * @valid gap short beside both intervals
 */
function gaps(design: Design): void {
  steady.gapFall = design.gap * design.frequency;
  steady.gapRise = steady.gapFall;
  steady.gapCurrent = design.gapCurrent;
  steady.waitCurrent = design.gapCurrent;
  steady.gapTurn = 0;
}

/** Where drops eat the whole drive no duty serves: a duty of one and the limits it breaks tell, not a negative voltage. */
function keepDriving(state: StageState): void {
  const least = 1e-6 * state.inputVoltage;
  if (!(steady.rise > least)) steady.rise = least;
}

/**
 * Duty, ripple and mode while power runs from output to input.
 * @source slva057, section 2.1, with source and output exchanged: the output drives, the input takes
 * @valid load current < 0; a switch in the low position
 */
function solveReverse(design: Design, state: StageState): void {
  const { current } = steady;
  steady.blocking = design.emulates;
  steady.shortestRise = design.shortestOnTime;
  steady.rise = state.outputVoltage - current * (state.lowResistance + state.pathResistance);
  steady.fall = state.inputVoltage - state.outputVoltage + current * (state.highResistance + state.pathResistance);
  keepDriving(state);
  gaps(design);
  steady.gapFall *= design.high.bodyDrop - current * state.highResistance;
  steady.gapRise *= design.low.bodyDrop;
  solveBentChoke(design, state, steady);
  applyReverse(steady, state);
}

/**
 * Writes the choke's and the input's waveform of one phase and the moments that losses need.
 * @source slus660h, pages 44 and 45: √D·(Io² + ΔI²/12) and its twin, as moments of straight segments
 * @valid straight segments
 */
function writeCurrents(state: StageState): void {
  state.highDevices = 1;
  state.lowDevices = 1;
  state.chokes = 1;
  state.drawCopies = state.activePhases;
  state.primaryMeanSquare = 0;
  state.secondaryMeanSquare = 0;
  state.fluxSwing = 0;
  state.lostDuty = 0;
  const { valleyCurrent: a, peakCurrent: b, highShare, lowShare } = state;
  const square = (a * a + a * b + b * b) / 3;
  state.highMeanSquare = highShare * square;
  state.lowMeanSquare = lowShare * square;
  state.chokeMeanSquare = state.highMeanSquare + state.lowMeanSquare;
  state.highMean = 0.5 * highShare * (a + b);
  state.lowMean = 0.5 * lowShare * (a + b);
  const period = state.frequency > 0 ? 1 / state.frequency : 1;
  const idle = pauses(state.mode) ? (1 - highShare - lowShare) * period : 0;
  clearWaveform(state.choke);
  // The pause lies where the current rests at zero: after the low interval going forward, after the high one in reverse.
  addSegment(state.choke, highShare * period, a, b);
  if (idle > 0 && a < 0) addSegment(state.choke, idle, 0, 0);
  addSegment(state.choke, lowShare * period, b, a);
  if (idle > 0 && a >= 0) addSegment(state.choke, idle, 0, 0);
  clearWaveform(state.draw);
  addSegment(state.draw, highShare * period, a, b);
  addSegment(state.draw, period - highShare * period, 0, 0);
}
