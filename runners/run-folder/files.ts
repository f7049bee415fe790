/**
 * Writing and reading files so that a reader never sees half a file: written beside the final name, synced, renamed.
 * A temporary name carries the process id, so two writers never share one.
 */
import {
  closeSync,
  fsyncSync,
  openSync,
  readdirSync,
  readSync,
  renameSync,
  rmSync,
  statSync,
  writeSync,
} from 'node:fs';
import { basename, dirname, join } from 'node:path';
import { reasonOf, refusal, systemCode } from '../errors.ts';

/** Replaces the file at `path` by `data` in one step. Throws what the system throws, after removing what it began. */
export function writeWhole(path: string, data: string | Uint8Array): void {
  const bytes = typeof data === 'string' ? Buffer.from(data, 'utf8') : data;
  const beside = join(dirname(path), `.${basename(path)}.${process.pid}.tmp`);
  try {
    writeSynced(beside, bytes);
    renameSync(beside, path);
  } catch (error) {
    rmSync(beside, { force: true });
    throw error;
  }
  syncFolder(dirname(path));
}

/** Removes what writers that died left beside the files of `folder`. Call only while holding its lock. */
export function sweepLeftovers(folder: string): void {
  for (const name of readdirSync(folder)) {
    if (/^\..*\.\d+\.tmp$/.test(name)) rmSync(join(folder, name), { force: true });
  }
}

/** Largest text that a person writes for us; what is above it is some other file. */
const LARGEST_TEXT = 64 * 1024 * 1024;

/** The text of a file that a person named; `what` says what it should be. Throws a refusal. */
export function readText(path: string, what: string, limit = LARGEST_TEXT): string {
  try {
    const { size } = statSync(path);
    const bytes = size > limit ? undefined : readUpTo(path, limit);
    if (bytes !== undefined) return bytes.toString('utf8');
    const megabytes = (count: number): string => (count / 1048576).toFixed(1);
    throw refusal('file-large', {
      file: path,
      size: megabytes(Math.max(size, limit + 1)),
      what,
      limit: megabytes(limit),
    });
  } catch (error) {
    const code = systemCode(error);
    if (code === 'ENOENT' || code === 'ENOTDIR') throw refusal('file-missing', { file: path, what });
    if (code === 'EISDIR') throw refusal('file-folder', { file: path, what });
    if (code !== '') throw refusal('file-unreadable', { file: path, reason: reasonOf(error) });
    throw error;
  }
}

/** The bytes of a file; undefined where there are more than `limit`, as in a device that never ends. */
function readUpTo(path: string, limit: number): Buffer | undefined {
  const file = openSync(path, 'r');
  try {
    const chunks: Buffer[] = [];
    for (let total = 0; total <= limit; ) {
      const chunk = Buffer.alloc(65_536);
      const count = readSync(file, chunk, 0, chunk.length, null);
      if (count === 0) return Buffer.concat(chunks);
      chunks.push(chunk.subarray(0, count));
      total += count;
    }
    return undefined;
  } finally {
    closeSync(file);
  }
}

function writeSynced(path: string, bytes: Uint8Array): void {
  const file = openSync(path, 'w');
  try {
    for (let done = 0; done < bytes.length; ) done += writeSync(file, bytes, done);
    fsyncSync(file);
  } finally {
    closeSync(file);
  }
}

// A rename is on disk only once its folder is; some file systems refuse to sync folders, which costs nothing but that.
function syncFolder(path: string): void {
  try {
    const folder = openSync(path, 'r');
    try {
      fsyncSync(folder);
    } finally {
      closeSync(folder);
    }
  } catch (error) {
    if (!['EINVAL', 'EISDIR', 'EPERM', 'EACCES', 'ENOTSUP'].includes(systemCode(error))) throw error;
  }
}
