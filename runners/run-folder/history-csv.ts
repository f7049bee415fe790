/** `history.csv`: how the front of each ring of islands grew. Nothing in it comes from the clock. */
import type { Source } from './found.ts';

const HEAD = ['seed', 'shard', 'epoch', 'evaluations', 'feasible', 'front', 'hypervolume'];

/** The table's text: a line for each row of each ring's history. */
export function historyCsv(sources: readonly Source[]): string {
  const lines = sources.flatMap(({ seed, shard, history }) =>
    history.map((row) =>
      [cell(seed), shard, row.epoch, row.evaluations, row.feasible, row.frontSize, row.hypervolume].join(','),
    ),
  );
  return `${[HEAD.join(','), ...lines].join('\n')}\n`;
}

// A seed is any text: quoted where it must be, and never a formula for a spreadsheet.
function cell(text: string): string {
  const safe = /^[=+\-@\t\r]/.test(text) ? `'${text}` : text;
  return /[",\n\r]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}
