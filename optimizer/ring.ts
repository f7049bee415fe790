/** Migration along a closed ring: what island i receives at epoch e comes from its neighbours at epoch e − 1. */
import type { Designs } from './archive/index.ts';
import type { Island } from './island.ts';
import { IMMIGRATION } from './settings.ts';

/** No designs at all. */
export const NO_DESIGNS: Designs = {
  count: 0,
  genes: new Float64Array(0),
  objectives: new Float64Array(0),
  violations: new Float64Array(0),
};

/**
 * Designs that island i receives for its next epoch, given all islands of the ring after the last one: some of each neighbour's archive,
 * evenly picked along its canonical order. None while families are tried by themselves and none in a ring of one.
 */
export function immigrantsFor(islands: readonly Island[], i: number): Designs {
  const count = islands.length;
  const { epoch, plan } = islands[i];
  if (count < 2 || epoch === 0 || epoch < plan.trialEpochs) return NO_DESIGNS;
  const left = (i + count - 1) % count;
  const right = (i + 1) % count;
  const wanted = Math.max(1, Math.round(plan.population * IMMIGRATION));
  const first = evenly(islands[left], wanted, epoch);
  return left === right ? first : joinDesigns([first, evenly(islands[right], wanted, epoch)]);
}

/** All rows of several sets of the same widths, one after the other. */
export function joinDesigns(sets: readonly Designs[]): Designs {
  return {
    count: sets.reduce((sum, set) => sum + set.count, 0),
    genes: join(sets.map((set) => set.genes)),
    objectives: join(sets.map((set) => set.objectives)),
    violations: join(sets.map((set) => set.violations)),
  };
}

/** Rows `rows` of a set. */
export function pickDesigns(from: Designs, rows: ArrayLike<number>): Designs {
  return {
    count: rows.length,
    genes: pick(from.genes, from.count, rows),
    objectives: pick(from.objectives, from.count, rows),
    violations: pick(from.violations, from.count, rows),
  };
}

/** Every k-th member of the archive, beginning at another one each epoch. */
function evenly(island: Island, wanted: number, epoch: number): Designs {
  const from = island.archive;
  const count = Math.min(wanted, from.count);
  const rows = Array.from({ length: count }, (_, k) => {
    const offset = (epoch * 7) % Math.max(1, Math.floor(from.count / count));
    return (Math.floor((k * from.count) / count) + offset) % from.count;
  });
  return pickDesigns(from, rows);
}

function join(arrays: readonly Float64Array[]): Float64Array {
  const joined = new Float64Array(arrays.reduce((sum, array) => sum + array.length, 0));
  let at = 0;
  for (const array of arrays) {
    joined.set(array, at);
    at += array.length;
  }
  return joined;
}

function pick(from: Float64Array, count: number, rows: ArrayLike<number>): Float64Array {
  const width = count === 0 ? 0 : from.length / count;
  const picked = new Float64Array(rows.length * width);
  for (let k = 0; k < rows.length; k++) {
    for (let c = 0; c < width; c++) picked[k * width + c] = from[rows[k] * width + c];
  }
  return picked;
}
