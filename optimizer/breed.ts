/** Making children: whole first populations, and batches by operators drawn by their shares. */
import { OPERATORS } from './island.ts';
import {
  champion,
  createNearness,
  guest,
  measureRange,
  type Nearness,
  neighbours,
  partner,
  tournament,
} from './parents.ts';
import { hashRow, remember } from './seen.ts';
import { ARCHIVE_PARENTS, TRIES } from './settings.ts';
import {
  contain,
  crossover,
  differential,
  drawOperator,
  graft,
  LINE,
  mutate,
  type Operator,
  proportion,
  refineMember,
  type Space,
  stepAround,
  toCoordinates,
  toGenes,
} from './variation/index.ts';
import type { World } from './world.ts';

/** Chance of a gene to be drawn anew when a stalled island restarts around the archive. */
const SCATTER = 0.3;

/**
 * Part of the refinements that start from a champion: the flat ends of a front add too little hypervolume to hold a place in the population,
 * yet the best in each objective is what one asks for first.
 */
const CHAMPIONS = 0.3;

/** Places in `OPERATORS` (island.ts) of those that need more than parents drawn at random. */
const NEIGHBOURS = OPERATORS.indexOf('neighbours');
const GRAFT = OPERATORS.indexOf('graft');
const REFINEMENT = OPERATORS.indexOf('refinement');

/** What makes the child, in the order of `OPERATORS`; refinement is handled apart. */
const MAKERS: readonly Operator[] = [crossover, differential, differential, differential, graft, proportion];
/** Chance that mutation follows, in the order of `OPERATORS`: moves of one kind by themselves are not blurred. */
const MUTATED: readonly number[] = [1, 1, 1, 0, 0.5, 0];

/** Scratch of breeding. */
export interface Nursery {
  readonly parents: Int32Array;
  readonly near: Nearness;
  readonly gene: Float64Array;
  /** A child's genes before it was snapped. */
  readonly drawn: Float64Array;
  readonly words: Uint32Array;
  readonly hash: Uint32Array;
}

/** Scratch for a world. */
export function createNursery(world: World): Nursery {
  const gene = new Float64Array(world.n);
  return {
    parents: new Int32Array(3),
    near: createNearness(world.m),
    gene,
    drawn: new Float64Array(world.n),
    words: new Uint32Array(gene.buffer),
    hash: new Uint32Array(2),
  };
}

/**
 * Writes up to `size` new designs behind the population, none of them seen before: seeds that belong here, then a Latin hypercube (McKay, Beckman,
 * Conover 1979) dealt out over the island's families. Returns their number.
 */
export function settle(world: World, nursery: Nursery, size: number): number {
  const { n, space, random, coordinates } = world;
  let made = 0;
  for (const seed of ownSeeds(world)) if (made < size && place(world, nursery, seed, made)) made++;
  const rows = size - made;
  const from = (world.count + made) * n;
  for (let g = 0; g < n; g++) {
    const order = permutation(rows, random.whole);
    for (let k = 0; k < rows; k++) {
      const u = (order[k] + random.uniform()) / rows;
      coordinates[from + k * n + g] = anywhere(space, g, u);
    }
  }
  const drawn = coordinates.slice(from, from + rows * n);
  for (let k = 0; k < rows; k++) {
    coordinates.set(drawn.subarray(k * n, k * n + n), (world.count + made) * n);
    if (finish(world, nursery, world.count + made, familyFor(world, k))) made++;
  }
  return made;
}

/**
 * Writes up to `size` new designs around the archive behind the population: members drawn at random with about a third of their genes drawn
 * anew, at least one. Returns their number.
 */
export function scatter(world: World, nursery: Nursery, size: number): number {
  const { n, space, random, coordinates } = world;
  const members = world.archive.pack();
  let made = 0;
  for (let tries = 0; made < size && tries < TRIES * size; tries++) {
    const at = (world.count + made) * n;
    toCoordinates(space, members.genes, random.whole(members.count) * n, coordinates, at);
    const sure = random.whole(n);
    for (let g = 0; g < n; g++) {
      if (g === sure || random.uniform() < SCATTER) coordinates[at + g] = anywhere(space, g, random.uniform());
    }
    world.maker[world.count + made] = -1;
    if (finish(world, nursery, world.count + made, -1)) made++;
  }
  return made;
}

/** Writes up to `size` children behind the population and returns their number. */
export function breed(world: World, nursery: Nursery, size: number): number {
  const start = world.watch === undefined ? 0 : world.watch.now();
  measureRange(world, nursery.near);
  let made = 0;
  for (let k = 0; k < size; k++) {
    for (let attempt = 0; attempt < TRIES; attempt++) {
      const row = world.count + made;
      makeChild(world, nursery, made, attempt);
      if (finish(world, nursery, row, world.trial ? world.family[nursery.parents[0]] : -1)) {
        measureStride(world, nursery.parents[0], row);
        made++;
        break;
      }
      world.counters.duplicates++;
    }
  }
  if (world.watch !== undefined) world.watch.spent.variation += world.watch.now() - start;
  return made;
}

/** One child in coordinates; the mutation rate grows with every failed attempt. */
function makeChild(world: World, nursery: Nursery, made: number, attempt: number): void {
  const { space, coordinates, random, n } = world;
  const row = world.count + made;
  const operator = drawOperator(world.shares, random.uniform());
  const { parents } = nursery;
  const ripe = !world.trial && 2 * world.island.epoch >= world.island.plan.epochs;
  parents[0] = ripe && random.uniform() < ARCHIVE_PARENTS ? guest(world, made) : tournament(world);
  if (operator === REFINEMENT) {
    const end = !world.trial && random.uniform() < CHAMPIONS;
    if (end) parents[0] = champion(world, parents[0]);
    if (end && random.uniform() < 0.5) stepAround(space, coordinates, parents[0], coordinates, row * n, random);
    else refineMember(space, coordinates, world.stride, parents[0], coordinates, row * n, random);
  } else {
    if (operator === NEIGHBOURS || operator === GRAFT) neighbours(world, nursery.near, parents);
    else {
      parents[1] = partner(world, parents[0]);
      parents[2] = partner(world, parents[0]);
    }
    MAKERS[operator](space, coordinates, parents, coordinates, row * n, random);
    if (random.uniform() < MUTATED[operator]) {
      mutate(space, coordinates, row * n, Math.min(1, (1 + attempt) / Math.max(1, space.live.length)), random);
    }
  }
  contain(space, coordinates, parents[0], coordinates, row * n, random);
  world.maker[row] = operator;
  world.parent[row] = parents[0];
}

/** Keeps the move that made a child. */
function measureStride(world: World, parent: number, row: number): void {
  const { n, coordinates, stride } = world;
  for (let g = 0; g < n; g++) stride[row * n + g] = coordinates[row * n + g] - coordinates[parent * n + g];
}

/** Snaps the child in `coordinates` into a design; false when it was seen before. */
function finish(world: World, nursery: Nursery, row: number, family: number): boolean {
  const { n, space, genes, coordinates, problem } = world;
  const { gene, drawn } = nursery;
  toGenes(space, coordinates, row * n, gene, 0);
  if (family >= 0) problem.families.confine(gene, family);
  drawn.set(gene);
  problem.snap(gene);
  hashRow(nursery.words, nursery.hash);
  if (remember(world.seen, nursery.hash)) return false;
  genes.set(gene, row * n);
  toCoordinates(space, genes, row * n, coordinates, row * n);
  keepHidden(world, nursery, row);
  world.family[row] = problem.families.of(gene);
  return true;
}

/**
 * Genes that play no part in a design are snapped to one value; the row's coordinates keep what they were, so that a child in which they
 * do play a part begins where the family left off, not at that one value.
 */
function keepHidden(world: World, nursery: Nursery, row: number): void {
  const { n, space, coordinates } = world;
  const { gene, drawn } = nursery;
  for (let g = 0; g < n; g++) {
    if (space.kind[g] !== LINE && Math.abs(drawn[g] - gene[g]) > 0.5) coordinates[row * n + g] = drawn[g];
  }
}

function place(world: World, nursery: Nursery, seed: Float64Array, made: number): boolean {
  const row = world.count + made;
  world.maker[row] = -1;
  toCoordinates(world.space, seed, 0, world.coordinates, row * world.n);
  return finish(world, nursery, row, -1);
}

/** Seeds of the families this island tries, or this island's part of all seeds. */
function ownSeeds(world: World): Float64Array[] {
  const { problem, island } = world;
  return problem.seeds.filter((seed, k) =>
    world.trial ? island.families.includes(problem.families.of(seed)) : k % island.plan.islands === island.index,
  );
}

function familyFor(world: World, k: number): number {
  return world.trial ? world.island.families[k % world.island.families.length] : -1;
}

/** The place in the range of a gene that lies at the part u of it, 0 (inclusive) … 1 (exclusive). */
function anywhere(space: Space, g: number, u: number): number {
  return space.kind[g] === LINE ? u : space.low[g] + Math.floor(u * (space.span[g] + 1));
}

/** A random order of 0 … count − 1 (Fisher, Yates). */
function permutation(count: number, whole: (count: number) => number): Int32Array {
  const order = Int32Array.from({ length: count }, (_, k) => k);
  for (let k = count - 1; k > 0; k--) {
    const j = whole(k + 1);
    const held = order[k];
    order[k] = order[j];
    order[j] = held;
  }
  return order;
}
