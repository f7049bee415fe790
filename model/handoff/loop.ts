/** The control loop that a design is handed over with: plant, type-III compensator, margins found on the loop itself. */
import type { Bank } from '../capacitors/index.ts';
import {
  type Compensator,
  type CompensatorParts,
  compensatorParts,
  crossoverLimit,
  designCompensator,
  type LoopPlant,
  loopMargin,
} from '../control/index.ts';
import { CROSSOVER_SHARE } from '../step-response.ts';
import type { SolvedPoint } from './solved-point.ts';

/** Phase margin asked for, rad: 55°, between the usual 45° and 60° (common practice, no source). */
const MARGIN = (55 / 180) * Math.PI;
/** Input resistor that the parts are given for, Ω (common practice, no source). */
const INPUT_RESISTOR = 10e3;
/** Part of the wanted crossover at which the search for a lower one ends. */
const LEAST_SHARE = 0.2;

/** A loop with what it reaches. */
export interface Loop {
  readonly plant: LoopPlant;
  readonly compensator: Compensator;
  readonly parts: CompensatorParts;
  /** Hz. */
  readonly crossover: number;
  /** rad. */
  readonly phaseMargin: number;
}

/**
 * The loop at `point`, for a modulator ramp of 1 V; the crossover is that which the load-step figure counts on.
 * @source venable-1983: type-III compensator
 * @source qiu-2004: crossover
 * @valid voltage mode, continuous operation
 */
export function loopAt(point: SolvedPoint): Loop {
  const { design } = point;
  const { stage } = design;
  const copies = design.phases * stage.chokes;
  const ripple = design.frequency * stage.chokeMultiple;
  const wanted = crossoverLimit(ripple, copies, CROSSOVER_SHARE);
  let loop = closeAt(point, wanted);
  for (let share = 0.9; share > LEAST_SHARE && !(loop.phaseMargin >= 0.8 * MARGIN); share -= 0.1) {
    loop = closeAt(point, share * wanted);
  }
  return loop;
}

/**
 * The loop closed at `wanted` Hz.
 * @source venable-1983
 * @valid crossover below half the edges' rate
 */
function closeAt(point: SolvedPoint, wanted: number): Loop {
  const plant = plantAt(point, wanted);
  const compensator = designCompensator(plant, wanted, MARGIN);
  const { crossover, phaseMargin } = loopMargin(plant, compensator, 0.01 * wanted, 30 * wanted);
  return { plant, compensator, parts: compensatorParts(compensator, INPUT_RESISTOR), crossover, phaseMargin };
}

/**
 * Plant of the averaged stage; the bank is what its impedance at `frequency` Hz says.
 * @source erickson-maksimovic-2001, chapter 8: averaged buck, phases in parallel
 * @valid below half the edges' rate
 */
function plantAt(point: SolvedPoint, frequency: number): LoopPlant {
  const { design, state, output } = point;
  const { stage } = design;
  const copies = design.phases * stage.chokes;
  const bank = equivalent(output, 2 * Math.PI * frequency);
  return {
    gain: sourceBehind(point),
    inductance: state.effectiveInductance / copies,
    capacitance: bank.capacitance,
    seriesResistance: bank.resistance,
    loadResistance: state.loadCurrent > 0 ? state.outputVoltage / state.loadCurrent : Number.POSITIVE_INFINITY,
    pathResistance: (state.pathResistance + state.lowResistance) / copies,
    // A modulator answers at its next edge: half the interval between edges of all phases, on average.
    delay: 0.5 / (copies * design.frequency * stage.chokeMultiple),
  };
}

/**
 * Voltage behind the chokes at a duty of one, V: what the ideal duty says of it.
 * @derivation Vo over the ideal duty
 * @valid no drops
 */
export function sourceBehind({ design, state }: SolvedPoint): number {
  return (
    state.outputVoltage / design.stage.idealDuty(state.inputVoltage, state.outputVoltage, design.transformer.ratio)
  );
}

/**
 * Capacitance and series resistance that have the bank's impedance at `omega` rad/s, series inductance left out.
 * @derivation series C and R of the same admittance at one frequency
 * @valid series inductance left out
 */
function equivalent(bank: Bank, omega: number): { capacitance: number; resistance: number } {
  const x1 = -1 / (omega * bank.c1);
  if (!(bank.c2 > 0)) return { capacitance: bank.c1, resistance: bank.r1 };
  const x2 = -1 / (omega * bank.c2);
  // Admittances add: 1/(r + jx) = (r − jx)/(r² + x²).
  const s1 = bank.r1 * bank.r1 + x1 * x1;
  const s2 = bank.r2 * bank.r2 + x2 * x2;
  const g = bank.r1 / s1 + bank.r2 / s2;
  const b = -x1 / s1 - x2 / s2;
  const size = g * g + b * b;
  return { capacitance: size / (omega * b), resistance: g / size };
}
