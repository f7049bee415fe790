/** Finding, making and refusing run folders; what each file in one is called is decided here and nowhere else. */
import { accessSync, constants, existsSync, mkdirSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { reasonOf, refusal, systemCode } from '../errors.ts';

/** Files of a run, beside checkpoints, `run.json` and the lock. */
export const RUN_FILES = {
  rail: 'rail.yaml',
  parts: 'parts',
  frontCsv: 'front.csv',
  frontJson: 'front.json',
  nearMisses: 'near-misses.csv',
  archive: 'archive.bin',
  restarts: 'restarts.bin',
  history: 'history.csv',
  page: 'page.html',
} as const;

/** Says how a run stands. */
export const RUN_RECORD = 'run.json';

/** Folder of the designs that the sheet names as existing ones. */
export const INCUMBENTS = 'incumbents';

/** What a run, or a merge of runs, consists of before its snapshot is whole. */
const BEGUN: readonly string[] = [RUN_RECORD, RUN_FILES.parts, INCUMBENTS, RUN_FILES.archive];

/** What stands at a path that shall become or is a run. */
export type FolderState = 'absent' | 'empty' | 'run' | 'other';

/** Looks at a path. Throws the refusal `folder-unusable` where it is a file or cannot be read. */
export function lookAt(folder: string): FolderState {
  try {
    if (!existsSync(folder)) return 'absent';
    const names = readdirSync(folder).filter((name) => !isOurs(name));
    if (names.length === 0 || isKilledStart(folder, names)) return 'empty';
    return names.includes(RUN_RECORD) && names.includes(RUN_FILES.rail) ? 'run' : 'other';
  } catch (error) {
    const reason = systemCode(error) === 'ENOTDIR' ? 'it is a file' : reasonOf(error);
    throw refusal('folder-unusable', { folder, reason });
  }
}

/** Makes a folder for a new run, or checks that one can be resumed. Throws the refusals of both. */
export function prepareFolder(folder: string, resume: boolean): void {
  const state = lookAt(folder);
  if (state === 'other') throw refusal('folder-not-run', { folder });
  if (state === 'run' && !resume) throw refusal('folder-has-run', { folder });
  if (state !== 'run' && resume) throw refusal('resume-nothing', { folder });
  makeFolder(folder);
}

/** Makes a folder where there is none. Throws the refusal `folder-unusable` where it cannot be made or written. */
export function makeFolder(folder: string): void {
  try {
    mkdirSync(folder, { recursive: true });
    accessSync(folder, constants.W_OK | constants.X_OK);
  } catch (error) {
    throw refusal('folder-unusable', { folder, reason: reasonOf(error) });
  }
}

/** Path of a file of the run. */
export function runFile(folder: string, name: keyof typeof RUN_FILES): string {
  return join(folder, RUN_FILES[name]);
}

// The record is written first and the sheet last, so that a record without a sheet is a start that was killed in between: nothing
// is lost with it. A folder of somebody else's stays theirs.
function isKilledStart(folder: string, names: readonly string[]): boolean {
  if (!names.includes(RUN_RECORD) || names.some((name) => !BEGUN.includes(name))) return false;
  return /"format":\s*"chopfront-run"/.test(readFileSync(join(folder, RUN_RECORD), 'utf8'));
}

// A lock and half-written files do not make a folder count as used: they may be all that a killed start left behind. Nor do
// the shards of a sweep, which their merged run may stand beside.
function isOurs(name: string): boolean {
  return name.startsWith('lock.json') || /^\..*\.tmp$/.test(name) || /^shard-\d+$/.test(name) || name === 'slurm';
}
