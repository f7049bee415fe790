/**
 * A transformer wound to order: secondary between two halves of the primary, ungapped. What does not depend on the operating
 * point is worked out once a design; the fields are rewritten, nothing is allocated.
 */
import { pow } from '../optimizer/maths/index.ts';
import { surfacePower } from './heat/index.ts';
import {
  copperMass,
  copperResistivity,
  createWinding,
  dowellHarmonics,
  harmonicLoss,
  inductanceFactor,
  knownConstants,
  layWinding,
  leakageInductance,
  type MaterialConstants,
  magnetizingInductance,
  parallelThatFit,
  skinDepth,
  WINDING_AC,
  type Winding,
  windowFill,
  wireResistance,
  woundCost,
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
  mean,
  meanSquare,
  slopeMeanSquare,
  type Waveform,
} from './waveform/index.ts';

/** Insulation between winding sections, m, and how many gaps of it a sandwich has. */
const INSULATION = 0.2e-3;
const GAPS = 2;
/** Mating faces of an ungapped core, m (common practice, no source). */
const RESIDUAL_GAP = 10e-6;
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
const coefficients = new Float64Array(2 * HARMONICS);
const factors = new Float64Array(HARMONICS);
const loss = new Float64Array(2);

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
}

/**
 * Rewrites `t` for a choice at `frequency` (Hz), usual duty of one switch `duty`, in air of `airSpeed` (m/s) at `ambient` (K).
 * @source igse-2002 (core loss at 1 T)
 * @source holman-2010 (surface); the parts below name theirs
 * @valid ungapped; sine range of the material's fit
 */
export function windTransformer(
  t: Transformer,
  choice: TransformerChoice,
  frequency: number,
  duty: number,
  airSpeed: number,
  ambient: number,
): void {
  t.primaryTurns = choice.primaryTurns;
  t.secondaryTurns = choice.secondaryTurns;
  t.ratio = choice.primaryTurns / choice.secondaryTurns;
  layBoth(t, choice);
  inductances(t, choice);
  acFactors(t, choice, frequency, duty, ambient + RISE);
  const { material, core } = choice;
  const { ki } = knownConstants(t.constants, material);
  t.coreScale = ki * pow(frequency, material.frequencyExponent) * core.coreVolume;
  t.frequencyExponent = material.frequencyExponent;
  t.fluxExponent = material.fluxExponent;
  t.area = core.area;
  t.minimumArea = core.minimumArea;
  t.surfaceResistance = RISE / surfacePower(RISE, core.surface, Math.sqrt(core.surface / 6), airSpeed, ambient);
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
  t.primaryParallel = parallelThatFit(choice.primary, choice.primaryTurns, core.windowBreadth, room, MOST_PARALLEL);
  t.secondaryParallel = parallelThatFit(
    choice.secondary,
    choice.secondaryTurns,
    core.windowBreadth,
    room / windings,
    MOST_PARALLEL,
  );
  layWinding(choice.primary, choice.primaryTurns, t.primaryParallel, core.windowBreadth, 2, t.primary);
  // Between two halves of the primary the field in the secondary is zero in its middle; a centre tap's idle half spoils that.
  layWinding(
    choice.secondary,
    choice.secondaryTurns,
    t.secondaryParallel,
    core.windowBreadth,
    3 - windings,
    t.secondary,
  );
  t.fill = windowFill(t.primary.build + windings * t.secondary.build, GAPS * INSULATION, core.windowHeight);
  const resistivity = copperResistivity(298.15);
  t.primaryResistance = wireResistance(resistivity, choice.primaryTurns * core.turnLength, t.primary.copperArea);
  t.secondaryResistance = wireResistance(resistivity, choice.secondaryTurns * core.turnLength, t.secondary.copperArea);
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
function acFactors(
  t: Transformer,
  choice: TransformerChoice,
  frequency: number,
  duty: number,
  temperature: number,
): void {
  const depth = skinDepth(copperResistivity(temperature), frequency);
  const on = Math.min(0.45, Math.max(0.05, duty));
  primaryPulses(pulses, choice.form, on);
  t.primaryFactor = factorOf(pulses, t.primary, depth);
  secondaryPulses(pulses, choice.form, on);
  t.secondaryFactor = factorOf(pulses, t.secondary, depth);
}

/**
 * Loss of the current `w` (period 1 s) over dc resistance times its mean square.
 * @source dowell-1966, per harmonic
 * @source hurley-2000 bounds the rest
 * @valid current edges of a hundredth of a period
 */
function factorOf(w: Waveform, winding: Winding, depth: number): number {
  const x1 = winding.dowellThickness / depth;
  const average = mean(w);
  const square = meanSquare(w);
  dowellHarmonics(x1, winding.dowellLayers, HARMONICS, factors);
  harmonics(w, HARMONICS, coefficients);
  const slope = slopeMeanSquare(w);
  harmonicLoss(coefficients, factors, HARMONICS, square - average * average, slope, 1, x1, winding.dowellLayers, loss);
  return (average * average + loss[WINDING_AC]) / square;
}

/**
 * Primary: one pulse a period in a forward stage, one of each sign in a bridge.
 * @source erickson-maksimovic-2001, chapter 6
 * @valid ripple left out
 */
function primaryPulses(w: Waveform, form: WindingForm, on: number): void {
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
 * Secondary: as the primary in a doubler; in a centre tap each half carries its pulse and half of what freewheels.
 * @source erickson-maksimovic-2001, chapter 6; freewheeling current shared alike by both halves
 * @valid ripple left out
 */
function secondaryPulses(w: Waveform, form: WindingForm, on: number): void {
  if (form !== 'centre-tap') {
    primaryPulses(w, form, on);
    return;
  }
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
  const price = (primary * choice.primary.pricePerMass + secondary * choice.secondary.pricePerMass) / copper;
  t.price.price = woundCost(
    coreMass,
    material.pricePerMass,
    copper,
    price,
    WINDING_FIXED,
    LABOUR_PER_MASS,
    LABOUR_FIXED,
    MARGIN,
  );
}
