/** What both capacitor banks see at one operating point: summed currents, ripple, loss. */
import { bankCurrents, bankRipple } from './capacitors/index.ts';
import type { Design } from './design.ts';
import type { Flavour } from './flavour.ts';
import { SLOT } from './ledger.ts';
import type { PointSolver } from './point-solver.ts';
import { sumShifted, sumUnequal } from './waveform/index.ts';

const OUTPUT_CERAMIC = SLOT['outputCeramic.seriesResistance'];
const OUTPUT_BULK = SLOT['outputBulk.seriesResistance'];
const INPUT_CERAMIC = SLOT['inputCeramic.seriesResistance'];
const INPUT_BULK = SLOT['inputBulk.seriesResistance'];
const DIVIDER = SLOT['dividerCeramic.seriesResistance'];

/**
 * Solves both banks under the solved stage's currents; voltages only where `voltages` are wanted.
 * @derivation Kirchhoff: a bank carries the sum of the shifted copies less its mean
 * @valid source impedance large beside the bank's, or see `resonate`
 */
export function solveBanks(solver: PointSolver, flavour: Flavour, voltages: boolean): void {
  const { state } = solver;
  const copies = state.activePhases * state.chokes;
  if (flavour.worst && copies > 1) sumUnequal(state.choke, copies, flavour.scales, solver.summed);
  else sumShifted(state.choke, copies, solver.summed);
  sumShifted(state.draw, state.drawCopies, solver.drawn);
  if (voltages) {
    bankRipple(flavour.output, solver.summed, solver.outputRipple);
    bankRipple(flavour.input, solver.drawn, solver.inputRipple);
  } else {
    bankCurrents(flavour.output, solver.summed, solver.outputRipple);
    bankCurrents(flavour.input, solver.drawn, solver.inputRipple);
  }
  resonate(solver, flavour);
}

/**
 * Source inductance and input bank form a resonance; the bank's current and voltage rise by 1/|1 − x² + j·x/Q| at the ripple's
 * frequency, x = corner over ripple frequency, the whole ripple taken as its fundamental.
 * @derivation second-order divider of the bank with the source's R and L
 * @valid ripple frequency above the corner
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

/**
 * Adds the losses in the banks' resistances, W.
 * @derivation I²·R of each group's rms current
 * @valid resistance constant over the ripple's harmonics
 */
export function addBanks(solver: PointSolver, design: Design, flavour: Flavour): void {
  const { state, ledger, outputRipple, inputRipple } = solver;
  // Both halves of a divider carry half of the primary current.
  if (design.dividerCount > 0) {
    ledger[DIVIDER] += 0.5 * state.activePhases * state.primaryMeanSquare * design.dividerResistance;
  }
  ledger[OUTPUT_CERAMIC] += outputRipple.meanSquare1 * flavour.output.r1;
  ledger[OUTPUT_BULK] += outputRipple.meanSquare2 * flavour.output.r2;
  ledger[INPUT_CERAMIC] += inputRipple.meanSquare1 * flavour.input.r1;
  ledger[INPUT_BULK] += inputRipple.meanSquare2 * flavour.input.r2;
}
