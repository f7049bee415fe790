/**
 * How well the runner uses a machine: two threads against one, what saving costs, whether memory grows, and what merging costs from 1 to 1,000 shards, with
 * 10,000 on paper. Absolute figures depend on the machine and on who else uses it; the ratios are what is compared.
 */
import { spawn } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createInterface } from 'node:readline';
import { packagePath } from '../../runners/package-path.ts';
import { readRecord } from '../../runners/run-folder/record.ts';
import type { ChildTask, MergeMark } from './runner-child.ts';

/** The runner's figures. */
export interface RunnerTiming {
  readonly sheet: string;
  readonly scaling: Scaling;
  readonly memory: Memory;
  readonly merge: Merging;
}

/** Two threads against one, in turn: one, two, two, one. */
export interface Scaling {
  /** Designs judged by each of the four sweeps; the last two thirds of them count, so that starting up and most of the compiling do not. */
  readonly evaluations: number;
  /** Designs per second with two threads over those with one. */
  readonly ratio: number;
  /** Twice the designs per processor second with two threads over those with one: the ratio on two processors that nobody else uses. */
  readonly ratioByProcessorTime: number;
  readonly target: number;
}

/** Resident memory of a sweep with two threads, MB. */
export interface Memory {
  readonly minutes: number;
  /** When `early` was read: minute 3, or a third of a shorter sweep. */
  readonly earlyMinute: number;
  readonly early: number;
  readonly end: number;
  readonly most: number;
  /** End over early; the claim is for 30 minutes. */
  readonly growth: number;
  readonly growthTarget: number;
  readonly mostTarget: number;
  /** Share of the same sweep's time that went into checkpoints. */
  readonly savingShare: number;
  readonly savingTarget: number;
}

/** Merging synthetic shards of 1,000 designs. */
export interface Merging {
  readonly marks: readonly MergeMark[];
  /** Of the front that the shards scatter around, 0 … 1: what no number of shards can exceed. */
  readonly trueHypervolume: number;
  /** For 10,000 shards: time on the line through the last two marks, the gap to the true front on their power law. */
  readonly onPaper: { readonly shards: number; readonly ms: number; readonly hypervolume: number };
}

/** How long to take. */
export interface RunnerOptions {
  /** Minutes of the sweep whose memory is read; 30 for the full claim. Default 1. */
  readonly minutes?: number;
  /**
   * Designs judged by each sweep with one and with two threads. Default 600,000: the compiler goes on for some 200,000 designs, on a core that one thread
   * leaves free and two do not, and no sweep of a night is that short.
   */
  readonly evaluations?: number;
}

const SHEET = 'buoy-sensors';
const PATH = packagePath('model', 'rails', `${SHEET}.yaml`);
const COUNTS = [1, 10, 100, 1000];

/** Runs everything: about three minutes with the defaults. */
export async function timeRunner(options: RunnerOptions = {}): Promise<RunnerTiming> {
  const folder = mkdtempSync(join(tmpdir(), 'runner-bench-'));
  try {
    return {
      sheet: SHEET,
      scaling: await timeScaling(folder, options.evaluations ?? 600_000),
      memory: await readMemory(folder, options.minutes ?? 1),
      merge: await timeMerge(),
    };
  } finally {
    rmSync(folder, { recursive: true });
  }
}

/** The figures as lines of text. */
export function runnerLines({ sheet, scaling, memory, merge }: RunnerTiming): string[] {
  const line = (name: string, value: string): string => `  ${name.padEnd(56)}${value}`;
  const percent = (share: number): string => `${(100 * share).toFixed(2)} %`;
  const whole = (value: number): string => Math.round(value).toLocaleString('en');
  return [
    '',
    `runner, on ${sheet}`,
    line(
      `two threads over one, four sweeps of ${whole(scaling.evaluations)} designs`,
      `${scaling.ratio.toFixed(2)} (target ${scaling.target})`,
    ),
    line('the same by processor time', scaling.ratioByProcessorTime.toFixed(2)),
    line(
      `memory at the end of ${memory.minutes} min over minute ${Number(memory.earlyMinute.toPrecision(2))}`,
      `${memory.growth.toFixed(3)} (${whole(memory.early)} to ${whole(memory.end)} MB; target ${memory.growthTarget} for 30 min from minute 3)`,
    ),
    line('most memory, two threads', `${whole(memory.most)} MB (under ${memory.mostTarget} MB)`),
    line(
      'share of its time spent on checkpoints',
      `${percent(memory.savingShare)} (under ${percent(memory.savingTarget)})`,
    ),
    ...merge.marks.map((mark) =>
      line(
        `merge of ${whole(mark.shards)} shards of 1,000 designs`,
        `${(mark.ms / mark.shards).toFixed(1)} ms a shard, ${whole(mark.megabytes)} MB, ${whole(mark.front)} on the front, ${percent(mark.hypervolume / merge.trueHypervolume)} of the true hypervolume`,
      ),
    ),
    line(
      `${whole(merge.onPaper.shards)} shards, on paper`,
      `${whole(merge.onPaper.ms / 1000)} s, ${percent(merge.onPaper.hypervolume / merge.trueHypervolume)} of the true hypervolume, memory as above`,
    ),
  ];
}

/** Where a sweep stood. */
interface Mark {
  readonly evaluations: number;
  readonly seconds: number;
  readonly processorSeconds: number;
}

async function timeScaling(folder: string, evaluations: number): Promise<Scaling> {
  const runs: Record<1 | 2, Mark[]> = { 1: [], 2: [] };
  for (const [i, threads] of ([1, 2, 2, 1] as const).entries()) {
    runs[threads].push(await sweep(join(folder, `scaling-${i}`), threads, evaluations));
  }
  const total = (threads: 1 | 2, pick: (run: Mark) => number): number =>
    runs[threads].reduce((sum, run) => sum + pick(run), 0);
  const speed = (threads: 1 | 2, by: (run: Mark) => number): number =>
    total(threads, (run) => run.evaluations) / total(threads, by);
  return {
    evaluations,
    ratio: speed(2, (run) => run.seconds) / speed(1, (run) => run.seconds),
    ratioByProcessorTime: (2 * speed(2, (run) => run.processorSeconds)) / speed(1, (run) => run.processorSeconds),
    target: 1.85,
  };
}

/** What the last two thirds of a sweep took. */
async function sweep(folder: string, threads: number, evaluations: number): Promise<Mark> {
  const marks: Mark[] = [];
  const args = sweepArguments(folder, threads, '--evaluations', String(evaluations));
  const child = start({ work: 'sweep', args }, [], (line) => {
    const progress: { readonly evaluations?: number; readonly seconds?: number } = JSON.parse(line);
    const processorSeconds = processorTimeOf(child.pid);
    if (progress.evaluations === undefined || progress.seconds === undefined || processorSeconds === undefined) return;
    marks.push({ evaluations: progress.evaluations, seconds: progress.seconds, processorSeconds });
  });
  await child.ended;
  const first = marks.find((mark) => mark.evaluations >= evaluations / 3);
  // What comes after the last design, such as pricing the limits, is no part of the sweep's pace.
  const last = marks.find((mark) => mark.evaluations === marks.at(-1)?.evaluations);
  if (first === undefined || last === undefined || last === first) throw new Error('the sweep was too short to time');
  return {
    evaluations: last.evaluations - first.evaluations,
    seconds: last.seconds - first.seconds,
    processorSeconds: last.processorSeconds - first.processorSeconds,
  };
}

async function readMemory(folder: string, minutes: number): Promise<Memory> {
  const earlyMinute = Math.min(3, minutes / 3);
  const begun = performance.now();
  const child = start({ work: 'sweep', args: sweepArguments(join(folder, 'memory'), 2, '--time', `${60 * minutes}s`) });
  const readings: { minute: number; megabytes: number }[] = [];
  const timer = setInterval(() => {
    const megabytes = residentOf(child.pid);
    if (megabytes !== undefined) readings.push({ minute: (performance.now() - begun) / 60_000, megabytes });
  }, 1000);
  await child.ended;
  clearInterval(timer);
  // A mean over a twentieth of the time: one reading may fall before or after a collection of garbage.
  const about = (minute: number): number => {
    const near = readings.filter((one) => Math.abs(one.minute - minute) <= minutes / 40);
    return near.reduce((sum, one) => sum + one.megabytes, 0) / near.length;
  };
  const early = about(earlyMinute);
  const end = about(minutes * (1 - 1 / 40));
  const most = readings.reduce((max, one) => Math.max(max, one.megabytes), 0);
  const { seconds, trust } = readRecord(join(folder, 'memory'));
  const { saving = 0 } = (trust.timeSplit ?? {}) as { saving?: number };
  const targets = { growthTarget: 1.05, mostTarget: 700, savingTarget: 0.01 };
  return { minutes, earlyMinute, early, end, most, growth: end / early, savingShare: saving / seconds, ...targets };
}

async function timeMerge(): Promise<Merging> {
  const task: ChildTask = { work: 'merge', sheet: PATH, counts: COUNTS, designs: 1000 };
  const marks: MergeMark[] = JSON.parse(await start(task, ['--expose-gc']).ended);
  // The shards scatter beyond an octant of a sphere of half the box's edge: 1 − (1/8)(4/3)π(1/2)³.
  const trueHypervolume = 1 - Math.PI / 48;
  const [before, last] = marks.slice(-2);
  if (before === undefined || last === undefined) throw new Error('too few merges to go by');
  const shards = 10_000;
  const slope = (last.ms - before.ms) / (last.shards - before.shards);
  const gap = (mark: MergeMark): number => Math.max(1e-12, trueHypervolume - mark.hypervolume);
  const power = Math.log(gap(last) / gap(before)) / Math.log(last.shards / before.shards);
  const hypervolume = trueHypervolume - gap(last) * (shards / last.shards) ** power;
  return { marks, trueHypervolume, onPaper: { shards, ms: last.ms + slope * (shards - last.shards), hypervolume } };
}

function sweepArguments(out: string, threads: number, ...budget: readonly string[]): string[] {
  return ['sweep', PATH, '--out', out, ...budget, '--threads', String(threads), '--no-page', '--log', 'json'];
}

interface Child {
  readonly pid: number | undefined;
  /** What it wrote, once it has ended well. */
  readonly ended: Promise<string>;
}

/** Starts a child; `hear` is told each line of its progress. */
function start(task: ChildTask, flags: readonly string[] = [], hear: (line: string) => void = () => {}): Child {
  const script = packagePath('dist', 'test', 'bench', 'runner-child.js');
  const child = spawn(process.execPath, [...flags, script, JSON.stringify(task)], {
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let [out, complaint] = ['', ''];
  child.stdout.on('data', (data: Buffer) => {
    out += data.toString();
  });
  createInterface({ input: child.stderr }).on('line', (line) => {
    complaint = (complaint + line).slice(-2000);
    if (line.startsWith('{')) hear(line);
  });
  const ended = new Promise<string>((resolve, reject) => {
    child.on('close', (code) =>
      code === 0 ? resolve(out) : reject(new Error(`the bench's child failed: ${complaint}`)),
    );
  });
  return { pid: child.pid, ended };
}

/** Resident memory of a process, MB; undefined where the system does not tell. */
function residentOf(pid: number | undefined): number | undefined {
  try {
    const found = /VmRSS:\s+(\d+) kB/.exec(readFileSync(`/proc/${pid}/status`, 'utf8'));
    return found === null ? undefined : (Number(found[1]) * 1024) / 1e6;
  } catch {
    return undefined;
  }
}

/** Processor time that a process and its threads have used, s; undefined where the system does not tell. */
function processorTimeOf(pid: number | undefined): number | undefined {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    // utime and stime, in ticks of which Linux counts 100 a second (proc(5)).
    return (Number(fields[11]) + Number(fields[12])) / 100;
  } catch {
    return undefined;
  }
}
