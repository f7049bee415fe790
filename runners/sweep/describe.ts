/** Objective values in words. */
import { formatQuantity } from '../../model/index.ts';
import type { Objective } from '../../optimizer/problem.ts';

/** `loss 1.23 W` and so on, one text an objective; empty where there are no values. */
export function describeValues(objectives: readonly Objective[], values: readonly number[]): string[] {
  return values.map((value, i) => {
    const objective = objectives[i];
    return objective === undefined ? '' : `${objective.name} ${formatQuantity(value, objective.unit)}`;
  });
}
