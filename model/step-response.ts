/** The output's excursion at the sheet's load step, for a design at one line: the worse of what slew and bandwidth leave. */
import { type Bank, createBank, createBankRipple, isPair, pairTransient } from './capacitors/index.ts';
import { crossoverLimit, slewedExcursion } from './control/index.ts';
import type { Design } from './design.ts';
import type { LoadStep } from './rail/rail.ts';
import { addSegment, clearWaveform, createWaveform } from './waveform/index.ts';

/** Crossover over N·f that a loop is designed for: within the usual 1/10 … 1/6 (common practice, no source). */
export const CROSSOVER_SHARE = 0.125;

/** What a step meets, and what it does. Reused; `forget` before another design. */
export class StepCase {
  /** V. */
  inputVoltage = 0.5;
  outputVoltage = 0.5;
  /** Zero-bias inductance of one phase at the high end of its tolerance, H. */
  inductance = 0.5;
  /** Worst-case output bank. */
  bank: Bank = createBank();
  /** Output ripple beforehand, V peak to peak. */
  ripple = 0.5;

  /** Largest excursion, V, of either sign. */
  excursion = 0.5;
  /** Excursion at the load's release, V, and the output voltage that it holds for: no input voltage changes it. */
  release = 0.5;
  releasedAt = Number.NaN;
  /** Excursion that the loop's bandwidth leaves, V. */
  bandwidth = 0.5;

  forget(): void {
    this.releasedAt = Number.NaN;
  }
}

/** A slewed excursion at hand: slew of the phases, A/s, from a delay on, s; what it comes to, V. */
const slew = { phases: 0.5, delay: 0.5, excursion: 0.5 };
const pulse = createWaveform(4);
const response = createBankRipple();

/** Writes the excursion of `design` at `step` to `at`. */
export function findStepExcursion(design: Design, step: LoadStep, at: StepCase): void {
  if (at.releasedAt !== at.outputVoltage) findRelease(design, step, at);
  const { stage } = design;
  const ripple = design.frequency * stage.chokeMultiple;
  const together = at.inductance / (design.phases * stage.chokes);
  const longest = Math.min(stage.highestDuty, Math.max(0, 1 - ripple * design.controller.minimumOffTime));
  // Mean voltage on the chokes at the longest duty: what the ideal duty says of the source behind them, times that duty.
  const source = at.outputVoltage / stage.idealDuty(at.inputVoltage, at.outputVoltage, design.transformer.ratio);
  const rising = Math.max(1e-3 * at.outputVoltage, source * longest - at.outputVoltage);
  slew.phases = rising / together;
  findSlewed(step, at.bank);
  at.excursion = Math.max(slew.excursion, at.release, at.bandwidth) + 0.5 * at.ripple;
}

/** Excursions that no input voltage changes: at release, and by the bandwidth. Leaves the delay in `slew`. */
function findRelease(design: Design, step: LoadStep, at: StepCase): void {
  const { stage } = design;
  const copies = design.phases * stage.chokes;
  const ripple = design.frequency * stage.chokeMultiple;
  slew.delay = 1 / (copies * ripple);
  slew.phases = (at.outputVoltage * copies) / at.inductance;
  findSlewed(step, at.bank);
  at.release = slew.excursion;
  at.releasedAt = at.outputVoltage;
  const crossover = crossoverLimit(ripple, copies, CROSSOVER_SHARE);
  at.bandwidth = step.current * bankImpedance(at.bank, 2 * Math.PI * crossover);
}

/** Excursion while the phases slew from the delay on: the bank carries what they do not yet bring. */
function findSlewed(step: LoadStep, bank: Bank): void {
  const { phases, delay } = slew;
  if (isPair(bank)) {
    deficit(step);
    pairTransient(bank, pulse, response);
    slew.excursion = Math.max(response.highest, 0);
  } else {
    slew.excursion = slewedExcursion(step.current, step.slew, phases, delay, bank.c1 + bank.c2, bank.r1, bank.l1, 0);
  }
}

/** The current that the bank must carry, until the phases have caught up: rising with the load, falling with the phases. */
function deficit(step: LoadStep): void {
  const { phases: phaseSlew, delay } = slew;
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
