/** Limits that depend on the operating point: ripple, load step, heat, saturation, on-time, capacitor current. */
import type { Design } from '../design.ts';
import { LOOP_INDUCTANCE } from '../edges.ts';
import type { Evaluator } from '../evaluate.ts';
import { BOARD_MAXIMUM, type HeatBalance, HOT } from '../heat-balance.ts';
import type { Bulk } from '../parts/bulk.ts';
import type { PlannedPoint } from '../plan.ts';
import { bulkRise } from '../point-heat.ts';
import { MODE, type StageState } from '../stages/state.ts';
import { findStepExcursion } from '../step-response.ts';
import { overshoot } from '../switches/index.ts';
import { judgeMagnetics } from './magnetics.ts';

/** Largest loop gain of heating that is still accepted; at 1 the temperature has no end. */
const RUNAWAY_MAXIMUM = 0.9;

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
  const { design, solver } = e;
  const { heat, outputRipple, inputRipple } = solver;
  judgeRippleAt(e, -1);
  judgeCapacitors(e, -1);
  heat.outputBulkRise = bulkRise(design.outputBulk, design.outputBulkCount, outputRipple.meanSquare2);
  heat.inputBulkRise = bulkRise(design.inputBulk, design.inputBulkCount, inputRipple.meanSquare2);
  judgeBulkHeat(e, heat, -1);
}

/** Notes the limits of heat at a worst point. */
export function judgeHeat(e: Evaluator, heat: HeatBalance, index: number): void {
  const { book, places, rail } = e;
  judgeHot(e, places.highJunction, heat, HOT.high, index);
  judgeHot(e, places.lowJunction, heat, HOT.low, index);
  judgeHot(e, places.inductorTemperature, heat, HOT.inductor, index);
  if (e.design.stage.form !== undefined) judgeHot(e, places.transformerTemperature, heat, HOT.transformer, index);
  const rise = Math.max(1, BOARD_MAXIMUM - rail.ambient);
  book.judgeBy(places.boardTemperature, heat.boardTemperature, BOARD_MAXIMUM, rise, index);
  book.judge(places.thermalRunaway, heat.runaway, RUNAWAY_MAXIMUM, index);
  judgeBulkHeat(e, heat, index);
}

/** A temperature is missed by a fraction of the rise that was allowed. */
function judgeHot(e: Evaluator, place: number, heat: HeatBalance, part: number, index: number): void {
  const allowed = heat.allowed[part];
  e.book.judgeBy(place, heat.temperature[part], allowed, Math.max(1, allowed - e.rail.ambient), index);
}

function judgeBulkHeat(e: Evaluator, heat: HeatBalance, index: number): void {
  const { book, places, rail } = e;
  const { outputBulk, inputBulk } = e.design;
  const spare = rail.derating.temperature;
  if (outputBulk !== undefined) {
    const allowed = outputBulk.maximumTemperature - spare;
    const temperature = heat.boardTemperature + heat.outputBulkRise;
    book.judgeBy(places.bulkTemperature, temperature, allowed, Math.max(1, allowed - rail.ambient), index);
  }
  if (inputBulk !== undefined) {
    const allowed = inputBulk.maximumTemperature - spare;
    const temperature = heat.boardTemperature + heat.inputBulkRise;
    book.judgeBy(places.bulkTemperature, temperature, allowed, Math.max(1, allowed - rail.ambient), index);
  }
}

/** Peak of one phase with unequal sharing, A, signless. */
function phasePeak(state: StageState, design: Design): number {
  const sharing = design.phases > 1 ? Math.abs(state.meanCurrent) * design.controller.sharingError : 0;
  const jitter = (state.inputVoltage * design.controller.jitter) / state.effectiveInductance;
  return Math.max(Math.abs(state.peakCurrent), Math.abs(state.valleyCurrent)) + sharing + jitter;
}

function judgeCurrents(e: Evaluator, index: number): void {
  const { design, book, places } = e;
  const peak = phasePeak(e.solver.state, design);
  const limited = peak * design.controller.currentLimitSpread;
  book.judge(places.saturation, limited, design.inductor.saturationCurrent, index);
  const { high, low, diode } = design;
  const { stage } = design;
  const drawn = stage.form === undefined ? peak : peak / design.transformer.ratio + e.solver.state.magnetizingPeak;
  book.judge(places.switchCurrent, drawn / design.highParallel, high.currentRating, index);
  if (diode === undefined) {
    const rectified = (stage.form?.doubler === true ? 2 * peak : peak) / design.lowParallel;
    book.judge(places.switchCurrent, rectified, low.currentRating, index);
  } else {
    book.judge(places.switchCurrent, e.solver.state.lowMean, diode.currentRating, index);
  }
}

/**
 * The high switch's voltage with the ringing of its loop against the whole rating. A step of current I rings to I·√(L/C); an
 * edge of length t cannot ring beyond 2·L·I/t, twice its inductive drop: the smaller holds.
 */
function judgeOvershoot(e: Evaluator, planned: PlannedPoint, index: number): void {
  const { design, book, places } = e;
  const { state } = e.solver;
  if (design.stage.form !== undefined || !(state.peakCurrent > 0)) return;
  const { high, highParallel, highEdges } = design;
  const capacitance = (highParallel * high.outputCharge) / high.outputTestVoltage;
  const time = highEdges.offTime + highEdges.offSlope * state.peakCurrent;
  const ramp = (2 * LOOP_INDUCTANCE * state.peakCurrent) / time;
  const rise = Math.min(overshoot(state.peakCurrent, LOOP_INDUCTANCE, capacitance), ramp);
  book.judge(places.highVoltage, planned.inputVoltage + rise, high.voltageRating, index);
}

function judgeTimes(e: Evaluator, index: number): void {
  const { design, book, places, rail } = e;
  const { controller } = design;
  const period = 1 / (design.frequency * (1 + rail.tolerances.oscillator));
  const { state } = e.solver;
  // While pulses are skipped the controller itself holds the shortest on-time.
  const skipping = state.mode === MODE.skipping || state.mode === MODE.off;
  const on = skipping ? design.shortestOnTime : (state.dutyCycle * period) / design.stage.chokeMultiple;
  const { shortestOnTime } = design;
  if (shortestOnTime > 0) book.judge(places.minimumOnTime, on, shortestOnTime, index);
  if (controller.minimumOffTime > 0) {
    const whole = design.stage.form?.doubleEnded === true ? 0.5 * period : period;
    book.judge(places.minimumOffTime, whole - on, controller.minimumOffTime, index);
  }
}

function judgeRippleAt(e: Evaluator, index: number): void {
  const { book, places, rail, solver } = e;
  book.judge(places.outputRipple, solver.outputRipple.ripple, rail.output.ripple, index);
  const allowed = rail.input.ripple;
  if (allowed !== undefined) book.judge(places.inputRipple, solver.inputRipple.ripple, allowed, index);
}

function judgeCapacitors(e: Evaluator, index: number): void {
  const { book, places, design, solver } = e;
  const output = solver.outputRipple;
  const input = solver.inputRipple;
  const { outputCeramic, inputCeramic } = design;
  const out = Math.sqrt(output.meanSquare1) / design.outputCeramicCount;
  book.judge(places.outputCeramicCurrent, out, outputCeramic.rippleRating, index);
  const into = Math.sqrt(input.meanSquare1) / design.inputCeramicCount;
  book.judge(places.inputCeramicCurrent, into, inputCeramic.rippleRating, index);
  judgeBulk(e, places.outputBulkCurrent, design.outputBulk, design.outputBulkCount, output.meanSquare2, index);
  judgeBulk(e, places.inputBulkCurrent, design.inputBulk, design.inputBulkCount, input.meanSquare2, index);
}

function judgeBulk(
  e: Evaluator,
  place: number,
  bulk: Bulk | undefined,
  count: number,
  square: number,
  index: number,
): void {
  if (bulk === undefined) return;
  const each = square / (count * count);
  const allowed = bulk.rippleRating * e.rail.derating.rippleCurrent;
  e.book.judge(place, Math.sqrt(each), allowed, index);
}

function judgeStep(e: Evaluator, planned: PlannedPoint, index: number): void {
  const { rail, book, places, design, worst, step } = e;
  if (rail.step === undefined) return;
  step.inputVoltage = planned.inputVoltage;
  step.outputVoltage = planned.outputVoltage;
  step.inductance = 2 * design.inductance - worst.inductance;
  step.bank = worst.output;
  step.ripple = e.solver.outputRipple.ripple;
  findStepExcursion(design, rail.step, step);
  book.judge(places.loadStep, step.excursion, rail.step.deviation, index);
}
