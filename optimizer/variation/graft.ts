/**
 * Grafting: a run of neighbouring genes of one design set into another (segment transfer, after the two-point crossover of De Jong 1975). Genes that
 * describe one component stand beside each other, so a part and its count travel together where a gene by itself would fit nowhere.
 */
import type { Operator } from './operator.ts';

/** Chance that one more gene follows. */
const ONWARD = 0.6;

/** Child = first parent, with a short run of the live genes of the second. */
export const graft: Operator = (space, pool, parents, child, at, random) => {
  const { n, live } = space;
  const a = parents[0] * n;
  const b = parents[1] * n;
  for (let g = 0; g < n; g++) child[at + g] = pool[a + g];
  if (live.length === 0) return;
  let k = random.whole(live.length);
  let more = live.length;
  do {
    const g = live[k];
    child[at + g] = pool[b + g];
    k = k + 1 === live.length ? 0 : k + 1;
    more--;
  } while (more > 0 && random.uniform() < ONWARD);
};
