/** The snapshot of sheet and parts that a run keeps, so that it can be resumed, shown and merged whatever became of the originals. */
import { mkdirSync } from 'node:fs';
import { basename, join } from 'node:path';
import { BUILT_IN_TABLES, canonicalParts, canonicalRail, readRail } from '../../model/index.ts';
import { refusal } from '../errors.ts';
import { type Inputs, type InputTexts, type NamedText, readInputs, type TableText } from '../inputs.ts';
import { readText, writeWhole } from './files.ts';
import { INCUMBENTS, RUN_FILES, RUN_RECORD } from './folder.ts';
import { hashOf } from './hashes.ts';
import type { RunRecord } from './record.ts';

/** Where each table of a snapshot is. */
export type StoredTables = RunRecord['tables'];

/** What `run.json` says of the tables of a snapshot. */
export function tablesOf(texts: InputTexts): StoredTables {
  return texts.tables.map((table, i) => {
    const stored = `${String(i + 1).padStart(2, '0')}-${basename(table.file)}`;
    return { kind: table.kind, file: table.file, stored };
  });
}

/** Writes the snapshot into a run folder, the sheet last: where it is, all else is. */
export function writeSnapshot(folder: string, texts: InputTexts): void {
  mkdirSync(join(folder, RUN_FILES.parts), { recursive: true });
  for (const [i, { stored }] of tablesOf(texts).entries()) {
    writeWhole(join(folder, RUN_FILES.parts, stored), texts.tables[i]?.text ?? '');
  }
  writeIncumbents(folder, texts);
  writeWhole(join(folder, RUN_FILES.rail), texts.rail.text);
}

function writeIncumbents(folder: string, texts: InputTexts): void {
  if (texts.incumbents === undefined) return;
  mkdirSync(join(folder, INCUMBENTS), { recursive: true });
  for (const [i, { text }] of texts.incumbents.entries()) writeWhole(incumbentPath(folder, i), text);
}

/** The snapshot's incumbents: as many as the sheet names. */
function readIncumbents(folder: string, rail: NamedText): Pick<InputTexts, 'incumbents'> {
  const read = readRail(rail.text, rail.file);
  const names = read.ok ? (read.value.incumbents ?? []) : [];
  if (names.length === 0) return {};
  const what = "a design of the run's snapshot";
  return { incumbents: names.map((file, i) => ({ file, text: readText(incumbentPath(folder, i), what) })) };
}

function incumbentPath(folder: string, i: number): string {
  return join(folder, INCUMBENTS, `${String(i + 1).padStart(2, '0')}.txt`);
}

/** Reads a run's snapshot. Throws refusals where it cannot be read. */
export function readSnapshot(folder: string, record: RunRecord): Inputs {
  const rail = { file: join(folder, RUN_FILES.rail), text: readText(join(folder, RUN_FILES.rail), "the run's sheet") };
  const tables = record.tables.map(({ kind, file, stored }): TableText => {
    const text = readText(join(folder, RUN_FILES.parts, basename(stored)), "a parts table of the run's snapshot");
    const known = BUILT_IN_TABLES.find((table) => table.kind === kind);
    if (known === undefined) throw refusal('run-damaged', { folder, file: RUN_RECORD, reason: `no parts are ${kind}` });
    return { kind: known.kind, file, text };
  });
  return readInputs({ rail, tables, ...readIncumbents(folder, rail) });
}

/** Hashes of the canonical sheet and parts. */
export function hashesOf(inputs: Inputs): { readonly railHash: string; readonly partsHash: string } {
  return { railHash: hashOf(canonicalRail(inputs.rail)), partsHash: hashOf(canonicalParts(inputs.tables)) };
}
