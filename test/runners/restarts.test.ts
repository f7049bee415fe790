/** The short searches after a sweep: which limits, what they may find, and that threads do not change it. */
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { beforeAll, describe, expect, it } from 'vitest';
import { createMerger, search } from '../../optimizer/index.ts';
import { problemOf, readSheet } from '../../runners/inputs.ts';
import { packagePath } from '../../runners/package-path.ts';
import { planRestarts } from '../../runners/restarts/plan.ts';
import { inlineRestarter, runRestarts, threadRestarter } from '../../runners/restarts/run.ts';
import { nearMissesOf } from '../../runners/run-folder/near-misses.ts';
import { readRestarts, writeRestarts } from '../../runners/run-folder/restarts.ts';
import { newFolder } from './processes.ts';

const inputs = readSheet(packagePath('model', 'rails', 'buoy-sensors.yaml'));
const problem = problemOf(inputs);
const merger = createMerger(problem);
for (const island of search(problem, { evaluations: 16_000, seed: 'test' }).islands) merger.add(island);
const found = { archive: merger.archive(), nearMisses: merger.nearMisses() };
const plan = planRestarts(problem, found, { seed: 'test', evaluations: 50_000 });
let made: Awaited<ReturnType<typeof runRestarts>>;

beforeAll(async () => {
  made = await runRestarts(inlineRestarter(problem), problem, plan, found.archive);
});

describe('the plan', () => {
  it('spends at most a tenth of the evaluations of the sweep, a search with nothing relaxed among them', () => {
    expect(plan.searches.reduce((sum, one) => sum + one.evaluations, 0)).toBeLessThanOrEqual(5000);
    expect(plan.searches[0]).toMatchObject({ limit: -1, share: 0 });
    expect(plan.searches.length).toBeGreaterThan(5);
  });

  it('relaxes by stated steps, each limit by a tenth first, and none that counts whole things', () => {
    for (const { limit, share } of plan.searches.slice(1)) {
      expect([0.025, 0.1, 0.25]).toContain(share);
      expect(problem.limitDefinitions[limit]?.whole).not.toBe(true);
    }
    expect(plan.searches[1]?.share).toBe(0.1);
  });

  it('makes none after a sweep too short to spare any', () => {
    expect(planRestarts(problem, found, { seed: 'test', evaluations: 5000 }).searches).toEqual([]);
  });
});

describe('what they find', () => {
  it('breaks one limit, by no more than it was relaxed, or none', () => {
    expect(made.misses.count).toBeGreaterThan(0);
    expect(made.level.violations.every((violation) => violation === 0)).toBe(true);
    const relaxed = new Map(plan.searches.map(({ limit }) => [limit, 0]));
    for (const { limit, share } of plan.searches) relaxed.set(limit, Math.max(share, relaxed.get(limit) ?? 0));
    const width = problem.limits.length;
    for (let row = 0; row < made.misses.count; row++) {
      const violations = made.misses.violations.subarray(row * width, (row + 1) * width);
      const broken = [...violations.keys()].filter((place) => (violations[place] ?? 0) > 0);
      expect(broken).toEqual([made.misses.limit[row]]);
      expect(violations[broken[0] ?? 0]).toBeLessThanOrEqual(relaxed.get(broken[0] ?? 0) ?? 0);
    }
  });

  it('is the same to the byte with two threads', async () => {
    const module = pathToFileURL(packagePath('dist', 'runners', 'engines', 'rail-problem.js')).href;
    const worker = packagePath('dist', 'runners', 'restarts', 'worker.js');
    const threads = threadRestarter(worker, { module, source: inputs.texts }, 2);
    try {
      expect(await runRestarts(threads, problem, plan, found.archive)).toEqual(made);
    } finally {
      await threads.close();
    }
  });

  it('joins the near misses of the sweep: nothing that keeps every limit beats one of them', () => {
    const restarts = { steps: [0.1], limits: ['outputRipple'], evaluations: 100, ...made };
    const missed = nearMissesOf(problem, found, restarts);
    expect(missed.length).toBeGreaterThan(0);
    const m = problem.objectives.length;
    for (const { design, limit, violation } of missed) {
      expect(violation).toBeGreaterThan(0);
      expect(design.margins[limit]).toBeLessThan(0);
      for (const { count, objectives } of [found.archive, made.level]) {
        for (let row = 0; row < count; row++) {
          const beaten = design.objectives.every((value, k) => (objectives[row * m + k] ?? 0) <= value);
          expect(beaten).toBe(false);
        }
      }
    }
  });

  it('is kept in the run folder for the archive it belongs to, and for no other', () => {
    const folder = newFolder();
    const restarts = { steps: [0.025, 0.1], limits: ['outputRipple'], evaluations: 100, ...made };
    writeRestarts(folder, found.archive, restarts);
    expect(readRestarts(folder, found.archive)).toEqual(restarts);
    expect(readRestarts(folder, { ...found.archive, genes: found.archive.genes.slice(1) })).toBeUndefined();
    expect(readRestarts(join(folder, 'none'), found.archive)).toBeUndefined();
  });
});
