/** A part that stands on the board and in the air: how the heat of its rating divides between its own faces and its leads. */

/** Share of the rated conductance that leads and base carry at least, however large the faces (common practice, no source). */
const LEAST_LEADS = 0.1;

/**
 * The four sides of a boxed part, m². All in m. The top is left out where a part stands on a board whose both faces are counted as
 * cooled: its base covers as much of the board as its top gives back.
 * @derivation perimeter times height
 * @valid parts that stand free
 * @example sideSurface(0.01, 0.01, 0.005) = 2e-4
 */
export function sideSurface(length: number, width: number, height: number): number {
  return 2 * height * (length + width);
}

/**
 * Thermal resistance from a part to its board, K/W, from that to its surroundings as rated on a board at ambient and the
 * conductance of its own faces in the rating's still air: what the faces do not carry the board does. `rated` K/W, `faces` W/K.
 * @derivation two paths side by side make the rated one; leads carry a tenth at least
 * @valid rating measured on a board that stays near ambient
 * @example boardPath(10, 0.05) = 20
 */
export function boardPath(rated: number, faces: number): number {
  const whole = 1 / rated;
  return 1 / Math.max(LEAST_LEADS * whole, whole - faces);
}
