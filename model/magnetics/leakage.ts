/** Leakage and magnetizing inductance of a two-winding transformer. */
import { MU0 } from './copper.ts';

/**
 * Leakage inductance on the side of `turns`, H: µ0·N²·l/(M²·b)·(Σh/3 + Σg). `turnLength` l m, `breadth` b m along the layers,
 * `builds` Σh m of all winding sections, `insulation` Σg m of all gaps between them, `interfaces` M: 1 for one winding over the
 * other, 2 where one lies between halves of the other.
 * @source snelling-1988, chapter 11 (leakage inductance of simple and sandwiched windings)
 * @valid windings as broad as the window, low frequency
 * @example leakageInductance(10, 0.05, 0.02, 3e-3, 1e-4, 1) = 3.4557519e-7
 */
export function leakageInductance(
  turns: number,
  turnLength: number,
  breadth: number,
  builds: number,
  insulation: number,
  interfaces: number,
): number {
  const scale = (MU0 * turns * turns * turnLength) / (interfaces * interfaces * breadth);
  return scale * (builds / 3 + insulation);
}

/**
 * Magnetizing inductance, H: AL·N². `inductanceFactor` H, `turns`.
 * @source lm5036, design section (AL 4.4 µH, 4 turns)
 * @valid below saturation
 * @example magnetizingInductance(4.4e-6, 4) = 7.04e-5
 */
export function magnetizingInductance(inductanceFactor: number, turns: number): number {
  return inductanceFactor * turns * turns;
}
