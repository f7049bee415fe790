/**
 * One operating point of one design with everything behind it still at hand: the stage's state, temperatures, banks, losses.
 * What is handed over (netlist, order sheets, compensator) is written from here, so it cannot differ from the assessment.
 */
import type { Bank } from '../capacitors/index.ts';
import type { Design } from '../design.ts';
import { Evaluator, judgeDesign, solveActive } from '../evaluate.ts';
import type { Flavour } from '../flavour.ts';
import type { PlannedPoint } from '../plan.ts';
import type { PointSolver } from '../point-solver.ts';
import type { RailProblem } from '../problem.ts';
import type { Rail } from '../rail/rail.ts';
import type { Stage } from '../stages/contract.ts';
import { stageOf } from '../stages/list.ts';
import type { StageState } from '../stages/state.ts';

/** Times a point is solved until temperatures and duty agree to far below every stated band. */
const ROUNDS = 4;

/** A solved point. Valid until its evaluator solves another. */
export interface SolvedPoint {
  readonly rail: Rail;
  readonly design: Design;
  readonly planned: PlannedPoint;
  readonly state: StageState;
  readonly solver: PointSolver;
  readonly flavour: Flavour;
  readonly output: Bank;
  readonly input: Bank;
}

/** An evaluator of `problem` for one's own use, with the design of snapped `genes` judged. */
export function judgedEvaluator(problem: RailProblem, genes: Float64Array): Evaluator {
  const stages = problem.architectures.map(stageOf).filter((stage): stage is Stage => stage !== undefined);
  const e = new Evaluator(problem.rail, problem.catalogue, stages);
  judgeDesign(e, genes);
  return e;
}

/** Full load at nominal line and output. */
export function fullLoad(rail: Rail): PlannedPoint {
  return { inputVoltage: rail.input.nominal, outputVoltage: rail.output.nominal, load: 1, share: 0 };
}

/** Solves `planned` for the design of snapped `genes`, with usual values or, where `worst`, with worst-case ones. */
export function solveAt(
  problem: RailProblem,
  genes: Float64Array,
  planned: PlannedPoint,
  worst: boolean = false,
): SolvedPoint {
  const e = judgedEvaluator(problem, genes);
  const flavour = worst ? e.worst : e.usual;
  e.solver.warm = false;
  e.solver.wantsRipple = true;
  for (let i = 0; i < ROUNDS; i++) solveActive(e, flavour, planned);
  const { design, solver } = e;
  const { output, input } = flavour;
  return { rail: e.rail, design, planned, state: solver.state, solver, flavour, output, input };
}
