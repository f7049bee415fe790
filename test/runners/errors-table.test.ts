/** Every refusal, word for word, as a person reads it: whoever changes a text or adds a row changes it here too. */
import { describe, expect, it } from 'vitest';
import { ERRORS, refusal, STATUS } from '../../runners/errors.ts';
import { trackedTexts } from '../support/project.ts';

type Row = readonly [values: Readonly<Record<string, string | number>>, status: number, text: string];

const folder = 'runs/night';
const EXPECTED: Readonly<Record<string, Row>> = {
  usage: [
    { text: "missing required argument 'sheet'", command: 'check ' },
    2,
    "missing required argument 'sheet'; see: chopfront check --help",
  ],
  findings: [
    { text: 'rail.yaml:8:12: output.current: found 8 without a unit; allowed: a current such as 8 A' },
    2,
    'rail.yaml:8:12: output.current: found 8 without a unit; allowed: a current such as 8 A',
  ],
  'file-missing': [
    { file: 'rail.yaml', what: 'a rail sheet' },
    2,
    'rail.yaml: no such file; give the path of a rail sheet',
  ],
  'file-folder': [{ file: 'runs', what: 'a rail sheet' }, 2, 'runs: is a folder; give the path of a rail sheet'],
  'file-unreadable': [
    { file: 'rail.yaml', reason: 'permission denied' },
    2,
    'rail.yaml: cannot be read (permission denied)',
  ],
  'file-large': [
    { file: 'dump.bin', size: '10.0', what: 'a rail sheet', limit: '1.0' },
    2,
    'dump.bin: is 10.0 MB; a rail sheet is never above 1.0 MB, so this is some other file',
  ],
  'table-kind': [
    { file: 'mine.csv', kinds: 'switches, diodes' },
    2,
    'mine.csv: its header fits no kind of parts table (switches, diodes); begin from: chopfront parts template KIND',
  ],
  'rows-rejected': [
    { rejected: '2 of 12 rows in mine.csv' },
    2,
    '2 of 12 rows in mine.csv rejected; mend them as listed, then check again',
  ],
  'unknown-kind': [
    { name: 'swiches', names: 'switches, diodes', nearest: '; did you mean switches?' },
    2,
    'no kind of parts table named swiches; there are: switches, diodes; did you mean switches?',
  ],
  'unknown-shell': [
    { name: 'tea', names: 'bash, zsh, fish' },
    2,
    'no completion for tea; there is one for: bash, zsh, fish',
  ],
  'file-exists': [
    { file: 'rail.yaml' },
    2,
    'rail.yaml: exists already; choose another name, or add --force to replace it',
  ],
  'file-unwritable': [
    { file: 'a/rail.yaml', reason: 'no such file or folder' },
    2,
    'a/rail.yaml: cannot be written (no such file or folder); choose another place',
  ],
  'unknown-scenario': [
    { name: 'hut-lonk', names: 'hut-link, hut-shelf', nearest: '; did you mean hut-link?' },
    2,
    'no scenario named hut-lonk; there are: hut-link, hut-shelf; did you mean hut-link?',
  ],
  'folder-not-run': [{ folder }, 2, 'runs/night: holds files but no run; give a new or empty folder to --out'],
  'folder-has-run': [
    { folder },
    2,
    'runs/night: holds a run already; add --resume to go on with it, or give another folder to --out',
  ],
  'run-missing': [{ folder }, 2, 'runs/night: no such run; make one with: chopfront sweep SHEET --out runs/night'],
  'run-empty': [
    { folder },
    2,
    'runs/night: this run has no front yet; go on with: chopfront sweep --resume --out runs/night',
  ],
  'run-damaged': [
    { folder, file: 'run.json', reason: 'status: missing' },
    2,
    'runs/night/run.json: cannot be understood (status: missing); restore it, or start a new run',
  ],
  'resume-nothing': [{ folder }, 2, 'runs/night: nothing to resume here; leave --resume out to start a run'],
  'resume-sheet': [
    { folder, difference: '  output.ripple: 20 mV became 10 mV' },
    2,
    'runs/night: the sheet has changed since this run began:\n  output.ripple: 20 mV became 10 mV\nrestore it, or sweep into another folder',
  ],
  'resume-parts': [
    { folder, difference: 'mine.csv is new' },
    2,
    'runs/night: the parts tables have changed since this run began (mine.csv is new); restore them, or sweep into another folder',
  ],
  'resume-settings': [
    { folder, name: 'seed', was: '1', now: '2' },
    2,
    'runs/night: this run began with seed 1, not 2; leave the option out to go on as it began',
  ],
  'resume-version': [
    { folder, was: '0.1.0', now: '0.2.0' },
    2,
    'runs/night: this run was made by version 0.1.0; this is 0.2.0, whose figures may differ: sweep into another folder',
  ],
  'checkpoint-none': [
    { folder },
    2,
    'runs/night: no checkpoint is whole any more; leave --resume out and start again in another folder',
  ],
  locked: [
    { folder, pid: 812, host: 'bench', age: '3 s' },
    4,
    'runs/night: in use by another sweep (process 812 on bench, last seen 3 s ago); wait for it, or stop it first',
  ],
  'no-design': [
    { evaluations: 20_000, explanation: '  efficiency@100%: missed by 3 %' },
    3,
    'no design keeps every limit after 20000 evaluations\n  efficiency@100%: missed by 3 %',
  ],
  'no-space': [
    { reasons: 'rail.yaml: parts.inductors: found no usable row' },
    3,
    'this sheet leaves nothing to search:\n  rail.yaml: parts.inductors: found no usable row',
  ],
  'unknown-design': [
    { folder, id: 'd9', nearest: '; it holds, for example, d01jm4' },
    2,
    'runs/night: no design d9 in this run; it holds, for example, d01jm4',
  ],
  'ambiguous-design': [
    { folder, id: 'd0', ids: 'd01jm4, d06974' },
    2,
    'runs/night: d0 begins more than one design id: d01jm4, d06974',
  ],
  'disk-full': [
    { folder, checkpoint: 'checkpoint-0000000004.bin', command: 'chopfront sweep --out runs/night --resume' },
    1,
    'runs/night: the disk is full; the last whole checkpoint (checkpoint-0000000004.bin) is kept: free some space, then go on with: chopfront sweep --out runs/night --resume',
  ],
  'folder-read-only': [
    {
      folder,
      reason: 'the file system is read-only',
      checkpoint: 'checkpoint-0000000004.bin',
      command: 'chopfront sweep --out runs/night --resume',
    },
    1,
    'runs/night: may not be written (the file system is read-only); the last whole checkpoint (checkpoint-0000000004.bin) is kept; then go on with: chopfront sweep --out runs/night --resume',
  ],
  'folder-vanished': [
    { folder },
    1,
    'runs/night: has vanished while the sweep ran; what was saved there is gone with it',
  ],
  'lock-lost': [{ folder }, 4, 'runs/night: another sweep has taken this folder over; this one ends without writing'],
  'folder-unusable': [
    { folder, reason: 'permission denied' },
    2,
    'runs/night: cannot be made or written (permission denied); choose another folder',
  ],
  'all-islands-failed': [{ reason: 'out of memory' }, 1, 'every island of the search has failed; first: out of memory'],
  'worker-missing': [
    { path: 'dist/runners/engines/worker.js' },
    1,
    'the worker program is not where it was built (dist/runners/engines/worker.js); run: npm run build',
  ],
  'merge-differs': [
    { folder, what: 'sheet', first: 'runs/monday' },
    2,
    'runs/night: was made from another sheet than runs/monday; only runs of one sheet and one set of parts can be merged',
  ],
  'objectives-differ': [
    { folder, names: 'loss, volume', ours: 'loss, cost' },
    2,
    'runs/night: this run has the objectives loss, volume; the sheet has loss, cost: give a run of the same sheet',
  ],
  'shard-range': [{ shard: 16, shards: 16, last: 15 }, 2, 'shard 16 is not one of 16; shards count from 0 to 15'],
  'shards-differ': [
    { shard: '1/4', shards: 5 },
    2,
    '--shard 1/4 and --shards 5 contradict each other; give one of them',
  ],
  'no-index': [{}, 2, 'no scheduler has set an index here; give --shard I/K, or submit this as an array job'],
  'shards-missing': [
    { missing: '3, 7', shards: 16, command: 'sbatch --array=3,7 runs/night/slurm/job.sh' },
    1,
    'shards 3, 7 of 16 are not done; submit them again with: sbatch --array=3,7 runs/night/slurm/job.sh',
  ],
  'slurm-missing': [
    {},
    2,
    'no sbatch here; run this where the scheduler is installed, or leave --on out to sweep on this machine',
  ],
  'slurm-refused': [
    { reason: 'sbatch: error: invalid partition specified: moon' },
    1,
    'the scheduler refused the job: sbatch: error: invalid partition specified: moon',
  ],
  'simulator-missing': [
    {},
    2,
    'no circuit simulator here: install ngspice, or the optional package eecircuit-engine, and try again',
  ],
  'page-failed': [{ reason: 'page-data is empty' }, 1, 'the page could not be drawn: page-data is empty'],
};

describe('the texts of the refusals', () => {
  it.each(Object.entries(EXPECTED))('%s', (code, [values, status, text]) => {
    expect(Object.keys(ERRORS)).toContain(code);
    const error = refusal(code as keyof typeof ERRORS, values);
    expect(error.message).toBe(text);
    expect(error.status).toBe(status);
  });

  it('are all written down here', () => {
    expect(Object.keys(EXPECTED).sort()).toEqual(Object.keys(ERRORS).sort());
  });

  it('are all used: no row stands for a refusal that nothing throws', () => {
    const runners = trackedTexts(/^runners\/(?!errors\.ts).*\.ts$/).map(({ text }) => text);
    const idle = Object.keys(ERRORS).filter((code) => !runners.some((text) => text.includes(`refusal('${code}'`)));
    expect(idle).toEqual([]);
  });
});

describe('what a refusal repeats of somebody else', () => {
  it('stays on its line, shown character for character', () => {
    const hostile = 'a\nb\u001b[2J\u202egnp';
    expect(refusal('file-exists', { file: hostile }).message).toBe(
      'a\\u{a}b\\u{1b}[2J\\u{202e}gnp: exists already; choose another name, or add --force to replace it',
    );
  });

  it('is cut where it is 10,000 characters long', () => {
    const { message } = refusal('file-exists', { file: 'x'.repeat(10_000) });
    expect(message.length).toBeLessThan(500);
    expect(message).toContain('xxx…: exists already');
  });
});

describe('exit statuses', () => {
  it('are the documented ones and stay', () => {
    expect(STATUS).toEqual({
      done: 0,
      fault: 1,
      badInput: 2,
      noDesign: 3,
      locked: 4,
      requeue: 75,
      hangUp: 129,
      interrupt: 130,
      terminate: 143,
    });
  });
});
