/** The front as files that other programs read: `front.json` in SI units, `front.csv` in engineering units. */
import { GENE_UNITS } from './genes.ts';
import type { RailProblem } from './problem.ts';
import { engineeringText, toEngineering } from './quantity/index.ts';

/** One design of a front. */
export interface FrontDesign {
  readonly id: string;
  readonly family: string;
  readonly genes: Readonly<Record<string, number>>;
  readonly parts: Readonly<Record<string, string>>;
  /** In the order of the file's objectives, SI. */
  readonly objectives: readonly number[];
  /** By limit name, in the limit's unit; ≥ 0 holds. */
  readonly margins: Readonly<Record<string, number>>;
  /** Smallest margin as a fraction of what is allowed. */
  readonly worstMargin: number;
  /** Share of samples within tolerances that keep every limit, 0 … 1; absent where no spread was run. */
  readonly yield?: number;
}

interface NamedUnit {
  readonly name: string;
  readonly unit: string;
}

/** `front.json`. Fields may be added, never renamed. */
export interface FrontFile {
  readonly format: 'chopfront-front';
  readonly version: 1;
  /** The rail's name. */
  readonly rail: string;
  readonly objectives: readonly NamedUnit[];
  readonly limits: readonly NamedUnit[];
  readonly genes: readonly NamedUnit[];
  readonly designs: readonly FrontDesign[];
}

/** Slots of the parts record that every file has a column for, in their order. */
const PART_SLOTS: readonly string[] = [
  'highSwitch',
  'lowSwitch',
  'powerStage',
  'bridgeControl',
  'diode',
  'inductor',
  'outputCeramic',
  'outputBulk',
  'inputCeramic',
  'inputBulk',
  'controller',
];

/** The front of the designs `rows` (snapped gene vectors), sorted by id. */
export function frontFile(problem: RailProblem, rows: readonly Float64Array[]): FrontFile {
  const designs = rows.map((genes) => frontDesign(problem, genes));
  designs.sort((a, b) => (a.id < b.id ? -1 : a.id > b.id ? 1 : 0));
  return {
    format: 'chopfront-front',
    version: 1,
    rail: problem.rail.name,
    objectives: problem.objectives.map(({ name, unit }) => ({ name, unit })),
    limits: problem.limitDefinitions.map(({ name, unit }) => ({ name, unit })),
    genes: problem.numericGenes.map((name) => ({ name, unit: GENE_UNITS[name] ?? '' })),
    designs,
  };
}

function frontDesign(problem: RailProblem, genes: Float64Array): FrontDesign {
  const record = problem.record(genes);
  const judged = problem.judge(genes);
  return {
    id: problem.id(genes),
    family: problem.families.names[problem.families.of(genes)],
    genes: record.genes,
    parts: record.parts,
    objectives: judged.objectives,
    margins: judged.margins,
    worstMargin: judged.worstMargin,
  };
}

/** `front.csv`: id, architecture, numeric genes, parts, objectives, margins, worst margin; units in the header. */
export function frontCsv(file: FrontFile): string {
  const column = ({ name, unit }: NamedUnit): string => header(name, unit);
  const spread = file.designs.some((design) => design.yield !== undefined);
  const slots = slotsOf(file);
  const head = [
    'id',
    'family',
    ...file.genes.map(column),
    ...slots,
    ...file.objectives.map(column),
    ...file.limits.map(({ name, unit }) => header(`${name} margin`, unit, true)),
    'worst margin',
    ...(spread ? ['yield'] : []),
  ];
  const lines = file.designs.map((design) => [
    design.id,
    design.family,
    ...file.genes.map(({ name, unit }) => cell(design.genes[name], unit)),
    ...slots.map((slot) => design.parts[slot] ?? ''),
    ...file.objectives.map(({ unit }, i) => cell(design.objectives[i], unit)),
    ...file.limits.map(({ name, unit }) => cell(design.margins[name], unit, true)),
    cell(design.worstMargin, ''),
    ...(spread ? [cell(design.yield, '')] : []),
  ]);
  return `${[head, ...lines].map((line) => line.map(quoteCell).join(',')).join('\n')}\n`;
}

/** The usual slots, then those that a design of this front has besides: what its chokes and transformers are wound from. */
function slotsOf({ designs }: FrontFile): readonly string[] {
  const used = new Set(designs.flatMap(({ parts }) => Object.keys(parts)));
  return [...PART_SLOTS, ...[...used].filter((slot) => !PART_SLOTS.includes(slot)).sort()];
}

/** A CSV cell that no spreadsheet takes for a formula, quoted where it must be. */
export function quoteCell(text: string): string {
  const number = /^[-+]?(\d|\.\d)[\d.eE+-]*$/.test(text);
  const safe = !number && /^[=+\-@\t\r]/.test(text) ? `'${text}` : text;
  return /[",\n\r]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}

/** A column's title; a difference of temperatures is in kelvin. */
function header(name: string, unit: string, difference = false): string {
  const shown = unit === 'K' && difference ? 'K' : toEngineering(unit).unit;
  return shown === '' ? name : `${name} [${shown}]`;
}

/** A value in engineering units, shortest digits that read back; a difference of temperatures has no offset. */
function cell(value: number | undefined, unit: string, difference = false): string {
  if (value === undefined) return '';
  return unit === 'K' && difference ? String(value) : engineeringText(value, unit);
}
