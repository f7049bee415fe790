/** Columns of a parts table: name, unit, what a cell may hold. A kind's list of columns is typed by the part it builds. */

import { type Bounds, boundsText, within } from '../quantity/bounds.ts';
import { isDecimal } from '../quantity/decimal.ts';
import { type Dimension, exampleOf } from '../quantity/dimension.ts';
import { inUnit } from '../quantity/parse.ts';
import type { UnitReading } from '../quantity/unit.ts';

/** A cell, read: its value, or what it may hold. */
export type CellReading<V> =
  | { readonly ok: true; readonly value: V }
  | { readonly ok: false; readonly allowed: string };

/** One column. */
export interface Column<V> {
  /** Name in the header, without the unit. */
  readonly name: string;
  /** Unit that templates show; empty where the column has none. */
  readonly unit: string;
  /** Kind of quantity; absent for words. */
  readonly dimension?: Dimension;
  /** Whether the header names a currency instead of a unit. */
  readonly money?: boolean;
  /** Reads a cell's text in the header's unit. */
  read(text: string, unit: UnitReading): CellReading<V>;
}

/** What every row of every table has. */
export interface Row {
  readonly name: string;
  readonly currency?: string;
}

/** Columns that build a row: one for each field but prices, currency and stock. */
export type ColumnsOf<T extends Row> = {
  readonly [F in keyof Omit<T, 'prices' | 'currency' | 'stock'>]-?: Column<T[F]>;
};

/** A physical law between the fields of one row. */
export interface RowCheck<T> {
  /** Field that is blamed. */
  readonly field: keyof T & string;
  holds(row: T): boolean;
  /** What the law asks. */
  readonly allowed: string;
}

/** How one kind of parts table is read. */
export interface TableSchema<T extends Row> {
  /** Whether rows carry price breaks and stock; else a column of `pricePerMass` stands for them. */
  readonly priced: boolean;
  readonly columns: ColumnsOf<T>;
  readonly checks: readonly RowCheck<T>[];
}

/** A quantity shown in `unit` by templates; any unit of the same dimension is read. */
export function quantity(name: string, unit: string, dimension: Dimension, bounds: Bounds): Column<number> {
  const allowed = `${boundsText(bounds, dimension)} in the unit of the header`;
  return {
    name,
    unit,
    dimension,
    read: (text, reading) => {
      if (!isDecimal(text)) return { ok: false, allowed: `a number (${exampleOf(dimension)})` };
      const value = inUnit(text, reading);
      return within(value, bounds) ? { ok: true, value } : { ok: false, allowed };
    },
  };
}

/** A positive quantity up to `most`. */
export function positive(name: string, unit: string, dimension: Dimension, most: number): Column<number> {
  return quantity(name, unit, dimension, { above: 0, to: most });
}

/** A number without a unit. */
export function plain(name: string, bounds: Bounds): Column<number> {
  return quantity(name, '', 'number', bounds);
}

/** A whole number. */
export function whole(name: string, from: number, to: number): Column<number> {
  const column = plain(name, { from, to });
  return {
    ...column,
    read: (text, unit) => {
      const cell = column.read(text, unit);
      return cell.ok && !Number.isInteger(cell.value)
        ? { ok: false, allowed: `a whole number ${from} to ${to}` }
        : cell;
    },
  };
}

/** A name: letters, digits and . _ + - / # and spaces, at most 60, the first a letter or digit. */
export function word(name: string): Column<string> {
  const allowed = 'a name of at most 60 letters, digits, spaces and . _ + - / #, starting with a letter or digit';
  const pattern = /^[\p{L}\p{N}][\p{L}\p{N} ._+\-/#]{0,59}$/u;
  return { name, unit: '', read: (text) => (pattern.test(text) ? { ok: true, value: text } : { ok: false, allowed }) };
}

/** One of a few words. */
export function choice<const O extends readonly string[]>(name: string, options: O): Column<O[number]> {
  return {
    name,
    unit: '',
    read: (text) => {
      const value = options.find((option) => option === text);
      return value === undefined ? { ok: false, allowed: options.join(', ') } : { ok: true, value };
    },
  };
}

/** One or more of a few words, joined by +. */
export function choices<const O extends readonly string[]>(name: string, options: O): Column<readonly O[number][]> {
  const single = choice(name, options);
  return {
    name,
    unit: '',
    read: (text, unit) => {
      const values: O[number][] = [];
      for (const part of text.split('+')) {
        const cell = single.read(part.trim(), unit);
        if (!cell.ok || values.includes(cell.value))
          return { ok: false, allowed: `${options.join(', ')}, joined by +` };
        values.push(cell.value);
      }
      return { ok: true, value: values };
    },
  };
}

/** `yes` or `no`. */
export function yesNo(name: string): Column<boolean> {
  return {
    name,
    unit: '',
    read: (text) => {
      if (text !== 'yes' && text !== 'no') return { ok: false, allowed: 'yes, no' };
      return { ok: true, value: text === 'yes' };
    },
  };
}

/** A price of one kilogram, in the currency of the header. */
export function pricePerMass(name: string): Column<number> {
  return { ...plain(name, { from: 0, to: 1e5 }), unit: 'EUR', money: true };
}

/** Box and mass of a part; the biggest part that makes sense is 0.5 m long and weighs 20 kg. */
export const BOX_COLUMNS = {
  length: positive('length', 'mm', 'length', 0.5),
  width: positive('width', 'mm', 'length', 0.5),
  height: positive('height', 'mm', 'length', 0.5),
  mass: positive('mass', 'g', 'mass', 20),
};
