/** The history that a page draws: of one ring, with its islands; of several, with each ring in an island's place. */
import type { HistoryRow } from '../../viz/data.ts';
import type { Source } from './sources.ts';

/** Most rings that are drawn by themselves. */
const APART = 32;

/**
 * Rows in order of evaluations. Rings exchange nothing and are merged only at the end, so for several of them `hypervolume` is that of the best
 * one: the whole has at least that.
 */
export function pageHistory(sources: readonly Source[]): HistoryRow[] {
  const [first] = sources;
  if (first === undefined) return [];
  if (sources.length === 1) {
    return first.history.map(({ evaluations, hypervolume, islands }) => ({ evaluations, hypervolume, islands }));
  }
  const longest = sources.reduce((best, source) => (source.epoch > best.epoch ? source : best), first);
  return longest.history.map((row) => together(sources, row.epoch));
}

/** All rings as they were at that epoch, or before it where their history has no such row. */
function together(sources: readonly Source[], epoch: number): HistoryRow {
  const rows = sources.map(({ history }) => history.findLast((row) => row.epoch <= epoch));
  const volumes = rows.map((row) => row?.hypervolume ?? 0);
  return {
    evaluations: rows.reduce((sum, row) => sum + (row?.evaluations ?? 0), 0),
    hypervolume: volumes.reduce((most, volume) => Math.max(most, volume), 0),
    islands: volumes.slice(0, APART),
  };
}
