/**
 * Saving a sweep: checkpoint, archive and record into its folder, and what it means when that fails. A disk that is full for
 * a while must not end a night's sweep: it goes on and tries again; a folder that is gone or taken over ends it.
 */
import { existsSync } from 'node:fs';
import { Refusal, reasonOf, refusal, systemCode } from '../errors.ts';
import { checkpointNames, writeCheckpoint } from '../run-folder/checkpoint.ts';
import { type Found, writeFound } from '../run-folder/found.ts';
import type { Lock } from '../run-folder/lock.ts';
import { type RunRecord, writeRecord } from '../run-folder/record.ts';
import type { RingState } from './resume.ts';

/** What is saved at one moment. */
export interface Moment {
  readonly rings: readonly RingState[];
  readonly islands: readonly Uint8Array[];
  readonly found: Found;
  readonly record: RunRecord;
  /** Spent on saving up to now, s. */
  readonly saving: number;
}

/** Saves moments into a folder. */
export interface Saver {
  /** Writes all three. Throws a refusal where it cannot. */
  save(moment: Moment): void;
  /** `performance.now()` of the last success; undefined before the first. */
  readonly last: number | undefined;
}

/** A saver that numbers its checkpoints from `number` + 1 on. */
export function createSaver(folder: string, lock: Lock, number: number): Saver {
  let count = number;
  let last: number | undefined;
  return {
    save({ rings, islands, found, record, saving }: Moment): void {
      if (!existsSync(folder)) throw refusal('folder-vanished', { folder });
      if (!lock.held()) throw refusal('lock-lost', { folder });
      try {
        const state = { seconds: record.seconds, saving, started: record.started, rings };
        writeCheckpoint(folder, { number: count + 1, node: process.version, state, islands });
        count += 1;
        writeFound(folder, found);
        writeRecord(folder, record);
        last = performance.now();
      } catch (error) {
        throw explainFailure(folder, error);
      }
    },
    get last() {
      return last;
    },
  };
}

/** Whether a sweep may go on after this failure to save, in the hope that the next attempt succeeds. */
export function maySaveLater(error: unknown): boolean {
  return error instanceof Refusal && (error.code === 'disk-full' || error.code === 'folder-read-only');
}

function explainFailure(folder: string, error: unknown): unknown {
  const code = systemCode(error);
  if (code === 'ENOENT' || !existsSync(folder)) return refusal('folder-vanished', { folder });
  const command = `chopfront sweep --out ${folder} --resume`;
  const values = { folder, command, reason: reasonOf(error), checkpoint: newest(folder) };
  if (code === 'ENOSPC' || code === 'EDQUOT') return refusal('disk-full', values);
  if (['EROFS', 'EACCES', 'EPERM', 'EIO'].includes(code)) return refusal('folder-read-only', values);
  return error;
}

function newest(folder: string): string {
  try {
    return checkpointNames(folder)[0] ?? 'none yet';
  } catch {
    return 'not readable';
  }
}
