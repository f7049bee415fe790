/** Core loss by the improved generalized Steinmetz equation, on any piecewise-linear flux and in closed forms. */
import { expAt, logAt, pow, powAt } from '../../optimizer/maths/index.ts';
import type { Waveform } from '../waveform/waveform.ts';
import { gamma } from './gamma.ts';

const power = new Float64Array(2);
const single = new Float64Array(1);

/**
 * Steinmetz loss density of a sinusoid, W/m³: k·f^α·B^β. `k`, `alpha`, `beta` of the material in SI, `frequency` Hz, `peakFlux` T.
 * @source guillod-2023, section II
 * @valid inside the material's stated range of frequency and flux
 * @example steinmetz(2, 1, 2, 1e5, 0.1) = 2000
 */
export function steinmetz(k: number, alpha: number, beta: number, frequency: number, peakFlux: number): number {
  return k * pow(frequency, alpha) * pow(peakFlux, beta);
}

/**
 * ∫|cos θ|^α dθ over a full turn: 2·√π·Γ((α + 1)/2)/Γ(α/2 + 1).
 * @source igse-2002, constant of the equation, with the integral in gamma functions
 * @valid α from 0 to 4
 * @example cosinePowerIntegral(2) = 3.14159265
 */
export function cosinePowerIntegral(alpha: number): number {
  return (2 * Math.sqrt(Math.PI) * gamma(0.5 * (alpha + 1))) / gamma(0.5 * alpha + 1);
}

/**
 * Constant ki = k/[(2π)^(α − 1)·2^(β − α)·∫|cos|^α]. `k`, `alpha`, `beta` of the sinusoidal law. Once a material.
 * @source igse-2002
 * @valid α 1 … 2.5, β 1.5 … 3.5
 * @example igseConstant(8, 2, 2) = 0.40528473
 */
export function igseConstant(k: number, alpha: number, beta: number): number {
  return k / (pow(2 * Math.PI, alpha - 1) * pow(2, beta - alpha) * cosinePowerIntegral(alpha));
}

/**
 * The same by the closed approximation k/(2^(β + 1)·π^(α − 1)·(0.2761 + 1.7061/(α + 1.354))): a second opinion.
 * @source igse-2002, approximation of the constant
 * @valid α 1 … 2, error below 0.1 %
 * @example igseConstantApproximate(8, 2, 2) = 0.405606
 */
export function igseConstantApproximate(k: number, alpha: number, beta: number): number {
  return k / (pow(2, beta + 1) * pow(Math.PI, alpha - 1) * (0.2761 + 1.7061 / (alpha + 1.354)));
}

/**
 * Writes to `into[0]` the loss density, W/m³, under the flux `flux` (T over s) of peak-to-peak swing `swing` (T):
 * ki·ΔB^(β − α)·(1/T)·Σ|B1 − B0|^α·d^(1 − α). Flat pieces lose nothing (no relaxation). Free of garbage; one power a segment.
 * @source igse-2002
 * @valid inside the material's range; major loop only, minor loops are to be split off first
 */
export function igseAt(
  ki: number,
  alpha: number,
  beta: number,
  flux: Waveform,
  swing: number,
  into: Float64Array,
): void {
  let sum = 0;
  for (let i = 0; i < flux.count; i++) {
    const d = flux.duration[i];
    const rise = Math.abs(flux.end[i] - flux.start[i]);
    if (d > 0 && rise > 0) {
      power[0] = rise / d;
      power[1] = alpha;
      powAt(power, 0);
      sum += power[0] * d;
    }
  }
  power[0] = swing;
  power[1] = beta - alpha;
  if (swing > 0) powAt(power, 0);
  into[0] = swing > 0 ? (ki * power[0] * sum) / flux.period : 0;
}

/**
 * Triangle, W/m³: ki·f^α·ΔB^β·[D^(1 − α) + (1 − D)^(1 − α)]. `ki`, `alpha`, `beta`; `frequency` Hz; `swing` T peak to peak; `duty` of the rise.
 * @source igse-2002, applied to a triangle
 * @valid 0 < duty < 1
 * @example triangleLossDensity(0.40528473, 2, 2, 1, 1, 0.5) = 1.6211389
 */
export function triangleLossDensity(
  ki: number,
  alpha: number,
  beta: number,
  frequency: number,
  swing: number,
  duty: number,
): number {
  return ki * pow(frequency, alpha) * pow(swing, beta) * (pow(duty, 1 - alpha) + pow(1 - duty, 1 - alpha));
}

/**
 * Trapezoid that rises for `ramp` of the period, rests, falls for as long and rests, W/m³: ki·f^α·ΔB^β·2·d^(1 − α).
 * Measured loss is higher where the flats are long (relaxation).
 * @source igse-2002, applied to a trapezoid; relaxation after guillod-2023 section VI
 * @valid 0 < ramp ≤ 0.5
 * @example trapezoidLossDensity(1, 2, 2, 1, 1, 0.25) = 8
 */
export function trapezoidLossDensity(
  ki: number,
  alpha: number,
  beta: number,
  frequency: number,
  swing: number,
  ramp: number,
): number {
  return ki * pow(frequency, alpha) * pow(swing, beta) * 2 * pow(ramp, 1 - alpha);
}

/**
 * Writes to `into[0]` the correction of a loss that holds for a triangle at half duty to another duty:
 * [D^(1 − α) + (1 − D)^(1 − α)]/2^α; 1 at D = 1/2. Two logarithms and two exponentials.
 * @source igse-2002, ratio of two triangles
 * @valid 0 < duty < 1
 */
export function dutyCorrectionAt(alpha: number, duty: number, into: Float64Array): void {
  single[0] = duty;
  logAt(single, 0);
  const first = (1 - alpha) * single[0];
  single[0] = 1 - duty;
  logAt(single, 0);
  const second = (1 - alpha) * single[0];
  const half = alpha * Math.LN2;
  single[0] = first - half;
  expAt(single, 0);
  const sum = single[0];
  single[0] = second - half;
  expAt(single, 0);
  into[0] = sum + single[0];
}
