/**
 * Temperatures of one operating point: losses in resistances are straight lines in their own temperature, the others constants; the
 * balance is solved, and what the settled temperatures make of the resistances is written down.
 */
import type { Design } from './design.ts';
import type { Flavour } from './flavour.ts';
import { BOARD_MAXIMUM, HOT, HOT_PARTS, solveHeat } from './heat-balance.ts';
import { SLOT, sumSlots } from './ledger.ts';
import { COPPER_TEMPCO } from './magnetics/index.ts';
import type { PointSolver } from './point-solver.ts';
import { diodeLeakageLoss, RESISTANCE_REFERENCE } from './switches/index.ts';

/** Temperature beyond which resistances are not followed, K: such a design has failed its limits long before. */
const HOTTEST = 523.15;
/** The same for the leakage of a diode, which grows without bound, K. */
const HOTTEST_DIODE = 448.15;
/** Resistance of the board copper in one phase's path at 20 °C, Ω: one square of 70 µm copper, 1.7241e-8 Ω·m / 70 µm. */
const BOARD_SQUARE = 2.463e-4;
/** Temperature that the board's copper is told at, K. */
const BOARD_REFERENCE = 293.15;
/** Temperature coefficient of copper taken at 25 °C, where inductor rows state their resistance, 1/K. */
const WINDING_TEMPCO = COPPER_TEMPCO / (1 + 5 * COPPER_TEMPCO);

const { high: HIGH, low: LOW, inductor: CHOKE, transformer: TRANSFORMER } = HOT;
const HIGH_CONDUCTION = SLOT['highSwitch.conduction'];
const LOW_CONDUCTION = SLOT['lowSwitch.conduction'];
const DIODE_CONDUCTION = SLOT['diode.conduction'];
const DIODE_LEAKAGE = SLOT['diode.leakage'];
const CHOKE_WINDING = SLOT['inductor.winding'];
const CHOKE_AC = SLOT['inductor.windingAc'];
const CHOKE_CORE = SLOT['inductor.core'];
const WINDINGS = SLOT['transformer.winding'];
const TRANSFORMER_CORE = SLOT['transformer.core'];
const COPPER = SLOT['board.copper'];
/** From here to the end the ledger's slots heat the board alone. */
const BOARD_SLOTS = SLOT['outputCeramic.seriesResistance'];

/**
 * Fills in the thermal paths of `design` with the point's active phases, and how its resistances rise with temperature.
 * @derivation pieces alike in parallel divide a thermal resistance
 * @valid pieces share heat alike
 */
export function prepareHeat(solver: PointSolver, design: Design): void {
  const { heat, state, rail, tempco } = solver;
  const spare = rail.derating.temperature;
  const phases = state.activePhases;
  const { stage, transformer, high, low, diode } = design;
  heat.ambient = rail.ambient;
  heat.conductance = solver.conductance;
  heat.resistance[HIGH] = high.thermalResistance / (phases * stage.highDevices * design.highParallel);
  heat.allowed[HIGH] = high.maximumJunction - spare;
  tempco[HIGH] = high.resistanceTempco;
  if (diode !== undefined) {
    heat.resistance[LOW] = diode.thermalResistance / phases;
    heat.allowed[LOW] = diode.maximumJunction - spare;
  } else {
    heat.resistance[LOW] = low.thermalResistance / (phases * stage.lowDevices * design.lowParallel);
    heat.allowed[LOW] = low.maximumJunction - spare;
    tempco[LOW] = low.resistanceTempco;
  }
  heat.resistance[CHOKE] = design.inductorThermalResistance / (phases * stage.chokes);
  heat.toAir[CHOKE] = design.chokeMaterial === undefined ? 0 : 1;
  heat.faces[CHOKE] = phases * stage.chokes * design.inductorFaces;
  heat.allowed[CHOKE] = design.inductor.maximumTemperature - spare;
  heat.toAir[TRANSFORMER] = 1;
  heat.resistance[TRANSFORMER] = stage.form === undefined ? 0 : transformer.surfaceResistance / phases;
  heat.allowed[TRANSFORMER] = transformer.maximumTemperature - spare;
  tempco[CHOKE] = WINDING_TEMPCO;
  tempco[TRANSFORMER] = WINDING_TEMPCO;
}

/**
 * Resistances of one phase at the temperatures of the round.
 * @source iec-60028 (copper); on-resistance linear in temperature
 * @valid the temperatures of the round, up to 523 K
 */
export function takeResistances(solver: PointSolver, design: Design, flavour: Flavour): void {
  const { state } = solver;
  const { diode, inductor, transformer } = design;
  const aboveHigh = state.highTemperature - RESISTANCE_REFERENCE;
  const aboveLow = state.lowTemperature - RESISTANCE_REFERENCE;
  state.highResistance = flavour.highResistance * (1 + design.high.resistanceTempco * aboveHigh);
  state.lowResistance =
    diode === undefined ? flavour.lowResistance * (1 + design.low.resistanceTempco * aboveLow) : diode.slopeResistance;
  state.pathResistance =
    inductor.dcResistance * (1 + WINDING_TEMPCO * (state.inductorTemperature - RESISTANCE_REFERENCE)) +
    BOARD_SQUARE * (1 + COPPER_TEMPCO * (state.boardTemperature - BOARD_REFERENCE));
  if (design.stage.form === undefined) return;
  const hot = 1 + WINDING_TEMPCO * (state.transformerTemperature - RESISTANCE_REFERENCE);
  state.primaryResistance = transformer.primaryResistance * transformer.primaryFactor * hot;
  state.secondaryResistance = transformer.secondaryResistance * transformer.secondaryFactor * hot;
}

/**
 * Splits losses into constants and slopes with temperature, solves the balance, and takes over the temperatures.
 * @derivation resistive loss is a straight line in its own temperature
 * @valid currents fixed for the round
 */
export function balanceHeat(solver: PointSolver, design: Design, flavour: Flavour): void {
  const { state, heat, ledger, resistive, tempco } = solver;
  const phases = state.activePhases;
  resistive[HIGH] = phases * state.highDevices * state.highMeanSquare * flavour.highResistance;
  resistive[LOW] =
    design.diode === undefined ? phases * state.lowDevices * state.lowMeanSquare * flavour.lowResistance : 0;
  const chokes = phases * state.chokes * state.chokeMeanSquare;
  resistive[CHOKE] = chokes * design.inductor.dcResistance + solver.chokeAc;
  resistive[TRANSFORMER] = design.stage.form === undefined ? 0 : windings(solver, design);
  solver.boardCopper = chokes * BOARD_SQUARE;
  for (let i = 0; i < HOT_PARTS; i++) {
    heat.slope[i] = resistive[i] * tempco[i];
    heat.constant[i] = resistive[i] * (1 - tempco[i] * RESISTANCE_REFERENCE);
  }
  addSlots(ledger, HIGH_CONDUCTION, LOW_CONDUCTION, heat.constant, HIGH);
  if (design.diode === undefined) addSlots(ledger, LOW_CONDUCTION, DIODE_CONDUCTION, heat.constant, LOW);
  else diodeHeat(solver, design);
  heat.constant[CHOKE] += ledger[CHOKE_CORE];
  heat.constant[TRANSFORMER] += ledger[TRANSFORMER_CORE];
  allowBulks(solver, design);
  heat.boardSlope = solver.boardCopper * COPPER_TEMPCO;
  board[0] = solver.boardCopper * (1 - COPPER_TEMPCO * BOARD_REFERENCE);
  addSlots(ledger, BOARD_SLOTS, ledger.length, board, 0);
  heat.boardConstant = board[0];
  solveHeat(heat);
  state.highTemperature = Math.min(HOTTEST, heat.temperature[HIGH]);
  state.lowTemperature = Math.min(HOTTEST, heat.temperature[LOW]);
  state.inductorTemperature = Math.min(HOTTEST, heat.temperature[CHOKE]);
  state.transformerTemperature = Math.min(HOTTEST, heat.temperature[TRANSFORMER]);
  state.boardTemperature = Math.min(HOTTEST, heat.boardTemperature);
}

const board = new Float64Array(1);

/** Adds the slots `from` … `to − 1` of `ledger` to `into[place]`. */
function addSlots(ledger: Float64Array, from: number, to: number, into: Float64Array, place: number): void {
  let sum = into[place];
  for (let i = from; i < to; i++) sum += ledger[i];
  into[place] = sum;
}

/**
 * Winding loss of all transformers at the reference temperature, ac included, W; a centre tap has two secondary windings.
 * @derivation I²·R·(ac factor) of primary and secondaries
 * @valid ac factor of the usual duty
 */
function windings(solver: PointSolver, design: Design): number {
  const { state } = solver;
  const t = design.transformer;
  const secondaries = design.stage.form?.centreTap === true ? 2 : 1;
  const primary = state.primaryMeanSquare * t.primaryResistance * t.primaryFactor;
  const secondary = secondaries * state.secondaryMeanSquare * t.secondaryResistance * t.secondaryFactor;
  return state.activePhases * (primary + secondary);
}

/**
 * What the bulk capacitors' own heating leaves of the board's temperature.
 * @derivation a capacitor sits on the board: its rise takes from the board's allowance
 * @valid as `findBulkRises`
 */
function allowBulks(solver: PointSolver, design: Design): void {
  const { heat } = solver;
  const spare = solver.rail.derating.temperature;
  const { outputBulk, inputBulk } = design;
  findBulkRises(solver, design);
  heat.boardAllowed = BOARD_MAXIMUM;
  if (outputBulk !== undefined) {
    heat.boardAllowed = Math.min(heat.boardAllowed, outputBulk.maximumTemperature - spare - heat.outputBulkRise);
  }
  if (inputBulk !== undefined) {
    heat.boardAllowed = Math.min(heat.boardAllowed, inputBulk.maximumTemperature - spare - heat.inputBulkRise);
  }
}

/**
 * Rises of the bulk capacitors over the board by their own heating: rated rise times the square of current over rating.
 * @derivation heating goes with the square of current over rating
 * @valid ripple spectrum near that of the rating
 */
export function findBulkRises(solver: PointSolver, design: Design): void {
  const { heat, outputRipple, inputRipple } = solver;
  const { outputBulk, outputBulkCount, inputBulk, inputBulkCount } = design;
  heat.outputBulkRise = 0;
  heat.inputBulkRise = 0;
  if (outputBulk !== undefined) {
    const rated = outputBulkCount * outputBulk.rippleRating;
    heat.outputBulkRise = (outputBulk.ratedRise * outputRipple.meanSquare2) / (rated * rated);
  }
  if (inputBulk !== undefined) {
    const rated = inputBulkCount * inputBulk.rippleRating;
    heat.inputBulkRise = (inputBulk.ratedRise * inputRipple.meanSquare2) / (rated * rated);
  }
}

/**
 * A diode's drop falls with temperature, its leakage doubles: the straight line through the round's temperature.
 * @derivation tangent of V0(T)·I + R·I² + leakage(T) in T
 * @valid near the round's temperature
 */
function diodeHeat(solver: PointSolver, design: Design): void {
  const { state, heat, ledger } = solver;
  const { diode } = design;
  if (diode === undefined) return;
  const n = state.activePhases;
  const t = Math.min(state.lowTemperature, HOTTEST_DIODE);
  const forward = n * (design.diodeDrop(t) * state.lowMean + diode.slopeResistance * state.lowMeanSquare);
  const leakage = n * diodeLeakageLoss(state.inputVoltage, diode.leakage, diode.leakageDoubling, state.highShare, t);
  ledger[DIODE_CONDUCTION] = forward;
  ledger[DIODE_LEAKAGE] = leakage;
  const slope = n * diode.dropTempco * state.lowMean + (leakage * Math.LN2) / diode.leakageDoubling;
  heat.slope[LOW] = slope;
  heat.constant[LOW] = forward + leakage - slope * t;
}

/**
 * Writes the losses that follow from the settled temperatures, and the sum of all.
 * @source iec-60028 (copper); on-resistance linear in temperature
 * @valid as `balanceHeat`
 */
export function settleLosses(solver: PointSolver, design: Design): void {
  const { heat, ledger, resistive, tempco } = solver;
  const { temperature } = heat;
  ledger[HIGH_CONDUCTION] = resistive[HIGH] * (1 + tempco[HIGH] * (temperature[HIGH] - RESISTANCE_REFERENCE));
  if (design.diode === undefined) {
    ledger[LOW_CONDUCTION] = resistive[LOW] * (1 + tempco[LOW] * (temperature[LOW] - RESISTANCE_REFERENCE));
  }
  const choke = 1 + WINDING_TEMPCO * (temperature[CHOKE] - RESISTANCE_REFERENCE);
  ledger[CHOKE_WINDING] = (resistive[CHOKE] - solver.chokeAc) * choke;
  ledger[CHOKE_AC] = solver.chokeAc * choke;
  ledger[WINDINGS] = resistive[TRANSFORMER] * (1 + WINDING_TEMPCO * (temperature[TRANSFORMER] - RESISTANCE_REFERENCE));
  ledger[COPPER] = solver.boardCopper * (1 + COPPER_TEMPCO * (heat.boardTemperature - BOARD_REFERENCE));
  solver.loss = sumSlots(ledger, 0, ledger.length);
}
