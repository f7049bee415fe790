/** Closed forms of capacitor ripple and ripple current: the textbook checks of the general solution. */

/**
 * Output ripple of an ideal capacitor under a triangle, V peak to peak: ΔI/(8·f·C). `rippleCurrent` A peak to peak,
 * `frequency` Hz of the ripple, `capacitance` F.
 * @source slva057, section 5.1
 * @valid no series resistance or inductance
 * @example capacitiveRipple(2, 5e5, 1e-4) = 0.005
 */
export function capacitiveRipple(rippleCurrent: number, frequency: number, capacitance: number): number {
  return rippleCurrent / (8 * frequency * capacitance);
}

/**
 * Factor of the summed ripple of N phases to one phase's: N·(D − m/N)·((m + 1)/N − D)/(D·(1 − D)), m = ⌊N·D⌋.
 * `phases` N ≥ 1, `duty` 0 < D < 1.
 * @source ltc3729, page 15 (cancellation of interleaved ripple), and slus660h equation 57 in another form
 * @valid equal phases
 * @example cancellation(2, 0.25) = 0.66666667
 */
export function cancellation(phases: number, duty: number): number {
  const m = Math.floor(phases * duty);
  return (phases * (duty - m / phases) * ((m + 1) / phases - duty)) / (duty * (1 - duty));
}

/**
 * Mean square of the input capacitor's current of an N-phase buck, A²:
 * [(N·D − m + 1)(m − N·D)/N²]·Io² + {[m²(N·D − m + 1)³ + (m − 1)²(m − N·D)³]/(12·N²·D²)}·ΔI², m = ⌈N·D⌉.
 * `phases` N, `duty` 0 < D < 1, `current` Io total A, `rippleCurrent` ΔI of one phase, A peak to peak.
 * @source isl6366, equations 49 to 51, page 38
 * @valid continuous operation, equal phases, all ac current in the capacitor
 * @example inputMeanSquare(1, 0.5, 10, 0) = 25
 */
export function inputMeanSquare(phases: number, duty: number, current: number, rippleCurrent: number): number {
  const nd = phases * duty;
  const m = Math.ceil(nd);
  const u = nd - m + 1;
  const v = m - nd;
  const dc = (u * v) / (phases * phases);
  const ramp = (m * m * u * u * u + (m - 1) * (m - 1) * v * v * v) / (12 * nd * nd);
  return dc * current * current + ramp * rippleCurrent * rippleCurrent;
}

/**
 * Voltage of an electrolytic-free input capacitor by charge alone, V peak to peak: Io·D·(1 − D)/(f·C). `current` A, `duty`,
 * `frequency` Hz, `capacitance` F.
 * @source slus660h, equation 25 (there without the 1 − D), strict form by the charge of a rectangle
 * @valid one phase, ripple current neglected
 * @example inputChargeRipple(20, 0.5, 5e5, 1e-4) = 0.1
 */
export function inputChargeRipple(current: number, duty: number, frequency: number, capacitance: number): number {
  return (current * duty * (1 - duty)) / (frequency * capacitance);
}
