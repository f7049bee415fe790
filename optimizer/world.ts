/** The island opened for work: its data in rows with room for children, its archives live, all in memory that one epoch after the other uses. */
import {
  type Archive,
  type ArchiveGrid,
  createArchive,
  createNearMisses,
  createSampler,
  type Designs,
  insertAll,
  insertAllNearMisses,
  type NearMisses,
  type NearMissGrid,
  packArchive,
  packNearMisses,
  type Sampler,
} from './archive/index.ts';
import { createTruncation, type Truncation } from './hypervolume/index.ts';
import { CEILINGS, type Island, OPERATORS } from './island.ts';
import type { Problem } from './problem.ts';
import { type Random, restoreRandom } from './random.ts';
import { type ConstrainedRanker, createConstrainedRanker } from './ranking/index.ts';
import { BATCH_SHARE, ISLAND_SAMPLE, NEAR_MISS_SHARE, NICHE } from './settings.ts';
import { createSpace, isQuantity, type Space, toCoordinates } from './variation/index.ts';

/** Where an epoch's time went, in the unit of the caller's clock. */
export interface TimeSplit {
  variation: number;
  model: number;
  ranking: number;
  archive: number;
}

/** A caller's clock and the record it fills. It never influences a result. */
export interface Watch {
  readonly now: () => number;
  readonly spent: TimeSplit;
}

/**
 * An open island. Rows 0 … count − 1 are the population, the rows behind them children; rows capacity … capacity + m − 1 of coordinates,
 * strides and objectives are the champions: the best feasible design known in each objective (objectives Infinity while there is none). Rows
 * capacity + m and behind are guests: first parents drawn from the archive, one for each child of a batch.
 */
export interface World {
  readonly problem: Problem;
  readonly island: Island;
  readonly watch: Watch | undefined;
  readonly space: Space;
  readonly n: number;
  readonly m: number;
  readonly limits: number;
  /** Rows there is room for. */
  readonly capacity: number;
  /** Members kept at a selection. */
  readonly keep: number;
  /** Children made between two selections. */
  readonly batch: number;
  readonly genes: Float64Array;
  readonly coordinates: Float64Array;
  /** The move, in coordinates, that made each row out of its first parent; zero where unknown. */
  readonly stride: Float64Array;
  readonly objectives: Float64Array;
  readonly violations: Float64Array;
  /** Total normalised violation of each row; Infinity for what cannot be computed. */
  readonly total: Float64Array;
  readonly rank: Int32Array;
  readonly family: Int32Array;
  /** Row of the first parent of each child, −1 where none. */
  readonly parent: Int32Array;
  /** Operator that made a row. */
  readonly maker: Int32Array;
  readonly archive: Archive;
  readonly near: NearMisses;
  readonly sample: Sampler;
  readonly seen: Uint32Array;
  readonly random: Random;
  readonly ranker: ConstrainedRanker;
  readonly truncation: Truncation;
  readonly shares: Float64Array;
  /** Most that each share may be in this space. */
  readonly ceilings: readonly number[];
  readonly quality: Float64Array;
  readonly tried: Float64Array;
  readonly earned: Float64Array;
  readonly violationSum: Float64Array;
  readonly violationCount: Float64Array;
  readonly record: {
    readonly evaluated: Float64Array;
    readonly feasible: Float64Array;
    readonly best: Float64Array;
    readonly violated: Float64Array;
  };
  readonly counters: {
    evaluations: number;
    feasible: number;
    notComputable: number;
    duplicates: number;
    restarts: number;
  };
  /** Archive entries in this epoch. */
  entries: number;
  /** Members of the population. */
  count: number;
  /** True while each family is searched by itself. */
  trial: boolean;
  relaxation: number;
  relaxedGenerations: number;
  stalled: number;
}

/** The grid of a problem's archive: from the problem alone. */
export function archiveGrid(problem: Problem): ArchiveGrid {
  return {
    genes: problem.genes.length,
    objectives: problem.objectives.length,
    violations: problem.limits.length,
    ideal: Float64Array.from(problem.objectives, (objective) => objective.ideal),
    resolution: Float64Array.from(problem.objectives, (objective) => objective.resolution),
  };
}

/** The scale of a problem's near misses: from the problem alone. */
export function nearMissGrid(problem: Problem): NearMissGrid {
  return {
    genes: problem.genes.length,
    objectives: problem.objectives.length,
    violations: problem.limits.length,
    ideal: Float64Array.from(problem.objectives, (objective) => objective.ideal),
    reference: Float64Array.from(problem.objectives, (objective) => objective.reference),
    share: NEAR_MISS_SHARE,
  };
}

/**
 * What worlds of one problem are opened in, one after the other. An epoch needs megabytes; taken anew each time they would keep the collector
 * busy, which throws away compiled code with them.
 */
export interface Memory {
  readonly problem: Problem;
  readonly space: Space;
  readonly archive: Archive;
  readonly near: NearMisses;
  readonly sample: Sampler;
  /** Remembered from the last world, and used again where the next is of the same size. */
  rows: Rows | undefined;
  seen: Uint32Array;
}

type Rows = Pick<
  World,
  | 'capacity'
  | 'batch'
  | 'genes'
  | 'coordinates'
  | 'stride'
  | 'objectives'
  | 'violations'
  | 'total'
  | 'rank'
  | 'family'
  | 'parent'
  | 'maker'
  | 'ranker'
  | 'truncation'
>;

/** Memory for worlds of that problem. */
export function createMemory(problem: Problem): Memory {
  return {
    problem,
    space: createSpace(problem.genes),
    archive: createArchive(archiveGrid(problem)),
    near: createNearMisses(nearMissGrid(problem)),
    sample: createSampler(problem.genes.length, problem.objectives.length, ISLAND_SAMPLE),
    rows: undefined,
    seen: new Uint32Array(0),
  };
}

/** Opens an island with room for `guests` more rows. The world that was opened in the memory before is lost. */
export function openWorld(memory: Memory, island: Island, guests: number, watch: Watch | undefined): World {
  const { problem, space, archive, near, sample } = memory;
  const n = problem.genes.length;
  const m = problem.objectives.length;
  const limits = problem.limits.length;
  const trial = island.epoch < island.plan.trialEpochs && problem.families.names.length > 1;
  const keep = trial ? Math.max(island.plan.population, NICHE * island.families.length) : island.plan.population;
  const batch = Math.max(1, Math.round(keep * BATCH_SHARE));
  const capacity = Math.max(keep, island.population.count) + Math.max(guests, keep);
  archive.clear();
  insertAll(archive, island.archive);
  near.clear();
  insertAllNearMisses(near, island.nearMisses);
  sample.clear();
  sample.addAll(island.sample);
  const world: World = {
    problem,
    island,
    watch,
    space,
    n,
    m,
    limits,
    keep,
    ...emptyRows(memory, capacity, batch),
    archive,
    near,
    sample,
    seen: copySeen(memory, island.seen),
    random: restoreRandom(island.random),
    shares: island.shares.slice(),
    ceilings: ceilingsFor(space),
    quality: island.quality.slice(),
    tried: new Float64Array(island.shares.length),
    earned: new Float64Array(island.shares.length),
    violationSum: island.violationSum.slice(),
    violationCount: island.violationCount.slice(),
    record: {
      evaluated: island.record.evaluated.slice(),
      feasible: island.record.feasible.slice(),
      best: island.record.best.slice(),
      violated: island.record.violated.slice(),
    },
    counters: { ...island.counters },
    entries: 0,
    count: 0,
    trial,
    relaxation: island.relaxation,
    relaxedGenerations: island.relaxedGenerations,
    stalled: island.stalled,
  };
  addRows(world, island.population);
  world.coordinates.set(island.coordinates);
  for (let c = 0; c < m; c++) findChampion(world, c);
  return world;
}

/** Rows as if new: none of what another world left in them can be told from a first use. */
function emptyRows(memory: Memory, capacity: number, batch: number): Rows {
  const { rows } = memory;
  if (rows?.capacity !== capacity || rows.batch !== batch) {
    memory.rows = newRows(memory.problem, capacity, batch);
    return memory.rows;
  }
  const { genes, coordinates, stride, violations, total, rank, family } = rows;
  for (const array of [genes, coordinates, stride, violations, total, rank, family]) array.fill(0);
  rows.objectives.fill(Number.POSITIVE_INFINITY);
  rows.parent.fill(-1);
  rows.maker.fill(-1);
  return rows;
}

function newRows(problem: Problem, capacity: number, batch: number): Rows {
  const n = problem.genes.length;
  const m = problem.objectives.length;
  const rows = capacity + m + batch;
  return {
    capacity,
    batch,
    genes: new Float64Array(rows * n),
    coordinates: new Float64Array(rows * n),
    stride: new Float64Array(rows * n),
    objectives: new Float64Array(rows * m).fill(Number.POSITIVE_INFINITY),
    violations: new Float64Array(capacity * problem.limits.length),
    total: new Float64Array(rows),
    rank: new Int32Array(capacity),
    family: new Int32Array(capacity),
    parent: new Int32Array(capacity).fill(-1),
    maker: new Int32Array(capacity).fill(-1),
    ranker: createConstrainedRanker(capacity, m),
    truncation: createTruncation(capacity, m),
  };
}

function copySeen(memory: Memory, seen: Uint32Array): Uint32Array {
  if (memory.seen.length !== seen.length) memory.seen = new Uint32Array(seen.length);
  memory.seen.set(seen);
  return memory.seen;
}

/** Moves in proportion need a quantity to be in proportion with. */
function ceilingsFor(space: Space): readonly number[] {
  const some = space.live.some((g) => isQuantity(space, g));
  return OPERATORS.map((name, k) => (name === 'proportion' && !some ? 0 : CEILINGS[k]));
}

/** Sets the champion of objective c from the archive that was brought along. */
function findChampion(world: World, c: number): void {
  const { m, n, capacity } = world;
  const { count, genes, objectives } = world.island.archive;
  let best = 0;
  for (let k = 1; k < count; k++) if (objectives[k * m + c] < objectives[best * m + c]) best = k;
  if (count === 0) return;
  for (let k = 0; k < m; k++) world.objectives[(capacity + c) * m + k] = objectives[best * m + k];
  toCoordinates(world.space, genes, best * n, world.coordinates, (capacity + c) * n);
}

/** True when every objective of a row is finite and no violation NaN. */
export function computable(world: World, row: number): boolean {
  const { m, limits, objectives, violations } = world;
  for (let c = 0; c < m; c++) if (!Number.isFinite(objectives[row * m + c])) return false;
  for (let k = 0; k < limits; k++) if (Number.isNaN(violations[row * limits + k])) return false;
  return true;
}

/** Appends evaluated designs to the population. */
export function addRows(world: World, designs: Designs): void {
  const { n, m, limits, count } = world;
  world.genes.set(designs.genes.subarray(0, designs.count * n), count * n);
  world.objectives.set(designs.objectives.subarray(0, designs.count * m), count * m);
  world.violations.set(designs.violations.subarray(0, designs.count * limits), count * limits);
  for (let row = count; row < count + designs.count; row++) {
    toCoordinates(world.space, world.genes, row * n, world.coordinates, row * n);
    world.total[row] = computable(world, row) ? 0 : Number.POSITIVE_INFINITY;
    world.family[row] = world.problem.families.of(world.genes.subarray(row * n, row * n + n));
  }
  world.count += designs.count;
}

/** Closes the world into the island's next state, which is in part a view of the world's memory: good until another world is opened there. */
export function closeWorld(world: World): Island {
  const { n, m, limits, count, island } = world;
  return {
    plan: island.plan,
    index: island.index,
    epoch: island.epoch + 1,
    random: world.random.state(),
    families: island.families,
    coordinates: world.coordinates.subarray(0, count * n),
    population: {
      count,
      genes: world.genes.subarray(0, count * n),
      objectives: world.objectives.subarray(0, count * m),
      violations: world.violations.subarray(0, count * limits),
    },
    archive: packArchive(world.archive),
    nearMisses: packNearMisses(world.near),
    sample: world.sample.view(),
    seen: world.seen,
    shares: world.shares,
    quality: world.quality,
    violationSum: world.violationSum,
    violationCount: world.violationCount,
    relaxation: world.relaxation,
    relaxedGenerations: world.relaxedGenerations,
    stalled: world.stalled,
    counters: { ...world.counters },
    record: world.record,
  };
}
