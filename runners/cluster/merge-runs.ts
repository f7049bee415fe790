/** The work behind `chopfront merge`: checks that runs belong together, joins them one by one, writes the joined run. */
import { availableParallelism } from 'node:os';
import { resolve } from 'node:path';
import { reasonOf, refusal, STATUS } from '../errors.ts';
import { type Inputs, problemOf } from '../inputs.ts';
import { tryRestarts } from '../restarts/make.ts';
import { lookAt, makeFolder } from '../run-folder/folder.ts';
import { type Found, readFound, writeFound } from '../run-folder/found.ts';
import { takeLock } from '../run-folder/lock.ts';
import { createJoiner } from '../run-folder/merge.ts';
import { writePage } from '../run-folder/page.ts';
import { publish } from '../run-folder/publish.ts';
import { type RunRecord, readRecord, writeRecord } from '../run-folder/record.ts';
import { readSnapshot, tablesOf, writeSnapshot } from '../run-folder/snapshot.ts';
import { measureDesigns } from '../sweep/grid.ts';
import { remark, say } from '../terminal/output.ts';
import { createRecordSum } from './record-sum.ts';
import { shardFoldersIn } from './shards.ts';

/** Merges `folders` (runs, or folders that hold shards) into `out`; returns the exit status. Throws refusals. */
export async function mergeRuns(out: string, folders: readonly string[], expect?: number): Promise<number> {
  const all = folders.flatMap((folder) => shardFoldersIn(folder) ?? [folder]);
  const state = lookAt(out);
  if (state === 'other') throw refusal('folder-not-run', { folder: out });
  // An earlier merge stays part of the result, so merging again adds to it.
  const runs = state === 'run' && !all.some((folder) => resolve(folder) === resolve(out)) ? [out, ...all] : all;
  const first = sameInputs(runs);
  if (expect !== undefined) refuseMissing(out, runs, expect);
  const inputs = readSnapshot(first.folder, first.record);
  makeFolder(out);
  const lock = takeLock(out);
  try {
    return await write(out, inputs, first.record, runs);
  } finally {
    lock.release();
  }
}

interface Run {
  readonly folder: string;
  readonly record: RunRecord;
}

async function write(out: string, inputs: Inputs, first: RunRecord, runs: readonly string[]): Promise<number> {
  const problem = problemOf(inputs);
  const joiner = createJoiner(problem);
  const sum = createRecordSum();
  // One run at a time, so that memory does not grow with their number.
  for (const folder of runs) sum.add(readRecord(folder), joiner.add(readFound(folder)));
  const { railHash, partsHash } = first;
  const found: Found = { railHash, partsHash, ...joiner.joined() };
  const { hypervolume } = measureDesigns(problem, found.archive);
  const record: RunRecord = { ...sum.record(first, found, hypervolume), tables: tablesOf(inputs.texts), frontSize: 0 };
  // The sheet comes after the record and what was found, so that a merge that was killed can simply be run again.
  writeRecord(out, record);
  writeFound(out, found);
  writeSnapshot(out, inputs.texts);
  const setup = { folder: out, problem, found, texts: inputs.texts, threads: availableParallelism() };
  await tryRestarts({ ...setup, say: remark });
  const front = publish(out, problem, found);
  writeRecord(out, { ...record, frontSize: front.designs.length });
  await drawPage(out);
  say(
    `${out}: ${front.designs.length} designs on the front of ${runs.length} runs, hypervolume ${hypervolume.toFixed(5)}`,
  );
  return STATUS.done;
}

async function drawPage(out: string): Promise<void> {
  try {
    await writePage(out);
  } catch (error) {
    remark(`the page could not be drawn (${reasonOf(error)}); try again with: chopfront page ${out}`);
  }
}

function sameInputs(runs: readonly string[]): Run {
  const [folder = ''] = runs;
  const first = { folder, record: readRecord(folder) };
  for (const other of runs.slice(1)) {
    const record = readRecord(other);
    const values = { folder: other, first: folder };
    if (record.railHash !== first.record.railHash) throw refusal('merge-differs', { ...values, what: 'sheet' });
    if (record.partsHash !== first.record.partsHash)
      throw refusal('merge-differs', { ...values, what: 'set of parts' });
    if (record.version !== first.record.version)
      throw refusal('merge-differs', { ...values, what: 'version of chopfront' });
  }
  return first;
}

function refuseMissing(out: string, runs: readonly string[], expect: number): void {
  const done = new Set<number | undefined>();
  for (const folder of runs) {
    const { status, shard } = readRecord(folder);
    if (status === 'done') done.add(shard);
  }
  const missing = Array.from({ length: expect }, (_, i) => i).filter((i) => !done.has(i));
  if (missing.length === 0) return;
  const command = `sbatch --array=${missing.join(',')} ${out}/slurm/shards.sh`;
  throw refusal('shards-missing', { missing: missing.join(', '), shards: expect, command });
}
