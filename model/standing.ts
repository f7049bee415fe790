/** Where a design stands: who dominates it, how far the front is, and the cheapest single change that helps. */
import type { Placed } from './prices.ts';
import type { RailProblem } from './problem.ts';

/** Fraction by which an objective must differ to count as better or worse. */
const TELLING = 1e-3;
/** Values tried of a gene on a logarithmic line, as factors. */
const FACTORS = [0.5, 0.7, 0.8, 0.9, 1.1, 1.25, 1.4, 2];

/** How far the front is in one objective. */
export interface Distance {
  readonly objective: string;
  readonly unit: string;
  readonly value: number;
  /** Best of the front at no more of every other objective; the value itself where the front has no such design. */
  readonly front: number;
}

/** One gene changed. */
export interface Change {
  readonly gene: string;
  readonly from: string;
  readonly to: string;
  readonly feasible: boolean;
  readonly objectives: readonly number[];
  /** Currency, whole design, before and after. */
  readonly costBefore: number;
  readonly costAfter: number;
}

/** A design's standing. */
export interface Standing {
  readonly dominatedBy: readonly string[];
  readonly distances: readonly Distance[];
  /** Absent where no single change helps. */
  readonly change?: Change;
}

/** Where the design of snapped `genes` stands against `front`. */
export function standingOf(problem: RailProblem, genes: Float64Array, front: readonly Placed[]): Standing {
  const own = judged(problem, genes);
  const change = cheapestChange(problem, genes, own);
  const id = problem.id(genes);
  return {
    dominatedBy: front
      .filter((other) => other.id !== id && dominates(other.objectives, own.objectives))
      .map((other) => other.id),
    distances: problem.objectives.map(({ name, unit }, k) => {
      const rivals = front.filter(({ objectives }) =>
        objectives.every((value, j) => j === k || value <= own.objectives[j]),
      );
      const best = rivals.reduce((low, { objectives }) => Math.min(low, objectives[k]), own.objectives[k]);
      return { objective: name, unit, value: own.objectives[k], front: best };
    }),
    ...(change === undefined ? {} : { change }),
  };
}

interface Judged {
  readonly objectives: readonly number[];
  /** Sum of the fractions by which limits are missed. */
  readonly missed: number;
}

function judged(problem: RailProblem, genes: Float64Array): Judged {
  const objectives = new Float64Array(problem.objectives.length);
  const violations = new Float64Array(problem.limits.length);
  problem.evaluate(genes, objectives, violations);
  return { objectives: [...objectives], missed: violations.reduce((a, b) => a + b, 0) };
}

/** The helpful single change after which the design costs least; undefined where none helps. */
function cheapestChange(problem: RailProblem, genes: Float64Array, own: Judged): Change | undefined {
  const costOf = (of: Float64Array): number => problem.assess(of).costs.reduce((sum, { value }) => sum + value, 0);
  const helpful = singleChanges(problem, genes)
    .map((one) => ({ ...one, after: judged(problem, one.genes) }))
    .filter(({ after }) => helps(own, after));
  const whole = helpful.filter(({ after }) => after.missed === 0);
  const chosen = whole.length > 0 ? whole : leastMissed(helpful);
  let best: Change | undefined;
  const costBefore = costOf(genes);
  for (const { gene, genes: changed, after } of chosen) {
    const costAfter = costOf(changed);
    if (best !== undefined && costAfter >= best.costAfter) continue;
    const texts = { from: textOf(problem, genes, gene), to: textOf(problem, changed, gene) };
    best = {
      gene: problem.genes[gene].name,
      ...texts,
      feasible: after.missed === 0,
      objectives: after.objectives,
      costBefore,
      costAfter,
    };
  }
  return best;
}

/** Of changes that still miss a limit only the one that misses least. */
function leastMissed<T extends { readonly after: Judged }>(changes: readonly T[]): readonly T[] {
  const least = changes.reduce((low, { after }) => Math.min(low, after.missed), Number.POSITIVE_INFINITY);
  return changes.filter(({ after }) => after.missed === least).slice(0, 1);
}

/** Whether a change helps: fewer limits missed, or with all kept some objective better and none worse. */
function helps(before: Judged, after: Judged): boolean {
  if (!after.objectives.every(Number.isFinite) || !Number.isFinite(after.missed)) return false;
  if (before.missed > 0) return after.missed < before.missed;
  if (after.missed > 0) return false;
  const better = after.objectives.some((value, k) => value < before.objectives[k] * (1 - TELLING));
  return better && after.objectives.every((value, k) => value <= before.objectives[k] * (1 + TELLING));
}

function singleChanges(problem: RailProblem, genes: Float64Array): { gene: number; genes: Float64Array }[] {
  const seen = new Set([String(genes)]);
  return problem.genes.flatMap(({ kind, low, high }, gene) => {
    const values =
      kind === 'log' || kind === 'real'
        ? FACTORS.map((factor) => factor * genes[gene])
        : Array.from({ length: high - low + 1 }, (_, i) => low + i);
    return values.flatMap((value) => {
      const changed = Float64Array.from(genes);
      changed[gene] = value;
      problem.snap(changed);
      const key = String(changed);
      if (seen.has(key)) return [];
      seen.add(key);
      return [{ gene, genes: changed }];
    });
  });
}

function textOf(problem: RailProblem, genes: Float64Array, gene: number): string {
  const { options, unit } = problem.genes[gene];
  return options?.[genes[gene]] ?? `${genes[gene]} ${unit}`.trim();
}

function dominates(a: readonly number[], b: readonly number[]): boolean {
  return a.every((value, k) => value <= b[k]) && a.some((value, k) => value < b[k]);
}
