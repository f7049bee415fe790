/** What of a sweep's rings goes into a checkpoint beside the islands, and the rings that come back out of it. */
import { z } from 'zod';
import type { EpochTimes } from '../engines/protocol.ts';
import { refusal } from '../errors.ts';
import { type Checkpoint, readCheckpoint } from '../run-folder/checkpoint.ts';
import { issueText } from '../run-folder/issue.ts';
import type { Fault } from '../run-folder/record.ts';
import type { History } from './history.ts';
import { createRing, type IslandState, islandsOf, type Ring, settledFaults } from './ring.ts';

/** A ring without its islands; plain data. */
export interface RingState {
  readonly shard: number;
  readonly epoch: number;
  readonly epochEvaluations: number;
  readonly islands: number;
  readonly history: History;
  readonly faults: readonly Fault[];
  readonly spent: EpochTimes;
}

/** A sweep as a checkpoint gives it back. */
export interface Resumed {
  readonly rings: Ring[];
  /** Swept before, s. */
  readonly seconds: number;
  /** Of these, spent on saving, s. */
  readonly saving: number;
  /** ISO 8601. */
  readonly started: string;
  /** Number of the checkpoint. */
  readonly number: number;
  readonly warnings: readonly string[];
}

const STATE = z.object({
  seconds: z.number(),
  saving: z.number(),
  started: z.string(),
  rings: z.array(
    z.object({
      shard: z.number(),
      epoch: z.number(),
      epochEvaluations: z.number(),
      islands: z.number(),
      history: z.custom<History>((value) => typeof value === 'object' && value !== null && 'rows' in value),
      spent: z.custom<EpochTimes>((value) => typeof value === 'object' && value !== null && 'model' in value),
      faults: z.array(z.custom<Fault>((value) => typeof value === 'object' && value !== null && 'island' in value)),
    }),
  ),
});

/** What to save of a ring. */
export function ringState(ring: Ring): RingState {
  const { shard, epoch, epochEvaluations, slots, history, spent } = ring;
  return { shard, epoch, epochEvaluations, islands: slots.length, history, faults: settledFaults(ring), spent };
}

/** Packed islands of all rings, ring by ring, as they were when each ring's epoch was complete. */
export function packedIslands(rings: readonly Ring[]): Uint8Array[] {
  return rings.flatMap((ring) => islandsOf(ring).map((state) => state.bytes));
}

/** The newest whole checkpoint of a folder as rings. Throws the refusals `checkpoint-none` and `run-damaged`. */
export function resumeFrom(folder: string, tally: (bytes: Uint8Array) => Omit<IslandState, 'bytes'>): Resumed {
  const { checkpoint, warnings } = readCheckpoint(folder);
  if (checkpoint === undefined) throw refusal('checkpoint-none', { folder });
  const { seconds, saving, started, rings } = stateOf(folder, checkpoint);
  return {
    rings: understood(folder, () => ringsOf(rings, checkpoint.islands, tally)),
    seconds,
    saving,
    started,
    number: checkpoint.number,
    warnings: [...warnings, ...nodeWarning(checkpoint)],
  };
}

type State = z.infer<typeof STATE>;

/** A whole checkpoint can still be of another layout than this program writes. */
function stateOf(folder: string, { state }: Checkpoint): State {
  return understood(folder, () => STATE.parse(state));
}

function ringsOf(
  rings: State['rings'],
  packed: readonly Uint8Array[],
  tally: (bytes: Uint8Array) => Omit<IslandState, 'bytes'>,
): Ring[] {
  if (rings.reduce((sum, ring) => sum + ring.islands, 0) !== packed.length) throw new Error('islands are missing');
  let at = 0;
  return rings.map((ring) => {
    const islands = packed.slice(at, at + ring.islands).map((bytes) => ({ bytes, ...tally(bytes) }));
    at += ring.islands;
    return createRing({ ...ring, islands });
  });
}

function understood<T>(folder: string, read: () => T): T {
  try {
    return read();
  } catch (error) {
    throw refusal('run-damaged', { folder, file: 'its checkpoint', reason: issueText(error) });
  }
}

function nodeWarning(checkpoint: Checkpoint): string[] {
  if (checkpoint.node === process.version) return [];
  return [`this run was begun under Node ${checkpoint.node} and goes on under ${process.version}`];
}
