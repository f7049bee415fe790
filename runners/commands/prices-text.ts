/** How the prices of requirements are laid out in the terminal. */
import {
  bestGainOf,
  formatDifference,
  formatQuantity,
  freeLimits,
  gainOf,
  howPriced,
  isTelling,
  type Relaxations,
  type RequirementPrice,
} from '../../model/index.ts';
import { listed, spoken, spokenLimit } from '../../viz/labels.ts';
import { percent } from '../progress/figures.ts';
import { table } from '../terminal/table.ts';

/** Lines that are shown. */
const SHOWN = 12;

/** The table; empty where nothing is to be gained. */
export function pricesText(prices: readonly RequirementPrice[], relaxations?: Relaxations): string {
  const [first] = prices;
  if (first === undefined) return '';
  const names = first.gains.map(({ objective }) => ({ head: `best ${short(objective)}`, right: true }));
  const heads = [{ head: 'limit' }, { head: 'relaxed' }, ...names, { head: 'at no more of the others' }];
  const head = 'What requirements cost: one limit relaxed so far, the best values then, and the design that gains most';
  const how = relaxations === undefined ? [] : [howPriced(relaxations), ...freeText(prices, relaxations)];
  return [head, ...table(heads, prices.slice(0, SHOWN).map(rowOf)), ...how].join('\n');
}

function rowOf({ limit, unit, allowed, relaxedTo, design, gains }: RequirementPrice): string[] {
  const moved =
    allowed === 0
      ? `by ${formatDifference(Math.abs(relaxedTo), unit)}`
      : `${formatQuantity(allowed, unit)} → ${formatQuantity(relaxedTo, unit)}`;
  const top = gains.reduce((a, b) => (gainOf(b) > gainOf(a) ? b : a));
  const most = isTelling(gainOf(top)) ? `${short(top.objective)} −${percent(gainOf(top))}, ${design}` : '';
  return [spokenLimit(limit), moved, ...gains.map((gain) => less(bestGainOf(gain))), most];
}

function less(gain: number): string {
  return isTelling(gain) ? `−${percent(gain)}` : '';
}

function freeText(prices: readonly RequirementPrice[], relaxations: Relaxations): string[] {
  const free = freeLimits(prices, relaxations).map(spokenLimit);
  return free.length === 0 ? [] : [`Relaxed without gain: ${listed(free)}.`];
}

function short(objective: string): string {
  return spoken(objective).split(',')[0] ?? objective;
}
