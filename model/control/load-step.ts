/** Output excursion at a load step: charge that the phases cannot yet bring comes from, or goes into, the bank. */

/**
 * Excursion by closed form, V, of a bank C with series resistance R under an instant step ΔI that the inductors follow with
 * slew v/L: for R·C ≤ L·ΔI/v it is L·ΔI²/(2·C·v) + v·C·R²/(2·L), else R·ΔI. `step` A, `inductance` L/N H, `voltage` v V: Vo at
 * release, Vi·Dmax − Vo at application. `capacitance` F, `resistance` Ω.
 * @source slus660h, equation 22 (there without the half, on purpose)
 * @valid ideal control: the duty goes to its limit at once
 * @example stepExcursion(10, 1e-6, 1.5, 8.33e-4, 0) = 0.040016
 */
export function stepExcursion(
  step: number,
  inductance: number,
  voltage: number,
  capacitance: number,
  resistance: number,
): number {
  const time = (inductance * step) / voltage;
  if (resistance * capacitance > time) return resistance * step;
  const charge = (0.5 * time * step) / capacitance;
  return charge + (voltage * capacitance * resistance * resistance) / (2 * inductance);
}

/**
 * Excursion with a slewing load, V: the bank must carry offset + min(ΔI, k·t) − m·max(0, t − td), k the load's and m the phases'
 * slew, until that is zero. The output moves by q/C + R·i + ESL·di/dt; the worst of corner points and parabola tops counts.
 * `step` ΔI A, `loadSlew` k A/s (Infinity for an instant step), `phaseSlew` m A/s (v over L/N), `delay` td s until the phases react at
 * the worst instant, `capacitance` F, `resistance` Ω, `inductance` H of the bank, `offset` A: half the peak-to-peak summed ripple,
 * which the phases lack at the worst instant.
 * @derivation piecewise-linear capacitor current, integrated exactly; instant slew and no delay give `stepExcursion`
 * @valid phaseSlew > 0, loadSlew > 0
 * @example slewedExcursion(10, Infinity, 1.5e6, 0, 8.33e-4, 0, 0, 0) = 0.040016
 * @example slewedExcursion(10, 1e6, 1e6, 1e-6, 1e-3, 0, 0, 0) = 0.01
 */
export function slewedExcursion(
  step: number,
  loadSlew: number,
  phaseSlew: number,
  delay: number,
  capacitance: number,
  resistance: number,
  inductance: number,
  offset: number,
): number {
  const given = [step, loadSlew, phaseSlew, delay, capacitance, resistance, inductance, offset];
  given.forEach((value, i) => {
    scratch[i] = value;
  });
  slewedExcursionAt(scratch);
  return scratch[0];
}

const scratch = new Float64Array(8);

/**
 * Replaces `a[0]` by that excursion, the arguments of `slewedExcursion` standing in `a[0 … 7]`: no double crosses the call.
 * @derivation as `slewedExcursion`
 * @valid as `slewedExcursion`
 */
export function slewedExcursionAt(a: Float64Array): void {
  const step = a[0];
  const loadSlew = a[1];
  const phaseSlew = a[2];
  const delay = a[3];
  const capacitance = a[4];
  const resistance = a[5];
  const inductance = a[6];
  const offset = a[7];
  const ramp = step / loadSlew;
  const first = Math.min(ramp, delay);
  const second = Math.max(ramp, delay);
  let current = ramp > 0 ? offset : offset + step;
  let charge = 0;
  let worst = resistance * current;
  // Three pieces: up to the first of (load has settled, phases react), up to the second, and the recovery.
  for (let piece = 0; piece < 3; piece++) {
    const loading = piece === 0 ? ramp > 0 : piece === 1 && ramp > delay;
    const reacting = piece === 2 || (piece === 0 ? delay <= 0 : delay <= ramp);
    const slope = (loading ? loadSlew : 0) - (reacting ? phaseSlew : 0);
    const whole = piece === 0 ? first : piece === 1 ? second - first : Number.POSITIVE_INFINITY;
    const length = slope < 0 ? Math.min(whole, -current / slope) : whole;
    if (!(length > 0)) continue;
    const corner = inductance * slope;
    const top = slope < 0 ? -current / slope - resistance * capacitance : 0;
    if (top > 0 && top < length) {
      const q = charge + (current + 0.5 * slope * top) * top;
      worst = Math.max(worst, q / capacitance + resistance * (current + slope * top) + corner);
    }
    charge += (current + 0.5 * slope * length) * length;
    current += slope * length;
    worst = Math.max(worst, charge / capacitance + resistance * current + corner);
  }
  a[0] = worst;
}

/**
 * Excursion that the loop's bandwidth leaves, V: ΔI/(2π·fc·C). `step` A, `crossover` fc Hz, `capacitance` F.
 * @derivation closed-loop output impedance near crossover is that of the bank, 1/(2π·fc·C)
 * @valid bank's resistance small at crossover
 * @example bandwidthExcursion(10, 5e4, 1e-3) = 0.0318310
 */
export function bandwidthExcursion(step: number, crossover: number, capacitance: number): number {
  return step / (2 * Math.PI * crossover * capacitance);
}

/**
 * Highest crossover a loop may have, Hz: min(k·N·f, f/3); unequal phases alias at f, so N does not raise the second bound.
 * `frequency` f Hz of one phase, `phases` N, `share` k, usually 1/10 … 1/6.
 * @source qiu-2004, aliasing of multiphase converters (sideband effect at the phase frequency)
 * @valid fixed-frequency modulation
 * @example crossoverLimit(3e5, 4, 0.1) = 1e5
 */
export function crossoverLimit(frequency: number, phases: number, share: number): number {
  return Math.min(share * phases * frequency, frequency / 3);
}

/**
 * Current noise from edge jitter, A: Vi·δt/L. `inputVoltage` V, `jitter` s, `inductance` H of one phase.
 * @derivation a late edge keeps the difference Vi on the inductor for δt longer
 * @valid jitter small against the on-time
 * @example jitterCurrent(48, 1e-9, 1e-6) = 0.048
 */
export function jitterCurrent(inputVoltage: number, jitter: number, inductance: number): number {
  return (inputVoltage * jitter) / inductance;
}

/**
 * Right-half-plane zero, rad/s, of a buck stage that runs backwards and regulates its input: Vo²/(|P|·L). `outputVoltage` V (the
 * side that feeds), `power` W, `inductance` L/N H.
 * @source erickson-maksimovic-2001, chapter 8 (right-half-plane zero of the boost: R·D'²/L)
 * @valid continuous operation
 * @example rightHalfPlaneZero(12, 120, 1e-6) = 1.2e6
 */
export function rightHalfPlaneZero(outputVoltage: number, power: number, inductance: number): number {
  return (outputVoltage * outputVoltage) / (Math.abs(power) * inductance);
}
