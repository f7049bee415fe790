/** The whole story of one design, told from the same pass over the operating points that the search's numbers come from. */

import { BOARD_PRICE, BOARD_THICKNESS, PACKING_FACTOR, PLACEMENT_PRICE } from './assembly.ts';
import type { Assessment, Corner, LimitFigure, LossItem, PartUse, PointReport, Share } from './assessment.ts';
import { boxVolume, priceAt } from './catalogue.ts';
import { cautionsOf } from './cautions.ts';
import { controllerCost, type Design } from './design.ts';
import { type Evaluator, judgeDesign, solveActive } from './evaluate.ts';
import { sinkCost, sinkVolume } from './heat/index.ts';
import { HOT } from './heat-balance.ts';
import { LOSS_SLOTS } from './ledger.ts';
import { listParts, PartsList } from './parts-list.ts';
import type { PlannedPoint } from './plan.ts';
import type { PointSolver } from './point-solver.ts';
import type { RailProblem } from './problem.ts';
import type { Rail } from './rail/rail.ts';
import { MODES } from './stages/state.ts';
import { tracesOf } from './traces.ts';

/** Loads of the efficiency curves, fractions of full load. */
const CURVE_LOADS = [0.02, 0.05, 0.1, 0.15, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9, 1];

/** Assesses the design of snapped `genes`. */
export function assessDesign(problem: RailProblem, e: Evaluator, genes: Float64Array): Assessment {
  const usual: PointReport[] = [];
  const worst: PointReport[] = [];
  judgeDesign(e, genes, (solver, planned, index) => {
    if (index < e.plan.usual.length) usual.push(reportPoint(solver, planned, e.design, e.usual));
    else worst.push(reportPoint(solver, planned, e.design, e.worst));
  });
  const points = [...usual, ...worst];
  const limits = limitFigures(e, points);
  const objectives = new Float64Array(problem.objectives.length);
  const violations = new Float64Array(problem.limits.length);
  const losses = lossItems(e.weighted);
  const parts = partUses(e.design, e.rail.quantity);
  const volumes = volumeShares(e, parts);
  const costs = costShares(e, parts);
  const curves = efficiencyCurves(e);
  // Read last, from a fresh pass: the curves above used the same scratch.
  problem.evaluate(genes, objectives, violations);
  return {
    id: problem.id(genes),
    family: problem.families.names[problem.families.of(genes)],
    design: problem.record(genes),
    feasible: violations.every((violation) => violation === 0) && objectives.every(Number.isFinite),
    objectives: problem.objectives.map(({ name, unit }, i) => ({ name, unit, value: objectives[i] })),
    limits,
    worstMargin: problem.judge(genes).worstMargin,
    points,
    losses,
    parts,
    volumes,
    costs,
    efficiencyCurves: curves,
    cautions: cautionsOf(e.rail, points),
  };
}

function limitFigures(e: Evaluator, points: readonly PointReport[]): LimitFigure[] {
  const { book } = e;
  return book.definitions.flatMap(({ name, unit, sense }, i) => {
    const slack = book.slack[i];
    if (slack === Number.POSITIVE_INFINITY) return [];
    const margin = sense === 'most' ? book.allowed[i] - book.value[i] : book.value[i] - book.allowed[i];
    const corner = cornerOf(points[book.corner[i]]);
    const figure = {
      name,
      unit,
      value: book.value[i],
      allowed: book.allowed[i],
      margin,
      slack,
      violation: slack >= 0 ? 0 : -slack,
      ...(corner === undefined ? {} : { corner }),
    };
    return [figure];
  });
}

function cornerOf(point: PointReport | undefined): Corner | undefined {
  if (point === undefined) return undefined;
  return { inputVoltage: point.inputVoltage, outputVoltage: point.outputVoltage, load: point.load };
}

function reportPoint(
  solver: PointSolver,
  planned: PlannedPoint,
  design: Design,
  flavour: Evaluator['usual'],
): PointReport {
  const { state, heat } = solver;
  const out = solver.outputPower;
  const inflow = out >= 0 ? out + solver.loss : -out;
  return {
    inputVoltage: planned.inputVoltage,
    outputVoltage: planned.outputVoltage,
    load: planned.load,
    share: planned.share,
    mode: MODES[state.mode],
    activePhases: state.activePhases,
    dutyCycle: state.dutyCycle,
    frequency: state.frequency,
    rippleCurrent: state.rippleCurrent,
    peakCurrent: state.peakCurrent,
    valleyCurrent: state.valleyCurrent,
    outputRipple: solver.outputRipple.ripple,
    inputRipple: solver.inputRipple.ripple,
    outputPower: out,
    inputPower: out + solver.loss,
    loss: solver.loss,
    efficiency: out === 0 ? 0 : 1 - solver.loss / inflow,
    losses: lossItems(solver.ledger),
    temperatures: {
      highSwitch: heat.temperature[HOT.high],
      [design.diode === undefined ? 'lowSwitch' : 'diode']: heat.temperature[HOT.low],
      inductor: heat.temperature[HOT.inductor],
      ...(design.stage.form === undefined ? {} : { transformer: heat.temperature[HOT.transformer] }),
      board: heat.boardTemperature,
    },
    traces: planned.share > 0 || planned.load === 1 ? tracesOf(solver, flavour) : [],
  };
}

function lossItems(ledger: Float64Array): LossItem[] {
  return LOSS_SLOTS.flatMap(([part, effect], i) => (ledger[i] !== 0 ? [{ part, effect, watts: ledger[i] }] : []));
}

/** The parts list of `design`, prices at `quantity` pieces. */
function partUses(design: Design, quantity: number): PartUse[] {
  const list = new PartsList();
  listParts(list, design);
  const uses: PartUse[] = [];
  for (let i = 0; i < list.length; i++) {
    const part = list.parts[i];
    const count = list.counts[i];
    if (part === undefined || count === 0) continue;
    const slot = list.slots[i];
    uses.push({
      slot,
      name: part.name,
      count,
      volume: count * boxVolume(part),
      area: count * part.length * part.width,
      height: part.height,
      mass: count * part.mass,
      cost: slot === 'controller' ? controllerCost(design, quantity) : count * priceAt(part, quantity),
    });
  }
  return uses;
}

function volumeShares(e: Evaluator, parts: readonly PartUse[]): Share[] {
  const shares = parts.map((part) => ({ name: part.slot, value: part.volume }));
  const air = parts.reduce((sum, part) => sum + part.volume, 0) * (PACKING_FACTOR - 1);
  shares.push({ name: 'spacing', value: air }, { name: 'board', value: e.assembly.boardArea * BOARD_THICKNESS });
  if (e.sink > 0) shares.push({ name: 'heatSink', value: sinkVolume(1 / e.sink, e.rail.airSpeed) });
  return shares;
}

function costShares(e: Evaluator, parts: readonly PartUse[]): Share[] {
  const shares = parts.map((part) => ({ name: part.slot, value: part.cost }));
  shares.push({ name: 'board', value: e.assembly.boardArea * BOARD_PRICE });
  shares.push({ name: 'placement', value: e.assembly.placements * PLACEMENT_PRICE });
  if (e.sink > 0) shares.push({ name: 'heatSink', value: sinkCost(sinkVolume(1 / e.sink, e.rail.airSpeed)) });
  return shares;
}

function efficiencyCurves(e: Evaluator): Assessment['efficiencyCurves'] {
  const { rail, solver } = e;
  const lines = [...new Set([rail.input.minimum, rail.input.nominal, rail.input.maximum])];
  const loads = curveLoads(rail);
  return lines.map((inputVoltage) => ({
    inputVoltage,
    load: loads,
    efficiency: loads.map((load) => {
      solveActive(e, e.usual, { inputVoltage, outputVoltage: rail.output.nominal, load, share: 0 });
      const out = solver.outputPower;
      return 1 - solver.loss / (out > 0 ? out + solver.loss : -out);
    }),
  }));
}

/** Loads of the curves; both signs where the profile has both. */
function curveLoads(rail: Rail): readonly number[] {
  if (!rail.profile.some((point) => point.fraction < 0)) return CURVE_LOADS;
  return [...CURVE_LOADS.map((load) => -load).reverse(), ...CURVE_LOADS];
}
