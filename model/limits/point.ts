/** Limits that depend on the operating point: ripple, load step, heat, saturation, on-time, capacitor current. */
import type { Design } from '../design.ts';
import { LOOP_INDUCTANCE } from '../edges.ts';
import type { Evaluator } from '../evaluate.ts';
import { BOARD_MAXIMUM, type HeatBalance, HOT } from '../heat-balance.ts';
import type { Bulk } from '../parts/bulk.ts';
import type { PlannedPoint } from '../plan.ts';
import { findBulkRises } from '../point-heat.ts';
import { MODE, type StageState } from '../stages/state.ts';
import { findStepExcursion } from '../step-response.ts';
import { overshoot } from '../switches/index.ts';
import { judgeMagnetics } from './magnetics.ts';

/** Largest loop gain of heating that is still accepted; at 1 the temperature has no end. */
const RUNAWAY_MAXIMUM = 0.9;

/**
 * Value, allowed and scale of the judgement at hand: in an array, so that no double crosses a call (one that does is boxed, a
 * hundred times a design).
 */
const asked = new Float64Array(3);
const peak = new Float64Array(1);

/** Notes every limit but those of heat at the worst point that the solver holds; `index` names it in the report. */
export function judgePoint(e: Evaluator, planned: PlannedPoint, index: number): void {
  judgeCurrents(e, index);
  judgeOvershoot(e, planned, index);
  judgeTimes(e, index);
  judgeRippleAt(e, index);
  judgeCapacitors(e, index);
  judgeMagnetics(e, index);
  if (planned.load === 1) judgeStep(e, planned, index);
}

/** Notes ripple and capacitor limits of a line between the corners. */
export function judgeRipple(e: Evaluator): void {
  judgeRippleAt(e, -1);
  judgeCapacitors(e, -1);
  findBulkRises(e.solver, e.design);
  judgeBulkHeat(e, e.solver.heat, -1);
}

/** Notes the limits of heat at a worst point. */
export function judgeHeat(e: Evaluator, heat: HeatBalance, index: number): void {
  const { book, places } = e;
  judgeHot(e, places.highJunction, heat, HOT.high, index);
  judgeHot(e, places.lowJunction, heat, HOT.low, index);
  judgeHot(e, places.inductorTemperature, heat, HOT.inductor, index);
  if (e.design.stage.form !== undefined) judgeHot(e, places.transformerTemperature, heat, HOT.transformer, index);
  asked[0] = heat.boardTemperature;
  asked[1] = BOARD_MAXIMUM;
  judgeTemperature(e, places.boardTemperature, index);
  asked[0] = heat.runaway;
  asked[1] = RUNAWAY_MAXIMUM;
  asked[2] = RUNAWAY_MAXIMUM;
  book.judgeAt(places.thermalRunaway, asked, index);
  judgeBulkHeat(e, heat, index);
}

function judgeHot(e: Evaluator, place: number, heat: HeatBalance, part: number, index: number): void {
  asked[0] = heat.temperature[part];
  asked[1] = heat.allowed[part];
  judgeTemperature(e, place, index);
}

/** The asked temperature is missed by a fraction of the rise that was allowed. */
function judgeTemperature(e: Evaluator, place: number, index: number): void {
  asked[2] = Math.max(1, asked[1] - e.rail.ambient);
  e.book.judgeAt(place, asked, index);
}

function judgeBulkHeat(e: Evaluator, heat: HeatBalance, index: number): void {
  const { places, rail } = e;
  const { outputBulk, inputBulk } = e.design;
  const spare = rail.derating.temperature;
  if (outputBulk !== undefined) {
    asked[0] = heat.boardTemperature + heat.outputBulkRise;
    asked[1] = outputBulk.maximumTemperature - spare;
    judgeTemperature(e, places.bulkTemperature, index);
  }
  if (inputBulk !== undefined) {
    asked[0] = heat.boardTemperature + heat.inputBulkRise;
    asked[1] = inputBulk.maximumTemperature - spare;
    judgeTemperature(e, places.bulkTemperature, index);
  }
}

/** The asked value is missed by a fraction of what is allowed. */
function judgeAsked(e: Evaluator, place: number, index: number): void {
  asked[2] = asked[1];
  e.book.judgeAt(place, asked, index);
}

/**
 * Writes the peak of one phase with unequal sharing, A, signless, to `peak[0]`.
 * @source qiu-2004 (phases alike by design only); jitter Vi·δt/L
 * @valid sharing error of the controller's row
 */
function findPhasePeak(state: StageState, design: Design): void {
  const sharing = design.phases > 1 ? Math.abs(state.meanCurrent) * design.controller.sharingError : 0;
  const jitter = (state.inputVoltage * design.controller.jitter) / state.effectiveInductance;
  peak[0] = Math.max(Math.abs(state.peakCurrent), Math.abs(state.valleyCurrent)) + sharing + jitter;
}

/**
 * Saturation at the current limit, and the current ratings.
 * @derivation current limit's spread over the peak; dice alike share
 * @valid dice share current alike
 */
function judgeCurrents(e: Evaluator, index: number): void {
  const { design, places } = e;
  const { state } = e.solver;
  const { high, low, diode, stage } = design;
  findPhasePeak(state, design);
  asked[0] = peak[0] * design.controller.currentLimitSpread;
  asked[1] = design.inductor.saturationCurrent;
  judgeAsked(e, places.saturation, index);
  const drawn = stage.form === undefined ? peak[0] : peak[0] / design.transformer.ratio + state.magnetizingPeak;
  asked[0] = drawn / design.highParallel;
  asked[1] = high.currentRating;
  judgeAsked(e, places.switchCurrent, index);
  if (diode === undefined) {
    asked[0] = (stage.form?.doubler === true ? 2 * peak[0] : peak[0]) / design.lowParallel;
    asked[1] = low.currentRating;
  } else {
    asked[0] = state.lowMean;
    asked[1] = diode.currentRating;
  }
  judgeAsked(e, places.switchCurrent, index);
}

/**
 * The high switch's voltage with the ringing of its loop against the whole rating. A step of current I rings to I·√(L/C); an
 * edge of length t cannot ring beyond 2·L·I/t, twice its inductive drop: the smaller holds.
 * @derivation step response of L and C, bounded by twice the inductive drop of the edge
 * @valid loop inductance of a tight layout
 */
function judgeOvershoot(e: Evaluator, planned: PlannedPoint, index: number): void {
  const { design, places } = e;
  const { state } = e.solver;
  if (design.stage.form !== undefined || !(state.peakCurrent > 0)) return;
  const { high, highParallel, highEdges } = design;
  const capacitance = (highParallel * high.outputCharge) / high.outputTestVoltage;
  const time = highEdges.offTime + highEdges.offSlope * state.peakCurrent;
  const ramp = (2 * LOOP_INDUCTANCE * state.peakCurrent) / time;
  asked[0] = planned.inputVoltage + Math.min(overshoot(state.peakCurrent, LOOP_INDUCTANCE, capacitance), ramp);
  asked[1] = high.voltageRating;
  judgeAsked(e, places.highVoltage, index);
}

/**
 * On-time and off-time at the fast end of the oscillator.
 * @source ltc3728, page 28: Vo/(Vi·f) against the controller's shortest
 * @valid the oscillator's fast end
 */
function judgeTimes(e: Evaluator, index: number): void {
  const { design, places, rail } = e;
  const { controller } = design;
  const period = 1 / (design.frequency * (1 + rail.tolerances.oscillator));
  const { state } = e.solver;
  // While pulses are skipped the controller itself holds the shortest on-time.
  const skipping = state.mode === MODE.skipping || state.mode === MODE.off;
  const on = skipping ? design.shortestOnTime : (state.dutyCycle * period) / design.stage.chokeMultiple;
  if (design.shortestOnTime > 0) {
    asked[0] = on;
    asked[1] = design.shortestOnTime;
    judgeAsked(e, places.minimumOnTime, index);
  }
  if (controller.minimumOffTime > 0) {
    asked[0] = (design.stage.form?.doubleEnded === true ? 0.5 * period : period) - on;
    asked[1] = controller.minimumOffTime;
    judgeAsked(e, places.minimumOffTime, index);
  }
}

function judgeRippleAt(e: Evaluator, index: number): void {
  const { places, rail, solver } = e;
  asked[0] = solver.outputRipple.ripple;
  asked[1] = rail.output.ripple;
  judgeAsked(e, places.outputRipple, index);
  const allowed = rail.input.ripple;
  if (allowed === undefined) return;
  asked[0] = solver.inputRipple.ripple;
  asked[1] = allowed;
  judgeAsked(e, places.inputRipple, index);
}

/**
 * Ripple current of each piece against its rating.
 * @derivation pieces alike share the group's rms current
 * @valid pieces alike
 */
function judgeCapacitors(e: Evaluator, index: number): void {
  const { places, design, solver } = e;
  const { outputRipple, inputRipple } = solver;
  asked[0] = Math.sqrt(outputRipple.meanSquare1) / design.outputCeramicCount;
  asked[1] = design.outputCeramic.rippleRating;
  judgeAsked(e, places.outputCeramicCurrent, index);
  asked[0] = Math.sqrt(inputRipple.meanSquare1) / design.inputCeramicCount;
  asked[1] = design.inputCeramic.rippleRating;
  judgeAsked(e, places.inputCeramicCurrent, index);
  if (design.outputBulk !== undefined) {
    asked[0] = Math.sqrt(outputRipple.meanSquare2) / design.outputBulkCount;
    judgeBulk(e, places.outputBulkCurrent, design.outputBulk, index);
  }
  if (design.inputBulk !== undefined) {
    asked[0] = Math.sqrt(inputRipple.meanSquare2) / design.inputBulkCount;
    judgeBulk(e, places.inputBulkCurrent, design.inputBulk, index);
  }
}

/** The asked current against the derated rating. */
function judgeBulk(e: Evaluator, place: number, bulk: Bulk, index: number): void {
  asked[1] = bulk.rippleRating * e.rail.derating.rippleCurrent;
  judgeAsked(e, place, index);
}

function judgeStep(e: Evaluator, planned: PlannedPoint, index: number): void {
  const { rail, places, design, worst, step } = e;
  if (rail.step === undefined) return;
  step.inputVoltage = planned.inputVoltage;
  step.outputVoltage = planned.outputVoltage;
  step.inductance = 2 * design.inductance - worst.inductance;
  step.bank = worst.output;
  step.ripple = e.solver.outputRipple.ripple;
  findStepExcursion(design, rail.step, step);
  asked[0] = step.excursion;
  asked[1] = rail.step.deviation;
  judgeAsked(e, places.loadStep, index);
}
