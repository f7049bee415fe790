/**
 * A choke wound to order on a core of the tables, told as a row of the inductor table: the physics of stocked inductors then
 * serves both. Gap, resistance, saturation and core loss follow from core, material, turns, conductor and inductance.
 */
import { powAt } from '../optimizer/maths/index.ts';
import { surfacePower } from './heat/index.ts';
import {
  BARE,
  copperMass,
  copperResistivity,
  createWinding,
  createWoundBill,
  gapAt,
  gapKeepOut,
  HEIGHT,
  knownConstants,
  layWindingAt,
  type MaterialConstants,
  parallelThatFitAt,
  ROOT_AREA,
  windowFill,
  woundCostAt,
} from './magnetics/index.ts';
import type { PriceBreak } from './parts/common.ts';
import type { Conductor } from './parts/conductor.ts';
import type { Core } from './parts/core.ts';
import type { Inductor } from './parts/inductor.ts';
import type { Material } from './parts/material.ts';

/** Rise at which the surface's conductance is taken, K. */
const RISE = 40;
/** Insulation across the window of a choke, m. */
const INSULATION = 0.3e-3;
/** Highest temperature of a wound part, K: class 130 insulation, IEC 60085 (from memory). */
const HIGHEST = 403.15;
/** Most conductors in parallel. */
const MOST_PARALLEL = 40;
/** Fixed shares of Burkart & Kolar's cost of a wound part: winding, labour per kilogram, labour, margin (source id burkart-kolar-2013). */
const WINDING_FIXED = 1;
const LABOUR_PER_MASS = 7;
const LABOUR_FIXED = 2;
const MARGIN = 0.25;

const winding = createWinding();
const bill = createWoundBill();
bill.windingFixed = WINDING_FIXED;
bill.labourPrice = LABOUR_PER_MASS;
bill.labourFixed = LABOUR_FIXED;
bill.margin = MARGIN;
const given = new Float64Array(3);
const power = new Float64Array(2);
/** Resistivity of copper at the temperature that rows state resistances for, Ω·m. */
const COPPER = copperResistivity(298.15);

/** The air around a design. */
export interface Air {
  /** m/s. */
  readonly airSpeed: number;
  /** K. */
  readonly ambient: number;
}

/** A wound choke as an inductor row, rewritten for each design. */
export class WoundChoke implements Inductor {
  name = 'wound choke';
  series = 'wound';
  length = 0.5;
  width = 0.5;
  height = 0.5;
  mass = 0.5;
  readonly price: { from: number; price: number } = { from: 1, price: 0.5 };
  readonly prices: readonly PriceBreak[] = [this.price];
  inductance = 0.5;
  tolerance = 0.1;
  saturationCurrent = 0.5;
  saturationDrop = 0.2;
  saturationExponent = 8;
  dcResistance = 0.5;
  conductorThickness = 0.5;
  layers = 1;
  coreCoefficient = 0.5;
  coreFrequencyExponent = 1.5;
  coreSwingExponent = 2.5;
  ratedCurrent = 0.5;
  ratedRise = RISE;
  maximumTemperature = HIGHEST;
  /** Core-loss constants of the materials seen so far. */
  readonly constants = new Map<Material, MaterialConstants>();
  /** Part to air of the cores seen so far, K/W: all in the same air. */
  readonly surfaces = new Map<Core, Float64Array>();
  /** As asked for; the inductance stands above. */
  turns = 1;
  /** m; 0 for a powder core, whose gap is in the material. */
  gap = 0.5;
  /** Share of the window's height that is used; above 1 the winding does not fit. */
  fill = 0.5;
  /** Peak flux density for one ampere, T/A. */
  fluxPerAmpere = 0.5;
  /** Fraction by which the wanted inductance is out of the core's reach, 0 where it can be had. */
  outOfReach = 0.5;
  parallel = 1;
  /** Part to air, K/W. */
  surfaceResistance = 0.5;
}

/**
 * Rewrites `choke` for the turns and the inductance that stand in it, of `conductor` on `core` of `material` in `air`.
 * @derivation joins the figures below: each names its source
 * @valid turns ≥ 1; inductance within the core's reach, else `outOfReach` tells
 */
export function windChoke(choke: WoundChoke, core: Core, material: Material, conductor: Conductor, air: Air): void {
  gapOf(choke, core, material);
  layChoke(choke, core, conductor);
  coreOf(choke, core, material);
  boxOf(choke, core, material, conductor, air);
}

/**
 * Gap for the inductance, and by what fraction it cannot be had.
 * @source mclyman-2004: gap with fringing
 * @valid gap up to a quarter of the window's breadth
 */
function gapOf(choke: WoundChoke, core: Core, material: Material): void {
  const { turns, inductance } = choke;
  const bare = (4e-7 * Math.PI * turns * turns * core.area * material.permeability) / core.pathLength;
  if (material.kind === 'powder') {
    choke.gap = 0;
    choke.outOfReach = Math.abs(bare / inductance - 1) > 0.1 ? Math.abs(bare / inductance - 1) : 0;
    return;
  }
  const most = 0.25 * core.windowBreadth;
  given[BARE] = (4e-7 * Math.PI * turns * turns * core.area) / inductance - core.pathLength / material.permeability;
  given[ROOT_AREA] = Math.sqrt(core.area);
  given[HEIGHT] = core.windowBreadth;
  gapAt(given);
  choke.gap = given[0];
  choke.outOfReach = choke.gap > most ? choke.gap / most - 1 : bare < inductance ? inductance / bare - 1 : 0;
}

/**
 * Layers, fill and dc resistance of the winding.
 * @source dowell-1966: layers from the choke's inside out
 * @valid layers fill the breadth
 */
function layChoke(choke: WoundChoke, core: Core, conductor: Conductor): void {
  winding.turns = choke.turns;
  winding.breadth = core.windowBreadth;
  winding.room = Math.max(0.1e-3, core.windowHeight - INSULATION - gapKeepOut(choke.gap));
  parallelThatFitAt(conductor, winding, MOST_PARALLEL);
  choke.parallel = winding.parallel;
  layWindingAt(conductor, winding);
  choke.fill = windowFill(winding.build, core.windowHeight - winding.room, core.windowHeight);
  choke.dcResistance = (COPPER * choke.turns * core.turnLength) / winding.copperArea;
  choke.conductorThickness = winding.dowellThickness;
  choke.layers = winding.dowellLayers;
}

/**
 * Saturation current and the core loss law in terms of ripple current.
 * @source igse-2002: ki·(2f)^α·ΔB^β·Ve at half duty; saturation from L·I/(N·Ae)
 * @valid the material's own range, else a limit tells
 */
function coreOf(choke: WoundChoke, core: Core, material: Material): void {
  const { turns, inductance } = choke;
  choke.fluxPerAmpere = inductance / (turns * core.minimumArea);
  choke.saturationCurrent = material.saturation100 / choke.fluxPerAmpere;
  choke.saturationDrop = material.kind === 'powder' ? 0.5 : 0.2;
  choke.saturationExponent = material.kind === 'powder' ? 2 : 8;
  const constants = knownConstants(choke.constants, material);
  power[0] = inductance / (turns * core.area);
  power[1] = material.fluxExponent;
  powAt(power, 0);
  choke.coreCoefficient = constants.ki * core.coreVolume * constants.doubling * power[0];
  choke.coreFrequencyExponent = material.frequencyExponent;
  choke.coreSwingExponent = material.fluxExponent;
}

/**
 * Size, mass, price and heat path.
 * @source burkart-kolar-2013: cost of a wound part
 * @source churchill-1977 and radiation: surface
 * @valid rise near 40 K
 */
function boxOf(choke: WoundChoke, core: Core, material: Material, conductor: Conductor, air: Air): void {
  choke.length = core.length;
  choke.width = core.width;
  choke.height = core.height;
  bill.windingMass = copperMass(choke.turns, core.turnLength, winding.copperArea);
  bill.windingPrice = conductor.pricePerMass;
  bill.coreMass = core.coreVolume * material.density;
  bill.corePrice = material.pricePerMass;
  choke.mass = bill.coreMass + bill.windingMass;
  woundCostAt(bill);
  choke.price.price = bill.cost;
  choke.surfaceResistance = knownSurface(choke.surfaces, core, air)[0];
  choke.ratedCurrent = Math.sqrt(RISE / (choke.surfaceResistance * choke.dcResistance));
}

/**
 * Surface to air of a part wound on `core`, K/W, from `known`, worked out only where it is not known yet: all parts stand in the same `air`.
 * @source churchill-1977 and radiation: surface
 * @valid rise near 40 K
 */
export function knownSurface(known: Map<Core, Float64Array>, core: Core, air: Air): Float64Array {
  let resistance = known.get(core);
  if (resistance === undefined) {
    const power = surfacePower(RISE, core.surface, Math.sqrt(core.surface / 6), air.airSpeed, air.ambient);
    resistance = Float64Array.of(RISE / power);
    known.set(core, resistance);
  }
  return resistance;
}
