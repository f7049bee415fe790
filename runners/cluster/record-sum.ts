/** The record of joined runs: what can only be added up, such as seconds and faults, and what follows from their rings. */
import type { Found } from '../run-folder/found.ts';
import type { Fault, RunRecord } from '../run-folder/record.ts';
import type { Source } from '../run-folder/sources.ts';
import { trustOfSources } from '../run-folder/trust.ts';

/** Adds up records one at a time. */
export interface RecordSum {
  /** `news`: whether the run held anything that earlier ones did not; one that did not counts for nothing, so twice is as once. */
  add(record: RunRecord, news: boolean): void;
  /** The record of all, but for what the snapshot and the front say. */
  record(first: RunRecord, found: Found, hypervolume: number): RunRecord;
}

/** A sum of nothing. */
export function createRecordSum(): RecordSum {
  const total = { seconds: 0, perSecond: 0, share: 0, threads: 0, runs: 0, unfinished: 0 };
  const faults: Fault[] = [];
  let timeSplit: readonly unknown[] = [];
  let updated = '';
  return {
    add(record, news): void {
      if (record.updated > updated) updated = record.updated;
      if (!news) return;
      total.seconds += record.seconds;
      total.perSecond += record.perSecond;
      total.share += record.share;
      total.threads = Math.max(total.threads, record.threads);
      total.runs += 1;
      if (record.status !== 'done') total.unfinished += 1;
      faults.push(...record.faults);
      timeSplit = [trustOfSources([], 0, [...timeSplit, record.trust.timeSplit]).timeSplit];
    },
    record(first, found, hypervolume): RunRecord {
      const { shard: _, ...rest } = first;
      return {
        ...rest,
        ...countsOf(found.sources),
        status: total.unfinished === 0 ? 'done' : 'stopped',
        threads: total.threads,
        seconds: total.seconds,
        perSecond: total.perSecond,
        share: total.share / Math.max(1, total.runs),
        faults,
        archiveSize: found.archive.count,
        nearMisses: found.nearMisses.count,
        hypervolume,
        trust: trustOfSources(found.sources, hypervolume, timeSplit),
        updated,
      };
    },
  };
}

function countsOf(
  sources: readonly Source[],
): Pick<RunRecord, 'seed' | 'shards' | 'islands' | 'evaluations' | 'epochs' | 'feasible' | 'feasibleShare'> {
  const sum = (pick: (source: Source) => number): number => sources.reduce((total, source) => total + pick(source), 0);
  const evaluations = sum((source) => source.evaluations);
  const feasible = sum((source) => source.feasible);
  return {
    seed: [...new Set(sources.map((source) => source.seed))].join(' '),
    shards: sources.length,
    islands: sum((source) => source.went?.islands ?? 0),
    evaluations,
    epochs: sum((source) => source.epoch),
    feasible,
    feasibleShare: evaluations > 0 ? feasible / evaluations : 0,
  };
}
