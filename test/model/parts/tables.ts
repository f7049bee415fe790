/** Helpers of the parts tests: the built-in tables, and findings as a person sees them. */
import { readFileSync } from 'node:fs';
import { describeFinding } from '../../../model/outcome.ts';
import { BUILT_IN_TABLES } from '../../../model/parts/built-in.ts';
import { readTable } from '../../../model/parts/read-table.ts';
import type { RowOf } from '../../../model/parts/schemas.ts';
import type { PartKind } from '../../../model/parts/tables.ts';

/** Text of a built-in table. */
export function tableText(kind: PartKind): string {
  const entry = BUILT_IN_TABLES.find((table) => table.kind === kind);
  if (entry === undefined) throw new Error(`no built-in table of ${kind}`);
  return readFileSync(new URL(`../../../model/tables/${entry.file}`, import.meta.url), 'utf8');
}

/** Rows of a built-in table. */
export function builtIn<K extends PartKind>(kind: K): readonly RowOf<K>[] {
  const outcome = readTable(kind, tableText(kind), `${kind}.csv`);
  if (!outcome.ok) throw new Error(outcome.findings.map(describeFinding).join('\n'));
  return outcome.value;
}

/** The messages of a table that must not read. */
export function complaints(kind: PartKind, text: string): readonly string[] {
  const outcome = readTable(kind, text, 'own.csv');
  return outcome.ok ? [] : outcome.findings.map(describeFinding);
}
