/** Power that gate drive takes. */

/**
 * Gate drive power, W: Q·V·f. `charge` C per cycle, `supplyVoltage` V: the drive voltage, or the input where a linear
 * supply feeds the driver (its whole drop is lost), `frequency` Hz.
 * @source rohm-64an035e, equation of gate charge loss
 * @valid every cycle charges and discharges the gate fully
 * @example gateLoss(1e-9, 5, 2e6) = 0.01
 */
export function gateLoss(charge: number, supplyVoltage: number, frequency: number): number {
  return charge * supplyVoltage * frequency;
}

/**
 * Gate charge per cycle, C, when the node has swung by `fraction` (0 … 1) before turn-on: Qg − fraction·Qgd, for the drain
 * no longer moves against the gate. `gateCharge` C, `drainCharge` C.
 * @source kasper-2016, section IV (gate charge at zero-voltage turn-on)
 * @valid 0 ≤ fraction ≤ 1
 * @example gateChargeAfterSwing(5e-9, 1e-9, 1) = 4e-9
 */
export function gateChargeAfterSwing(gateCharge: number, drainCharge: number, fraction: number): number {
  return gateCharge - fraction * drainCharge;
}

/**
 * Gate charge scaled from the row's drive voltage to another, C: in proportion, for above the plateau the gate is a
 * constant capacitance. `charge` C at `rowVoltage` V, wanted at `driveVoltage` V.
 * @derivation constant input capacitance between the row's drive voltage and the controller's
 * @valid within ±30 % of the row's drive voltage
 * @example gateChargeAt(1e-8, 5, 6) = 1.2e-8
 */
export function gateChargeAt(charge: number, rowVoltage: number, driveVoltage: number): number {
  return (charge * driveVoltage) / rowVoltage;
}
