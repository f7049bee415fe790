/** Words around the trade-off picture: first picks, the note under it, the spoken value, the hover card, the table. */
import { bandOf } from '../bands.ts';
import type { Dataset } from '../dataset.ts';
import { counted, listed, spoken, titled } from '../labels.ts';
import { plainTable } from '../marks/numbers.ts';
import { clear, type Root } from '../marks/root.ts';
import type { Pick as FirstPick } from '../picks.ts';
import { marginPercent, percent, show } from '../units.ts';
import { familyName } from './legend.ts';
import { isDisputed } from './overlay.ts';
import type { TradeoffInput } from './tradeoff-scales.ts';

export function renderPicks<E extends Element>(
  root: Root<E>,
  dataset: Dataset,
  picks: readonly FirstPick[],
  open: string,
): void {
  clear(root);
  for (const pick of picks) {
    const id = dataset.designs[pick.index]?.id ?? '';
    root
      .append('button')
      .attr('type', 'button')
      .attr('data-act', 'open')
      .attr('data-id', id)
      .attr('aria-pressed', String(id === open))
      .text(pick.label);
  }
}

/** What size, shade, rings and the band mean, with their numbers. */
export function pictureNote(input: TradeoffInput): string {
  const words: string[] = [];
  if (input.third !== undefined) {
    const { label, unit, low, high } = input.third;
    const how = input.as === 'size' ? 'A larger mark has more' : 'A darker mark has less';
    words.push(`${how} ${label}: ${show(low, unit)} to ${show(high, unit)}.`);
  }
  if (input.open !== undefined)
    words.push(`Tinted box: the model’s own error around the open design; ${alikeWords(input)}.`);
  if (input.open !== undefined && input.dataset.misses.has(input.open))
    words.push('The open design is a near miss: it breaks a limit, so it is not on the front.');
  if (input.incumbents.length > 0) words.push('Dashed ring: a design that exists already.');
  if (input.dataset.designs.some((_, i) => isDisputed(input, i)))
    words.push('Dotted red ring: simulation disagrees with the model.');
  if (input.dataset.designs.length > 0) words.push('Grey: a sample of all designs that keep every limit.');
  return words.join(' ');
}

function alikeWords({ alike, dataset, rail }: TradeoffInput): string {
  const banded = dataset.objectives
    .filter(({ name, high }) => bandOf(name, high, rail) > 0)
    .map(({ name }) => spoken(name).split(',')[0] ?? '');
  if (alike.length === 0) return `no other lies in it in ${listed(banded)}`;
  return `the ${counted(alike.length, 'ringed design')} cannot be told from it in ${listed(banded)}`;
}

/** One design in a breath, for the hover card and for screen readers. */
export function designWords(dataset: Dataset, index: number): readonly string[] {
  const design = dataset.rows[index];
  if (design === undefined) return [];
  const figures = dataset.objectives.map(
    (objective) => `${show(objective.values[index] ?? Number.NaN, objective.unit)} ${spoken(objective.name)}`,
  );
  const { frequency, inductance } = design.genes;
  const genes = [
    frequency === undefined ? '' : show(frequency, 'Hz'),
    inductance === undefined ? '' : show(inductance, 'H'),
  ].filter((text) => text !== '');
  return [familyName(design.family), ...figures, genes.join(', '), design.id, ...(dataset.remarks.get(index) ?? [])];
}

/** Table of the designs left, `most` at most, by the horizontal axis. */
export function renderDesigns<E extends Element>(root: Root<E>, input: TradeoffInput, most: number): void {
  const { dataset } = input;
  const order = [...input.kept].sort((a, b) => (input.x.values[a] ?? 0) - (input.x.values[b] ?? 0)).slice(0, most);
  const hasYield = dataset.byKey.has('y.yield');
  const hasRemarks = order.some((i) => dataset.remarks.has(i));
  const head = [
    'Design',
    'Family',
    ...dataset.objectives.map((objective) => titled(objective.name)),
    'Frequency',
    'Tightest margin',
    ...(hasYield ? ['Yield'] : []),
    ...(hasRemarks ? ['Remark'] : []),
  ];
  const frequency = dataset.byKey.get('v.frequency');
  const rows = order.map((i) => [
    dataset.designs[i]?.id ?? '',
    familyName(dataset.designs[i]?.family ?? ''),
    ...dataset.objectives.map((objective) => show(objective.values[i] ?? Number.NaN, objective.unit)),
    frequency === undefined ? '' : show(frequency.values[i] ?? Number.NaN, 'Hz'),
    marginPercent(dataset.designs[i]?.worstMargin ?? Number.NaN),
    ...(hasYield ? [percent(dataset.designs[i]?.yield ?? Number.NaN)] : []),
    ...(hasRemarks ? [dataset.remarks.get(i)?.join(', ') ?? ''] : []),
  ]);
  const table = plainTable(
    clear(root) as unknown as Root<HTMLDivElement>,
    `Designs left, ${order.length} of ${input.kept.length} shown, by ${spoken(input.x.name)}`,
    head,
    rows,
  );
  table.selectAll<HTMLElement, unknown>('tbody th').each(function link() {
    const id = this.textContent ?? '';
    this.textContent = '';
    const button = this.ownerDocument.createElement('button');
    button.type = 'button';
    button.className = 'link';
    button.dataset.act = 'open';
    button.dataset.id = id;
    button.textContent = id;
    this.append(button);
  });
}
