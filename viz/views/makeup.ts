/** What takes the room and the money: volume and cost by contribution, largest first, both on one line each. */
import type { Assessment } from '../../model/assessment.ts';
import { titled } from '../labels.ts';
import { bar } from '../marks/bar.ts';
import { clear, type Root } from '../marks/root.ts';
import { percent, show } from '../units.ts';

export function renderMakeup<E extends Element>(root: Root<E>, design: Assessment, currency: string): void {
  const names = [...new Set([...design.volumes, ...design.costs].map((share) => share.name))];
  const sum = (list: Assessment['volumes']) => list.reduce((total, share) => total + share.value, 0);
  const [volume, cost] = [sum(design.volumes), sum(design.costs)];
  const rows = names.map((name) => ({ name, volume: of(design.volumes, name), cost: of(design.costs, name) }));
  rows.sort((a, b) => b.volume / volume + b.cost / cost - (a.volume / volume + a.cost / cost));
  const table = clear(root).append('table').attr('class', 'ledger');
  table.append('caption').attr('class', 'unseen').text('Volume and cost by contribution');
  const head = table.append('thead').append('tr');
  for (const word of ['Share', 'volume', 'cost']) head.append('th').attr('scope', 'col').text(word);
  const body = table.append('tbody');
  for (const row of rows) {
    const line = body.append('tr').attr('class', 'whole');
    line.append('th').attr('scope', 'row').text(titled(row.name));
    bar(shareCell(line, row.volume, volume, 'm³'), row.volume / volume);
    bar(shareCell(line, row.cost, cost, currency), row.cost / cost, 'money');
  }
  const foot = table.append('tfoot').append('tr');
  foot.append('th').attr('scope', 'row').text('All');
  foot.append('td').text(show(volume, 'm³'));
  foot.append('td').text(show(cost, currency));
}

function of(list: Assessment['volumes'], name: string): number {
  return list.filter((share) => share.name === name).reduce((total, share) => total + share.value, 0);
}

/** The figure, and beside it its share of the whole; a dot where there is none. */
function shareCell(
  row: Root<HTMLTableRowElement>,
  value: number,
  total: number,
  unit: string,
): Root<HTMLTableCellElement> {
  const cell = row.append('td').text(value === 0 ? '·' : show(value, unit));
  if (value !== 0)
    cell
      .append('span')
      .attr('class', 'share')
      .text(percent(value / total, 0));
  return cell;
}
