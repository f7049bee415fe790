/** Where each watt goes: one row a part and effect, one column a load point, bars on one common scale. */
import type { Assessment, LossItem } from '../../model/assessment.ts';
import { spoken, titled } from '../labels.ts';
import { bar } from '../marks/bar.ts';
import { clear, type Root } from '../marks/root.ts';
import { type AxisUnit, axisUnit, digits, percent } from '../units.ts';

export const lossesDefaults = {
  /** Effects below this share of the largest cell are summed into one row per part. */
  smallest: 0.004,
  /** Whether each part's effects follow it. */
  effects: true,
};

interface Line {
  readonly label: string;
  readonly whole: boolean;
  readonly watts: readonly number[];
}

export function renderLosses<E extends Element>(
  root: Root<E>,
  design: Assessment,
  profilePoints: number,
  options = lossesDefaults,
): void {
  const points = design.points.slice(0, profilePoints);
  const columns = [design.losses, ...points.map((point) => point.losses)];
  const lines = linesOf(columns, options);
  const unit = axisUnit(
    'W',
    design.losses.reduce((sum, item) => sum + item.watts, 0),
  );
  const largest = Math.max(...lines.filter((line) => line.whole).flatMap((line) => line.watts), 1e-12);
  const table = clear(root)
    .append('table')
    .attr('class', points.length > 4 ? 'ledger many' : 'ledger');
  table
    .append('caption')
    .attr('class', 'unseen')
    .text('Loss by part and effect, at nominal input: mean over the load profile, then each load point');
  const head = table.append('thead').append('tr');
  for (const word of [`Loss, ${unit.label}`, 'mean', ...points.map((point) => percent(point.load, 0))])
    head.append('th').attr('scope', 'col').text(word);
  const body = table.append('tbody');
  for (const line of lines) {
    const row = body.append('tr').attr('class', line.whole ? 'whole' : 'within');
    row.append('th').attr('scope', 'row').text(line.label);
    for (const watts of line.watts) {
      const cell = row.append('td').text(written(watts, unit));
      if (line.whole) bar(cell, watts / largest);
    }
  }
  totals(
    table.append('tfoot'),
    unit,
    columns,
    points.map((point) => point.efficiency),
  );
}

function totals(
  foot: Root<HTMLTableSectionElement>,
  unit: AxisUnit,
  columns: readonly (readonly LossItem[])[],
  efficiencies: readonly number[],
): void {
  const sums = foot.append('tr');
  sums.append('th').attr('scope', 'row').text('All');
  for (const items of columns) {
    const sum = items.reduce((total, item) => total + item.watts, 0);
    sums.append('td').text(written(sum, unit));
  }
  const last = foot.append('tr');
  last.append('th').attr('scope', 'row').text('Efficiency, %');
  last.append('td').text('');
  for (const efficiency of efficiencies) last.append('td').text(efficiency > 0 ? (efficiency * 100).toFixed(1) : '·');
}

/** Watts in the table's unit; what would read as zero is a dot. */
function written(watts: number, unit: AxisUnit): string {
  const value = watts / unit.factor;
  if (value < 5e-3) return '·';
  return value < 1 ? value.toFixed(2) : digits(value);
}

/** Parts by falling mean loss, each followed by its effects. */
function linesOf(columns: readonly (readonly LossItem[])[], options: typeof lossesDefaults): readonly Line[] {
  const parts = [...new Set(columns.flatMap((items) => items.map((item) => item.part)))];
  const whole = parts.map((part) => ({ part, watts: sumOver(columns, (item) => item.part === part) }));
  const peak = Math.max(...whole.flatMap((one) => one.watts), 1e-12);
  whole.sort((a, b) => (b.watts[0] ?? 0) - (a.watts[0] ?? 0) || (a.part < b.part ? -1 : 1));
  return whole.flatMap(({ part, watts }) => [
    { label: titled(part), whole: true, watts },
    ...(options.effects ? effectsOf(columns, part) : []).filter(
      (line) => Math.max(...line.watts) >= options.smallest * peak,
    ),
  ]);
}

function effectsOf(columns: readonly (readonly LossItem[])[], part: string): readonly Line[] {
  const effects = [
    ...new Set(columns.flatMap((items) => items.filter((item) => item.part === part).map((item) => item.effect))),
  ];
  if (effects.length < 2) return [];
  const lines = effects.map((effect) => ({
    label: spoken(effect),
    whole: false,
    watts: sumOver(columns, (item) => item.part === part && item.effect === effect),
  }));
  return lines.sort((a, b) => (b.watts[0] ?? 0) - (a.watts[0] ?? 0));
}

function sumOver(columns: readonly (readonly LossItem[])[], belongs: (item: LossItem) => boolean): readonly number[] {
  return columns.map((items) => items.filter(belongs).reduce((sum, item) => sum + item.watts, 0));
}
