/** How `status` lays out runs. */
import { percent, rounded } from '../progress/figures.ts';
import type { RunRecord } from '../run-folder/record.ts';
import { showDuration } from '../terminal/duration.ts';
import { table } from '../terminal/table.ts';

/** A run with its folder. */
export interface StatusRow {
  readonly folder: string;
  readonly record: RunRecord;
}

/** A line a run, and a line for all of them where there are several. */
export function statusLines(rows: readonly StatusRow[]): string[] {
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
  const cells = rows.map(({ folder, record }) => [
    folder,
    record.status,
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

/** A line for each island that was lost, with the design that it was evaluating. */
export function faultLines(rows: readonly StatusRow[]): string[] {
  return rows.flatMap(({ folder, record }) =>
    record.faults.map((fault) => {
      const design = fault.design === undefined ? '' : ` while evaluating ${JSON.stringify(fault.design)}`;
      return `${folder}: shard ${fault.shard}, island ${fault.island}, lost after epoch ${fault.epoch}: ${fault.reason}${design}`;
    }),
  );
}

function together(rows: readonly StatusRow[]): string[] {
  const sum = (pick: (record: RunRecord) => number): number => rows.reduce((total, row) => total + pick(row.record), 0);
  const done = rows.filter((row) => row.record.status === 'done').length;
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
