/** What `parts check` finds in one table: rejected rows, ranges beside those of the built-in tables, rows that look odd. */
import {
  describeFinding,
  type Finding,
  inspectTable,
  LARGEST_TABLE,
  type Outlier,
  type PartKind,
  type RowOf,
  readTable,
  tableProfile,
} from '../../model/index.ts';
import { builtInText } from '../inputs.ts';
import { readText } from '../run-folder/files.ts';
import { kindOfTable, nameOfKind } from '../table-kind.ts';

/** Smallest and largest value of a column, SI, here and in the built-in table of the kind. */
export interface ComparedRange {
  readonly column: string;
  readonly unit: string;
  readonly dimension: string;
  readonly smallest: number;
  readonly largest: number;
  readonly builtIn?: readonly [number, number];
}

/** A row worth a second look. */
export interface OddRow {
  readonly line: number;
  readonly name: string;
  /** What is odd: a law between columns, or a column. */
  readonly what: string;
  readonly unit: string;
  /** SI. */
  readonly value: number;
  readonly usual: readonly [number, number];
}

/** One table, looked at. */
export interface PartsReport {
  readonly file: string;
  readonly kind: string;
  /** Rows below the header, and how many of them were rejected. */
  readonly rows: number;
  readonly rejected: number;
  readonly currency?: string;
  readonly findings: readonly Finding[];
  readonly ranges: readonly ComparedRange[];
  readonly odd: readonly OddRow[];
  readonly remarks: readonly string[];
}

/** Looks at the table in `file`. Throws refusals where it cannot be read at all or is of no kind. */
export function inspectOwnTable(file: string): PartsReport {
  const text = readText(file, 'a parts table', 4 * LARGEST_TABLE);
  return inspectTableText(text, file);
}

/** Looks at the table in `text`; `file` is its name. Throws the refusal `table-kind`. */
export function inspectTableText(text: string, file: string): PartsReport {
  const kind = kindOfTable(text, file);
  const { rows, lines, total, findings } = inspectTable(kind, text, file);
  const bad = new Set(findings.map(({ line }) => line));
  const good = rows.map((row, i) => ({ row, line: lines[i] ?? 0 })).filter(({ line }) => !bad.has(line));
  const kept = good.map(({ row }) => row);
  const builtIn = shippedRows(kind);
  const lineOf = new Map(good.map(({ row, line }) => [row.name, line]));
  const currency = kept[0]?.currency;
  const ranges = compared(kind, kept, builtIn);
  return {
    file,
    kind: nameOfKind(kind),
    rows: total,
    rejected: total - kept.length,
    ...(currency === undefined ? {} : { currency }),
    findings,
    ranges,
    odd: oddRows(kind, kept, ranges)
      .map((row) => ({ ...row, line: lineOf.get(row.name) ?? 0 }))
      .sort((a, b) => a.line - b.line),
    remarks: remarksOn(kind, kept, builtIn, currency),
  };
}

/** `2 of 12 rows in a.csv, 1 of 3 rows in b.csv`; empty where nothing was rejected. */
export function rejectedIn(reports: readonly PartsReport[]): string {
  return reports
    .filter(({ findings }) => findings.length > 0)
    .map(({ file, rows, rejected }) => `${rejected} of ${rows} row${rows === 1 ? '' : 's'} in ${file}`)
    .join(', ');
}

const read = new Map<PartKind, readonly RowOf<PartKind>[]>();

/** Rows of the built-in table of a kind, read once. */
function shippedRows<K extends PartKind>(kind: K): readonly RowOf<K>[] {
  const known = read.get(kind);
  if (known !== undefined) return known as readonly RowOf<K>[];
  const rows = readShipped(kind);
  read.set(kind, rows);
  return rows;
}

function readShipped<K extends PartKind>(kind: K): readonly RowOf<K>[] {
  const { text, file } = builtInText(kind);
  const outcome = readTable(kind, text, file);
  if (outcome.ok) return outcome.value;
  throw new Error(outcome.findings.map(describeFinding)[0] ?? file);
}

function compared<K extends PartKind>(kind: K, rows: readonly RowOf<K>[], shipped: readonly RowOf<K>[]) {
  const theirs = new Map(tableProfile(kind, shipped).ranges.map((range) => [range.column, range]));
  return tableProfile(kind, rows).ranges.map((range): ComparedRange => {
    const other = theirs.get(range.column);
    return other === undefined ? range : { ...range, builtIn: [other.smallest, other.largest] };
  });
}

/** How far outside the built-in range a value may lie before a slip of the unit is likelier than a new part. */
const FAR = 10;

function oddRows<K extends PartKind>(
  kind: K,
  rows: readonly RowOf<K>[],
  ranges: readonly ComparedRange[],
): Omit<OddRow, 'line'>[] {
  const byTrend = tableProfile(kind, rows).outliers.map(({ trend, ...rest }: Outlier) => ({ ...rest, what: trend }));
  // Ranges of one row at a time tell that row's values in SI, by the names of the columns.
  const byRange = rows.flatMap((row) =>
    tableProfile(kind, [row]).ranges.flatMap(({ column, unit, dimension, smallest: value }) => {
      const usual = ranges.find((range) => range.column === column)?.builtIn;
      if (usual === undefined || SCALELESS.has(dimension)) return [];
      const near = value >= usual[0] / FAR && value <= usual[1] * FAR;
      return near ? [] : [{ name: row.name, what: column, unit, value, usual }];
    }),
  );
  return [...byTrend, ...byRange];
}

/** Quantities of which a tenth or tenfold says nothing. */
const SCALELESS = new Set(['temperature', 'number', 'fraction', 'change per kelvin', 'voltage per kelvin']);

function remarksOn(
  kind: PartKind,
  rows: readonly RowOf<PartKind>[],
  shipped: readonly RowOf<PartKind>[],
  currency: string | undefined,
): string[] {
  const taken = new Set(shipped.map(({ name }) => name));
  const double = rows.filter(({ name }) => taken.has(name)).map(({ name }) => name);
  const rising = rows.flatMap((row) => ('prices' in row && rises(row.prices) ? [row.name] : []));
  const theirs = shipped[0]?.currency ?? '';
  return [
    ...(double.length === 0
      ? []
      : [`the built-in ${nameOfKind(kind)} have ${listed(double)} too: a sheet cannot use both tables`]),
    ...(rising.length === 0 ? [] : [`more pieces cost more each: ${listed(rising)}`]),
    ...(currency === undefined || currency === theirs
      ? []
      : [`prices are in ${currency}, those of the built-in tables in ${theirs}: a sheet cannot use both`]),
  ];
}

function rises(prices: readonly { readonly price: number }[]): boolean {
  return prices.some(({ price }, i) => i > 0 && price > (prices[i - 1]?.price ?? price));
}

function listed(names: readonly string[]): string {
  return names.length <= 5 ? names.join(', ') : `${names.slice(0, 5).join(', ')} and ${names.length - 5} more`;
}
