/** The snapshot of sheet and parts that a run keeps, so that it can be resumed, shown and merged whatever became of the originals. */
import { mkdirSync } from 'node:fs';
import { basename, join } from 'node:path';
import { BUILT_IN_TABLES, canonicalParts, canonicalRail } from '../../model/index.ts';
import { refusal } from '../errors.ts';
import { type Inputs, type InputTexts, readInputs, type TableText } from '../inputs.ts';
import { readText, writeWhole } from './files.ts';
import { RUN_FILES } from './folder.ts';
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

/** Writes the snapshot into a run folder; returns what `run.json` says of its tables. */
export function writeSnapshot(folder: string, texts: InputTexts): StoredTables {
  writeWhole(join(folder, RUN_FILES.rail), texts.rail.text);
  mkdirSync(join(folder, RUN_FILES.parts), { recursive: true });
  const tables = tablesOf(texts);
  for (const [i, { stored }] of tables.entries()) {
    writeWhole(join(folder, RUN_FILES.parts, stored), texts.tables[i]?.text ?? '');
  }
  return tables;
}

/** Reads a run's snapshot. Throws refusals where it cannot be read. */
export function readSnapshot(folder: string, record: RunRecord): Inputs {
  const rail = { file: join(folder, RUN_FILES.rail), text: readText(join(folder, RUN_FILES.rail), "the run's sheet") };
  const tables = record.tables.map(({ kind, file, stored }): TableText => {
    const text = readText(join(folder, RUN_FILES.parts, basename(stored)), "a parts table of the run's snapshot");
    const known = BUILT_IN_TABLES.find((table) => table.kind === kind);
    if (known === undefined) throw refusal('run-damaged', { folder, file: 'run.json', reason: `no parts are ${kind}` });
    return { kind: known.kind, file, text };
  });
  return readInputs({ rail, tables });
}

/** Hashes of the canonical sheet and parts. */
export function hashesOf(inputs: Inputs): { readonly railHash: string; readonly partsHash: string } {
  return { railHash: hashOf(canonicalRail(inputs.rail)), partsHash: hashOf(canonicalParts(inputs.tables)) };
}
