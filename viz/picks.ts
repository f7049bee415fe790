/** A few designs worth a first look, as the model chooses them, with labels for buttons: the balanced one first. */
import { representativesOf } from '../model/representatives.ts';
import type { Dataset } from './dataset.ts';

export interface Pick {
  readonly label: string;
  readonly index: number;
}

/** The balanced design first, then the best in each objective, among `among`. */
export function picksOf(dataset: Dataset, among: readonly number[]): readonly Pick[] {
  const names = dataset.objectives.map(({ name }) => name);
  const values = among.map((index) => dataset.objectives.map((objective) => objective.values[index] ?? 0));
  const chosen = representativesOf(names, values).map(({ title, index }) => ({
    label: `${title.charAt(0).toUpperCase()}${title.slice(1)}`,
    index: among[index] ?? 0,
  }));
  return [...chosen.slice(-1), ...chosen.slice(0, -1)];
}
