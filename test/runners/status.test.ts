/** `status`: what stands in run folders and in folders of shards, and, plainly, what does not. */
import { mkdirSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { standingsOf } from '../../runners/cluster/standing.ts';
import { remarkLines, statusLines } from '../../runners/commands/status-text.ts';
import { takeLock } from '../../runners/run-folder/lock.ts';
import { type RunRecord, writeRecord } from '../../runners/run-folder/record.ts';
import { newFolder } from './processes.ts';

const record = (changes: Partial<RunRecord>): RunRecord => ({
  format: 'chopfront-run',
  status: 'done',
  version: '0',
  node: 'v20',
  rail: 'toy',
  railHash: 'r',
  partsHash: 'p',
  seed: '1',
  shards: 4,
  threads: 2,
  islands: 2,
  budget: { evaluations: 4000 },
  evaluations: 1000,
  epochs: 3,
  seconds: 10,
  perSecond: 100,
  feasible: 400,
  feasibleShare: 0.4,
  frontSize: 7,
  archiveSize: 9,
  nearMisses: 3,
  hypervolume: 0.5,
  share: 1,
  trust: {},
  faults: [],
  tables: [],
  started: '2026-01-01T00:00:00.000Z',
  updated: '2026-01-01T00:00:10.000Z',
  ...changes,
});

/** A folder with shards 0 and 1 of 4, the second one as `second` says. */
function sweepOf(second: Partial<RunRecord>): string {
  const parent = newFolder();
  for (const [shard, changes] of [{}, second].entries()) {
    const folder = join(parent, `shard-0000${shard}`);
    mkdirSync(folder);
    writeRecord(folder, record({ shard, ...changes }));
  }
  return parent;
}

describe('the status of shards', () => {
  it('has a line each and one for all, and names those that have not begun', () => {
    const standings = standingsOf([sweepOf({ share: 0.5, status: 'stopped' })]);
    const lines = statusLines(standings.runs);
    expect(lines).toHaveLength(4);
    expect(lines[1]).toMatch(/shard-00000 +done +100 % +1\.0 k +100 +10 s +40\.0 % +7 +0\.50000 +0/);
    expect(lines[2]).toMatch(/shard-00001 +stopped +50 %/);
    expect(lines[3]).toMatch(/together +1 of 2 done +75 % +2\.0 k +200 +20 s +40\.0 %/);
    expect(remarkLines(standings)).toEqual(['shards 2, 3 of 4 have not begun']);
  });

  it('keeps the end of a long path, which tells one shard from another', () => {
    const [run] = standingsOf([sweepOf({})]).runs;
    if (run === undefined) throw new Error('no run');
    const folder = `/${'far/'.repeat(30)}shard-00001`;
    expect(statusLines([{ ...run, folder }])[1]).toMatch(/^ +…[far/]+\/shard-00001 +done /);
  });

  it('calls one broken off that says it runs and that no process holds, with how to go on', () => {
    const parent = sweepOf({ status: 'running', share: 0.5 });
    const folder = join(parent, 'shard-00001');
    const lock = takeLock(folder);
    expect(standingsOf([parent]).runs.map((run) => run.state)).toEqual(['done', 'running']);
    lock.release();
    const standings = standingsOf([parent]);
    expect(standings.runs.map((run) => run.state)).toEqual(['done', 'broken off']);
    expect(remarkLines(standings)[1]).toBe(
      `${folder}: broke off, no process sweeps it; go on with: chopfront sweep --out ${folder} --resume`,
    );
  });

  it('goes past one that is damaged, and says which', () => {
    const parent = sweepOf({});
    writeFileSync(join(parent, 'shard-00001', 'run.json'), '{');
    const standings = standingsOf([parent]);
    expect(standings.runs).toHaveLength(1);
    expect(remarkLines(standings).join('\n')).toMatch(/shard-00001\/run\.json: cannot be understood/);
    rmSync(join(parent, 'shard-00001'), { recursive: true });
    expect(remarkLines(standingsOf([parent]))).toEqual(['shards 1, 2, 3 of 4 have not begun']);
  });

  it('tells each fault with the design that caused it', () => {
    const fault = { shard: 1, island: 0, epoch: 2, reason: 'its memory ran out', design: { x: 1 } };
    expect(remarkLines(standingsOf([sweepOf({ faults: [fault] })])).at(-1)).toMatch(
      /shard-00001: shard 1, island 0, lost after epoch 2: its memory ran out while evaluating \{"x":1\}/,
    );
  });

  it('refuses a run that was named and is not there', () => {
    expect(() => standingsOf([join(newFolder(), 'none')])).toThrow('no such run');
  });
});
