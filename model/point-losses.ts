/** Losses of one operating point beside edges, resistances and capacitors: chokes, transformer cores, controller, input filter. */
import { expAt, logAt, powAt } from '../optimizer/maths/index.ts';
import type { Design } from './design.ts';
import { SLOT } from './ledger.ts';
import { coreTemperatureFactor, stockedCoreLossAt, triangleLossAt, windingResistance } from './magnetics/index.ts';
import type { PointSolver } from './point-solver.ts';
import { pauses } from './stages/state.ts';

/** Efficiency of the auxiliary supply behind drivers that do not burn the input's rest (common practice, no source). */
const AUXILIARY_EFFICIENCY = 0.85;

const CHOKE_CORE = SLOT['inductor.core'];
const TRANSFORMER_CORE = SLOT['transformer.core'];
const CONTROLLER = SLOT['controller.quiescent'];
const FILTER_CHOKE = SLOT['filterChoke.winding'];

const watts = new Float64Array(2);
const scratch = new Float64Array(2);

/** Adds them to the ledger of `solver`, W. */
export function addOtherLosses(solver: PointSolver, design: Design): void {
  addChokes(solver, design);
  if (design.stage.form !== undefined) addTransformerCore(solver, design);
  addController(solver, design);
  if (design.filterChoke !== undefined) addFilterChoke(solver, design);
}

/**
 * Ac winding loss, at the reference temperature of rows, and core loss. A ripple with a pause is taken as its own triangle for the
 * share of time that it lasts: the same as the whole triangle where the pause closes.
 * @source dowell-1966 (winding)
 * @source igse-2002 (core)
 * @valid ripple a triangle; the rows' own ranges
 */
function addChokes(solver: PointSolver, design: Design): void {
  const { state } = solver;
  const { inductor, inductorAt } = design;
  const n = state.activePhases * state.chokes;
  const lasts = state.highShare + state.lowShare;
  const share = lasts > 0 ? state.highShare / lasts : 0.5;
  const swing = state.rippleCurrent;
  watts[0] = swing;
  watts[1] = share;
  triangleLossAt(inductorAt, watts);
  solver.chokeAc = n * lasts * Math.max(0, watts[0] - (swing * swing) / 12) * inductor.dcResistance;
  watts[0] = swing;
  watts[1] = share;
  stockedCoreLossAt(inductor, inductorAt, watts);
  solver.ledger[CHOKE_CORE] += n * pulseShare(solver, design) * watts[0];
}

/**
 * Share of the set frequency's core loss that a ripple with a pause has: each slope burns k·(ΔI/t)^α·t, so squeezing the
 * triangle into a share s of the period at the set frequency leaves s^(1 − α), and skipped pulses thin it out.
 * @source igse-2002: each slope adds |dB/dt|^α·ΔB^(β−α)·t
 * @valid no relaxation loss in the pause
 */
function pulseShare(solver: PointSolver, design: Design): number {
  const { state } = solver;
  if (!pauses(state.mode)) return 1;
  const skipped = state.frequency / (design.frequency * design.stage.chokeMultiple);
  scratch[0] = Math.min(1, (state.highShare + state.lowShare) / (skipped > 0 ? skipped : 1));
  scratch[1] = 1 - design.inductor.coreFrequencyExponent;
  powAt(scratch, 0);
  return skipped * scratch[0];
}

/**
 * Core loss of the transformers: a trapezoid of flux, two ramps a period; pulses that are skipped lose nothing.
 * @source igse-2002: 2·ki·f^α·ΔB^β·d^(1−α), d the share of one ramp
 * @valid no relaxation loss on the flats
 */
function addTransformerCore(solver: PointSolver, design: Design): void {
  const { state } = solver;
  const { transformer, transformerChoice, frequency, stage } = design;
  if (transformerChoice === undefined) return;
  scratch[0] = state.fluxSwing;
  scratch[1] = Math.max(1e-6, state.fluxRamp);
  logAt(scratch, 0);
  logAt(scratch, 1);
  scratch[0] = transformer.fluxExponent * scratch[0] + (1 - transformer.frequencyExponent) * scratch[1];
  expAt(scratch, 0);
  const skipped = state.frequency / (frequency * stage.chokeMultiple);
  const factor = coreTemperatureFactor(transformerChoice.material, state.transformerTemperature);
  solver.ledger[TRANSFORMER_CORE] += state.activePhases * transformer.coreScale * 2 * scratch[0] * skipped * factor;
}

/**
 * What controller and power stages draw for themselves.
 * @derivation supply voltage times quiescent current
 * @valid auxiliary supply of stated efficiency where the controller has no linear one
 */
function addController(solver: PointSolver, design: Design): void {
  const { state, ledger } = solver;
  const { controller, powerStage } = design;
  // Without a linear supply the controller lives on an auxiliary one at its drive voltage.
  const supply = controller.linearDriveSupply
    ? state.inputVoltage
    : Math.min(state.inputVoltage, controller.driveVoltage / AUXILIARY_EFFICIENCY);
  const stages = powerStage === undefined ? 0 : state.activePhases * powerStage.quiescentCurrent;
  ledger[CONTROLLER] += supply * (controller.quiescentCurrent + stages);
}

/**
 * Loss of the input filter's choke: dc alone, for its ripple is what the filter leaves.
 * @derivation I²·R of the mean input current
 * @valid ripple current in the filter small
 */
function addFilterChoke(solver: PointSolver, design: Design): void {
  const { state, ledger } = solver;
  if (design.filterChoke === undefined) return;
  const current = state.activePhases * state.highMean;
  ledger[FILTER_CHOKE] +=
    current * current * windingResistance(design.filterChoke.dcResistance, state.boardTemperature);
}
