/** Which designs the ranges and hidden families leave. */
import type { Dataset, Quantity } from './dataset.ts';
import type { State } from './state.ts';

/** Indices of the designs left, in the front's order. */
export function kept(dataset: Dataset, state: Pick<State, 'ranges' | 'hidden'>): readonly number[] {
  const tests = Object.entries(state.ranges).flatMap(([key, interval]) => {
    const quantity = dataset.byKey.get(key);
    return quantity === undefined ? [] : [{ quantity, interval }];
  });
  const hidden = new Set(state.hidden);
  return dataset.designs.flatMap((design, i) => {
    if (hidden.has(design.family)) return [];
    return tests.every(({ quantity, interval: [low, high] }) => within(quantity, i, low, high)) ? [i] : [];
  });
}

function within(quantity: Quantity, i: number, low: number, high: number): boolean {
  const value = quantity.values[i] ?? Number.NaN;
  return value >= low && value <= high;
}
