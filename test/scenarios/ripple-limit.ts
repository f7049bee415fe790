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

/** Sweeps the sheet with `share` of its ripple limit. */
export function spentAt(share: number, evaluations: number): Spent {
  const rail = shippedRail('buoy-winch');
  const found = sweep(
    spaceOf({ ...rail, output: { ...rail.output, ripple: share * rail.output.ripple } }),
    evaluations,
  );
  return { ...smallest(found), hypervolume: found.hypervolume };
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
