/**
 * An epoch is a pure function of plain data: the laws on which threads, checkpoints and clusters rest. All comparisons are of bytes.
 */
import { describe, expect, it } from 'vitest';
import {
  agreementOf,
  createMeasure,
  createPlan,
  createStepper,
  type Designs,
  hypervolumeOf,
  type Island,
  immigrantsFor,
  mergeArchives,
  mergeNearMisses,
  mergeRecords,
  NO_DESIGNS,
  type Problem,
  packDesigns,
  packIsland,
  search,
  startIslands,
  step,
  unpackDesigns,
  unpackIsland,
} from '../../optimizer/index.ts';
import { osyczkaKundu } from './problems/constrained.ts';
import { rooms } from './problems/rooms.ts';
import { zdt1 } from './problems/zdt.ts';

/** Two epochs of a ring of three. */
function ring(problem: Problem, seed: number, epochs = 2): Island[] {
  const plan = createPlan(problem, { seed, islands: 3, population: 20, epochGenerations: 4, trialEpochs: 1 });
  let islands = startIslands(problem, plan);
  for (let epoch = 0; epoch < epochs; epoch++) {
    const before = islands;
    islands = before.map((island, i) => step(problem, island, immigrantsFor(before, i)));
  }
  return islands;
}

/** Bytes as text, which compares faster. */
const text = (packed: Uint8Array): string => Buffer.from(packed).toString('base64');

const bytes = (islands: readonly Island[]): string => islands.map((island) => text(packIsland(island))).join();

describe.each([zdt1(6).problem, osyczkaKundu().problem, rooms()])('an epoch on $name', (problem) => {
  it('is the same for the same seed and another for another', () => {
    expect(bytes(ring(problem, 1))).toBe(bytes(ring(problem, 1)));
    expect(bytes(ring(problem, 1))).not.toBe(bytes(ring(problem, 2)));
  });

  it('changes neither its island nor its immigrants', () => {
    const islands = ring(problem, 3);
    const immigrants = immigrantsFor(islands, 0);
    const before = [bytes(islands), text(packDesigns(immigrants))];
    const first = bytes([step(problem, islands[0], immigrants)]);
    expect([bytes(islands), text(packDesigns(immigrants))]).toEqual(before);
    expect(bytes([step(problem, islands[0], immigrants)])).toBe(first);
  });

  it('goes on from bytes as if it had never stopped', () => {
    const islands = ring(problem, 4);
    const immigrants = immigrantsFor(islands, 1);
    const stored = packIsland(islands[1]);
    const carried = unpackDesigns(packDesigns(immigrants));
    expect(bytes([step(problem, unpackIsland(stored), carried)])).toBe(bytes([step(problem, islands[1], immigrants)]));
  });

  it('is the same in memory that other epochs have used, of other islands and other sizes', () => {
    const [first, second, third] = ring(problem, 10, 1);
    const immigrants = immigrantsFor([first, second, third], 0);
    const { plan } = first;
    const [wide] = startIslands(problem, { ...plan, population: 2 * plan.population, seed: 11 });
    const stepper = createStepper(problem);
    const alone = bytes([step(problem, first, immigrants)]);
    for (const before of [first, second, wide, third, wide]) {
      stepper(before, NO_DESIGNS);
      expect(bytes([stepper(first, immigrants)])).toBe(alone);
    }
  });

  it('is not influenced by the clock that watches it', () => {
    const [island] = ring(problem, 5);
    let tick = 0;
    const spent = { variation: 0, model: 0, ranking: 0, archive: 0 };
    const watched = step(problem, island, NO_DESIGNS, { now: () => tick++, spent });
    expect(bytes([watched])).toBe(bytes([step(problem, island)]));
    for (const part of Object.values(spent)) expect(part).toBeGreaterThan(0);
  });

  it('spends exactly its evaluations, and its records add up', () => {
    for (const { counters, record, plan, epoch } of ring(problem, 6)) {
      expect(counters.evaluations).toBe(epoch * plan.epochGenerations * plan.population);
      expect(sum(record.evaluated)).toBe(counters.evaluations);
      expect(sum(record.feasible)).toBe(counters.feasible);
    }
  });

  it('gives merged archives the same bytes in any order', () => {
    const islands = ring(problem, 7);
    const front = packDesigns(mergeArchives(problem, islands));
    expect(packDesigns(mergeArchives(problem, islands.toReversed()))).toEqual(front);
    const two: Designs = mergeArchives(problem, islands.slice(1));
    expect(packDesigns(mergeArchives(problem, [two, islands[0]]))).toEqual(front);
  });

  it('measures fronts one after the other as it measures each by itself', () => {
    const measure = createMeasure(problem);
    const islands = [...ring(problem, 12, 1), ...ring(problem, 13)];
    const fronts = [...islands.map((island) => island.archive), mergeArchives(problem, islands)];
    for (const front of [...fronts, ...fronts.toReversed()]) expect(measure(front)).toBe(hypervolumeOf(problem, front));
  });

  it('never loses what an archive covers', () => {
    let [island] = ring(problem, 8, 1);
    for (let epoch = 0; epoch < 5; epoch++) {
      const before = island.archive;
      island = step(problem, island);
      // Every old member is still weakly dominated, up to the edge of a grid cell, by some member.
      const { objectives } = problem;
      const m = objectives.length;
      for (let a = 0; a < before.count; a++) {
        const covered = range(island.archive.count).some((b) =>
          objectives.every(
            ({ resolution }, c) =>
              island.archive.objectives[b * m + c] <= before.objectives[a * m + c] + resolution * (1 + 1e-9),
          ),
        );
        expect(covered, `member ${a} of epoch ${epoch}`).toBe(true);
      }
    }
  });
});

describe('packed islands', () => {
  const packed = packIsland(ring(zdt1(6).problem, 9)[0]);

  it('say what is wrong with damaged bytes', () => {
    expect(() => unpackIsland(packed.subarray(0, packed.length - 8))).toThrow(
      `packed island cut short: ${packed.length - 8} of ${packed.length} bytes`,
    );
    expect(() => unpackIsland(new Uint8Array(100))).toThrow('these bytes are no packed island');
    const foreign = packed.slice();
    foreign[4] = 99;
    expect(() => unpackIsland(foreign)).toThrow('packed by layout version 99, this one reads 2');
  });

  it('are the same in any room, whatever was in it and however large it is', () => {
    const room = new SharedArrayBuffer(packed.length + 100);
    new Uint8Array(room).fill(255);
    const again = packIsland(unpackIsland(packed), () => room);
    expect(again.buffer).toBe(room);
    expect(text(again)).toBe(text(packed));
    expect(text(packIsland(unpackIsland(again)))).toBe(text(packed));
  });

  it('may lie anywhere in a buffer', () => {
    const shifted = new Uint8Array(packed.length + 3);
    shifted.set(packed, 3);
    expect(text(packIsland(unpackIsland(shifted.subarray(3))))).toBe(text(packed));
  });
});

describe('a ring', () => {
  it('spreads its islands over the families, and every family is tried', () => {
    const problem = rooms();
    for (const islands of [1, 2, 3, 7]) {
      const plan = createPlan(problem, { islands, population: 20, epochGenerations: 2, trialEpochs: 1 });
      const after = startIslands(problem, plan).map((island) => step(problem, island));
      const evaluated = problem.families.names.map((_, f) =>
        after.reduce((all, { record }) => all + record.evaluated[f], 0),
      );
      for (const count of evaluated) expect(count).toBeGreaterThanOrEqual(10);
    }
  });

  it('lets nobody in while families are tried, and only neighbours after that', () => {
    const problem = rooms();
    expect(immigrantsFor(ring(problem, 1, 0), 0).count).toBe(0);
    const islands = ring(problem, 1, 1);
    expect(immigrantsFor(islands, 0).count).toBe(
      Math.min(2, islands[2].archive.count) + Math.min(2, islands[1].archive.count),
    );
    expect(immigrantsFor(islands.slice(0, 1), 0).count).toBe(0);
  });

  it('plans by budget: one island for 25,000 evaluations, at most 16, whole epochs', () => {
    const problem = zdt1().problem;
    const planned = (evaluations: number) => createPlan(problem, { evaluations });
    expect(planned(25_000)).toMatchObject({ islands: 1, epochs: 10, trialEpochs: 0 });
    expect(planned(200_000)).toMatchObject({ islands: 8, epochs: 10 });
    expect(planned(10_000_000)).toMatchObject({ islands: 16, epochs: 250 });
    expect(planned(100)).toMatchObject({ islands: 1, epochs: 2 });
    const { islands, population, epochGenerations, epochs } = planned(77_777);
    expect(islands * population * epochGenerations * epochs).toBeGreaterThanOrEqual(77_777);
  });
});

function sum(values: Float64Array): number {
  return values.reduce((all, value) => all + value, 0);
}

function range(count: number): number[] {
  return Array.from({ length: count }, (_, k) => k);
}

describe('islands together', () => {
  it('add up their records and tell how far they agree', () => {
    const problem = rooms();
    const islands = ring(problem, 11);
    const front = mergeArchives(problem, islands);
    const record = mergeRecords(islands);
    expect(sum(record.evaluated)).toBe(islands.reduce((all, island) => all + island.counters.evaluations, 0));
    expect(Math.min(...record.best.filter((_, k) => k % 2 === 0))).toBe(front.objectives[0]);
    for (const share of agreementOf(problem, islands, front)) {
      expect(share).toBeGreaterThan(0.5);
      expect(share).toBeLessThan(1.01);
    }
  });

  it('hold near misses that break one limit by at most a quarter and beat the front', () => {
    const problem = rooms();
    const islands = ring(problem, 12);
    const front = mergeArchives(problem, islands);
    const near = mergeNearMisses(problem, islands, front);
    expect(near.count).toBeGreaterThan(0);
    for (let k = 0; k < near.count; k++) {
      expect(near.violations[k]).toBeGreaterThan(0);
      expect(near.violations[k]).toBeLessThanOrEqual(0.25);
      const [cost, discomfort] = near.objectives.subarray(2 * k, 2 * k + 2);
      for (let j = 0; j < front.count; j++) {
        expect(front.objectives[2 * j] <= cost && front.objectives[2 * j + 1] <= discomfort).toBe(false);
      }
    }
  });

  it('start from the seeds given', () => {
    const problem = rooms();
    const genes = Float64Array.of(1, 10, 6, 300);
    const f = new Float64Array(2);
    problem.evaluate(genes, f, new Float64Array(1));
    const plan = createPlan(problem, { islands: 1, population: 20, epochGenerations: 1 });
    const [island] = startIslands(problem, plan).map((each) => step(problem, each));
    const { archive } = island;
    const covered = range(archive.count).some(
      (k) => archive.objectives[2 * k] <= f[0] + 1 && archive.objectives[2 * k + 1] <= f[1] + 0.01,
    );
    expect(covered).toBe(true);
  });

  it('restart around the archive when nothing new enters it, and stop when every design was seen', () => {
    const small: Problem = {
      ...rooms(),
      genes: rooms().genes.slice(0, 2),
      seeds: [],
      snap: () => {},
      evaluate: ([a, b], f, v) => {
        f[0] = a + b;
        f[1] = 41 - b;
        v[0] = 0;
      },
    };
    const { islands, front, evaluations } = search(small, { evaluations: 20_000, seed: 1 });
    // 3 shapes × 40 seat counts; the front is the first shape with every seat count.
    expect(front.count).toBe(40);
    expect(evaluations).toBe(120);
    expect(islands[0].counters.restarts).toBeGreaterThan(0);
  });
});
