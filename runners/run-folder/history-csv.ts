/** `history.csv`: how the front of each ring of islands grew, and that of each island by itself. Nothing in it comes from the clock. */
import { csvCell } from './csv-cell.ts';
import type { Source } from './sources.ts';

const HEAD = ['seed', 'shard', 'epoch', 'evaluations', 'feasible', 'front', 'hypervolume'];

/** The table's text: a line for each row of each ring's history, a column for each island (empty where it was not measured). */
export function historyCsv(sources: readonly Source[]): string {
  const most = sources.reduce(
    (all, source) => source.history.reduce((n, row) => Math.max(n, row.islands.length), all),
    0,
  );
  const islands = Array.from({ length: most }, (_, i) => i);
  const lines = sources.flatMap(({ seed, shard, history }) =>
    history.map((row) => {
      const whole = [csvCell(seed), shard, row.epoch, row.evaluations, row.feasible, row.frontSize, row.hypervolume];
      return [...whole, ...islands.map((i) => row.islands[i] ?? '')].join(',');
    }),
  );
  const head = [...HEAD, ...islands.map((i) => `island ${i}`)];
  return `${[head.join(','), ...lines].join('\n')}\n`;
}
