/** Tables of short texts for the terminal: columns aligned, numbers to the right, nothing drawn around them. */
import { short, widthOf } from './text.ts';

/** One column: its heading and on which side its texts stand. */
export interface Column {
  readonly head: string;
  readonly right?: boolean;
}

const WIDEST = 48;

/** The table as lines, each indented by two spaces; cells are made harmless and cut to `widest` characters. */
export function table(
  columns: readonly Column[],
  rows: readonly (readonly string[])[],
  widest: number = WIDEST,
): string[] {
  const all = [columns.map((column) => column.head), ...rows.map((row) => columns.map((_, i) => row[i] ?? ''))];
  const cells = all.map((row) => row.map((cell) => short(cell, widest)));
  const widths = columns.map((_, i) => Math.max(...cells.map((row) => widthOf(row[i] ?? ''))));
  const headless = columns.every((column) => column.head === '');
  return (headless ? cells.slice(1) : cells).map((row) => `  ${line(columns, row, widths)}`.trimEnd());
}

function line(columns: readonly Column[], row: readonly string[], widths: readonly number[]): string {
  const padded = columns.map((column, i) => {
    const text = row[i] ?? '';
    const gap = ' '.repeat((widths[i] ?? 0) - widthOf(text));
    return column.right === true ? gap + text : text + gap;
  });
  return padded.join('  ');
}
