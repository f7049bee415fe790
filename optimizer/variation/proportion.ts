/**
 * Moves in proportion: several quantities grow or shrink by one common factor, each up or down. Where products and quotients of quantities
 * meet limits (as power laws make them), such a move stays inside where each quantity by itself would leave.
 */
import { exp } from '../maths/index.ts';
import type { Operator } from './operator.ts';
import { isCount, isQuantity, isRow, LINE } from './space.ts';

/** Chance of each kind of gene to take part: quantities on logarithmic lines, counts, rows of ordered options. */
const QUANTITY = 0.5;
const COUNT = 0.12;
const ROW = 0.05;
/** Logarithms of the smallest factor (1 %) and of the span up to the largest (1.95): sizes are spread evenly between in their logarithm. */
const SMALLEST = -4.6;
const RANGE = 4.2;

/** Child = first parent, some of its quantities and counts multiplied or divided by a common factor, now and then a row exchanged. */
export const proportion: Operator = (space, pool, parents, child, at, random) => {
  const { n, kind, low, span } = space;
  const from = parents[0] * n;
  const size = exp(SMALLEST + RANGE * random.uniform());
  for (let g = 0; g < n; g++) {
    child[at + g] = pool[from + g];
    if (!(span[g] > 0) || random.uniform() >= chanceOf(space, g)) continue;
    const sign = random.uniform() < 0.5 ? -1 : 1;
    if (kind[g] === LINE) child[at + g] += (sign * size) / span[g];
    else if (isRow(space, g)) {
      child[at + g] = random.uniform() < 0.5 ? child[at + g] + sign : low[g] + random.whole(span[g] + 1);
    } else child[at + g] = scaledCount(child[at + g], sign, size);
  }
};

function chanceOf(space: Parameters<Operator>[0], g: number): number {
  if (isQuantity(space, g)) return QUANTITY;
  if (isCount(space, g)) return COUNT;
  return isRow(space, g) ? ROW : 0;
}

/** The count times or over the factor, at least one away. */
function scaledCount(count: number, sign: number, size: number): number {
  const scaled = Math.round(count * exp(sign * size));
  return scaled === count ? count + sign : scaled;
}
