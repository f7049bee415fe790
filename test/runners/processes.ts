/** Starting the built programs as real processes, as a person or a scheduler would. */
import { type ChildProcess, spawn } from 'node:child_process';
import { existsSync, mkdtempSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { ToyOrder } from './toy-sweep.ts';

/** What a process left behind. */
export interface Ended {
  /** Exit status; 128 + number where a signal ended it. */
  readonly status: number;
  readonly stdout: string;
  readonly stderr: string;
}

/** A process that runs. */
export interface Running {
  readonly child: ChildProcess;
  readonly ended: Promise<Ended>;
}

const DIST = new URL('../../dist/', import.meta.url).pathname;
const TOY = join(DIST, 'test', 'runners', 'toy-sweep.js');
const CHOPFRONT = join(DIST, 'runners', 'chopfront.js');
const SIGNAL_NUMBERS: Readonly<Record<string, number>> = { SIGHUP: 1, SIGINT: 2, SIGKILL: 9, SIGTERM: 15 };

/** Starts a sweep of the toy problem. */
export function startToy(order: ToyOrder): Running {
  return start(TOY, [JSON.stringify(order)]);
}

/** Starts `chopfront` with these arguments. */
export function startChopfront(args: readonly string[], env: NodeJS.ProcessEnv = {}, cwd?: string): Running {
  return start(CHOPFRONT, args, env, cwd);
}

/** Runs `chopfront` to its end. */
export function chopfront(...args: readonly string[]): Promise<Ended> {
  return startChopfront(args).ended;
}

/** Runs a sweep of the toy problem to its end. */
export function sweepToy(order: ToyOrder): Promise<Ended> {
  return startToy(order).ended;
}

/** A new empty folder that goes away with the machine's temporary files. */
export function newFolder(): string {
  return mkdtempSync(join(tmpdir(), 'chopfront-test-'));
}

/** Most that a test waits for another process, s: a busy machine must not make one fail. */
const PATIENCE = 200;

/** Waits until `ready` holds; what it throws meanwhile, such as that a file is not there, is no. */
export async function until(ready: () => boolean): Promise<void> {
  for (let i = 0; i < 100 * PATIENCE; i++) {
    if (holds(ready)) return;
    await new Promise((done) => setTimeout(done, 10));
  }
  throw new Error(`waited ${PATIENCE} s in vain`);
}

function holds(ready: () => boolean): boolean {
  try {
    return ready();
  } catch {
    return false;
  }
}

function start(script: string, args: readonly string[], env: NodeJS.ProcessEnv = {}, cwd?: string): Running {
  if (!existsSync(script)) throw new Error(`${script} is missing: run npm run build first`);
  const child = spawn(process.execPath, [script, ...args], {
    env: { ...process.env, ...env },
    cwd,
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let [stdout, stderr] = ['', ''];
  child.stdout?.on('data', (data: Buffer) => {
    stdout += data.toString();
  });
  child.stderr?.on('data', (data: Buffer) => {
    stderr += data.toString();
  });
  const ended = new Promise<Ended>((done) => {
    child.on('close', (code, signal) =>
      done({ status: code ?? 128 + (SIGNAL_NUMBERS[signal ?? ''] ?? 0), stdout, stderr }),
    );
  });
  return { child, ended };
}
