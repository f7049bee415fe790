/** An empty parts table to fill in. */
import type { Column } from './column.ts';
import { headerCell } from './header.ts';
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
