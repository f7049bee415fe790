/**
 * The child that the model's bench runs, in a process or thread of its own: draws the designs of one stated reference
 * evaluation and judges them round and round. It runs as built, and once bundled with counted functions.
 */
import { readFileSync } from 'node:fs';
import { type HeapProfiler, Session } from 'node:inspector';
import { join } from 'node:path';
import { isMainThread, parentPort, workerData } from 'node:worker_threads';
import { BUILT_IN_TABLES } from '../../model/parts/built-in.ts';
import { joinTables } from '../../model/parts/join.ts';
import { readTable } from '../../model/parts/read-table.ts';
import { createRailProblem, type RailProblem } from '../../model/problem.ts';
import type { Rail } from '../../model/rail/rail.ts';
import { readRail } from '../../model/rail/read.ts';
import type { Architecture } from '../../model/stages/list.ts';
import { exp, expAt, log, logAt, pow, powAt, sincosAt } from '../../optimizer/maths/index.ts';
import { need, randomFrom, randomGenes } from '../model/support.ts';

/** What a child is asked. */
export interface Task {
  /** Folder of the package. */
  readonly root: string;
  readonly reference: string;
  readonly work: 'time' | 'count' | 'garbage' | 'floor';
}

/** Designs of one reference evaluation: drawn once with seed 1, judged in turn. */
const DESIGNS = 256;
/** Length of a timed run after as long a warm-up, ms. */
const RUN = 1000;
/** Bytes between two samples of the heap, on average. */
const SAMPLED = 1024;

interface Reference {
  readonly sheet: string;
  readonly architecture: Architecture;
  readonly phases: number;
}

const REFERENCES: Readonly<Record<string, Reference>> = {
  'two-phase synchronous buck': { sheet: 'buoy-sensors.yaml', architecture: 'buck-synchronous', phases: 2 },
  'half-bridge with current doubler': {
    sheet: 'hut-shelf.yaml',
    architecture: 'half-bridge-current-doubler',
    phases: 1,
  },
};

const task = (isMainThread ? JSON.parse(process.argv[2]) : workerData) as Task;
const answer = run(task);
if (parentPort === null) process.stdout.write(JSON.stringify(answer));
else parentPort.postMessage(answer);

function run({ root, reference, work }: Task): unknown {
  if (work === 'floor') return floor();
  const { problem, designs } = prepare(root, REFERENCES[reference]);
  const judge = judging(problem, designs);
  if (work === 'time') return time(judge);
  return work === 'count' ? count(judge) : garbage(judge);
}

/** The sheet with one architecture, forced continuous, three loads at three lines, and the tolerances that its limits need. */
function prepare(root: string, reference: Reference): { problem: RailProblem; designs: Float64Array[] } {
  const text = (...path: string[]): string => readFileSync(join(root, 'model', ...path), 'utf8');
  const sheet = need(readRail(text('rails', reference.sheet), reference.sheet));
  const { phases, architecture } = reference;
  const rail: Rail = {
    ...sheet,
    lightLoad: 'forced-continuous',
    profile: [
      { fraction: 1, share: 0.3 },
      { fraction: 0.5, share: 0.4 },
      { fraction: 0.1, share: 0.3 },
    ],
    limits: { ...sheet.limits, efficiency: [{ load: 1, atLeast: 0.9 }] },
    search: { ...sheet.search, architectures: [architecture], phases: { minimum: phases, maximum: phases } },
  };
  const tables = need(
    joinTables(
      BUILT_IN_TABLES.map(({ kind, file }) => ({ kind, rows: need(readTable(kind, text('tables', file), file)) })),
    ),
  );
  const problem = need(createRailProblem(rail, tables));
  const next = randomFrom(1);
  return { problem, designs: Array.from({ length: DESIGNS }, () => randomGenes(problem, next)) };
}

/** A function that judges the next `n` designs. */
function judging(problem: RailProblem, designs: readonly Float64Array[]): (n: number) => void {
  const objectives = new Float64Array(problem.objectives.length);
  const violations = new Float64Array(problem.limits.length);
  let next = 0;
  return (n) => {
    for (let i = 0; i < n; i++) {
      problem.evaluate(designs[next], objectives, violations);
      next = (next + 1) % designs.length;
    }
  };
}

/** Designs per second of the clock, and per second of this process's own processor time: on a busy machine the two differ. */
function time(judge: (n: number) => void): { perSecond: number; perProcessorSecond: number } {
  const until = performance.now() + RUN;
  while (performance.now() < until) judge(DESIGNS);
  const from = performance.now();
  const used = process.cpuUsage();
  let done = 0;
  while (performance.now() - from < RUN) {
    judge(DESIGNS);
    done += DESIGNS;
  }
  const { user, system } = process.cpuUsage(used);
  return { perSecond: (1000 * done) / (performance.now() - from), perProcessorSecond: (1e6 * done) / (user + system) };
}

/** Calls of each elementary function per evaluation: the bundle must have been built with counted functions. */
function count(judge: (n: number) => void): Record<string, number> {
  const calls = (globalThis as { elementaryCalls?: Record<string, number> }).elementaryCalls;
  if (calls === undefined) throw new Error('built without counted functions');
  for (const name of Object.keys(calls)) calls[name] = 0;
  judge(DESIGNS);
  return Object.fromEntries(Object.entries(calls).flatMap(([name, n]) => (n > 0 ? [[name, n / DESIGNS]] : [])));
}

/**
 * Bytes that each evaluation leaves behind, over 10⁵, by the engine's sampling of all that is allocated, what was collected meanwhile
 * included: the size of the heap before and after would miss that.
 */
function garbage(judge: (n: number) => void): { bytes: number } {
  const evaluations = 1e5;
  judge(60_000);
  const session = new Session();
  session.connect();
  session.post('HeapProfiler.startSampling', {
    samplingInterval: SAMPLED,
    includeObjectsCollectedByMajorGC: true,
    includeObjectsCollectedByMinorGC: true,
  } as HeapProfiler.StartSamplingParameterType);
  judge(evaluations);
  let bytes = 0;
  session.post('HeapProfiler.stopSampling', (error, { profile }) => {
    if (error !== null) throw error;
    bytes = sampled(profile.head);
  });
  session.disconnect();
  return { bytes: bytes / evaluations };
}

/** Bytes of a node of the profile and all under it. */
function sampled(node: HeapProfiler.SamplingHeapProfileNode): number {
  return node.children.reduce((sum, child) => sum + sampled(child), node.selfSize);
}

/** Nanoseconds of one bare call of each elementary function that the model uses, arguments as they come up. */
function floor(): Record<string, number> {
  const n = 4096;
  const next = randomFrom(2);
  const drawn = Float64Array.from({ length: 2 * n }, () => next());
  const a = new Float64Array(2 * n);
  const plain = (call: (x: number) => number) => () => {
    let sum = 0;
    for (let i = 0; i < n; i++) sum += call(drawn[i]);
    a[0] = sum;
  };
  const inPlace = (call: (a: Float64Array, i: number) => void) => () => {
    for (let i = 0; i < n; i++) call(a, 2 * i);
  };
  const works: Record<string, () => void> = {
    exp: plain((x) => exp(-3 * x)),
    log: plain((x) => log(x + 1e-3)),
    pow: plain((x) => pow(x + 1e-3, 1.4)),
    expAt: inPlace(expAt),
    logAt: inPlace(logAt),
    powAt: inPlace(powAt),
    sincosAt: inPlace(sincosAt),
  };
  return Object.fromEntries(Object.entries(works).map(([name, work]) => [name, nanoseconds(work, a, drawn) / n]));
}

/** Best of many runs of `work`, ns, the copying of fresh arguments aside. */
function nanoseconds(work: () => void, a: Float64Array, drawn: Float64Array): number {
  let best = Number.POSITIVE_INFINITY;
  for (let round = 0; round < 200; round++) {
    a.set(drawn);
    const from = performance.now();
    work();
    best = Math.min(best, 1e6 * (performance.now() - from));
  }
  return best;
}
