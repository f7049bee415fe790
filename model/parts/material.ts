/** A core material. */

export interface Material {
  readonly name: string;
  readonly kind: 'MnZn' | 'NiZn' | 'powder';
  /** Loss at 100 °C under a sinusoid: k·f^α·B^β W/m³, f in Hz, B peak in T. */
  readonly lossCoefficient: number;
  /** α. */
  readonly frequencyExponent: number;
  /** β. */
  readonly fluxExponent: number;
  /** Loss over its 100 °C value: 1 + c1·θ + c2·θ², θ = T − 373.15 K; c1 in 1/K. */
  readonly lossSlope: number;
  /** c2, 1/K². */
  readonly lossCurvature: number;
  /** Range that the loss parameters hold in, Hz. */
  readonly frequencyMinimum: number;
  readonly frequencyMaximum: number;
  /** Highest peak flux density that the loss parameters hold for, T. */
  readonly fluxMaximum: number;
  /** Saturation flux density at 25 °C and at 100 °C, T. */
  readonly saturation25: number;
  readonly saturation100: number;
  /** Initial permeability (of the powder with its distributed gap). */
  readonly permeability: number;
  /** kg/m³. */
  readonly density: number;
  /** Price of one kilogram of finished core, currency. */
  readonly pricePerMass: number;
  /** Three letters of the price's currency, where the row came from a table. */
  readonly currency?: string;
}
