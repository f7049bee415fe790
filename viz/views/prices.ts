/** What each limit costs: a limit relaxed so far, and what each objective would gain; every near miss can be opened. */
import {
  bestGainOf,
  freeLimits,
  type Gain,
  gainOf,
  howPriced,
  isTelling,
  type Relaxations,
  type RequirementPrice,
  requirementPrices,
} from '../../model/prices.ts';
import type { PageData } from '../data.ts';
import { capital, counted, inWords, listed, spoken, spokenLimit, titled } from '../labels.ts';
import { clear, type Root } from '../marks/root.ts';
import { percent, show, showDifference } from '../units.ts';
import { written } from './limits.ts';

type PricesInput = Pick<PageData, 'front' | 'nearMisses' | 'relaxations' | 'rail'>;

export function renderPrices<E extends Element>(root: Root<E>, input: PricesInput): void {
  const { front, nearMisses, relaxations, rail } = input;
  clear(root);
  const prices = requirementPrices(front, nearMisses, relaxations);
  const hint = (words: string): void => {
    root.append('p').attr('class', 'hint').text(words);
  };
  if (prices.length > 0) priceTable(root, front.objectives, prices);
  else {
    hint(
      `No design found that would beat the front by breaking one limit of ${rail.name} a little: no single limit stands in the way.`,
    );
  }
  hint(inWords(howPriced(relaxations)) + freeWords(prices, relaxations));
  if (nearMisses.length > 0) everyMiss(root, input);
}

/** ` Relaxed without any gain: height and saturation.` */
function freeWords(prices: readonly RequirementPrice[], relaxations: Relaxations | undefined): string {
  const free = relaxations === undefined ? [] : freeLimits(prices, relaxations).map(spokenLimit);
  return free.length === 0 ? '' : ` Relaxed without any gain: ${listed(free)}.`;
}

function region<E extends Element>(root: Root<E>, name: string): Root<HTMLDivElement> {
  return root
    .append('div')
    .attr('class', 'scroll')
    .attr('tabindex', 0)
    .attr('role', 'region')
    .attr('aria-label', name) as unknown as Root<HTMLDivElement>;
}

function headed(
  root: Root<HTMLDivElement>,
  name: string,
  caption: string,
  words: readonly string[],
): Root<HTMLTableElement> {
  const table = root.append('table').attr('class', name);
  table.append('caption').attr('class', 'unseen').text(caption);
  const head = table.append('thead').append('tr');
  for (const word of words) head.append('th').attr('scope', 'col').text(word);
  return table;
}

function priceTable<E extends Element>(
  root: Root<E>,
  objectives: PageData['front']['objectives'],
  prices: readonly RequirementPrice[],
): void {
  const names = objectives.map(({ name }) => `Best ${short(name)}`);
  const table = headed(
    region(root, 'What each limit costs'),
    'ledger prices',
    'Limits, how far each is relaxed, how the best of each objective changes, and the design that gains most at no more of the others',
    ['If this limit', 'moved', ...names, 'One gains most, the others no worse'],
  );
  const body = table.append('tbody');
  for (const [i, price] of prices.entries()) {
    const row = body.append('tr');
    if (price.limit !== prices[i - 1]?.limit) {
      const lines = prices.filter(({ limit }) => limit === price.limit).length;
      const name = row.append('th').attr('scope', 'row');
      if (lines > 1) name.attr('rowspan', lines);
      name.text(capital(spokenLimit(price.limit)));
    }
    row.append('td').attr('class', 'moved').text(relaxationWords(price));
    for (const gain of price.gains) gainCell(row, bestGainOf(gain), gain.best, gain.relaxed, gain.unit);
    topCell(row, price);
  }
}

function short(objective: string): string {
  return spoken(objective).split(',')[0] ?? '';
}

/** `−12.0 %`, and below it from what to what; a dot where nothing is gained. */
function gainCell(row: Root<HTMLTableRowElement>, share: number, from: number, to: number, unit: string): void {
  const cell = row.append('td');
  if (!isTelling(share)) {
    cell.text('·');
    return;
  }
  cell.attr('class', 'gained').append('strong').text(percent(-share));
  cell.append('span').text(`${show(from, unit)} → ${show(to, unit)}`);
}

/** The objective that one design gains most in, and that design. */
function topCell(row: Root<HTMLTableRowElement>, { gains, design }: RequirementPrice): void {
  const top = gains.reduce((a: Gain, b: Gain) => (gainOf(b) > gainOf(a) ? b : a));
  const cell = row.append('td').attr('class', 'gained');
  if (isTelling(gainOf(top))) cell.append('strong').text(`${short(top.objective)} ${percent(-gainOf(top))} `);
  opener(cell, design);
}

/** `20 mV → 21.8 mV (+9.0 %)`, a temperature by kelvin, an efficiency by points; a limit that allows nothing by how far it is broken. */
function relaxationWords({ limit, unit, allowed, relaxedTo }: RequirementPrice): string {
  const one = { name: limit, unit };
  if (allowed === 0) return `by ${unit === '' ? percent(Math.abs(relaxedTo)) : written(one, Math.abs(relaxedTo))}`;
  const share = relaxedTo / allowed - 1;
  if (limit.startsWith('efficiency')) return `${written(one, allowed)} → ${written(one, relaxedTo)}`;
  const by = unit === 'K' ? showDifference(relaxedTo - allowed, unit) : `${share < 0 ? '' : '+'}${percent(share)}`;
  return `${written(one, allowed)} → ${written(one, relaxedTo)} (${by})`;
}

function opener(cell: Root<HTMLTableCellElement>, id: string): void {
  cell
    .append('button')
    .attr('type', 'button')
    .attr('class', 'link')
    .attr('data-act', 'open')
    .attr('data-id', id)
    .text(id);
}

/** Every near miss, closed until asked for: what it breaks, its objectives, and a way to open it. */
function everyMiss<E extends Element>(root: Root<E>, { front, nearMisses }: PricesInput): void {
  const details = root.append('details').attr('class', 'numbers') as unknown as Root<HTMLDetailsElement>;
  const count = counted(nearMisses.length, 'near miss', 'near misses');
  details.append('summary').text(`All ${count}: designs that break exactly one limit and would beat the front`);
  const heads = front.objectives.map(({ name }) => titled(name));
  const table = headed(region(details, 'Near misses'), '', 'Near misses', [
    'Design',
    'breaks',
    'has',
    'allowed',
    ...heads,
  ]);
  const body = table.append('tbody');
  for (const { limit, value, allowed, design } of nearMisses) {
    const unit = front.limits.find(({ name }) => name === limit)?.unit ?? '';
    const row = body.append('tr');
    opener(row.append('th').attr('scope', 'row') as unknown as Root<HTMLTableCellElement>, design.id);
    const objectives = front.objectives.map((one, k) => show(design.objectives[k] ?? Number.NaN, one.unit));
    const figures = [value, allowed].map((figure) => written({ name: limit, unit }, figure));
    for (const text of [capital(spokenLimit(limit)), ...figures, ...objectives]) row.append('td').text(text);
  }
}
