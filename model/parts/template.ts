/** An empty parts table to fill in: its header alone, or under comments that explain every column. */
import type { Column } from './column.ts';
import { headerCell } from './header.ts';
import { MEANINGS } from './meanings.ts';
import { SCHEMAS } from './schemas.ts';
import type { PartKind } from './tables.ts';

/** The header line of a table of `kind`, with usual units and price breaks, and a stock column; ends with a line break. */
export function tableTemplate(kind: PartKind): string {
  const columns: readonly Column<unknown>[] = Object.values(SCHEMAS[kind].columns);
  const prices = SCHEMAS[kind].priced
    ? ['price_1 [EUR]', 'price_100 [EUR]', 'price_1000 [EUR]', 'price_10000 [EUR]', 'stock']
    : [];
  return `${[...columns.map(headerCell), ...prices].join(',')}\n`;
}

/** The same header under a comment line for each column: what it means, in which unit, what a word may be. */
export function explainedTemplate(kind: PartKind): string {
  const columns: [string, Column<unknown>][] = Object.entries(SCHEMAS[kind].columns);
  const meanings: Readonly<Record<string, string>> = MEANINGS[kind];
  const rows = columns.map(
    ([field, column]) => [headerCell(column), meaningOf(column, meanings[field] ?? '')] as const,
  );
  if (SCHEMAS[kind].priced) rows.push(...PRICES);
  const width = Math.max(...rows.map(([cell]) => cell.length));
  const lines = rows.map(([cell, meaning]) => `#   ${cell.padEnd(width)}  ${meaning}`);
  return [...HEAD, ...lines, tableTemplate(kind)].join('\n');
}

const HEAD: readonly string[] = [
  '# One row for each part, below the header. Columns may stand in any order; a header may name another unit of the same',
  '# kind, such as [Ω] for [mΩ]. Write numbers with a point and without units. Lines like these may stand at the top alone.',
  '#',
];

const PRICES: readonly (readonly [string, string])[] = [
  ['price_1 [EUR]', 'price of one piece; [CHF] or another currency where the sheet is in it, one currency in a table'],
  ['price_100 [EUR]', 'price of one piece from 100 pieces on; any number may stand here, an empty cell is no break'],
  ['stock', 'pieces on hand; may be left empty'],
];

/** The meaning, and for a word what it may be: the column itself says so of an empty cell. */
function meaningOf(column: Column<unknown>, meaning: string): string {
  if (column.dimension !== undefined) return meaning;
  const empty = column.read('', { exponent: 0, factor: 1, offset: 0, base: '' });
  return empty.ok ? meaning : `${meaning}: ${empty.allowed}`;
}
