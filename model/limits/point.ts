/** Limits that depend on the operating point: ripple, load step, heat, saturation, on-time, capacitor current. */
import { createBank } from '../capacitors/index.ts';
import type { Design } from '../design.ts';
import { LOOP_INDUCTANCE } from '../edges.ts';
import type { Evaluator } from '../evaluate.ts';
import { BOARD_MAXIMUM, type HeatBalance, HOT } from '../heat-balance.ts';
import type { Bulk } from '../parts/bulk.ts';
import type { PlannedPoint } from '../plan.ts';
import { bulkRise } from '../point.ts';
import { MODE, type StageState } from '../stages/state.ts';
import { stepExcursionOf } from '../step-response.ts';
import { overshoot } from '../switches/index.ts';
import { judgeMagnetics } from './magnetics.ts';

/** Largest loop gain of heating that is still accepted; at 1 the temperature has no end. */
const RUNAWAY_MAXIMUM = 0.9;

/** Reused from point to point. */
const stepCase = { inputVoltage: 0.5, outputVoltage: 0.5, inductance: 0.5, bank: createBank(), ripple: 0.5 };

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
  const board = solver.heat.boardTemperature;
  judgeRippleAt(e, -1);
  judgeCapacitors(e, -1);
  const { outputBulk, outputBulkCount, inputBulk, inputBulkCount } = design;
  judgeBulkHeat(e, outputBulk, board + bulkRise(outputBulk, outputBulkCount, solver.outputRipple.meanSquare2), -1);
  judgeBulkHeat(e, inputBulk, board + bulkRise(inputBulk, inputBulkCount, solver.inputRipple.meanSquare2), -1);
}

/** Notes the limits of heat at a worst point. */
export function judgeHeat(e: Evaluator, heat: HeatBalance, index: number): void {
  const { book, places } = e;
  judgeTemperature(e, places.highJunction, heat.temperature[HOT.high], heat.allowed[HOT.high], index);
  judgeTemperature(e, places.lowJunction, heat.temperature[HOT.low], heat.allowed[HOT.low], index);
  judgeTemperature(e, places.inductorTemperature, heat.temperature[HOT.inductor], heat.allowed[HOT.inductor], index);
  judgeTemperature(e, places.boardTemperature, heat.boardTemperature, BOARD_MAXIMUM, index);
  book.judge(places.thermalRunaway, heat.runaway, RUNAWAY_MAXIMUM, RUNAWAY_MAXIMUM, index);
  judgeBulkHeat(e, e.design.outputBulk, heat.boardTemperature + heat.outputBulkRise, index);
  judgeBulkHeat(e, e.design.inputBulk, heat.boardTemperature + heat.inputBulkRise, index);
  if (e.design.stage.form === undefined) return;
  const { transformerTemperature } = places;
  judgeTemperature(e, transformerTemperature, heat.temperature[HOT.transformer], heat.allowed[HOT.transformer], index);
}

function judgeBulkHeat(e: Evaluator, bulk: Bulk | undefined, temperature: number, index: number): void {
  if (bulk === undefined) return;
  const allowed = bulk.maximumTemperature - e.rail.derating.temperature;
  judgeTemperature(e, e.places.bulkTemperature, temperature, allowed, index);
}

/** A temperature is missed by a fraction of the rise that was allowed. */
function judgeTemperature(e: Evaluator, place: number, value: number, allowed: number, index: number): void {
  e.book.judge(place, value, allowed, Math.max(1, allowed - e.rail.ambient), index);
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
  book.judge(places.saturation, limited, design.inductor.saturationCurrent, design.inductor.saturationCurrent, index);
  const { high, low, diode } = design;
  const { stage } = design;
  const drawn = stage.form === undefined ? peak : peak / design.transformer.ratio + e.solver.state.magnetizingPeak;
  book.judge(places.switchCurrent, drawn / design.highParallel, high.currentRating, high.currentRating, index);
  if (diode === undefined) {
    const rectified = (stage.form?.doubler === true ? 2 * peak : peak) / design.lowParallel;
    book.judge(places.switchCurrent, rectified, low.currentRating, low.currentRating, index);
  } else {
    book.judge(places.switchCurrent, e.solver.state.lowMean, diode.currentRating, diode.currentRating, index);
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
  book.judge(places.highVoltage, planned.inputVoltage + rise, high.voltageRating, high.voltageRating, index);
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
  if (shortestOnTime > 0) book.judge(places.minimumOnTime, on, shortestOnTime, shortestOnTime, index);
  if (controller.minimumOffTime > 0) {
    const whole = design.stage.form?.doubleEnded === true ? 0.5 * period : period;
    book.judge(places.minimumOffTime, whole - on, controller.minimumOffTime, controller.minimumOffTime, index);
  }
}

function judgeRippleAt(e: Evaluator, index: number): void {
  const { book, places, rail, solver } = e;
  book.judge(places.outputRipple, solver.outputRipple.ripple, rail.output.ripple, rail.output.ripple, index);
  const allowed = rail.input.ripple;
  if (allowed !== undefined) book.judge(places.inputRipple, solver.inputRipple.ripple, allowed, allowed, index);
}

function judgeCapacitors(e: Evaluator, index: number): void {
  const { book, places, design, solver } = e;
  const output = solver.outputRipple;
  const input = solver.inputRipple;
  const { outputCeramic, inputCeramic } = design;
  const out = Math.sqrt(output.meanSquare1) / design.outputCeramicCount;
  book.judge(places.outputCeramicCurrent, out, outputCeramic.rippleRating, outputCeramic.rippleRating, index);
  const into = Math.sqrt(input.meanSquare1) / design.inputCeramicCount;
  book.judge(places.inputCeramicCurrent, into, inputCeramic.rippleRating, inputCeramic.rippleRating, index);
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
  e.book.judge(place, Math.sqrt(each), allowed, allowed, index);
}

function judgeStep(e: Evaluator, planned: PlannedPoint, index: number): void {
  const { rail, book, places, design, worst } = e;
  if (rail.step === undefined) return;
  stepCase.inputVoltage = planned.inputVoltage;
  stepCase.outputVoltage = planned.outputVoltage;
  stepCase.inductance = 2 * design.inductance - worst.inductance;
  stepCase.bank = worst.output;
  stepCase.ripple = e.solver.outputRipple.ripple;
  const excursion = stepExcursionOf(design, rail, stepCase);
  book.judge(places.loadStep, excursion, rail.step.deviation, rail.step.deviation, index);
}
