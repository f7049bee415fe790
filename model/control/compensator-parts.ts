/** Resistors and capacitors that make a compensator. */
import type { Compensator } from './compensator.ts';

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
