/** Several parts tables as one set: names unique over all, one currency; and the set as canonical text for hashing. */
import { canonicalText } from '../canonical.ts';
import { bad, type Finding, good, type Outcome } from '../outcome.ts';
import type { Row } from './column.ts';
import { PART_KINDS, type RowOf } from './schemas.ts';
import type { PartKind, PartsTables } from './tables.ts';

/** Rows of one table, as `readTable` gave them for that kind; `file` names it in messages. */
export interface ReadTable {
  readonly kind: PartKind;
  readonly rows: readonly RowOf<PartKind>[];
  readonly file?: string;
}

/** Joins `tables`, in their order. With `currency`, every price must be in it. */
export function joinTables(tables: readonly ReadTable[], currency?: string): Outcome<PartsTables> {
  const findings = [...repeated(tables), ...mixed(tables, currency)];
  if (findings.length > 0) return bad(findings);
  return good({
    switches: rowsOf(tables, 'switches'),
    diodes: rowsOf(tables, 'diodes'),
    inductors: rowsOf(tables, 'inductors'),
    ceramics: rowsOf(tables, 'ceramics'),
    bulks: rowsOf(tables, 'bulks'),
    controllers: rowsOf(tables, 'controllers'),
    cores: rowsOf(tables, 'cores'),
    materials: rowsOf(tables, 'materials'),
    conductors: rowsOf(tables, 'conductors'),
    powerStages: rowsOf(tables, 'powerStages'),
  });
}

/** Stable text of all rows in SI units, sorted by name within a kind: the same for the same parts in any order of tables. */
export function canonicalParts(tables: PartsTables): string {
  const byName = (a: Row, b: Row): number => (a.name < b.name ? -1 : a.name > b.name ? 1 : 0);
  const sorted = PART_KINDS.map((kind) => {
    const rows: readonly Row[] = tables[kind];
    return [kind, [...rows].sort(byName)];
  });
  return canonicalText(Object.fromEntries(sorted));
}

/** All rows of `kind`. */
function rowsOf<K extends PartKind>(tables: readonly ReadTable[], kind: K): readonly RowOf<K>[] {
  // A table of a kind holds rows of that kind: `readTable` made both.
  return tables.filter((table) => table.kind === kind).flatMap(({ rows }) => rows as readonly RowOf<K>[]);
}

function repeated(tables: readonly ReadTable[]): Finding[] {
  const findings: Finding[] = [];
  const owners = new Map<string, string>();
  for (const { kind, rows, file = kind } of tables) {
    for (const { name } of rows) {
      const owner = owners.get(name);
      if (owner === undefined) owners.set(name, file);
      else findings.push(problem(file, 'name', `${name}, which ${owner} has too`, 'each name once over all tables'));
    }
  }
  return findings;
}

function mixed(tables: readonly ReadTable[], wanted: string | undefined): Finding[] {
  const findings: Finding[] = [];
  let agreed = wanted;
  for (const { kind, rows, file = kind } of tables) {
    const own = rows.find((row: Row) => row.currency !== undefined)?.currency;
    agreed ??= own;
    if (own === undefined || own === agreed) continue;
    const allowed = `prices in ${agreed}, one currency for a sheet and its tables`;
    findings.push(problem(file, 'currency', `prices in ${own}`, allowed));
  }
  return findings;
}

function problem(file: string, field: string, found: string, allowed: string): Finding {
  return { file, line: 0, column: 0, field, found, allowed };
}
