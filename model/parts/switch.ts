/** A discrete switch: silicon or gallium nitride. */
import type { Part } from './common.ts';

export interface Switch extends Part {
  readonly technology: 'si' | 'gan';
  /** Rated drain-source voltage, V. */
  readonly voltageRating: number;
  /** Rated continuous drain current, A. */
  readonly currentRating: number;
  /** On-resistance at 25 °C and `driveVoltage`, Ω (highest of the row). */
  readonly onResistance: number;
  /** Rise of on-resistance over its 25 °C value per kelvin, 1/K. */
  readonly resistanceTempco: number;
  /** Factor on the on-resistance while switching (gallium nitride; 1 for silicon). */
  readonly dynamicFactor: number;
  /** Gate voltage that on-resistance and gate charge hold for, V. */
  readonly driveVoltage: number;
  /** Highest allowed gate voltage, V. */
  readonly gateRating: number;
  /** Plateau voltage at the usual current, V. */
  readonly plateauVoltage: number;
  /** Total gate charge at `driveVoltage`, C. */
  readonly gateCharge: number;
  /** Gate charge between threshold and plateau, C. */
  readonly gateChargeSwitch: number;
  /** Gate-drain charge, C. */
  readonly gateDrainCharge: number;
  /** Internal gate resistance, Ω. */
  readonly gateResistance: number;
  /** Output charge at `outputTestVoltage`, C. */
  readonly outputCharge: number;
  /** Output energy at `outputTestVoltage`, J. */
  readonly outputEnergy: number;
  /** V. */
  readonly outputTestVoltage: number;
  /** Recovery charge of the body diode at `recoveryCurrent`, C; 0 for gallium nitride. */
  readonly recoveryCharge: number;
  /** A. */
  readonly recoveryCurrent: number;
  /** Whether the printed recovery charge already contains the output charge. */
  readonly recoveryHoldsOutput: boolean;
  /** Source-drain drop while the channel is off, V. */
  readonly bodyDrop: number;
  /** Inductance common to gate and power loop, H. */
  readonly commonSourceInductance: number;
  /** Junction to board, K/W. */
  readonly thermalResistance: number;
  /** Highest junction temperature, K. */
  readonly maximumJunction: number;
}
