/** Thermal resistances, and the fixed point of a loss that grows with the temperature it makes. */

/**
 * Temperature, K, over a thermal path: ambient + P·R. `ambient` K, `power` W, `resistance` K/W.
 * @derivation definition of thermal resistance
 * @valid steady state
 * @example pathTemperature(313.15, 2, 20) = 353.15
 */
export function pathTemperature(ambient: number, power: number, resistance: number): number {
  return ambient + power * resistance;
}

/**
 * Two thermal paths side by side, K/W. Both in K/W, above 0; Infinity for a path that is not there.
 * @derivation heat flows add at the same temperature difference
 * @valid both above 0
 * @example parallelResistance(20, 20) = 10
 */
export function parallelResistance(first: number, second: number): number {
  return 1 / (1 / first + 1 / second);
}

/**
 * Junction temperature, K, of a loss P0·(1 + a·(T − 298.15)): (Ta + R·P0·(1 − 298.15·a))/(1 − R·P0·a); Infinity in runaway,
 * R·P0·a ≥ 1. `ambient` Ta K, `resistance` R K/W, `power25` P0 W at 25 °C, `tempco` a 1/K.
 * @source ltc3729, page 14 (linear rise of on-resistance), solved for the fixed point
 * @valid all of the loss grows with temperature
 * @example fixedPoint(313.15, 40, 1, 0.005) = 366.9
 */
export function fixedPoint(ambient: number, resistance: number, power25: number, tempco: number): number {
  const gain = resistance * power25 * tempco;
  if (gain >= 1) return Number.POSITIVE_INFINITY;
  return (ambient + resistance * power25 * (1 - 298.15 * tempco)) / (1 - gain);
}

/**
 * Temperature, K, where part of the loss grows: (Ta + R·(Pc + P0·(1 − a·298.15)))/(1 − R·P0·a); Infinity in runaway. `constantPower`
 * Pc W, the rest as `fixedPoint`.
 * @derivation as `fixedPoint` with a constant loss beside the growing one
 * @valid linear growth
 * @example mixedFixedPoint(313.15, 40, 0.5, 1, 0.005) = 391.9
 */
export function mixedFixedPoint(
  ambient: number,
  resistance: number,
  constantPower: number,
  power25: number,
  tempco: number,
): number {
  const gain = resistance * power25 * tempco;
  if (gain >= 1) return Number.POSITIVE_INFINITY;
  return (ambient + resistance * (constantPower + power25 * (1 - 298.15 * tempco))) / (1 - gain);
}
