/**
 * `npm run bench:search`: the search's quality on published problems and the times of its kernels and of whole runs, as two tables, or with `--json` as rows. `--seeds
 * N` takes fewer seeds than 11, `--short` leaves out the plain versions that take seconds, `--random N`
 * draws until N random designs of the demo's rail are feasible (200,000 take an hour), `--spread N` searches that rail with N seeds in the place of 12,
 * `--whole N` judges a converter space of nearly 10⁷ designs whole (some ten minutes) and searches it with N seeds. A full run is kept in test/bench/results/.
 */
import { execFileSync } from 'node:child_process';
import { mkdirSync, writeFileSync } from 'node:fs';
import { cpus } from 'node:os';
import { join } from 'node:path';
import { parseArgs } from 'node:util';
import { measureConverter, measureWholeSpace } from './converter.ts';
import { type Row, timeKernels } from './kernels.ts';
import { measureQuality, type QualityRow } from './quality.ts';
import { overheadAt200, timeRuns } from './runs.ts';

const { values } = parseArgs({
  options: {
    json: { type: 'boolean', default: false },
    short: { type: 'boolean', default: false },
    seeds: { type: 'string', default: '11' },
    random: { type: 'string', default: '1000' },
    spread: { type: 'string', default: '12' },
    whole: { type: 'string', default: '0' },
  },
});
const seeds = Number(values.seeds);
const quality = measureQuality(seeds);
const times = [...timeKernels({ skipLongPlain: values.short }), ...timeRuns()];
const record = {
  machine: cpus()[0]?.model ?? 'unknown',
  cores: cpus().length,
  node: process.version,
  commit: commit(),
  seeds,
  quality,
  times,
  overheadMicroseconds: overheadAt200(),
  converter: measureConverter(Number(values.random), Number(values.spread)),
  whole: Number(values.whole) > 0 ? measureWholeSpace(Number(values.whole)) : undefined,
};
process.stdout.write(values.json ? json(quality, times) : tables());
if (seeds >= 11 && !values.short) keep();

/** The present commit, marked when files differ from it. */
function commit(): string {
  const git = (...args: string[]): string => execFileSync('git', args, { encoding: 'utf8' }).trim();
  try {
    const hash = git('rev-parse', '--short', 'HEAD');
    return git('status', '--porcelain', '--', 'optimizer') === '' ? hash : `${hash}-changed`;
  } catch {
    return 'unknown';
  }
}

function json(qualityRows: readonly QualityRow[], timeRows: readonly Row[]): string {
  // JSON has no NaN: what was not measured or not set is null.
  const rows = qualityRows.map(({ ms: _, ...row }) => row);
  return `${JSON.stringify([...rows, ...timeRows], null, 1)}\n`;
}

function tables(): string {
  const head = `${record.machine}, ${record.cores} cores, Node ${record.node}, commit ${record.commit}, ${seeds} seeds\n\n`;
  const first = table(
    ['problem', 'median', 'worst', 'target', 'floor', 'ceiling', 'ms', ''],
    quality.map((q) => [
      q.problem,
      ...[q.median, q.worst, q.target, q.floor, q.ceiling].map((value) => value.toFixed(4)),
      q.ms.toFixed(0),
      q.median >= q.target && q.worst >= q.floor ? '' : 'short',
    ]),
  );
  const second = table(
    ['work', 'ms', 'target', 'plain', 'ratio', ''],
    times.map((t) => [
      t.work,
      digits(t.ms),
      digits(t.target),
      digits(t.plainMs),
      digits(t.ratio),
      t.ms > t.target ? 'slow' : '',
    ]),
  );
  const last = `outside the model, population 200, three objectives: ${record.overheadMicroseconds.toFixed(1)} µs an evaluation\n`;
  return `${head}${first}\n${second}\n${last}${converterLines()}`;
}

function converterLines(): string {
  const { searched, seeds: found, spread, drawn, random, outsideModel } = record.converter;
  const line = ({ feasible, hypervolume }: { feasible: number; hypervolume: number }): string =>
    `  ${feasible} random feasible designs hold ${hypervolume.toFixed(4)}; the search ${((100 * searched) / hypervolume - 100).toFixed(1)} % more\n`;
  return `demo's rail: ${searched.toFixed(4)} after 200,000 evaluations; ${drawn} random designs drawn\n${random.map(line).join('')}  spread of ${found.length} seeds: ${Math.min(...found).toFixed(4)} to ${Math.max(...found).toFixed(4)}, ${(100 * spread).toFixed(2)} % (at most 0.5 %)\n  outside the model, population 200: ${(100 * outsideModel).toFixed(1)} % of the time (at most 20 %)\n${wholeLine()}`;
}

function wholeLine(): string {
  if (record.whole === undefined) return '';
  const { designs, feasible, shares } = record.whole;
  const reached = shares.filter((share) => share >= 0.995).length;
  return `  a space of ${designs} designs judged whole, ${feasible} feasible: after a hundredth of it ${reached} of ${shares.length} seeds hold 99.5 %, the worst ${(100 * Math.min(...shares)).toFixed(2)} %\n`;
}

function digits(value: number): string {
  return Number.isFinite(value) ? value.toPrecision(3) : '–';
}

function table(head: readonly string[], rows: readonly (readonly string[])[]): string {
  const widths = head.map((title, c) => Math.max(title.length, ...rows.map((cells) => cells[c].length)));
  const line = (cells: readonly string[]): string =>
    `${cells.map((cell, c) => (c === 0 ? cell.padEnd(widths[c]) : cell.padStart(widths[c]))).join('  ')}\n`;
  return [head, ...rows].map(line).join('');
}

function keep(): void {
  const folder = join('test', 'bench', 'results');
  mkdirSync(folder, { recursive: true });
  writeFileSync(join(folder, `search-${record.commit}.json`), `${JSON.stringify(record, null, 1)}\n`);
}
