/** How runs stand, those of a sweep over several folders together: what is there, what is missing, what broke off. */
import { join } from 'node:path';
import { Refusal } from '../errors.ts';
import { isLocked } from '../run-folder/lock.ts';
import { type RunRecord, readRecord } from '../run-folder/record.ts';
import { shardFolder } from './shard.ts';
import { shardFoldersIn } from './shards.ts';

/** A run with its folder; `broken off` where its record says that it runs and no process does. */
export interface RunStanding {
  readonly folder: string;
  readonly record: RunRecord;
  readonly state: RunRecord['status'] | 'broken off';
}

/** Several runs, and what is to be said of them beside. */
export interface Standings {
  readonly runs: readonly RunStanding[];
  /** Shards of a sweep that have not begun. */
  readonly missing: readonly { readonly folder: string; readonly shard: number; readonly shards: number }[];
  /** A line for each shard that cannot be read. */
  readonly unreadable: readonly string[];
}

/** Looks at runs, and at folders that hold shards. Throws the refusals of `readRecord` for a run that was named itself. */
export function standingsOf(folders: readonly string[]): Standings {
  const all = folders.map((folder) => {
    const shards = shardFoldersIn(folder);
    return shards === undefined ? alone(folder) : together(folder, shards);
  });
  return {
    runs: all.flatMap((one) => one.runs),
    missing: all.flatMap((one) => one.missing),
    unreadable: all.flatMap((one) => one.unreadable),
  };
}

function alone(folder: string): Standings {
  return { runs: [standingOf(folder)], missing: [], unreadable: [] };
}

function together(parent: string, folders: readonly string[]): Standings {
  const runs: RunStanding[] = [];
  const unreadable: string[] = [];
  for (const folder of folders) {
    try {
      runs.push(standingOf(folder));
    } catch (error) {
      if (!(error instanceof Refusal)) throw error;
      unreadable.push(error.message);
    }
  }
  const shards = runs.reduce((most, { record }) => Math.max(most, record.shards), 0);
  const found = new Set(folders);
  const missing = Array.from({ length: shards }, (_, shard) => ({
    folder: join(parent, shardFolder(shard)),
    shard,
    shards,
  }));
  return { runs, missing: missing.filter(({ folder }) => !found.has(folder)), unreadable };
}

function standingOf(folder: string): RunStanding {
  const record = readRecord(folder);
  const state = record.status === 'running' && !isLocked(folder) ? 'broken off' : record.status;
  return { folder, record, state };
}
