/**
 * A design resolved from its genes: the rows behind every choice, and everything that does not depend on the operating
 * point, worked out once. One object is reused for all designs of a search; nothing is allocated.
 */
import { ceramicCapacitance } from './capacitors/index.ts';
import { type Catalogue, priceAt } from './catalogue.ts';
import { EdgeFigures, prepareEdges } from './edge-figures.ts';
import { GENE } from './genes.ts';
import { boardPath, sideSurface, surfaceCoefficient } from './heat/index.ts';
import {
  copperResistivity,
  createInductorAtFrequency,
  inductorThermalResistance,
  prepareInductorAt,
  skinDepth,
} from './magnetics/index.ts';
import type { Bulk } from './parts/bulk.ts';
import type { Ceramic } from './parts/ceramic.ts';
import type { Controller } from './parts/controller.ts';
import type { Diode } from './parts/diode.ts';
import type { Inductor } from './parts/inductor.ts';
import type { Material } from './parts/material.ts';
import type { Driver, PowerStage } from './parts/power-stage.ts';
import type { Switch } from './parts/switch.ts';
import type { Rail } from './rail/rail.ts';
import { nearestRow } from './snap.ts';
import type { Stage } from './stages/contract.ts';
import { Transformer, type TransformerChoice, type WindingForm, windingDepth, windTransformer } from './transformer.ts';
import { WoundChoke, windChoke } from './wound-choke.ts';

/** Rise over ambient at which the skin depth of the windings is taken, K. */
const WINDING_RISE = 30;

/** One design. Counts are whole numbers stored as doubles; SI units. */
export class Design {
  stage: Stage;
  phases = 1;
  /** Hz. */
  frequency = 0.5;
  inductor: Inductor;
  /** Zero-bias inductance of the row, H. */
  inductance = 0.5;
  high: Switch;
  highParallel = 1;
  low: Switch;
  lowParallel = 1;
  diode: Diode | undefined;
  controller: Controller;
  /** Shortest on-time of controller and sheet, s: below it pulses are skipped. */
  shortestOnTime = 0.5;
  /** Gap between the switches of a leg, s; 0 before a diode. */
  gap = 0.5;
  /** Current that moves a leg's node from rail to rail within the gap, A. */
  gapCurrent = 0.5;
  /** What drives the gates: the controller, or the power stage's own driver. */
  driver: Driver;
  /** The power stage of a phase; absent with discrete switches. */
  powerStage: PowerStage | undefined;
  outputCeramic: Ceramic;
  outputCeramicCount = 1;
  outputBulk: Bulk | undefined;
  outputBulkCount = 0;
  inputCeramic: Ceramic;
  inputCeramicCount = 1;
  inputBulk: Bulk | undefined;
  inputBulkCount = 0;
  /** Clamp diodes of a two-switch stage, two to a phase; absent elsewhere. */
  clampDiode: Diode | undefined;
  /** Pieces of the input ceramic in each half of a half bridge's divider, one phase; 0 elsewhere. */
  dividerCount = 0;
  /** Their ESR in one half, Ω. */
  dividerResistance = 0.5;
  /** The input filter's choke, chosen once the design's worst input ripple is known; absent where none is needed. */
  filterChoke: Inductor | undefined;
  /** Whether the legs of a full bridge are shifted against each other, so that they turn on at zero voltage. */
  phaseShifted = false;
  /** The transformer of a phase; its fields mean nothing in a stage without one. */
  readonly transformer = new Transformer();
  readonly transformerChoice: TransformerChoice | undefined;
  /** The choke's own wound form; `inductor` is this object where the choke is wound to order. */
  readonly woundChoke = new WoundChoke();
  chokeMaterial: Material | undefined;
  /** Whether the low switch turns off at zero current at light load (the sheet's policy and the controller's ability). */
  emulates = false;
  /** Whether phases are dropped at light load. */
  sheds = false;

  /** Edge and gate figures of both positions; those of the low one mean nothing under a diode. */
  readonly highEdges = new EdgeFigures();
  readonly lowEdges = new EdgeFigures();
  /** Core and winding figures of the inductor at this frequency. */
  readonly inductorAt = createInductorAtFrequency();
  /** Stocked choke to board, wound one to air, K/W. */
  inductorThermalResistance = 0.5;
  /** Stocked choke to air by its sides, W/K; its top stands for the board that it covers. */
  inductorFaces = 0.5;

  /** Heat paths of the stocked chokes seen so far: see `stockedHeat`. */
  readonly stockedHeats = new Map<Inductor, Float64Array>();

  constructor(rail: Rail, catalogue: Catalogue, stages: readonly Stage[]) {
    this.stage = stages[0];
    this.inductor = this.woundChoke;
    this.high = catalogue.highSwitches[0];
    this.low = catalogue.lowSwitches[0];
    this.diode = catalogue.diodes[0];
    this.controller = catalogue.controllers[0];
    this.driver = this.controller;
    this.outputCeramic = catalogue.outputCeramics[0];
    this.inputCeramic = catalogue.inputCeramics[0];
    this.outputBulk = catalogue.outputBulks[0];
    this.inputBulk = catalogue.inputBulks[0];
    this.inductorAt.depth = skinDepth(copperResistivity(rail.ambient + WINDING_RISE), 1);
    this.emulates = rail.lightLoad !== 'forced-continuous';
    const core = catalogue.transformerCores[0];
    const material = catalogue.transformerMaterials[0];
    const wire = catalogue.conductors[0];
    if (core !== undefined && material !== undefined && wire !== undefined) {
      this.transformerChoice = {
        core,
        material,
        primary: wire,
        secondary: wire,
        primaryTurns: 1,
        secondaryTurns: 1,
        form: 'forward',
        frequency: 0.5,
        duty: 0.5,
        depth: windingDepth(rail),
      };
    }
  }

  /** Drop of the diode at zero current and junction temperature `temperature` (K), V; 0 without a diode. */
  diodeDrop(temperature: number): number {
    if (this.diode === undefined) return 0;
    const drop = this.diode.forwardDrop + this.diode.dropTempco * (temperature - 298.15);
    return Math.max(drop, 0);
  }
}

/** Reads snapped `genes` into `design`. */
export function resolveDesign(
  design: Design,
  genes: Float64Array,
  rail: Rail,
  catalogue: Catalogue,
  stages: readonly Stage[],
): void {
  design.stage = stages[genes[GENE.architecture]];
  design.phases = genes[GENE.phases];
  design.frequency = genes[GENE.frequency];
  resolveChoke(design, genes, rail, catalogue);
  design.diode = design.stage.diode ? catalogue.diodes[genes[GENE.diode]] : undefined;
  design.controller = catalogue.controllers[genes[GENE.controller]];
  design.shortestOnTime = Math.max(design.controller.minimumOnTime, rail.limits.minimumOnTime ?? 0);
  resolveLeg(design, genes, catalogue);
  resolveGap(design);
  design.outputCeramic = catalogue.outputCeramics[genes[GENE.outputCeramic]];
  design.outputCeramicCount = genes[GENE.outputCeramicCount];
  design.outputBulkCount = genes[GENE.outputBulkCount];
  design.outputBulk = design.outputBulkCount > 0 ? catalogue.outputBulks[genes[GENE.outputBulk]] : undefined;
  design.inputCeramic = catalogue.inputCeramics[genes[GENE.inputCeramic]];
  design.inputCeramicCount = genes[GENE.inputCeramicCount];
  design.inputBulkCount = genes[GENE.inputBulkCount];
  design.inputBulk = design.inputBulkCount > 0 ? catalogue.inputBulks[genes[GENE.inputBulk]] : undefined;
  const asked = rail.lightLoad !== 'forced-continuous';
  design.clampDiode = undefined;
  design.dividerCount = 0;
  design.phaseShifted = genes[GENE.bridgeControl] > 0;
  if (design.stage.windings !== undefined) resolveTransformer(design, genes, rail, catalogue, design.stage.windings);
  design.emulates = !design.stage.diode && asked && design.controller.diodeEmulation;
  design.sheds = rail.lightLoad === 'phase-shedding' && design.controller.phaseShedding && design.phases > 1;
}

/** Discrete switches under the controller's drivers, or a power stage under its own. */
function resolveLeg(design: Design, genes: Float64Array, catalogue: Catalogue): void {
  const packaged = design.stage.packagedLegs && genes[GENE.legBuild] > 0;
  const leg = packaged ? catalogue.legs[genes[GENE.powerStage]] : undefined;
  design.powerStage = leg?.stage;
  design.driver = leg?.driver ?? design.controller;
  design.high = leg?.high ?? catalogue.highSwitches[genes[GENE.highSwitch]];
  design.highParallel = packaged ? 1 : genes[GENE.highParallel];
  design.low = leg?.low ?? catalogue.lowSwitches[genes[GENE.lowSwitch]];
  design.lowParallel = packaged ? 1 : genes[GENE.lowParallel];
  prepareEdges(design.highEdges, design.high, design.highParallel, design.driver);
  prepareEdges(design.lowEdges, design.low, design.lowParallel, design.driver);
}

/** Charge of a node that is taken at least, C: one without any moves at once. */
const LEAST_CHARGE = 1e-15;

/**
 * Gap of a leg and the current that moves its node within it.
 * @derivation charge over time: the current that moves the node within the gap
 * @valid charge at the rows' test voltage
 */
function resolveGap(design: Design): void {
  design.gap = design.diode === undefined ? design.driver.deadTime : 0;
  const own = design.lowParallel * design.low.outputCharge;
  const node = design.stage.form === undefined ? own + design.highParallel * design.high.outputCharge : own;
  design.gapCurrent = design.gap > 0 ? Math.max(LEAST_CHARGE, node) / design.gap : 1;
}

function resolveChoke(design: Design, genes: Float64Array, rail: Rail, catalogue: Catalogue): void {
  if (genes[GENE.chokeBuild] < woundIndex(catalogue)) {
    const series = catalogue.inductorSeries[genes[GENE.inductorSeries]];
    design.inductor = series.rows[nearestRow(series, genes)];
    design.chokeMaterial = undefined;
    stockedHeat(design, design.inductor, rail);
  } else {
    design.chokeMaterial = catalogue.materials[genes[GENE.chokeMaterial]];
    design.woundChoke.turns = genes[GENE.chokeTurns];
    design.woundChoke.inductance = genes[GENE.inductance];
    const core = catalogue.chokeCores[genes[GENE.chokeCore]];
    windChoke(design.woundChoke, core, design.chokeMaterial, catalogue.conductors[genes[GENE.chokeConductor]], rail);
    design.inductor = design.woundChoke;
    design.inductorThermalResistance = design.woundChoke.surfaceResistance;
    design.inductorFaces = 0;
  }
  design.inductance = design.inductor.inductance;
  const ripple = design.frequency * design.stage.chokeMultiple;
  design.inductorAt.frequency = ripple;
  prepareInductorAt(design.inductor, design.inductorAt);
}

/** Rise at which the conductance of a choke's faces is taken, K. */
const FACE_RISE = 40;
/** Ambient of the rating of stocked chokes, K. */
const RATING_AMBIENT = 298.15;

/** Fills in how a stocked choke gives off its heat; worked out once a row, for one rail's designs use the same rows again and again. */
function stockedHeat(design: Design, row: Inductor, rail: Rail): void {
  let paths = design.stockedHeats.get(row);
  if (paths === undefined) {
    paths = heatPathsOf(row, rail);
    design.stockedHeats.set(row, paths);
  }
  design.inductorThermalResistance = paths[0];
  design.inductorFaces = paths[1];
}

/**
 * Divides the rated conductance of a stocked choke: its way into the board, K/W, and its faces in the sheet's air, W/K.
 * @source churchill-1977 and radiation for the faces; the rest of the rated conductance is the way into the board
 * @valid rated in still air on a board
 */
function heatPathsOf(row: Inductor, rail: Rail): Float64Array {
  const sides = sideSurface(row.length, row.width, row.height);
  const faces = sides + row.length * row.width;
  const size = Math.sqrt(0.2 * faces);
  const rated = inductorThermalResistance(row.ratedCurrent, row.ratedRise, row.dcResistance);
  const still = surfaceCoefficient(row.ratedRise, size, 0, RATING_AMBIENT);
  const air = surfaceCoefficient(FACE_RISE, size, rail.airSpeed, rail.ambient);
  return Float64Array.of(boardPath(rated, faces * still), sides * air);
}

/** Value of the gene `chokeBuild` from which on chokes are wound. */
function woundIndex(catalogue: Catalogue): number {
  return catalogue.inductorSeries.length > 0 ? 1 : 0;
}

function resolveTransformer(
  design: Design,
  genes: Float64Array,
  rail: Rail,
  catalogue: Catalogue,
  form: WindingForm,
): void {
  const choice = design.transformerChoice;
  if (choice === undefined) return;
  choice.core = catalogue.transformerCores[genes[GENE.transformerCore]];
  choice.material = catalogue.transformerMaterials[genes[GENE.transformerMaterial]];
  choice.primary = catalogue.conductors[genes[GENE.primaryConductor]];
  choice.secondary = catalogue.conductors[genes[GENE.secondaryConductor]];
  choice.primaryTurns = genes[GENE.primaryTurns];
  choice.secondaryTurns = genes[GENE.secondaryTurns];
  choice.form = form;
  design.clampDiode = design.stage.form?.doubleEnded === false ? catalogue.clampDiodes[0] : undefined;
  const ratio = choice.primaryTurns / choice.secondaryTurns;
  choice.frequency = design.frequency;
  choice.duty = design.stage.idealDuty(rail.input.nominal, rail.output.nominal, ratio) / design.stage.chokeMultiple;
  design.transformer.ratio = ratio;
  sizeDivider(design, rail);
  windTransformer(design.transformer, choice, rail);
}

/** Ripple of a half bridge's divider as a share of the half input that it holds (common practice, no source). */
const DIVIDER_RIPPLE = 0.05;

/**
 * The divider of a half bridge from pieces of the input ceramic: each half carries half of the primary current, keeps its
 * midpoint within the usual ripple, and every piece within its rated current.
 * @derivation charge of half a period of half the primary current over the allowed ripple
 * @valid ripple small beside the half input
 */
function sizeDivider(design: Design, rail: Rail): void {
  const { form } = design.stage;
  const { ratio } = design.transformer;
  design.dividerCount = 0;
  if (form === undefined || form.share === 1) return;
  const { inputCeramic: row } = design;
  const current = rail.output.current / (design.phases * ratio * (form.doubler ? 2 : 1));
  const half = 0.5 * rail.input.minimum;
  const held = ceramicCapacitance(row.capacitance, row.smallSignalFactor, row.halvingVoltage, row.biasExponent, half);
  const charge = (0.5 * current) / (2 * design.frequency);
  const byRipple = charge / (DIVIDER_RIPPLE * half * held);
  const byCurrent = (0.5 * current) / row.rippleRating;
  design.dividerCount = Math.ceil(Math.max(byRipple, byCurrent));
  design.dividerResistance = row.seriesResistance / design.dividerCount;
}

/** Cost of the controller and its drivers for all phases, in the sheet's currency. */
export function controllerCost(design: Design, quantity: number): number {
  return priceAt(design.controller, quantity) * (1 + design.controller.phasePriceShare * (design.phases - 1));
}
