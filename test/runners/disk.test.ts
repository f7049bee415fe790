/**
 * When the disk fails a sweep: full, read-only or gone, each with one clear line, the last whole checkpoint kept, and the same
 * bytes once it is mended. Full and read-only need a small file system of their own, which only root may mount.
 */
import { spawnSync } from 'node:child_process';
import { readFileSync, renameSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { checkpointNames, readCheckpoint } from '../../runners/run-folder/checkpoint.ts';
import { lacking } from '../support/needs.ts';
import { newFolder, startToy, sweepToy, until } from './processes.ts';

const order = { evaluations: 4000, threads: 2, source: { work: 20_000 }, checkpoint: 0.05 };
const front = (folder: string): string => readFileSync(join(folder, 'front.csv'), 'utf8');
let whole = '';

beforeAll(async () => {
  const folder = newFolder();
  await sweepToy({ ...order, folder });
  whole = front(folder);
});

function mount(point: string, options: string): boolean {
  return spawnSync('mount', ['-t', 'tmpfs', '-o', options, 'tmpfs', point]).status === 0;
}

function mayMount(): boolean {
  const point = newFolder();
  if (!mount(point, 'size=1m')) return false;
  spawnSync('umount', [point]);
  return true;
}

const small = mayMount() || lacking('mount', 'mounting a tmpfs is not allowed here');

describe.runIf(small)('on a small file system', () => {
  const point = newFolder();
  const run = join(point, 'run');
  afterAll(() => {
    spawnSync('umount', [point]);
  });

  it('full: says so and what to do, keeps the last whole checkpoint, and ends at the same bytes with more room', async () => {
    // Room for two checkpoints of this sweep and not for a third beside them.
    expect(mount(point, 'size=2800k')).toBe(true);
    const ended = await sweepToy({ ...order, folder: run });
    expect(ended.status).toBe(1);
    expect(ended.stderr).toMatch(/run: the disk is full; the last whole checkpoint \(checkpoint-\d+\.bin\) is kept/);
    expect(ended.stderr).toContain(`go on with: chopfront sweep --out ${run} --resume`);
    expect(ended.stderr).not.toMatch(/\n\s+at /);
    expect(readCheckpoint(run)).toMatchObject({ checkpoint: { node: process.version }, warnings: [] });
    expect(spawnSync('mount', ['-o', 'remount,size=20m', point]).status).toBe(0);
    expect(await sweepToy({ ...order, folder: run, resume: true })).toMatchObject({ status: 0 });
    expect(front(run)).toBe(whole);
  });

  it('read-only in the middle: says so and ends with status 1', async () => {
    const folder = join(point, 'second');
    const { ended } = startToy({ ...order, folder, evaluations: 12_000, source: { work: 80_000 } });
    await until(() => saved(folder));
    // Refused at the moment of a write.
    await until(() => spawnSync('mount', ['-o', 'remount,ro', point]).status === 0);
    const { status, stderr } = await ended;
    expect(status).toBe(1);
    expect(stderr).toMatch(
      /second: may not be written \(.*read-only.*\); the last whole checkpoint \(checkpoint-\d+\.bin\) is kept/,
    );
    expect(stderr).not.toMatch(/\n\s+at /);
  });
});

/** What Node 20 itself prints when it aborts while a thread that still compiles is ended: seen once, and nothing of ours. */
const RUNTIME_ABORT = 'node_platform.cc';

describe('a folder that vanishes', () => {
  it('ends the sweep with one line and status 1', async () => {
    let outcome = await vanish();
    if (outcome.stderr.includes(RUNTIME_ABORT)) outcome = await vanish();
    expect(outcome.stderr).toContain('run: has vanished while the sweep ran');
    expect(outcome.status).toBe(1);
  });

  async function vanish() {
    const folder = join(newFolder(), 'run');
    const { ended } = startToy({ ...order, folder, evaluations: 40_000 });
    await until(() => saved(folder));
    // One rename: deleting file by file would race with the sweep, which may write a new file into the folder meanwhile.
    renameSync(folder, `${folder}-elsewhere`);
    return ended;
  }
});

function saved(folder: string): boolean {
  try {
    return checkpointNames(folder).length > 0;
  } catch {
    return false;
  }
}
