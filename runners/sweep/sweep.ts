/**
 * The sweep itself: hands ready epochs to an engine, counts, records history, saves, and ends when the budget is used, a
 * stop is asked for, or nothing is left to run. Knows no rail, no terminal and no file name: these come as functions.
 */
import type { Engine, EpochResult, EpochTimes } from '../engines/protocol.ts';
import { createNote, readNote } from '../engines/protocol.ts';
import { refusal } from '../errors.ts';
import type { Fault } from '../run-folder/record.ts';
import type { Budget } from './budget.ts';
import { addRow, isDue, tellsIslands } from './history.ts';
import type { Measure } from './measure.ts';
import {
  completeEpoch,
  failIsland,
  type IslandState,
  isLost,
  islandsOf,
  type Ring,
  readyIslands,
  stateAt,
  tallyOf,
} from './ring.ts';
import { ringShare } from './shares.ts';

/** What a sweep needs. */
export interface SweepSetup {
  readonly engine: Engine;
  readonly rings: readonly Ring[];
  readonly budget: Budget;
  /** How many shards the budget is divided among. */
  readonly shards: number;
  readonly geneNames: readonly string[];
  /** Islands from which island i of n takes immigrants. */
  neighbours(island: number, islands: number): readonly number[];
  /** Reads counts from a packed island. */
  tally(bytes: Uint8Array): { readonly evaluations: number; readonly feasible: number };
  /** Measures the union of islands. */
  measure(islands: readonly IslandState[]): Measure;
  /** Hypervolume of each island by itself. */
  apart(islands: readonly IslandState[]): readonly number[];
  /** Seconds swept before this start. */
  readonly secondsBefore: number;
  /** Called when a checkpoint is due and at the end; throws where it cannot save. */
  save(reason: 'interval' | 'end'): void;
  readonly checkpoints: CheckpointRule;
  /** Seconds of the whole machine that went, beside the sweep, into the files of the last checkpoint; 0 while unknown. */
  besides(): number;
  /** Told of every fault as it happens. */
  onFault(fault: Fault): void;
  /** Resolves when the sweep shall stop. */
  readonly stop: Promise<void>;
  /** Seconds that running epochs get to finish after a stop. */
  readonly graceSeconds: number;
}

/** How often a sweep is saved. */
export interface CheckpointRule {
  /** Seconds from one checkpoint to the next, at least. */
  readonly seconds: number;
  /** Largest share of the time that checkpoints and the files made from them may take, above 0 … 1. */
  readonly share: number;
}

/** How a sweep ended. */
export type Ending = 'done' | 'stopped';

/** A sweep under way. */
export interface Sweep {
  /** Resolves when it has ended and been saved. Rejects with what saving threw, or when every island is lost. */
  readonly ended: Promise<Ending>;
  /** Seconds swept, over all resumptions. */
  seconds(): number;
}

/** An epoch is tried this often before its island is given up. */
const TRIES = 3;

/** Starts a sweep. */
export function startSweep(setup: SweepSetup): Sweep {
  const started = performance.now();
  const seconds = (): number => setup.secondsBefore + (performance.now() - started) / 1000;
  return { ended: run(setup, seconds), seconds };
}

async function run(setup: SweepSetup, seconds: () => number): Promise<Ending> {
  const running = new Set<Promise<void>>();
  const state: State = { stopped: false, saved: seconds(), saving: 0, failure: undefined };
  const stop = setup.stop.then(() => {
    state.stopped = true;
  });
  for (const ring of setup.rings) settleBudget(setup, ring, seconds());
  while (!state.stopped && state.failure === undefined && setup.rings.some((ring) => !ring.done)) {
    dispatch(setup, running, state, seconds);
    await Promise.race([stop, ...running]);
    if (!state.stopped && state.failure === undefined && seconds() >= nextSave(setup, state))
      saveTimed(setup, state, seconds);
  }
  if (state.failure !== undefined) throw state.failure;
  if (state.stopped) await Promise.race([Promise.all(running), pause(setup.graceSeconds)]);
  setup.save('end');
  return setup.rings.every((ring) => ring.done) ? 'done' : 'stopped';
}

interface State {
  stopped: boolean;
  /** When it was last saved, and how long that took, s. */
  saved: number;
  saving: number;
  failure: unknown;
}

// Asked again and again: what the last checkpoint cost beside the sweep becomes known a while after it.
function nextSave({ checkpoints, besides }: SweepSetup, { saved, saving }: State): number {
  return saved + Math.max(checkpoints.seconds, (saving + besides()) / checkpoints.share);
}

function saveTimed(setup: SweepSetup, state: State, seconds: () => number): void {
  const before = seconds();
  setup.save('interval');
  state.saved = seconds();
  state.saving = state.saved - before;
}

function dispatch(setup: SweepSetup, running: Set<Promise<void>>, state: State, seconds: () => number): void {
  const ready = setup.rings.flatMap((ring) => {
    const islands = readyIslands(ring, (i) => setup.neighbours(i, ring.slots.length));
    return islands.map((island) => ({ ring, island, epoch: ring.slots[island]?.epoch ?? 0 }));
  });
  // One task more than there are threads waits in the engine, so that no thread idles while this one counts.
  const wanted = setup.engine.width + 1 - running.size;
  for (const { ring, island } of ready.sort((a, b) => a.epoch - b.epoch).slice(0, Math.max(0, wanted))) {
    const work = runEpoch(setup, ring, island, state, seconds).catch((error: unknown) => {
      state.failure = error;
    });
    const tracked: Promise<void> = work.finally(() => running.delete(tracked));
    running.add(tracked);
  }
}

async function runEpoch(
  setup: SweepSetup,
  ring: Ring,
  island: number,
  state: State,
  seconds: () => number,
): Promise<void> {
  const slot = ring.slots[island];
  if (slot === undefined) return;
  slot.running = true;
  const note = createNote(setup.geneNames.length);
  const result = await setup.engine.run({
    island: stateAt(ring, island, slot.epoch).bytes,
    neighbours: setup.neighbours(island, ring.slots.length).map((n) => stateAt(ring, n, slot.epoch).bytes),
    room: ring.rooms.pop(),
    note,
  });
  if (ring.done || (state.stopped && !result.ok)) {
    slot.running = false;
    return;
  }
  const advanced = takeIn(setup, ring, island, result, note);
  if (advanced) closeEpoch(setup, ring, seconds());
  if (setup.rings.every(isLost)) throw refusal('all-islands-failed', { reason: ring.faults[0]?.reason ?? 'unknown' });
}

function takeIn(setup: SweepSetup, ring: Ring, island: number, result: EpochResult, note: SharedArrayBuffer): boolean {
  if (result.ok) {
    addTimes(ring.spent, result.spent);
    return completeEpoch(ring, island, { bytes: result.island, ...setup.tally(result.island) });
  }
  const slot = ring.slots[island];
  if (slot === undefined) return false;
  slot.running = false;
  slot.tries += 1;
  if (slot.tries < TRIES) return false;
  const genes = readNote(note);
  const design = genes && Object.fromEntries(setup.geneNames.map((name, i) => [name, genes[i] ?? 0]));
  const fault: Fault = { shard: ring.shard, island, epoch: slot.epoch, reason: result.reason, design };
  setup.onFault(fault);
  return failIsland(ring, fault);
}

function addTimes(total: EpochTimes, more: EpochTimes): void {
  for (const name of ['variation', 'model', 'ranking', 'archive', 'transfer'] as const) total[name] += more[name];
}

function closeEpoch(setup: SweepSetup, ring: Ring, seconds: number): void {
  if (isDue(ring.history, ring.epoch)) addHistory(setup, ring);
  settleBudget(setup, ring, seconds);
}

function addHistory(setup: SweepSetup, ring: Ring): void {
  const { evaluations, feasible } = tallyOf(ring);
  const islands = islandsOf(ring);
  const { frontSize, hypervolume } = setup.measure(islands);
  addRow(ring.history, {
    epoch: ring.epoch,
    evaluations,
    feasible: evaluations === 0 ? 0 : feasible / evaluations,
    frontSize,
    hypervolume,
    islands: tellsIslands(ring.epoch) ? setup.apart(islands) : [],
  });
}

function settleBudget(setup: SweepSetup, ring: Ring, seconds: number): void {
  if (isLost(ring) || ringShare(setup.budget, setup.shards, ring, seconds) >= 1) ring.done = true;
}

function pause(seconds: number): Promise<void> {
  return new Promise((done) => {
    setTimeout(done, 1000 * seconds).unref();
  });
}
