/**
 * Crossover of two parents: simulated binary crossover on lines (Deb, Agrawal 1995, "Simulated binary crossover for continuous search
 * space", distribution index 15), uniform crossover on whole numbers and choices (Syswerda 1989).
 */
import type { Operator } from './operator.ts';
import { LINE } from './space.ts';

/** Child near the first parent or the second, spread as far as the parents lie apart. */
export const crossover: Operator = (space, pool, parents, child, at, random) => {
  const { n, kind } = space;
  const a = parents[0] * n;
  const b = parents[1] * n;
  for (let g = 0; g < n; g++) {
    const x = pool[a + g];
    const y = pool[b + g];
    const draw = random.uniform();
    if (draw < 0.5 || x === y) child[at + g] = x;
    else if (kind[g] !== LINE) child[at + g] = y;
    else {
      const u = random.uniform();
      // β = (2u)^(1/16), or (1/(2(1 − u)))^(1/16): exponent 1/(η + 1) as four square roots.
      const base = u < 0.5 ? 2 * u : 1 / (2 - 2 * u);
      const beta = Math.sqrt(Math.sqrt(Math.sqrt(Math.sqrt(base))));
      const side = draw < 0.75 ? 1 : -1;
      child[at + g] = 0.5 * (x + y + side * beta * (x - y));
    }
  }
};
