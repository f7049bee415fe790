/** How a design's standing against a run is laid out in the terminal. */
import { type Change, formatQuantity, type RailProblem, type Standing } from '../../model/index.ts';
import { percent } from '../progress/figures.ts';
import { table } from '../terminal/table.ts';
import { plain } from '../terminal/text.ts';

/** Ids that are listed. */
const LISTED = 10;

/** The standing in words and a table. */
export function standingText(standing: Standing, problem: RailProblem): string {
  const { dominatedBy, distances, change } = standing;
  const rows = distances.map(({ objective, unit, value, front }) => [
    objective,
    formatQuantity(value, unit),
    formatQuantity(front, unit),
    value > front ? `${percent(1 - front / value)} less` : 'nothing to gain',
  ]);
  const right = (head: string): { head: string; right: boolean } => ({ head, right: true });
  return [
    dominated(dominatedBy),
    '',
    ...table([{ head: 'At no more of the others' }, right('this'), right('front'), right('distance')], rows),
    '',
    change === undefined ? 'No single change helps.' : changeText(change, problem),
  ].join('\n');
}

function dominated(ids: readonly string[]): string {
  if (ids.length === 0) return 'No design of the run is better in every objective.';
  const some = ids.slice(0, LISTED).join(' ');
  const more = ids.length > LISTED ? ' …' : '';
  return `Dominated by ${ids.length} design${ids.length === 1 ? '' : 's'} of the run: ${some}${more}`;
}

function changeText(change: Change, problem: RailProblem): string {
  const { currency } = problem.rail;
  const figures = problem.objectives.map(({ name, unit }, k) => {
    return `${name} ${formatQuantity(change.objectives[k] ?? Number.NaN, unit)}`;
  });
  const verdict = change.feasible ? '' : ' (still breaks a limit)';
  return [
    `Cheapest single change that helps: ${change.gene} from ${plain(change.from)} to ${plain(change.to)}${verdict}`,
    `  ${figures.join(', ')}; cost ${formatQuantity(change.costBefore, currency)} to ${formatQuantity(change.costAfter, currency)}`,
  ].join('\n');
}
