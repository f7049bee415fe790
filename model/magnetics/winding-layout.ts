/** How turns of a conductor lie in a window: layers, build, copper area, and the layer that Dowell's law sees. Once a design. */
import type { Conductor } from '../parts/conductor.ts';

/** A winding: how it is asked for, and as it is laid. Filled in place. */
export interface Winding {
  turns: number;
  /** Conductors in parallel. */
  parallel: number;
  /** Breadth of the window and height that the winding may take there, m. */
  breadth: number;
  room: number;
  /** 1, or 2 where the other winding lies between two halves of it. */
  sections: number;
  /** Whole layers of conductors. */
  layers: number;
  /** Height across the layers, m. */
  build: number;
  /** Copper area of one turn, all parallel conductors, m². */
  copperArea: number;
  /** Thickness of the equal foil with porosity, m: over the skin depth it is Dowell's x. */
  dowellThickness: number;
  /** Dowell's m: layers of conductors, or of strands in a litz. */
  dowellLayers: number;
}

/** A winding to be filled. */
export function createWinding(): Winding {
  const asked = { turns: 1, parallel: 1, breadth: 0.5, room: 0.5, sections: 1 };
  return { ...asked, layers: 1, build: 0.5, copperArea: 0.5, dowellThickness: 0.5, dowellLayers: 1.5 };
}

const ROUND = 0.5 * Math.sqrt(Math.PI);

/**
 * Lays `turns` of `parallel` conductors side by side over `breadth` m and fills `into`. A conductor wider than the breadth
 * yields one to a layer: the build tells that it does not fit. `sections` (1, or 2 where the other winding lies between two
 * halves) divides the layers that build up field.
 * Parallel foils of one turn are not transposed: field enters them as one foil of their joint thickness, so they are one layer.
 * Round wire by Dowell's porosity; parallel wires lie side by side in one layer (`parallelThatFit` sees to it); a litz of n strands as √n × √n layers of strands.
 * @source dowell-1966, porosity; litz as square strand layers after Wojda and Kazimierczuk (2012)
 * @valid turns, parallel, sections ≥ 1
 */
export function layWinding(
  conductor: Conductor,
  turns: number,
  parallel: number,
  breadth: number,
  sections: number,
  into: Winding,
): void {
  into.turns = turns;
  into.parallel = parallel;
  into.breadth = breadth;
  into.sections = sections;
  layWindingAt(conductor, into);
}

/**
 * The same for what stands in `into` already: no double crosses the call.
 * @source dowell-1966, porosity
 * @valid as `layWinding`
 */
export function layWindingAt(conductor: Conductor, into: Winding): void {
  const { turns, parallel, breadth, sections } = into;
  if (conductor.kind === 'foil') {
    into.layers = turns;
    into.build = turns * parallel * conductor.outerSize;
    into.copperArea = conductor.size * breadth * parallel;
    into.dowellThickness = conductor.size * parallel;
    into.dowellLayers = turns / sections;
    return;
  }
  const wires = turns * parallel;
  const perLayer = Math.max(1, Math.floor(breadth / conductor.outerSize));
  into.layers = Math.ceil(wires / perLayer);
  into.build = into.layers * conductor.outerSize;
  into.copperArea = 0.25 * Math.PI * conductor.size * conductor.size * conductor.strands * parallel;
  const root = Math.sqrt(conductor.strands);
  const pitch = conductor.kind === 'litz' ? conductor.outerSize / root : breadth / Math.min(perLayer, wires);
  const equal = ROUND * conductor.size;
  into.dowellThickness = equal * Math.sqrt(Math.min(1, equal / pitch));
  into.dowellLayers = (into.layers * root) / sections;
}

/** Most loose round wires that are wound side by side as one turn: beyond it one takes litz or foil (common practice, no source). */
const MOST_LOOSE_WIRES = 8;

/**
 * Conductors of one turn that can lie in parallel in `room` m of height over `breadth` m, 1 … `most`: round ones no more than stand
 * side by side in one layer, for those of different layers would not share the current.
 * @derivation whole conductors in a rectangle
 * @valid turns ≥ 1, room and breadth above 0
 */
export function parallelThatFit(
  conductor: Conductor,
  turns: number,
  breadth: number,
  room: number,
  most: number,
): number {
  placed.turns = turns;
  placed.breadth = breadth;
  placed.room = room;
  parallelThatFitAt(conductor, placed, most);
  return placed.parallel;
}

const placed = createWinding();

/**
 * Takes as many conductors in parallel as fit in the room that stands in `into`, as `parallelThatFit`: no double crosses the call.
 * @derivation whole conductors in a rectangle
 * @valid as `parallelThatFit`
 */
export function parallelThatFitAt(conductor: Conductor, into: Winding, most: number): void {
  const { turns, breadth, room } = into;
  if (conductor.kind === 'foil') {
    into.parallel = Math.max(1, Math.min(most, Math.floor(room / (turns * conductor.outerSize))));
    return;
  }
  const perLayer = Math.floor(breadth / conductor.outerSize);
  const wires = (Math.floor(room / conductor.outerSize) * perLayer) / turns;
  const loose = conductor.kind === 'solid' ? MOST_LOOSE_WIRES : most;
  into.parallel = Math.max(1, Math.min(most, loose, perLayer, Math.floor(wires)));
}

/**
 * Share of the window's height that windings take: Σ build over height less the insulation. Above 1 they do not fit. `build` m of all
 * windings, `insulation` m in all, `windowHeight` m.
 * @derivation heights add
 * @valid insulation below the window's height
 * @example windowFill(4e-3, 1e-3, 6e-3) = 0.8
 */
export function windowFill(build: number, insulation: number, windowHeight: number): number {
  return build / (windowHeight - insulation);
}

/**
 * Distance that windings keep from a gap, m: three gap lengths, so that the fringing field does not heat them.
 * `gap` m.
 * @derivation common practice, no source
 * @valid one gap in the centre leg
 * @example gapKeepOut(5e-4) = 1.5e-3
 */
export function gapKeepOut(gap: number): number {
  return 3 * gap;
}
