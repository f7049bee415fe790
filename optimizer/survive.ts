/**
 * Survival: constraint domination (Deb et al. 2002) in front, hypervolume contribution (Beume, Naujoks, Emmerich 2007) inside the last front
 * that fits, with an ε-relaxed start (Takahama, Sakai 2006) while nothing feasible is known.
 */
import { type Bold, createBold, keepBold } from './bold.ts';
import { weighViolations } from './judge.ts';
import { referenceOf } from './reference.ts';
import { RELAXED_GENERATIONS, RELAXED_SHARE } from './settings.ts';
import type { World } from './world.ts';

/** Scratch of survival. */
export interface Survival {
  readonly rows: Int32Array;
  readonly objectives: Float64Array;
  readonly total: Float64Array;
  readonly ranks: Int32Array;
  readonly front: Int32Array;
  readonly kept: Uint8Array;
  readonly reference: Float64Array;
  readonly bold: Bold;
}

/** Scratch for a world. */
export function createSurvival(world: World): Survival {
  return {
    rows: new Int32Array(world.capacity),
    objectives: new Float64Array(world.capacity * world.m),
    total: new Float64Array(world.capacity),
    ranks: new Int32Array(world.capacity),
    front: new Int32Array(world.capacity),
    kept: new Uint8Array(world.capacity),
    reference: new Float64Array(world.m),
    bold: createBold(world),
  };
}

/** Shrinks rows 0 … `all` − 1 to the population: the whole together, or each family by itself while families are tried. */
export function survive(world: World, scratch: Survival, all: number): void {
  const start = world.watch === undefined ? 0 : world.watch.now();
  weighViolations(world, 0, all);
  const epsilon = relaxed(world, all);
  scratch.kept.fill(0, 0, all);
  if (world.trial) surviveByFamily(world, scratch, all, epsilon);
  else {
    for (let row = 0; row < all; row++) scratch.rows[row] = row;
    choose(world, scratch, all, world.keep, epsilon);
  }
  compact(world, scratch.kept, all);
  if (world.watch !== undefined) world.watch.spent.ranking += world.watch.now() - start;
}

function surviveByFamily(world: World, scratch: Survival, all: number, epsilon: number): void {
  const { families } = world.island;
  const quota = Math.max(1, Math.floor(world.keep / families.length));
  for (const family of families) {
    let size = 0;
    for (let row = 0; row < all; row++) if (world.family[row] === family) scratch.rows[size++] = row;
    choose(world, scratch, size, quota, epsilon);
  }
}

/** Marks in `kept` the best `keep` of the first `all` rows named in `scratch.rows`, a few bold ones among them, and writes their ranks. */
function choose(world: World, scratch: Survival, all: number, keep: number, epsilon: number): void {
  const { m } = world;
  const size = keepBold(world, scratch.bold, scratch.rows, all, keep, scratch.kept);
  const { rows, objectives, total, ranks, front } = scratch;
  for (let i = 0; i < size; i++) {
    total[i] = world.total[rows[i]];
    for (let c = 0; c < m; c++) objectives[i * m + c] = world.objectives[rows[i] * m + c];
  }
  const fronts = world.ranker.rank(objectives, total, epsilon, size, ranks);
  let left = keep - (all - size);
  for (let f = 0; f < fronts && left > 0; f++) {
    let count = 0;
    for (let i = 0; i < size; i++) if (ranks[i] === f) front[count++] = i;
    if (count > left && total[front[0]] <= epsilon) {
      referenceOf(objectives, front, count, m, scratch.reference);
      world.truncation.truncate(objectives, front, count, left, scratch.reference);
    }
    const taken = Math.min(count, left);
    for (let k = 0; k < taken; k++) {
      scratch.kept[rows[front[k]]] = 1;
      world.rank[rows[front[k]]] = f;
    }
    left -= taken;
  }
}

/** Moves the kept rows to the front, the last ones into the gaps. */
function compact(world: World, kept: Uint8Array, all: number): void {
  let last = all - 1;
  let row = 0;
  for (; row <= last; row++) {
    if (kept[row] === 1) continue;
    while (last > row && kept[last] === 0) last--;
    if (last <= row) break;
    copyRow(world, last, row);
    last--;
  }
  world.count = row;
}

/** Copies everything known of a row to another. */
function copyRow(world: World, from: number, to: number): void {
  const { n, m, limits } = world;
  world.genes.copyWithin(to * n, from * n, from * n + n);
  world.coordinates.copyWithin(to * n, from * n, from * n + n);
  world.stride.copyWithin(to * n, from * n, from * n + n);
  world.objectives.copyWithin(to * m, from * m, from * m + m);
  world.violations.copyWithin(to * limits, from * limits, from * limits + limits);
  world.total[to] = world.total[from];
  world.rank[to] = world.rank[from];
  world.family[to] = world.family[from];
  world.maker[to] = world.maker[from];
}

/**
 * Present ε: 0 as soon as anything feasible is known. It begins at the total violation that a fifth of the first population stays under, and tightens by a
 * square law over ten generations.
 */
function relaxed(world: World, all: number): number {
  if (world.counters.feasible > 0) return 0;
  if (world.relaxation < 0) {
    const sorted = world.total.slice(0, all).sort();
    const threshold = sorted[Math.floor(RELAXED_SHARE * all)];
    world.relaxation = Number.isFinite(threshold) ? threshold : 0;
    world.relaxedGenerations = RELAXED_GENERATIONS;
  }
  world.relaxedGenerations = Math.max(0, world.relaxedGenerations - world.batch / world.keep);
  const part = world.relaxedGenerations / RELAXED_GENERATIONS;
  return world.relaxation * part * part;
}
