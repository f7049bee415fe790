/**
 * A sweep survives: the same seed gives the same bytes with any number of threads, stopped, killed or not, and whatever goes
 * wrong inside a worker costs at most an epoch. Real processes sweep the toy problem.
 */
import { existsSync, readdirSync, readFileSync, truncateSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { checkpointNames } from '../../runners/run-folder/checkpoint.ts';
import { readRecord } from '../../runners/run-folder/record.ts';
import { newFolder, startToy, sweepToy, until } from './processes.ts';
import type { Trap } from './toy.ts';

const EVALUATIONS = 2400;
const source = { work: 15_000 };
/** The same work at a pace at which a sweep is always caught in the middle, however late this test gets to look. */
const slow = { work: 1_000_000 };
const filesOf = (folder: string) => ({
  front: readFileSync(join(folder, 'front.csv'), 'utf8'),
  history: readFileSync(join(folder, 'history.csv'), 'utf8'),
  // Front, near misses, families, and the sample of everything feasible.
  archive: readFileSync(join(folder, 'archive.bin'), 'latin1'),
});
const saved = (folder: string): boolean => {
  try {
    return checkpointNames(folder).length > 0;
  } catch {
    return false;
  }
};
let whole: ReturnType<typeof filesOf>;
/** How long the whole sweep takes here and now, ms. */
let took: number;

beforeAll(async () => {
  const folder = newFolder();
  const begun = performance.now();
  expect(await sweepToy({ folder, evaluations: EVALUATIONS, threads: 2, source })).toMatchObject({ status: 0 });
  took = performance.now() - begun;
  whole = filesOf(folder);
  expect(whole.front.split('\n').length).toBeGreaterThan(20);
});

describe('the same seed', () => {
  it.each([0, 1, 3])('gives the same bytes with %d threads as with 2', async (threads) => {
    const folder = newFolder();
    expect(await sweepToy({ folder, evaluations: EVALUATIONS, threads, source })).toMatchObject({ status: 0 });
    expect(filesOf(folder)).toEqual(whole);
  });

  it('gives another front where the seed is another', async () => {
    const folder = newFolder();
    await sweepToy({ folder, evaluations: EVALUATIONS, threads: 2, seed: '2' });
    expect(filesOf(folder).front).not.toBe(whole.front);
  });

  it.each([
    ['SIGINT', 130],
    ['SIGTERM', 143],
    ['SIGHUP', 129],
  ] as const)('gives the same bytes when %s stopped it (status %d) and it was resumed', async (signal, status) => {
    const folder = newFolder();
    const order = { folder, evaluations: EVALUATIONS, threads: 2, source };
    const { child, ended } = startToy({ ...order, source: slow });
    await until(() => saved(folder));
    child.kill(signal);
    expect((await ended).status).toBe(status);
    expect(readRecord(folder).status).toBe('stopped');
    expect(readdirSync(folder)).not.toContain('lock.json');
    expect(await sweepToy({ ...order, threads: 1, resume: true })).toMatchObject({ status: 0 });
    expect(filesOf(folder)).toEqual(whole);
    expect(readRecord(folder).status).toBe('done');
  });

  it('leaves at once at the second SIGINT, without damage', async () => {
    const folder = newFolder();
    // Epochs that take longer than the grace that the first SIGINT gives them.
    const order = { folder, evaluations: EVALUATIONS, threads: 2, source };
    const { child, ended } = startToy({ ...order, source: { work: 5_000_000 } });
    await until(() => existsSync(join(folder, 'rail.yaml')));
    child.kill('SIGINT');
    await new Promise((done) => setTimeout(done, 200));
    child.kill('SIGINT');
    expect((await ended).status).toBe(130);
    expect(await sweepToy({ ...order, resume: true })).toMatchObject({ status: 0 });
    expect(filesOf(folder)).toEqual(whole);
  });

  it('gives the same bytes when it was killed at 20 random moments and resumed after each', async () => {
    for (let round = 0; round < 20; round++) {
      const folder = newFolder();
      const order = { folder, evaluations: EVALUATIONS, threads: 2, source, checkpoint: 0.01 };
      const { child, ended } = startToy(order);
      await new Promise((done) => setTimeout(done, 20 + took * Math.random()));
      child.kill('SIGKILL');
      await ended;
      expect(await sweepToy({ ...order, resume: true })).toMatchObject({ status: 0 });
      expect(filesOf(folder)).toEqual(whole);
    }
  }, 900_000);
});

describe('a fault inside a worker', () => {
  it.each<Trap>(['exit', 'heap', 'loop', 'throw'])(
    '%s, once: the epoch runs again and nothing else changes',
    async (trap) => {
      const folder = newFolder();
      const once = join(newFolder(), 'gone-off');
      const order = { folder, evaluations: EVALUATIONS, threads: 2, epochLimit: 20, source: { ...source, trap, once } };
      expect(await sweepToy(order)).toMatchObject({ status: 0 });
      expect(readFileSync(once, 'utf8')).toBe('');
      expect(filesOf(folder)).toEqual(whole);
      expect(readRecord(folder).faults).toEqual([]);
    },
  );

  it('every time: each island is lost with the design that did it, and the sweep says so', async () => {
    const folder = newFolder();
    const ended = await sweepToy({ folder, evaluations: EVALUATIONS, threads: 2, source: { trap: 'throw' } });
    expect(ended.status).toBe(1);
    expect(ended.stderr).toMatch(
      /island \d of shard 0 is lost after epoch 0: the trap went off while evaluating \{.*x0.*\}/,
    );
    expect(ended.stderr).toContain('every island of the search has failed; first: the trap went off');
    expect(ended.stderr).not.toMatch(/\n\s+at /);
  });
});

describe('a damaged folder', () => {
  async function stoppedRun(): Promise<string> {
    const folder = newFolder();
    const { child, ended } = startToy({ folder, evaluations: EVALUATIONS, threads: 2, source: slow, checkpoint: 0.05 });
    await until(() => checkpointNames(folder).length > 1);
    child.kill('SIGTERM');
    await ended;
    return folder;
  }

  it('goes back to the checkpoint before one that was cut short or changed, warns, and ends at the same bytes', async () => {
    const folder = await stoppedRun();
    const newest = join(folder, checkpointNames(folder)[0] ?? '');
    const bytes = readFileSync(newest);
    bytes[bytes.length >> 1] = (bytes[bytes.length >> 1] ?? 0) ^ 16;
    writeFileSync(newest, bytes);
    const ended = await sweepToy({ folder, evaluations: EVALUATIONS, threads: 2, source, resume: true });
    expect(ended.status).toBe(0);
    expect(ended.stderr).toContain('damaged (its checksum does not fit); going back to the one before');
    expect(filesOf(folder)).toEqual(whole);
  });

  it('is refused when no checkpoint is whole any more', async () => {
    const folder = await stoppedRun();
    for (const name of checkpointNames(folder)) truncateSync(join(folder, name), 50);
    const ended = await sweepToy({ folder, evaluations: EVALUATIONS, threads: 2, source, resume: true });
    expect(ended.status).toBe(2);
    expect(ended.stderr).toContain('no checkpoint is whole any more');
  });

  it('is never swept by two: the second is refused with status 4', async () => {
    const folder = newFolder();
    const order = { folder, evaluations: EVALUATIONS, threads: 1, source };
    const first = startToy({ ...order, source: slow });
    await until(() => saved(folder));
    const second = await sweepToy({ ...order, resume: true });
    expect(second.status).toBe(4);
    expect(second.stderr).toContain(`in use by another sweep (process ${first.child.pid} on`);
    first.child.kill('SIGINT');
    expect((await first.ended).status).toBe(130);
    expect(await sweepToy({ ...order, resume: true })).toMatchObject({ status: 0 });
    expect(filesOf(folder)).toEqual(whole);
  });
});

describe('shards', () => {
  it('are closed: all on one machine hold what each of them holds alone', async () => {
    const all = newFolder();
    const order = { evaluations: 2 * EVALUATIONS, threads: 2, shards: 3 };
    await sweepToy({ ...order, folder: all });
    const rows = new Set(filesOf(all).history.split('\n'));
    for (const shard of [0, 1, 2]) {
      const folder = newFolder();
      expect(await sweepToy({ ...order, folder, shard })).toMatchObject({ status: 0 });
      const own = filesOf(folder).history.trimEnd().split('\n');
      expect(own.length).toBeGreaterThan(3);
      for (const line of own) expect(rows).toContain(line);
    }
  });
});
