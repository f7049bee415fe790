/** Rings of islands: an island never runs ahead of what it needs, the order of completion changes nothing, and no island is written over while it is read. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  completeEpoch,
  createRing,
  failIsland,
  type IslandState,
  islandsOf,
  readyIslands,
  settledFaults,
  stateAt,
} from '../../runners/sweep/ring.ts';

const neighboursOf = (i: number, n: number): number[] =>
  [...new Set([(i + n - 1) % n, (i + 1) % n])].filter((j) => j !== i);
const state = (text: string): IslandState => ({ bytes: Buffer.from(text), evaluations: 1, feasible: 0 });
const stateIn = (room: SharedArrayBuffer, text: string): IslandState => {
  const bytes = new Uint8Array(room, 0, text.length);
  bytes.set(Buffer.from(text));
  return { bytes, evaluations: 1, feasible: 0 };
};
const textOf = (one: IslandState): string => Buffer.from(one.bytes).toString();

/**
 * Runs a ring of `n` to epoch `end`, finishing running islands in the order that `choose` says; island `bad` fails at epoch `at`. As a thread may, a running
 * island writes into its room from its start on and reads what it was given as late as its end.
 */
function play(n: number, end: number, choose: (count: number) => number, bad = -1, at = 0): string[] {
  const names = Array.from({ length: n }, (_, i) => state(`${i}`));
  const ring = createRing({ shard: 0, epoch: 0, epochEvaluations: 1, islands: names });
  const running: { island: number; seen: readonly IslandState[]; room: SharedArrayBuffer }[] = [];
  while (ring.epoch < end) {
    for (const island of readyIslands(ring, (i) => neighboursOf(i, n))) {
      const slot = ring.slots[island];
      if (slot === undefined) throw new Error('no such island');
      slot.running = true;
      const room = ring.rooms.pop() ?? new SharedArrayBuffer(8);
      new Uint8Array(room).fill(63);
      const seen = [island, ...neighboursOf(island, n)].map((i) => stateAt(ring, i, slot.epoch));
      running.push({ island, seen, room });
    }
    const [next] = running.splice(choose(running.length), 1);
    if (next === undefined) throw new Error('nothing can run');
    const epoch = ring.slots[next.island]?.epoch ?? 0;
    if (next.island === bad && epoch === at) failIsland(ring, { shard: 0, island: bad, epoch, reason: 'test' });
    else completeEpoch(ring, next.island, stateIn(next.room, hash(next.seen.map(textOf).join('|'))));
  }
  expect(ring.rooms.length, 'rooms that wait').toBeLessThan(2 * n);
  return islandsOf(ring).map(textOf);
}

// FNV-1a, 32 bits: enough to see that two histories were the same.
function hash(text: string): string {
  let value = 2166136261;
  for (const byte of Buffer.from(text)) value = Math.imul(value ^ byte, 16777619) >>> 0;
  return value.toString(16);
}

describe('a ring of islands', () => {
  const picks = fc.infiniteStream(fc.nat());
  const choosing = (stream: Stream) => (count: number) => (stream.next().value ?? 0) % Math.max(1, count);
  interface Stream {
    next(): { value?: number };
  }

  it('comes to the same islands whatever finishes first', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 6 }), fc.integer({ min: 1, max: 6 }), picks, (n, end, stream) => {
        expect(play(n, end, choosing(stream))).toEqual(play(n, end, () => 0));
      }),
    );
  });

  it('comes to the same islands whatever finishes first when one of them fails', () => {
    fc.assert(
      fc.property(fc.integer({ min: 2, max: 6 }), fc.integer({ min: 0, max: 4 }), picks, (n, at, stream) => {
        expect(play(n, 6, choosing(stream), 1, at)).toEqual(play(n, 6, () => 0, 1, at));
      }),
    );
  });

  it('keeps a fault that came ahead of its epoch out of what is saved', () => {
    const ring = createRing({ shard: 0, epoch: 0, epochEvaluations: 1, islands: ['a', 'b', 'c', 'd'].map(state) });
    completeEpoch(ring, 0, state('a1'));
    failIsland(ring, { shard: 0, island: 0, epoch: 1, reason: 'test' });
    expect(ring.epoch).toBe(0);
    expect(settledFaults(ring)).toEqual([]);
    expect(islandsOf(ring).map(textOf)).toEqual(['a', 'b', 'c', 'd']);
    for (const [i, text] of ['b1', 'c1', 'd1'].entries()) completeEpoch(ring, i + 1, state(text));
    expect(settledFaults(ring)).toHaveLength(1);
    expect(islandsOf(ring).map(textOf)).toEqual(['a1', 'b1', 'c1', 'd1']);
  });
});
