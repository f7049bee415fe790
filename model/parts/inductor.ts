/** A stocked inductor. */
import type { Part } from './common.ts';

export interface Inductor extends Part {
  /** Family of one size and construction; its rows differ in inductance. */
  readonly series: string;
  /** Zero-bias inductance, H. */
  readonly inductance: number;
  /** Fraction, 0.2 is ±20 %. */
  readonly tolerance: number;
  /** Current at which the inductance has fallen by `saturationDrop`, hot, A. */
  readonly saturationCurrent: number;
  /** Fraction, usually 0.2 or 0.3. */
  readonly saturationDrop: number;
  /** Exponent s of L(I) = L0/(1 + q·(I/Isat)^s), q = drop/(1 − drop): 2 … 3 for pressed powder, 6 … 10 for gapped ferrite. */
  readonly saturationExponent: number;
  /** Resistance at 25 °C, Ω (highest of the row). */
  readonly dcResistance: number;
  /** Thickness of the conductor layer across the layers, m (foil, or the square equivalent of a wire). */
  readonly conductorThickness: number;
  /** Layers of the winding, from 1. */
  readonly layers: number;
  /** Core loss P = k·f^α·ΔI^β of a sinusoid-equivalent triangle at half duty, W with f in Hz and ΔI peak to peak in A. */
  readonly coreCoefficient: number;
  /** α, 1 … 2.2. */
  readonly coreFrequencyExponent: number;
  /** β, 1.8 … 3. */
  readonly coreSwingExponent: number;
  /** Dc current that raises the part by `ratedRise`, A. */
  readonly ratedCurrent: number;
  /** K. */
  readonly ratedRise: number;
  /** Highest part temperature, K. */
  readonly maximumTemperature: number;
}
