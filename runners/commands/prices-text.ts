/** How the prices of requirements are laid out in the terminal. */
import { formatQuantity, gainOf, type RequirementPrice } from '../../model/index.ts';
import { spoken } from '../../viz/labels.ts';
import { percent } from '../progress/figures.ts';
import { table } from '../terminal/table.ts';

/** Lines that are shown. */
const SHOWN = 12;

/** The table; empty where nothing is to be gained. */
export function pricesText(prices: readonly RequirementPrice[]): string {
  if (prices.length === 0) return '';
  const rows = prices
    .slice(0, SHOWN)
    .map((line) => [
      spoken(line.limit),
      `${formatQuantity(line.allowed, line.unit)} → ${formatQuantity(line.relaxedTo, line.unit)}`,
      ...line.gains.map((gain) => (gainOf(gain) > 0 ? `−${percent(gainOf(gain))}` : '')),
    ]);
  const names = prices[0]?.gains.map(({ objective }) => ({ head: spoken(objective), right: true })) ?? [];
  const head = 'What requirements cost: relaxed so far, each objective at no more of the others';
  return [head, ...table([{ head: 'limit' }, { head: 'relaxed' }, ...names], rows)].join('\n');
}
