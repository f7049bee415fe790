/** The work behind `chopfront merge`: checks that runs belong together, joins them one by one, writes the joined run. */
import { resolve } from 'node:path';
import { reasonOf, refusal, STATUS } from '../errors.ts';
import { type Inputs, problemOf } from '../inputs.ts';
import { lookAt, makeFolder } from '../run-folder/folder.ts';
import { type Found, readFound, type Source, writeFound } from '../run-folder/found.ts';
import { takeLock } from '../run-folder/lock.ts';
import { createJoiner } from '../run-folder/merge.ts';
import { writePage } from '../run-folder/page.ts';
import { publish } from '../run-folder/publish.ts';
import { type RunRecord, readRecord, writeRecord } from '../run-folder/record.ts';
import { readSnapshot, writeSnapshot } from '../run-folder/snapshot.ts';
import { measureDesigns } from '../sweep/grid.ts';
import { remark, say } from '../terminal/output.ts';
import { shardFoldersIn } from './shards.ts';

/** Merges `folders` (runs, or folders that hold shards) into `out`; returns the exit status. Throws refusals. */
export async function mergeRuns(out: string, folders: readonly string[], expect?: number): Promise<number> {
  const all = folders.flatMap((folder) => shardFoldersIn(folder) ?? [folder]);
  const state = lookAt(out);
  if (state === 'other') throw refusal('folder-not-run', { folder: out });
  // An earlier merge stays part of the result, so merging again adds to it.
  const runs = state === 'run' && !all.some((folder) => resolve(folder) === resolve(out)) ? [out, ...all] : all;
  const records = runs.map((folder) => ({ folder, record: readRecord(folder) }));
  const first = sameInputs(records);
  if (expect !== undefined) refuseMissing(out, records, expect);
  const inputs = readSnapshot(first.folder, first.record);
  makeFolder(out);
  const lock = takeLock(out);
  try {
    return await write(out, inputs, first.record, records);
  } finally {
    lock.release();
  }
}

interface Run {
  readonly folder: string;
  readonly record: RunRecord;
}

async function write(out: string, inputs: Inputs, first: RunRecord, runs: readonly Run[]): Promise<number> {
  const problem = problemOf(inputs);
  const joiner = createJoiner(problem);
  let example: Found | undefined;
  for (const { folder } of runs) {
    const found = readFound(folder);
    joiner.add(found);
    example ??= found;
  }
  if (example === undefined) return STATUS.badInput;
  const { railHash, partsHash } = example;
  const found: Found = { railHash, partsHash, ...joiner.joined() };
  const tables = writeSnapshot(out, inputs.texts);
  writeFound(out, found);
  const front = publish(out, problem, found);
  const measured = measureDesigns(problem, found.archive);
  writeRecord(out, {
    ...recordOf(first, runs, found.sources),
    tables,
    ...measuredFields(found, front.designs.length),
    hypervolume: measured.hypervolume,
  });
  await drawPage(out);
  say(
    `${out}: ${front.designs.length} designs on the front of ${runs.length} runs, hypervolume ${measured.hypervolume.toFixed(5)}`,
  );
  return STATUS.done;
}

function measuredFields(found: Found, frontSize: number): Pick<RunRecord, 'frontSize' | 'archiveSize' | 'nearMisses'> {
  return { frontSize, archiveSize: found.archive.count, nearMisses: found.nearMisses.count };
}

async function drawPage(out: string): Promise<void> {
  try {
    await writePage(out);
  } catch (error) {
    remark(`the page could not be drawn (${reasonOf(error)}); try again with: chopfront page ${out}`);
  }
}

function sameInputs(runs: readonly Run[]): Run {
  const first = runs[0];
  if (first === undefined) throw refusal('run-missing', { folder: '' });
  for (const { folder, record } of runs) {
    const values = { folder, first: first.folder };
    if (record.railHash !== first.record.railHash) throw refusal('merge-differs', { ...values, what: 'sheet' });
    if (record.partsHash !== first.record.partsHash)
      throw refusal('merge-differs', { ...values, what: 'set of parts' });
    if (record.version !== first.record.version)
      throw refusal('merge-differs', { ...values, what: 'version of chopfront' });
  }
  return first;
}

function refuseMissing(out: string, runs: readonly Run[], expect: number): void {
  const done = new Set(runs.filter((run) => run.record.status === 'done').map((run) => run.record.shard));
  const missing = Array.from({ length: expect }, (_, i) => i).filter((i) => !done.has(i));
  if (missing.length === 0) return;
  const command = `sbatch --array=${missing.join(',')} ${out}/slurm/shards.sh`;
  throw refusal('shards-missing', { missing: missing.join(', '), shards: expect, command });
}

function recordOf(first: RunRecord, runs: readonly Run[], sources: readonly Source[]): RunRecord {
  const sum = (pick: (source: Source) => number): number => sources.reduce((total, source) => total + pick(source), 0);
  const total = (pick: (record: RunRecord) => number): number => runs.reduce((all, run) => all + pick(run.record), 0);
  const evaluations = sum((source) => source.evaluations);
  const feasible = sum((source) => source.feasible);
  const { shard: _, ...rest } = first;
  return {
    ...rest,
    status: runs.every((run) => run.record.status === 'done') ? 'done' : 'stopped',
    seed: [...new Set(sources.map((source) => source.seed))].join(' '),
    shards: sources.length,
    evaluations,
    epochs: sum((source) => source.epoch),
    seconds: total((record) => record.seconds),
    perSecond: total((record) => record.perSecond),
    feasible,
    feasibleShare: evaluations > 0 ? feasible / evaluations : 0,
    share: total((record) => record.share) / runs.length,
    faults: runs.flatMap((run) => run.record.faults),
    trust: {},
    updated: new Date().toISOString(),
  };
}
