/** Designs side by side: what differs comes first, most different on top; what is alike in all stands closed below. */
import { type Dataset, type Quantity, shown } from '../dataset.ts';
import { capital, titled } from '../labels.ts';
import { clear, type Root } from '../marks/root.ts';
import { familyName } from './legend.ts';
import { letter } from './overlay.ts';

/** Heads over lines of one rank; the objectives need none. */
const GROUPS: Readonly<Record<number, string>> = { 2: 'Values and parts', 3: 'Margins' };

interface Row {
  readonly label: string;
  readonly cells: readonly string[];
  /** Column of the best value, where smaller or larger is better. */
  readonly best?: number | undefined;
  /** How much the cells differ, 0 … ; 0 is alike. */
  readonly spread: number;
  readonly rank: number;
}

export function renderCompare<E extends Element>(root: Root<E>, dataset: Dataset, pinned: readonly number[]): void {
  clear(root);
  if (pinned.length === 0) {
    root
      .append('p')
      .attr('class', 'hint')
      .text(
        'Pin designs to set them side by side: press “Pin” on an open design, or P while moving along the picture.',
      );
    return;
  }
  const rows = rowsOf(dataset, pinned);
  const different = rows.filter((row) => row.spread > 0).sort((a, b) => a.rank - b.rank || b.spread - a.spread);
  const alike = rows.filter((row) => row.spread === 0);
  const ids = pinned.map((i) => dataset.rows[i]?.id ?? '');
  table(
    root
      .append('div')
      .attr('class', 'scroll')
      .attr('tabindex', 0)
      .attr('role', 'region')
      .attr('aria-label', 'Differences, side by side'),
    'Where they differ',
    ids,
    pinned.length === 1 ? rows : different,
    true,
  );
  if (alike.length === 0 || pinned.length === 1) return;
  const details = root.append('details').attr('class', 'numbers');
  details.append('summary').text(`Alike in all: ${alike.length} ${alike.length === 1 ? 'line' : 'lines'}`);
  table(
    details
      .append('div')
      .attr('class', 'scroll')
      .attr('tabindex', 0)
      .attr('role', 'region')
      .attr('aria-label', 'Alike in all'),
    'Alike in all',
    ids,
    alike,
    false,
  );
}

function table(
  root: Root<HTMLDivElement>,
  caption: string,
  ids: readonly string[],
  rows: readonly Row[],
  heads: boolean,
): void {
  const made = root.append('table').attr('class', 'compare');
  made.append('caption').attr('class', 'unseen').text(caption);
  const head = made.append('thead').append('tr');
  head.append('th').attr('scope', 'col').text(caption);
  ids.forEach((id, column) => {
    const cell = head.append('th').attr('scope', 'col');
    cell.append('span').attr('class', 'pin-name').text(letter(column));
    if (!heads) return;
    cell
      .append('button')
      .attr('type', 'button')
      .attr('class', 'link')
      .attr('data-act', 'open')
      .attr('data-id', id)
      .text(id);
    cell
      .append('button')
      .attr('type', 'button')
      .attr('class', 'quiet')
      .attr('data-act', 'unpin')
      .attr('data-id', id)
      .attr('aria-label', `Unpin ${id}`)
      .text('×');
  });
  let body = made.append('tbody');
  let group = '';
  for (const row of rows) {
    if (heads && GROUPS[row.rank] !== undefined && GROUPS[row.rank] !== group) {
      group = GROUPS[row.rank] ?? '';
      body = made.append('tbody');
      body
        .append('tr')
        .attr('class', 'group')
        .append('th')
        .attr('scope', 'rowgroup')
        .attr('colspan', ids.length + 1)
        .text(group);
    }
    const line = body.append('tr');
    line
      .append('th')
      .attr('scope', 'row')
      .text(group === GROUPS[3] ? row.label.replace(/, margin$/, '') : row.label);
    row.cells.forEach((cell, column) => {
      const td = line.append('td');
      if (row.best === column) td.attr('class', 'best').append('span').attr('class', 'flag').text('best');
      td.append('bdi').text(cell);
    });
  }
}

function rowsOf(dataset: Dataset, pinned: readonly number[]): readonly Row[] {
  const designs = pinned.flatMap((i) => dataset.rows[i] ?? []);
  const words = (label: string, cells: readonly string[], rank: number): Row => ({
    label,
    cells,
    rank,
    spread: new Set(cells).size > 1 ? 1 : 0,
  });
  const slots = [...new Set(designs.flatMap((design) => Object.keys(design.parts)))];
  return [
    ...dataset.quantities.map((quantity) => numbers(quantity, pinned)),
    words(
      'Family',
      designs.map((design) => familyName(design.family)),
      1,
    ),
    words(
      'Remark',
      pinned.map((i) => dataset.remarks.get(i)?.join(', ') ?? 'none'),
      -1,
    ),
    ...slots.map((slot) =>
      words(
        titled(slot),
        designs.map((design) => design.parts[slot] ?? 'none'),
        2,
      ),
    ),
  ].filter((row) => row.cells.some((cell) => cell !== 'none'));
}

function numbers(quantity: Quantity, pinned: readonly number[]): Row {
  const values = pinned.map((i) => quantity.values[i] ?? Number.NaN);
  const finite = values.filter((value) => Number.isFinite(value));
  const [low, high] = [Math.min(...finite), Math.max(...finite)];
  const size = Math.max(Math.abs(low), Math.abs(high)) || 1;
  const cells = values.map((value) => shown(quantity, value));
  const isAlike = new Set(cells).size === 1;
  const spread = isAlike ? 0 : Math.max((high - low) / size, 1e-6);
  const target = quantity.group === 'objective' ? low : high;
  const isRanked = quantity.group === 'objective' || quantity.group === 'yield';
  const best = isRanked && !isAlike && pinned.length > 1 ? values.indexOf(target) : undefined;
  const rank = isRanked ? 0 : quantity.group === 'variable' ? 2 : 3;
  return {
    label: capital(quantity.label),
    cells,
    best,
    spread,
    rank,
  };
}
