/** What comes out of islands: the merged front, near misses, a choice of members, and how good a front is. */
import {
  createArchive,
  createNearMisses,
  type Designs,
  insertAll,
  insertAllNearMisses,
  type NearMissDesigns,
  packArchive,
  selectNearMisses,
} from './archive/index.ts';
import { createHypervolume, selectSubset } from './hypervolume/index.ts';
import type { FamilyRecord, Island } from './island.ts';
import type { Problem } from './problem.ts';
import { pickDesigns } from './ring.ts';
import { archiveGrid, nearMissGrid } from './world.ts';

/** The front of all archives together, in canonical order; the same bytes in whatever order the islands or fronts come. */
export function mergeArchives(problem: Problem, parts: readonly (Island | Designs)[]): Designs {
  const archive = createArchive(archiveGrid(problem));
  for (const part of parts) insertAll(archive, 'archive' in part ? part.archive : part);
  return packArchive(archive);
}

/** The near misses of all islands together that no design of `front` dominates. */
export function mergeNearMisses(
  problem: Problem,
  parts: readonly (Island | Designs)[],
  front: Designs,
): NearMissDesigns {
  const near = createNearMisses(nearMissGrid(problem));
  for (const part of parts) insertAllNearMisses(near, 'nearMisses' in part ? part.nearMisses : part);
  return selectNearMisses(near, front);
}

/** What became of each family over all islands together. */
export function mergeRecords(islands: readonly Island[]): FamilyRecord {
  const add = (pick: (record: FamilyRecord) => Float64Array, join: (a: number, b: number) => number): Float64Array =>
    islands
      .slice(1)
      .reduce(
        (all, { record }) => all.map((value, k) => join(value, pick(record)[k])),
        islands.length === 0 ? new Float64Array(0) : pick(islands[0].record).slice(),
      );
  const sum = (a: number, b: number): number => a + b;
  return {
    evaluated: add((record) => record.evaluated, sum),
    feasible: add((record) => record.feasible, sum),
    best: add((record) => record.best, Math.min),
    violated: add((record) => record.violated, sum),
  };
}

/** How far islands agree: hypervolume of each one's archive over that of the merged front, 0 … 1. */
export function agreementOf(problem: Problem, islands: readonly Island[], front: Designs): number[] {
  const whole = hypervolumeOf(problem, front);
  return islands.map((island) => (whole > 0 ? hypervolumeOf(problem, island.archive) / whole : 0));
}

/**
 * The `count` members of a front that together keep most of its hypervolume, in the front's order. The reference lies a tenth of the front's own
 * range beyond its worst values (or at `reference`, m values, if given).
 */
export function chooseSubset(front: Designs, count: number, reference?: Float64Array): Designs {
  if (front.count <= count || front.count === 0) return front;
  const m = front.objectives.length / front.count;
  const rows = Int32Array.from({ length: front.count }, (_, row) => row);
  const chosen = selectSubset(front.objectives, rows, front.count, count, reference ?? beyond(front, m), m);
  return chosen === undefined ? front : pickDesigns(front, chosen);
}

/** Hypervolume of a front as a part of the box between the problem's ideal and reference values, 0 … 1. */
export function hypervolumeOf(problem: Problem, front: Designs): number {
  return createMeasure(problem)(front);
}

/** `hypervolumeOf` for one problem, with memory of its own: for many fronts, one after the other. */
export function createMeasure(problem: Problem): (front: Designs) => number {
  const { objectives } = problem;
  const m = objectives.length;
  const corner = new Float64Array(m).fill(1);
  let hypervolume = createHypervolume(1, m);
  let scaled = new Float64Array(m);
  let rows = new Int32Array(1);
  return (front) => {
    if (front.count > hypervolume.capacity) {
      const capacity = 2 * front.count;
      hypervolume = createHypervolume(capacity, m);
      scaled = new Float64Array(capacity * m);
      rows = Int32Array.from({ length: capacity }, (_, row) => row);
    }
    for (let row = 0; row < front.count; row++) {
      for (let c = 0; c < m; c++) {
        const { ideal, reference } = objectives[c];
        scaled[row * m + c] = Math.max(0, (front.objectives[row * m + c] - ideal) / (reference - ideal));
      }
    }
    return hypervolume.volume(scaled, rows, front.count, corner);
  };
}

function beyond(front: Designs, m: number): Float64Array {
  const reference = new Float64Array(m);
  for (let c = 0; c < m; c++) {
    let low = Number.POSITIVE_INFINITY;
    let high = Number.NEGATIVE_INFINITY;
    for (let row = 0; row < front.count; row++) {
      low = Math.min(low, front.objectives[row * m + c]);
      high = Math.max(high, front.objectives[row * m + c]);
    }
    reference[c] = high + (high > low ? 0.1 * (high - low) : 1);
  }
  return reference;
}
