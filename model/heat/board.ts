/** The whole board as a heat sink: what its two faces carry away, or many phases would be cooled for free. */
import { surfaceCoefficient } from './surface.ts';

/** Rise over ambient, K, that the board's conductance is taken at: it falls by a tenth at half of it. */
const RISE = 40;
/** Ambient, K, that it is taken at. */
const AMBIENT = 313.15;

/**
 * Conductance of a board to air, W/K: both faces of `area` (m², one face) with the coefficient of a plate of length √area at 40 K
 * over 40 °C in air of `airSpeed` m/s. Constant, so that a heat balance stays linear; once a sheet.
 * @source holman-2010, chapters 5, 7 and 8
 * @valid boards with copper planes that spread heat; both faces in the air
 * @example boardConductance(25e-4, 0) = 0.075636
 */
export function boardConductance(area: number, airSpeed: number): number {
  return 2 * area * surfaceCoefficient(RISE, Math.sqrt(area), airSpeed, AMBIENT);
}
