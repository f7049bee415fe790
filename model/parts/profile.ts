/** What a parts table holds at a glance: the range of every column, and rows far off the trends of their kind. */
import type { Dimension } from '../quantity/dimension.ts';
import { DIMENSIONS } from '../quantity/dimension.ts';
import type { Column, Row } from './column.ts';
import { type RowOf, SCHEMAS } from './schemas.ts';
import type { PartKind } from './tables.ts';
import { TRENDS, type Trend } from './trends.ts';

/** Smallest and largest value of a column, SI. */
export interface ColumnRange {
  readonly column: string;
  readonly unit: string;
  readonly dimension: Dimension;
  readonly smallest: number;
  readonly largest: number;
}

/** A row far off a trend, SI. */
export interface Outlier {
  readonly name: string;
  readonly trend: string;
  readonly unit: string;
  readonly value: number;
  /** Smallest and largest value that are usual for such a part. */
  readonly usual: readonly [number, number];
}

export interface TableProfile {
  readonly rows: number;
  readonly ranges: readonly ColumnRange[];
  readonly outliers: readonly Outlier[];
}

/** The profile of `rows`; ranges in the order of the columns, outliers in the order of the rows. */
export function tableProfile<K extends PartKind>(kind: K, rows: readonly RowOf<K>[]): TableProfile {
  const columns: [string, Column<unknown>][] = Object.entries(SCHEMAS[kind].columns);
  const trends: readonly Trend<RowOf<K>>[] = TRENDS[kind];
  return {
    rows: rows.length,
    ranges: columns.flatMap(([field, column]) => rangeOf(field, column, rows)),
    outliers: rows.flatMap((row) => trends.flatMap((trend) => outlierOf(trend, row))),
  };
}

function rangeOf(field: string, { name, dimension, money }: Column<unknown>, rows: readonly Row[]): ColumnRange[] {
  if (dimension === undefined || money === true) return [];
  const values = rows.map((row) => Reflect.get(row, field)).filter((value) => typeof value === 'number');
  if (values.length === 0) return [];
  const smallest = values.reduce((least, value) => Math.min(least, value), Number.POSITIVE_INFINITY);
  const largest = values.reduce((most, value) => Math.max(most, value), Number.NEGATIVE_INFINITY);
  return [{ column: name, unit: DIMENSIONS[dimension].unit, dimension, smallest, largest }];
}

function outlierOf<T extends Row>(trend: Trend<T>, row: T): Outlier[] {
  const usual = trend.usual(row);
  if (usual === undefined) return [];
  const value = trend.value(row);
  const range = [usual * trend.low, usual * trend.high] as const;
  if (value >= range[0] && value <= range[1]) return [];
  return [{ name: row.name, trend: trend.name, unit: trend.unit, value, usual: range }];
}
