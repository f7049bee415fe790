/** Where a sweep goes, which shard it is, and whether it begins or goes on. */
import { join } from 'node:path';
import { shardFolder, shardFromEnvironment } from '../cluster/shard.ts';
import { refusal } from '../errors.ts';
import { lookAt } from '../run-folder/folder.ts';
import { type RunRecord, readRecord } from '../run-folder/record.ts';
import type { SweepOptions } from './options.ts';

/** Where a sweep goes and which shard it is. */
export interface Place {
  readonly folder: string;
  readonly shards: number | undefined;
  readonly shard: number | undefined;
  /** Whether a scheduler runs this, so that it starts, goes on or ends at once by itself. */
  readonly task: boolean;
  readonly resume: boolean;
}

/** The place that the options and, for `--shard auto`, the scheduler name. Throws refusals. */
export function placeOf(options: SweepOptions): Place {
  const { out, shard, shards } = options;
  if (shard !== 'auto') {
    const count = shard?.shards ?? shards;
    if (shard !== undefined && shards !== undefined && shards !== shard.shards) {
      throw refusal('shards-differ', { shard: `${shard.shard}/${shard.shards}`, shards });
    }
    return { folder: out, shards: count, shard: shard?.shard, task: false, resume: options.resume === true };
  }
  const found = shardFromEnvironment(process.env, options.indexFrom);
  if (found === undefined) throw refusal('no-index');
  if (shards === undefined) throw refusal('usage', { text: '--shard auto needs --shards', command: 'sweep ' });
  if (found < 0 || found >= shards) throw refusal('shard-range', { shard: found, shards, last: shards - 1 });
  return { folder: join(out, shardFolder(found)), shards, shard: found, task: true, resume: true };
}

/** The record of the run that is gone on with; undefined where one begins. */
export function knownRun(where: Place): RunRecord | undefined {
  if (!where.resume) return undefined;
  return lookAt(where.folder) === 'run' ? readRecord(where.folder) : undefined;
}
