/**
 * A sheet and its parts tables as texts: what a run keeps as its snapshot, what a worker gets to rebuild the problem from, and
 * what the readers of the model turn into a rail and tables.
 */
import { dirname, resolve } from 'node:path';
import {
  BUILT_IN_TABLES,
  createRailProblem,
  type DesignRecord,
  describeFinding,
  type Finding,
  joinTables,
  type Outcome,
  type PartKind,
  type PartsTables,
  type Rail,
  type RailProblem,
  readPlainDesign,
  readRail,
  readSpec,
  readTable,
  recordOfSpec,
} from '../model/index.ts';
import { unknownPartNames } from '../model/parts-choice.ts';
import { refusal } from './errors.ts';
import { packagePath } from './package-path.ts';
import { readText } from './run-folder/files.ts';
import { kindOfTable } from './table-kind.ts';
import { plain } from './terminal/text.ts';

/** A text with the name that messages about it use. */
export interface NamedText {
  readonly file: string;
  readonly text: string;
}

/** A parts table as text. */
export interface TableText extends NamedText {
  readonly kind: PartKind;
}

/** Everything that a problem is made from. Plain data. */
export interface InputTexts {
  readonly rail: NamedText;
  readonly tables: readonly TableText[];
  /** Designs that exist already, in the sheet's order; absent where it names none. */
  readonly incumbents?: readonly NamedText[];
}

/** The texts, read. */
export interface Inputs {
  readonly texts: InputTexts;
  readonly rail: Rail;
  readonly tables: PartsTables;
  readonly incumbents: readonly DesignRecord[];
  /** Remarks that do not forbid anything. */
  readonly remarks: readonly string[];
}

/** Largest sheet; a person's is a few kilobytes. */
const LARGEST_SHEET = 1024 * 1024;

/** Reads the sheet at `path` and the tables it names. Throws refusals that name every problem found. */
export function readSheet(path: string): Inputs {
  const text = { file: path, text: readText(path, 'a rail sheet', LARGEST_SHEET) };
  const rail = take(readRail(text.text, text.file));
  const tables = rail.parts.tables.flatMap((name) =>
    name === 'built-in' ? builtIn() : [ownTable(name, dirname(path))],
  );
  const incumbents = (rail.incumbents ?? []).map((name) => {
    return { file: name, text: readText(resolve(dirname(path), name), 'a design named in the sheet') };
  });
  return readInputs({ rail: text, tables, ...(incumbents.length === 0 ? {} : { incumbents }) });
}

/** A design as a spec or as a plain list. Throws the refusal `findings` where it is neither. */
export function readDesign(text: NamedText): DesignRecord {
  if (!text.text.trimStart().startsWith('{')) return take(readPlainDesign(text.text, text.file));
  return recordOfSpec(take(readSpec(text.text, text.file)));
}

/** Reads texts that were gathered before, such as a run's snapshot. Throws refusals that name every problem found. */
export function readInputs(texts: InputTexts): Inputs {
  const rail = readRail(texts.rail.text, texts.rail.file);
  const rows = texts.tables.map(({ kind, text, file }) => ({ kind, file, outcome: readTable(kind, text, file) }));
  const findings = [rail, ...rows.map((row) => row.outcome)].flatMap((outcome) => (outcome.ok ? [] : outcome.findings));
  if (findings.length > 0) throw refuseFindings(findings);
  const parts = rows.flatMap(({ kind, file, outcome }) => (outcome.ok ? [{ kind, file, rows: outcome.value }] : []));
  const sheet = take(rail);
  const joined = joinTables(parts, sheet.currency);
  const remarks = [rail, ...rows.map((row) => row.outcome), joined].flatMap((outcome) =>
    outcome.ok ? outcome.remarks : [],
  );
  const tables = take(joined);
  const unknown = unknownPartNames(texts.rail, sheet, tables);
  if (unknown.length > 0) throw refuseFindings(unknown);
  const incumbents = (texts.incumbents ?? []).map(readDesign);
  return { texts, rail: sheet, tables, incumbents, remarks: remarks.map(describeFinding) };
}

/** The built-in table of a kind. */
export function builtInText(kind: PartKind): TableText {
  const file = BUILT_IN_TABLES.find((table) => table.kind === kind)?.file ?? '';
  return { kind, file, text: readText(packagePath('model', 'tables', file), 'a built-in parts table') };
}

/** The problem that the inputs pose. Throws the refusal `no-space` where nothing can be searched. */
export function problemOf(inputs: Inputs): RailProblem {
  const outcome = createRailProblem(inputs.rail, inputs.tables, inputs.incumbents);
  if (outcome.ok) return outcome.value;
  throw refusal('no-space', { reasons: linesOf(outcome.findings) });
}

/** The value of an outcome. Throws the refusal `findings` with a line for each problem where there is none. */
export function take<T>(outcome: Outcome<T>): T {
  if (outcome.ok) return outcome.value;
  throw refuseFindings(outcome.findings);
}

/** Most problems that are listed; a file of noise has thousands. */
const MOST_LISTED = 20;

function refuseFindings(findings: readonly Finding[]): Error {
  return refusal('findings', { text: linesOf(findings) });
}

/** A line for each finding, whatever it repeats of a person's text. */
function linesOf(findings: readonly Finding[]): string {
  const lines = findings.slice(0, MOST_LISTED).map((finding) => plain(describeFinding(finding)));
  if (findings.length > MOST_LISTED) lines.push(`and ${findings.length - MOST_LISTED} more`);
  return lines.join('\n  ');
}

function builtIn(): TableText[] {
  return BUILT_IN_TABLES.map(({ kind }) => builtInText(kind));
}

function ownTable(name: string, folder: string): TableText {
  const text = readText(resolve(folder, name), 'a parts table named in the sheet');
  return { kind: kindOfTable(text, name), file: name, text };
}
