/**
 * Submits a sweep to Slurm: an array job whose tasks are shards, and a job after it that checks that all are there and merges
 * them. The folder is the record of truth: nothing depends on how the cluster treats requeued jobs, and submitting again
 * runs what is missing.
 */
import { spawnSync } from 'node:child_process';
import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { refusal, systemCode } from '../errors.ts';
import { writeWhole } from '../run-folder/files.ts';

/** What to submit. */
export interface SlurmJob {
  /** Absolute path of the folder on the shared file system. */
  readonly out: string;
  readonly shards: number;
  readonly partition?: string;
  /** As Slurm takes it, such as `08:00:00`. */
  readonly timeLimit?: string;
  readonly threads: number;
  /** Arguments of `chopfront` for one shard and for the merge, without the program. */
  readonly shardArguments: readonly string[];
  readonly mergeArguments: readonly string[];
  /** Node and the script that run `chopfront`. */
  readonly program: readonly string[];
  readonly name: string;
}

/** Ids that the scheduler gave. */
export interface Submitted {
  readonly array: string;
  readonly merge: string;
}

/** Seconds before its time limit at which a shard is told to save; it then asks to be run again. */
const NOTICE = 60;

/** Writes both job scripts into the folder and submits them. Throws `slurm-missing` and `slurm-refused`. */
export function submit(job: SlurmJob): Submitted {
  mkdirSync(join(job.out, 'slurm'), { recursive: true });
  const array = sbatch(job, 'shards.sh', shardScript(job), []);
  const merge = sbatch(job, 'merge.sh', mergeScript(job), [`--dependency=afterany:${array}`]);
  return { array, merge };
}

/** The array job's script. */
function shardScript(job: SlurmJob): string {
  const directives = [
    `--job-name=${job.name}`,
    `--array=0-${job.shards - 1}`,
    `--cpus-per-task=${job.threads}`,
    `--signal=B:TERM@${NOTICE}`,
    '--requeue',
    '--open-mode=append',
    `--output=${join(job.out, 'slurm', 'shard-%a.log')}`,
  ];
  return script(job, directives, job.shardArguments);
}

/** The script of the job that checks and merges. */
function mergeScript(job: SlurmJob): string {
  const directives = [`--job-name=${job.name}-merge`, `--output=${join(job.out, 'slurm', 'merge.log')}`];
  return script(job, directives, job.mergeArguments);
}

function script(job: SlurmJob, directives: readonly string[], args: readonly string[]): string {
  const passed = [
    ...(job.partition === undefined ? [] : [`--partition=${job.partition}`]),
    ...(job.timeLimit === undefined ? [] : [`--time=${job.timeLimit}`]),
  ];
  const lines = [...directives, ...passed].map((directive) => `#SBATCH ${directive}`);
  return `#!/bin/sh\n${lines.join('\n')}\nexec ${[...job.program, ...args].map(quoted).join(' ')}\n`;
}

function sbatch(job: SlurmJob, name: string, text: string, options: readonly string[]): string {
  const path = join(job.out, 'slurm', name);
  writeWhole(path, text);
  const run = spawnSync('sbatch', ['--parsable', ...options, path], { encoding: 'utf8' });
  if (run.error !== undefined && systemCode(run.error) === 'ENOENT') throw refusal('slurm-missing');
  if (run.status !== 0)
    throw refusal('slurm-refused', { reason: run.stderr.trim().split('\n')[0] ?? 'no reason given' });
  return run.stdout.trim().split(';')[0] ?? '';
}

/** `text` as one word of the shell. */
function quoted(text: string): string {
  return /^[\w@%+=:,./-]+$/.test(text) ? text : `'${text.replaceAll("'", `'\\''`)}'`;
}
