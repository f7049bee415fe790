/** How a board and a heat sink carry a converter's heat away, from the sheet's area and air speed. */
import { surfaceCoefficient, volumetricResistance } from './heat/index.ts';

/** Rise over ambient at which the board's surface coefficient is taken, K: it changes by a few per cent for ±20 K. */
const BOARD_RISE = 40;
/** Share of a heat sink's box that is metal. */
const SOLID_SHARE = 0.3;
/** Density of aluminium, kg/m³. */
const ALUMINIUM = 2700;
/** Price of an extruded sink, currency per m³ of box (invented, of the order of the trade's). */
const SINK_PRICE = 2.5e4;

/** Conductance of both faces of a board of `area` (m²) in air of `airSpeed` (m/s) at `ambient` (K) to the air, W/K. */
export function boardConductance(area: number, airSpeed: number, ambient: number): number {
  return 2 * area * surfaceCoefficient(BOARD_RISE, Math.sqrt(area), airSpeed, ambient);
}

/** Box volume of a heat sink of `conductance` (W/K) in air of `airSpeed` (m/s), m³. */
export function sinkBox(conductance: number, airSpeed: number): number {
  return conductance * volumetricResistance(airSpeed);
}

/** Mass of a heat sink of box `volume` (m³), kg. */
export function sinkMass(volume: number): number {
  return volume * SOLID_SHARE * ALUMINIUM;
}

/** Cost of a heat sink of box `volume` (m³), currency. */
export function sinkCost(volume: number): number {
  return volume * SINK_PRICE;
}
