/** Whether a run may go on: with the same sheet, parts, version and settings that it began with. */
import { diffRails } from '../../model/index.ts';
import { refusal } from '../errors.ts';
import type { Inputs } from '../inputs.ts';
import type { RunRecord } from '../run-folder/record.ts';
import { hashesOf, readSnapshot } from '../run-folder/snapshot.ts';
import { VERSION } from '../version.ts';
import type { SweepOptions } from './options.ts';

/** Throws a refusal that spells out what differs. `given` says whether the inputs came from a sheet and not from the run itself. */
export function refuseChanges(
  folder: string,
  known: RunRecord,
  inputs: Inputs,
  given: boolean,
  options: SweepOptions,
  shards: number | undefined,
): void {
  if (known.version !== VERSION) throw refusal('resume-version', { folder, was: known.version, now: VERSION });
  if (options.seed !== undefined && options.seed !== known.seed) {
    throw refusal('resume-settings', { folder, name: 'seed', was: known.seed, now: options.seed });
  }
  if (shards !== undefined && shards !== known.shards) {
    throw refusal('resume-settings', { folder, name: 'shards', was: known.shards, now: shards });
  }
  const { railHash, partsHash } = hashesOf(inputs);
  const snapshot = (): Inputs => readSnapshot(folder, known);
  if (railHash !== known.railHash) {
    const difference = given ? differenceOf(snapshot(), inputs) : '  the snapshot in the run folder was edited';
    throw refusal('resume-sheet', { folder, difference });
  }
  if (partsHash !== known.partsHash)
    throw refusal('resume-parts', { folder, difference: partsDifference(given, inputs, known, snapshot) });
}

function differenceOf(before: Inputs, after: Inputs): string {
  return diffRails(before.rail, after.rail)
    .map((line) => `  ${line}`)
    .join('\n');
}

function partsDifference(given: boolean, inputs: Inputs, known: RunRecord, snapshot: () => Inputs): string {
  if (!given) return 'the snapshot in the run folder was edited';
  const before = new Map(snapshot().texts.tables.map((table) => [table.file, table.text]));
  const files = inputs.texts.tables.filter((table) => before.get(table.file) !== table.text).map((table) => table.file);
  const gone = known.tables.filter((table) => !inputs.texts.tables.some((now) => now.file === table.file));
  return [
    ...files.map((file) => `${file} differs`),
    ...gone.map((table) => `${table.file} is not named any more`),
  ].join(', ');
}
