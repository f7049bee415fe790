/** A rectifier diode: forward, leakage and junction-charge loss. */
import { expAt } from '../../optimizer/maths/index.ts';

const scratch = new Float64Array(1);
/** Temperature that diode rows hold for, K. */
const REFERENCE = 298.15;

/**
 * Forward loss, W: (V0 + k·(T − 298.15))·mean(I) + R·mean(I²), not below zero drop. `drop` V0 in V, `tempco` k in V/K,
 * `slopeResistance` R in Ω, `meanCurrent` A, `meanSquareCurrent` A², `temperature` K.
 * @source erickson-maksimovic-2001, chapter 3 (diode as voltage source and resistance)
 * @valid straight-line law near the rated current
 * @example diodeForwardLoss(0.4, 0, 0.02, 5, 30, 298.15) = 2.6
 */
export function diodeForwardLoss(
  drop: number,
  tempco: number,
  slopeResistance: number,
  meanCurrent: number,
  meanSquareCurrent: number,
  temperature: number,
): number {
  const hot = drop + tempco * (temperature - REFERENCE);
  return Math.max(hot, 0) * meanCurrent + slopeResistance * meanSquareCurrent;
}

/**
 * Forward drop at one current, V: V0 + k·(T − 298.15) + R·I. Arguments as `diodeForwardLoss`; `current` A.
 * @source erickson-maksimovic-2001, chapter 3
 * @valid current ≥ 0
 * @example diodeDrop(0.4, 0, 0.02, 5, 298.15) = 0.5
 */
export function diodeDrop(
  drop: number,
  tempco: number,
  slopeResistance: number,
  current: number,
  temperature: number,
): number {
  const hot = drop + tempco * (temperature - REFERENCE);
  return Math.max(hot, 0) + slopeResistance * current;
}

/**
 * Leakage loss, W: V·I25·2^((T − 298.15)/doubling)·share. `reverseVoltage` V, `leakage` A at rated voltage and 25 °C,
 * `doubling` K, `share` 0 … 1 of the time spent in reverse, `temperature` K. The rated-voltage figure is an upper bound.
 * @derivation the row states the doubling: I(T) = I25·2^((T − 298.15)/doubling)
 * @valid 250 K to 450 K
 * @example diodeLeakageLoss(30, 1e-4, 12, 0.5, 322.15) = 0.006
 */
export function diodeLeakageLoss(
  reverseVoltage: number,
  leakage: number,
  doubling: number,
  share: number,
  temperature: number,
): number {
  scratch[0] = (Math.LN2 * (temperature - REFERENCE)) / doubling;
  expAt(scratch, 0);
  return reverseVoltage * leakage * scratch[0] * share;
}

/**
 * Energy that one hard edge burns in charging a diode's junction by the square-root law, J: Q·V − E with Q ∝ √V and
 * E = Q·V/3: two thirds of Q·V. `charge` C at `testVoltage` V, `voltage` V.
 * @source kasper-2016, section II (partner's share of a hard edge) with the abrupt-junction law
 * @valid Schottky and abrupt junctions
 * @example diodeChargeEnergy(2e-8, 40, 10) = 6.6666667e-8
 */
export function diodeChargeEnergy(charge: number, testVoltage: number, voltage: number): number {
  return (2 / 3) * charge * Math.sqrt(Math.max(0, voltage) / testVoltage) * voltage;
}
