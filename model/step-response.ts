/** The output's excursion at the sheet's load step, for a design at one line: the worse of what slew and bandwidth leave. */
import { type Bank, createBankRipple, isPair, pairTransient } from './capacitors/index.ts';
import { crossoverLimit, slewedExcursion } from './control/index.ts';
import type { Design } from './design.ts';
import type { LoadStep, Rail } from './rail/rail.ts';
import { addSegment, clearWaveform, createWaveform } from './waveform/index.ts';

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

const pulse = createWaveform(4);
const response = createBankRipple();

/** Largest excursion, V, of either sign. */
export function stepExcursionOf(design: Design, rail: Rail, at: StepCase): number {
  const { step } = rail;
  if (step === undefined) return 0;
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
  const up = slewed(step, rising / together, delay, at.bank);
  const down = slewed(step, at.outputVoltage / together, delay, at.bank);
  const crossover = crossoverLimit(ripple, copies, CROSSOVER_SHARE);
  const bandwidth = step.current * bankImpedance(at.bank, 2 * Math.PI * crossover);
  return Math.max(up, down, bandwidth) + half;
}

/** Excursion while the phases slew by `phaseSlew` A/s from `delay` s on, V: the bank carries what they do not yet bring. */
function slewed(step: LoadStep, phaseSlew: number, delay: number, bank: Bank): number {
  if (!isPair(bank)) {
    return slewedExcursion(step.current, step.slew, phaseSlew, delay, bank.c1 + bank.c2, bank.r1, bank.l1, 0);
  }
  deficit(step, phaseSlew, delay);
  pairTransient(bank, pulse, response);
  return Math.max(response.highest, 0);
}

/** The current that the bank must carry, until the phases have caught up: rising with the load, falling with the phases. */
function deficit(step: LoadStep, phaseSlew: number, delay: number): void {
  const ramp = step.current / step.slew;
  const first = Math.min(ramp, delay);
  const second = Math.max(ramp, delay);
  clearWaveform(pulse);
  const atFirst = step.slew * first;
  const between = ramp > delay ? step.slew - phaseSlew : 0;
  const atSecond = Math.max(0, atFirst + between * (second - first));
  addSegment(pulse, first, 0, atFirst);
  addSegment(pulse, second - first, atFirst, atSecond);
  addSegment(pulse, Math.max(atSecond / phaseSlew, 1e-12), atSecond, 0);
}

/** |Z| of a bank at `omega` (rad/s), Ω. */
function bankImpedance(bank: Bank, omega: number): number {
  const x1 = omega * bank.l1 - 1 / (omega * bank.c1);
  const z1 = bank.r1 * bank.r1 + x1 * x1;
  let re = bank.r1 / z1;
  let im = -x1 / z1;
  if (bank.c2 > 0) {
    const x2 = omega * bank.l2 - 1 / (omega * bank.c2);
    const z2 = bank.r2 * bank.r2 + x2 * x2;
    re += bank.r2 / z2;
    im -= x2 / z2;
  }
  return 1 / Math.sqrt(re * re + im * im);
}
