/** A ceramic capacitor. */
import type { Part } from './common.ts';

export interface Ceramic extends Part {
  /** Dielectric class code of IEC 60384-21/-22 and EIA-198, such as X5R, X7R, C0G. */
  readonly dielectric: string;
  /** Nominal capacitance, F. */
  readonly capacitance: number;
  /** Fraction. */
  readonly tolerance: number;
  /** V. */
  readonly voltageRating: number;
  /** Bias V½ at which the capacitance has halved, V, of C(V) = C·a/(1 + (V/V½)^p). */
  readonly halvingVoltage: number;
  /** p, 1 … 4. */
  readonly biasExponent: number;
  /** a, capacitance at zero dc bias and small signal over nominal, 0.5 … 1. */
  readonly smallSignalFactor: number;
  /** Largest loss of capacitance over the temperature range, fraction. */
  readonly temperatureDrop: number;
  /** Loss of capacitance per decade of hours, fraction. */
  readonly ageing: number;
  /** Ω, at hundreds of kilohertz. */
  readonly seriesResistance: number;
  /** H. */
  readonly seriesInductance: number;
  /** Rated ripple current, A rms. */
  readonly rippleRating: number;
}
