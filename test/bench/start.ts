/** How soon the command answers: `--help` beside a program that does nothing, in turn. */
import { spawnSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { packagePath } from '../../runners/package-path.ts';

/** Starts of one program. */
export interface StartTiming {
  readonly name: string;
  /** Median time from start to end, ms. */
  readonly ms: number;
  /** Mean processor time, ms, to about 10 ms over the number of runs; NaN where the system does not tell. */
  readonly processorMs: number;
  readonly target?: number;
}

const RUNS = 21;

/** `chopfront --help`, and Node with nothing to do. */
export function timeStart(): StartTiming[] {
  const help = [packagePath('dist', 'runners', 'chopfront.js'), '--help'];
  return [
    { name: '--help', ...median(help), target: 200 },
    { name: 'Node alone', ...median(['-e', '']) },
  ];
}

/** The figures as lines of text. */
export function startLines(timings: readonly StartTiming[]): string[] {
  if (timings.length === 0) return [];
  const line = ({ name, ms, processorMs, target }: StartTiming): string =>
    `  ${name.padEnd(36)}${ms.toFixed(0)} ms, processor time ${processorMs.toFixed(0)} ms${target === undefined ? '' : ` (target ${target} ms)`}`;
  return ['', `start-up, median of ${RUNS}`, ...timings.map(line)];
}

function median(args: readonly string[]): { ms: number; processorMs: number } {
  const before = childrenSeconds();
  const times = Array.from({ length: RUNS }, () => {
    const start = performance.now();
    const { status } = spawnSync(process.execPath, args);
    if (status !== 0) throw new Error(`${args.join(' ')} ended with status ${status}`);
    return performance.now() - start;
  });
  const processorMs = (1000 * (childrenSeconds() - before)) / RUNS;
  return { ms: times.sort((a, b) => a - b)[RUNS >> 1] ?? Number.NaN, processorMs };
}

/** Processor time of all children that have ended, s (proc(5): cutime and cstime, 100 ticks a second). */
function childrenSeconds(): number {
  try {
    const stat = readFileSync('/proc/self/stat', 'utf8');
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    return (Number(fields[13]) + Number(fields[14])) / 100;
  } catch {
    return Number.NaN;
  }
}
