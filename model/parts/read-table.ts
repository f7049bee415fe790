/** Reads a parts table: CSV text to typed rows in SI units, or every problem in it with its line and column. */
import { bad, type Finding, good, type Outcome } from '../outcome.ts';
import { readDecimal } from '../quantity/decimal.ts';
import type { Column, Row, TableSchema } from './column.ts';
import type { PriceBreak } from './common.ts';
import { type CsvRow, columnOfCell, shownCell, splitCsv } from './csv.ts';
import { type Header, type PriceCell, readHeader } from './header.ts';
import { type RowOf, SCHEMAS } from './schemas.ts';
import type { PartKind } from './tables.ts';

/** Most problems reported of one table. */
const MOST_FINDINGS = 100;

/** What a table holds whether or not all of it can be read. */
export interface TableInspection<T> {
  /** The rows that were read, in their order; none where the header is refused. */
  readonly rows: readonly T[];
  /** Line in the file of each of `rows`. */
  readonly lines: readonly number[];
  /** Rows below the header. */
  readonly total: number;
  /** Every problem, at most 101. */
  readonly findings: readonly Finding[];
}

/** Reads `text` as a table of `kind`; `file` is its name in messages. Rows keep their order. */
export function readTable<K extends PartKind>(kind: K, text: string, file: string): Outcome<readonly RowOf<K>[]> {
  const { rows, findings } = inspectTable(kind, text, file);
  return findings.length === 0 ? good(rows) : bad(findings);
}

/** Reads what can be read of `text` as a table of `kind`: the good rows beside every problem of the others. */
export function inspectTable<K extends PartKind>(kind: K, text: string, file: string): TableInspection<RowOf<K>> {
  return inspectRows<RowOf<K>>(SCHEMAS[kind], text, file);
}

function inspectRows<T extends Row>(schema: TableSchema<T>, text: string, file: string): TableInspection<T> {
  const split = splitCsv(text, file);
  if (!split.ok) return { rows: [], lines: [], total: 0, findings: [split.finding] };
  const lines = text.replace(/\r\n?/g, '\n').split('\n');
  const findings: Finding[] = [];
  const report: Report = (row, index, rest) => {
    const raw = lines[row.line - 1] ?? '';
    findings.push({ file, line: row.line, column: index < 0 ? 0 : columnOfCell(raw, index), ...rest });
  };
  const header = readHeader(split.value.header, schema);
  for (const { index, ...rest } of header.problems) report(split.value.header, index, rest);
  const rows: T[] = [];
  const places: number[] = [];
  if (findings.length === 0) {
    const width = split.value.header.cells.length;
    for (const row of split.value.rows) {
      const part = readRow(schema, header, row, width, report);
      if (part !== undefined) {
        rows.push(part);
        places.push(row.line);
      }
      if (findings.length > MOST_FINDINGS) break;
    }
    repeatedNames(split.value.rows, header, report);
    if (rows.length === 0 && findings.length === 0) report(split.value.header, -1, EMPTY);
  }
  return { rows, lines: places, total: split.value.rows.length, findings: cut(findings, file) };
}

type Report = (row: CsvRow, index: number, rest: Pick<Finding, 'field' | 'found' | 'allowed' | 'nearest'>) => void;
const EMPTY = { field: '', found: 'a header without rows', allowed: 'one row for each part' };

function readRow<T extends Row>(
  schema: TableSchema<T>,
  header: Header,
  row: CsvRow,
  width: number,
  report: Report,
): T | undefined {
  if (row.cells.length !== width) {
    report(row, -1, { field: '', found: `${row.cells.length} cells`, allowed: `${width} cells, as the header has` });
    return undefined;
  }
  const values: [string, unknown][] = [];
  let whole = true;
  for (const { index, field, column, unit } of header.fields) {
    const text = (row.cells[index] ?? '').trim();
    const cell = column.read(text, unit);
    if (cell.ok) values.push([field, cell.value]);
    else {
      whole = false;
      report(row, index, { field: column.name, found: shownCell(text), allowed: cell.allowed });
    }
  }
  const prices = schema.priced ? readPrices(header.prices, row, report) : {};
  const stock = readStock(header, row, report);
  if (!whole || prices === undefined || stock === undefined) return undefined;
  // The columns of the schema cover every field of T (its type says so), and each cell was read by the field's own column.
  const part = {
    ...Object.fromEntries(values),
    ...prices,
    currency: header.currency,
    ...stock,
  } as unknown as T;
  return lawful(schema, part, header, row, report) ? part : undefined;
}

/** Whether `part` keeps the physical laws of its kind. */
function lawful<T extends Row>(schema: TableSchema<T>, part: T, header: Header, row: CsvRow, report: Report): boolean {
  const broken = schema.checks.filter((check) => !check.holds(part));
  for (const { field, allowed } of broken) {
    const cell = header.fields.find((candidate) => candidate.field === field);
    const column: Column<unknown> | undefined = cell?.column;
    const index = cell?.index ?? -1;
    report(row, index, { field: column?.name ?? field, found: shownCell(row.cells[index] ?? ''), allowed });
  }
  return broken.length === 0;
}

function readPrices(cells: readonly PriceCell[], row: CsvRow, report: Report): { prices: PriceBreak[] } | undefined {
  const prices: PriceBreak[] = [];
  for (const { index, name, from } of cells) {
    const text = (row.cells[index] ?? '').trim();
    if (text === '') continue;
    const price = readDecimal(text);
    if (!(price >= 0 && price <= 1e6)) {
      report(row, index, { field: name, found: shownCell(text), allowed: 'a price from 0 to 1000000, or nothing' });
      return undefined;
    }
    prices.push({ from, price });
  }
  if (prices.length === 0) {
    const index = cells[0]?.index ?? -1;
    report(row, index, {
      field: cells[0]?.name ?? 'price_1',
      found: 'no price',
      allowed: 'a price in one column at least',
    });
    return undefined;
  }
  return { prices: prices.sort((a, b) => a.from - b.from) };
}

function readStock(header: Header, row: CsvRow, report: Report): { stock?: number } | undefined {
  const text = header.stock < 0 ? '' : (row.cells[header.stock] ?? '').trim();
  if (text === '') return {};
  const stock = readDecimal(text);
  if (Number.isInteger(stock) && stock >= 0) return { stock };
  report(row, header.stock, {
    field: 'stock',
    found: shownCell(text),
    allowed: 'a whole number of pieces, or nothing',
  });
  return undefined;
}

function repeatedNames(rows: readonly CsvRow[], header: Header, report: Report): void {
  const index = header.fields.find(({ field }) => field === 'name')?.index ?? -1;
  const lines = new Map<string, number>();
  for (const row of rows) {
    const name = (row.cells[index] ?? '').trim();
    const earlier = lines.get(name);
    if (earlier === undefined) lines.set(name, row.line);
    else if (name !== '') {
      report(row, index, {
        field: 'name',
        found: `${shownCell(name)}, which line ${earlier} has too`,
        allowed: 'each name once',
      });
    }
  }
}

function cut(findings: readonly Finding[], file: string): readonly Finding[] {
  if (findings.length <= MOST_FINDINGS) return findings;
  const more = {
    file,
    line: 0,
    column: 0,
    field: '',
    found: `more than ${MOST_FINDINGS} problems`,
    allowed: 'a table without any; the first ones are listed',
  };
  return [...findings.slice(0, MOST_FINDINGS), more];
}
