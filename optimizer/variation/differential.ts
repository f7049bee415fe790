/**
 * Differential variation (Storn, Price 1997, "Differential evolution", DE/rand/1/bin): the difference of two parents, scaled, added to the
 * first. On whole numbers the sum is rounded at random; a choice is taken from one of the parents.
 */
import type { Operator } from './operator.ts';
import { CHOICE, WHOLE } from './space.ts';

/** Child = first parent + F · (second − third) in a random part of the genes; F spread over 0.3 … 0.8. */
export const differential: Operator = (space, pool, parents, child, at, random) => {
  const { n, kind } = space;
  const a = parents[0] * n;
  const b = parents[1] * n;
  const c = parents[2] * n;
  const scale = 0.3 + 0.5 * random.uniform();
  const rate = random.uniform() < 0.5 ? 1 : 0.2;
  const sure = random.whole(n);
  for (let g = 0; g < n; g++) {
    const x = pool[a + g];
    if (g !== sure && random.uniform() >= rate) child[at + g] = x;
    else if (kind[g] === CHOICE) child[at + g] = random.uniform() < 0.5 ? x : pool[b + g];
    else {
      const moved = x + scale * (pool[b + g] - pool[c + g]);
      child[at + g] = kind[g] === WHOLE ? Math.floor(moved + random.uniform()) : moved;
    }
  }
};
