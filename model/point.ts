/**
 * One operating point of one design, solved: waveforms, losses, temperatures, ripple. The one place where the physics of
 * all parts comes together; the search's fast path and the full assessment both go through here.
 */
import { powAt } from '../optimizer/maths/index.ts';
import { type BankRipple, bankCurrents, bankRipple, createBankRipple } from './capacitors/index.ts';
import type { Design } from './design.ts';
import type { Flavour } from './flavour.ts';
import { BOARD_MAXIMUM, type HeatBalance, HOT, solveHeat } from './heat-balance.ts';
import { LOSS_SLOTS, SLOT, sumSlots } from './ledger.ts';
import {
  COPPER_TEMPCO,
  coreTemperatureFactor,
  RIPPLE_HARMONICS,
  stockedCoreLossAt,
  triangleLoss,
  windingResistance,
} from './magnetics/index.ts';
import type { Bulk } from './parts/bulk.ts';
import type { Inductor } from './parts/inductor.ts';
import type { PlannedPoint } from './plan.ts';
import type { Rail } from './rail/rail.ts';
import { StageState } from './stages/state.ts';
import { diodeLeakageLoss, onResistance, RESISTANCE_REFERENCE } from './switches/index.ts';
import { createWaveform, sumShifted, sumUnequal } from './waveform/index.ts';

/**
 * Rounds of temperature → resistance → duty → loss → temperature. The heat balance is exact in each, so all that a round
 * mends is the duty by which resistances of another temperature differ: one more is enough, and where a point starts from the
 * temperatures of the point before, none. A diode's leakage doubles every few kelvin: it always takes one more.
 */
const COLD_ROUNDS = 2;
const WARM_ROUNDS = 1;
/** Rise over ambient from which the first round starts, K. */
const FIRST_RISE = 30;
/** Temperature beyond which resistances are not followed, K: such a design has failed its limits long before. */
const HOTTEST = 523.15;
/** The same for the leakage of a diode, which grows without bound, K. */
const HOTTEST_DIODE = 448.15;
/** Resistance of the board copper in one phase's path at 20 °C, Ω: one square of 70 µm copper, 1.7241e-8 Ω·m / 70 µm. */
const BOARD_SQUARE = 2.463e-4;
/** Temperature coefficient of copper taken at 25 °C, where inductor rows state their resistance, 1/K. */
const WINDING_TEMPCO = COPPER_TEMPCO / (1 + 5 * COPPER_TEMPCO);
/** Efficiency of the auxiliary supply behind drivers that do not burn the input's rest (common practice, no source). */
const AUXILIARY_EFFICIENCY = 0.85;
/** Load under which a blocking stage is solved as if it carried this share of full load: its pulses still come. */
const LEAST_LOAD = 1e-6;

const watts = new Float64Array(2);
const scratch = new Float64Array(2);

/** Everything one operating point yields. Reused from point to point. */
export class PointSolver {
  readonly rail: Rail;
  readonly state = new StageState();
  /** Where the heat of the point at hand is balanced. */
  heat: HeatBalance;
  readonly ledger = new Float64Array(LOSS_SLOTS.length);
  /** Summed choke current and summed draw from the input. */
  readonly summed = createWaveform(64);
  readonly drawn = createWaveform(64);
  readonly outputRipple: BankRipple = createBankRipple();
  readonly inputRipple: BankRipple = createBankRipple();
  /** Whether a point starts from the temperatures of the point before; the first of a design must not. */
  warm = false;
  /** Whether ripple voltages are wanted, beside the currents that heat the capacitors. */
  wantsRipple = true;
  /** W, ac loss of all chokes' windings at the reference temperature of rows. */
  chokeAc = 0.5;
  /** W, all losses. */
  loss = 0.5;
  /** W, delivered to the load; negative in reverse flow. */
  outputPower = 0.5;

  constructor(rail: Rail, heat: HeatBalance) {
    this.rail = rail;
    this.heat = heat;
  }
}

/**
 * Solves `planned` for `design` under `flavour` with `phases` active phases; `boardConductance` is that of board and sink
 * to ambient, W/K. Results stand in `solver`.
 */
export function solvePoint(
  solver: PointSolver,
  design: Design,
  flavour: Flavour,
  planned: PlannedPoint,
  phases: number,
  boardConductance: number,
): void {
  const { state, heat, rail } = solver;
  ask(solver, design, flavour, planned, phases);
  heat.ambient = rail.ambient;
  heat.conductance = boardConductance;
  heatPaths(solver, design);
  const rounds = solver.warm && design.diode === undefined ? WARM_ROUNDS : COLD_ROUNDS;
  for (let round = 0; round < rounds; round++) {
    resistances(state, design);
    design.stage.solve(design, state);
    solver.ledger.fill(0);
    design.stage.addEdgeLosses(design, state, solver.ledger);
    addInductorLosses(solver, design);
    if (design.stage.form !== undefined) addTransformerCore(design, state, solver.ledger);
    addController(solver, design);
    if (round === rounds - 1) addCapacitors(solver, design, flavour);
    if (design.filterChoke !== undefined) addFilterChoke(solver, design.filterChoke);
    balance(solver, design);
  }
  solver.warm = true;
  solver.outputPower = planned.outputVoltage * planned.load * rail.output.current;
  settleLosses(solver, design);
}

/** Balances `heat` anew at another `conductance` to ambient, W/K, with the losses that it holds. */
export function settleHeat(heat: HeatBalance, conductance: number): void {
  heat.conductance = conductance;
  solveHeat(heat);
}

/** Writes the losses that follow from the temperatures of the point's heat, and their sum. */
export function settleLosses(solver: PointSolver, design: Design): void {
  writeResistiveLosses(solver, design);
  solver.loss = sumSlots(solver.ledger, 0, solver.ledger.length);
}

/** Summed ripple and capacitor stress alone, at a line in between: no heat. The last temperatures stay in force. */
export function solveRipple(
  solver: PointSolver,
  design: Design,
  flavour: Flavour,
  inputVoltage: number,
  outputVoltage: number,
): void {
  const { state } = solver;
  state.inputVoltage = inputVoltage;
  state.outputVoltage = outputVoltage;
  state.loadCurrent = solver.rail.output.current;
  state.activePhases = design.phases;
  design.stage.solve(design, state);
  sumOutput(solver, flavour);
  bankRipple(flavour.output, solver.summed, solver.outputRipple);
  sumShifted(state.draw, state.drawCopies, solver.drawn);
  bankRipple(flavour.input, solver.drawn, solver.inputRipple);
  resonate(solver, flavour);
}

function ask(solver: PointSolver, design: Design, flavour: Flavour, planned: PlannedPoint, phases: number): void {
  const { state, rail } = solver;
  const full = rail.output.current;
  const blocking = design.stage.diode || design.emulates;
  state.inputVoltage = planned.inputVoltage;
  state.outputVoltage = planned.outputVoltage;
  state.loadCurrent = planned.load * full;
  if (blocking && Math.abs(planned.load) < LEAST_LOAD) state.loadCurrent = LEAST_LOAD * full;
  state.activePhases = phases;
  state.inductance = flavour.inductance;
  state.resistanceScale = flavour.resistanceScale;
  if (solver.warm) return;
  const guess = rail.ambient + FIRST_RISE;
  state.highTemperature = guess;
  state.lowTemperature = guess;
  state.inductorTemperature = guess;
  state.transformerTemperature = guess;
  state.boardTemperature = guess;
}

function heatPaths(solver: PointSolver, design: Design): void {
  const { heat, state, rail } = solver;
  const spare = rail.derating.temperature;
  const phases = state.activePhases;
  const { stage, transformer } = design;
  heat.resistance[HOT.high] = design.high.thermalResistance / (phases * stage.highDevices * design.highParallel);
  heat.allowed[HOT.high] = design.high.maximumJunction - spare;
  if (design.diode !== undefined) {
    heat.resistance[HOT.low] = design.diode.thermalResistance / phases;
    heat.allowed[HOT.low] = design.diode.maximumJunction - spare;
  } else {
    heat.resistance[HOT.low] = design.low.thermalResistance / (phases * stage.lowDevices * design.lowParallel);
    heat.allowed[HOT.low] = design.low.maximumJunction - spare;
  }
  heat.resistance[HOT.inductor] = design.inductorThermalResistance / (phases * stage.chokes);
  heat.toAir[HOT.inductor] = design.chokeMaterial === undefined ? 0 : 1;
  heat.faces[HOT.inductor] = phases * stage.chokes * design.inductorFaces;
  heat.toAir[HOT.transformer] = 1;
  heat.resistance[HOT.transformer] = stage.form === undefined ? 0 : transformer.surfaceResistance / phases;
  heat.allowed[HOT.transformer] = transformer.maximumTemperature - spare;
  heat.allowed[HOT.inductor] = design.inductor.maximumTemperature - spare;
}

function resistances(state: StageState, design: Design): void {
  const { high, low, diode, inductor } = design;
  state.highResistance =
    state.resistanceScale *
    onResistance(
      high.onResistance,
      high.resistanceTempco,
      high.dynamicFactor,
      state.highTemperature,
      design.highParallel,
    );
  state.lowResistance =
    diode === undefined
      ? state.resistanceScale *
        onResistance(
          low.onResistance,
          low.resistanceTempco,
          low.dynamicFactor,
          state.lowTemperature,
          design.lowParallel,
        )
      : diode.slopeResistance;
  state.pathResistance =
    inductor.dcResistance * (1 + WINDING_TEMPCO * (state.inductorTemperature - RESISTANCE_REFERENCE)) +
    BOARD_SQUARE * (1 + COPPER_TEMPCO * (state.boardTemperature - 293.15));
  if (design.stage.form === undefined) return;
  const { transformer } = design;
  const hot = 1 + WINDING_TEMPCO * (state.transformerTemperature - RESISTANCE_REFERENCE);
  state.primaryResistance = transformer.primaryResistance * transformer.primaryFactor * hot;
  state.secondaryResistance = transformer.secondaryResistance * transformer.secondaryFactor * hot;
}

/**
 * Ac winding loss, at the reference temperature of rows, and core loss. A ripple with a pause is taken as its own triangle for the share of time that it lasts: the
 * same as the whole triangle where the pause closes.
 */
function addInductorLosses(solver: PointSolver, design: Design): void {
  const { state, ledger } = solver;
  const { inductor, inductorAt } = design;
  const n = state.activePhases * state.chokes;
  const lasts = state.highShare + state.lowShare;
  const share = lasts > 0 ? state.highShare / lasts : 0.5;
  triangleLoss(
    state.rippleCurrent,
    share,
    inductorAt.factors,
    RIPPLE_HARMONICS,
    inductorAt.x1,
    inductorAt.layers,
    watts,
  );
  const square = (state.rippleCurrent * state.rippleCurrent) / 12;
  solver.chokeAc = n * lasts * Math.max(0, watts[0] - square) * inductor.dcResistance;
  stockedCoreLossAt(inductor, inductorAt.coreScale, state.rippleCurrent, share, 1 - share, watts);
  ledger[SLOT['inductor.core']] += n * pulseShare(design, state) * watts[0];
}

/** Core loss of the transformers: a trapezoid of flux, two ramps a period; pulses that are skipped lose nothing. */
function addTransformerCore(design: Design, state: StageState, ledger: Float64Array): void {
  const { transformer, transformerChoice, frequency, stage } = design;
  if (transformerChoice === undefined) return;
  const ramp = Math.max(1e-6, state.fluxRamp);
  scratch[0] = state.fluxSwing;
  scratch[1] = transformer.fluxExponent;
  powAt(scratch, 0);
  const swing = scratch[0];
  scratch[0] = ramp;
  scratch[1] = 1 - transformer.frequencyExponent;
  powAt(scratch, 0);
  const skipped = state.frequency / (frequency * stage.chokeMultiple);
  const factor = coreTemperatureFactor(transformerChoice.material, state.transformerTemperature);
  ledger[SLOT['transformer.core']] +=
    state.activePhases * transformer.coreScale * swing * 2 * scratch[0] * skipped * factor;
}

/**
 * Share of the set frequency's core loss that a ripple with a pause has: each slope burns k·(ΔI/t)^α·t, so squeezing the
 * triangle into a share s of the period at the set frequency leaves s^(1 − α), and skipped pulses thin it out.
 */
function pulseShare(design: Design, state: StageState): number {
  const skipped = state.frequency / (design.frequency * design.stage.chokeMultiple);
  const lasts = (state.highShare + state.lowShare) / (skipped > 0 ? skipped : 1);
  if (!(lasts < 1)) return skipped;
  scratch[0] = lasts;
  scratch[1] = 1 - design.inductor.coreFrequencyExponent;
  powAt(scratch, 0);
  return skipped * scratch[0];
}

function addController(solver: PointSolver, design: Design): void {
  const { controller } = design;
  // Without a linear supply the controller lives on an auxiliary one at its drive voltage.
  const supply = controller.linearDriveSupply
    ? solver.state.inputVoltage
    : Math.min(solver.state.inputVoltage, controller.driveVoltage / AUXILIARY_EFFICIENCY);
  const stages = design.powerStage === undefined ? 0 : solver.state.activePhases * design.powerStage.quiescentCurrent;
  solver.ledger[SLOT['controller.quiescent']] += supply * (controller.quiescentCurrent + stages);
}

/**
 * Source inductance and input bank form a resonance; the bank's current and voltage rise by 1/|1 − x² + j·x/Q| at the ripple's
 * frequency, x = corner over ripple frequency, the whole ripple taken as its fundamental.
 */
function resonate(solver: PointSolver, flavour: Flavour): void {
  const { sourceInductance, sourceResistance } = solver.rail.input;
  if (!(sourceInductance > 0)) return;
  const { input } = flavour;
  const capacitance = input.c1 + input.c2;
  const turn = (2 * Math.PI) / solver.drawn.period;
  const x2 = 1 / (sourceInductance * capacitance * turn * turn);
  const damping = (sourceResistance + input.r1) * capacitance * turn * x2;
  const gain = 1 / Math.sqrt((1 - x2) * (1 - x2) + damping * damping);
  const ripple = solver.inputRipple;
  ripple.ripple *= gain;
  ripple.meanSquare1 *= gain * gain;
  ripple.meanSquare2 *= gain * gain;
}

/** Loss of the input filter's choke: dc alone, for its ripple is what the filter leaves. */
function addFilterChoke(solver: PointSolver, choke: Inductor): void {
  const { state, ledger } = solver;
  const current = state.activePhases * state.highMean;
  const hot = windingResistance(choke.dcResistance, state.boardTemperature);
  ledger[SLOT['filterChoke.winding']] += current * current * hot;
}

function addCapacitors(solver: PointSolver, design: Design, flavour: Flavour): void {
  const { state, ledger } = solver;
  sumOutput(solver, flavour);
  sumShifted(state.draw, state.drawCopies, solver.drawn);
  if (solver.wantsRipple) {
    bankRipple(flavour.output, solver.summed, solver.outputRipple);
    bankRipple(flavour.input, solver.drawn, solver.inputRipple);
  } else {
    bankCurrents(flavour.output, solver.summed, solver.outputRipple);
    bankCurrents(flavour.input, solver.drawn, solver.inputRipple);
  }
  resonate(solver, flavour);
  // Both halves of a divider carry half of the primary current.
  if (design.dividerCount > 0) {
    ledger[SLOT['dividerCeramic.seriesResistance']] +=
      0.5 * state.activePhases * state.primaryMeanSquare * design.dividerResistance;
  }
  ledger[SLOT['outputCeramic.seriesResistance']] += solver.outputRipple.meanSquare1 * flavour.output.r1;
  ledger[SLOT['outputBulk.seriesResistance']] += solver.outputRipple.meanSquare2 * flavour.output.r2;
  ledger[SLOT['inputCeramic.seriesResistance']] += solver.inputRipple.meanSquare1 * flavour.input.r1;
  ledger[SLOT['inputBulk.seriesResistance']] += solver.inputRipple.meanSquare2 * flavour.input.r2;
}

function sumOutput(solver: PointSolver, flavour: Flavour): void {
  const { state } = solver;
  const copies = state.activePhases * state.chokes;
  if (flavour.worst && copies > 1) {
    sumUnequal(state.choke, copies, flavour.scales, solver.summed);
  } else {
    sumShifted(state.choke, copies, solver.summed);
  }
}

/** Splits losses into constants and slopes with temperature, solves the balance, and takes over the temperatures. */
function balance(solver: PointSolver, design: Design): void {
  const { state, heat, ledger } = solver;
  resistive(heat, HOT.high, highWatts(state, design), design.high.resistanceTempco);
  heat.constant[HOT.high] += sumSlots(ledger, SLOT['highSwitch.conduction'], SLOT['lowSwitch.conduction']);
  if (design.diode === undefined) {
    resistive(heat, HOT.low, lowWatts(state, design), design.low.resistanceTempco);
    heat.constant[HOT.low] += sumSlots(ledger, SLOT['lowSwitch.conduction'], SLOT['diode.conduction']);
  } else {
    diodeHeat(solver, design);
  }
  resistive(heat, HOT.inductor, chokeWatts(state, design) + solver.chokeAc, WINDING_TEMPCO);
  heat.constant[HOT.inductor] += ledger[SLOT['inductor.core']];
  resistive(heat, HOT.transformer, transformerWatts(state, design), WINDING_TEMPCO);
  heat.constant[HOT.transformer] += ledger[SLOT['transformer.core']];
  const copper = copperWatts(state);
  heat.outputBulkRise = bulkRise(design.outputBulk, design.outputBulkCount, solver.outputRipple.meanSquare2);
  heat.inputBulkRise = bulkRise(design.inputBulk, design.inputBulkCount, solver.inputRipple.meanSquare2);
  heat.boardAllowed = Math.min(
    bulkAllowance(solver, design.outputBulk, heat.outputBulkRise),
    bulkAllowance(solver, design.inputBulk, heat.inputBulkRise),
  );
  heat.boardSlope = copper * COPPER_TEMPCO;
  heat.boardConstant =
    copper * (1 - COPPER_TEMPCO * 293.15) + sumSlots(ledger, SLOT['outputCeramic.seriesResistance'], ledger.length);
  solveHeat(heat);
  state.highTemperature = Math.min(HOTTEST, heat.temperature[HOT.high]);
  state.lowTemperature = Math.min(HOTTEST, heat.temperature[HOT.low]);
  state.inductorTemperature = Math.min(HOTTEST, heat.temperature[HOT.inductor]);
  state.transformerTemperature = Math.min(HOTTEST, heat.temperature[HOT.transformer]);
  state.boardTemperature = Math.min(HOTTEST, heat.boardTemperature);
}

/** Rise of a bulk capacitor over the board by its own heating, K: rated rise times the square of current over rating; 0 without one. */
export function bulkRise(bulk: Bulk | undefined, count: number, square: number): number {
  if (bulk === undefined) return 0;
  return (bulk.ratedRise * square) / (count * count * bulk.rippleRating * bulk.rippleRating);
}

/** Board temperature that a bulk capacitor allows after its own heating, K; the board's own limit without one. */
function bulkAllowance(solver: PointSolver, bulk: Bulk | undefined, rise: number): number {
  if (bulk === undefined) return BOARD_MAXIMUM;
  return Math.min(BOARD_MAXIMUM, bulk.maximumTemperature - solver.rail.derating.temperature - rise);
}

/** Conduction loss of the high position at the reference temperature, with tolerance, all phases, W. */
function highWatts(state: StageState, design: Design): number {
  const { high, highParallel } = design;
  const resistance = (state.resistanceScale * high.onResistance * high.dynamicFactor) / highParallel;
  return state.activePhases * state.highDevices * state.highMeanSquare * resistance;
}

/** The same of a switch in the low position. */
function lowWatts(state: StageState, design: Design): number {
  const { low, lowParallel } = design;
  const resistance = (state.resistanceScale * low.onResistance * low.dynamicFactor) / lowParallel;
  return state.activePhases * state.lowDevices * state.lowMeanSquare * resistance;
}

/** Dc-resistance loss of all chokes at the reference temperature, W. */
function chokeWatts(state: StageState, design: Design): number {
  return state.activePhases * state.chokes * state.chokeMeanSquare * design.inductor.dcResistance;
}

/** Winding loss of all transformers at the reference temperature, ac included, W; a centre tap has two secondary windings. */
function transformerWatts(state: StageState, design: Design): number {
  const { form } = design.stage;
  if (form === undefined) return 0;
  const t = design.transformer;
  const secondaries = form.centreTap ? 2 : 1;
  const primary = state.primaryMeanSquare * t.primaryResistance * t.primaryFactor;
  const secondary = secondaries * state.secondaryMeanSquare * t.secondaryResistance * t.secondaryFactor;
  return state.activePhases * (primary + secondary);
}

/** Loss of the board copper at 20 °C, W. */
function copperWatts(state: StageState): number {
  return state.activePhases * state.chokes * state.chokeMeanSquare * BOARD_SQUARE;
}

/** A resistive loss `loss` (W at the reference temperature of rows) as constant and slope of hot part `part`. */
function resistive(heat: HeatBalance, part: number, loss: number, tempco: number): void {
  heat.slope[part] = loss * tempco;
  heat.constant[part] = loss * (1 - tempco * RESISTANCE_REFERENCE);
}

/** A diode's drop falls with temperature, its leakage doubles: the straight line through the round's temperature. */
function diodeHeat(solver: PointSolver, design: Design): void {
  const { state, heat, ledger } = solver;
  const { diode } = design;
  if (diode === undefined) return;
  const n = state.activePhases;
  const t = Math.min(state.lowTemperature, HOTTEST_DIODE);
  const forward = n * (design.diodeDrop(t) * state.lowMean + diode.slopeResistance * state.lowMeanSquare);
  const leakage = n * diodeLeakageLoss(state.inputVoltage, diode.leakage, diode.leakageDoubling, state.highShare, t);
  ledger[SLOT['diode.conduction']] = forward;
  ledger[SLOT['diode.leakage']] = leakage;
  const slope = n * diode.dropTempco * state.lowMean + (leakage * Math.LN2) / diode.leakageDoubling;
  heat.slope[HOT.low] = slope;
  heat.constant[HOT.low] = forward + leakage - slope * t;
}

/** Writes the losses that the balance settled at its final temperatures. */
function writeResistiveLosses(solver: PointSolver, design: Design): void {
  const { state, heat, ledger } = solver;
  const { temperature } = heat;
  const reference = RESISTANCE_REFERENCE;
  const high = design.high.resistanceTempco;
  ledger[SLOT['highSwitch.conduction']] = heated(highWatts(state, design), high, temperature[HOT.high], reference);
  if (design.diode === undefined) {
    const low = design.low.resistanceTempco;
    ledger[SLOT['lowSwitch.conduction']] = heated(lowWatts(state, design), low, temperature[HOT.low], reference);
  }
  const choke = chokeWatts(state, design);
  ledger[SLOT['inductor.winding']] = heated(choke, WINDING_TEMPCO, temperature[HOT.inductor], reference);
  ledger[SLOT['inductor.windingAc']] = heated(solver.chokeAc, WINDING_TEMPCO, temperature[HOT.inductor], reference);
  const windings = transformerWatts(state, design);
  ledger[SLOT['transformer.winding']] = heated(windings, WINDING_TEMPCO, temperature[HOT.transformer], reference);
  ledger[SLOT['board.copper']] = heated(copperWatts(state), COPPER_TEMPCO, heat.boardTemperature, 293.15);
}

/** A resistive loss `watts` at `reference` (K), W at `temperature` (K). */
function heated(watts: number, tempco: number, temperature: number, reference: number): number {
  return watts * (1 + tempco * (temperature - reference));
}
