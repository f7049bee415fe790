/** Ranges that narrow everything: a histogram and two thumbs for each chosen quantity. */
import type { Dataset, Quantity } from '../dataset.ts';
import { shown, varies } from '../dataset.ts';
import { capital, thousands } from '../labels.ts';
import { clear, px, type Root } from '../marks/root.ts';
import type { Interval, State } from '../state.ts';

const rangesDefaults = {
  bins: 36,
  /** Positions of a thumb from one end to the other. */
  steps: 240,
  /** Variables that stand open beside the objectives. */
  variables: ['frequency', 'phases'],
};

/** Quantities with a row: the objectives, a few variables, and all that carry a range. */
export function shownQuantities(
  dataset: Dataset,
  ranges: State['ranges'],
  options = rangesDefaults,
): readonly Quantity[] {
  return dataset.quantities.filter(
    (one) =>
      (one.key in ranges && varies(one)) ||
      (varies(one) &&
        (one.group === 'objective' ||
          one.group === 'yield' ||
          (one.group === 'variable' && options.variables.includes(one.name)))),
  );
}

/** Fills `root` with one row a quantity; rows that stay keep their inputs, so that a drag or the focus survives. */
export function renderRanges<E extends Element>(
  root: Root<E>,
  dataset: Dataset,
  state: Pick<State, 'ranges'>,
  kept: readonly number[],
  options = rangesDefaults,
): void {
  const rows = root
    .selectAll<HTMLDivElement, Quantity>('div.range')
    .data(shownQuantities(dataset, state.ranges), (quantity) => quantity.key);
  const all = rows.join((enter) => {
    const row = enter
      .append('div')
      .attr('class', 'range')
      .attr('data-key', (quantity) => quantity.key);
    const head = row.append('div').attr('class', 'range-head');
    head
      .append('span')
      .attr('class', 'range-name')
      .text((quantity) => capital(quantity.label));
    head.append('output').attr('class', 'range-span');
    row
      .append('svg')
      .attr('class', 'histogram')
      .attr('viewBox', '0 0 240 26')
      .attr('preserveAspectRatio', 'none')
      .attr('aria-hidden', 'true');
    const thumbs = row.append('div').attr('class', 'thumbs');
    thumb(thumbs, 'low', 'at least', options.steps);
    thumb(thumbs, 'high', 'at most', options.steps);
    return row;
  });
  const keptSet = new Set(kept);
  all.order().each(function fill(quantity) {
    const row = this.ownerDocument === null ? undefined : this;
    if (row !== undefined) update(row, quantity, state.ranges[quantity.key], keptSet, options);
  });
}

function thumb(thumbs: d3Selection, name: 'low' | 'high', words: string, steps: number): void {
  thumbs
    .append('input')
    .attr('type', 'range')
    .attr('class', name)
    .attr('min', 0)
    .attr('max', (quantity) => (quantity.whole ? quantity.high - quantity.low : steps))
    .attr('step', 1)
    .attr('data-end', name)
    .attr('aria-label', (quantity) => `${capital(quantity.label)}, ${words}`);
}

type d3Selection = import('d3').Selection<HTMLDivElement, Quantity, Element, unknown>;

function update(
  row: HTMLDivElement,
  quantity: Quantity,
  range: Interval | undefined,
  kept: ReadonlySet<number>,
  o: typeof rangesDefaults,
): void {
  const [low, high] = range ?? [quantity.low, quantity.high];
  row.classList.toggle('narrowed', range !== undefined);
  const output = row.querySelector('output');
  if (output !== null)
    output.textContent = low === high ? shown(quantity, low) : `${shown(quantity, low)} to ${shown(quantity, high)}`;
  const most = quantity.whole ? quantity.high - quantity.low : o.steps;
  for (const [name, value] of [
    ['low', low],
    ['high', high],
  ] as const) {
    const input = row.querySelector<HTMLInputElement>(`input.${name}`);
    if (input === null) continue;
    const position = String(Math.round(place(quantity, value) * most));
    if (input.value !== position) input.value = position;
    input.setAttribute('value', position);
    input.setAttribute('aria-valuetext', shown(quantity, value));
  }
  const svg = row.querySelector('svg');
  if (svg !== null) histogram(svg, quantity, kept, o.bins);
}

function histogram(svg: SVGSVGElement, quantity: Quantity, kept: ReadonlySet<number>, most: number): void {
  const bins = quantity.whole ? Math.min(most, quantity.high - quantity.low + 1) : most;
  const all = new Uint32Array(bins);
  const left = new Uint32Array(bins);
  quantity.front.forEach((value, i) => {
    if (Number.isNaN(value)) return;
    const bin = Math.min(bins - 1, Math.floor(place(quantity, value) * (quantity.whole ? bins - 1 : bins)));
    all[bin] = (all[bin] ?? 0) + 1;
    if (kept.has(i)) left[bin] = (left[bin] ?? 0) + 1;
  });
  const peak = Math.max(1, ...all);
  svg.replaceChildren();
  for (const [name, counts] of [
    ['all', all],
    ['left', left],
  ] as const) {
    const path = svg.ownerDocument.createElementNS('http://www.w3.org/2000/svg', 'path');
    path.setAttribute('class', name);
    path.setAttribute('d', bars(counts, peak, 240 / bins));
    svg.append(path);
  }
}

function bars(counts: Uint32Array, peak: number, width: number): string {
  let d = '';
  counts.forEach((count, i) => {
    if (count > 0) d += `M${px(i * width)} 26v${px(-2 - 24 * Math.sqrt(count / peak))}h${px(width - 1)}V26Z`;
  });
  return d;
}

/** Place of a value between the quantity's ends, 0 … 1, on its own scale. */
export function place({ low, high, log }: Quantity, value: number): number {
  if (high <= low) return 0;
  const share = log ? Math.log(value / low) / Math.log(high / low) : (value - low) / (high - low);
  return Math.max(0, Math.min(1, share));
}

/** The value at a place; the ends give the ends exactly. */
export function valueAt({ low, high, log, whole }: Quantity, share: number): number {
  if (share <= 0) return low;
  if (share >= 1) return high;
  if (whole) return Math.round(low + share * (high - low));
  return log ? low * (high / low) ** share : low + share * (high - low);
}

/** How many designs are left, in words. */
export function renderCount<E extends Element>(root: Root<E>, left: number, all: number): void {
  clear(root);
  root.append('strong').text(thousands(left));
  root.append('span').text(left === all ? ` designs, none beaten by another` : ` of ${thousands(all)} designs left`);
}
