/**
 * One operating point of one design, solved: waveforms, losses, temperatures, ripple. The one place where the physics of
 * all parts comes together; the search's fast path and the full assessment both go through here.
 */
import type { Design } from './design.ts';
import type { Flavour } from './flavour.ts';
import { type HeatBalance, solveHeat } from './heat-balance.ts';
import type { PlannedPoint } from './plan.ts';
import { addBanks, solveBanks } from './point-banks.ts';
import { balanceHeat, prepareHeat, settleLosses, takeResistances } from './point-heat.ts';
import { addOtherLosses } from './point-losses.ts';
import type { PointSolver } from './point-solver.ts';

/**
 * Rounds of temperature → resistance → duty → loss → temperature. The heat balance is exact in each, so all that a round
 * mends is the duty by which resistances of another temperature differ: one more is enough, and where a point starts from the
 * temperatures of the point before, none. A diode's leakage doubles every few kelvin: it always takes one more.
 */
const COLD_ROUNDS = 2;
const WARM_ROUNDS = 1;
/** Rise over ambient from which the first round starts, K. */
const FIRST_RISE = 30;
/** Load under which a blocking stage is solved as if it carried this share of full load: its pulses still come. */
const LEAST_LOAD = 1e-6;

/**
 * Solves `planned` for `design` under `flavour` with `phases` active phases and the solver's conductance to ambient.
 * Results stand in `solver`.
 */
export function solvePoint(
  solver: PointSolver,
  design: Design,
  flavour: Flavour,
  planned: PlannedPoint,
  phases: number,
): void {
  ask(solver, design, flavour, planned, phases);
  prepareHeat(solver, design);
  const rounds = solver.warm && design.diode === undefined ? WARM_ROUNDS : COLD_ROUNDS;
  for (let round = 1; round <= rounds; round++) solveRound(solver, design, flavour, round === rounds);
  solver.warm = true;
  solver.outputPower = planned.outputVoltage * planned.load * solver.rail.output.current;
  settleLosses(solver, design);
}

/** One round: resistances at the temperatures that stand, the stage, its losses, the temperatures that follow. */
function solveRound(solver: PointSolver, design: Design, flavour: Flavour, last: boolean): void {
  const { state, ledger } = solver;
  takeResistances(solver, design, flavour);
  design.stage.solve(design, state);
  for (let i = 0; i < ledger.length; i++) ledger[i] = 0;
  design.stage.addEdgeLosses(design, state, ledger);
  addOtherLosses(solver, design);
  if (last) {
    solveBanks(solver, flavour, solver.wantsRipple);
    addBanks(solver, design, flavour);
  }
  balanceHeat(solver, design, flavour);
}

/** Balances `heat` anew at another `conductance` to ambient, W/K, with the losses that it holds. */
export function settleHeat(heat: HeatBalance, conductance: number): void {
  if (heat.conductance === conductance) return;
  heat.conductance = conductance;
  solveHeat(heat);
}

/** Summed ripple and capacitor stress alone, at the voltages that the state holds: no heat. The last temperatures stay in force. */
export function solveRipple(solver: PointSolver, design: Design, flavour: Flavour): void {
  const { state } = solver;
  state.loadCurrent = solver.rail.output.current;
  state.activePhases = design.phases;
  design.stage.solve(design, state);
  solveBanks(solver, flavour, true);
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
