/**
 * Values of one design under one assumption: usual (rows as printed, at bias) or worst (inductance and capacitance low,
 * resistances high, phases unequal). Filled once a design; every operating point then reads it.
 */
import {
  type Bank,
  ceramicCapacitance,
  ceramicWorstFactor,
  createBank,
  setGroup1,
  setGroup2,
} from './capacitors/index.ts';
import type { Design } from './design.ts';
import type { Bulk } from './parts/bulk.ts';
import type { Ceramic } from './parts/ceramic.ts';
import type { Rail } from './rail/rail.ts';

/** Hours of service after which ceramic ageing is judged: about ten years. */
const AGED_HOURS = 1e5;
/** Most copies of a phase. */
const PHASES = 16;

export class Flavour {
  readonly worst: boolean;
  /** Zero-bias inductance of one choke, H. */
  inductance = 0.5;
  /** Factor on on-resistances. */
  resistanceScale = 1.5;
  /** On-resistance of the high position and of a switch in the low one at the reference temperature of rows, tolerance included, Ω. */
  highResistance = 0.5;
  lowResistance = 0.5;
  readonly output: Bank = createBank();
  readonly input: Bank = createBank();
  /** What one piece of each ceramic holds at the output's and the input's bias, F: one rail's designs use the same rows again and again. */
  readonly outputHeld = new Map<Ceramic, Float64Array>();
  readonly inputHeld = new Map<Ceramic, Float64Array>();
  /** Ripple of each phase over that of the phase with the lowest inductance; all 1 in the usual flavour. */
  readonly scales = new Float64Array(PHASES).fill(1);

  constructor(worst: boolean) {
    this.worst = worst;
  }
}

/** Fills `flavour` for `design`. */
export function prepareFlavour(flavour: Flavour, design: Design, rail: Rail): void {
  const low = flavour.worst ? Math.max(rail.tolerances.inductance, design.inductor.tolerance) : 0;
  flavour.inductance = design.inductance * (1 - low);
  flavour.resistanceScale = flavour.worst ? 1 + rail.tolerances.onResistance : 1;
  spreadPhases(flavour, design.phases * design.stage.chokes, low);
  bank(
    flavour,
    flavour.output,
    flavour.outputHeld,
    rail,
    rail.output.nominal,
    design.outputCeramic,
    design.outputCeramicCount,
    design.outputBulk,
    design.outputBulkCount,
  );
  bank(
    flavour,
    flavour.input,
    flavour.inputHeld,
    rail,
    rail.input.nominal,
    design.inputCeramic,
    design.inputCeramicCount,
    design.inputBulk,
    design.inputBulkCount,
  );
}

/**
 * Fills in the resistances of `design` under the flavour's factor.
 * @derivation dice alike in parallel divide a resistance
 * @valid dice share current alike
 */
export function prepareResistances(flavour: Flavour, design: Design): void {
  const { high, low } = design;
  // `onResistance` at the temperature that rows state it for.
  flavour.highResistance = (flavour.resistanceScale * high.onResistance * high.dynamicFactor) / design.highParallel;
  flavour.lowResistance = (flavour.resistanceScale * low.onResistance * low.dynamicFactor) / design.lowParallel;
}

/**
 * Half the phases at the low end of the inductance's tolerance and half at the high end, side by side: the arrangement that
 * leaves the lowest frequency uncancelled.
 * @derivation extremes of a tolerance band, half the phases at each
 * @valid inductances within the tolerance
 */
function spreadPhases(flavour: Flavour, phases: number, low: number): void {
  const high = (1 - low) / (1 + low);
  for (let i = 0; i < phases; i++) flavour.scales[i] = 2 * i < phases ? 1 : high;
}

function bank(
  flavour: Flavour,
  into: Bank,
  held: Map<Ceramic, Float64Array>,
  rail: Rail,
  volts: number,
  ceramic: Ceramic,
  ceramicCount: number,
  bulk: Bulk | undefined,
  bulkCount: number,
): void {
  let capacitance = held.get(ceramic);
  if (capacitance === undefined) {
    capacitance = Float64Array.of(heldBy(ceramic, flavour, rail, volts));
    held.set(ceramic, capacitance);
  }
  setGroup1(into, ceramicCount, capacitance[0], ceramic.seriesResistance, ceramic.seriesInductance);
  if (bulk === undefined) {
    setGroup2(into, 0, 0, 0, 0);
    return;
  }
  const drop = flavour.worst ? Math.max(rail.tolerances.capacitance, bulk.tolerance) : 0;
  setGroup2(into, bulkCount, bulk.capacitance * (1 - drop), bulk.seriesResistance, bulk.seriesInductance);
}

/**
 * Capacitance that one piece of `row` holds at `volts`, F.
 * @source derating-curves-2025: bias; tolerance, temperature and ageing on top
 * @valid bias up to the rated voltage
 */
function heldBy(row: Ceramic, flavour: Flavour, rail: Rail, volts: number): number {
  const { capacitance, smallSignalFactor, halvingVoltage, biasExponent } = row;
  const biased = ceramicCapacitance(capacitance, smallSignalFactor, halvingVoltage, biasExponent, volts);
  if (!flavour.worst) return biased;
  const tolerance = Math.max(rail.tolerances.capacitance, row.tolerance);
  return biased * ceramicWorstFactor(tolerance, row.temperatureDrop, row.ageing, AGED_HOURS);
}
