/**
 * What both switching edges of a cycle cost. At each edge one switch of the leg turns off and the other on; which of them
 * pays is decided by the sign of the current at that instant, so the same lines serve forward and reverse power, forced
 * continuous operation and everything between, without a jump.
 */
import type { Design } from './design.ts';
import { addGateLosses, cycleCharge, overlapOff, overlapOn } from './gate-drive.ts';
import { SLOT } from './ledger.ts';
import type { Switch } from './parts/switch.ts';
import type { StageState } from './stages/state.ts';
import {
  deadTimeEnergy,
  diodeChargeEnergy,
  hardEdgeEnergy,
  loopEnergy,
  OUTPUT_CHARGE,
  OUTPUT_ENERGY,
  outputAt,
  partialEdgeEnergyAt,
  recoveryCharge,
  swingFraction,
  transitionTime,
} from './switches/index.ts';

/** Inductance of the loop through input capacitor and both switches, H: a tight layout (common practice, no source). */
export const LOOP_INDUCTANCE = 1e-9;

const highOutput = new Float64Array(2);
const lowOutput = new Float64Array(2);
const partial = new Float64Array(1);
/** What the two above hold for. */
const kept: { high: Switch | undefined; low: Switch | undefined; volts: number } = {
  high: undefined,
  low: undefined,
  volts: 0.5,
};

/** Adds the switching losses of all active phases at `state` to `ledger`, W. */
export function addEdgeLosses(design: Design, state: StageState, ledger: Float64Array): void {
  refreshOutputs(design, state.inputVoltage);
  if (design.diode === undefined) addSwitchEdges(design, state, ledger);
  else addDiodeEdges(design, state, ledger);
}

/** Output charge and energy of both rows at the bus: taken again only when the row or the bus is another. */
function refreshOutputs(design: Design, volts: number): void {
  if (kept.high !== design.high || kept.volts !== volts) outputAt(design.high, volts, highOutput);
  if (kept.low !== design.low || kept.volts !== volts) outputAt(design.low, volts, lowOutput);
  kept.high = design.high;
  kept.low = design.low;
  kept.volts = volts;
}

function addSwitchEdges(design: Design, state: StageState, ledger: Float64Array): void {
  const cycles = state.frequency * state.activePhases;
  const { high, low, driver } = design;
  const a = state.valleyCurrent;
  const b = state.peakCurrent;
  const nodeCharge = design.highParallel * highOutput[OUTPUT_CHARGE] + design.lowParallel * lowOutput[OUTPUT_CHARGE];
  const toHigh = rising(design, state, nodeCharge);
  const toLow = falling(design, state, nodeCharge);

  // Into the high switch: hard while the current flows out of the leg, helped by it while it flows in.
  ledger[SLOT['highSwitch.overlap']] += cycles * overlapOn(high, design.highParallel, driver, state.inputVoltage, a);
  ledger[SLOT['lowSwitch.overlap']] += cycles * overlapOff(low, design.lowParallel, driver, state.inputVoltage, -a);
  ledger[SLOT['highSwitch.recovery']] +=
    cycles * recovery(low, design.lowParallel, lowOutput[OUTPUT_CHARGE], state.inputVoltage, a);
  edgeEnergy(low, design.lowParallel, lowOutput, high, design.highParallel, highOutput, state.inputVoltage, toHigh);
  ledger[SLOT['highSwitch.outputCharge']] += cycles * partial[0];

  // Into the low switch: the mirror image.
  ledger[SLOT['highSwitch.overlap']] += cycles * overlapOff(high, design.highParallel, driver, state.inputVoltage, b);
  ledger[SLOT['lowSwitch.overlap']] += cycles * overlapOn(low, design.lowParallel, driver, state.inputVoltage, -b);
  ledger[SLOT['lowSwitch.recovery']] +=
    cycles * recovery(high, design.highParallel, highOutput[OUTPUT_CHARGE], state.inputVoltage, -b);
  edgeEnergy(high, design.highParallel, highOutput, low, design.lowParallel, lowOutput, state.inputVoltage, toLow);
  ledger[SLOT['lowSwitch.outputCharge']] += cycles * partial[0];

  ledger[SLOT['highSwitch.loop']] += cycles * loopEnergy(LOOP_INDUCTANCE, Math.max(0, b));
  ledger[SLOT['lowSwitch.loop']] += cycles * loopEnergy(LOOP_INDUCTANCE, Math.max(0, -a));
  addGap(ledger, cycles, design, a, a > 0, nodeCharge);
  addGap(ledger, cycles, design, b, b < 0, nodeCharge);
  addGates(ledger, cycles, design, state, toHigh, toLow);
}

/** How far the node has swung by itself when the high switch turns on, 0 … 1. */
function rising(design: Design, state: StageState, nodeCharge: number): number {
  return swingFraction(
    state.valleyCurrent,
    state.effectiveInductance,
    nodeCharge,
    state.inputVoltage,
    state.outputVoltage,
    design.driver.deadTime,
    inverseExponent(design.low),
  );
}

/** How far it has swung by itself when the low switch turns on. */
function falling(design: Design, state: StageState, nodeCharge: number): number {
  return swingFraction(
    -state.peakCurrent,
    state.effectiveInductance,
    nodeCharge,
    state.inputVoltage,
    state.inputVoltage - state.outputVoltage,
    design.driver.deadTime,
    inverseExponent(design.high),
  );
}

/** 1/p of a row's charge law Q ∝ V^p, from its stored energy: see `chargeExponent`. */
function inverseExponent(row: Switch): number {
  const share = row.outputEnergy / (row.outputCharge * row.outputTestVoltage);
  return share > 0 ? (1 - share) / share : 1;
}

/** Writes to `partial[0]` what the switch `own` burns as it turns on after the node has swung by `fraction`. */
function edgeEnergy(
  partner: Switch,
  partnerDice: number,
  partnerOutput: Float64Array,
  own: Switch,
  ownDice: number,
  ownOutput: Float64Array,
  volts: number,
  fraction: number,
): void {
  if (fraction >= 1) {
    partial[0] = 0;
  } else if (fraction > 0) {
    partialEdgeEnergyAt(partner, partnerDice, own, ownDice, volts, fraction, partial);
  } else {
    partial[0] = hardEdgeEnergy(
      partnerDice * partnerOutput[OUTPUT_CHARGE],
      partnerDice * partnerOutput[OUTPUT_ENERGY],
      ownDice * ownOutput[OUTPUT_ENERGY],
      volts,
    );
  }
}

function recovery(row: Switch, dice: number, outputCharge: number, volts: number, current: number): number {
  return (
    volts *
    dice *
    recoveryCharge(row.recoveryCharge, row.recoveryCurrent, row.recoveryHoldsOutput, outputCharge, current / dice)
  );
}

/**
 * Adds the body-diode loss of the gap before one edge, in the position that the current's sign chooses. Before a hard edge
 * the diode conducts through the whole gap; before a soft one it waits for the node to arrive.
 */
function addGap(
  ledger: Float64Array,
  energyScale: number,
  design: Design,
  current: number,
  hard: boolean,
  node: number,
): void {
  const gap = design.driver.deadTime;
  const wait = hard ? 0 : transitionTime(node, current, gap);
  const slot = current >= 0 ? SLOT['lowSwitch.deadTime'] : SLOT['highSwitch.deadTime'];
  const drop = current >= 0 ? design.low.bodyDrop : design.high.bodyDrop;
  ledger[slot] += energyScale * deadTimeEnergy(drop, current, gap, wait);
}

function addGates(
  ledger: Float64Array,
  cycles: number,
  design: Design,
  state: StageState,
  toHigh: number,
  toLow: number,
): void {
  const { driver } = design;
  const high = cycles * cycleCharge(design.high, design.highParallel, driver, toHigh);
  const low = design.diode === undefined ? cycles * cycleCharge(design.low, design.lowParallel, driver, toLow) : 0;
  addGateLosses(ledger, driver, state.inputVoltage, high, low);
}

function addDiodeEdges(design: Design, state: StageState, ledger: Float64Array): void {
  const { diode, high, driver } = design;
  if (diode === undefined) return;
  const cycles = state.frequency * state.activePhases;
  const a = state.valleyCurrent;
  const volts = state.inputVoltage;
  ledger[SLOT['highSwitch.overlap']] +=
    cycles *
    (overlapOn(high, design.highParallel, driver, volts, a) +
      overlapOff(high, design.highParallel, driver, volts, state.peakCurrent));
  ledger[SLOT['highSwitch.outputCharge']] +=
    cycles *
    (design.highParallel * highOutput[OUTPUT_ENERGY] +
      diodeChargeEnergy(diode.junctionCharge, diode.chargeVoltage, volts));
  ledger[SLOT['highSwitch.loop']] += cycles * loopEnergy(LOOP_INDUCTANCE, Math.max(0, state.peakCurrent));
  ledger[SLOT['highSwitch.recovery']] +=
    cycles * volts * recoveryCharge(diode.recoveryCharge, diode.recoveryCurrent, false, 0, a);
  addGates(ledger, cycles, design, state, 0, 0);
}
