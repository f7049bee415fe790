/** `sweep --on slurm`: checks the sheet here and now, then hands shards and merge to the scheduler. */
import { join, resolve } from 'node:path';
import { refusal, STATUS } from '../errors.ts';
import { problemOf, readSheet } from '../inputs.ts';
import { packagePath } from '../package-path.ts';
import { makeFolder } from '../run-folder/folder.ts';
import type { SweepOptions } from '../sweep/options.ts';
import { say } from '../terminal/output.ts';
import { submit } from './slurm.ts';

/** Submits the sweep; returns the exit status. Throws refusals. */
export function submitSweep(sheet: string | undefined, options: SweepOptions): number {
  if (sheet === undefined) throw refusal('usage', { text: 'name the sheet to sweep', command: 'sweep ' });
  if (options.shards === undefined) throw refusal('usage', { text: '--on slurm needs --shards', command: 'sweep ' });
  problemOf(readSheet(sheet));
  const out = resolve(options.out);
  makeFolder(out);
  const threads = options.threads ?? 1;
  const jobs = submit({
    out,
    shards: options.shards,
    partition: options.partition,
    timeLimit: options.timeLimit,
    threads,
    program: [process.execPath, packagePath('dist', 'runners', 'chopfront.js')],
    shardArguments: shardArguments(resolve(sheet), out, options, threads),
    mergeArguments: ['merge', out, out, '--expect', String(options.shards)],
    name: 'chopfront',
  });
  say(`submitted: ${options.shards} shards as job ${jobs.array}, the merge after them as job ${jobs.merge}`);
  say(
    `watch with: chopfront status ${options.out}; what is missing at the end is named in ${join(options.out, 'slurm', 'merge.log')}`,
  );
  return STATUS.done;
}

function shardArguments(sheet: string, out: string, options: SweepOptions, threads: number): string[] {
  const budget = [
    ...given('--evaluations', options.evaluations),
    ...given('--time', options.time === undefined ? undefined : `${options.time}s`),
    ...given('--until-steady', options.untilSteady),
    ...given('--checkpoint', options.checkpoint === undefined ? undefined : `${options.checkpoint}s`),
  ];
  const seed = given('--seed', options.seed);
  const shards = ['--shards', String(options.shards), '--shard', 'auto', '--threads', String(threads)];
  return ['sweep', sheet, '--out', out, ...shards, ...seed, ...budget];
}

function given(option: string, value: string | number | undefined): string[] {
  return value === undefined ? [] : [option, String(value)];
}
