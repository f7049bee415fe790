/** The output's excursion at the sheet's load step, for a design at one line: the worse of what slew and bandwidth leave. */
import { type Bank, createBank, createBankRipple, isPair, pairTransient } from './capacitors/index.ts';
import { crossoverLimit, slewedExcursionAt } from './control/index.ts';
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

/** The slewed excursion at hand. */
class Slew {
  /** Slew of the phases, A/s, from the delay on, s. */
  phases = 0.5;
  delay = 0.5;
  /** Angular frequency that the bank's impedance is asked at, rad/s, and that impedance, Ω. */
  omega = 0.5;
  impedance = 0.5;
  /** What it comes to, V. */
  excursion = 0.5;
}

const slew = new Slew();
const given = new Float64Array(8);
const pulse = createWaveform(4);
const response = createBankRipple();

/**
 * Writes the excursion of `design` at `step` to `at`.
 * @source slus660h, equation 22 (application)
 * @source qiu-2004 bounds the loop
 * @valid ideal control: the longest duty at once
 */
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

/**
 * Excursions that no input voltage changes: at release, and by the bandwidth. Leaves the delay in `slew`.
 * @source slus660h, equation 22 (release); bandwidth form ΔI·|Z| at the crossover
 * @valid as `findStepExcursion`
 */
function findRelease(design: Design, step: LoadStep, at: StepCase): void {
  const { stage } = design;
  const copies = design.phases * stage.chokes;
  const ripple = design.frequency * stage.chokeMultiple;
  slew.delay = 1 / (copies * ripple);
  slew.phases = (at.outputVoltage * copies) / at.inductance;
  findSlewed(step, at.bank);
  at.release = slew.excursion;
  at.releasedAt = at.outputVoltage;
  slew.omega = 2 * Math.PI * crossoverLimit(ripple, copies, CROSSOVER_SHARE);
  findImpedance(at.bank);
  at.bandwidth = step.current * slew.impedance;
}

/**
 * Excursion while the phases slew from the delay on: the bank carries what they do not yet bring.
 * @derivation piecewise-linear capacitor current, integrated exactly
 * @valid slews > 0
 */
function findSlewed(step: LoadStep, bank: Bank): void {
  const { phases, delay } = slew;
  if (isPair(bank)) {
    deficit(step);
    pairTransient(bank, pulse, response);
    slew.excursion = Math.max(response.highest, 0);
  } else {
    given[0] = step.current;
    given[1] = step.slew;
    given[2] = phases;
    given[3] = delay;
    given[4] = bank.c1 + bank.c2;
    given[5] = bank.r1;
    given[6] = bank.l1;
    given[7] = 0;
    slewedExcursionAt(given);
    slew.excursion = given[0];
  }
}

/**
 * The current that the bank must carry, until the phases have caught up: rising with the load, falling with the phases.
 * @derivation load's ramp less the phases' ramp, until they meet
 * @valid slews > 0
 */
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

/**
 * Writes |Z| of a bank at the frequency in `slew`.
 * @derivation admittances of two R–L–C branches add
 * @valid c1 > 0
 */
function findImpedance(bank: Bank): void {
  const { omega } = slew;
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
  slew.impedance = 1 / Math.sqrt(re * re + im * im);
}
