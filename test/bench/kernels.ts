/**
 * Times the optimizer's kernels, each beside its plain version in the same process: machines differ, the ratio much less. One thread; medians
 * after warming up.
 */
import { createArchive } from '../../optimizer/archive/index.ts';
import { createChosenSet } from '../../optimizer/hypervolume/chosen-set.ts';
import {
  createContributions,
  createHypervolume,
  createTruncation,
  selectSubset,
} from '../../optimizer/hypervolume/index.ts';
import { createRanker } from '../../optimizer/ranking/index.ts';
import { allRows, cube, sphere } from '../optimizer/oracles/points.ts';
import { archivePlainly, sortPlainly, volumePlainly } from './plain.ts';

/** One line of the timing table. */
export interface Row {
  readonly work: string;
  /** Median time of the kernel, milliseconds. */
  readonly ms: number;
  /** Time of the plain version in the same run, milliseconds; NaN when it was left out. */
  readonly plainMs: number;
  /** plainMs / ms: how many times faster the kernel is. */
  readonly ratio: number;
  /** What `ms` must reach on the class of machine the targets were set on; NaN where none was set. */
  readonly target: number;
}

/** What to time. */
export interface KernelBenchOptions {
  /** Leaves out the plain versions that take seconds (20,000 rows). Default false. */
  readonly skipLongPlain?: boolean;
}

/** A piece of work and its plain version. */
interface Case {
  readonly work: string;
  readonly target: number;
  /** Does the work once on data set 0, 1 or 2. */
  run(set: number): void;
  plain(): void;
  /** Calls of `run` that are timed, after as many to warm up. */
  readonly repeats: number;
  /** Whether `plain` takes long: then it runs once, else the median of 5 after 5 to warm up counts. */
  readonly longPlain: boolean;
}

/** Times all kernels; about half a minute, a few seconds without the long plain versions. */
export function timeKernels(options: KernelBenchOptions = {}): Row[] {
  return [...sortCases(), ...volumeCases(), ...selectionCases(), ...archiveCases()].map((each) => {
    for (let k = 0; k < each.repeats; k++) each.run(k % 3);
    const ms = median(each.repeats, (k) => each.run(k % 3));
    const skip = each.longPlain && options.skipLongPlain === true;
    if (!each.longPlain) for (let k = 0; k < 5; k++) each.plain();
    const plainMs = skip ? Number.NaN : median(each.longPlain ? 1 : 5, () => each.plain());
    return { work: each.work, ms, plainMs, ratio: plainMs / ms, target: each.target };
  });
}

function sortCases(): Case[] {
  const list: readonly (readonly [number, number, 'cube' | 'one front', number])[] = [
    [200, 3, 'cube', 0.06],
    [200, 3, 'one front', 0.06],
    [1000, 2, 'cube', 0.1],
    [1000, 3, 'cube', 0.4],
    [1000, 4, 'cube', 0.6],
    [20000, 2, 'cube', 3],
    [20000, 3, 'cube', 20],
    [20000, 4, 'cube', 32],
    [20000, 3, 'one front', 12],
  ];
  return list.map(([n, m, kind, target]) => {
    const sets = [1, 2, 3].map((seed) => (kind === 'cube' ? cube(n, m, seed) : sphere(n, m, seed)));
    const ranker = createRanker(n, m);
    const ranks = new Int32Array(n);
    return {
      work: `sort N=${n}, m=${m}, ${kind}`,
      target,
      run: (set) => ranker.rank(sets[set], n, ranks),
      plain: () => sortPlainly(sets[0], m, n, ranks),
      repeats: n > 5000 ? 15 : 600,
      longPlain: n > 5000,
    };
  });
}

function volumeCases(): Case[] {
  const list: readonly (readonly [number, number, number])[] = [
    [1000, 2, 0.12],
    [1000, 3, 0.3],
    [1000, 4, 3],
    [10000, 3, 4],
  ];
  return list.map(([n, m, target]) => {
    const sets = [1, 2, 3].map((seed) => sphere(n, m, seed));
    const measure = createHypervolume(n, m);
    const reference = new Float64Array(m).fill(1.1);
    const rows = allRows(n);
    return {
      work: `hypervolume N=${n}, m=${m}, one front`,
      target,
      run: (set) => measure.volume(sets[set], rows, n, reference),
      plain: () => volumePlainly(sets[0], m, n, 1.1),
      repeats: 90,
      longPlain: m === 4 || n > 5000,
    };
  });
}

function selectionCases(): Case[] {
  return [
    leastCase(3, 0.015),
    leastCase(2, 0.015),
    leastCase(4, Number.NaN),
    truncationCase(3),
    truncationCase(4),
    subsetCase(),
  ];
}

/** Steady state: the one of 101 rows to drop. Plain: one hypervolume for every row left out. */
function leastCase(m: number, target: number): Case {
  const n = 101;
  const sets = [1, 2, 3].map((seed) => sphere(n, m, seed));
  const reference = new Float64Array(m).fill(1.1);
  const rows = allRows(n);
  const contributions = createContributions(n, m);
  const values = new Float64Array(n);
  const measure = createHypervolume(n, m);
  return {
    work: `contributions N=${n}, m=${m}, one front`,
    target,
    run: (set) => contributions.measure(sets[set], rows, n, reference, values),
    plain: () => {
      for (let i = 0; i < n; i++)
        measure.volume(
          sets[0],
          rows.filter((row) => row !== i),
          n - 1,
          reference,
        );
    },
    repeats: m === 4 ? 60 : 1500,
    longPlain: false,
  };
}

/** One generation: 200 rows down to 100. Plain: all contributions anew after every removal. */
function truncationCase(m: number): Case {
  const [n, keep] = [200, 100];
  const sets = [1, 2, 3].map((seed) => sphere(n, m, seed));
  const reference = new Float64Array(m).fill(1.1);
  const truncation = createTruncation(n, m);
  const contributions = createContributions(n, m);
  const values = new Float64Array(n);
  const rows = allRows(n);
  return {
    work: `truncation ${n} to ${keep}, m=${m}, one front`,
    target: m === 3 ? 1 : Number.NaN,
    run: (set) => {
      for (let i = 0; i < n; i++) rows[i] = i;
      truncation.truncate(sets[set], rows, n, keep, reference);
    },
    plain: () => {
      let left = allRows(n);
      while (left.length > keep) {
        contributions.measure(sets[0], left, left.length, reference, values);
        const least = values.subarray(0, left.length).indexOf(Math.min(...values.subarray(0, left.length)));
        left = left.filter((_, i) => i !== least);
      }
    },
    repeats: m === 4 ? 15 : 150,
    longPlain: false,
  };
}

/** End of a run: the best 100 of an archive. Plain: greedy inclusion with every gain measured at every step, and no exchange. */
function subsetCase(): Case {
  const [n, keep, m] = [5000, 100, 3];
  const sets = [1, 2, 3].map((seed) => sphere(n, m, seed));
  const reference = new Float64Array(m).fill(1.1);
  const rows = allRows(n);
  return {
    work: `subset ${keep} of ${n}, m=${m}, with exchange`,
    target: 1000,
    run: (set) => selectSubset(sets[set], rows, n, keep, reference, m),
    plain: () => {
      const chosen = createChosenSet(sets[0], m, keep, reference);
      for (let k = 0; k < keep; k++) {
        let best = 0;
        let at = 0;
        for (let i = 0; i < n; i++) {
          const gain = chosen.gain(i);
          if (gain > best) [best, at] = [gain, i];
        }
        chosen.add(at);
      }
    },
    repeats: 3,
    longPlain: false,
  };
}

function archiveCases(): Case[] {
  const [n, m, genes, resolution] = [20000, 3, 10, 0.01];
  const sets = [1, 2, 3].map((seed) => {
    const front = sphere(n, m, seed);
    const worse = cube(n, 1, seed + 10);
    return front.map((value, k) => value * (1 + 0.3 * worse[Math.floor(k / m)]));
  });
  const geneRows = cube(n, genes, 4);
  const none = new Float64Array(0);
  const grid = {
    genes,
    objectives: m,
    violations: 0,
    ideal: new Float64Array(m),
    resolution: new Float64Array(m).fill(resolution),
  };
  return [
    {
      work: `archive, ${n} designs shown, m=${m}`,
      target: Number.NaN,
      run: (set) => {
        const archive = createArchive(grid);
        for (let i = 0; i < n; i++) archive.insert(geneRows, sets[set], none, i);
      },
      plain: () => archivePlainly(sets[0], m, n, resolution),
      repeats: 6,
      longPlain: true,
    },
  ];
}

function median(repeats: number, work: (k: number) => void): number {
  const times = Array.from({ length: repeats }, (_, k) => {
    const start = performance.now();
    work(k);
    return performance.now() - start;
  });
  return times.sort((a, b) => a - b)[repeats >> 1];
}
