/** How often a sweep is saved: no more often than asked for, and less often where a checkpoint and what is made from it would cost too much. */
import { describe, expect, it } from 'vitest';
import type { Engine } from '../../runners/engines/protocol.ts';
import { createRing } from '../../runners/sweep/ring.ts';
import { type CheckpointRule, startSweep } from '../../runners/sweep/sweep.ts';

const spent = { variation: 0, model: 0, ranking: 0, archive: 0, transfer: 0 };

/** An engine whose every epoch takes some milliseconds and changes nothing. */
const idle: Engine = {
  width: 1,
  run: async ({ island }) => {
    await new Promise((done) => setTimeout(done, 5));
    return { ok: true, island, spent };
  },
  close: async () => {},
};

/** Times at which a sweep of `length` seconds was saved on its way, s. */
async function savesOf(checkpoints: CheckpointRule, besides: number, length: number): Promise<number[]> {
  const saves: number[] = [];
  const islands = [{ bytes: new Uint8Array(8), evaluations: 0, feasible: 0 }];
  const sweep = startSweep({
    engine: idle,
    rings: [createRing({ shard: 0, epoch: 0, epochEvaluations: 1, islands })],
    budget: { seconds: length },
    shards: 1,
    geneNames: [],
    neighbours: () => [],
    tally: () => ({ evaluations: 0, feasible: 0 }),
    measure: () => ({ frontSize: 0, hypervolume: 0, best: [] }),
    apart: () => [],
    secondsBefore: 0,
    save: (reason) => void (reason === 'interval' && saves.push(sweep.seconds())),
    checkpoints,
    besides: () => besides,
    onFault: () => {},
    stop: new Promise(() => {}),
    graceSeconds: 0,
  });
  await sweep.ended;
  return saves;
}

describe('a sweep under way', () => {
  it('is saved as often as asked for where that costs little', async () => {
    const [first = 0, second = 0] = await savesOf({ seconds: 0.1, share: 0.5 }, 0, 1);
    expect(first).toBeGreaterThanOrEqual(0.1);
    expect(second - first).toBeGreaterThanOrEqual(0.1);
  });

  it('waits until what was made from the last checkpoint is no more than its share of the time', async () => {
    const [first = 0, ...later] = await savesOf({ seconds: 0.1, share: 0.5 }, 0.3, 1.5);
    for (const [i, at] of later.entries()) expect(at - (later[i - 1] ?? first)).toBeGreaterThanOrEqual(0.6);
  });
});
