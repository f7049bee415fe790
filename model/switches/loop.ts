/** The power loop's inductance: energy lost at turn-off and overshoot of the switch voltage. */

/**
 * Energy lost each turn-off, J: ½·L·I². `inductance` H of the loop, `current` A.
 * @source ren-2006, section III (loop inductance)
 * @valid no clamp returns the energy
 * @example loopEnergy(1e-9, 20) = 2e-7
 */
export function loopEnergy(inductance: number, current: number): number {
  return 0.5 * inductance * current * current;
}

/**
 * Overshoot of the switch voltage, V: I·√(L/C), the resonance of the loop with the output capacitance.
 * `current` A at the edge, `inductance` H, `capacitance` F (charge-equivalent, at the bus).
 * @derivation an undamped series L–C with initial current I peaks at I·√(L/C) above its final value
 * @valid undamped: an upper bound
 * @example overshoot(10, 1e-9, 1e-9) = 10
 */
export function overshoot(current: number, inductance: number, capacitance: number): number {
  return Math.abs(current) * Math.sqrt(inductance / capacitance);
}
