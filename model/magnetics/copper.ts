/** Copper: resistivity with temperature, skin depth, resistance of a conductor. */

/** Resistivity of annealed copper at 20 °C, Ω·m: 1/58 Ω·mm²/m. */
export const COPPER_RESISTIVITY = 1e-6 / 58;
/** Temperature coefficient at 20 °C, 1/K. */
export const COPPER_TEMPCO = 0.00393;
/** kg/m³. */
export const COPPER_DENSITY = 8890;
/** Vacuum permeability, H/m. */
export const MU0 = 4e-7 * Math.PI;

/**
 * Resistivity of copper, Ω·m, at `temperature` K: (1/58)·10⁻⁶·(1 + 0.00393·(T − 293.15)).
 * @source iec-60028, clause on standard annealed copper
 * @valid 230 K to 430 K
 * @example copperResistivity(373.15) = 2.266207e-8
 */
export function copperResistivity(temperature: number): number {
  return COPPER_RESISTIVITY * (1 + COPPER_TEMPCO * (temperature - 293.15));
}

/**
 * Skin depth, m: √(ρ/(π·f·µ0)). `resistivity` Ω·m, `frequency` Hz.
 * @source hurley-2000, section II
 * @valid non-magnetic conductors
 * @example skinDepth(1.7241379e-8, 1e5) = 2.08981e-4
 */
export function skinDepth(resistivity: number, frequency: number): number {
  return Math.sqrt(resistivity / (Math.PI * frequency * MU0));
}

/**
 * Direct-current resistance of a conductor, Ω: ρ·l/A. `resistivity` Ω·m, `length` m, `area` m².
 * @derivation Ohm's law for a uniform conductor
 * @valid area above 0
 * @example wireResistance(1.7241379e-8, 1, 1e-6) = 0.017241379
 */
export function wireResistance(resistivity: number, length: number, area: number): number {
  return (resistivity * length) / area;
}
