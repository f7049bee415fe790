/**
 * One sweep at a time in a run folder: a lock file with host, process and a heartbeat. A lock whose process is gone
 * (same host), or whose heartbeat is old (another host), is stale and is taken over.
 */
import { randomUUID } from 'node:crypto';
import { linkSync, readFileSync, renameSync, rmSync, statSync, utimesSync, writeFileSync } from 'node:fs';
import { hostname } from 'node:os';
import { join } from 'node:path';
import { refusal, systemCode } from '../errors.ts';
import { showDuration } from '../terminal/duration.ts';

/** A lock that this process holds. */
export interface Lock {
  /** Whether the lock file is still ours: false once the folder is gone or another host has taken it over. */
  held(): boolean;
  release(): void;
}

interface Owner {
  readonly token: string;
  readonly host: string;
  readonly pid: number;
  /** Start of the process in clock ticks since boot, so that a process id used again is not taken for the owner. */
  readonly born: string;
}

const NAME = 'lock.json';
const BEAT = 5_000;
/** Age of a heartbeat of another host, s, after which its lock counts as stale. */
export const STALE_AFTER = 120;

/** Takes the lock of `folder`. Throws the refusal `locked` where another process works there. */
export function takeLock(folder: string): Lock {
  const path = join(folder, NAME);
  const mine: Owner = { token: randomUUID(), host: hostname(), pid: process.pid, born: bornOf(process.pid) };
  for (let attempt = 0; attempt < 5; attempt++) {
    if (claim(path, mine)) return hold(path, mine);
    removeIfStale(folder, path);
  }
  throw busy(folder, readOwner(path), ageOf(folder, path));
}

/** Whether a process holds the folder's lock now, as far as can be told from here; writes nothing. */
export function isLocked(folder: string): boolean {
  const path = join(folder, NAME);
  try {
    const age = Math.max(0, (Date.now() - statSync(path).mtimeMs) / 1000);
    return !isStale(readOwner(path), age);
  } catch {
    return false;
  }
}

// The owner's text is complete before the name exists: a link of a finished file either appears or fails.
function claim(path: string, mine: Owner): boolean {
  const beside = `${path}.${mine.token}`;
  writeFileSync(beside, `${JSON.stringify(mine)}\n`);
  try {
    linkSync(beside, path);
    return true;
  } catch (error) {
    if (systemCode(error) === 'EEXIST') return false;
    throw error;
  } finally {
    rmSync(beside, { force: true });
  }
}

function hold(path: string, mine: Owner): Lock {
  const held = (): boolean => readOwner(path)?.token === mine.token;
  const beat = setInterval(() => {
    try {
      if (held()) utimesSync(path, new Date(), new Date());
    } catch {
      // A heartbeat that cannot be written is found at the next checkpoint, which says so.
    }
  }, BEAT);
  beat.unref();
  const release = (): void => {
    clearInterval(beat);
    if (held()) rmSync(path, { force: true });
  };
  return { held, release };
}

function removeIfStale(folder: string, path: string): void {
  const owner = readOwner(path);
  const age = ageOf(folder, path);
  if (age === undefined) return;
  if (!isStale(owner, age)) throw busy(folder, owner, age);
  const aside = `${path}.${randomUUID()}`;
  try {
    renameSync(path, aside);
  } catch (error) {
    if (systemCode(error) === 'ENOENT') return;
    throw error;
  }
  // Somebody may have taken over between our look and our rename: then what we moved is theirs, and goes back.
  if (readOwner(aside)?.token !== owner?.token) restore(aside, path);
  rmSync(aside, { force: true });
}

function restore(aside: string, path: string): void {
  try {
    linkSync(aside, path);
  } catch (error) {
    if (systemCode(error) !== 'EEXIST') throw error;
  }
}

function isStale(owner: Owner | undefined, age: number): boolean {
  if (owner === undefined) return age > STALE_AFTER;
  if (owner.host !== hostname()) return age > STALE_AFTER;
  return !isAlive(owner);
}

function isAlive(owner: Owner): boolean {
  try {
    process.kill(owner.pid, 0);
  } catch (error) {
    if (systemCode(error) === 'ESRCH') return false;
  }
  const born = bornOf(owner.pid);
  return born !== 'dead' && (born === '' || owner.born === '' || born === owner.born);
}

/** Start time of a process where the system tells it, `dead` for a zombie, empty where it does not tell. */
function bornOf(pid: number): string {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    return fields[0] === 'Z' || fields[0] === 'X' ? 'dead' : (fields[19] ?? '');
  } catch {
    return '';
  }
}

/** Age of the heartbeat, s, by the clock of the file system that holds it; undefined where there is no lock. */
function ageOf(folder: string, path: string): number | undefined {
  const probe = join(folder, `.clock.${process.pid}.tmp`);
  try {
    writeFileSync(probe, '');
    return Math.max(0, (statSync(probe).mtimeMs - statSync(path).mtimeMs) / 1000);
  } catch (error) {
    if (systemCode(error) === 'ENOENT') return undefined;
    throw error;
  } finally {
    rmSync(probe, { force: true });
  }
}

function readOwner(path: string): Owner | undefined {
  try {
    const found: unknown = JSON.parse(readFileSync(path, 'utf8'));
    return isOwner(found) ? found : undefined;
  } catch {
    return undefined;
  }
}

function isOwner(value: unknown): value is Owner {
  if (typeof value !== 'object' || value === null) return false;
  const owner: Partial<Record<keyof Owner, unknown>> = value;
  const texts = [owner.token, owner.host, owner.born].every((text) => typeof text === 'string');
  return texts && Number.isInteger(owner.pid);
}

function busy(folder: string, owner: Owner | undefined, age: number | undefined): Error {
  const who = { pid: owner?.pid ?? '?', host: owner?.host ?? '?' };
  return refusal('locked', { folder, ...who, age: showDuration(age ?? 0) });
}
