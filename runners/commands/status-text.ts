/** How `status` lays out runs. */
import type { RunStanding, Standings } from '../cluster/standing.ts';
import { percent, rounded } from '../progress/figures.ts';
import type { RunRecord } from '../run-folder/record.ts';
import { showDuration } from '../terminal/duration.ts';
import { table } from '../terminal/table.ts';
import { shortPath } from '../terminal/text.ts';

/** Columns for a run's path. */
const WIDEST_PATH = 48;

/** A line a run, and a line for all of them where there are several. */
export function statusLines(rows: readonly RunStanding[]): string[] {
  const right = (head: string): { head: string; right: boolean } => ({ head, right: true });
  const columns = [
    { head: 'run' },
    { head: 'state' },
    right('done'),
    right('designs'),
    right('a second'),
    right('time'),
    right('feasible'),
    right('front'),
    right('hypervolume'),
    right('lost'),
  ];
  const cells = rows.map(({ folder, record, state }) => [
    shortPath(folder, WIDEST_PATH),
    state,
    percent(record.share, 0),
    rounded(record.evaluations),
    rounded(record.perSecond),
    showDuration(record.seconds),
    percent(record.feasibleShare),
    String(record.frontSize),
    record.hypervolume.toFixed(5),
    String(record.faults.length),
  ]);
  return table(columns, rows.length > 1 ? [...cells, together(rows)] : cells);
}

/** What else is to be said: shards that have not begun or cannot be read, runs that broke off, islands that were lost. */
export function remarkLines({ runs, missing, unreadable }: Standings): string[] {
  return [
    ...missingLines(missing),
    ...unreadable,
    ...runs.filter(({ state }) => state === 'broken off').map(brokenLine),
    ...runs.flatMap(faultLines),
  ];
}

function missingLines(missing: Standings['missing']): string[] {
  const sizes = [...new Set(missing.map((one) => one.shards))];
  return sizes.map((shards) => {
    const names = missing.filter((one) => one.shards === shards).map((one) => one.shard);
    return `${names.length === 1 ? 'shard' : 'shards'} ${names.join(', ')} of ${shards} ${names.length === 1 ? 'has' : 'have'} not begun`;
  });
}

function brokenLine({ folder }: RunStanding): string {
  return `${folder}: broke off, no process sweeps it; go on with: chopfront sweep --out ${folder} --resume`;
}

/** A line for each island that was lost, with the design that it was evaluating. */
function faultLines({ folder, record }: RunStanding): string[] {
  return record.faults.map((fault) => {
    const design = fault.design === undefined ? '' : ` while evaluating ${JSON.stringify(fault.design)}`;
    return `${folder}: shard ${fault.shard}, island ${fault.island}, lost after epoch ${fault.epoch}: ${fault.reason}${design}`;
  });
}

function together(rows: readonly RunStanding[]): string[] {
  const sum = (pick: (record: RunRecord) => number): number => rows.reduce((total, row) => total + pick(row.record), 0);
  const done = rows.filter((row) => row.state === 'done').length;
  const evaluations = sum((record) => record.evaluations);
  return [
    'together',
    `${done} of ${rows.length} done`,
    percent(sum((record) => record.share) / rows.length, 0),
    rounded(evaluations),
    rounded(sum((record) => record.perSecond)),
    showDuration(sum((record) => record.seconds)),
    percent(evaluations === 0 ? 0 : sum((record) => record.feasible) / evaluations),
    '',
    '',
    String(sum((record) => record.faults.length)),
  ];
}
