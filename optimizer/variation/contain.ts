/** Brings a child back inside the ranges of its genes. */
import type { Random } from '../random.ts';
import { LINE, type Space } from './space.ts';

/**
 * A gene beyond an end goes to the end or to a random place between the end and the parent (row `parent` of `pool`), one time in
 * two each: ends are often best, and landing there always would empty the rest.
 */
export function contain(
  space: Space,
  pool: Float64Array,
  parent: number,
  child: Float64Array,
  at: number,
  random: Random,
): void {
  const { n, kind, low, high } = space;
  for (let g = 0; g < n; g++) {
    const bottom = kind[g] === LINE ? 0 : low[g];
    const top = kind[g] === LINE ? 1 : high[g];
    const x = child[at + g];
    if (x >= bottom && x <= top) continue;
    const end = x < bottom ? bottom : top;
    const u = random.uniform();
    const back = u < 0.5 ? 0 : (2 * u - 1) * (pool[parent * n + g] - end);
    child[at + g] = kind[g] === LINE ? end + back : Math.round(end + back);
  }
}
