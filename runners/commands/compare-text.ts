/** How a comparison is laid out in the terminal and as a table for a spreadsheet. */
import { formatQuantity } from '../../model/index.ts';
import type { Carried, Change, Comparison, Why } from '../../viz/compare-data.ts';
import { percent } from '../progress/figures.ts';
import { csvCell } from '../run-folder/csv-cell.ts';
import { table } from '../terminal/table.ts';
import { plain } from '../terminal/text.ts';

/** Most differences listed. */
const MOST = 12;

/** The comparison in words and a table. */
export function compareText(comparison: Comparison): string {
  const { a, b, differences, hypervolume, carried, sizes } = comparison;
  const right = (head: string): { head: string; right: boolean } => ({ head, right: true });
  return [
    `From ${plain(a)} to ${plain(b)}: ${sameText(comparison)}`,
    ...differences.slice(0, MOST).map((line) => `  ${plain(line)}`),
    ...(differences.length > MOST ? [`  and ${differences.length - MOST} more`] : []),
    '',
    ...table([{ head: '' }, right('before'), right('after'), right('change')], rowsOf(comparison)),
    '',
    `Together the two fronts reach a hypervolume of ${hypervolume.byA.together.toFixed(5)} by the sheet before, ${hypervolume.byB.together.toFixed(5)} by the one after.`,
    carriedText('Designs from before, under the sheet and parts after', carried.a, sizes.a, hypervolume.byB.b),
    carriedText('Designs from after, under the sheet and parts before', carried.b, sizes.b, hypervolume.byA.a),
    ...restatedText(comparison),
    '',
    countsText(comparison),
    ...whyText('gained', comparison.gained),
    ...whyText('lost', comparison.lost),
  ].join('\n');
}

/** One line for each design gained, lost or moved; values in SI base units, by the sheet and parts before and after. */
export function compareCsv({ objectives, gained, lost, moved }: Comparison): string {
  const names = objectives.map(({ name, unit }) => (unit === '' ? name : `${name} [${unit}]`));
  const columns = [...names.map((name) => `${name} before`), ...names.map((name) => `${name} after`)];
  const figures = (values: readonly number[] | undefined): string[] =>
    objectives.map((_, i) => (values?.[i] === undefined ? '' : String(values[i])));
  const lines = [...gained, ...lost, ...moved].map(({ change, id, family, before, after, why }) => {
    return [change, csvCell(id), csvCell(family), ...figures(before), ...figures(after), csvCell(why?.words ?? '')];
  });
  return `${[['change', 'id', 'family', ...columns.map(csvCell), 'why'], ...lines].map((cells) => cells.join(',')).join('\n')}\n`;
}

function rowsOf({ objectives, hypervolume, dominated, best, sizes }: Comparison): string[][] {
  const volume = (name: string, { a, b }: { a: number; b: number }): string[] => [
    name,
    a.toFixed(5),
    b.toFixed(5),
    change(a, b),
  ];
  return [
    ['designs on the front', String(sizes.a), String(sizes.b), ''],
    volume('hypervolume, by the sheet before', hypervolume.byA),
    volume('hypervolume, by the sheet after', hypervolume.byB),
    ['dominated by the other', percent(dominated.a), percent(dominated.b), ''],
    ...objectives.map(({ name, unit }, i) => {
      const pair = best[i] ?? { a: Number.NaN, b: Number.NaN };
      return [`best ${name}`, formatQuantity(pair.a, unit), formatQuantity(pair.b, unit), change(pair.a, pair.b)];
    }),
  ];
}

function carriedText(what: string, { buildable, feasible, hypervolume }: Carried, size: number, whole: number): string {
  const built = buildable === size ? '' : `, ${size - buildable} cannot be built`;
  return `${what}: ${feasible} of ${size} keep every limit${built}; hypervolume ${hypervolume.toFixed(5)} of ${whole.toFixed(5)}.`;
}

function restatedText({ restated }: Comparison): string[] {
  if (restated.a + restated.b === 0) return [];
  return [`This version computes other figures for ${restated.a} designs from before and ${restated.b} from after.`];
}

function countsText({ gained, lost, moved, kept }: Comparison): string {
  return `${gained.length} designs gained, ${lost.length} lost, ${moved.length} moved, ${kept.length} the same.`;
}

const WHY: Readonly<Record<Why['kind'], string>> = {
  unbuildable: 'cannot be built',
  breaks: 'breaking a limit',
  beaten: 'beaten',
  unbeaten: 'beaten by nothing (not found or not kept)',
};

function whyText(what: 'gained' | 'lost', changes: readonly Change[]): string[] {
  if (changes.length === 0) return [];
  const counts = Object.entries(WHY).flatMap(([kind, words]) => {
    const count = changes.filter((one) => one.why?.kind === kind).length;
    return count === 0 ? [] : [`${count} ${words}`];
  });
  const side = what === 'gained' ? 'before' : 'after';
  return [`Of those ${what}, under the sheet and parts ${side}: ${counts.join(', ')}.`];
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
