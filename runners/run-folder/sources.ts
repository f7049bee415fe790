/**
 * The rings of islands that a run's findings came from, and what is kept of each. Any order and any repetition of the same rings gives the same
 * list, and its length in bytes is bounded but for a line a ring: the more rings, the fewer rows of each one's history.
 */
import type { HistoryRow } from '../sweep/history.ts';

/** One ring of islands that contributed. */
export interface Source {
  readonly seed: string;
  readonly shards: number;
  readonly shard: number;
  readonly epoch: number;
  readonly evaluations: number;
  readonly feasible: number;
  readonly history: readonly HistoryRow[];
  /** How much of each family was tried, in the order of the problem's families; absent where it was not counted. */
  readonly families?: readonly FamilyCount[];
  /** How its search went; absent where it was not counted. */
  readonly went?: RingWent;
}

/** What became of one family. */
export interface FamilyCount {
  readonly evaluated: number;
  readonly feasible: number;
  /** Smallest feasible value of each objective; empty where no design was feasible. */
  readonly best: readonly number[];
  /** How often each limit was missed, in the problem's order. */
  readonly violated: readonly number[];
}

/** How the search of a ring went, over all its islands. */
export interface RingWent {
  readonly islands: number;
  /** Children not evaluated because they had been seen. */
  readonly duplicates: number;
  readonly restarts: number;
  readonly notComputable: number;
  /** Mean share of each operator, by its name. */
  readonly operatorShares: Readonly<Record<string, number>>;
}

/** Takes in sources one at a time. */
export interface SourceList {
  /** Adds a source; false when it was known already and no further on. */
  add(source: Source): boolean;
  /** All of them, ordered by seed, shards and shard, each once. */
  list(): Source[];
}

/** Rows of history kept of all sources together; each source keeps its last row beside. */
const ROWS = 8000;

/** An empty list. */
export function createSourceList(): SourceList {
  const sources = new Map<string, Source>();
  return {
    add(source) {
      const key = JSON.stringify([source.seed, source.shards, source.shard]);
      const known = sources.get(key);
      // The same ring may come twice, once further than the other: the further one tells how much was done.
      if (known !== undefined && known.epoch >= source.epoch) return false;
      sources.set(key, thinned(source, sources.size + 1));
      // Thinning by powers of two can be done again and again: what is left depends on the last number alone.
      if (known === undefined && Number.isInteger(Math.log2(sources.size))) thinAll(sources);
      return true;
    },
    list() {
      thinAll(sources);
      return [...sources.values()].sort(bySource);
    },
  };
}

/** The list of these sources. */
export function listSources(sources: readonly Source[]): Source[] {
  const list = createSourceList();
  for (const source of sources) list.add(source);
  return list.list();
}

function thinAll(sources: Map<string, Source>): void {
  for (const [key, source] of sources) sources.set(key, thinned(source, sources.size));
}

/** Rows whose epochs are multiples of the smallest power of two that leaves few enough, and the last one. */
function thinned(source: Source, count: number): Source {
  const { history } = source;
  const most = Math.max(1, Math.floor(ROWS / count));
  let stride = 1;
  const due = (row: HistoryRow): boolean => row.epoch % stride === 0;
  while (history.filter(due).length > most) stride *= 2;
  const last = history.at(-1);
  const kept = history.filter((row) => due(row) || row === last);
  return kept.length === history.length ? source : { ...source, history: kept };
}

function bySource(a: Source, b: Source): number {
  if (a.seed !== b.seed) return a.seed < b.seed ? -1 : 1;
  return a.shards - b.shards || a.shard - b.shard;
}
