/** The parts list of one design. */
import type { Assessment } from '../../model/assessment.ts';
import { titled } from '../labels.ts';
import { clear, type Root } from '../marks/root.ts';
import { show } from '../units.ts';

export function renderParts<E extends Element>(root: Root<E>, design: Assessment, currency: string): void {
  const table = clear(root).append('table').attr('class', 'ledger parts');
  table.append('caption').attr('class', 'unseen').text('Parts list');
  const head = table.append('thead').append('tr');
  for (const word of ['Where', 'part', 'pieces', 'height', 'volume', 'cost'])
    head
      .append('th')
      .attr('scope', 'col')
      .attr('class', word === 'part' ? 'words' : null)
      .text(word);
  const body = table.append('tbody');
  for (const use of design.parts) {
    const row = body.append('tr');
    row.append('th').attr('scope', 'row').text(titled(use.slot));
    row.append('td').attr('class', 'name').append('bdi').text(use.name);
    for (const text of [String(use.count), show(use.height, 'm'), show(use.volume, 'm³'), show(use.cost, currency)])
      row.append('td').text(text);
  }
}
