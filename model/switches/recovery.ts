/** Reverse recovery of a body diode or rectifier when its partner turns on hard. */

/**
 * Recovery charge at the commutated `current` (A), C: in proportion to the current by charge control, from `charge` (C) at
 * `testCurrent` (A). Where the printed charge already holds the output charge (`holdsOutput`), `outputCharge` (C, same
 * die) is taken off first, for the hard edge counts it. None at or below zero current, so it is continuous there.
 * @derivation charge control: stored charge is forward current × carrier lifetime, so it scales with the current
 * @valid within a few times the test current; slope of current near that of the test
 * @example recoveryCharge(4e-8, 20, false, 1e-8, 10) = 2e-8
 * @example recoveryCharge(4e-8, 20, true, 1e-8, 10) = 1.5e-8
 */
export function recoveryCharge(
  charge: number,
  testCurrent: number,
  holdsOutput: boolean,
  outputCharge: number,
  current: number,
): number {
  if (current <= 0 || testCurrent <= 0) return 0;
  const own = holdsOutput ? charge - outputCharge : charge;
  return own > 0 ? (own * current) / testCurrent : 0;
}

/**
 * Recovery loss, W: V·Q·f, drawn from the bus. `voltage` V, `charge` C, `frequency` Hz.
 * @derivation the bus supplies the charge Q at its full voltage once a cycle
 * @valid hard edges
 * @example recoveryLoss(12, 1e-8, 1e6) = 0.12
 */
export function recoveryLoss(voltage: number, charge: number, frequency: number): number {
  return voltage * charge * frequency;
}

/**
 * Recovery loss from the triangle of a recovery current, W: ½·V·Irr·trr·f. `voltage` V, `peakCurrent` A, `time` s, `frequency` Hz.
 * @source rohm-64an035e, equation of recovery loss
 * @valid triangular recovery
 * @example recoveryLossTriangle(12, 2, 1e-8, 1e6) = 0.12
 */
export function recoveryLossTriangle(voltage: number, peakCurrent: number, time: number, frequency: number): number {
  return 0.5 * voltage * peakCurrent * time * frequency;
}
