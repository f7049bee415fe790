/** A bulk capacitor: polymer, wet electrolytic or film. */
import type { Part } from './common.ts';

export interface Bulk extends Part {
  readonly technology: 'polymer' | 'electrolytic' | 'film';
  /** F. */
  readonly capacitance: number;
  /** Fraction. */
  readonly tolerance: number;
  /** V. */
  readonly voltageRating: number;
  /** Ω at 100 kHz, 20 °C, end of life. */
  readonly seriesResistance: number;
  /** H. */
  readonly seriesInductance: number;
  /** A rms at 100 kHz and `maximumTemperature`. */
  readonly rippleRating: number;
  /** K of self-heating at rated ripple current. */
  readonly ratedRise: number;
  /** K. */
  readonly maximumTemperature: number;
  /** Life at `maximumTemperature`, s. */
  readonly ratedLife: number;
}
