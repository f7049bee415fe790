/**
 * Every refusal a person can meet, in one table: a code, the exit status, and the text with the next step in it.
 * Commands throw a `Refusal`; `main` prints its one line and leaves with its status. Anything else that is thrown is an
 * internal fault.
 */
import { short } from './terminal/text.ts';

/** Exit statuses. Stable: scripts and schedulers rely on them. */
export const STATUS = {
  done: 0,
  fault: 1,
  badInput: 2,
  noDesign: 3,
  locked: 4,
  requeue: 75,
  hangUp: 129,
  interrupt: 130,
  terminate: 143,
} as const;

/** Code → exit status and text; `{name}` is filled in. */
export const ERRORS = {
  usage: [2, '{text}; see: chopfront {command}--help'],
  findings: [2, '{text}'],
  'file-missing': [2, '{file}: no such file; give the path of {what}'],
  'file-folder': [2, '{file}: is a folder; give the path of {what}'],
  'file-unreadable': [2, '{file}: cannot be read ({reason})'],
  'file-large': [2, '{file}: is {size} MB; {what} is never above {limit} MB, so this is some other file'],
  'table-kind': [
    2,
    '{file}: its header fits no kind of parts table ({kinds}); begin from: chopfront parts template KIND',
  ],
  'rows-rejected': [2, '{rejected} rejected; mend them as listed, then check again'],
  'unknown-kind': [2, 'no kind of parts table named {name}; there are: {names}{nearest}'],
  'unknown-shell': [2, 'no completion for {name}; there is one for: {names}'],
  'file-exists': [2, '{file}: exists already; choose another name, or add --force to replace it'],
  'file-unwritable': [2, '{file}: cannot be written ({reason}); choose another place'],
  'unknown-scenario': [2, 'no scenario named {name}; there are: {names}{nearest}'],
  'folder-not-run': [2, '{folder}: holds files but no run; give a new or empty folder to --out'],
  'folder-has-run': [
    2,
    '{folder}: holds a run already; add --resume to go on with it, or give another folder to --out',
  ],
  'run-missing': [2, '{folder}: no such run; make one with: chopfront sweep SHEET --out {folder}'],
  'run-empty': [2, '{folder}: this run has no front yet; go on with: chopfront sweep --resume --out {folder}'],
  'run-damaged': [2, '{folder}/{file}: cannot be understood ({reason}); restore it, or start a new run'],
  'resume-nothing': [2, '{folder}: nothing to resume here; leave --resume out to start a run'],
  'resume-sheet': [
    2,
    '{folder}: the sheet has changed since this run began:\n{difference}\nrestore it, or sweep into another folder',
  ],
  'resume-parts': [
    2,
    '{folder}: the parts tables have changed since this run began ({difference}); restore them, or sweep into another folder',
  ],
  'resume-settings': [
    2,
    '{folder}: this run began with {name} {was}, not {now}; leave the option out to go on as it began',
  ],
  'resume-version': [
    2,
    '{folder}: this run was made by version {was}; this is {now}, whose figures may differ: sweep into another folder',
  ],
  'checkpoint-none': [
    2,
    '{folder}: no checkpoint is whole any more; leave --resume out and start again in another folder',
  ],
  locked: [
    4,
    '{folder}: in use by another sweep (process {pid} on {host}, last seen {age} ago); wait for it, or stop it first',
  ],
  'no-design': [3, 'no design keeps every limit after {evaluations} evaluations\n{explanation}'],
  'no-space': [3, 'this sheet leaves nothing to search:\n  {reasons}'],
  'unknown-design': [2, '{folder}: no design {id} in this run{nearest}'],
  'ambiguous-design': [2, '{folder}: {id} begins more than one design id: {ids}'],
  'disk-full': [
    1,
    '{folder}: the disk is full; the last whole checkpoint ({checkpoint}) is kept: free some space, then go on with: {command}',
  ],
  'folder-read-only': [
    1,
    '{folder}: may not be written ({reason}); the last whole checkpoint ({checkpoint}) is kept; then go on with: {command}',
  ],
  'folder-vanished': [1, '{folder}: has vanished while the sweep ran; what was saved there is gone with it'],
  'lock-lost': [4, '{folder}: another sweep has taken this folder over; this one ends without writing'],
  'folder-unusable': [2, '{folder}: cannot be made or written ({reason}); choose another folder'],
  'all-islands-failed': [1, 'every island of the search has failed; first: {reason}'],
  'worker-missing': [1, 'the worker program is not where it was built ({path}); run: npm run build'],
  'merge-differs': [
    2,
    '{folder}: was made from another {what} than {first}; only runs of one sheet and one set of parts can be merged',
  ],
  'objectives-differ': [
    2,
    '{folder}: this run has the objectives {names}; the sheet has {ours}: give a run of the same sheet',
  ],
  'shard-range': [2, 'shard {shard} is not one of {shards}; shards count from 0 to {last}'],
  'shards-differ': [2, '--shard {shard} and --shards {shards} contradict each other; give one of them'],
  'no-index': [2, 'no scheduler has set an index here; give --shard I/K, or submit this as an array job'],
  'shards-missing': [1, 'shards {missing} of {shards} are not done; submit them again with: {command}'],
  'slurm-missing': [
    2,
    'no sbatch here; run this where the scheduler is installed, or leave --on out to sweep on this machine',
  ],
  'slurm-refused': [1, 'the scheduler refused the job: {reason}'],
  'simulator-missing': [
    2,
    'no circuit simulator here: install ngspice, or the optional package eecircuit-engine, and try again',
  ],
  'page-failed': [1, 'the page could not be drawn: {reason}'],
} as const satisfies Record<string, readonly [number, string]>;

/** Name of a row of the table. */
export type ErrorCode = keyof typeof ERRORS;

/** A refusal with its row and text; what it says is meant for a person. */
export class Refusal extends Error {
  readonly code: ErrorCode;
  /** Exit status of the process. */
  readonly status: number;
  constructor(code: ErrorCode, text: string, status: number) {
    super(text);
    this.code = code;
    this.status = status;
  }
}

/** Values that we laid out in lines ourselves; every other one is somebody's text and stays on its line. */
const LAID_OUT = new Set(['text', 'difference', 'explanation', 'reasons']);
/** Longest text of somebody that a message repeats, characters. */
const LONGEST = 400;

/** The refusal of that code; each `{name}` in its text is taken from `values`, made harmless. */
export function refusal(code: ErrorCode, values: Readonly<Record<string, string | number>> = {}): Refusal {
  const [status, template] = ERRORS[code];
  const text = template.replace(/\{(\w+)\}/g, (_, name: string) => {
    const value = String(values[name] ?? `{${name}}`);
    return LAID_OUT.has(name) ? value : short(value, LONGEST);
  });
  return new Refusal(code, text, status);
}

/** The code that Node or the system gave to an error, such as `ENOENT`; empty where it gave none. */
export function systemCode(error: unknown): string {
  if (error instanceof Refusal) return '';
  return error instanceof Error && 'code' in error && typeof error.code === 'string' ? error.code : '';
}

/** What the system's codes mean to a person. */
const SYSTEM_REASONS: Readonly<Record<string, string>> = {
  ENOENT: 'no such file or folder',
  EACCES: 'permission denied',
  EPERM: 'permission denied',
  EEXIST: 'a file of that name is in the way',
  EISDIR: 'it is a folder',
  ENOTDIR: 'a part of that path is a file',
  ENOSPC: 'the disk is full',
  EDQUOT: 'the quota is used up',
  EROFS: 'the file system is read-only',
  ENAMETOOLONG: 'the name is too long',
  ELOOP: 'its links go round in a circle',
  EMFILE: 'too many files are open',
  EIO: 'the device fails',
};

/** What went wrong in one line, whatever was thrown. */
export function reasonOf(error: unknown): string {
  const known = SYSTEM_REASONS[systemCode(error)];
  if (known !== undefined) return known;
  const text = error instanceof Error ? error.message : String(error);
  return text.split('\n', 1)[0] ?? '';
}
