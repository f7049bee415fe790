/** A rectifier diode: Schottky or fast junction. */
import type { Part } from './common.ts';

export interface Diode extends Part {
  readonly technology: 'schottky' | 'junction';
  /** Rated reverse voltage, V. */
  readonly voltageRating: number;
  /** Rated mean forward current, A. */
  readonly currentRating: number;
  /** Forward drop at zero current of the straight-line law at 25 °C, V. */
  readonly forwardDrop: number;
  /** Slope of the straight-line law, Ω. */
  readonly slopeResistance: number;
  /** Change of the drop per kelvin, V/K (negative). */
  readonly dropTempco: number;
  /** Junction charge at `chargeVoltage`, C. */
  readonly junctionCharge: number;
  /** V. */
  readonly chargeVoltage: number;
  /** Recovery charge at `recoveryCurrent`, C; 0 for Schottky. */
  readonly recoveryCharge: number;
  /** A. */
  readonly recoveryCurrent: number;
  /** Reverse current at rated voltage and 25 °C, A; it doubles every `leakageDoubling` kelvin. */
  readonly leakage: number;
  /** K. */
  readonly leakageDoubling: number;
  /** Junction to board, K/W. */
  readonly thermalResistance: number;
  /** Highest junction temperature, K. */
  readonly maximumJunction: number;
}
