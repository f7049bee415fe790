/** Making children: whole first populations, and batches by operators drawn by their shares. */
import { OPERATORS } from './island.ts';
import { hashRow, remember } from './seen.ts';
import { TRIES } from './settings.ts';
import {
  contain,
  crossover,
  differential,
  drawOperator,
  LINE,
  mutate,
  type Operator,
  refineMember,
  type Space,
  stepAround,
  toCoordinates,
  toGenes,
} from './variation/index.ts';
import type { World } from './world.ts';

/** Nearest members that count as neighbours. */
const NEAREST = 8;

/** Chance of a gene to be drawn anew when a stalled island restarts around the archive. */
const SCATTER = 0.3;

/**
 * Part of the refinements that start from a champion: the flat ends of a front add too little hypervolume to hold a place in the population,
 * yet the best in each objective is what one asks for first.
 */
const CHAMPIONS = 0.3;

/** Places in `OPERATORS` (island.ts) of those that need more than parents drawn at random. */
const NEIGHBOURS = OPERATORS.indexOf('neighbours');
const REFINEMENT = OPERATORS.indexOf('refinement');

/** What makes the child, in the order of `OPERATORS`, for all but refinement. */
const MAKERS: readonly Operator[] = [crossover, differential, differential];

/** Scratch of breeding. */
export interface Nursery {
  readonly parents: Int32Array;
  readonly nearest: Int32Array;
  readonly distance: Float64Array;
  readonly range: Float64Array;
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
    nearest: new Int32Array(NEAREST),
    distance: new Float64Array(NEAREST),
    range: new Float64Array(world.m),
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
  measureRange(world, nursery);
  let made = 0;
  for (let k = 0; k < size; k++) {
    for (let attempt = 0; attempt < TRIES; attempt++) {
      const row = world.count + made;
      makeChild(world, nursery, row, attempt);
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
function makeChild(world: World, nursery: Nursery, row: number, attempt: number): void {
  const { space, coordinates, random, n } = world;
  const operator = drawOperator(world.shares, random.uniform());
  const { parents } = nursery;
  parents[0] = tournament(world);
  if (operator === REFINEMENT) {
    const end = !world.trial && random.uniform() < CHAMPIONS;
    if (end) parents[0] = champion(world, parents[0]);
    if (end && random.uniform() < 0.5) stepAround(space, coordinates, parents[0], coordinates, row * n, random);
    else refineMember(space, coordinates, world.stride, parents[0], coordinates, row * n, random);
  } else {
    if (operator === NEIGHBOURS) neighbours(world, nursery);
    else {
      parents[1] = partner(world, parents[0]);
      parents[2] = partner(world, parents[0]);
    }
    MAKERS[operator](space, coordinates, parents, coordinates, row * n, random);
    mutate(space, coordinates, row * n, Math.min(1, (1 + attempt) / n), random);
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

/** The better by rank of two members drawn at random; while families are tried, of one family drawn at random. */
function tournament(world: World): number {
  const a = world.random.whole(world.count);
  const b = world.random.whole(world.count);
  if (world.trial && world.family[a] !== world.family[b]) return a;
  return world.rank[b] < world.rank[a] ? b : a;
}

/** The champion of an objective drawn at random, or `otherwise` while there is none. */
function champion(world: World, otherwise: number): number {
  const row = world.capacity + world.random.whole(world.m);
  return world.objectives[row * world.m] < Number.POSITIVE_INFINITY ? row : otherwise;
}

/** Another member, of the same family while families are tried (if a few draws find one). */
function partner(world: World, first: number): number {
  let other = first;
  for (let draw = 0; draw < 8; draw++) {
    other = world.random.whole(world.count);
    if (other !== first && (!world.trial || world.family[other] === world.family[first])) break;
  }
  return other;
}

/** Range of each objective over the population, for distances. */
function measureRange(world: World, nursery: Nursery): void {
  const { m, count, objectives } = world;
  for (let c = 0; c < m; c++) {
    let low = Number.POSITIVE_INFINITY;
    let high = Number.NEGATIVE_INFINITY;
    for (let row = 0; row < count; row++) {
      const value = objectives[row * m + c];
      if (value < low) low = value;
      if (value > high) high = value;
    }
    nursery.range[c] = high - low > 0 && high - low < Number.POSITIVE_INFINITY ? 1 / (high - low) : 0;
  }
}

/** Sets the second and third parent to two of the nearest members of the first, by normalised objectives. */
function neighbours(world: World, nursery: Nursery): void {
  const { m, count, objectives, random } = world;
  const { parents, nearest, distance, range } = nursery;
  const first = parents[0];
  let held = 0;
  for (let row = 0; row < count; row++) {
    if (row === first) continue;
    let d = 0;
    for (let c = 0; c < m; c++) {
      const gap = (objectives[row * m + c] - objectives[first * m + c]) * range[c];
      d += gap * gap;
    }
    if (held === NEAREST && !(d < distance[held - 1])) continue;
    let k = held < NEAREST ? held++ : held - 1;
    for (; k > 0 && distance[k - 1] > d; k--) {
      distance[k] = distance[k - 1];
      nearest[k] = nearest[k - 1];
    }
    distance[k] = d;
    nearest[k] = row;
  }
  if (held === 0) {
    parents[1] = first;
    parents[2] = first;
    return;
  }
  const b = random.whole(held);
  parents[1] = nearest[b];
  parents[2] = held > 1 ? nearest[(b + 1 + random.whole(held - 1)) % held] : first;
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
