/**
 * Judges one design: every operating point solved, every limit noted, every objective summed. The search calls this
 * millions of times; the assessment calls the same function with a listener that sees each point as it stands.
 */
import { Assembly, assemble } from './assembly.ts';
import type { Catalogue } from './catalogue.ts';
import { filterImpedanceLimit } from './control/index.ts';
import { Design, resolveDesign } from './design.ts';
import { Flavour, prepareFlavour, prepareResistances } from './flavour.ts';
import { boardConductance, sinkCost, sinkMass, volumetricResistance } from './heat/index.ts';
import { HeatBalance } from './heat-balance.ts';
import { chooseFilterChoke, filterCurrent, filterInductance, findSourcePath, SourcePath } from './input-filter.ts';
import { LOSS_SLOTS } from './ledger.ts';
import { LimitBook } from './limits/book.ts';
import { judgeConstruction } from './limits/construction.ts';
import { addWear, judgeLife } from './limits/life.ts';
import { limitsOf } from './limits/list.ts';
import { type LimitPlaces, limitPlaces } from './limits/places.ts';
import { judgeHeat, judgePoint, judgeRipple } from './limits/point.ts';
import { type PlannedPoint, type PointPlan, planPoints } from './plan.ts';
import { settleHeat, solvePoint, solveRipple } from './point.ts';
import { settleLosses } from './point-heat.ts';
import { PointSolver } from './point-solver.ts';
import type { Rail } from './rail/rail.ts';
import type { Stage } from './stages/contract.ts';
import { StepCase } from './step-response.ts';

/** Sees each solved point: `index` counts usual points first, then worst points. */
export type PointListener = (solver: PointSolver, planned: PlannedPoint, index: number) => void;

/** Everything that one rail's designs are judged with. One per thread; holds the scratch. */
export class Evaluator {
  readonly rail: Rail;
  readonly catalogue: Catalogue;
  readonly stages: readonly Stage[];
  readonly plan: PointPlan;
  readonly book: LimitBook;
  readonly places: LimitPlaces;
  readonly design: Design;
  readonly assembly = new Assembly();
  readonly usual = new Flavour(false);
  readonly worst = new Flavour(true);
  readonly solver: PointSolver;
  /** Heat of the usual points in turn, and of each worst point: those are balanced again once the heat sink is known. */
  readonly usualHeat = new HeatBalance();
  readonly worstHeat: readonly HeatBalance[];
  /** Volumetric resistance of a sink in the sheet's air, m³·K/W. */
  readonly sinkVolume: number;
  /** Source and filter choke. */
  readonly source = new SourcePath();
  /** The load step at the point at hand. */
  readonly step = new StepCase();
  /** Conductance of the bare board, W/K. */
  readonly bareBoard: number;
  /** Wear of the output's and the input's wet electrolytics over the profile, 1/s. */
  readonly wear = new Float64Array(2);
  /** W by slot, profile-weighted. */
  readonly weighted = new Float64Array(LOSS_SLOTS.length);
  /** Conductance of the heat sink of the design at hand, W/K; 0 without one. */
  sink = 0.5;
  /** Inductance that the worst ripple so far asks of source and filter together, H. */
  filterNeed = 0.5;
  /** Input current that a filter choke carries, A. */
  readonly filterCurrent: number;
  /** W, profile-weighted loss and power that flows in. */
  loss = 0.5;
  inflow = 0.5;
  /** W, loss at full load, usual values. */
  fullLoss = 0.5;

  /** Changes what `prepare` filled in, for a sample of the spread; absent in a search. */
  adjust: ((e: Evaluator) => void) | undefined;
  /** Conductance of the sink that is built, W/K, where it is not to be sized again. */
  builtSink: number | undefined;

  constructor(rail: Rail, catalogue: Catalogue, stages: readonly Stage[]) {
    this.rail = rail;
    this.catalogue = catalogue;
    this.stages = stages;
    this.plan = planPoints(rail);
    this.book = new LimitBook(limitsOf(rail));
    this.places = limitPlaces(this.book, rail);
    this.design = new Design(rail, catalogue, stages);
    this.solver = new PointSolver(rail, this.usualHeat);
    this.worstHeat = this.plan.worst.map(() => new HeatBalance());
    this.filterCurrent = filterCurrent(rail);
    this.sinkVolume = volumetricResistance(rail.airSpeed);
    this.bareBoard = boardConductance(rail.coolingArea, rail.airSpeed);
  }
}

/** Judges the design of snapped `genes`; results stand in `e`. `listener` is for the assessment alone. */
export function judgeDesign(e: Evaluator, genes: Float64Array, listener?: PointListener): void {
  prepare(e, genes);
  judgeAllWorst(e, listener);
  judgeBetween(e);
  addFilter(e);
  sumUsual(e, listener);
  addSink(e);
  judgeConstruction(e);
}

function prepare(e: Evaluator, genes: Float64Array): void {
  const { design } = e;
  resolveDesign(design, genes, e.rail, e.catalogue, e.stages);
  design.filterChoke = undefined;
  prepareFlavour(e.usual, design, e.rail);
  prepareFlavour(e.worst, design, e.rail);
  e.adjust?.(e);
  prepareResistances(e.usual, design);
  prepareResistances(e.worst, design);
  assemble(e.assembly, design, e.rail.quantity);
  e.book.clear();
  e.step.forget();
}

/** Judges the worst points: currents and ripple as each is solved, heat once the sink that they ask for is whole. */
function judgeAllWorst(e: Evaluator, listener?: PointListener): void {
  e.sink = e.builtSink ?? 0;
  e.filterNeed = 0;
  solveWorst(e);
  const { worstHeat, plan } = e;
  for (let i = 0; i < worstHeat.length; i++) {
    settleHeat(worstHeat[i], e.bareBoard + e.sink);
    judgeHeat(e, worstHeat[i], plan.usual.length + i);
  }
  if (listener !== undefined) showWorst(e, listener);
}

/**
 * Solves and judges every worst point in turn. The heat sink begins with none and grows as a point asks for more; that point is
 * then solved again, so none is solved hotter than its own limits allow.
 */
function solveWorst(e: Evaluator, shown?: (index: number) => void): void {
  const { solver, plan } = e;
  // Every pass starts cold: what came before it must not show in its last digits.
  solver.warm = false;
  solver.wantsRipple = true;
  for (let i = 0; i < plan.worst.length; i++) {
    solver.heat = e.worstHeat[i];
    solveActive(e, e.worst, plan.worst[i]);
    if (growSink(e)) {
      solveActive(e, e.worst, plan.worst[i]);
      growSink(e);
    }
    judgePoint(e, plan.worst[i], plan.usual.length + i);
    noteRipple(e);
    shown?.(i);
  }
}

/** Adds to the sink what the solved point still needs; whether it did. */
function growSink(e: Evaluator): boolean {
  const needed = e.solver.heat.sinkNeeded;
  if (!(needed > 0) || e.builtSink !== undefined) return false;
  e.sink += needed;
  return true;
}

/** Solves the worst points once more, the same way, and shows each as it stands under the whole sink. */
function showWorst(e: Evaluator, listener: PointListener): void {
  const { sink, solver, plan } = e;
  e.sink = e.builtSink ?? 0;
  solveWorst(e, (i) => {
    settleHeat(solver.heat, e.bareBoard + sink);
    settleLosses(solver, e.design);
    listener(solver, plan.worst[i], plan.usual.length + i);
  });
  e.sink = sink;
}

/** Judges ripple at input voltages inside the range where N chokes cancel worst, near D = (2j − 1)/(2N). */
function judgeBetween(e: Evaluator): void {
  const { phases, stage, transformer } = e.design;
  const copies = phases * stage.chokes;
  if (copies < 2) return;
  for (const span of e.plan.spans) {
    const dutyAtOne = stage.idealDuty(1, span.outputVoltage, transformer.ratio);
    for (let j = 1; j <= copies; j++) {
      const inputVoltage = (dutyAtOne * 2 * copies) / (2 * j - 1);
      if (!(inputVoltage > span.low && inputVoltage < span.high)) continue;
      e.solver.state.inputVoltage = inputVoltage;
      e.solver.state.outputVoltage = span.outputVoltage;
      solveRipple(e.solver, e.design, e.worst);
      judgeRipple(e);
    }
  }
}

/** Notes what the input ripple of the solved point asks of the filter. */
function noteRipple(e: Evaluator): void {
  const allowed = e.rail.input.sourceRipple;
  if (allowed === undefined) return;
  const frequency = 1 / e.solver.drawn.period;
  e.filterNeed = Math.max(e.filterNeed, filterInductance(e.solver.inputRipple.ripple, frequency, allowed));
}

/** Chooses the filter choke, adds it to the construction, and judges the filter before the converter's negative resistance. */
function addFilter(e: Evaluator): void {
  const { design, rail, book, places } = e;
  const missing = e.filterNeed - rail.input.sourceInductance;
  if (missing > 0) {
    design.filterChoke = chooseFilterChoke(e.catalogue.filterChokes, missing, e.filterCurrent);
    book.judge(places.filterChoke, design.filterChoke === undefined ? 0 : 1, 1, -1);
    assemble(e.assembly, design, rail.quantity);
  }
  findSourcePath(e.source, design, rail, e.worst.input);
  if (!(e.source.inductance > 0)) return;
  book.found = e.source.peak;
  book.bound = filterImpedanceLimit(rail.input.minimum, rail.input.minimum * e.filterCurrent);
  book.weigh(places.filterDamping, -1);
}

/** Sums the profile at nominal input with usual values. */
function sumUsual(e: Evaluator, listener?: PointListener): void {
  const { solver, weighted } = e;
  weighted.fill(0);
  e.wear.fill(0);
  e.loss = 0;
  e.inflow = 0;
  solver.warm = false;
  solver.heat = e.usualHeat;
  for (let i = 0; i < e.plan.usual.length; i++) {
    const planned = e.plan.usual[i];
    solver.wantsRipple = listener !== undefined;
    solveActive(e, e.usual, planned);
    solver.inputPower = solver.outputPower >= 0 ? solver.outputPower + solver.loss : -solver.outputPower;
    e.loss += planned.share * solver.loss;
    e.inflow += planned.share * solver.inputPower;
    if (planned.load === 1) e.fullLoss = solver.loss;
    if (planned.share > 0) for (let k = 0; k < weighted.length; k++) weighted[k] += planned.share * solver.ledger[k];
    judgeUsual(e, planned, i);
    addWear(e, planned);
    listener?.(solver, planned, i);
  }
  judgeLife(e);
}

/** Efficiency and no-load limits at a usual point. */
function judgeUsual(e: Evaluator, planned: PlannedPoint, index: number): void {
  const { rail, places, book, solver } = e;
  if (planned.load === 0) {
    const allowed = rail.limits.noLoadPower;
    if (allowed === undefined) return;
    book.found = solver.loss;
    book.bound = allowed;
    book.weigh(places.noLoadPower, index);
    return;
  }
  const limits = rail.limits.efficiency;
  for (let k = 0; k < limits.length; k++) {
    if (limits[k].load !== planned.load) continue;
    const efficiency = 1 - solver.loss / solver.inputPower;
    book.found = efficiency;
    book.bound = limits[k].atLeast;
    book.scale = 1 - limits[k].atLeast;
    book.weighByScale(places.efficiency[k], index);
  }
}

/** Solves a point with the phase count that the light-load policy asks for: all, or the one with the least loss. */
export function solveActive(e: Evaluator, flavour: Flavour, planned: PlannedPoint): void {
  const { design, solver } = e;
  solver.conductance = e.bareBoard + e.sink;
  let best = design.phases;
  if (design.sheds) {
    const fewest = Math.max(1, Math.ceil(design.phases * Math.abs(planned.load)));
    let least = Number.POSITIVE_INFINITY;
    for (let n = design.phases; n >= fewest; n--) {
      solvePoint(solver, design, flavour, planned, n);
      if (!(solver.loss < least)) continue;
      least = solver.loss;
      best = n;
    }
    if (best === fewest) return;
  }
  solvePoint(solver, design, flavour, planned, best);
}

/** Adds the heat sink to volume, mass and cost. */
function addSink(e: Evaluator): void {
  if (!(e.sink > 0)) return;
  const volume = e.sinkVolume / (1 / e.sink);
  e.assembly.volume += volume;
  // The sink covers the board that the sheet gives to cooling.
  e.assembly.height = Math.max(e.assembly.height, volume / e.rail.coolingArea);
  e.assembly.mass += sinkMass(volume);
  e.assembly.cost += sinkCost(volume);
}
