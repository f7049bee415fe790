/** The output's excursion at the sheet's load step, for a design at one line: the worse of what slew and bandwidth leave. */
import type { Bank } from './capacitors/index.ts';
import { bandwidthExcursion, crossoverLimit, slewedExcursion } from './control/index.ts';
import type { Design } from './design.ts';
import type { Rail } from './rail/rail.ts';

/** Crossover over N·f that a loop is designed for: within the usual 1/10 … 1/6 (common practice, no source). */
export const CROSSOVER_SHARE = 0.125;

/** What a step meets. */
export interface StepCase {
  /** V. */
  readonly inputVoltage: number;
  readonly outputVoltage: number;
  /** Zero-bias inductance of one phase at the high end of its tolerance, H. */
  readonly inductance: number;
  /** Worst-case output bank. */
  readonly bank: Bank;
  /** Output ripple beforehand, V peak to peak. */
  readonly ripple: number;
}

/** Largest excursion, V, of either sign. */
export function stepExcursionOf(design: Design, rail: Rail, at: StepCase): number {
  const { step } = rail;
  if (step === undefined) return 0;
  const { bank } = at;
  const capacitance = bank.c1 + bank.c2;
  const resistance = bank.c2 > 0 ? (bank.r1 * bank.r2) / (bank.r1 + bank.r2) : bank.r1;
  const esl = bank.c2 > 0 ? (bank.l1 * bank.l2) / (bank.l1 + bank.l2) : bank.l1;
  const { stage } = design;
  const copies = design.phases * stage.chokes;
  const ripple = design.frequency * stage.chokeMultiple;
  const together = at.inductance / copies;
  const delay = 1 / (copies * ripple);
  const longest = Math.min(stage.highestDuty, Math.max(0, 1 - ripple * design.controller.minimumOffTime));
  // Mean voltage on the chokes at the longest duty: what the ideal duty says of the source behind them, times that duty.
  const source = at.outputVoltage / stage.idealDuty(at.inputVoltage, at.outputVoltage, design.transformer.ratio);
  const rising = Math.max(1e-3 * at.outputVoltage, source * longest - at.outputVoltage);
  const half = 0.5 * at.ripple;
  const up = slewedExcursion(step.current, step.slew, rising / together, delay, capacitance, resistance, esl, half);
  const down = slewedExcursion(
    step.current,
    step.slew,
    at.outputVoltage / together,
    delay,
    capacitance,
    resistance,
    esl,
    half,
  );
  const crossover = crossoverLimit(ripple, copies, CROSSOVER_SHARE);
  const bandwidth = bandwidthExcursion(step.current, crossover, capacitance) + half;
  return Math.max(up, down, bandwidth);
}
