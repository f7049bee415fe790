/**
 * Mutation by kind of gene, each gene with about one chance in the number of genes: on lines polynomial (Deb, Goyal 1996; bounded form of
 * Deb 2001, distribution index 15) with fine and far moves among it, a geometric step on whole numbers (Rudolph 1994), another option for a choice.
 */
import type { Random } from '../random.ts';
import { lineStep } from './refinement.ts';
import { CHOICE, LINE, type Space } from './space.ts';

/** Part of the mutated genes on lines that land anywhere, so that separate pieces of a front find each other. */
const FAR = 0.1;
/** Part of them that take a step of a size spread evenly over the decades, so that edges of narrow limits are met. */
const FINE = 0.3;

/** Mutates the child at `child[at …]` in place; `rate` is the chance of each gene, 0 … 1. */
export function mutate(space: Space, child: Float64Array, at: number, rate: number, random: Random): void {
  const { n, kind } = space;
  for (let g = 0; g < n; g++) {
    if (random.uniform() >= rate || !(space.span[g] > 0)) continue;
    if (kind[g] === LINE) child[at + g] = mutateLine(child[at + g], random);
    else if (kind[g] === CHOICE) child[at + g] = otherOption(space, g, child[at + g], random);
    else child[at + g] += geometricStep(space.span[g], random);
  }
}

/** A far, a fine or a polynomial move of x in 0 … 1. */
function mutateLine(x: number, random: Random): number {
  const draw = random.uniform();
  if (draw < FAR) return random.uniform();
  if (draw < FAR + FINE) return x + lineStep(random);
  return polynomial(x, random.uniform());
}

/** Polynomial mutation of x in 0 … 1 by the draw u, exponents 16 and 1/16 as squarings and square roots. */
function polynomial(x: number, u: number): number {
  const inside = Math.max(0, Math.min(1, x));
  const gap = u < 0.5 ? 1 - inside : inside;
  const p2 = gap * gap;
  const p4 = p2 * p2;
  const p8 = p4 * p4;
  const p16 = p8 * p8;
  const v = u < 0.5 ? 2 * u : 2 - 2 * u;
  const root = Math.sqrt(Math.sqrt(Math.sqrt(Math.sqrt(v + (1 - v) * p16))));
  return u < 0.5 ? inside + root - 1 : inside + 1 - root;
}

/** An option other than the present one, all alike. */
function otherOption(space: Space, g: number, present: number, random: Random): number {
  const other = space.low[g] + random.whole(space.span[g]);
  return other >= present ? other + 1 : other;
}

/** A step of at least one, up or down; one time in two a single one, else with a mean of a tenth of the span. */
function geometricStep(span: number, random: Random): number {
  const stay = random.uniform() < 0.5 ? 0 : span > 20 ? 1 - 10 / span : 0.5;
  let step = 1;
  while (step < span && random.uniform() < stay) step++;
  return random.uniform() < 0.5 ? -step : step;
}
