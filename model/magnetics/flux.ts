/** Flux density in a core, from current or from volt-seconds, and what saturation allows. */

/**
 * Peak flux density, T: L·I/(N·Ae). `inductance` H, `current` A, `turns`, `area` m².
 * @source mclyman-2004, chapter 8
 * @valid uniform section
 * @example fluxOfCurrent(1e-5, 10, 10, 1e-4) = 0.1
 */
export function fluxOfCurrent(inductance: number, current: number, turns: number, area: number): number {
  return (inductance * current) / (turns * area);
}

/**
 * Peak-to-peak swing of flux density, T: V·t/(N·Ae). `voltage` V for `time` s on `turns`, `area` m².
 * @source ltc1698, page 16 (B = Vin·DC/(2·Np·Ae·f) is half of this swing)
 * @valid constant voltage
 * @example fluxSwing(48, 1e-6, 4, 1e-4) = 0.12
 */
export function fluxSwing(voltage: number, time: number, turns: number, area: number): number {
  return (voltage * time) / (turns * area);
}

/**
 * Saturation flux density at a temperature, T: a line through the row's values at 25 °C and 100 °C. `flux25` and `flux100` T, `temperature` K.
 * @derivation linear interpolation of the two values that data sheets print
 * @valid 273 K to 420 K
 * @example saturationFlux(0.49, 0.39, 373.15) = 0.39
 */
export function saturationFlux(flux25: number, flux100: number, temperature: number): number {
  return flux25 + ((flux100 - flux25) * (temperature - 298.15)) / 75;
}
