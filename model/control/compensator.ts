/**
 * A type-III compensator for a voltage-mode buck stage: poles and zeros for a wanted crossover and phase margin.
 */
import { atan, tan } from '../../optimizer/maths/index.ts';

/** The stage that is to be controlled. */
export interface LoopPlant {
  /** Low-frequency gain from control voltage to output: input voltage over the modulator's ramp, dimensionless. */
  readonly gain: number;
  /** L/N, H. */
  readonly inductance: number;
  /** Output capacitance, F. */
  readonly capacitance: number;
  /** Series resistance of the bank, Ω. */
  readonly seriesResistance: number;
  /** Load resistance Vo/Io, Ω; Infinity at no load. */
  readonly loadResistance: number;
  /** Resistance in series with L (windings and switches), Ω. */
  readonly pathResistance: number;
  /** Delay of sampling and modulator, s. */
  readonly delay: number;
}

/** G(s) = integrator/s·(1 + s/z1)(1 + s/z2)/[(1 + s/p1)(1 + s/p2)]. */
export interface Compensator {
  /** rad/s. */
  readonly integrator: number;
  readonly zero1: number;
  readonly zero2: number;
  readonly pole1: number;
  readonly pole2: number;
}

/**
 * Magnitude and phase (rad, continuous below −π) of the plant at `omega` rad/s.
 * @source erickson-maksimovic-2001, chapter 8 (buck output filter with series resistance)
 * @valid up to about half the switching frequency
 */
export function plantResponse(plant: LoopPlant, omega: number): { magnitude: number; phase: number } {
  const load = plant.loadResistance;
  const share = Number.isFinite(load) ? 1 / load : 0;
  const { inductance: l, capacitance: c, seriesResistance: r, pathResistance: p } = plant;
  // Zc = r + 1/(jωc) ‖ load, over Zc‖load + p + jωl: numerator 1 + jωrc, denominator a + jb.
  const a = 1 + p * share - omega * omega * l * c * (1 + r * share);
  const b = omega * (l * share + r * c + p * c * (1 + r * share));
  const numerator = Math.sqrt(1 + omega * r * c * (omega * r * c));
  const magnitude = (plant.gain * numerator) / Math.sqrt(a * a + b * b);
  const lag = a > 0 ? atan(b / a) : Math.PI - atan(b / -a);
  return { magnitude, phase: atan(omega * r * c) - (a === 0 ? Math.PI / 2 : lag) - omega * plant.delay };
}

/**
 * Magnitude and phase (rad) of the compensator at `omega` rad/s.
 * @source venable-1983, type-III amplifier
 * @valid omega above 0
 */
export function compensatorResponse(g: Compensator, omega: number): { magnitude: number; phase: number } {
  const up = side(omega / g.zero1) * side(omega / g.zero2);
  const down = side(omega / g.pole1) * side(omega / g.pole2);
  const phase = atan(omega / g.zero1) + atan(omega / g.zero2) - atan(omega / g.pole1) - atan(omega / g.pole2);
  return { magnitude: ((g.integrator / omega) * up) / down, phase: phase - Math.PI / 2 };
}

function side(x: number): number {
  return Math.sqrt(1 + x * x);
}

/**
 * Compensator for crossover at `crossover` Hz with `phaseMargin` rad, by the k-factor method: two zeros at ωc/√K, two poles at ωc·√K,
 * √K = tan(boost/4 + π/4), boost = margin − plant phase − π/2, integrator so that the loop gain is 1 at ωc.
 * The boost is kept between 0 and 172°; a plant that needs more yields less margin: judge `loopMargin`, not the wish.
 * @source venable-1983, k-factor for the type-III amplifier
 * @valid crossover above the filter's resonance
 */
export function designCompensator(plant: LoopPlant, crossover: number, phaseMargin: number): Compensator {
  const omega = 2 * Math.PI * crossover;
  const stage = plantResponse(plant, omega);
  const boost = Math.min(3, Math.max(0, phaseMargin - stage.phase - Math.PI / 2));
  const root = tan(boost / 4 + Math.PI / 4);
  const bare = { integrator: 1, zero1: omega / root, zero2: omega / root, pole1: omega * root, pole2: omega * root };
  return { ...bare, integrator: 1 / (stage.magnitude * compensatorResponse(bare, omega).magnitude) };
}
