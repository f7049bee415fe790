/** The table behind a chart: closed until asked for, the same numbers as the drawing. */
import type { Root } from './root.ts';

export interface NumbersOptions {
  /** What the closed table is called. */
  readonly summary: string;
  readonly caption: string;
}

/** Appends a closed table; the first cell of each row is its header. */
export function numbersTable<E extends Element>(
  root: Root<E>,
  options: NumbersOptions,
  head: readonly string[],
  rows: readonly (readonly string[])[],
): void {
  const details = root.append('details').attr('class', 'numbers');
  details.append('summary').text(options.summary);
  plainTable(
    details
      .append('div')
      .attr('class', 'scroll')
      .attr('tabindex', 0)
      .attr('role', 'region')
      .attr('aria-label', options.caption),
    options.caption,
    head,
    rows,
  );
}

/** Appends an open table with a caption for screen readers. */
export function plainTable(
  root: Root<HTMLDivElement>,
  caption: string,
  head: readonly string[],
  rows: readonly (readonly string[])[],
): Root<HTMLTableElement> {
  const table = root.append('table');
  table.append('caption').attr('class', 'unseen').text(caption);
  const line = table.append('thead').append('tr');
  for (const word of head) line.append('th').attr('scope', 'col').text(word);
  const body = table.append('tbody');
  for (const row of rows) {
    const tr = body.append('tr');
    row.forEach((cell, i) => {
      if (i === 0) tr.append('th').attr('scope', 'row').text(cell);
      else tr.append('td').text(cell);
    });
  }
  return table;
}
