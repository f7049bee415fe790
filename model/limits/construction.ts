/** Limits that depend on the choice of parts alone: ratings, controller abilities, avoided bands, size, mass, cost. */
import type { Evaluator } from '../evaluate.ts';
import type { Switch } from '../parts/switch.ts';
import type { AvoidedBand } from '../rail/rail.ts';

/** Ringing of a rectifier over what it blocks, with a snubber: 1.5 to 2 without a clamp (common practice, no source). */
const RINGING = 1.5;
/** Share of the drive voltage a row is specified at that a controller must at least give. */
const DRIVE_SHARE = 0.9;

/** Notes every limit of the construction. */
export function judgeConstruction(e: Evaluator): void {
  judgeVoltages(e);
  judgeController(e);
  judgeBands(e);
  judgeSize(e);
}

/**
 * Blocking voltages against derated ratings.
 * @source hart-2011, chapter 7: a switch of these stages blocks the input; ringing by common practice
 * @valid no resonance beyond the stated ringing
 */
function judgeVoltages(e: Evaluator): void {
  const { book, places, design, rail } = e;
  const share = rail.derating.switchVoltage;
  const high = design.high.voltageRating * share;
  book.judge(places.highVoltage, rail.input.maximum, high, -1);
  const low = (design.diode === undefined ? design.low : design.diode).voltageRating * share;
  const { form } = design.stage;
  const blocked = design.stage.lowBlocking(rail.input.maximum, design.transformer.ratio);
  book.judge(places.lowVoltage, form === undefined ? blocked : RINGING * blocked, low, -1);
  if (design.powerStage !== undefined) return;
  judgeGate(e, design.high);
  if (design.diode === undefined) judgeGate(e, design.low);
}

function judgeGate(e: Evaluator, row: Switch): void {
  const drive = e.design.controller.driveVoltage;
  e.book.judge(e.places.gateVoltage, drive, row.gateRating, -1);
  const least = row.driveVoltage * DRIVE_SHARE;
  e.book.judge(e.places.driveVoltage, drive, least, -1);
}

function judgeController(e: Evaluator): void {
  const { book, places, design, rail } = e;
  const { controller } = design;
  book.judge(places.phases, design.phases, controller.phasesMaximum, -1);
  const { oscillator } = rail.tolerances;
  const highest = design.frequency * (1 + oscillator);
  book.judge(places.controllerFrequency, highest, controller.frequencyMaximum, -1);
  const lowest = design.frequency * (1 - oscillator);
  book.judge(places.controllerLowestFrequency, lowest, controller.frequencyMinimum, -1);
  book.judge(places.controllerAbilities, controller.stages.includes(design.stage.control) ? 1 : 0, 1, -1);
}

function judgeBands(e: Evaluator): void {
  const { avoid } = e.rail;
  for (let i = 0; i < avoid.length; i++) judgeBand(e, avoid[i]);
}

/**
 * Judges the smallest distance of the frequency (and its harmonics, as the band asks) to a band, as a fraction of the frequency; below 0
 * inside. The oscillator's tolerance counts.
 * @derivation k·f·(1 ± tolerance) outside the band
 * @valid k whole, up to the band's harmonics
 */
function judgeBand(e: Evaluator, band: AvoidedBand): void {
  const { frequency } = e.design;
  const { oscillator } = e.rail.tolerances;
  let least = Number.MAX_VALUE;
  for (let k = 1; k <= band.harmonics; k++) {
    const below = band.from / (k * frequency) - (1 + oscillator);
    const above = 1 - oscillator - band.to / (k * frequency);
    least = Math.min(least, Math.max(below, above));
  }
  e.book.judgeBy(e.places.avoidedBands, least * frequency, 0, frequency, -1);
}

function judgeSize(e: Evaluator): void {
  const { book, places, assembly } = e;
  const { limits } = e.rail;
  if (limits.height !== undefined) book.judge(places.height, assembly.height, limits.height, -1);
  if (limits.boardArea !== undefined) {
    book.judge(places.boardArea, assembly.boardArea, limits.boardArea, -1);
  }
  if (limits.volume !== undefined) book.judge(places.volume, assembly.volume, limits.volume, -1);
  if (limits.mass !== undefined) book.judge(places.mass, assembly.mass, limits.mass, -1);
  if (limits.cost !== undefined) book.judge(places.cost, assembly.cost, limits.cost, -1);
}
