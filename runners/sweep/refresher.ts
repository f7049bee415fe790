/** Starts the short-lived process that rebuilds CSVs and page during a sweep: one at a time, the page not too often. */
import { type ChildProcess, spawn } from 'node:child_process';
import { packagePath } from '../package-path.ts';

/** Keeps what people look at fresh. */
export interface Refresher {
  /** Begins a refresh unless one is under way. */
  begin(): void;
  /** Resolves when nothing is under way; what hangs is ended after a while. */
  settled(): Promise<void>;
  /** Processor seconds that the last refresh took, the page apart; 0 before the first has ended. */
  cost(): number;
}

const PAGE_EVERY = 120_000;
const LONGEST = 60_000;

/** A refresher for a run folder; `warn` is told what the process had to complain about. */
export function createRefresher(folder: string, warn: (text: string) => void): Refresher {
  let child: ChildProcess | undefined;
  let ended = Promise.resolve();
  let cost = 0;
  let nextPage = performance.now() + PAGE_EVERY / 4;
  const begin = (): void => {
    if (child !== undefined) return;
    const page = performance.now() >= nextPage;
    if (page) nextPage = performance.now() + PAGE_EVERY;
    const started = start(folder, page, warn, (seconds) => {
      cost = seconds;
    });
    child = started.child;
    ended = started.ended.then(() => {
      child = undefined;
    });
  };
  return { begin, settled: () => ended, cost: () => cost };
}

function start(
  folder: string,
  page: boolean,
  warn: (text: string) => void,
  tellCost: (seconds: number) => void,
): { child: ChildProcess; ended: Promise<void> } {
  const script = packagePath('dist', 'runners', 'refresh.js');
  const args = [script, folder, ...(page ? ['page'] : [])];
  // Its own process group: a Ctrl-C at the terminal is for the sweep, which then waits for this to end.
  const child = spawn(process.execPath, args, { stdio: ['ignore', 'pipe', 'pipe'], detached: true });
  const timer = setTimeout(() => child.kill('SIGKILL'), LONGEST);
  let complaint = '';
  child.stdout?.on('data', (data: Buffer) => {
    const seconds = Number(data.toString());
    if (seconds > 0) tellCost(seconds);
  });
  child.stderr?.on('data', (data: Buffer) => {
    complaint = (complaint + data.toString()).slice(0, 2000);
  });
  const ended = new Promise<void>((done) => {
    const finish = (): void => {
      clearTimeout(timer);
      if (complaint !== '') warn(`front files not refreshed: ${complaint.split('\n', 1)[0] ?? ''}`);
      done();
    };
    child.on('error', finish);
    child.on('close', finish);
  });
  return { child, ended };
}
