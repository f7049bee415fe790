/**
 * How the front grew: a row every so many epochs. When there are too many rows, every second one goes and the stride
 * doubles, so a night's record stays small and is the same whether or not the sweep was interrupted.
 */

/** The state of one ring of islands after an epoch; all fields follow from the seed alone, none from the clock. */
export interface HistoryRow {
  readonly epoch: number;
  readonly evaluations: number;
  /** Share of the evaluations that kept every limit, 0 … 1. */
  readonly feasible: number;
  readonly frontSize: number;
  /** Normalised by each objective's ideal and reference, 0 … 1. */
  readonly hypervolume: number;
  /** The same of each island's own archive, in island order; empty in most rows of a long sweep. */
  readonly islands: readonly number[];
}

/** Rows in order of epoch, each a multiple of `stride`. */
export interface History {
  stride: number;
  rows: HistoryRow[];
}

/** Most rows kept. */
export const HISTORY_ROWS = 1000;

/** A history with nothing in it. */
export function newHistory(): History {
  return { stride: 1, rows: [] };
}

/** Whether the history wants a row at this epoch. */
export function isDue(history: History, epoch: number): boolean {
  return epoch % history.stride === 0;
}

/** Rows with islands in each doubling of the epochs. */
const APART = 32;

/** Whether the row of this epoch tells the islands apart: all of the first 64, then 32 in each doubling. */
export function tellsIslands(epoch: number): boolean {
  let step = 1;
  while (epoch / step > 2 * APART) step *= 2;
  return epoch % step === 0;
}

/** Adds a row whose epoch is due. */
export function addRow(history: History, row: HistoryRow): void {
  history.rows.push(row);
  while (history.rows.length > HISTORY_ROWS) {
    history.stride *= 2;
    history.rows = history.rows.filter((kept) => kept.epoch % history.stride === 0);
  }
}

/** Gain in hypervolume over the last tenth of the evaluations as a share of the present one; undefined while too early to say. */
export function lastGain(history: History): number | undefined {
  const last = history.rows.at(-1);
  if (last === undefined || history.rows.length < 20 || !(last.hypervolume > 0)) return undefined;
  const before = history.rows.findLast((row) => row.evaluations <= 0.9 * last.evaluations);
  return before === undefined ? undefined : (last.hypervolume - before.hypervolume) / last.hypervolume;
}
