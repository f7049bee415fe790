/** How warm each part gets: at the chosen point and at the hottest one, on a scale that starts at the ambient. */
import type { Assessment, PointReport } from '../../model/assessment.ts';
import { titled } from '../labels.ts';
import { bar } from '../marks/bar.ts';
import { clear, type Root } from '../marks/root.ts';
import { percent, show } from '../units.ts';

const temperaturesDefaults = {
  /** The scale ends at least this far above the ambient, K. */
  span: 60,
};

export function renderTemperatures<E extends Element>(
  root: Root<E>,
  design: Assessment,
  point: PointReport,
  ambient: number,
  options = temperaturesDefaults,
): void {
  const slots = [...new Set(design.points.flatMap((one) => Object.keys(one.temperatures)))];
  const rows = slots.map((slot) => ({
    slot,
    here: point.temperatures[slot] ?? Number.NaN,
    worst: hottest(design, slot),
  }));
  rows.sort((a, b) => b.worst.kelvin - a.worst.kelvin || (a.slot < b.slot ? -1 : 1));
  const top = Math.max(ambient + options.span, ...rows.map((row) => row.worst.kelvin));
  const table = clear(root).append('table').attr('class', 'ledger');
  table
    .append('caption')
    .attr('class', 'unseen')
    .text('Temperatures by part, at the chosen operating point and at the hottest');
  const head = table.append('thead').append('tr');
  for (const word of ['Part', 'at this point', 'hottest', 'where'])
    head
      .append('th')
      .attr('scope', 'col')
      .attr('class', word === 'where' ? 'words' : null)
      .text(word);
  const body = table.append('tbody');
  for (const { slot, here, worst } of rows) {
    const row = body.append('tr').attr('class', 'whole');
    row.append('th').attr('scope', 'row').text(titled(slot));
    row.append('td').text(show(here, 'K'));
    bar(
      row.append('td').text(show(worst.kelvin, 'K')),
      (worst.kelvin - ambient) / (top - ambient),
      'warm',
      (here - ambient) / (top - ambient),
    );
    row.append('td').attr('class', 'where').text(worst.where);
  }
}

function hottest(design: Assessment, slot: string): { readonly kelvin: number; readonly where: string } {
  return design.points.reduce(
    (best, point) => {
      const kelvin = point.temperatures[slot] ?? Number.NEGATIVE_INFINITY;
      return kelvin > best.kelvin
        ? { kelvin, where: `${show(point.inputVoltage, 'V')}, ${percent(point.load, 0)}` }
        : best;
    },
    { kelvin: Number.NEGATIVE_INFINITY, where: '' },
  );
}
