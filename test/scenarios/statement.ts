/** One statement about a scenario, judged: tests expect it, the evidence prints it. */

/** What is said and what was found. */
export interface Statement {
  /** Sheet or study. */
  readonly where: string;
  readonly says: string;
  /** Where the statement comes from; 'common practice, no source' for a fact of the trade. */
  readonly source: string;
  readonly ours: string;
  readonly holds: boolean;
}

/** Says what a sheet's row says of itself. */
export function stated(where: string, says: string, ours: string, holds: boolean, source = 'arithmetic'): Statement {
  return { where, says, source, ours, holds };
}

/** A share as per cent. */
export function percent(share: number): string {
  return `${(100 * share).toPrecision(3)} %`;
}

/** Middle value of a list; NaN of an empty one. */
export function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[sorted.length >> 1] ?? Number.NaN;
}

/** How often each name occurs, most often first, as text. */
export function tally(names: readonly string[]): string {
  const counts = new Map<string, number>();
  for (const name of names) counts.set(name, (counts.get(name) ?? 0) + 1);
  return [...counts]
    .sort((a, b) => b[1] - a[1] || (a[0] < b[0] ? -1 : 1))
    .map(([name, count]) => `${name}: ${count}`)
    .join(', ');
}
