/** How far to trust the search: the front's growth, the islands' agreement, and what it takes to repeat the run. */
import { line, scaleLinear } from 'd3';
import type { HistoryRow, RunRecord } from '../data.ts';
import { thousands } from '../labels.ts';
import { bottomAxis, canvasOf, leftAxis } from '../marks/axis.ts';
import { numbersTable } from '../marks/numbers.ts';
import { clear, px, type Root } from '../marks/root.ts';
import { digits, percent } from '../units.ts';

export const trustDefaults = {
  width: 560,
  height: 230,
  left: 52,
  right: 16,
  top: 30,
  bottom: 42,
  /** Growth over the last fifth of the evaluations that still counts as settled. */
  settled: 0.005,
};

export function renderTrust<E extends Element>(
  root: Root<E>,
  run: RunRecord,
  history: readonly HistoryRow[],
  o = trustDefaults,
): void {
  clear(root);
  const left = root.append('div');
  for (const sentence of verdicts(run, history, o.settled)) left.append('p').text(sentence);
  if (history.length > 1) growth(left, history, o);
  facts(root.append('dl').attr('class', 'facts'), run);
  const islands = Math.max(0, ...history.map((row) => row.islands.length));
  const head = ['Evaluations', 'All', ...Array.from({ length: islands }, (_, i) => `Island ${i + 1}`)];
  numbersTable(
    left,
    { summary: 'Numbers', caption: 'Hypervolume by evaluations' },
    head,
    history.map((row) => [
      thousands(row.evaluations),
      row.hypervolume.toFixed(4),
      ...row.islands.map((value) => value.toFixed(4)),
    ]),
  );
}

/** What the numbers mean, in sentences. */
export function verdicts(run: RunRecord, history: readonly HistoryRow[], settled: number): readonly string[] {
  const words: string[] = [];
  if (run.status !== 'done')
    words.push(
      run.status === 'running'
        ? 'The sweep is still running: this page shows what it has so far.'
        : `The sweep ${run.status}: it can be resumed.`,
    );
  const last = history[history.length - 1];
  if (last === undefined) return words;
  const before = history.findLast((row) => row.evaluations <= 0.8 * last.evaluations);
  if (before !== undefined && last.hypervolume > 0) {
    const grown = (last.hypervolume - before.hypervolume) / last.hypervolume;
    words.push(
      grown <= settled
        ? `Settled: the last fifth of the search moved the front by ${percent(grown, 2)}.`
        : `Still growing: the last fifth of the search moved the front by ${percent(grown, 2)}; a longer sweep will find more.`,
    );
  }
  const islands = run.agreement ?? last.islands.map((own) => own / Math.max(...last.islands, 1e-300));
  if (islands.length > 1) {
    words.push(
      `${islands.length} islands searched apart; the weakest alone holds ${percent(Math.min(...islands), 2)} of ${run.agreement === undefined ? 'the best' : 'the whole'}.`,
    );
  }
  return words;
}

function growth<E extends Element>(root: Root<E>, history: readonly HistoryRow[], o: typeof trustDefaults): void {
  const svg = canvasOf(root, o, 'Hypervolume against evaluations, of the whole search and of each island');
  const most = Math.max(...history.map((row) => row.evaluations));
  const all = history.flatMap((row) => [row.hypervolume, ...row.islands]);
  const x = scaleLinear()
    .domain([0, most])
    .range([o.left, o.width - o.right]);
  const y = scaleLinear()
    .domain([Math.min(...all), Math.max(...all)])
    .nice(5)
    .range([o.height - o.bottom, o.top]);
  bottomAxis(svg, x, o, {
    title: 'Designs judged',
    unit: { label: most >= 1e5 ? 'thousand' : '', factor: most >= 1e5 ? 1000 : 1, offset: 0 },
    ticks: 6,
  });
  leftAxis(svg, y, o, {
    title: 'Hypervolume, share of the box from ideal to reference',
    unit: { label: '', factor: 1, offset: 0 },
    ticks: 5,
  });
  const islands = history[history.length - 1]?.islands.length ?? 0;
  for (let island = 0; island < islands; island++)
    path(svg, history, x, y, 'line island', (row) => row.islands[island]);
  path(svg, history, x, y, 'line merged', (row) => row.hypervolume);
}

function path(
  svg: Root<SVGSVGElement>,
  history: readonly HistoryRow[],
  x: (v: number) => number,
  y: (v: number) => number,
  name: string,
  value: (row: HistoryRow) => number | undefined,
): void {
  const shape = line<HistoryRow>(
    (row) => px(x(row.evaluations)),
    (row) => px(y(value(row) ?? 0)),
  ).defined((row) => value(row) !== undefined);
  svg
    .append('path')
    .attr('class', name)
    .attr('d', shape([...history]) ?? '');
}

function facts(list: Root<HTMLDListElement>, run: RunRecord): void {
  const pairs = [
    ['Designs judged', thousands(run.evaluations)],
    ['Keep every limit', percent(run.feasibleShare)],
    ['Hypervolume', run.hypervolume.toFixed(4)],
    ['Took', duration(run.seconds)],
    ['Threads', String(run.threads)],
    ['Seed', run.seed],
    ['Version', run.version],
    ['Sheet', run.railHash.slice(0, 12)],
    ['Parts', run.partsHash.slice(0, 12)],
    ['Page built', run.built.slice(0, 16).replace('T', ' ')],
  ];
  for (const [name = '', value = ''] of pairs) {
    const pair = list.append('div');
    pair.append('dt').text(name);
    pair.append('dd').text(value);
  }
}

/** `61.2 s`, `12 min`, `8 h 20 min`. */
export function duration(seconds: number): string {
  if (seconds < 90) return `${digits(seconds)}\u00a0s`;
  const minutes = Math.round(seconds / 60);
  return minutes < 90 ? `${minutes}\u00a0min` : `${Math.floor(minutes / 60)}\u00a0h ${minutes % 60}\u00a0min`;
}
