/** How the spread of a design is laid out in the terminal. */
import { formatQuantity, type Spread } from '../../model/index.ts';
import { percent } from '../progress/figures.ts';
import type { Paint } from '../terminal/colour.ts';
import { table } from '../terminal/table.ts';

/** The spread in tables. */
export function spreadText(spread: Spread, paint: Paint): string {
  const right = (head: string): { head: string; right: boolean } => ({ head, right: true });
  const yields = spread.yields.map(({ name, share, low, high }) => [
    name,
    percent(share, 2),
    `${percent(low, 2)} to ${percent(high, 2)}`,
  ]);
  const objectives = spread.objectives.map(({ name, unit, p5, p50, p95 }) => [
    name,
    ...[p5, p50, p95].map((value) => formatQuantity(value, unit)),
  ]);
  const causes = spread.variance.map(({ figure, shares }) => [
    figure,
    shares.map(({ cause, share }) => `${cause} ${percent(share, 0)}`).join(', '),
  ]);
  return [
    `${paint(spread.id, 'bold')}  ${spread.samples} samples, seed ${spread.seed}`,
    '',
    ...table([{ head: 'Yield' }, right(''), right('95 times in 100 within')], yields),
    '',
    ...table([{ head: 'Objective' }, right('5 %'), right('half'), right('95 %')], objectives),
    '',
    ...table([{ head: 'What varies' }, { head: 'with (share of its variance)' }], causes, 120),
    '',
    'Tolerances are taken as three deviations of a normal spread; line evenly over its range, ambient evenly over the 30 K below.',
  ].join('\n');
}
