/** The body of a comparison's page: what differs, the figures side by side, the pictures, and every design behind them. */
import type { Carried, Change, Comparison } from '../compare-data.ts';
import { counted, titled } from '../labels.ts';
import { numbersTable, plainTable } from '../marks/numbers.ts';
import type { Root } from '../marks/root.ts';
import { percent, show, showDifference } from '../units.ts';
import { renderChangeMark, renderChanges } from './change-marks.ts';

/** Draws everything into `root`. */
export function renderComparison<E extends Element>(root: Root<E>, comparison: Comparison): void {
  masthead(root, comparison);
  const main = root.append('main');
  figures(card(main, 'figures', 'Before and after'), comparison);
  pictures(card(main, 'pictures', 'The two fronts'), comparison);
  carriedOver(card(main, 'carried', 'Old designs, new sheet, and the reverse'), comparison);
  for (const [change, heading] of LISTS) {
    const list = comparison[change];
    designs(card(main, change, `${heading}: ${counted(list.length, 'design')}`), comparison, change);
  }
}

const LISTS = [
  ['gained', 'Gained'],
  ['lost', 'Lost'],
  ['moved', 'Moved'],
  ['kept', 'The same'],
] as const;

function masthead<E extends Element>(root: Root<E>, { a, b, same, differences }: Comparison): void {
  const head = root.append('header').attr('id', 'masthead');
  const names = head.append('div');
  names.append('h1').text('What changed');
  names.append('p').text(`Before: ${a}`);
  names.append('p').text(`After: ${b}`);
  const changed = [same.sheet ? '' : 'sheet', same.parts ? '' : 'parts', same.version ? '' : 'version'].filter(Boolean);
  const side = head.append('div');
  side.append('p').text(changed.length === 0 ? 'Same sheet, parts and version.' : `Changed: ${changed.join(', ')}.`);
  const list = side.append('ul').attr('class', 'differences');
  for (const line of differences) list.append('li').text(line);
}

function card<E extends Element>(root: Root<E>, id: string, heading: string): Root<HTMLElement> {
  const section = root.append('section').attr('id', id).attr('class', 'card compared');
  section.append('h2').text(heading);
  return section;
}

function figures(root: Root<HTMLElement>, comparison: Comparison): void {
  const { objectives, best, sizes, hypervolume, dominated } = comparison;
  const volume = ({ a, b }: { a: number; b: number }) => [a.toFixed(4), b.toFixed(4), relative(a, b)];
  const rows = [
    ['Designs on the front', String(sizes.a), String(sizes.b), ''],
    ['Hypervolume, by the sheet before', ...volume(hypervolume.byA)],
    ['Hypervolume, by the sheet after', ...volume(hypervolume.byB)],
    ['Beaten by the other front', percent(dominated.a), percent(dominated.b), ''],
    ...objectives.map(({ name, unit }, i) => {
      const { a, b } = best[i] ?? { a: Number.NaN, b: Number.NaN };
      return [`Best ${titled(name).toLowerCase()}`, show(a, unit), show(b, unit), relative(a, b)];
    }),
  ];
  plainTable(scrolling(root, 'Before and after'), 'Before and after', ['', 'Before', 'After', 'Change'], rows);
  const { byA, byB } = hypervolume;
  const together = `Both fronts together reach ${byA.together.toFixed(4)} by the sheet before and ${byB.together.toFixed(4)} by the one after.`;
  root.append('p').attr('class', 'note').text(together);
}

function pictures(root: Root<HTMLElement>, comparison: Comparison): void {
  root
    .append('p')
    .attr('class', 'how')
    .text('Left and down is better. A line leads from where a moved design was to where it is.');
  const legend = root.append('ul').attr('class', 'change-legend');
  for (const [change, heading] of LISTS) {
    const item = legend.append('li');
    renderChangeMark(item, change);
    item.append('span').text(`${heading} ${comparison[change].length}`);
  }
  const pairs = root.append('div').attr('class', 'pairs');
  const count = comparison.objectives.length;
  for (let y = 1; y < count; y++) {
    for (let x = 0; x < y; x++) renderChanges(pairs.append('div'), comparison, x, y);
  }
}

function carriedOver(root: Root<HTMLElement>, { carried, restated, sizes, hypervolume }: Comparison): void {
  const row = (name: string, { buildable, feasible, hypervolume: reached }: Carried, size: number, whole: number) => [
    name,
    String(size),
    String(buildable),
    String(feasible),
    `${reached.toFixed(4)} of ${whole.toFixed(4)}`,
  ];
  const head = ['Designs of', 'On the front', 'Can be built', 'Keep every limit', 'Hypervolume, of the front there'];
  plainTable(scrolling(root, 'Designs carried over'), 'Designs carried over', head, [
    row('before, judged as after', carried.a, sizes.a, hypervolume.byB.b),
    row('after, judged as before', carried.b, sizes.b, hypervolume.byA.a),
  ]);
  if (restated.a + restated.b === 0) return;
  const words = `This version computes other figures for ${counted(restated.a, 'design')} from before and ${restated.b} from after.`;
  root.append('p').attr('class', 'note').text(words);
}

function designs(root: Root<HTMLElement>, { objectives, ...lists }: Comparison, change: Change['change']): void {
  const list = lists[change];
  if (list.length === 0) return;
  const head = [
    'Design',
    'Family',
    ...objectives.map(({ name }) => titled(name)),
    ...(change === 'gained' || change === 'lost' ? ['Why not on the other'] : []),
  ];
  const rows = list.map((one) => [
    one.id,
    one.family,
    ...objectives.map(({ unit }, i) => figureText(one, i, unit)),
    ...(one.why === undefined ? [] : [one.why.words]),
  ]);
  numbersTable(root, { summary: 'Designs as a table', caption: `Designs ${change}` }, head, rows);
}

/** The figure on its own front; of a moved design both, with the difference. */
function figureText({ change, before, after }: Change, i: number, unit: string): string {
  const [was, is] = [before?.[i] ?? Number.NaN, after?.[i] ?? Number.NaN];
  if (change === 'lost') return show(was, unit);
  if (change !== 'moved') return show(is, unit);
  return was === is ? show(is, unit) : `${show(is, unit)} (${showDifference(is - was, unit)})`;
}

function relative(a: number, b: number): string {
  if (!Number.isFinite(a) || !Number.isFinite(b) || a === 0) return '';
  return `${b >= a ? '+' : '−'}${percent(Math.abs(b / a - 1), 2)}`;
}

function scrolling(root: Root<HTMLElement>, name: string): Root<HTMLDivElement> {
  return root.append('div').attr('class', 'scroll').attr('tabindex', 0).attr('role', 'region').attr('aria-label', name);
}
