/**
 * A transformer wound to order: secondary between two halves of the primary, ungapped. What does not depend on the operating
 * point is worked out once a design; the fields are rewritten, nothing is allocated.
 */
import { powAt } from '../optimizer/maths/index.ts';
import {
  copperMass,
  copperResistivity,
  createHarmonicLoss,
  createWinding,
  createWoundBill,
  dowellHarmonicsAt,
  harmonicLossAt,
  inductanceFactor,
  knownConstants,
  layWindingAt,
  leakageInductance,
  type MaterialConstants,
  magnetizingInductance,
  parallelThatFitAt,
  skinDepth,
  WINDING_AC,
  type Winding,
  windowFill,
  woundCostAt,
} from './magnetics/index.ts';
import type { Part, PriceBreak } from './parts/common.ts';
import type { Conductor } from './parts/conductor.ts';
import type { Core } from './parts/core.ts';
import type { Material } from './parts/material.ts';
import {
  addSegment,
  clearWaveform,
  createWaveform,
  harmonics,
  MEAN,
  MEAN_SQUARE,
  measure,
  measureSlope,
  type Waveform,
} from './waveform/index.ts';
import { type Air, knownSurface } from './wound-choke.ts';

/** Insulation between winding sections, m, and how many gaps of it a sandwich has. */
const INSULATION = 0.2e-3;
const GAPS = 2;
/** Mating faces of an ungapped core, m (common practice, no source). */
const RESIDUAL_GAP = 10e-6;
/** Rise over ambient at which the windings' skin depth is taken, K. */
const RISE = 40;
const HIGHEST = 403.15;
const MOST_PARALLEL = 60;
const HARMONICS = 12;
/** Length of a current edge as a share of the period, for the harmonics of the winding currents. */
const EDGE = 0.01;
const WINDING_FIXED = 2;
const LABOUR_PER_MASS = 7;
const LABOUR_FIXED = 4;
const MARGIN = 0.25;

/** How the windings' currents look, which sets their harmonics. */
export type WindingForm = 'forward' | 'centre-tap' | 'current-doubler';

const pulses = createWaveform(12);
/** Share of the period that one pulse takes: in a record, so that no double crosses a call. */
const shape = { on: 0.5 };
const coefficients = new Float64Array(2 * HARMONICS);
const factors = new Float64Array(HARMONICS);
const loss = new Float64Array(2);
const power = new Float64Array(2);
/** Mean, mean square, peak and valley of the winding current, and mean square of its slope. */
const moments = new Float64Array(4);
const slope = new Float64Array(1);
const current = createHarmonicLoss();
current.frequency = 1;
const bill = createWoundBill();
bill.windingFixed = WINDING_FIXED;
bill.labourPrice = LABOUR_PER_MASS;
bill.labourFixed = LABOUR_FIXED;
bill.margin = MARGIN;
/** Resistivity of copper at the temperature that resistances are told at, Ω·m. */
const COPPER = copperResistivity(298.15);

/** One transformer; all phases have the same. */
export class Transformer implements Part {
  name = 'transformer';
  length = 0.5;
  width = 0.5;
  height = 0.5;
  mass = 0.5;
  readonly price: { from: number; price: number } = { from: 1, price: 0.5 };
  readonly prices: readonly PriceBreak[] = [this.price];
  primaryTurns = 1;
  secondaryTurns = 1;
  /** Np/Ns. */
  ratio = 1.5;
  area = 0.5;
  minimumArea = 0.5;
  /** H, primary side. */
  magnetizing = 0.5;
  leakage = 0.5;
  /** Dc resistance at 25 °C of the primary and of one secondary winding, Ω. */
  primaryResistance = 0.5;
  secondaryResistance = 0.5;
  /** Loss over dc resistance times mean square, ≥ 1. */
  primaryFactor = 1.5;
  secondaryFactor = 1.5;
  /** ki·f^α·Ve, W at 1 T of swing before the ramp's correction. */
  coreScale = 0.5;
  frequencyExponent = 1.5;
  fluxExponent = 2.5;
  fill = 0.5;
  /** Part to air, K/W. */
  surfaceResistance = 0.5;
  maximumTemperature = HIGHEST;
  /** Core-loss constants of the materials seen so far. */
  readonly constants = new Map<Material, MaterialConstants>();
  /** Part to air of the cores seen so far, K/W: all in the same air. */
  readonly surfaces = new Map<Core, Float64Array>();
  primaryParallel = 1;
  secondaryParallel = 1;
  readonly primary: Winding = createWinding();
  readonly secondary: Winding = createWinding();
}

/** The choice of a transformer. */
export interface TransformerChoice {
  core: Core;
  material: Material;
  primary: Conductor;
  secondary: Conductor;
  primaryTurns: number;
  secondaryTurns: number;
  form: WindingForm;
  /** Hz. */
  frequency: number;
  /** Usual duty of one switch. */
  duty: number;
  /** Skin depth of the windings at 1 Hz, m·√Hz: see `windingDepth`. */
  readonly depth: number;
}

/**
 * Skin depth of a transformer's windings in `air` at 1 Hz, m·√Hz: it falls with the root of the frequency.
 * @source hurley-2000, section II
 * @valid windings 40 K above the air
 */
export function windingDepth(air: Air): number {
  return skinDepth(copperResistivity(air.ambient + RISE), 1);
}

/**
 * Rewrites `t` for a choice in `air`.
 * @source igse-2002 (core loss at 1 T)
 * @source holman-2010 (surface); the parts below name theirs
 * @valid ungapped; sine range of the material's fit
 */
export function windTransformer(t: Transformer, choice: TransformerChoice, air: Air): void {
  t.primaryTurns = choice.primaryTurns;
  t.secondaryTurns = choice.secondaryTurns;
  t.ratio = choice.primaryTurns / choice.secondaryTurns;
  layBoth(t, choice);
  inductances(t, choice);
  acFactors(t, choice);
  const { material, core } = choice;
  const { ki } = knownConstants(t.constants, material);
  power[0] = choice.frequency;
  power[1] = material.frequencyExponent;
  powAt(power, 0);
  t.coreScale = ki * power[0] * core.coreVolume;
  t.frequencyExponent = material.frequencyExponent;
  t.fluxExponent = material.fluxExponent;
  t.area = core.area;
  t.minimumArea = core.minimumArea;
  t.surfaceResistance = knownSurface(t.surfaces, core, air)[0];
  box(t, choice);
}

/**
 * Half the window for each side; a centre-tapped secondary shares its half between two windings.
 * @source dowell-1966: an interleaved winding has half the layers on each side of the field's zero
 * @valid layers fill the breadth
 */
function layBoth(t: Transformer, choice: TransformerChoice): void {
  const { core } = choice;
  const room = Math.max(0.1e-3, (core.windowHeight - GAPS * INSULATION) / 2);
  const windings = choice.form === 'centre-tap' ? 2 : 1;
  const { primary, secondary } = t;
  primary.turns = choice.primaryTurns;
  primary.breadth = core.windowBreadth;
  primary.room = room;
  primary.sections = 2;
  layOne(choice.primary, primary);
  t.primaryParallel = primary.parallel;
  secondary.turns = choice.secondaryTurns;
  secondary.breadth = core.windowBreadth;
  secondary.room = room / windings;
  // Between two halves of the primary the field in the secondary is zero in its middle; a centre tap's idle half spoils that.
  secondary.sections = 3 - windings;
  layOne(choice.secondary, secondary);
  t.secondaryParallel = secondary.parallel;
  t.fill = windowFill(t.primary.build + windings * t.secondary.build, GAPS * INSULATION, core.windowHeight);
  t.primaryResistance = (COPPER * choice.primaryTurns * core.turnLength) / primary.copperArea;
  t.secondaryResistance = (COPPER * choice.secondaryTurns * core.turnLength) / secondary.copperArea;
}

/**
 * Lays as many conductors in parallel as fit in the winding's room.
 * @derivation whole conductors in a rectangle
 * @valid as `layWinding`
 */
function layOne(conductor: Conductor, winding: Winding): void {
  parallelThatFitAt(conductor, winding, MOST_PARALLEL);
  layWindingAt(conductor, winding);
}

/**
 * Magnetizing and leakage inductance, primary side.
 * @source snelling-1988, leakage of a sandwich; magnetizing Np²·AL
 * @valid permeability constant; residual gap of the mating faces
 */
function inductances(t: Transformer, choice: TransformerChoice): void {
  const { core, material } = choice;
  const al = inductanceFactor(core.area, RESIDUAL_GAP, 1, core.pathLength, material.permeability);
  t.magnetizing = magnetizingInductance(al, choice.primaryTurns);
  const builds = t.primary.build + t.secondary.build;
  t.leakage = leakageInductance(choice.primaryTurns, core.turnLength, core.windowBreadth, builds, GAPS * INSULATION, 2);
}

/**
 * Ac loss over dc loss of both windings at the usual duty.
 * @source dowell-1966
 * @valid duty of one switch 0.05 … 0.45
 */
function acFactors(t: Transformer, choice: TransformerChoice): void {
  const perDepth = Math.sqrt(choice.frequency) / choice.depth;
  shape.on = Math.min(0.45, Math.max(0.05, choice.duty));
  primaryPulses(pulses, choice.form);
  takeSpectrum(pulses);
  current.x1 = t.primary.dowellThickness * perDepth;
  findFactor(t.primary);
  t.primaryFactor = loss[0];
  if (choice.form === 'centre-tap') {
    halfPulses(pulses);
    takeSpectrum(pulses);
  }
  current.x1 = t.secondary.dowellThickness * perDepth;
  findFactor(t.secondary);
  t.secondaryFactor = loss[0];
}

/**
 * Harmonics and moments of the winding current `w` (period 1 s).
 * @source hurley-2000 bounds what lies beyond the harmonics by the slope
 * @valid current edges of a hundredth of a period
 */
function takeSpectrum(w: Waveform): void {
  harmonics(w, HARMONICS, coefficients);
  measure(w, moments);
  measureSlope(w, slope);
  current.acMeanSquare = moments[MEAN_SQUARE] - moments[MEAN] * moments[MEAN];
  current.slopeMeanSquare = slope[0];
}

/**
 * Writes to `loss[0]` the loss of the current at hand in `winding` over dc resistance times its mean square.
 * @source dowell-1966, per harmonic
 * @source hurley-2000 bounds the rest
 * @valid current edges of a hundredth of a period
 */
function findFactor(winding: Winding): void {
  current.layers = winding.dowellLayers;
  dowellHarmonicsAt(current, HARMONICS, factors);
  harmonicLossAt(current, coefficients, factors, HARMONICS, loss);
  loss[0] = (moments[MEAN] * moments[MEAN] + loss[WINDING_AC]) / moments[MEAN_SQUARE];
}

/**
 * Primary: one pulse a period in a forward stage, one of each sign in a bridge.
 * @source erickson-maksimovic-2001, chapter 6
 * @valid ripple left out
 */
function primaryPulses(w: Waveform, form: WindingForm): void {
  const { on } = shape;
  clearWaveform(w);
  if (form === 'forward') {
    pulse(w, on, 1);
    addSegment(w, 1 - on, 0, 0);
    return;
  }
  pulse(w, on, 1);
  addSegment(w, 0.5 - on, 0, 0);
  pulse(w, on, -1);
  addSegment(w, 0.5 - on, 0, 0);
}

/**
 * One half of a centre-tapped secondary: its pulse and half of what freewheels. Any other secondary carries what the primary does.
 * @source erickson-maksimovic-2001, chapter 6; freewheeling current shared alike by both halves
 * @valid ripple left out
 */
function halfPulses(w: Waveform): void {
  const { on } = shape;
  clearWaveform(w);
  addSegment(w, EDGE, 0.5, 1);
  addSegment(w, on - EDGE, 1, 1);
  addSegment(w, EDGE, 1, 0.5);
  addSegment(w, 0.5 - on - EDGE, 0.5, 0.5);
  addSegment(w, EDGE, 0.5, 0);
  addSegment(w, on - EDGE, 0, 0);
  addSegment(w, EDGE, 0, 0.5);
  addSegment(w, 0.5 - on - EDGE, 0.5, 0.5);
}

/**
 * A pulse of height `level` with finite edges; `on` is its whole length.
 * @derivation a trapezoid whose edges take a hundredth of the period
 * @valid `on` above two edges
 */
function pulse(w: Waveform, on: number, level: number): void {
  addSegment(w, EDGE, 0, level);
  addSegment(w, on - 2 * EDGE, level, level);
  addSegment(w, EDGE, level, 0);
}

/**
 * Size, mass and price.
 * @source burkart-kolar-2013: cost of a wound part
 * @valid prices of 2013, or the sheet's own
 */
function box(t: Transformer, choice: TransformerChoice): void {
  const { core, material } = choice;
  t.length = core.length;
  t.width = core.width;
  t.height = core.height;
  const windings = choice.form === 'centre-tap' ? 2 : 1;
  const primary = copperMass(t.primaryTurns, core.turnLength, t.primary.copperArea);
  const secondary = windings * copperMass(t.secondaryTurns, core.turnLength, t.secondary.copperArea);
  const coreMass = core.coreVolume * material.density;
  t.mass = coreMass + primary + secondary;
  const copper = primary + secondary;
  bill.windingMass = copper;
  bill.windingPrice = (primary * choice.primary.pricePerMass + secondary * choice.secondary.pricePerMass) / copper;
  bill.coreMass = coreMass;
  bill.corePrice = material.pricePerMass;
  woundCostAt(bill);
  t.price.price = bill.cost;
}
