/**
 * Local refinement of a member: along the line that led to it, further (the pattern move of Hooke, Jeeves 1961, "Direct search"), or, where no such line is
 * known, one gene or two by small steps. Meant for the member's own direction of compromise, which the archive then judges.
 */
import { exp } from '../maths/index.ts';
import type { Random } from '../random.ts';
import { CHOICE, LINE, type Space } from './space.ts';

/** Smallest and largest exponent of ten of a step along a line, as parts of its range. */
const FINEST = -4;
const COARSEST = -1;
/** Chance that the gene beside the stepped one is stepped too: genes of one component stand beside each other. */
const PAIR = 0.5;
/** Chance that a step over whole numbers grows by one more. */
const LONGER = 0.5;

/**
 * Writes to `child[at …]` the member at `pool[member · n …]` moved on along `stride[member · n …]` by 0.5 … 2 of its length, each gene a little more or
 * less so that curved edges can be followed, or with one gene or two neighbouring ones
 * stepped when the stride is all zero or one time in two.
 */
export function refineMember(
  space: Space,
  pool: Float64Array,
  stride: Float64Array,
  member: number,
  child: Float64Array,
  at: number,
  random: Random,
): void {
  const { n, live } = space;
  const from = member * n;
  for (let g = 0; g < n; g++) child[at + g] = pool[from + g];
  if (random.uniform() < 0.5 && follow(space, stride, from, child, at, random)) return;
  if (live.length === 0) return;
  const k = random.whole(live.length);
  nudge(space, live[k], child, at, random);
  if (random.uniform() < PAIR) nudge(space, live[k + 1 === live.length ? 0 : k + 1], child, at, random);
}

/** Steps gene g of the child by a little; a choice lands anywhere. */
function nudge(space: Space, g: number, child: Float64Array, at: number, random: Random): void {
  const { kind, low, span } = space;
  if (kind[g] === LINE) child[at + g] += lineStep(random);
  else if (kind[g] === CHOICE) child[at + g] = low[g] + random.whole(span[g] + 1);
  else {
    let step = 1;
    while (step < span[g] && random.uniform() < LONGER) step++;
    child[at + g] += random.uniform() < 0.5 ? -step : step;
  }
}

/**
 * Writes to `child[at …]` the member at `pool[member · n …]` with every gene on a line moved by a normal step of one deviation, which is drawn
 * evenly over the decades; whole numbers now and then move by one. Where limits meet at a narrow angle, single genes cannot move and this can.
 */
export function stepAround(
  space: Space,
  pool: Float64Array,
  member: number,
  child: Float64Array,
  at: number,
  random: Random,
): void {
  const { n, kind } = space;
  const deviation = decadeStep(random);
  for (let g = 0; g < n; g++) {
    child[at + g] = pool[member * n + g];
    if (kind[g] === LINE) child[at + g] += deviation * random.normal();
    else if (kind[g] !== CHOICE && random.uniform() * n < 0.5) child[at + g] += random.uniform() < 0.5 ? -1 : 1;
  }
}

/** Moves on along the stride; false when there is none. */
function follow(
  space: Space,
  stride: Float64Array,
  from: number,
  child: Float64Array,
  at: number,
  random: Random,
): boolean {
  const { n, kind } = space;
  const length = 0.5 + 1.5 * random.uniform();
  let moved = false;
  for (let g = 0; g < n; g++) {
    const step = stride[from + g];
    if (step === 0 || kind[g] === CHOICE) continue;
    const stretched = length * step * (0.7 + 0.6 * random.uniform());
    child[at + g] += kind[g] === LINE ? stretched : Math.round(stretched);
    moved = true;
  }
  return moved;
}

/** A step along a line, of either sign, whose size is spread evenly over the decades. */
export function lineStep(random: Random): number {
  const size = decadeStep(random);
  return random.uniform() < 0.5 ? -size : size;
}

/** A size spread evenly over the decades from the finest to the coarsest step. */
function decadeStep(random: Random): number {
  return exp((FINEST + (COARSEST - FINEST) * random.uniform()) * Math.LN10);
}
