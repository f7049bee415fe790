/**
 * One closed ring of islands: which island may run its next epoch, what it gets from its neighbours, when an epoch of the
 * whole ring is complete. Holds bytes and counts, never designs; knows neither threads nor clock nor files.
 *
 * Island i may run epoch e + 1 once its neighbours have completed epoch e, so threads need not wait for the slowest island
 * of every epoch; what is saved and counted is the ring at the last epoch that all islands have completed.
 */
import type { EpochTimes } from '../engines/protocol.ts';
import type { Fault } from '../run-folder/record.ts';
import { type History, newHistory } from './history.ts';

/** An island after an epoch. */
export interface IslandState {
  /** Packed. */
  readonly bytes: Uint8Array;
  /** Designs evaluated since the start, and those of them that keep every limit. */
  readonly evaluations: number;
  readonly feasible: number;
}

/** A ring, with everything that a checkpoint needs. */
export interface Ring {
  readonly shard: number;
  readonly slots: readonly Slot[];
  /** Last epoch that every living island has completed. */
  epoch: number;
  /** Designs that the ring evaluates in an epoch, as planned. */
  readonly epochEvaluations: number;
  readonly history: History;
  readonly faults: Fault[];
  /** Where the time of its epochs went, s. */
  readonly spent: EpochTimes;
  /** Whether its budget is used up. */
  done: boolean;
  /** Shared memory of islands that nobody needs any more. */
  readonly rooms: SharedArrayBuffer[];
}

/** One island's place in the ring. */
export interface Slot {
  /** States by epoch: the ring's own and those ahead of it. */
  readonly states: Map<number, IslandState>;
  /** Last completed epoch. */
  epoch: number;
  running: boolean;
  failed: boolean;
  /** Failures of the epoch that is due. */
  tries: number;
}

const NO_TIME: EpochTimes = { variation: 0, model: 0, ranking: 0, archive: 0, transfer: 0 };

/** How far an island may be ahead of the ring. */
const LEAD = 1;

/** What a ring is made of; `history` and `faults` are those of before where it goes on. */
export interface RingParts {
  readonly shard: number;
  readonly epoch: number;
  readonly epochEvaluations: number;
  /** As they were when `epoch` was complete. */
  readonly islands: readonly IslandState[];
  readonly history?: History;
  readonly faults?: readonly Fault[];
  readonly spent?: EpochTimes;
}

/** A ring of these parts; an island that is named in `faults` has failed. */
export function createRing(parts: RingParts): Ring {
  const { shard, epoch, epochEvaluations, islands, faults = [], history = newHistory(), spent = NO_TIME } = parts;
  const slots = islands.map((state, i) => ({
    states: new Map([[epoch, state]]),
    epoch,
    running: false,
    failed: faults.some((fault) => fault.island === i),
    tries: 0,
  }));
  return {
    shard,
    slots,
    epoch,
    epochEvaluations,
    history,
    faults: [...faults],
    spent: { ...spent },
    done: false,
    rooms: [],
  };
}

/** Indices of islands whose next epoch can run now, those that are furthest behind first. */
export function readyIslands(ring: Ring, neighboursOf: (island: number) => readonly number[]): number[] {
  if (ring.done) return [];
  const ready = (i: number): boolean => {
    const slot = slotAt(ring, i);
    if (slot.running || slot.failed || slot.epoch > ring.epoch + LEAD - 1) return false;
    return neighboursOf(i).every((n) => slotAt(ring, n).failed || slotAt(ring, n).epoch >= slot.epoch);
  };
  const all = ring.slots.map((_, i) => i).filter(ready);
  return all.sort((a, b) => slotAt(ring, a).epoch - slotAt(ring, b).epoch || a - b);
}

/** State of an island when it had completed `epoch`; of one that failed before that, its last. */
export function stateAt(ring: Ring, island: number, epoch: number): IslandState {
  const slot = slotAt(ring, island);
  const state = slot.states.get(Math.min(epoch, slot.epoch));
  if (state === undefined) throw new Error(`island ${island} has no state of epoch ${epoch}`);
  return state;
}

/** Takes in a completed epoch of an island. Returns true when that completed an epoch of the ring. */
export function completeEpoch(ring: Ring, island: number, state: IslandState): boolean {
  const slot = slotAt(ring, island);
  slot.running = false;
  slot.tries = 0;
  slot.epoch += 1;
  slot.states.set(slot.epoch, state);
  return advance(ring);
}

/** Takes an island out after a fault. Returns true when that completed an epoch of the ring. */
export function failIsland(ring: Ring, fault: Fault): boolean {
  const slot = slotAt(ring, fault.island);
  slot.running = false;
  slot.failed = true;
  ring.faults.push(fault);
  return advance(ring);
}

/** The islands as they were when the ring's epoch was complete. */
export function islandsOf(ring: Ring): IslandState[] {
  return ring.slots.map((_, i) => stateAt(ring, i, ring.epoch));
}

/** Designs evaluated by the ring up to its epoch, and those of them that keep every limit. */
export function tallyOf(ring: Ring): { evaluations: number; feasible: number } {
  const states = islandsOf(ring);
  const sum = (pick: (state: IslandState) => number): number => states.reduce((total, state) => total + pick(state), 0);
  return { evaluations: sum((state) => state.evaluations), feasible: sum((state) => state.feasible) };
}

/**
 * Faults that had come when the ring's epoch was complete. A later one is left out of a checkpoint: the island runs again on
 * resuming and fails at the same place, so that its neighbours see the same whether or not the sweep was interrupted.
 */
export function settledFaults(ring: Ring): Fault[] {
  return ring.faults.filter((fault) => fault.epoch <= ring.epoch);
}

/** Designs evaluated by rings so far, with epochs that the whole ring has not completed yet. */
export function latestEvaluations(rings: readonly Ring[]): number {
  const slots = rings.flatMap((ring) => ring.slots);
  return slots.reduce((sum, slot) => sum + (slot.states.get(slot.epoch)?.evaluations ?? 0), 0);
}

/** The tallies of several rings, added up. */
export function sumTallies(rings: readonly Ring[]): { evaluations: number; feasible: number } {
  const tallies = rings.map(tallyOf);
  const sum = (pick: (tally: { evaluations: number; feasible: number }) => number): number =>
    tallies.reduce((total, tally) => total + pick(tally), 0);
  return { evaluations: sum((tally) => tally.evaluations), feasible: sum((tally) => tally.feasible) };
}

/** Whether no island of the ring is left. */
export function isLost(ring: Ring): boolean {
  return ring.slots.every((slot) => slot.failed);
}

function advance(ring: Ring): boolean {
  const living = ring.slots.filter((slot) => !slot.failed);
  if (living.length === 0) return false;
  const slowest = Math.min(...living.map((slot) => slot.epoch));
  if (slowest <= ring.epoch) return false;
  ring.epoch = slowest;
  for (const slot of living) {
    for (const [epoch, state] of slot.states) {
      if (epoch >= slowest) continue;
      slot.states.delete(epoch);
      if (state.bytes.buffer instanceof SharedArrayBuffer) ring.rooms.push(state.bytes.buffer);
    }
  }
  return true;
}

function slotAt(ring: Ring, island: number): Slot {
  const slot = ring.slots[island];
  if (slot === undefined) throw new Error(`no island ${island} in shard ${ring.shard}`);
  return slot;
}
