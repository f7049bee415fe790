/** Round wire by gauge, and litz wire from its strands. Once a design or a table row, not hot. */
import { pow } from '../../optimizer/maths/index.ts';
import { roundWireProximity, roundWireSkin } from './round-wire.ts';

/**
 * Bare diameter of a wire of American gauge `gauge` (−3, which is 0000, to 50), m: 0.127 mm·92^((36 − n)/39).
 * @source astm-b258, the defining geometric series
 * @valid −3 to 50
 * @example gaugeDiameter(36) = 1.27e-4
 */
export function gaugeDiameter(gauge: number): number {
  return 1.27e-4 * pow(92, (36 - gauge) / 39);
}

/**
 * Area of a round conductor, m². `diameter` m.
 * @derivation area of a circle
 * @valid diameter ≥ 0
 * @example roundArea(1e-3) = 7.8539816e-7
 */
export function roundArea(diameter: number): number {
  return 0.25 * Math.PI * diameter * diameter;
}

/**
 * Loss of one metre of litz wire, W/m: n·R·[½·S·(I/n)² + G·I²/(8·π·A) + G·H²], A = π·d²/4 of the bundle, R of one strand per metre,
 * S its skin factor, G its proximity factor (m²). `strands` n, `strandDiameter` m, `bundleDiameter` d m, `depth` m (skin
 * depth), `strandResistance` Ω/m, `peakCurrent` I A, `peakField` H A/m from outside.
 * @source guillod-2017, loss of a perfectly twisted litz wire
 * @valid perfect twist; strands thinner than about two skin depths
 * @example litzLoss(1, 1e-3, 1e-3, 1, 0.02, 10, 0) = 1
 */
export function litzLoss(
  strands: number,
  strandDiameter: number,
  bundleDiameter: number,
  depth: number,
  strandResistance: number,
  peakCurrent: number,
  peakField: number,
): number {
  const skin = roundWireSkin(strandDiameter, depth);
  const proximity = roundWireProximity(strandDiameter, depth);
  const share = peakCurrent / strands;
  const inner = (peakCurrent * peakCurrent) / (8 * Math.PI * roundArea(bundleDiameter));
  return strands * strandResistance * (0.5 * skin * share * share + proximity * (inner + peakField * peakField));
}
