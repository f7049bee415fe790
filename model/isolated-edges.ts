/**
 * Switching losses of a transformer stage. Primary switches turn on from half the input (the node rests between the rails
 * while all are off; the reset has left it there in a two-switch stage) and off against the whole; leakage energy returns to the
 * input. Rectifiers pay recovery and the charge that rings through the leakage.
 */
import type { Design } from './design.ts';
import { lookUpBus } from './edge-figures.ts';
import { SLOT } from './ledger.ts';
import type { IsolatedForm } from './stages/isolated.ts';
import type { StageState } from './stages/state.ts';
import { deadTimeEnergy, hardEdgeEnergy, overlapEnergy } from './switches/index.ts';

const HIGH_OVERLAP = SLOT['highSwitch.overlap'];
const HIGH_OUTPUT = SLOT['highSwitch.outputCharge'];
const HIGH_GATE = SLOT['highSwitch.gate'];
const LOW_OUTPUT = SLOT['lowSwitch.outputCharge'];
const LOW_RECOVERY = SLOT['lowSwitch.recovery'];
const LOW_DEAD_TIME = SLOT['lowSwitch.deadTime'];
const LOW_GATE = SLOT['lowSwitch.gate'];
const DRIVE_SUPPLY = SLOT['controller.driveSupply'];

/**
 * Adds the switching losses of all active phases at `state` to `ledger`, W.
 * @source rohm-aek59; each term names its own
 * @valid as `Stage.addEdgeLosses`
 */
export function addIsolatedEdges(form: IsolatedForm, design: Design, state: StageState, ledger: Float64Array): void {
  addPrimary(form, design, state, ledger);
  if (design.phaseShifted) addShiftedEdges(form, design, state, ledger);
  else addRestingEdges(form, design, state, ledger);
  addRectifiers(form, design, state, ledger);
  addGates(form, design, state, ledger);
}

/**
 * Cycles a second of one switch, all active phases.
 * @derivation a choke behind a rectified wave sees two pulses for one cycle of each switch
 * @valid effective frequency ≥ 0
 */
function cycles(form: IsolatedForm, state: StageState): number {
  const perCycle = form.doubleEnded && !form.doubler ? 0.5 : 1;
  return state.frequency * perCycle * state.activePhases;
}

/**
 * Turn-off overlap of the primary switches.
 * @source rohm-aek59: ½·V·I·t·f at peak plus magnetizing current
 * @valid hard turn-off
 */
function addPrimary(form: IsolatedForm, design: Design, state: StageState, ledger: Float64Array): void {
  const { highEdges: high, transformer } = design;
  const current = state.peakCurrent / transformer.ratio + state.magnetizingPeak;
  const devices = cycles(form, state) * state.highDevices;
  const time = high.offTime + high.offSlope * current;
  ledger[HIGH_OVERLAP] += devices * overlapEnergy(state.inputVoltage, current, time);
}

/**
 * Turn-on from where the node rests between the rails.
 * @source kasper-2016: charge of a partner at half the input
 * @valid node at half the input before the edge
 */
function addRestingEdges(form: IsolatedForm, design: Design, state: StageState, ledger: Float64Array): void {
  const { highEdges: high, transformer } = design;
  const current = state.valleyCurrent / transformer.ratio;
  const devices = cycles(form, state) * state.highDevices;
  high.volts = 0.5 * state.inputVoltage;
  lookUpBus(high);
  const { charge, energy, volts } = high;
  ledger[HIGH_OVERLAP] += devices * overlapEnergy(volts, current, high.onTime + high.onSlope * current);
  // A leg's partner is charged with each turn-on; a two-switch stage has clamp diodes there instead, far smaller.
  ledger[HIGH_OUTPUT] += devices * (form.doubleEnded ? hardEdgeEnergy(charge, energy, energy, volts) : energy);
}

/**
 * Edges of a shifted bridge. The leading leg is moved by the choke's current and always arrives; the lagging one has only the
 * leakage's energy, ½·L·I² against Q·V (Sabaté 1990), and pays for the part of the swing that is left. Half the devices each.
 * @source sabate-1990: ½·Llk·I² against the charge of the leg
 * @valid dead time of a quarter of the leakage's ringing
 */
function addShiftedEdges(form: IsolatedForm, design: Design, state: StageState, ledger: Float64Array): void {
  const { highEdges: high, transformer } = design;
  const current = state.peakCurrent / transformer.ratio + state.magnetizingPeak;
  const devices = cycles(form, state) * state.highDevices;
  high.volts = state.inputVoltage;
  lookUpBus(high);
  const { charge, energy, volts } = high;
  const stored = 0.5 * transformer.leakage * current * current;
  const left = Math.max(0, 1 - stored / (charge * volts));
  ledger[HIGH_OUTPUT] += 0.5 * devices * left * hardEdgeEnergy(charge, energy, energy, volts);
}

/**
 * Recovery, charge and dead-time loss of the rectifiers.
 * @derivation charging C through L from V and damping the rest costs Q·V; recovery Qrr·V; body diode in the gaps
 * @valid ringing damped within the pulse
 */
function addRectifiers(form: IsolatedForm, design: Design, state: StageState, ledger: Float64Array): void {
  const { lowEdges: low, driver } = design;
  const devices = cycles(form, state) * state.lowDevices;
  low.volts = state.rectifierVoltage;
  lookUpBus(low);
  const { charge, volts } = low;
  const each = form.centreTap ? 0.5 : 1;
  const before = each * Math.max(0, state.valleyCurrent);
  const after = each * Math.max(0, state.peakCurrent);
  ledger[LOW_RECOVERY] += devices * volts * low.recovery * before;
  // Charging a capacitance from a voltage through an inductance and damping the ringing costs Q·V in all.
  ledger[LOW_OUTPUT] += devices * charge * volts;
  const gap = driver.deadTime;
  ledger[LOW_DEAD_TIME] +=
    devices * (deadTimeEnergy(low.bodyDrop, before, gap, 0) + deadTimeEnergy(low.bodyDrop, after, gap, 0));
}

/**
 * Gate losses; a linear drive supply burns the rest of the input in the driver.
 * @source rohm-aek59: Q·V·f
 * @valid whole gate charge each cycle
 */
function addGates(form: IsolatedForm, design: Design, state: StageState, ledger: Float64Array): void {
  const { highEdges, lowEdges, driver } = design;
  const rate = cycles(form, state);
  const high = rate * state.highDevices * highEdges.gateCharge;
  const low = rate * state.lowDevices * lowEdges.gateCharge;
  ledger[HIGH_GATE] += high * driver.driveVoltage;
  ledger[LOW_GATE] += low * driver.driveVoltage;
  const drop = state.inputVoltage - driver.driveVoltage;
  if (driver.linearDriveSupply && drop > 0) ledger[DRIVE_SUPPLY] += (high + low) * drop;
}
