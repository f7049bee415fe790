/** Findings of shards that nobody searched: designs scattered around a curved front, for tests and benches of merging. */
import { createMerger, NO_SAMPLE } from '../../optimizer/index.ts';
import type { Problem } from '../../optimizer/problem.ts';
import type { Found } from '../../runners/run-folder/found.ts';

/** What a synthetic shard is like. */
export interface SyntheticShard {
  readonly shard: number;
  readonly shards: number;
  /** Feasible designs shown to its archive; an eighth as many near misses beside. */
  readonly designs: number;
  /** Rows of its history. */
  readonly epochs: number;
}

/**
 * Findings of one shard: the same for the same arguments. Objectives lie at 1 … 1.5 times the distance of a sphere about the ideal point through half the
 * reference (the shape of DTLZ2: Deb, Thiele, Laumanns, Zitzler 2002); genes are only there to tell designs apart.
 */
export function syntheticFound(problem: Problem, { shard, shards, designs, epochs }: SyntheticShard): Found {
  const next = randomFrom(shard + 1);
  const merger = createMerger(problem);
  const misses = Math.ceil(designs / 8);
  const good = scatter(problem, next, designs, 0);
  merger.add({
    archive: good.designs,
    nearMisses: { ...scatter(problem, next, misses, 0.1).designs, limit: new Int32Array(misses) },
    sample: good.sample,
  });
  const source = {
    seed: '1',
    shards,
    shard,
    epoch: epochs,
    evaluations: 100 * epochs,
    feasible: 50 * epochs,
    history: Array.from({ length: epochs }, (_, i) => historyRow(i + 1)),
    went: {
      islands: 2,
      duplicates: shard + 5,
      restarts: 0,
      notComputable: 0,
      operatorShares: { crossover: 0.5, differential: 0.5 },
    },
  };
  return {
    railHash: 'r',
    partsHash: 'p',
    sources: [source],
    archive: merger.archive(),
    nearMisses: merger.nearMisses(),
    sample: merger.sample(),
  };
}

function historyRow(epoch: number) {
  const hypervolume = 0.8 * (1 - 1 / (1 + epoch));
  return { epoch, evaluations: 100 * epoch, feasible: 0.5, frontSize: epoch, hypervolume, islands: [hypervolume, 0.7] };
}

/** Designs with their sample; all break the first limit by `miss`. */
function scatter(problem: Problem, next: () => number, count: number, miss: number) {
  const [n, m, k] = [problem.genes.length, problem.objectives.length, problem.limits.length];
  const designs = {
    count,
    genes: Float64Array.from({ length: count * n }, next),
    objectives: new Float64Array(count * m),
    violations: new Float64Array(count * k),
  };
  const keys = Float64Array.from({ length: count }, () => Math.floor(next() * 2 ** 53)).sort();
  for (let row = 0; row < count; row++) {
    if (k > 0) designs.violations[row * k] = miss;
    const direction = problem.objectives.map(() => next() + 1e-3);
    const length = Math.hypot(...direction);
    const distance = (0.5 * (1 + 0.5 * next() * next())) / length;
    problem.objectives.forEach(({ ideal, reference }, c) => {
      designs.objectives[row * m + c] = ideal + (reference - ideal) * distance * (direction[c] ?? 0);
    });
  }
  const sample = { ...NO_SAMPLE, count, keys, objectives: designs.objectives, family: new Int32Array(count) };
  return { designs, sample };
}

/** Numbers from 0 (inclusive) to 1 (exclusive), the same for the same seed (mulberry32). */
function randomFrom(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}
