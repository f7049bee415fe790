/** Which views a change of state touches. */
import type { State } from './state.ts';

export type Change = 'axes' | 'ranges' | 'open' | 'pinned' | 'point' | 'moved';

const FIELDS: Readonly<Record<Change, readonly (keyof State)[]>> = {
  axes: ['x', 'y', 'third', 'as', 'window'],
  ranges: ['ranges', 'hidden'],
  open: ['open'],
  pinned: ['pinned'],
  point: ['point'],
  moved: ['changes'],
};

/** What differs between two states. */
export function changesBetween(before: State, after: State): ReadonlySet<Change> {
  const names = Object.keys(FIELDS) as Change[];
  return new Set(names.filter((name) => FIELDS[name].some((field) => !same(before[field], after[field]))));
}

function same(a: unknown, b: unknown): boolean {
  return a === b || JSON.stringify(a) === JSON.stringify(b);
}
