/** A CSV text as cells that know their place: papaparse for the cells, lines and columns counted beside it. */
import Papa from 'papaparse';
import type { Finding } from '../outcome.ts';
import { shorten } from '../quantity/parse.ts';

/** One row of cells. */
export interface CsvRow {
  /** Line in the file, from 1. */
  readonly line: number;
  readonly cells: readonly string[];
}

/** The header and the rows below it. */
export interface CsvText {
  readonly header: CsvRow;
  readonly rows: readonly CsvRow[];
}

/** Largest table read, characters. */
export const LARGEST_TABLE = 4 * 1024 * 1024;

type Split = { readonly ok: true; readonly value: CsvText } | { readonly ok: false; readonly finding: Finding };

/** Splits `text`; comment lines start with # and may stand at the top alone. */
export function splitCsv(text: string, file: string): Split {
  const refuse = (line: number, found: string, allowed: string): Split => ({
    ok: false,
    finding: { file, line, column: 0, field: '', found, allowed },
  });
  if (text.length > LARGEST_TABLE) {
    return refuse(0, `${(text.length / 1e6).toFixed(1)} million characters`, 'a table of at most 4 million characters');
  }
  if (text.includes('\0')) return refuse(0, 'bytes that are no text', 'a CSV table in UTF-8');
  const { body, skipped } = withoutComments(text.replace(/^\uFEFF/, '').replace(/\r\n?/g, '\n'));
  const parsed = Papa.parse<string[]>(body, { delimiter: ',', newline: '\n', header: false });
  const rows = placed(parsed.data, skipped);
  const broken = parsed.errors.find(({ type }) => type === 'Quotes');
  if (broken !== undefined) {
    const line = lineOfRow(parsed.data, broken.row ?? 0, skipped);
    return refuse(line, 'a quotation mark that is never closed', 'cells in quotation marks closed on their line');
  }
  const [header, ...rest] = rows;
  if (header === undefined) return refuse(0, 'nothing', 'a header row and one row for each part');
  return { ok: true, value: { header, rows: rest } };
}

/** Column, from 1, at which cell `index` starts in the line `raw`. */
export function columnOfCell(raw: string, index: number): number {
  let quoted = false;
  let left = index;
  for (let i = 0; i < raw.length; i++) {
    if (left === 0) return i + 1;
    if (raw[i] === '"') quoted = !quoted;
    if (raw[i] === ',' && !quoted) left--;
  }
  return raw.length + 1;
}

/** A cell for a message. */
export function shownCell(text: string): string {
  return text.trim() === '' ? 'nothing' : shorten(text.trim());
}

function withoutComments(text: string): { body: string; skipped: number } {
  let from = 0;
  let skipped = 0;
  while (text[from] === '#') {
    const end = text.indexOf('\n', from);
    from = end < 0 ? text.length : end + 1;
    skipped++;
  }
  return { body: text.slice(from), skipped };
}

/** Rows with their line, empty ones left out; a quoted cell may span lines. */
function placed(data: readonly string[][], skipped: number): CsvRow[] {
  const rows: CsvRow[] = [];
  let line = skipped + 1;
  for (const cells of data) {
    if (cells.some((cell) => cell.trim() !== '')) rows.push({ line, cells });
    line += 1 + breaksIn(cells);
  }
  return rows;
}

function lineOfRow(data: readonly string[][], row: number, skipped: number): number {
  return data.slice(0, row).reduce((line, cells) => line + 1 + breaksIn(cells), skipped + 1);
}

function breaksIn(cells: readonly string[]): number {
  return cells.reduce((sum, cell) => sum + cell.split('\n').length - 1, 0);
}
