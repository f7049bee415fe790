/**
 * Switching losses of a transformer stage. Primary switches turn on from half the input (the node rests between the rails
 * while all are off; the reset has left it there in a two-switch stage) and off against the whole; leakage energy returns to the
 * input. Rectifiers pay recovery and the charge that rings through the leakage.
 */
import type { Design } from './design.ts';
import { addGateLosses, cycleCharge, overlapOff, overlapOn } from './gate-drive.ts';
import { SLOT } from './ledger.ts';
import type { IsolatedForm } from './stages/isolated.ts';
import type { StageState } from './stages/state.ts';
import {
  deadTimeEnergy,
  hardEdgeEnergy,
  OUTPUT_CHARGE,
  OUTPUT_ENERGY,
  outputAt,
  recoveryCharge,
} from './switches/index.ts';

const output = new Float64Array(2);

/** Adds the switching losses of all active phases at `state` to `ledger`, W. */
export function addIsolatedEdges(form: IsolatedForm, design: Design, state: StageState, ledger: Float64Array): void {
  const perCycle = form.doubleEnded && !form.doubler ? 0.5 : 1;
  const cycles = state.frequency * perCycle * state.activePhases;
  addPrimary(form, design, state, ledger, cycles);
  addRectifiers(form, design, state, ledger, cycles);
  const high = cycles * state.highDevices * cycleCharge(design.high, design.highParallel, design.driver, 0);
  const low = cycles * state.lowDevices * cycleCharge(design.low, design.lowParallel, design.driver, 0);
  addGateLosses(ledger, design.driver, state.inputVoltage, high, low);
}

function addPrimary(form: IsolatedForm, design: Design, state: StageState, ledger: Float64Array, cycles: number): void {
  const { high, highParallel, driver } = design;
  const ratio = design.transformer.ratio;
  const on = state.valleyCurrent / ratio;
  const off = state.peakCurrent / ratio + state.magnetizingPeak;
  const devices = cycles * state.highDevices;
  ledger[SLOT['highSwitch.overlap']] += devices * overlapOff(high, highParallel, driver, state.inputVoltage, off);
  if (design.phaseShifted) {
    addShiftedEdges(design, state, ledger, devices, off);
    return;
  }
  const rest = 0.5 * state.inputVoltage;
  ledger[SLOT['highSwitch.overlap']] += devices * overlapOn(high, highParallel, driver, rest, on);
  outputAt(high, rest, output);
  const charge = highParallel * output[OUTPUT_CHARGE];
  const energy = highParallel * output[OUTPUT_ENERGY];
  // A leg's partner is charged with each turn-on; a two-switch stage has clamp diodes there instead, far smaller.
  const edge = form.doubleEnded ? hardEdgeEnergy(charge, energy, energy, rest) : energy;
  ledger[SLOT['highSwitch.outputCharge']] += devices * edge;
}

/**
 * Edges of a shifted bridge. The leading leg is moved by the choke's current and always arrives; the lagging one has only the
 * leakage's energy, ½·L·I² against Q·V (Sabaté 1990), and pays for the part of the swing that is left. Half the devices each.
 */
function addShiftedEdges(
  design: Design,
  state: StageState,
  ledger: Float64Array,
  devices: number,
  current: number,
): void {
  const { high, highParallel, transformer } = design;
  outputAt(high, state.inputVoltage, output);
  const charge = highParallel * output[OUTPUT_CHARGE];
  const energy = highParallel * output[OUTPUT_ENERGY];
  const stored = 0.5 * transformer.leakage * current * current;
  const left = Math.max(0, 1 - stored / (charge * state.inputVoltage));
  const edge = hardEdgeEnergy(charge, energy, energy, state.inputVoltage);
  ledger[SLOT['highSwitch.outputCharge']] += 0.5 * devices * left * edge;
}

function addRectifiers(
  form: IsolatedForm,
  design: Design,
  state: StageState,
  ledger: Float64Array,
  cycles: number,
): void {
  const { low, lowParallel, driver } = design;
  const devices = cycles * state.lowDevices;
  const volts = state.rectifierVoltage;
  outputAt(low, volts, output);
  const before = Math.max(0, form.centreTap ? 0.5 * state.valleyCurrent : state.valleyCurrent);
  const charge = recoveryCharge(
    low.recoveryCharge,
    low.recoveryCurrent,
    low.recoveryHoldsOutput,
    output[OUTPUT_CHARGE],
    before / lowParallel,
  );
  ledger[SLOT['lowSwitch.recovery']] += devices * volts * lowParallel * charge;
  // Charging a capacitance from a voltage through an inductance and damping the ringing costs Q·V in all.
  ledger[SLOT['lowSwitch.outputCharge']] += devices * lowParallel * output[OUTPUT_CHARGE] * volts;
  const gap = driver.deadTime;
  const each = form.centreTap ? 0.5 : 1;
  ledger[SLOT['lowSwitch.deadTime']] +=
    devices *
    (deadTimeEnergy(low.bodyDrop, each * Math.max(0, state.valleyCurrent), gap, 0) +
      deadTimeEnergy(low.bodyDrop, each * Math.max(0, state.peakCurrent), gap, 0));
}
