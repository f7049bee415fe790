/**
 * A sweep on a real scheduler: an array of four shards, one of them requeued in the middle, checked and merged by the job after
 * them, equals the same four shards on one machine to the byte.
 */
import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { readRecord } from '../../runners/run-folder/record.ts';
import { chopfront, newFolder, startChopfront } from '../runners/processes.ts';
import { lacking } from '../support/needs.ts';
import { type PrivateSlurm, startSlurm, waitFor, whyNoSlurm } from './private-slurm.ts';

const SHEET = new URL('../../model/rails/buoy-sensors.yaml', import.meta.url).pathname;
const BYTES = ['front.csv', 'front.json', 'near-misses.csv', 'history.csv', 'archive.bin'];
const SIZE = ['--shards', '4', '--evaluations', '128k', '--seed', 'cluster', '--threads', '1'];
const why = whyNoSlurm();
const here = why === '' || lacking('slurm', why);

describe.runIf(here)('on a private Slurm', () => {
  let slurm: PrivateSlurm;
  beforeAll(async () => {
    slurm = await startSlurm(newFolder(), 2);
  });
  afterAll(async () => {
    await slurm.stop();
  });

  it('four shards, one requeued in the middle, merge to the bytes of one machine', async () => {
    const out = newFolder();
    const args = ['sweep', SHEET, '--out', out, ...SIZE, '--on', 'slurm', '--partition', 'batch', '--checkpoint', '1s'];
    const submitted = await startChopfront(args, slurm.env).ended;
    expect(submitted).toMatchObject({ status: 0, stderr: '' });
    const job = /as job (\d+), the merge after them as job (\d+)/.exec(submitted.stdout);
    const requeued = join(out, 'shard-00001');
    await waitFor(() => evaluationsOf(requeued) > 0);
    slurm.run('scontrol', 'requeue', `${job?.[1]}_1`);
    await waitFor(() => readFileSync(join(out, 'slurm', 'shard-1.log'), 'utf8').includes('SIGTERM: saving'));
    // A requeued task waits for two minutes unless told to start.
    await waitFor(() => slurm.run('squeue', '-h', '-r', '-t', 'PENDING', '-o', '%F_%K').includes(`${job?.[1]}_1`));
    slurm.run('scontrol', 'update', `JobId=${job?.[1]}_1`, 'StartTime=now');
    await waitFor(() => slurm.run('squeue', '-h').trim() === '');
    expect(readFileSync(join(out, 'slurm', 'merge.log'), 'utf8')).toContain('on the front of 4 runs');
    const whole = join(newFolder(), 'run');
    expect(await chopfront('sweep', SHEET, '--out', whole, ...SIZE)).toMatchObject({ status: 0 });
    for (const name of BYTES) {
      expect(readFileSync(join(out, name), 'latin1') === readFileSync(join(whole, name), 'latin1'), name).toBe(true);
    }
    const { stdout } = await chopfront('status', ...[0, 1, 2, 3].map((shard) => join(out, `shard-0000${shard}`)));
    expect(stdout).toContain('4 of 4 done');
  }, 1_200_000);
});

function evaluationsOf(folder: string): number {
  return existsSync(join(folder, 'run.json')) ? readRecord(folder).evaluations : 0;
}
