/** Conduction loss of a switch and the on-resistance behind it. */

/** Temperature that on-resistances of the parts tables hold for, K. */
export const RESISTANCE_REFERENCE = 298.15;

/**
 * On-resistance, Ω, of `parallel` equal dice at junction temperature `temperature` (K): R25·dynamic·(1 + a·(T − 298.15))/n.
 * `resistance25` in Ω at 25 °C, `tempco` a in 1/K, `dynamicFactor` ≥ 1 for gallium nitride while switching.
 * @source ltc3729, page 14 (linear rise of on-resistance, 0.005 per kelvin)
 * @valid 220 K to the rated junction; a from 0.003 to 0.01
 * @example onResistance(0.01, 0.005, 1, 398.15, 1) = 0.015
 */
export function onResistance(
  resistance25: number,
  tempco: number,
  dynamicFactor: number,
  temperature: number,
  parallel: number,
): number {
  return (resistance25 * dynamicFactor * (1 + tempco * (temperature - RESISTANCE_REFERENCE))) / parallel;
}

/**
 * Conduction loss, W: `currentSquare` (mean square current, A²) times `resistance` (Ω).
 * @source slus660h, pages 43 to 45 (conduction loss from rms current)
 * @valid any current
 * @example conductionLoss(350, 0.002) = 0.7
 */
export function conductionLoss(currentSquare: number, resistance: number): number {
  return currentSquare * resistance;
}
