/**
 * A type-III compensator for a voltage-mode buck stage: poles and zeros for a wanted crossover and phase margin, resistors and
 * capacitors that make them, and the margin that the whole loop then has.
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

/** A margin found on the loop gain. */
export interface LoopMargin {
  /** Hz; NaN where the gain never crosses one. */
  readonly crossover: number;
  /** rad. */
  readonly phaseMargin: number;
}

/** Resistors Ω and capacitors F around the error amplifier, given the input resistor R1. */
export interface CompensatorParts {
  readonly r1: number;
  readonly r2: number;
  readonly r3: number;
  readonly c1: number;
  readonly c2: number;
  readonly c3: number;
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

/**
 * Crossover and phase margin of the loop, found on the loop gain itself: the highest frequency below `highest` Hz where its magnitude
 * falls through 1, located on 200 logarithmic points and by bisection.
 * @derivation Nyquist: margin = π + phase at the crossover
 * @valid loops that are stable without feedback
 */
export function loopMargin(plant: LoopPlant, g: Compensator, lowest: number, highest: number): LoopMargin {
  const ratio = highest / lowest;
  const points = 200;
  const step = rootOf(ratio, points);
  let above = highest;
  for (let i = 0; i < points; i++) {
    const below = above / step;
    if (gainAt(plant, g, below) >= 1 && gainAt(plant, g, above) < 1) return refine(plant, g, below, above);
    above = below;
  }
  return { crossover: Number.NaN, phaseMargin: Number.NaN };
}

/** n-th root by bisection; once a margin. */
function rootOf(x: number, n: number): number {
  let low = 1;
  let high = x;
  for (let round = 0; round < 100; round++) {
    const middle = 0.5 * (low + high);
    let product = 1;
    for (let i = 0; i < n && product <= x; i++) product *= middle;
    if (product < x) low = middle;
    else high = middle;
  }
  return high;
}

function gainAt(plant: LoopPlant, g: Compensator, frequency: number): number {
  const omega = 2 * Math.PI * frequency;
  return plantResponse(plant, omega).magnitude * compensatorResponse(g, omega).magnitude;
}

function refine(plant: LoopPlant, g: Compensator, from: number, to: number): LoopMargin {
  let low = from;
  let high = to;
  for (let round = 0; round < 60; round++) {
    const middle = 0.5 * (low + high);
    if (gainAt(plant, g, middle) >= 1) low = middle;
    else high = middle;
  }
  const omega = 2 * Math.PI * low;
  const phase = plantResponse(plant, omega).phase + compensatorResponse(g, omega).phase;
  return { crossover: low, phaseMargin: Math.PI + phase };
}

/**
 * Parts of the type-III amplifier for a chosen input resistor `r1` (Ω): R1 with R3–C3 beside it, R2–C1 with C2 beside it in feedback.
 * 1/z1 = R2·C1, 1/z2 = (R1 + R3)·C3, 1/p1 = R3·C3, 1/p2 = R2·C1·C2/(C1 + C2), integrator = 1/(R1·(C1 + C2)).
 * @source venable-1983, type-III amplifier
 * @valid zeros below poles; ideal amplifier
 */
export function compensatorParts(g: Compensator, r1: number): CompensatorParts {
  const r3 = r1 / (g.pole1 / g.zero2 - 1);
  const c3 = 1 / (r3 * g.pole1);
  const sum = 1 / (g.integrator * r1);
  // 1/p2 = R2·C1·C2/(C1 + C2) = (1/z1)·C2/(C1 + C2)
  const c2 = (sum * g.zero1) / g.pole2;
  const c1 = sum - c2;
  return { r1, r2: 1 / (g.zero1 * c1), r3, c1, c2, c3 };
}

/**
 * Response Zf/Zi (without the inversion) at `omega` rad/s of the amplifier built from parts: the check on `compensatorParts`.
 * @source venable-1983, type-III amplifier
 * @valid ideal amplifier
 */
export function amplifierResponse(parts: CompensatorParts, omega: number): { re: number; im: number } {
  const { r1, r2, r3, c1, c2, c3 } = parts;
  // Zf = (R2 + 1/sC1) ‖ 1/sC2 = (1 + sR2C1)/(s(C1 + C2)(1 + sR2C1C2/(C1 + C2)));  Zi = R1 ‖ (R3 + 1/sC3)
  const numerator = times(1, omega * r2 * c1, 1, omega * (r1 + r3) * c3);
  const turn = times(1, (omega * r2 * c1 * c2) / (c1 + c2), 1, omega * r3 * c3);
  const whole = times(0, omega * (c1 + c2) * r1, turn.re, turn.im);
  const size = whole.re * whole.re + whole.im * whole.im;
  return {
    re: (numerator.re * whole.re + numerator.im * whole.im) / size,
    im: (numerator.im * whole.re - numerator.re * whole.im) / size,
  };
}

function times(ar: number, ai: number, br: number, bi: number): { re: number; im: number } {
  return { re: ar * br - ai * bi, im: ar * bi + ai * br };
}
