/** Which kind of parts a user's own table holds: the kind whose template shares most columns with its header. */
import { BUILT_IN_TABLES, type PartKind, tableTemplate } from '../model/index.ts';
import { KIND_NAMES } from '../model/parts/built-in.ts';
import { refusal } from './errors.ts';

/** What a person calls a kind, such as `power-stages`. */
export function nameOfKind(kind: PartKind): string {
  return KIND_NAMES[BUILT_IN_TABLES.findIndex((table) => table.kind === kind)] ?? kind;
}

/** The kind of that name; undefined where there is none. */
export function kindNamed(name: string): PartKind | undefined {
  return BUILT_IN_TABLES[KIND_NAMES.indexOf(name)]?.kind;
}

/** The kind of the table in `text`. Throws the refusal `table-kind` where its header fits none. */
export function kindOfTable(text: string, file: string): PartKind {
  const own = columnsOf(text);
  const scores = BUILT_IN_TABLES.map(({ kind }) => {
    const wanted = columnsOf(tableTemplate(kind));
    return { kind, share: [...wanted].filter((name) => own.has(name)).length / wanted.size };
  });
  const best = scores.reduce((a, b) => (b.share > a.share ? b : a));
  if (best.share > 0.5) return best.kind;
  throw refusal('table-kind', { file, kinds: KIND_NAMES.join(', ') });
}

/** Column names of the first line that is not a comment, without their units; prices say nothing of the kind. */
function columnsOf(text: string): Set<string> {
  const lines = text
    .slice(0, 100_000)
    .replace(/^\ufeff/, '')
    .split(/\r\n?|\n/);
  const header = lines.find((line) => line.trim() !== '' && !line.startsWith('#')) ?? '';
  const names = header.split(',').map((cell) => cell.replace(/\[.*/, '').replaceAll('"', '').trim());
  return new Set(names.filter((name) => name !== '' && name !== 'name' && !/^price_/.test(name)));
}
