/** Why each family is on the front, or is not: one line each. */
import type { FamilyNote } from '../data.ts';
import { inWords, thousands } from '../labels.ts';
import { clear, type Root } from '../marks/root.ts';
import { percent } from '../units.ts';
import { familyMark, familyName } from './legend.ts';

/** Of the columns; on a narrow screen each stands before its figure. */
const HEADS: readonly string[] = ['Family', 'judged', 'feasible', 'on the front', 'why'];

export function renderFamilies<E extends Element>(root: Root<E>, notes: readonly FamilyNote[]): void {
  clear(root);
  const table = root
    .append('div')
    .attr('class', 'scroll')
    .attr('tabindex', 0)
    .attr('role', 'region')
    .attr('aria-label', 'Families')
    .append('table')
    .attr('class', 'ledger families');
  table
    .append('caption')
    .attr('class', 'unseen')
    .text('Families with the number of designs judged, feasible and on the front, and why');
  const head = table.append('thead').append('tr');
  for (const word of HEADS)
    head
      .append('th')
      .attr('scope', 'col')
      .attr('class', word === 'why' ? 'words' : null)
      .text(word);
  const body = table.append('tbody');
  for (const note of [...notes].sort((a, b) => b.front - a.front || b.feasible - a.feasible)) {
    const row = body.append('tr').attr('class', note.front === 0 ? 'lost' : '');
    const name = row.append('th').attr('scope', 'row');
    familyMark(name, note.family);
    name.append('span').text(familyName(note.family));
    const share = note.evaluated === 0 ? 'none' : percent(note.feasible / note.evaluated, 0);
    const figures = [thousands(note.evaluated), share, thousands(note.front)];
    for (const [i, figure] of figures.entries()) {
      row
        .append('td')
        .attr('data-word', HEADS[i + 1] ?? '')
        .text(figure);
    }
    row.append('td').attr('class', 'why').text(inWords(note.reason));
  }
}
