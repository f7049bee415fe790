/**
 * The protocol between a sweep and whatever runs its epochs, whole:
 *
 * 1. A worker is born with a `WorkerBirth`: the address of a module whose `createProblem(source)` builds the problem, and
 *    that source as plain data (for a rail: the texts of the sheet and its tables). So these are sent once a worker.
 * 2. The sweep sends an `EpochTask`: the packed island, the packed neighbours that immigrants come from, a note.
 * 3. The worker answers with an `EpochResult`. An epoch is a pure function of its task, so a task may run twice, anywhere.
 *
 * Failures are data: an exception, a dead worker, a task that took too long all come back as `{ ok: false }`, because class and
 * stack of an error do not survive the way between threads. Islands lie in shared memory, so nothing is copied on the way; the sweep hands out the
 * rooms of islands that nobody reads any more, and a task that failed keeps its room. The note is shared memory in which the worker writes each design
 * before it evaluates it; when the worker dies, the design that killed it is read from there.
 */
import type { TimeSplit } from '../../optimizer/index.ts';
import type { Problem } from '../../optimizer/problem.ts';

/** What a worker is born with; plain data. */
export interface WorkerBirth {
  /** URL of a module that exports `createProblem: CreateProblem`. */
  readonly module: string;
  /** What that function gets. */
  readonly source: unknown;
}

/** Builds the problem from its source. Throws where it cannot. */
export type CreateProblem = (source: unknown) => Problem;

/** One epoch of one island. */
export interface EpochTask {
  /** The island, packed. */
  readonly island: Uint8Array;
  /** The islands it takes immigrants from, packed, as they were when the epoch before ended. */
  readonly neighbours: readonly Uint8Array[];
  /** Where to pack the result if there is room for it; else the worker makes a room. Nobody else may read or write it meanwhile. */
  readonly room?: SharedArrayBuffer;
  /** Where to note each design before it is evaluated; see `createNote`. */
  readonly note: SharedArrayBuffer;
}

/** Where the time of an epoch went, s; it never influences a result. */
export interface EpochTimes extends TimeSplit {
  /** Packing and unpacking. */
  transfer: number;
}

/** What became of a task. */
export type EpochResult =
  | { readonly ok: true; readonly island: Uint8Array; readonly spent: EpochTimes }
  | { readonly ok: false; readonly reason: string };

/** Runs epochs, several at once. */
export interface Engine {
  /** How many tasks can run at the same time. */
  readonly width: number;
  /** Runs a task; never rejects. */
  run(task: EpochTask): Promise<EpochResult>;
  /** Gives up on everything that runs and frees the threads. */
  close(): Promise<void>;
}

/** Islands grow slowly, by what their archives hold: so much room more than one needs. */
const SPARE = 1.25;

/** Shared memory for a packed island of `bytes` bytes and those a little larger. */
export function createRoom(bytes: number): SharedArrayBuffer {
  return new SharedArrayBuffer(Math.ceil(SPARE * bytes));
}

/** A note for designs of `genes` genes: a flag (1 while a design is being evaluated), then the genes. */
export function createNote(genes: number): SharedArrayBuffer {
  return new SharedArrayBuffer(8 * (genes + 1));
}

/** The design that was being evaluated when the note was last written; undefined where none was. */
export function readNote(note: SharedArrayBuffer): Float64Array | undefined {
  const cells = new Float64Array(note);
  return cells[0] === 1 ? Float64Array.from(cells.subarray(1)) : undefined;
}

/** The problem, writing each design into the note that `current` gives before it evaluates it. */
export function noting(problem: Problem, current: () => Float64Array): Problem {
  const evaluate: Problem['evaluate'] = (genes, objectives, violations) => {
    const cells = current();
    cells.set(genes, 1);
    cells[0] = 1;
    problem.evaluate(genes, objectives, violations);
    cells[0] = 0;
  };
  return {
    name: problem.name,
    genes: problem.genes,
    objectives: problem.objectives,
    limits: problem.limits,
    families: problem.families,
    seeds: problem.seeds,
    snap: (genes) => problem.snap(genes),
    evaluate,
  };
}
