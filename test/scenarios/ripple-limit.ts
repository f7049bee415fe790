/** The price of a ripple limit: the winch's sheet with its limit and with a quarter of it. */
import { least, type Sweep, shippedRail, spaceOf, sweep } from './spaces.ts';

/** What the smallest design spends on ripple. */
export interface Spent {
  readonly phases: number;
  /** Output capacitance by rating, F. */
  readonly capacitance: number;
  /** m³. */
  readonly volume: number;
  readonly hypervolume: number;
}

/** Seeds of the sweeps at each limit: one alone may stop at a local optimum. */
const SEEDS = ['a', 'b', 'c'];

/** The sheet with its ripple limit and with a quarter of it; each seed may spend `evaluations` on each. */
export function wholeAndQuarter(evaluations: number): readonly [whole: Spent, quarter: Spent] {
  const quarter = spentAt(0.25, evaluations);
  const whole = spentAt(1, evaluations);
  // What keeps a quarter of the limit keeps the limit.
  return [whole.volume <= quarter.volume ? whole : { ...quarter, hypervolume: whole.hypervolume }, quarter];
}

/** The smallest design of all seeds, and the largest hypervolume, with `share` of the ripple limit. */
function spentAt(share: number, evaluations: number): Spent {
  const rail = shippedRail('buoy-winch');
  const problem = spaceOf({ ...rail, output: { ...rail.output, ripple: share * rail.output.ripple } });
  const all = SEEDS.map((seed) => sweep(problem, evaluations, seed));
  const best = all.map(smallest).reduce((least, one) => (one.volume < least.volume ? one : least));
  return { ...best, hypervolume: Math.max(...all.map(({ hypervolume }) => hypervolume)) };
}

function smallest(found: Sweep): Omit<Spent, 'hypervolume'> {
  const { problem } = found;
  const member = least(found, 'volume');
  const { genes, parts } = problem.record(member.genes);
  const { outputCeramics, outputBulks } = problem.catalogue;
  const of = (
    rows: readonly { name: string; capacitance: number }[],
    name: string | undefined,
    count: number,
  ): number => count * (rows.find((row) => row.name === name)?.capacitance ?? 0);
  const capacitance =
    of(outputCeramics, parts.outputCeramic, genes.outputCeramicCount) +
    of(outputBulks, parts.outputBulk, genes.outputBulkCount);
  const volume = problem.assess(member.genes).objectives.find(({ name }) => name === 'volume')?.value ?? Number.NaN;
  return { phases: genes.phases, capacitance, volume };
}
