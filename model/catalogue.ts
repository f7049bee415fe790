/**
 * The parts a rail may use, ordered so that neighbours are alike: a step of a whole-number gene then means a slightly
 * larger part, not a random one. Parts that cannot work on this rail at all (a rating below what the sheet asks) are left
 * out here, once, instead of being refused a million times in the search.
 */
import { bad, type Finding, good, type Outcome } from './outcome.ts';
import { alike, laidOut, layoutOf } from './parts/alike.ts';
import type { Bulk } from './parts/bulk.ts';
import type { Ceramic } from './parts/ceramic.ts';
import type { Part } from './parts/common.ts';
import type { Conductor } from './parts/conductor.ts';
import type { Controller } from './parts/controller.ts';
import type { Core } from './parts/core.ts';
import type { Diode } from './parts/diode.ts';
import type { Inductor } from './parts/inductor.ts';
import type { Material } from './parts/material.ts';
import { type Leg, legOf } from './parts/power-stage.ts';
import type { Switch } from './parts/switch.ts';
import type { PartsTables } from './parts/tables.ts';
import type { Rail } from './rail/rail.ts';
import { type Architecture, stageOf } from './stages/list.ts';

/** Stocked inductors of one series by rising inductance. */
export interface InductorSeries {
  readonly name: string;
  readonly rows: readonly Inductor[];
}

/** Options of every part slot, in the order in which genes count them. */
export interface Catalogue {
  /** By falling on-resistance. */
  readonly highSwitches: readonly Switch[];
  /** By falling on-resistance. */
  readonly lowSwitches: readonly Switch[];
  /** By rising rated current. */
  readonly diodes: readonly Diode[];
  /** Diodes that may clamp a two-switch stage to its input, by rising price. */
  readonly clampDiodes: readonly Diode[];
  /** Power stages for a synchronous buck, by falling on-resistance of the low switch. */
  readonly legs: readonly Leg[];
  /** By rising volume. */
  readonly inductorSeries: readonly InductorSeries[];
  /** Every usable stocked inductor by rising volume, for the input filter; empty unless the sheet limits the source's ripple. */
  readonly filterChokes: readonly Inductor[];
  /** By rising effective capacitance at the output's bias. */
  readonly outputCeramics: readonly Ceramic[];
  readonly outputBulks: readonly Bulk[];
  /** By rising effective capacitance at the input's bias. */
  readonly inputCeramics: readonly Ceramic[];
  readonly inputBulks: readonly Bulk[];
  /** By rising price. */
  readonly controllers: readonly Controller[];
  /** By rising volume; empty unless the sheet asks for wound chokes. */
  readonly chokeCores: readonly Core[];
  /** By rising volume; empty without a transformer architecture. */
  readonly transformerCores: readonly Core[];
  readonly materials: readonly Material[];
  /** Materials without a distributed gap. */
  readonly transformerMaterials: readonly Material[];
  /** By kind, then rising size. */
  readonly conductors: readonly Conductor[];
}

/** Ratings beyond this multiple of the need are left out: they only widen the search. */
const RATING_SPAN = 6;

/** The options for `rail`, or one finding for each part kind of which none is left. */
export function createCatalogue(rail: Rail, given: PartsTables): Outcome<Catalogue> {
  const tables = allAlike(given);
  const switchNeed = rail.input.maximum / rail.derating.switchVoltage;
  const switches = usable(rail, tables.switches).filter((row) => within(row.voltageRating, switchNeed, RATING_SPAN));
  const byResistance = sortBy(switches, (row) => -row.onResistance);
  const transformers = rail.search.architectures.some(hasTransformer);
  const cores = sortBy(usable(rail, tables.cores), (row) => boxVolume(row));
  const catalogue: Catalogue = {
    highSwitches: byResistance,
    lowSwitches: transformers
      ? sortBy(rectifierSwitches(rail, tables.switches), (row) => -row.onResistance)
      : byResistance,
    diodes: sortBy(
      usable(rail, tables.diodes).filter((row) => within(row.voltageRating, switchNeed, RATING_SPAN)),
      (row) => row.currentRating,
    ),
    clampDiodes: clampDiodes(rail, tables.diodes),
    legs: legsFor(rail, tables),
    inductorSeries: inductorSeries(rail, tables.inductors),
    filterChokes:
      rail.input.sourceRipple === undefined ? [] : sortBy(usable(rail, tables.inductors), (row) => boxVolume(row)),
    outputCeramics: ceramicsFor(rail, tables.ceramics, rail.output.maximum),
    outputBulks: bulksFor(rail, tables.bulks, rail.output.maximum),
    inputCeramics: ceramicsFor(rail, tables.ceramics, rail.input.maximum),
    inputBulks: bulksFor(rail, tables.bulks, rail.input.maximum),
    controllers: controllersFor(rail, tables.controllers),
    chokeCores: rail.search.woundChokes === true ? cores : [],
    transformerCores: transformers ? cores.filter((row) => row.shape !== 'ring') : [],
    materials: chosen(rail, tables.materials),
    transformerMaterials: transformers
      ? chosen(
          rail,
          tables.materials.filter((row) => row.kind !== 'powder'),
        )
      : [],
    conductors: [...chosen(rail, tables.conductors)].sort((a, b) =>
      a.kind < b.kind ? -1 : a.kind > b.kind ? 1 : a.size * a.size * a.strands - b.size * b.size * b.strands,
    ),
  };
  const findings = missingKinds(rail, catalogue);
  return findings.length > 0 ? bad(findings) : good(catalogue);
}

/** `tables` with the rows of each kind laid out alike. */
function allAlike(tables: PartsTables): PartsTables {
  const layout = switchLayout(tables);
  return {
    switches: tables.switches.map((row) => laidOut(row, layout)),
    diodes: alike(tables.diodes),
    inductors: alike(tables.inductors),
    ceramics: alike(tables.ceramics),
    bulks: alike(tables.bulks),
    controllers: alike(tables.controllers),
    cores: alike(tables.cores),
    materials: alike(tables.materials),
    conductors: alike(tables.conductors),
    powerStages: alike(tables.powerStages),
  };
}

/** The layout that discrete switches and those inside power stages share. */
function switchLayout(tables: PartsTables): string {
  const legs = tables.powerStages.map(legOf);
  return layoutOf([...tables.switches, ...legs.flatMap(({ high, low }) => [high, low])]);
}

/** Price of one piece of `part` when `quantity` pieces are bought, in the table's currency. */
export function priceAt(part: Part, quantity: number): number {
  let price = part.prices.length > 0 ? (part.prices[0] as { price: number }).price : 0;
  for (const step of part.prices) if (quantity >= step.from) price = step.price;
  return price;
}

/** Box volume of one piece, m³. */
export function boxVolume(part: Part): number {
  return part.length * part.width * part.height;
}

/** Capacitance of `row` at a bias of `volts`, F; the bias curve of the parts table. */
function capacitanceOrder(row: Ceramic, volts: number): number {
  return row.capacitance / (1 + volts / row.halvingVoltage);
}

function usable<P extends Part>(rail: Rail, rows: readonly P[]): readonly P[] {
  return chosen(
    rail,
    rows.filter((row) => row.height <= heightLimit(rail)),
  );
}

/** The rows that the sheet does not bar; of these the preferred ones alone, where there are any. */
function chosen<P extends { readonly name: string }>(rail: Rail, rows: readonly P[]): readonly P[] {
  const allowed = rows.filter((row) => !rail.parts.barred.includes(row.name));
  const preferred = allowed.filter((row) => rail.parts.preferred.includes(row.name));
  return preferred.length > 0 ? preferred : allowed;
}

function heightLimit(rail: Rail): number {
  return rail.limits.height ?? Number.MAX_VALUE;
}

function within(rating: number, need: number, span: number): boolean {
  return rating >= need && rating <= need * span + 30;
}

function sortBy<P extends Part>(rows: readonly P[], key: (row: P) => number): readonly P[] {
  return [...rows].sort((a, b) => key(a) - key(b) || (a.name < b.name ? -1 : 1));
}

function inductorSeries(rail: Rail, rows: readonly Inductor[]): readonly InductorSeries[] {
  const { minimum, maximum } = rail.search.inductance;
  const bySeries = new Map<string, Inductor[]>();
  for (const row of usable(rail, rows)) {
    if (row.inductance < minimum * 0.999 || row.inductance > maximum * 1.001) continue;
    const series = bySeries.get(row.series) ?? [];
    series.push(row);
    bySeries.set(row.series, series);
  }
  const list = [...bySeries].map(([name, members]) => ({ name, rows: sortBy(members, (row) => row.inductance) }));
  const size = (series: InductorSeries): number => boxVolume(series.rows[0] as Inductor);
  return list.sort((a, b) => size(a) - size(b) || (a.name < b.name ? -1 : 1));
}

function ceramicsFor(rail: Rail, rows: readonly Ceramic[], volts: number): readonly Ceramic[] {
  const need = volts / rail.derating.ceramicVoltage;
  return sortBy(
    usable(rail, rows).filter((row) => within(row.voltageRating, need, RATING_SPAN) && row.capacitance >= 0.4e-6),
    (row) => capacitanceOrder(row, volts),
  );
}

function bulksFor(rail: Rail, rows: readonly Bulk[], volts: number): readonly Bulk[] {
  const need = volts / rail.derating.bulkVoltage;
  return sortBy(
    usable(rail, rows).filter((row) => within(row.voltageRating, need, RATING_SPAN)),
    (row) => row.capacitance,
  );
}

function controllersFor(rail: Rail, rows: readonly Controller[]): readonly Controller[] {
  const fits = (row: Controller): boolean =>
    row.inputMaximum >= rail.input.maximum &&
    row.inputMinimum <= rail.input.minimum &&
    row.outputMinimum <= rail.output.minimum &&
    row.outputMaximum >= rail.output.maximum;
  return sortBy(usable(rail, rows).filter(fits), (row) => priceAt(row, rail.quantity));
}

function clampDiodes(rail: Rail, rows: readonly Diode[]): readonly Diode[] {
  if (!rail.search.architectures.some(isClamped)) return [];
  const need = rail.input.maximum / rail.derating.switchVoltage;
  return sortBy(
    usable(rail, rows).filter((row) => row.voltageRating >= need),
    (row) => priceAt(row, rail.quantity),
  );
}

function legsFor(rail: Rail, tables: PartsTables): readonly Leg[] {
  if (!rail.search.architectures.some(takesPowerStages)) return [];
  const need = rail.input.maximum / rail.derating.switchVoltage;
  const rows = usable(rail, tables.powerStages).filter((row) => within(row.voltageRating, need, RATING_SPAN));
  const layout = switchLayout(tables);
  return sortBy(rows, (row) => -row.lowResistance).map((row) => {
    const leg = legOf(row);
    return { ...leg, high: laidOut(leg.high, layout), low: laidOut(leg.low, layout) };
  });
}

/** Whether an architecture has a transformer. */
export function hasTransformer(architecture: Architecture): boolean {
  return stageOf(architecture)?.form !== undefined;
}

/** Whether an architecture has four primary switches, so that its legs may be shifted against each other. */
export function isFullBridge(architecture: Architecture): boolean {
  return stageOf(architecture)?.highDevices === 4;
}

/** Switches that may rectify behind a transformer: from twice the output up to what a plain buck needs. */
function rectifierSwitches(rail: Rail, rows: readonly Switch[]): readonly Switch[] {
  const least = (2 * rail.output.maximum) / rail.derating.switchVoltage;
  const buck = rail.search.architectures.some((architecture) => !hasTransformer(architecture));
  const most = (buck ? RATING_SPAN * rail.input.maximum : 16 * rail.output.maximum) / rail.derating.switchVoltage + 60;
  return usable(rail, rows).filter((row) => row.voltageRating >= least && row.voltageRating <= most);
}

/** Whether an architecture rectifies with a switch. */
export function usesLowSwitch(architecture: Architecture): boolean {
  return stageOf(architecture)?.diode !== true;
}

/** Whether a phase's leg may be a power stage. */
export function takesPowerStages(architecture: Architecture): boolean {
  return stageOf(architecture)?.packagedLegs === true;
}

/** Whether diodes clamp the primary switches to the input. */
function isClamped(architecture: Architecture): boolean {
  return stageOf(architecture)?.control === 'forward';
}

function missingKinds(rail: Rail, catalogue: Catalogue): Finding[] {
  const wanted: [string, number, string][] = [
    ['switches', catalogue.highSwitches.length, `a rating of at least ${rail.input.maximum} V with derating`],
    [
      'inductors',
      catalogue.inductorSeries.length + catalogue.chokeCores.length,
      'an inductance inside the search range and a height inside the limit',
    ],
    ['ceramics', catalogue.outputCeramics.length, 'a rating for the output voltage with derating'],
    ['ceramics', catalogue.inputCeramics.length, 'a rating for the input voltage with derating'],
    ['controllers', catalogue.controllers.length, "limits that hold the sheet's input and output"],
  ];
  if (rail.search.architectures.some(hasTransformer)) {
    wanted.push(['cores', catalogue.transformerCores.length, 'a height inside the limit']);
    wanted.push(['materials', catalogue.transformerMaterials.length, 'no distributed gap']);
    wanted.push(['conductors', catalogue.conductors.length, 'any size']);
  }
  if (rail.search.architectures.some(isClamped)) {
    wanted.push(['diodes', catalogue.clampDiodes.length, `a rating of at least ${rail.input.maximum} V with derating`]);
  }
  if (rail.search.architectures.some((architecture) => !usesLowSwitch(architecture))) {
    wanted.push(['diodes', catalogue.diodes.length, `a rating of at least ${rail.input.maximum} V with derating`]);
  }
  const { barred, preferred } = rail.parts;
  const left = barred.length + preferred.length > 0 ? ', among those that parts.bar and parts.prefer leave' : '';
  return wanted
    .filter(([, count]) => count === 0)
    .map(([kind, , need]) => ({
      file: rail.name,
      line: 0,
      column: 0,
      field: `parts.${kind}`,
      found: 'no usable row',
      allowed: `at least one row with ${need}${left}`,
    }));
}
