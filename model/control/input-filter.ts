/** The L–C input filter: attenuation, parallel damping, and Middlebrook's check against the converter's negative resistance. */

/**
 * Characteristic impedance, Ω: √(L/C). `inductance` H, `capacitance` F.
 * @source middlebrook-1976, input filter design
 * @valid both above 0
 * @example filterImpedance(1e-6, 1e-4) = 0.1
 */
export function filterImpedance(inductance: number, capacitance: number): number {
  return Math.sqrt(inductance / capacitance);
}

/**
 * Corner frequency, Hz: 1/(2π·√(L·C)). `inductance` H, `capacitance` F.
 * @source middlebrook-1976
 * @valid both above 0
 * @example filterCorner(1e-6, 1e-4) = 15915.494
 */
export function filterCorner(inductance: number, capacitance: number): number {
  return 1 / (2 * Math.PI * Math.sqrt(inductance * capacitance));
}

/**
 * Peak output impedance, Ω, with the best parallel R–C damping of blocking capacitance n·C: √(L/C)·√(2·(2 + n))/n. `impedance` √(L/C) Ω, `ratio` n.
 * @source erickson-maksimovic-2001, chapter 10 (optimum parallel damping of an input filter)
 * @valid n above 0, best resistance from `dampingResistance`
 * @example dampedPeak(1, 4) = 0.8660254
 */
export function dampedPeak(impedance: number, ratio: number): number {
  return (impedance * Math.sqrt(2 * (2 + ratio))) / ratio;
}

/**
 * Best damping resistance, Ω, in series with n·C: √(L/C)·√[(2 + n)(4 + 3·n)/(2·n²·(4 + n))]. `impedance` Ω, `ratio` n.
 * @source erickson-maksimovic-2001, chapter 10
 * @valid n above 0
 * @example dampingResistance(1, 4) = 0.61237
 */
export function dampingResistance(impedance: number, ratio: number): number {
  return impedance * Math.sqrt(((2 + ratio) * (4 + 3 * ratio)) / (2 * ratio * ratio * (4 + ratio)));
}

/**
 * Largest output impedance the filter may show, Ω: a third of the converter's input resistance Vi²/P at the lowest input.
 * `inputMinimum` V, `power` W drawn.
 * @source middlebrook-1976
 * @valid tightly regulated output
 * @example filterImpedanceLimit(36, 100) = 4.32
 */
export function filterImpedanceLimit(inputMinimum: number, power: number): number {
  return (inputMinimum * inputMinimum) / (3 * power);
}

/**
 * Ripple at the source, V peak to peak, of the fundamental: bank ripple times the attenuation 1/((f/f0)² − 1) of filter inductance and
 * source-side capacitance, f0 their corner. `bankRipple` V, `frequency` Hz of the ripple, `corner` f0 Hz; not below the corner: NaN there.
 * @derivation undamped L–C divider well above its resonance
 * @valid frequency above the corner
 * @example filteredRipple(0.2, 3e5, 3e4) = 0.0020202
 */
export function filteredRipple(bankRipple: number, frequency: number, corner: number): number {
  const ratio = frequency / corner;
  return ratio > 1 ? bankRipple / (ratio * ratio - 1) : Number.NaN;
}
