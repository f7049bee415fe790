/**
 * Volume, board area, mass and cost of a design without its heat sink, and the assumptions behind them. The assumptions are
 * plain numbers of an ordinary four-layer board; a sheet's own limits and prices weigh more than they do.
 */
import { boxVolume, priceAt } from './catalogue.ts';
import { controllerCost, type Design } from './design.ts';
import type { Part } from './parts/common.ts';
import { listParts, PartsList } from './parts-list.ts';

/** Board area over the footprints of the parts: spacing, routing, vias. */
const AREA_FACTOR = 1.4;
/** Board thickness, m. */
export const BOARD_THICKNESS = 1.6e-3;
/** Board density, kg/m³. */
const BOARD_DENSITY = 1850;
/** Volume around the boxed parts over the parts' own: parts of unlike height leave air above the flat ones. */
export const PACKING_FACTOR = 1.25;
/** Board price, currency per m² (four layers, thousands of pieces). */
export const BOARD_PRICE = 250;
/** Placing one part, currency. */
export const PLACEMENT_PRICE = 0.008;

/** Sums over the parts of one design. Reused. */
export class Assembly {
  readonly list = new PartsList();
  /** m³: boxed parts with packing and the board under them. */
  volume = 0.5;
  /** m². */
  boardArea = 0.5;
  /** Tallest part, m. */
  height = 0.5;
  /** kg. */
  mass = 0.5;
  /** Currency. */
  cost = 0.5;
  /** Parts to place. */
  placements = 1;

  boxes = 0.5;
  footprints = 0.5;
}

/** Fills `assembly` for `design` at `quantity` pieces. */
export function assemble(assembly: Assembly, design: Design, quantity: number): void {
  assembly.boxes = 0;
  assembly.footprints = 0;
  assembly.height = 0;
  assembly.mass = 0;
  assembly.cost = 0;
  assembly.placements = 0;
  const { list } = assembly;
  listParts(list, design);
  for (let i = 0; i < list.length; i++) {
    const part = list.parts[i];
    if (part !== undefined) add(assembly, part, list.counts[i], quantity);
  }
  assembly.cost += controllerCost(design, quantity) - priceAt(design.controller, quantity);
  assembly.boardArea = assembly.footprints * AREA_FACTOR;
  assembly.volume = assembly.boxes * PACKING_FACTOR + assembly.boardArea * BOARD_THICKNESS;
  assembly.mass += assembly.boardArea * BOARD_THICKNESS * BOARD_DENSITY;
  assembly.cost += assembly.boardArea * BOARD_PRICE + assembly.placements * PLACEMENT_PRICE;
}

function add(assembly: Assembly, part: Part, count: number, quantity: number): void {
  assembly.boxes += count * boxVolume(part);
  assembly.footprints += count * part.length * part.width;
  assembly.height = Math.max(assembly.height, part.height);
  assembly.mass += count * part.mass;
  assembly.cost += count * priceAt(part, quantity);
  assembly.placements += count;
}
