/** A few designs worth a first look: the best in each objective, and the balanced one. Terminal and page choose alike. */

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
    return { title: TITLES[name] ?? `least ${name}`, index: balancedAmong(values, alike) };
  });
  return [...best, { title: 'balanced', index: balancedAmong(values, all) }];
}

/** The design with the smallest product of its objectives: a per cent more of one weighs as a per cent less of another. */
function balancedAmong(values: readonly (readonly number[])[], among: readonly number[]): number {
  const product = (index: number): number => (values[index] ?? []).reduce((all, value) => all * value, 1);
  return among.reduce((chosen, index) => (product(index) < product(chosen) ? index : chosen), among[0] ?? 0);
}
