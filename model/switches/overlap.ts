/** Overlap of voltage and current while a switch turns on or off. */

/**
 * Time of a switching edge, s. The gate passes `chargeSwitch` (Qgs2, C) while the current moves and `chargeDrain` (Qgd, C)
 * while the voltage moves, from `driveOverPlateau` (V: Vdrive − Vplateau at turn-on, Vplateau at turn-off) through
 * `gateResistance` (Ω); the current's slope over `sourceInductance` (H, common to gate and power loop) opposes the drive.
 * From Qgs2 = ∫Ig dt with Ig = (V − Ls·I/t)/R: t = (Qgs2·R + Ls·I)/V + Qgd·R/V. `current` is the switched current
 * of one die, A. For dice in parallel give the summed charges and `sharedGateResistance`.
 * @source ren-2006, section III (gate current lowered by the common-source inductance)
 * @valid positive drive over the plateau; `current` ≥ 0
 * @example edgeTime(2e-9, 3e-9, 2, 2, 0, 20) = 5e-9
 * @example edgeTime(2e-9, 3e-9, 2, 2, 1e-10, 20) = 6e-9
 */
export function edgeTime(
  chargeSwitch: number,
  chargeDrain: number,
  driveOverPlateau: number,
  gateResistance: number,
  sourceInductance: number,
  current: number,
): number {
  return ((chargeSwitch + chargeDrain) * gateResistance + sourceInductance * current) / driveOverPlateau;
}

/**
 * Gate resistance, Ω, that the total charge of `parallel` dice sees: one driver of `driverResistance` (Ω) feeds all gates,
 * each with its own `internalResistance` (Ω).
 * @derivation the driver is shared, the internal resistances are parallel
 * @valid parallel ≥ 1
 * @example sharedGateResistance(2, 1.5, 3) = 2.5
 */
export function sharedGateResistance(driverResistance: number, internalResistance: number, parallel: number): number {
  return driverResistance + internalResistance / parallel;
}

/**
 * Energy of one overlap, J: ½·V·I·t with `voltage` V, `current` A (valley at turn-on, peak at turn-off; none below zero), `time` s.
 * @source rohm-64an035e, equation of switching loss (½·V·I·(tr + tf)·f)
 * @valid straight edges
 * @example overlapEnergy(12, 3, 1e-8) = 1.8e-7
 */
export function overlapEnergy(voltage: number, current: number, time: number): number {
  return current > 0 ? 0.5 * voltage * current * time : 0;
}

/**
 * Power of overlaps by the Miller-capacitance form, W: V²·(I/2)·R·C·[1/(Vdr − Vth) + 1/Vth]·f.
 * `voltage` V, `current` A, `driverResistance` Ω, `millerCapacitance` F, `driveVoltage` V, `thresholdVoltage` V, `frequency` Hz.
 * Not used by the search: the second opinion on `overlapEnergy`.
 * @source ltc3729, page 14
 * @valid driveVoltage above thresholdVoltage
 * @example overlapLossMiller(10, 2, 2, 1e-10, 5, 2.5, 1e6) = 0.016
 */
export function overlapLossMiller(
  voltage: number,
  current: number,
  driverResistance: number,
  millerCapacitance: number,
  driveVoltage: number,
  thresholdVoltage: number,
  frequency: number,
): number {
  const inverse = 1 / (driveVoltage - thresholdVoltage) + 1 / thresholdVoltage;
  return voltage * voltage * 0.5 * current * driverResistance * millerCapacitance * inverse * frequency;
}
