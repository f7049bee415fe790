/** A parts set in which every kind is empty: what a test's own parts are laid over, so that a new kind needs no change of tests. */
import { joinTables } from '../../model/index.ts';
import type { PartsTables } from '../../model/parts/tables.ts';

export const NO_TABLES: PartsTables = empty();

function empty(): PartsTables {
  const joined = joinTables([]);
  if (!joined.ok) throw new Error('no tables cannot be joined');
  return joined.value;
}
