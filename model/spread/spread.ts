/** What spread a design's figures have: yield of each limit and of all, percentiles of objectives, which tolerance matters. */
import type { RailProblem } from '../problem.ts';
import { CAUSES, drawSamples, type SampleLayout, sampleLayout } from './sample.ts';

/** A share with the interval in which the true one lies, 95 times in 100. */
export interface Yield {
  readonly name: string;
  readonly share: number;
  readonly low: number;
  readonly high: number;
}

/** Percentiles of one objective. */
export interface Percentiles {
  readonly name: string;
  readonly unit: string;
  readonly mean: number;
  readonly p5: number;
  readonly p50: number;
  readonly p95: number;
}

/** How much of a figure's variance goes with each cause: squared correlation; the rest is interplay and bend. */
export interface VarianceShares {
  readonly figure: string;
  readonly shares: readonly { readonly cause: string; readonly share: number }[];
}

/** The spread of one design. */
export interface Spread {
  readonly id: string;
  readonly samples: number;
  readonly seed: string;
  /** All limits together, then every limit that is missed at least once. */
  readonly yields: readonly Yield[];
  readonly objectives: readonly Percentiles[];
  /** Of each objective that varies, and of the tightest limit's slack. */
  readonly variance: readonly VarianceShares[];
}

/** The spread of the design of snapped `genes` from `samples` samples, drawn here. */
export function spreadOf(problem: RailProblem, genes: Float64Array, samples: number, seed: string): Spread {
  return summarise(problem, genes, drawSamples(problem, genes, seed, 0, samples), seed);
}

/** The spread that `rows` (all samples in order, see `drawSamples`) show. */
export function summarise(problem: RailProblem, genes: Float64Array, rows: Float64Array, seed: string): Spread {
  const layout = sampleLayout(problem);
  const samples = rows.length / layout.width;
  const first = layout.causes + layout.chokes;
  const column = (place: number): Float64Array =>
    Float64Array.from({ length: samples }, (_, i) => rows[i * layout.width + place]);
  const slacks = problem.limits.map((_, k) => column(first + k));
  const objectives = problem.objectives.map((_, k) => column(first + layout.limits + k));
  // A limit on a whole number that just holds is no risk, and would hide the one that is.
  const fine = slacks.filter(
    (slack, k) => problem.limitDefinitions[k].whole !== true || slack.some((value) => value < 0),
  );
  const tightest = worstSlack(fine, samples);
  const figures = [
    ...problem.objectives.map(({ name }, k) => ({ name, values: objectives[k] })),
    { name: 'tightest limit', values: tightest },
  ];
  return {
    id: problem.id(genes),
    samples,
    seed,
    yields: yieldsOf(problem, slacks, samples),
    objectives: problem.objectives.map(({ name, unit }, k) => percentiles(name, unit, objectives[k])),
    variance: figures
      .map(({ name, values }) => variance(name, values, layout, column))
      .filter(({ shares }) => shares.length > 0),
  };
}

function yieldsOf(problem: RailProblem, slacks: readonly Float64Array[], samples: number): Yield[] {
  let all = 0;
  for (let i = 0; i < samples; i++) if (slacks.every((slack) => slack[i] >= 0)) all++;
  const each = problem.limits.map((name, k) => wilson(name, slacks[k].filter((slack) => slack >= 0).length, samples));
  return [wilson('all limits', all, samples), ...each.filter(({ share }) => share < 1)];
}

/** 97.5th percentile of the normal distribution. */
const Z = 1.959964;

/**
 * Share of `good` in `samples` with Wilson's score interval (1927).
 * @derivation the shares p with (good/n − p)² ≤ z²·p·(1 − p)/n: a quadratic in p
 * @valid samples ≥ 1
 */
function wilson(name: string, good: number, samples: number): Yield {
  const share = good / samples;
  const z2 = Z * Z;
  const middle = (share + z2 / (2 * samples)) / (1 + z2 / samples);
  const half = (Z / (1 + z2 / samples)) * Math.sqrt((share * (1 - share)) / samples + z2 / (4 * samples * samples));
  return { name, share, low: Math.max(0, middle - half), high: Math.min(1, middle + half) };
}

function percentiles(name: string, unit: string, values: Float64Array): Percentiles {
  const sorted = Float64Array.from(values).sort();
  const at = (p: number): number => sorted[Math.min(sorted.length - 1, Math.floor(p * sorted.length))];
  return {
    name,
    unit,
    mean: values.reduce((a, b) => a + b, 0) / values.length,
    p5: at(0.05),
    p50: at(0.5),
    p95: at(0.95),
  };
}

function worstSlack(slacks: readonly Float64Array[], samples: number): Float64Array {
  return Float64Array.from({ length: samples }, (_, i) =>
    slacks.reduce((low, slack) => Math.min(low, slack[i]), Number.POSITIVE_INFINITY),
  );
}

/** Chance alone gives a squared correlation of about 1/n: what is below some of that is not told. */
const CHANCE = 10;

/** Squared correlation of each cause with `values`; single chokes are added up. Empty where nothing varies. */
function variance(
  figure: string,
  values: Float64Array,
  layout: SampleLayout,
  column: (place: number) => Float64Array,
): VarianceShares {
  const shares = CAUSES.map((cause, c) => {
    if (cause !== 'inductance') return { cause, share: correlation(column(c), values) };
    let share = 0;
    for (let j = 0; j < layout.chokes; j++) {
      const own = correlation(column(layout.causes + j), values);
      if (own > CHANCE / values.length) share += own;
    }
    return { cause, share };
  });
  const least = CHANCE / values.length;
  const told = shares.filter(({ share }) => share > least).sort((a, b) => b.share - a.share);
  return { figure, shares: told };
}

/**
 * Squared correlation.
 * @derivation squared correlation of two samples: the share of variance that a straight line explains
 * @valid two values or more
 */
function correlation(x: Float64Array, y: Float64Array): number {
  const n = x.length;
  const mx = x.reduce((a, b) => a + b, 0) / n;
  const my = y.reduce((a, b) => a + b, 0) / n;
  let [xx, xy, yy] = [0, 0, 0];
  for (let i = 0; i < n; i++) {
    xx += (x[i] - mx) * (x[i] - mx);
    xy += (x[i] - mx) * (y[i] - my);
    yy += (y[i] - my) * (y[i] - my);
  }
  return xx > 0 && yy > 1e-24 * my * my * n ? (xy * xy) / (xx * yy) : 0;
}
