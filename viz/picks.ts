/** A few designs worth a first look: the best in each objective and the most balanced one. */
import type { Dataset } from './dataset.ts';
import { spoken } from './labels.ts';

export interface Pick {
  readonly label: string;
  readonly index: number;
}

const BEST: Readonly<Record<string, string>> = {
  loss: 'Coolest',
  inefficiency: 'Most efficient',
  volume: 'Smallest',
  cost: 'Cheapest',
  'board-area': 'Least board',
  mass: 'Lightest',
  'full-load-loss': 'Coolest at full load',
};

/** The balanced design first, then the best in each objective, among `among`. */
export function picksOf(dataset: Dataset, among: readonly number[]): readonly Pick[] {
  if (among.length === 0) return [];
  const best = dataset.objectives.map((objective) => ({
    label: BEST[objective.name] ?? `Least ${spoken(objective.name)}`,
    index: least(among, (i) => objective.values[i] ?? Number.POSITIVE_INFINITY),
  }));
  return [{ label: 'Balanced', index: balanced(dataset, among) }, ...best];
}

/** The design nearest to the corner of all best values, each objective scaled to its spread (least squares). */
function balanced(dataset: Dataset, among: readonly number[]): number {
  const spans = dataset.objectives.map((objective) => {
    const values = among.map((i) => objective.values[i] ?? 0);
    const low = Math.min(...values);
    return { low, span: Math.max(...values) - low || 1 };
  });
  return least(among, (i) =>
    spans.reduce((sum, { low, span }, k) => sum + (((dataset.objectives[k]?.values[i] ?? 0) - low) / span) ** 2, 0),
  );
}

function least(among: readonly number[], value: (index: number) => number): number {
  return among.reduce((best, i) => (value(i) < value(best) ? i : best), among[0] ?? 0);
}
