/** Soft saturation of an inductor: L(I), flux linkage λ(I) and its inverse, and ripple where L bends within the cycle. */
import { powAt } from '../../optimizer/maths/index.ts';

const power = new Float64Array(2);

/** What describes a core's bend. Fields of an inductor row, or of a wound part. */
export interface Bend {
  /** L0, H. */
  readonly inductance: number;
  /** Current at which L has fallen by `saturationDrop`, A. */
  readonly saturationCurrent: number;
  /** Fraction. */
  readonly saturationDrop: number;
  /** s. */
  readonly saturationExponent: number;
}

/**
 * Writes the incremental inductance, H, at `current` (A, either sign) to `into[0]`: L0/(1 + q·(|I|/Isat)^s), q = drop/(1 − drop).
 * @derivation the parts table's law; equals (1 − drop)·L0 at the saturation current by construction
 * @valid up to about twice the saturation current
 */
export function inductanceAt(bend: Bend, current: number, into: Float64Array): void {
  into[0] = current;
  inductanceInPlaceAt(bend, into);
}

/**
 * The same for the current that stands in `into[0]`: no double crosses the call.
 * @derivation as `inductanceAt`
 * @valid as `inductanceAt`
 */
export function inductanceInPlaceAt(bend: Bend, into: Float64Array): void {
  power[0] = Math.abs(into[0]) / bend.saturationCurrent;
  power[1] = bend.saturationExponent;
  powAt(power, 0);
  const q = bend.saturationDrop / (1 - bend.saturationDrop);
  into[0] = bend.inductance / (1 + q * power[0]);
}

const NODE = Math.sqrt(0.6);
const value = new Float64Array(1);

/**
 * Writes to `into[0]` the mean of L over currents from `low` to `high` (A), H: three-point Gauss rule. Flux linkage between the two is
 * this times (high − low).
 * @source abramowitz-stegun, 25.4.30 (Gauss integration)
 * @valid high ≥ low; within 0.2 % while L falls by up to half across the range
 */
export function meanInductanceAt(bend: Bend, low: number, high: number, into: Float64Array): void {
  const middle = 0.5 * (low + high);
  const reach = 0.5 * (high - low) * NODE;
  inductanceAt(bend, middle, value);
  let sum = 8 * value[0];
  inductanceAt(bend, middle - reach, value);
  sum += 5 * value[0];
  inductanceAt(bend, middle + reach, value);
  sum += 5 * value[0];
  into[0] = sum / 18;
}

/**
 * Writes to `into[0]` the peak-to-peak ripple, A, about `meanCurrent` (A) that carries `voltSeconds` (V·s) of flux linkage:
 * ΔI with ∫L dI = λ, by `rounds` of ΔI = λ/L̄(I − ΔI/2, I + ΔI/2).
 * @derivation flux linkage λ(I) = ∫L dI; a fixed point, contracting while L̄ changes less than ΔI does
 * @valid the ripple stays symmetric about its mean (second-order skew is left out)
 */
export function swingAt(
  bend: Bend,
  meanCurrent: number,
  voltSeconds: number,
  rounds: number,
  into: Float64Array,
): void {
  let swing = voltSeconds / bend.inductance;
  for (let round = 0; round < rounds; round++) {
    meanInductanceAt(bend, meanCurrent - 0.5 * swing, meanCurrent + 0.5 * swing, into);
    swing = voltSeconds / into[0];
  }
  into[0] = swing;
}

/**
 * Flux linkage λ(I), V·s, odd in the current: ∫L dI from 0, by 24 Gauss pieces. For assessments and checks, not hot.
 * @derivation integral of the table's law; s = 2 has the closed form L0·Isat/√q·atan(√q·I/Isat), which a test holds it to
 * @valid as `inductanceAt`
 */
export function fluxLinkage(bend: Bend, current: number): number {
  const mean = new Float64Array(1);
  const size = Math.abs(current);
  let sum = 0;
  for (let piece = 0; piece < 24; piece++) {
    meanInductanceAt(bend, (size * piece) / 24, (size * (piece + 1)) / 24, mean);
    sum += (mean[0] * size) / 24;
  }
  return current < 0 ? -sum : sum;
}

/**
 * Current, A, at a flux linkage (V·s): the inverse of `fluxLinkage`, by bisection up to ten saturation currents.
 * @derivation λ rises with I, so one root
 * @valid |λ| up to λ(10·Isat); beyond it the bound is returned
 */
export function currentOfLinkage(bend: Bend, linkage: number): number {
  const size = Math.abs(linkage);
  let low = 0;
  let high = 10 * bend.saturationCurrent;
  for (let round = 0; round < 60; round++) {
    const middle = 0.5 * (low + high);
    if (fluxLinkage(bend, middle) < size) low = middle;
    else high = middle;
  }
  const current = 0.5 * (low + high);
  return linkage < 0 ? -current : current;
}
