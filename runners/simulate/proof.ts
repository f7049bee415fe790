/** A proof: a design's netlist simulated at several corners, predicted beside simulated. Plain data, stored in the run folder. */
import {
  agreesWith,
  type LimitFigure,
  MODEL_VERSION,
  type Prediction,
  type Proof,
  type ProofCorner,
  type ProofFigure,
  type ProofLimit,
  type RailProblem,
  solveAt,
  stageNetlist,
  stepNetlist,
} from '../../model/index.ts';
import { conductionIn, readFigure } from './figures.ts';
import type { Simulator } from './run.ts';

/** Band of the conduction loss, and by how much the simulated excursion may exceed the predicted one. */
const CONDUCTION = 0.03;
const STEP = 0.15;

/** Corners of a rail: every line at full load, and the lightest load that flows at nominal line. */
export function proofCorners({ rail }: RailProblem): { inputVoltage: number; outputVoltage: number; load: number }[] {
  const { input, output } = rail;
  const at = (inputVoltage: number, load: number) => ({ inputVoltage, outputVoltage: output.nominal, load });
  const lines = [...new Set([input.nominal, input.minimum, input.maximum])].map((volts) => at(volts, 1));
  const loads = rail.profile.map(({ fraction }) => fraction).filter((fraction) => fraction !== 0);
  const lightest = loads.reduce((low, load) => (Math.abs(load) < Math.abs(low) ? load : low), 1);
  const back = loads.filter((load) => load < 0).reduce((low, load) => Math.min(low, load), 0);
  const more = [lightest, back].filter((load) => load !== 0 && load !== 1);
  return [...lines, ...[...new Set(more)].map((load) => at(input.nominal, load))];
}

/** Simulates the design of snapped `genes`; `told` hears of each corner before it begins. */
export async function prove(
  problem: RailProblem,
  genes: Float64Array,
  simulator: Simulator,
  told: (text: string) => void = () => {},
): Promise<Proof> {
  const id = problem.id(genes);
  const corners: ProofCorner[] = [];
  for (const corner of proofCorners(problem)) {
    told(`${id}: ${corner.inputVoltage} V in, load ${Number((100 * corner.load).toPrecision(3))} %`);
    corners.push(await proveCorner(problem, id, genes, corner, simulator));
  }
  told(`${id}: load step`);
  const { limits, step } = await proveLimits(problem, id, genes, corners, simulator);
  const first = corners[0];
  if (first !== undefined && step !== undefined) corners[0] = { ...first, figures: [...first.figures, step] };
  const agrees = corners.every(({ figures, failure }) => failure === undefined && figures.every((one) => one.agrees));
  const head = { format: 'chopfront-proof', version: 1, tool: MODEL_VERSION } as const;
  return { ...head, id, simulator: simulator.name, corners, limits, agrees };
}

async function proveCorner(
  problem: RailProblem,
  id: string,
  genes: Float64Array,
  corner: { inputVoltage: number; outputVoltage: number; load: number },
  simulator: Simulator,
): Promise<ProofCorner> {
  const netlist = stageNetlist(problem, id, solveAt(problem, genes, { ...corner, share: 0 }));
  try {
    const run = await simulator.run(netlist.text);
    const figures = netlist.predictions.map((one) => figure(one, readFigure(run, one)));
    const loss = conductionIn(run, netlist.losses);
    return {
      ...corner,
      figures: [
        ...figures,
        figure({ name: 'conduction loss', unit: 'W', value: netlist.conduction, band: CONDUCTION }, loss),
      ],
    };
  } catch (error) {
    return { ...corner, figures: [], failure: error instanceof Error ? error.message : String(error) };
  }
}

function figure(
  prediction: Pick<Prediction, 'name' | 'unit' | 'value' | 'band' | 'floor' | 'bound'>,
  simulated: number,
): ProofFigure {
  const { name, unit, value, band } = prediction;
  const difference = value / simulated - 1;
  return { name, unit, predicted: value, simulated, difference, band, agrees: agreesWith(prediction, simulated) };
}

/** The sheet's ripple limits at the simulated corners and the load step in the closed loop at its worst corner. */
async function proveLimits(
  problem: RailProblem,
  id: string,
  genes: Float64Array,
  corners: readonly ProofCorner[],
  simulator: Simulator,
): Promise<{ limits: ProofLimit[]; step?: ProofFigure }> {
  const { rail } = problem;
  const ripple = [limitOf('outputRipple', corners, 'output ripple', rail.output.ripple)];
  if (rail.input.ripple !== undefined) {
    ripple.push(limitOf('inputRipple', corners, 'input ripple', rail.input.ripple));
  }
  const limit = problem.assess(genes).limits.find(({ name }) => name === 'loadStep');
  const simulated = limit === undefined ? undefined : await excursion(problem, id, genes, limit, simulator);
  if (limit === undefined || simulated === undefined) return { limits: ripple };
  const { value, allowed, unit } = limit;
  // The prediction is a bound: a loop that does better agrees with it.
  const step = figure({ name: 'load-step excursion', unit, value, band: STEP, bound: true }, simulated);
  const held = { name: 'loadStep', unit, simulated, allowed, holds: simulated <= allowed };
  return { limits: [...ripple, held], step };
}

function limitOf(name: string, corners: readonly ProofCorner[], figureName: string, allowed: number): ProofLimit {
  const found = corners.flatMap(({ figures }) => figures.filter((one) => one.name === figureName));
  const simulated = Math.max(0, ...found.map((one) => one.simulated));
  return { name, unit: 'V', simulated, allowed, holds: simulated <= allowed };
}

/** Largest excursion in the closed loop, V, with half the ripple; undefined where there is no loop. */
async function excursion(
  problem: RailProblem,
  id: string,
  genes: Float64Array,
  limit: LimitFigure,
  simulator: Simulator,
): Promise<number | undefined> {
  if (limit.corner === undefined) return undefined;
  const point = solveAt(problem, genes, { ...limit.corner, share: 0 }, true);
  const netlist = stepNetlist(problem, id, point);
  if (netlist === undefined) return undefined;
  const half = 0.5 * point.solver.outputRipple.ripple;
  const run = await simulator.run(netlist.text);
  const volts = run.vectors.get('v(out)') ?? [];
  const rest = volts[0] ?? Number.NaN;
  let worst = 0;
  for (let i = 0; i < volts.length; i++) worst = Math.max(worst, Math.abs((volts[i] ?? rest) - rest));
  return worst + half;
}
