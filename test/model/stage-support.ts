/** One operating point of a stage alone, with resistances given as they are: no temperature, no other part has a say. */
import {
  type BankRipple,
  bankRipple,
  createBank,
  createBankRipple,
  setGroup1,
  setGroup2,
} from '../../model/capacitors/index.ts';
import { Evaluator, judgeDesign } from '../../model/evaluate.ts';
import type { Rail } from '../../model/rail/rail.ts';
import { STAGES } from '../../model/stages/list.ts';
import type { StageState } from '../../model/stages/state.ts';
import { createWaveform, sumShifted, type Waveform } from '../../model/waveform/index.ts';
import { type HandMade, handMade, plainRail, type Where } from './support.ts';

/** Resistances of one phase, Ω; 0 where absent. */
export interface Resistances {
  readonly high?: number;
  readonly low?: number;
  /** Choke and copper. */
  readonly path?: number;
}

/** The solved state of a hand-made design's stage at `where`. */
export function solveStage(made: HandMade, where: Where, ohms: Resistances = {}, over: Partial<Rail> = {}): StageState {
  const { problem, genes } = handMade(made, plainRail(where, over));
  const stages = STAGES.filter((stage) => problem.architectures.includes(stage.architecture));
  const evaluator = new Evaluator(problem.rail, problem.catalogue, stages);
  judgeDesign(evaluator, genes);
  const { design, solver } = evaluator;
  const { state } = solver;
  state.inputVoltage = where.input;
  state.outputVoltage = where.output;
  state.loadCurrent = where.current * (where.load ?? 1);
  state.activePhases = design.phases;
  state.inductance = design.inductance;
  state.highResistance = ohms.high ?? 0;
  state.lowResistance = ohms.low ?? 0;
  state.pathResistance = ohms.path ?? 0;
  state.highTemperature = 298.15;
  state.lowTemperature = 298.15;
  design.stage.solve(design, state);
  return state;
}

/** Sum of `copies` shifted copies of `w`. */
export function summed(w: Waveform, copies: number): Waveform {
  const sum = createWaveform(64);
  sumShifted(w, copies, sum);
  return sum;
}

/** One group of a bank: F, Ω, H of the whole group. */
export type Group = readonly [capacitance: number, resistance: number, inductance: number];

/** Steady state of a bank of one or two groups under `current`. */
export function rippleOf(current: Waveform, first: Group, second: Group = [0, 0, 0]): BankRipple {
  const bank = createBank();
  setGroup1(bank, 1, ...first);
  setGroup2(bank, second[0] > 0 ? 1 : 0, ...second);
  const into = createBankRipple();
  bankRipple(bank, current, into);
  return into;
}
