/** How a comparison is laid out in the terminal and as a table for a spreadsheet. */
import { formatQuantity } from '../../model/index.ts';
import { percent } from '../progress/figures.ts';
import type { Comparison } from '../run-folder/compare.ts';
import { table } from '../terminal/table.ts';
import { plain } from '../terminal/text.ts';

/** The comparison in words and a table. */
export function compareText(comparison: Comparison): string {
  const { a, b, objectives, hypervolume, dominated, best, sizes, gained, lost, moved } = comparison;
  const right = (head: string): { head: string; right: boolean } => ({ head, right: true });
  const rows = [
    ['designs on the front', String(sizes.a), String(sizes.b), ''],
    ['hypervolume', hypervolume.a.toFixed(5), hypervolume.b.toFixed(5), change(hypervolume.a, hypervolume.b)],
    ['dominated by the other', percent(dominated.a), percent(dominated.b), ''],
    ...objectives.map(({ name, unit }, i) => {
      const pair = best[i] ?? { a: Number.NaN, b: Number.NaN };
      return [`best ${name}`, formatQuantity(pair.a, unit), formatQuantity(pair.b, unit), change(pair.a, pair.b)];
    }),
  ];
  return [
    `From ${plain(a)} to ${plain(b)}: ${sameText(comparison)}`,
    '',
    ...table([{ head: '' }, right('before'), right('after'), right('change')], rows),
    '',
    `Together the two fronts reach a hypervolume of ${hypervolume.together.toFixed(5)}.`,
    `${gained.length} designs gained, ${lost.length} lost, ${moved.length} moved.`,
  ].join('\n');
}

/** One line for each design gained, lost or moved; values in SI base units. */
export function compareCsv({ objectives, gained, lost, moved }: Comparison): string {
  const names = objectives.map(({ name, unit }) => (unit === '' ? name : `${name} [${unit}]`));
  const head = [
    'change',
    'id',
    'family',
    ...names.map((name) => `${name} before`),
    ...names.map((name) => `${name} after`),
  ];
  const none = objectives.map(() => '');
  const lines = [
    ...gained.map((one) => ['gained', one.id, one.family, ...none, ...one.objectives]),
    ...lost.map((one) => ['lost', one.id, one.family, ...one.objectives, ...none]),
    ...moved.map((one) => ['moved', one.id, one.family, ...one.before, ...one.after]),
  ];
  return `${[head, ...lines].map((cells) => cells.join(',')).join('\n')}\n`;
}

function sameText({ same }: Comparison): string {
  const changed = [same.sheet ? '' : 'the sheet', same.parts ? '' : 'the parts', same.version ? '' : 'the version'];
  const named = changed.filter((text) => text !== '');
  return named.length === 0 ? 'same sheet, parts and version' : `${named.join(' and ')} changed`;
}

function change(before: number, after: number): string {
  if (!Number.isFinite(before) || !Number.isFinite(after) || before === 0) return '';
  const share = after / before - 1;
  return `${share < 0 ? '−' : '+'}${percent(Math.abs(share), 2)}`;
}
