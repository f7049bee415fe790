/** The one signature of all operators that make a child out of parents. */
import type { Random } from '../random.ts';
import type { Space } from './space.ts';

/**
 * Writes a child to `child[at …]` from parents that are rows of `pool` (both in coordinates). `parents` holds row numbers, the first
 * is the one the child should resemble. May leave 0 … 1 on a line; `contain` brings it back.
 */
export type Operator = (
  space: Space,
  pool: Float64Array,
  parents: Int32Array,
  child: Float64Array,
  at: number,
  random: Random,
) => void;
