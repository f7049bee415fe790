/** Capacitance that a ceramic capacitor really has: at bias, cold or hot, aged, at the low end of its tolerance. */
import { log10, powAt } from '../../optimizer/maths/index.ts';

const power = new Float64Array(2);

/**
 * Capacitance at dc bias, F: C·a/(1 + (V/V½)^p). `capacitance` C nominal in F, `smallSignalFactor` a, `halvingVoltage` V½ in V,
 * `biasExponent` p, `voltage` V of either sign.
 * @source derating-curves-2025 (measured curves that the two-parameter law is fitted to)
 * @valid up to the rated voltage
 * @example ceramicCapacitance(1e-5, 0.8, 10, 2, 10) = 4e-6
 */
export function ceramicCapacitance(
  capacitance: number,
  smallSignalFactor: number,
  halvingVoltage: number,
  biasExponent: number,
  voltage: number,
): number {
  power[0] = Math.abs(voltage) / halvingVoltage;
  power[1] = biasExponent;
  powAt(power, 0);
  return (capacitance * smallSignalFactor) / (1 + power[0]);
}

/**
 * Factor of the worst case on the capacitance at bias: (1 − tolerance)·(1 − temperature drop)·(1 − ageing·log10(hours)).
 * `tolerance` and `temperatureDrop` fractions, `ageing` fraction per decade of hours, `hours` since the last heating, ≥ 1.
 * Constant for a part: take it out of the hot path.
 * @derivation the three losses are stated by the row and independent: they multiply
 * @valid hours ≥ 1
 * @example ceramicWorstFactor(0.1, 0.1, 0.02, 10000) = 0.7452
 */
export function ceramicWorstFactor(tolerance: number, temperatureDrop: number, ageing: number, hours: number): number {
  const aged = 1 - ageing * log10(Math.max(1, hours));
  return (1 - tolerance) * (1 - temperatureDrop) * Math.max(0, aged);
}
