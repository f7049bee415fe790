/**
 * A choke wound to order on a core of the tables, told as a row of the inductor table: the physics of stocked inductors then
 * serves both. Gap, resistance, saturation and core loss follow from core, material, turns, conductor and inductance.
 */
import { pow } from '../optimizer/maths/index.ts';
import { surfacePower } from './heat/index.ts';
import {
  copperMass,
  copperResistivity,
  createWinding,
  gapFor,
  gapKeepOut,
  knownConstants,
  layWinding,
  type MaterialConstants,
  parallelThatFit,
  windowFill,
  wireResistance,
  woundCost,
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
 * Rewrites `choke` for `turns` of `conductor` on `core` of `material` at `inductance` (H), in air of `airSpeed` (m/s) at `ambient` (K).
 * @derivation joins the figures below: each names its source
 * @valid turns ≥ 1; inductance within the core's reach, else `outOfReach` tells
 */
export function windChoke(
  choke: WoundChoke,
  core: Core,
  material: Material,
  conductor: Conductor,
  turns: number,
  inductance: number,
  airSpeed: number,
  ambient: number,
): void {
  choke.inductance = inductance;
  gapOf(choke, core, material, turns, inductance);
  layChoke(choke, core, conductor, turns);
  coreOf(choke, core, material, turns, inductance);
  boxOf(choke, core, material, conductor, turns, airSpeed, ambient);
}

/**
 * Gap for the inductance, and by what fraction it cannot be had.
 * @source mclyman-2004: gap with fringing
 * @valid gap up to a quarter of the window's breadth
 */
function gapOf(choke: WoundChoke, core: Core, material: Material, turns: number, inductance: number): void {
  const bare = (4e-7 * Math.PI * turns * turns * core.area * material.permeability) / core.pathLength;
  if (material.kind === 'powder') {
    choke.gap = 0;
    choke.outOfReach = Math.abs(bare / inductance - 1) > 0.1 ? Math.abs(bare / inductance - 1) : 0;
    return;
  }
  const most = 0.25 * core.windowBreadth;
  choke.gap = gapFor(inductance, turns, core.area, core.pathLength, material.permeability, core.windowBreadth);
  choke.outOfReach = choke.gap > most ? choke.gap / most - 1 : bare < inductance ? inductance / bare - 1 : 0;
}

/**
 * Layers, fill and dc resistance of the winding.
 * @source dowell-1966: layers from the choke's inside out
 * @valid layers fill the breadth
 */
function layChoke(choke: WoundChoke, core: Core, conductor: Conductor, turns: number): void {
  const height = Math.max(0.1e-3, core.windowHeight - INSULATION - gapKeepOut(choke.gap));
  choke.parallel = parallelThatFit(conductor, turns, core.windowBreadth, height, MOST_PARALLEL);
  layWinding(conductor, turns, choke.parallel, core.windowBreadth, 1, winding);
  choke.fill = windowFill(winding.build, core.windowHeight - height, core.windowHeight);
  choke.dcResistance = wireResistance(copperResistivity(298.15), turns * core.turnLength, winding.copperArea);
  choke.conductorThickness = winding.dowellThickness;
  choke.layers = winding.dowellLayers;
}

/**
 * Saturation current and the core loss law in terms of ripple current.
 * @source igse-2002: ki·(2f)^α·ΔB^β·Ve at half duty; saturation from L·I/(N·Ae)
 * @valid the material's own range, else a limit tells
 */
function coreOf(choke: WoundChoke, core: Core, material: Material, turns: number, inductance: number): void {
  choke.fluxPerAmpere = inductance / (turns * core.minimumArea);
  choke.saturationCurrent = material.saturation100 / choke.fluxPerAmpere;
  choke.saturationDrop = material.kind === 'powder' ? 0.5 : 0.2;
  choke.saturationExponent = material.kind === 'powder' ? 2 : 8;
  const { ki } = knownConstants(choke.constants, material);
  const swing = pow(inductance / (turns * core.area), material.fluxExponent);
  choke.coreCoefficient = ki * core.coreVolume * pow(2, material.frequencyExponent) * swing;
  choke.coreFrequencyExponent = material.frequencyExponent;
  choke.coreSwingExponent = material.fluxExponent;
}

/**
 * Size, mass, price and heat path.
 * @source burkart-kolar-2013: cost of a wound part
 * @source churchill-1977 and radiation: surface
 * @valid rise near 40 K
 */
function boxOf(
  choke: WoundChoke,
  core: Core,
  material: Material,
  conductor: Conductor,
  turns: number,
  airSpeed: number,
  ambient: number,
): void {
  choke.length = core.length;
  choke.width = core.width;
  choke.height = core.height;
  const copper = copperMass(turns, core.turnLength, winding.copperArea);
  const coreMass = core.coreVolume * material.density;
  choke.mass = coreMass + copper;
  choke.price.price = woundCost(
    coreMass,
    material.pricePerMass,
    copper,
    conductor.pricePerMass,
    WINDING_FIXED,
    LABOUR_PER_MASS,
    LABOUR_FIXED,
    MARGIN,
  );
  choke.surfaceResistance = RISE / surfacePower(RISE, core.surface, Math.sqrt(core.surface / 6), airSpeed, ambient);
  choke.ratedCurrent = Math.sqrt(RISE / (choke.surfaceResistance * choke.dcResistance));
}
