/** A few designs worth a first look: the best in each objective, and the balanced one. Terminal and page choose alike. */
import { log } from '../optimizer/maths/index.ts';

/** A design with what it is best at. */
export interface Representative {
  /** Such as `coolest`, `smallest`, `balanced`. */
  readonly title: string;
  /** Place in the list it was chosen from. */
  readonly index: number;
}

/** What the best in an objective is called. */
const TITLES: Readonly<Record<string, string>> = {
  loss: 'coolest',
  inefficiency: 'most efficient',
  volume: 'smallest',
  cost: 'cheapest',
  'board-area': 'least board',
  mass: 'lightest',
  'full-load-loss': 'coolest at full load',
};

/** Designs within this share of the best in an objective count as equally good there: far inside the model's own error. */
const ALIKE = 0.01;

/**
 * The best of each objective, then the balanced one; `values[i][k]` is objective k of design i, above 0. Among designs as good as the
 * best to one per cent the one with the smallest product of all objectives stands for them, so that no microwatt is bought with euros.
 * The balanced design is the nearest to the point that is best in everything (the global criterion of Marler and Arora, 2004, section
 * 3.2, from memory), each objective on a logarithmic line from its best to its worst: a corner of the front is as far as can be.
 */
export function representativesOf(
  names: readonly string[],
  values: readonly (readonly number[])[],
): readonly Representative[] {
  if (values.length === 0) return [];
  const all = values.map((_, index) => index);
  const best = names.map((name, k) => {
    const least = Math.min(...values.map((row) => row[k] ?? Number.POSITIVE_INFINITY));
    const alike = all.filter((index) => (values[index]?.[k] ?? 0) <= least * (1 + ALIKE));
    return { title: TITLES[name] ?? `least ${name}`, index: bargainAmong(values, alike) };
  });
  return [...best, { title: 'balanced', index: nearestToBest(values) }];
}

/** The design with the smallest product of its objectives: a per cent more of one weighs as a per cent less of another. */
function bargainAmong(values: readonly (readonly number[])[], among: readonly number[]): number {
  const product = (index: number): number => (values[index] ?? []).reduce((all, value) => all * value, 1);
  return among.reduce((chosen, index) => (product(index) < product(chosen) ? index : chosen), among[0] ?? 0);
}

/** Least sum of squares of the objectives' places between best (0) and worst (1); the first of equals. */
function nearestToBest(values: readonly (readonly number[])[]): number {
  const logs = values.map((row) => row.map(log));
  const columns = (logs[0] ?? []).map((_, k) => logs.map((row) => row[k] ?? 0));
  const lows = columns.map((column) => Math.min(...column));
  const spans = columns.map((column, k) => Math.max(...column) - (lows[k] ?? 0) || 1);
  const distance = (row: readonly number[]): number =>
    row.reduce((sum, value, k) => {
      const place = (value - (lows[k] ?? 0)) / (spans[k] ?? 1);
      return sum + place * place;
    }, 0);
  const distances = logs.map(distance);
  return distances.indexOf(Math.min(...distances));
}
