/** How it is laid out in the terminal why families of designs are not on the front. */
import type { FamilyNote } from '../../viz/data.ts';
import { inWords } from '../../viz/labels.ts';
import { plain } from '../terminal/text.ts';

/** One line a losing family, never cut short; empty where every family is on the front. */
export function familiesText(families: readonly FamilyNote[]): string {
  const lost = families.filter(({ front }) => front === 0);
  if (lost.length === 0) return '';
  const width = Math.max(...lost.map(({ family }) => family.length));
  const lines = lost.map(({ family, reason }) => `  ${family.padEnd(width)}  ${plain(inWords(reason))}`);
  return ['Why other families are not on the front', ...lines].join('\n');
}
