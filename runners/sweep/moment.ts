/** A sweep at one moment, as it is saved: islands, what they found, and the record of how the run stands. */
import type { RunRecord } from '../run-folder/record.ts';
import { listSources } from '../run-folder/sources.ts';
import type { Budget } from './budget.ts';
import { packedIslands, ringState } from './resume.ts';
import { islandsOf, type Ring, sumTallies, tallyOf } from './ring.ts';
import type { Moment } from './saving.ts';
import type { Search, Survey } from './search.ts';
import { meanShare } from './shares.ts';

/** What is fixed about a run from its start, as `run.json` says it. */
export type RunIdentity = Pick<
  RunRecord,
  'version' | 'rail' | 'railHash' | 'partsHash' | 'seed' | 'shards' | 'shard' | 'tables'
>;

/** A sweep under way. */
export interface Sweeping {
  readonly identity: RunIdentity;
  readonly budget: Budget;
  readonly threads: number;
  readonly rings: readonly Ring[];
  /** Spent on saving, s. */
  readonly saving: number;
  /** ISO 8601. */
  readonly started: string;
}

/** The moment at which `sweeping`, of `status`, has taken `seconds`. */
export function momentOf(search: Search, sweeping: Sweeping, status: RunRecord['status'], seconds: number): Moment {
  const { rings, saving } = sweeping;
  const { railHash, partsHash, seed, shards } = sweeping.identity;
  const survey = search.survey(rings.flatMap(islandsOf));
  const { archive, nearMisses, sample } = survey;
  const sources = rings.map((ring) => {
    const { shard, epoch, history } = ring;
    return { seed, shards, shard, epoch, ...tallyOf(ring), history: history.rows, ...search.went(islandsOf(ring)) };
  });
  return {
    rings: rings.map(ringState),
    islands: packedIslands(rings),
    found: { railHash, partsHash, sources: listSources(sources), archive, nearMisses, sample },
    record: recordOf(sweeping, survey, status, seconds),
    saving,
  };
}

function recordOf(sweeping: Sweeping, survey: Survey, status: RunRecord['status'], seconds: number): RunRecord {
  const { identity, budget, threads, rings, saving, started } = sweeping;
  const { evaluations, feasible } = sumTallies(rings);
  const { archive, nearMisses, trust } = survey;
  const { frontSize, hypervolume } = survey.measure;
  return {
    format: 'chopfront-run',
    status,
    ...identity,
    node: process.version,
    threads,
    islands: rings.reduce((sum, ring) => sum + ring.slots.length, 0),
    budget,
    evaluations,
    epochs: rings.reduce((sum, ring) => sum + ring.epoch, 0),
    seconds,
    perSecond: seconds > 0 ? evaluations / seconds : 0,
    feasible,
    feasibleShare: evaluations > 0 ? feasible / evaluations : 0,
    frontSize,
    archiveSize: archive.count,
    nearMisses: nearMisses.count,
    hypervolume,
    share: meanShare(budget, identity.shards, rings, seconds),
    trust: { ...trust, timeSplit: { ...timeSplitOf(rings), saving } },
    faults: rings.flatMap((ring) => ring.faults),
    started,
    updated: new Date().toISOString(),
  };
}

/** Seconds of all threads together, by what they were spent on; saving is done beside them. */
function timeSplitOf(rings: readonly Ring[]): Record<string, number> {
  const names = ['model', 'variation', 'ranking', 'archive', 'transfer'] as const;
  return Object.fromEntries(names.map((name) => [name, rings.reduce((sum, ring) => sum + ring.spent[name], 0)]));
}
