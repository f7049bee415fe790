/** The trust record of joined runs: what `run.json` says of how the search went, from what is known of each ring of islands. */
import type { RunRecord } from './record.ts';
import type { Source } from './sources.ts';

/** `trust` of rings together; `whole` is the hypervolume of their merged archive, `timeSplits` those of the runs that were joined. */
export function trustOfSources(
  sources: readonly Source[],
  whole: number,
  timeSplits: readonly unknown[],
): RunRecord['trust'] {
  const sum = (pick: (source: Source) => number | undefined): number =>
    sources.reduce((total, source) => total + (pick(source) ?? 0), 0);
  const islands = sum((source) => source.went?.islands);
  return {
    agreement: agreementOfSources(sources, whole),
    operatorShares: operatorShares(sources, islands),
    duplicates: sum((source) => source.went?.duplicates),
    restarts: sum((source) => source.went?.restarts),
    notComputable: sum((source) => source.went?.notComputable),
    timeSplit: addedUp(timeSplits),
  };
}

/** Hypervolume that each ring reached alone, as a share of the whole, 0 … 1. */
function agreementOfSources(sources: readonly Source[], whole: number): number[] {
  return sources.map(({ history }) => (whole > 0 ? Math.min(1, (history.at(-1)?.hypervolume ?? 0) / whole) : 0));
}

function operatorShares(sources: readonly Source[], islands: number): Record<string, number> {
  const shares: Record<string, number> = {};
  for (const { went } of sources) {
    for (const [name, share] of Object.entries(went?.operatorShares ?? {})) {
      shares[name] = (shares[name] ?? 0) + (share * (went?.islands ?? 0)) / islands;
    }
  }
  return shares;
}

function addedUp(records: readonly unknown[]): Record<string, number> {
  const total: Record<string, number> = {};
  for (const record of records) {
    for (const [name, value] of Object.entries(record ?? {})) {
      if (typeof value === 'number') total[name] = (total[name] ?? 0) + value;
    }
  }
  return total;
}
