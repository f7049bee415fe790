/** Edges and gates as a controller drives them: overlap energy of one switch position, gate loss of a set of switches. */
import { SLOT } from './ledger.ts';
import type { Controller } from './parts/controller.ts';
import type { Switch } from './parts/switch.ts';
import { edgeTime, gateChargeAfterSwing, gateChargeAt, overlapEnergy, sharedGateResistance } from './switches/index.ts';

/** Energy of one turn-on overlap at `volts` and `current`, `dice` in parallel, J; none without positive current. */
export function overlapOn(row: Switch, dice: number, controller: Controller, volts: number, current: number): number {
  if (current <= 0) return 0;
  const resistance = sharedGateResistance(controller.driverSourceResistance, row.gateResistance, dice);
  const time = edgeTime(
    dice * row.gateChargeSwitch,
    dice * row.gateDrainCharge,
    driveOverPlateau(row, controller),
    resistance,
    row.commonSourceInductance / dice,
    current,
  );
  return overlapEnergy(volts, current, time);
}

/** Energy of one turn-off overlap, J; see `overlapOn`. */
export function overlapOff(row: Switch, dice: number, controller: Controller, volts: number, current: number): number {
  if (current <= 0) return 0;
  return overlapEnergy(volts, current, turnOffTime(row, dice, controller, current));
}

/** Time of the turn-off edge of `dice` in parallel at `current` (A), s. */
export function turnOffTime(row: Switch, dice: number, controller: Controller, current: number): number {
  const resistance = sharedGateResistance(controller.driverSinkResistance, row.gateResistance, dice);
  return edgeTime(
    dice * row.gateChargeSwitch,
    dice * row.gateDrainCharge,
    row.plateauVoltage,
    resistance,
    row.commonSourceInductance / dice,
    current,
  );
}

/** Drive above the plateau, V; at least a tenth of a volt, so that a controller that cannot drive a row stays finite. */
function driveOverPlateau(row: Switch, controller: Controller): number {
  return Math.max(0.1, controller.driveVoltage - row.plateauVoltage);
}

/** Gate charge of `dice` in one cycle after the node swung by `fraction` on its own, at the controller's drive, C. */
export function cycleCharge(row: Switch, dice: number, controller: Controller, fraction: number): number {
  const charge = gateChargeAfterSwing(row.gateCharge, row.gateDrainCharge, fraction);
  return dice * gateChargeAt(charge, row.driveVoltage, controller.driveVoltage);
}

/**
 * Adds gate losses: `high` and `low` are gate charges a second of the two positions, A. A linear drive supply burns the rest of
 * `inputVoltage` (V) in the controller.
 */
export function addGateLosses(
  ledger: Float64Array,
  controller: Controller,
  inputVoltage: number,
  high: number,
  low: number,
): void {
  ledger[SLOT['highSwitch.gate']] += high * controller.driveVoltage;
  ledger[SLOT['lowSwitch.gate']] += low * controller.driveVoltage;
  if (!controller.linearDriveSupply) return;
  const drop = inputVoltage - controller.driveVoltage;
  ledger[SLOT['controller.driveSupply']] += drop > 0 ? (high + low) * drop : 0;
}
