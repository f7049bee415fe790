/**
 * What a requirement costs: for each limit and each step by which it is relaxed, how the best value of each objective changes, and which one
 * design gains most. It is read from near misses, those of the sweep and those of short searches in which the limit was relaxed.
 */

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
  /** By what fraction it misses: of what is allowed; a temperature of its allowed rise, an efficiency of the losses allowed. */
  readonly violation: number;
  readonly design: Placed;
}

/** Short searches from the front, each with one limit relaxed. */
export interface Relaxations {
  /** By what fractions, ascending, and which limits. */
  readonly steps: readonly number[];
  readonly limits: readonly string[];
  /** Evaluations of each search. */
  readonly evaluations: number;
  /** Designs beside the front that keep every limit: what searching on gives without relaxing anything. */
  readonly level: readonly Placed[];
}

/** What relaxing one limit does to one objective. */
export interface Gain {
  readonly objective: string;
  readonly unit: string;
  /** Best value while every limit holds, and best once the limit is relaxed. */
  readonly best: number;
  readonly relaxed: number;
  /** Best of the front at no more of every other objective than the design named has, and that design's own. */
  readonly from: number;
  readonly to: number;
}

/** One line of the table. */
export interface RequirementPrice {
  readonly limit: string;
  readonly unit: string;
  readonly allowed: number;
  readonly relaxedTo: number;
  /** Fraction by which the limit must be missed for all that the line promises, as violations count. */
  readonly relaxation: number;
  /** The design that gains most at no more of the other objectives. */
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

/** Steps by which a limit is relaxed; the largest is as far as a near miss may miss. */
export const RELAXED_BY: readonly number[] = [0.025, 0.1, 0.25];
/** Fraction below which a gain is no gain. */
const TELLING = 0.0005;

/** The table: limits by their largest gain, each by rising steps; empty where nothing is gained. */
export function requirementPrices(
  front: PricedFront,
  misses: readonly Miss[],
  relaxations?: Relaxations,
): RequirementPrice[] {
  const whole = { ...front, designs: [...front.designs, ...(relaxations?.level ?? [])] };
  const names = [...new Set(misses.map((miss) => miss.limit))];
  const groups = names.map((name) =>
    linesOf(
      whole,
      misses.filter((miss) => miss.limit === name),
    ),
  );
  return groups.sort((a, b) => largest(b) - largest(a)).flat();
}

/** Names of relaxed limits of which no line tells: relaxing them gains nothing. */
export function freeLimits(prices: readonly RequirementPrice[], relaxations: Relaxations): readonly string[] {
  return relaxations.limits.filter((name) => !prices.some(({ limit }) => limit === name));
}

/** Lines of one limit, a step each; a step that gains no more than the one before has none. */
function linesOf(front: PricedFront, misses: readonly Miss[]): RequirementPrice[] {
  const kept: RequirementPrice[] = [];
  for (const step of RELAXED_BY) {
    const line = lineOf(
      front,
      misses.filter(({ violation }) => violation <= step),
    );
    if (line !== undefined && !isSame(line, kept[kept.length - 1])) kept.push(line);
  }
  return kept;
}

function lineOf(front: PricedFront, misses: readonly Miss[]): RequirementPrice | undefined {
  const offers = misses.map((miss) => ({ miss, gains: gainsOf(front, misses, miss) }));
  offers.sort((a, b) => most(b.gains) - most(a.gains) || a.miss.violation - b.miss.violation || byId(a.miss, b.miss));
  const chosen = offers[0];
  if (chosen === undefined || (most(chosen.gains) < TELLING && best(chosen.gains) < TELLING)) return undefined;
  const used = [chosen.miss, ...chosen.gains.flatMap((gain, k) => cheapest(misses, gain, k))];
  const farthest = used.reduce((a, b) => (b.violation > a.violation ? b : a));
  const { limit, design } = chosen.miss;
  return {
    limit,
    unit: front.limits.find(({ name }) => name === limit)?.unit ?? '',
    allowed: farthest.allowed,
    relaxedTo: farthest.value,
    relaxation: farthest.violation,
    design: design.id,
    family: design.family,
    gains: chosen.gains,
  };
}

function gainsOf(front: PricedFront, misses: readonly Miss[], { design }: Miss): Gain[] {
  const mine = design.objectives;
  return front.objectives.map(({ name, unit }, k) => {
    const rivals = front.designs.filter(({ objectives }) =>
      objectives.every((value, j) => j === k || value <= mine[j] * (1 + 1e-9)),
    );
    const held = least(front.designs, k);
    const relaxed = Math.min(held, ...misses.map((miss) => miss.design.objectives[k]));
    return { objective: name, unit, best: held, relaxed, from: least(rivals, k), to: mine[k] };
  });
}

/** Of the misses that reach the relaxed best of objective `k` the one that misses least; none where the best stays. */
function cheapest(misses: readonly Miss[], gain: Gain, k: number): readonly Miss[] {
  if (bestGainOf(gain) < TELLING) return [];
  const reaching = misses.filter(({ design }) => design.objectives[k] <= gain.relaxed);
  return reaching.sort((a, b) => a.violation - b.violation || byId(a, b)).slice(0, 1);
}

function byId(a: Miss, b: Miss): number {
  return a.design.id < b.design.id ? -1 : 1;
}

function isSame(line: RequirementPrice, before: RequirementPrice | undefined): boolean {
  if (before === undefined || line.design !== before.design) return false;
  return line.gains.every((gain, k) => bestGainOf(gain) - bestGainOf(before.gains[k]) < TELLING);
}

function least(designs: readonly Placed[], k: number): number {
  return designs.reduce((low, design) => Math.min(low, design.objectives[k]), Number.POSITIVE_INFINITY);
}

/** Largest gain of lines, of either kind; 0 where there are none. */
function largest(lines: readonly RequirementPrice[]): number {
  return Math.max(0, ...lines.map(({ gains }) => Math.max(most(gains), best(gains))));
}

function most(gains: readonly Gain[]): number {
  return Math.max(0, ...gains.map(gainOf));
}

function best(gains: readonly Gain[]): number {
  return Math.max(0, ...gains.map(bestGainOf));
}

/** (from − to)/from of one gain at no more of every other objective; 0 where the front has no such design. */
export function gainOf({ from, to }: Gain): number {
  return Number.isFinite(from) && from > 0 ? (from - to) / from : 0;
}

/** (best − relaxed)/best: by what fraction the best value of the objective falls; never below 0. */
export function bestGainOf({ best, relaxed }: Gain): number {
  return Number.isFinite(best) && best > 0 ? (best - relaxed) / best : 0;
}

/** Whether a fraction gained is worth a word. */
export function isTelling(gain: number): boolean {
  return gain >= TELLING;
}

/** How the table was come by, as a sentence for a reader. */
export function howPriced(relaxations: Relaxations | undefined): string {
  if (relaxations === undefined) return 'Told from the near misses of the sweep alone.';
  const { steps, limits, evaluations } = relaxations;
  const shares = steps.map((step) => Number((100 * step).toPrecision(3)));
  const by = `${[shares.slice(0, -1).join(', '), ...shares.slice(-1)].filter((part) => part !== '').join(' and ')} %`;
  const each = limits.length === 1 ? '1 limit was relaxed' : `${limits.length} limits were relaxed, one at a time,`;
  return `After the sweep ${each} by ${by} of what is allowed, and the search went on from the front for ${evaluations} evaluations each time; what as long a search gains with nothing relaxed does not count.`;
}
