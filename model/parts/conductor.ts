/** A conductor to wind with: solid round wire, foil as wide as the window, or litz wire. */

export interface Conductor {
  readonly name: string;
  readonly kind: 'solid' | 'foil' | 'litz';
  /** Diameter of the bare wire or of one bare strand; thickness of the bare foil, m. */
  readonly size: number;
  /** Strands; 1 for solid and foil. */
  readonly strands: number;
  /** Outer diameter, or thickness, with insulation, m. */
  readonly outerSize: number;
  /** Price of one kilogram of copper in this form, currency. */
  readonly pricePerMass: number;
  /** Three letters of the price's currency, where the row came from a table. */
  readonly currency?: string;
}
