/** One sample of a design as it may come off the line: every tolerance drawn, temperature and line somewhere in their range. */
import { log10 } from '../../optimizer/maths/index.ts';
import type { Bank } from '../capacitors/index.ts';
import { Evaluator, judgeDesign } from '../evaluate.ts';
import type { Flavour } from '../flavour.ts';
import { objectiveWriters } from '../objectives.ts';
import type { Ceramic } from '../parts/ceramic.ts';
import type { RailProblem } from '../problem.ts';
import type { Rail } from '../rail/rail.ts';
import type { Stage } from '../stages/contract.ts';
import { stageOf } from '../stages/list.ts';
import { normal, seedOf, uniform } from './chance.ts';

/** What varies. The inductance of each choke is drawn by itself. */
export const CAUSES = [
  'line',
  'ambient',
  'oscillator',
  'on-resistance',
  'inductance',
  'output ceramic',
  'output bulk',
  'input ceramic',
  'input bulk',
  'ceramic age and temperature',
] as const;

/** Kelvin below the sheet's ambient from which samples are drawn evenly: a room's season (common practice, no source). */
const AMBIENT_SPAN = 30;
/** Deviations in a stated tolerance: it is taken as three, and nothing is beyond it (common practice, no source). */
const SIGMAS = 3;
/** Most chokes of a design, and hours of the oldest service. */
const CHOKES = 16;
const OLDEST = 1e5;
const FIXED = CAUSES.length;

/** Numbers of one sample, as a row: causes (−1 … 1 or 0 … 1), deviations of single chokes, slacks, objectives. */
export interface SampleLayout {
  readonly causes: number;
  readonly chokes: number;
  readonly limits: number;
  readonly objectives: number;
  readonly width: number;
}

/** How the row of a sample of `problem` is laid out. */
export function sampleLayout(problem: RailProblem): SampleLayout {
  const limits = problem.limits.length;
  const objectives = problem.objectives.length;
  return { causes: FIXED, chokes: CHOKES, limits, objectives, width: FIXED + CHOKES + limits + objectives };
}

/** Rows of samples `from` … `to − 1` of the design of snapped `genes`, one after the other: the same whoever draws them. */
export function drawSamples(
  problem: RailProblem,
  genes: Float64Array,
  seed: string,
  from: number,
  to: number,
): Float64Array {
  const layout = sampleLayout(problem);
  const rows = new Float64Array((to - from) * layout.width);
  const start = seedOf(seed);
  const stages = problem.architectures.map(stageOf).filter((stage): stage is Stage => stage !== undefined);
  const built = new Evaluator(problem.rail, problem.catalogue, stages);
  judgeDesign(built, genes);
  const writers = objectiveWriters(problem.rail);
  for (let sample = from; sample < to; sample++) {
    const row = rows.subarray((sample - from) * layout.width, (sample - from + 1) * layout.width);
    drawCauses(row, start, sample);
    const e = new Evaluator(sampleRail(problem.rail, row), problem.catalogue, stages);
    e.builtSink = built.sink;
    e.adjust = (evaluator) => adjust(evaluator, problem.rail, row);
    judgeDesign(e, genes);
    row.set(e.book.slack, FIXED + CHOKES);
    for (const [k, write] of writers.entries()) write(e, row, FIXED + CHOKES + layout.limits + k);
  }
  return rows;
}

/**
 * Draws what varies in one sample.
 * @derivation three deviations are the stated tolerance, cut there; line, ambient and age even
 * @valid tolerances symmetrical
 */
function drawCauses(row: Float64Array, seed: number, sample: number): void {
  for (let c = 0; c < FIXED + CHOKES; c++) {
    const even = c === 0 || c === 1 || c === 9;
    row[c] = even ? uniform(seed, sample, 2 * c) : clipped(normal(seed, sample, 2 * c) / SIGMAS);
  }
}

function clipped(value: number): number {
  return Math.max(-1, Math.min(1, value));
}

/**
 * The sheet at the sample's line and ambient; what was drawn is no longer a tolerance.
 * @derivation even between the line's ends; ambient even within its season
 * @valid ambient span of a room
 */
function sampleRail(rail: Rail, row: Float64Array): Rail {
  const { minimum, maximum } = rail.input;
  const volts = minimum + row[0] * (maximum - minimum);
  return {
    ...rail,
    input: { ...rail.input, minimum: volts, nominal: volts, maximum: volts },
    ambient: rail.ambient - AMBIENT_SPAN * (1 - row[1]),
    tolerances: { inductance: 0, capacitance: 0, oscillator: 0, onResistance: 0 },
  };
}

/**
 * Puts a sample's drawn deviations into frequency, resistances, inductances and banks.
 * @derivation tolerances drawn once each for the sample
 * @valid as `drawCauses`
 */
function adjust(e: Evaluator, rail: Rail, row: Float64Array): void {
  const { design } = e;
  const { tolerances } = rail;
  design.frequency *= 1 + tolerances.oscillator * row[2];
  const tolerance = Math.max(tolerances.inductance, design.inductor.tolerance);
  const copies = design.phases * design.stage.chokes;
  let least = Number.POSITIVE_INFINITY;
  for (let j = 0; j < copies; j++) least = Math.min(least, 1 + tolerance * row[FIXED + (j % CHOKES)]);
  for (const flavour of [e.usual, e.worst]) {
    flavour.resistanceScale = 1 + tolerances.onResistance * row[3];
    flavour.inductance = design.inductance * least;
    for (let j = 0; j < copies; j++) flavour.scales[j] = least / (1 + tolerance * row[FIXED + (j % CHOKES)]);
    copyBank(e.usual, flavour);
  }
  // Both now hold usual values; what was drawn comes on top, once each.
  for (const flavour of [e.usual, e.worst]) {
    vary(flavour.output, rail, design.outputCeramic, design.outputBulk?.tolerance ?? 0, row[5], row[6], row[9]);
    vary(flavour.input, rail, design.inputCeramic, design.inputBulk?.tolerance ?? 0, row[7], row[8], row[9]);
  }
}

function copyBank(from: Flavour, to: Flavour): void {
  Object.assign(to.output, from.output);
  Object.assign(to.input, from.input);
}

/**
 * Multiplies a bank's capacitances by what a sample drew.
 * @derivation product of the drawn deviations; ageing by the decade of hours
 * @valid deviations within the tolerances
 */
function vary(
  bank: Bank,
  rail: Rail,
  ceramic: Ceramic,
  bulk: number,
  first: number,
  second: number,
  age: number,
): void {
  const { capacitance } = rail.tolerances;
  const aged = 1 - ceramic.ageing * age * log10(OLDEST);
  const drift = Math.max(0, aged) * (1 - age * ceramic.temperatureDrop);
  bank.c1 *= (1 + Math.max(capacitance, ceramic.tolerance) * first) * drift;
  bank.c2 *= 1 + Math.max(capacitance, bulk) * second;
}
