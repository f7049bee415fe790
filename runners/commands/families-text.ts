/** How it is laid out in the terminal why families of designs are not on the front. */
import type { FamilyNote } from '../../viz/data.ts';
import { inWords } from '../../viz/labels.ts';
import { table } from '../terminal/table.ts';

/** One line a losing family; empty where every family is on the front. */
export function familiesText(families: readonly FamilyNote[]): string {
  const lost = families.filter(({ front }) => front === 0);
  if (lost.length === 0) return '';
  const rows = lost.map(({ family, reason }) => [family, inWords(reason)]);
  return ['Why other families are not on the front', ...table([{ head: '' }, { head: '' }], rows)].join('\n');
}
