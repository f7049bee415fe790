/** Who becomes a parent: by tournament, from the archive, the best in an objective, or the neighbours of another. */
import { toCoordinates } from './variation/index.ts';
import type { World } from './world.ts';

/** Nearest members that count as neighbours. */
const NEAREST = 8;

/** Scratch of the search for neighbours. */
export interface Nearness {
  readonly nearest: Int32Array;
  readonly distance: Float64Array;
  /** One over the range of each objective in the population. */
  readonly range: Float64Array;
}

/** Scratch for `m` objectives. */
export function createNearness(m: number): Nearness {
  return {
    nearest: new Int32Array(NEAREST),
    distance: new Float64Array(NEAREST),
    range: new Float64Array(m),
  };
}

/** The row of guest `k`, filled with a member of the archive drawn at random; by tournament while none is found. */
export function guest(world: World, k: number): number {
  const row = world.capacity + world.m + k;
  const { n } = world;
  if (!world.archive.draw(world.random.whole, world.genes, world.objectives, row)) return tournament(world);
  toCoordinates(world.space, world.genes, row * n, world.coordinates, row * n);
  return row;
}

/** The better by rank of two members drawn at random; while families are tried, of one family drawn at random. */
export function tournament(world: World): number {
  const a = world.random.whole(world.count);
  const b = world.random.whole(world.count);
  if (world.trial && world.family[a] !== world.family[b]) return a;
  return world.rank[b] < world.rank[a] ? b : a;
}

/** The champion of an objective drawn at random, or `otherwise` while there is none. */
export function champion(world: World, otherwise: number): number {
  const row = world.capacity + world.random.whole(world.m);
  return world.objectives[row * world.m] < Number.POSITIVE_INFINITY ? row : otherwise;
}

/** Another member, of the same family while families are tried (if a few draws find one). */
export function partner(world: World, first: number): number {
  let other = first;
  for (let draw = 0; draw < 8; draw++) {
    other = world.random.whole(world.count);
    if (other !== first && (!world.trial || world.family[other] === world.family[first])) break;
  }
  return other;
}

/** Range of each objective over the population, for distances. */
export function measureRange(world: World, near: Nearness): void {
  const { m, count, objectives } = world;
  for (let c = 0; c < m; c++) {
    let low = Number.POSITIVE_INFINITY;
    let high = Number.NEGATIVE_INFINITY;
    for (let row = 0; row < count; row++) {
      const value = objectives[row * m + c];
      if (value < low) low = value;
      if (value > high) high = value;
    }
    near.range[c] = high - low > 0 && high - low < Number.POSITIVE_INFINITY ? 1 / (high - low) : 0;
  }
}

/** Sets the second and third parent to two of the nearest members of the first, by normalised objectives. */
export function neighbours(world: World, near: Nearness, parents: Int32Array): void {
  const { m, count, objectives, random } = world;
  const { nearest, distance, range } = near;
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
