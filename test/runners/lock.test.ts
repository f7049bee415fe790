/** The lock of a run folder: one holder at a time; a dead holder's lock is taken over, a living one's never. */
import { spawn } from 'node:child_process';
import { existsSync, mkdtempSync, readdirSync, readFileSync, utimesSync, writeFileSync } from 'node:fs';
import { hostname, tmpdir } from 'node:os';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { STALE_AFTER, takeLock } from '../../runners/run-folder/lock.ts';

const folder = (): string => mkdtempSync(join(tmpdir(), 'chopfront-'));
const forge = (at: string, owner: object): void => writeFileSync(join(at, 'lock.json'), JSON.stringify(owner));

async function deadPid(): Promise<number> {
  const child = spawn(process.execPath, ['-e', '']);
  await new Promise((done) => child.on('exit', done));
  return child.pid ?? 0;
}

describe('the lock of a run folder', () => {
  it('is held by one and free again after', () => {
    const at = folder();
    const lock = takeLock(at);
    expect(lock.held()).toBe(true);
    expect(() => takeLock(at)).toThrow(
      new RegExp(`in use by another sweep \\(process ${process.pid} on ${hostname()}, last seen \\d+ s ago\\)`),
    );
    lock.release();
    takeLock(at).release();
    expect(readdirSync(at)).toEqual([]);
  });

  it('of a process that has died on this host is taken over at once', async () => {
    const at = folder();
    forge(at, { token: 'old', host: hostname(), pid: await deadPid(), born: '' });
    const lock = takeLock(at);
    expect(lock.held()).toBe(true);
    lock.release();
  });

  it('of a process whose id another process has now is taken over', () => {
    const at = folder();
    forge(at, { token: 'old', host: hostname(), pid: process.pid, born: '1' });
    expect(takeLock(at).held()).toBe(true);
  });

  it('of another host stands while its heartbeat is young, and is taken over when it is old', () => {
    const at = folder();
    forge(at, { token: 'old', host: 'elsewhere', pid: 1, born: '' });
    expect(() => takeLock(at)).toThrow('process 1 on elsewhere');
    const past = Date.now() / 1000 - STALE_AFTER - 10;
    utimesSync(join(at, 'lock.json'), past, past);
    expect(takeLock(at).held()).toBe(true);
  });

  it('is lost, not released twice, when another host has taken it over', () => {
    const at = folder();
    const lock = takeLock(at);
    forge(at, { token: 'other', host: 'elsewhere', pid: 1, born: '' });
    expect(lock.held()).toBe(false);
    lock.release();
    expect(existsSync(join(at, 'lock.json'))).toBe(true);
    expect(readFileSync(join(at, 'lock.json'), 'utf8')).toContain('elsewhere');
  });
});
