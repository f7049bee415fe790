/**
 * Volume, board area, mass and cost of a design without its heat sink, and the assumptions behind them. The assumptions are
 * plain numbers of an ordinary four-layer board; a sheet's own limits and prices weigh more than they do.
 */
import { boxVolume, priceAt } from './catalogue.ts';
import type { Design } from './design.ts';
import type { Part } from './parts/common.ts';
import { listParts, PartsList } from './parts-list.ts';
import type { Transformer } from './transformer.ts';
import type { WoundChoke } from './wound-choke.ts';

/** Places of a part's figures: box, m³, footprint, m², height, m, mass, kg, and price of one piece. */
const BOX = 0;
const FOOTPRINT = 1;
const HEIGHT = 2;
const MASS = 3;
const PRICE = 4;

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
  /** Figures of every part seen so far, at `quantity` pieces. */
  readonly figures = new Map<Part, Float64Array>();
  quantity = 0;
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

/**
 * Fills `assembly` for `design` at `quantity` pieces.
 * @derivation sums of boxes, footprints, masses and prices with stated factors for air, spacing and board
 * @valid an ordinary four-layer board
 */
export function assemble(assembly: Assembly, design: Design, quantity: number): void {
  forgetOtherQuantity(assembly, quantity);
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
    if (part === undefined) continue;
    add(assembly, figuresOf(assembly, design, part), list.counts[i]);
  }
  // The controller's price stands in the sum; each further phase adds its share.
  const { controller } = design;
  const price = figuresOf(assembly, design, controller)[PRICE];
  assembly.cost += price * controller.phasePriceShare * (design.phases - 1);
  assembly.boardArea = assembly.footprints * AREA_FACTOR;
  assembly.volume = assembly.boxes * PACKING_FACTOR + assembly.boardArea * BOARD_THICKNESS;
  assembly.mass += assembly.boardArea * BOARD_THICKNESS * BOARD_DENSITY;
  assembly.cost += assembly.boardArea * BOARD_PRICE + assembly.placements * PLACEMENT_PRICE;
}

function forgetOtherQuantity(assembly: Assembly, quantity: number): void {
  if (assembly.quantity === quantity) return;
  assembly.quantity = quantity;
  assembly.figures.clear();
}

/** Box, footprint, height, mass and price of one piece: looked up for a row, worked out anew for a part wound to order. */
function figuresOf(assembly: Assembly, design: Design, part: Part): Float64Array {
  let figures = assembly.figures.get(part);
  if (figures === undefined) {
    figures = new Float64Array(PRICE + 1);
    assembly.figures.set(part, figures);
    writeRow(part, assembly.quantity, figures);
  } else if (part === design.transformer) {
    writeTransformer(design.transformer, figures);
  } else if (part === design.woundChoke) {
    writeChoke(design.woundChoke, figures);
  }
  return figures;
}

function writeRow(part: Part, quantity: number, figures: Float64Array): void {
  figures[BOX] = boxVolume(part);
  figures[FOOTPRINT] = part.length * part.width;
  figures[HEIGHT] = part.height;
  figures[MASS] = part.mass;
  figures[PRICE] = priceAt(part, quantity);
}

// Two functions alike on purpose: each reads objects of one layout, which an engine does many times faster than of several.
function writeTransformer(t: Transformer, figures: Float64Array): void {
  figures[BOX] = t.length * t.width * t.height;
  figures[FOOTPRINT] = t.length * t.width;
  figures[HEIGHT] = t.height;
  figures[MASS] = t.mass;
  figures[PRICE] = t.price.price;
}

function writeChoke(choke: WoundChoke, figures: Float64Array): void {
  figures[BOX] = choke.length * choke.width * choke.height;
  figures[FOOTPRINT] = choke.length * choke.width;
  figures[HEIGHT] = choke.height;
  figures[MASS] = choke.mass;
  figures[PRICE] = choke.price.price;
}

function add(assembly: Assembly, figures: Float64Array, count: number): void {
  assembly.boxes += count * figures[BOX];
  assembly.footprints += count * figures[FOOTPRINT];
  assembly.height = Math.max(assembly.height, figures[HEIGHT]);
  assembly.mass += count * figures[MASS];
  assembly.cost += count * figures[PRICE];
  assembly.placements += count;
}
