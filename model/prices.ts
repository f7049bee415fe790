/** What a requirement costs: for each limit that near misses break by a little, what the objectives would gain if it were relaxed. */

/** A design by its objectives, in the problem's order. */
export interface Placed {
  readonly id: string;
  readonly family: string;
  readonly objectives: readonly number[];
}

/** A design that breaks one limit by a little. */
export interface Miss {
  readonly limit: string;
  /** What it has and what is allowed, in the limit's unit. */
  readonly value: number;
  readonly allowed: number;
  readonly design: Placed;
}

/** What relaxing one limit does to one objective. */
export interface Gain {
  readonly objective: string;
  readonly unit: string;
  /** Best of the front, and best once the limit is relaxed. */
  readonly best: number;
  readonly relaxed: number;
  /** Best of the front at no more of every other objective than the near miss has, and the near miss's own. */
  readonly from: number;
  readonly to: number;
}

/** One line of the table: the limit relaxed so far that one near miss is allowed. */
export interface RequirementPrice {
  readonly limit: string;
  readonly unit: string;
  readonly allowed: number;
  readonly relaxedTo: number;
  /** Fraction of what is allowed. */
  readonly relaxation: number;
  /** The near miss that gains most. */
  readonly design: string;
  readonly family: string;
  readonly gains: readonly Gain[];
}

interface NamedUnit {
  readonly name: string;
  readonly unit: string;
}

/** Where the front's objectives and limits are named. */
export interface PricedFront {
  readonly objectives: readonly NamedUnit[];
  readonly limits: readonly NamedUnit[];
  readonly designs: readonly Placed[];
}

/** Lines for one limit at most: a next one asks for less. */
const LINES = 3;

/** The table, limits by their largest gain; empty where no near miss beats the front. */
export function requirementPrices(front: PricedFront, misses: readonly Miss[]): RequirementPrice[] {
  const names = [...new Set(misses.map((miss) => miss.limit))];
  const groups = names.map((name) =>
    linesOf(
      front,
      misses.filter((miss) => miss.limit === name),
    ),
  );
  return groups.sort((a, b) => largest(b[0]) - largest(a[0])).flat();
}

/** Lines of one limit: the best offer first, then those that ask for less. */
function linesOf(front: PricedFront, misses: readonly Miss[]): RequirementPrice[] {
  const lines = misses.map((miss) => lineOf(front, misses, miss)).filter((line) => largest(line) > 0);
  lines.sort((a, b) => largest(b) - largest(a) || a.relaxation - b.relaxation || (a.design < b.design ? -1 : 1));
  const kept: RequirementPrice[] = [];
  for (const line of lines) {
    if (kept.length < LINES && kept.every((other) => line.relaxation < 0.75 * other.relaxation)) kept.push(line);
  }
  return kept;
}

function lineOf(front: PricedFront, misses: readonly Miss[], miss: Miss): RequirementPrice {
  const relaxation = share(miss);
  const allowed = misses.filter((other) => share(other) <= relaxation);
  const mine = miss.design.objectives;
  const gains = front.objectives.map(({ name, unit }, k): Gain => {
    const best = least(front.designs, k);
    const rivals = front.designs.filter(({ objectives }) =>
      objectives.every((value, j) => j === k || value <= mine[j] * (1 + 1e-9)),
    );
    const own = mine[k];
    const relaxed = Math.min(best, ...allowed.map(({ design }) => design.objectives[k]));
    return { objective: name, unit, best, relaxed, from: least(rivals, k), to: own };
  });
  return {
    limit: miss.limit,
    unit: front.limits.find(({ name }) => name === miss.limit)?.unit ?? '',
    allowed: miss.allowed,
    relaxedTo: miss.value,
    relaxation,
    design: miss.design.id,
    family: miss.design.family,
    gains,
  };
}

function share({ value, allowed }: Miss): number {
  return Math.abs(value - allowed) / (Math.abs(allowed) || 1);
}

function least(designs: readonly Placed[], k: number): number {
  return designs.reduce((low, design) => Math.min(low, design.objectives[k]), Number.POSITIVE_INFINITY);
}

/** Largest gain of a line as a fraction; 0 where it has none. */
function largest(line: RequirementPrice | undefined): number {
  return Math.max(0, ...(line?.gains ?? []).map(gainOf));
}

/** (from − to)/from of one gain at no more of every other objective; 0 where the front has no such design. */
export function gainOf({ from, to }: Gain): number {
  return Number.isFinite(from) && from > 0 ? (from - to) / from : 0;
}
