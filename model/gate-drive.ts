/** Edges and gates as a controller drives them: overlap energy of one switch position, gate loss of a set of switches. */
import { SLOT } from './ledger.ts';
import type { Driver } from './parts/power-stage.ts';
import type { Switch } from './parts/switch.ts';
import { edgeTime, gateChargeAfterSwing, gateChargeAt, overlapEnergy, sharedGateResistance } from './switches/index.ts';

/** Energy of one turn-on overlap at `volts` and `current`, `dice` in parallel, J; none without positive current. */
export function overlapOn(row: Switch, dice: number, driver: Driver, volts: number, current: number): number {
  if (current <= 0) return 0;
  const resistance = sharedGateResistance(driver.driverSourceResistance, row.gateResistance, dice);
  const time = edgeTime(
    dice * row.gateChargeSwitch,
    dice * row.gateDrainCharge,
    driveOverPlateau(row, driver),
    resistance,
    row.commonSourceInductance / dice,
    current,
  );
  return overlapEnergy(volts, current, time);
}

/** Energy of one turn-off overlap, J; see `overlapOn`. */
export function overlapOff(row: Switch, dice: number, driver: Driver, volts: number, current: number): number {
  if (current <= 0) return 0;
  return overlapEnergy(volts, current, turnOffTime(row, dice, driver, current));
}

/** Time of the turn-off edge of `dice` in parallel at `current` (A), s. */
export function turnOffTime(row: Switch, dice: number, driver: Driver, current: number): number {
  const resistance = sharedGateResistance(driver.driverSinkResistance, row.gateResistance, dice);
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
function driveOverPlateau(row: Switch, driver: Driver): number {
  return Math.max(0.1, driver.driveVoltage - row.plateauVoltage);
}

/** Gate charge of `dice` in one cycle after the node swung by `fraction` on its own, at the controller's drive, C. */
export function cycleCharge(row: Switch, dice: number, driver: Driver, fraction: number): number {
  const charge = gateChargeAfterSwing(row.gateCharge, row.gateDrainCharge, fraction);
  return dice * gateChargeAt(charge, row.driveVoltage, driver.driveVoltage);
}

/**
 * Adds gate losses: `high` and `low` are gate charges a second of the two positions, A. A linear drive supply burns the rest of
 * `inputVoltage` (V) in the driver.
 */
export function addGateLosses(
  ledger: Float64Array,
  driver: Driver,
  inputVoltage: number,
  high: number,
  low: number,
): void {
  ledger[SLOT['highSwitch.gate']] += high * driver.driveVoltage;
  ledger[SLOT['lowSwitch.gate']] += low * driver.driveVoltage;
  if (!driver.linearDriveSupply) return;
  const drop = inputVoltage - driver.driveVoltage;
  ledger[SLOT['controller.driveSupply']] += drop > 0 ? (high + low) * drop : 0;
}
