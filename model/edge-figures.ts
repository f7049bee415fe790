/**
 * What the edges and gates of one switch position cost, as far as it does not depend on the operating point: worked out once a
 * design, so that a point pays a few products. Charge and energy of the node are kept for each bus voltage that comes again.
 */
import type { Diode } from './parts/diode.ts';
import type { Driver } from './parts/power-stage.ts';
import type { Switch } from './parts/switch.ts';
import {
  edgeTime,
  gateChargeAfterSwing,
  gateChargeAt,
  OUTPUT_CHARGE,
  OUTPUT_ENERGY,
  outputInPlaceAt,
  recoveryCharge,
  sharedGateResistance,
} from './switches/index.ts';

/** Bus voltages that are kept for a design: the corners of the input. */
const LINES = 4;
/** Least drive above the plateau, V, so that a controller that cannot drive a row stays finite. */
const LEAST_DRIVE = 0.1;

const output = new Float64Array(2);
const lines = { volts: 0, charge: 1, energy: 2, recovery: 3, width: 4 } as const;

/** Figures of all dice of one position together. Filled once a design. */
export class EdgeFigures {
  row: Switch | undefined;
  dice = 1;
  /** Time of a turn-on edge, s at no current and s/A; the same of a turn-off edge. */
  onTime = 0.5;
  onSlope = 0.5;
  offTime = 0.5;
  offSlope = 0.5;
  /** Gate charge of a cycle, C, and what a whole swing of the node by itself spares of it. */
  gateCharge = 0.5;
  gateSpared = 0.5;
  /** Drop of the body diode, V. */
  bodyDrop = 0.5;
  /** p of the row's charge law Q ∝ V^p, from its stored energy (see `chargeExponent`), and 1/p. */
  exponent = 0.5;
  inverseExponent = 1.5;

  /** Bus voltage that the three below hold for, V: see `lookUpBus`. */
  volts = 0.5;
  /** Output charge, C, and energy, J, at that voltage; recovery charge over commutated current there, C/A. */
  charge = 0.5;
  energy = 0.5;
  recovery = 0.5;

  readonly kept = new Float64Array(LINES * lines.width);
  known = 0;
}

/**
 * Fills `figures` for `dice` of `row` in parallel under `driver`.
 * @source ren-2006: edge time from charge over gate current, lengthened by common-source inductance
 * @valid drive above the plateau
 */
export function prepareEdges(figures: EdgeFigures, row: Switch, dice: number, driver: Driver): void {
  figures.row = row;
  figures.dice = dice;
  figures.known = 0;
  figures.bodyDrop = row.bodyDrop;
  const charge = dice * row.gateChargeSwitch;
  const drain = dice * row.gateDrainCharge;
  const source = row.commonSourceInductance / dice;
  const drive = Math.max(LEAST_DRIVE, driver.driveVoltage - row.plateauVoltage);
  const on = sharedGateResistance(driver.driverSourceResistance, row.gateResistance, dice);
  const off = sharedGateResistance(driver.driverSinkResistance, row.gateResistance, dice);
  figures.onTime = edgeTime(charge, drain, drive, on, 0, 0);
  figures.onSlope = edgeTime(0, 0, drive, on, source, 1);
  figures.offTime = edgeTime(charge, drain, row.plateauVoltage, off, 0, 0);
  figures.offSlope = edgeTime(0, 0, row.plateauVoltage, off, source, 1);
  const whole = gateChargeAfterSwing(row.gateCharge, row.gateDrainCharge, 0);
  figures.gateCharge = dice * gateChargeAt(whole, row.driveVoltage, driver.driveVoltage);
  figures.gateSpared = dice * gateChargeAt(row.gateDrainCharge, row.driveVoltage, driver.driveVoltage);
  const share = row.outputEnergy / (row.outputCharge * row.outputTestVoltage);
  figures.exponent = share > 0 ? share / (1 - share) : 1;
  figures.inverseExponent = share > 0 ? (1 - share) / share : 1;
}

/** Brings charge, energy and recovery to the bus voltage that `figures.volts` asks for. */
export function lookUpBus(figures: EdgeFigures): void {
  const { kept, volts } = figures;
  let at = 0;
  const end = figures.known * lines.width;
  while (at < end && kept[at] !== volts) at += lines.width;
  if (at >= end) at = workOutBus(figures);
  figures.charge = kept[at + lines.charge];
  figures.energy = kept[at + lines.energy];
  figures.recovery = kept[at + lines.recovery];
}

/**
 * Works out a bus voltage that is not kept; returns its place. The last place is overwritten when all are taken.
 * @source jedec-coss; charge law through the row's charge and energy
 * @valid bus voltage > 0
 */
function workOutBus(figures: EdgeFigures): number {
  const { row, dice, kept, volts } = figures;
  if (figures.known < LINES) figures.known++;
  const at = (figures.known - 1) * lines.width;
  kept[at] = volts;
  if (row === undefined) return at;
  output[0] = volts;
  outputInPlaceAt(row, output);
  kept[at + lines.charge] = dice * output[OUTPUT_CHARGE];
  kept[at + lines.energy] = dice * output[OUTPUT_ENERGY];
  kept[at + lines.recovery] = recoveryCharge(
    row.recoveryCharge,
    row.recoveryCurrent,
    row.recoveryHoldsOutput,
    output[OUTPUT_CHARGE],
    1,
  );
  return at;
}

/**
 * Recovery charge of a rectifier diode over its commutated current, C/A.
 * @derivation charge control: stored charge is in proportion to the current
 * @valid within a few times the test current
 */
export function diodeRecovery(diode: Diode): number {
  return recoveryCharge(diode.recoveryCharge, diode.recoveryCurrent, false, 0, 1);
}
