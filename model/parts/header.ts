/** The header row of a parts table: which cell holds which field, in which unit, and which hold prices. */
import type { Finding } from '../outcome.ts';
import { DIMENSIONS, exampleOf } from '../quantity/dimension.ts';
import { nearest } from '../quantity/nearest.ts';
import { measures, readUnit, type UnitReading } from '../quantity/unit.ts';
import type { Column } from './column.ts';
import { type CsvRow, shownCell } from './csv.ts';

/** A cell of the header that holds a field. */
export interface FieldCell {
  readonly index: number;
  readonly field: string;
  readonly column: Column<unknown>;
  readonly unit: UnitReading;
}

/** A cell of the header that holds prices. */
export interface PriceCell {
  readonly index: number;
  readonly name: string;
  readonly from: number;
}

/** The header, read. */
export interface Header {
  readonly fields: readonly FieldCell[];
  readonly prices: readonly PriceCell[];
  /** Place of the stock column, −1 without one. */
  readonly stock: number;
  /** Currency of all prices; absent where none was read. */
  readonly currency?: string;
  readonly problems: readonly HeaderProblem[];
}

/** A finding of the header but for file and line; `index` is the cell, −1 for the row. */
export interface HeaderProblem extends Pick<Finding, 'field' | 'found' | 'allowed' | 'nearest'> {
  readonly index: number;
}

/** What the header must hold. */
export interface Wanted {
  readonly priced: boolean;
  readonly columns: Readonly<Record<string, Column<unknown>>>;
}

interface Draft {
  readonly fields: FieldCell[];
  readonly prices: PriceCell[];
  readonly problems: HeaderProblem[];
  stock: number;
  currency?: string;
}

const NO_UNIT: UnitReading = { exponent: 0, factor: 1, offset: 0, base: '' };
const CELL = /^([^[\]]*?)\s*(?:\[([^[\]]*)\])?$/;
const PRICE = /^price_([1-9]\d{0,8})$/;

/** `name [unit]`, as templates write it. */
export function headerCell(column: Column<unknown>): string {
  return column.unit === '' ? column.name : `${column.name} [${column.unit}]`;
}

/** Reads the header against what is wanted. */
export function readHeader(row: CsvRow, wanted: Wanted): Header {
  const draft: Draft = { fields: [], prices: [], problems: [], stock: -1 };
  const names = Object.values(wanted.columns).map((column) => column.name);
  if (wanted.priced) names.push('stock', 'price_1');
  const seen = new Set<string>();
  row.cells.forEach((cell, index) => {
    const [, name = '', unit = ''] = CELL.exec(cell.trim()) ?? [];
    const report: Report = (found, allowed, near) => {
      draft.problems.push({ index, field: name, found, allowed, ...(near === undefined ? {} : { nearest: near }) });
    };
    if (seen.has(name)) report(`the column ${shownCell(name)} twice`, 'each column once');
    else if (!addCell(draft, wanted, { index, name, unit: unit.trim() }, report)) {
      report(`the unknown column ${shownCell(cell)}`, names.join(', '), nearest(name, names));
    }
    seen.add(name);
  });
  if (draft.fields.length === 0) return { ...draft, problems: [strange(row, names)] };
  missing(draft, wanted);
  return draft;
}

type Report = (found: string, allowed: string, near?: string) => void;
interface HeaderCell {
  readonly index: number;
  readonly name: string;
  readonly unit: string;
}

/** Takes a cell of the header; false where its name is not known. */
function addCell(draft: Draft, wanted: Wanted, cell: HeaderCell, report: Report): boolean {
  const price = PRICE.exec(cell.name);
  if (wanted.priced && price !== null) {
    draft.prices.push({ index: cell.index, name: cell.name, from: Number(price[1]) });
    takeCurrency(draft, cell, report);
    return true;
  }
  if (wanted.priced && cell.name === 'stock') {
    draft.stock = cell.index;
    return true;
  }
  const entry = Object.entries(wanted.columns).find(([, column]) => column.name === cell.name);
  if (entry === undefined) return false;
  const [field, column] = entry;
  if (column.money === true) takeCurrency(draft, cell, report);
  draft.fields.push({ index: cell.index, field, column, unit: unitOf(column, cell, report) });
  return true;
}

function unitOf(column: Column<unknown>, { unit }: HeaderCell, report: Report): UnitReading {
  const { dimension } = column;
  if (column.money === true) return NO_UNIT;
  if (dimension === undefined || dimension === 'number') {
    if (unit !== '' && unit !== '1') report(`the unit ${shownCell(unit)}`, `the header ${column.name}, without a unit`);
    return NO_UNIT;
  }
  const reading = readUnit(unit);
  if (reading !== undefined && measures(reading, dimension)) return reading;
  const found = unit === '' ? 'no unit' : `the unit ${shownCell(unit)}`;
  const example = DIMENSIONS[dimension].unit === '' ? 'a share' : exampleOf(dimension);
  report(found, `the unit of ${example}, as in ${headerCell(column)}`);
  return NO_UNIT;
}

function takeCurrency(draft: Draft, { name, unit }: HeaderCell, report: Report): void {
  if (!/^[A-Z]{3}$/.test(unit)) {
    const found = unit === '' ? 'no currency' : `the currency ${shownCell(unit)}`;
    report(found, `three capital letters, as in ${name} [EUR]`);
  } else if (draft.currency !== undefined && draft.currency !== unit) {
    report(`the currency ${unit}`, `one currency in a table: ${draft.currency}`);
  } else draft.currency = unit;
}

function missing(draft: Draft, wanted: Wanted): void {
  for (const [field, column] of Object.entries(wanted.columns)) {
    if (draft.fields.some((cell) => cell.field === field)) continue;
    const allowed = `the column ${headerCell(column)}`;
    draft.problems.push({ index: -1, field: column.name, found: 'no such column', allowed });
  }
  if (wanted.priced && draft.prices.length === 0) {
    const allowed = 'at least one, such as price_1 [EUR]';
    draft.problems.push({ index: -1, field: 'price_1', found: 'no price column', allowed });
  }
}

function strange(row: CsvRow, names: readonly string[]): HeaderProblem {
  const first = row.cells.join(',');
  const hint = /[;\t]/.test(first) && !first.includes(',') ? ', with commas between the columns' : '';
  return {
    index: -1,
    field: '',
    found: shownCell(first),
    allowed: `a header with the columns ${names.join(', ')}${hint}`,
  };
}
