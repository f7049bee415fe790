/** The design space of each shipped rail: what the search and a person are promised of it. */
import { describe, expect, it } from 'vitest';
import type { RailProblem } from '../../model/problem.ts';
import { createRailProblem } from '../../model/problem.ts';
import { readSpec, recordOfSpec } from '../../model/spec.ts';
import { writeSpec } from '../../model/write-spec.ts';
import { builtInTables, RAIL_NAMES, shippedProblem, shippedRail } from './shipped.ts';
import { need, randomFrom, randomGenes } from './support.ts';

/** `count` random snapped designs of `problem`, the same in every run. */
function designs(problem: RailProblem, count: number, seed = 7): Float64Array[] {
  const next = randomFrom(seed);
  return Array.from({ length: count }, () => randomGenes(problem, next));
}

function evaluated(problem: RailProblem, genes: Float64Array): { objectives: Float64Array; violations: Float64Array } {
  const objectives = new Float64Array(problem.objectives.length);
  const violations = new Float64Array(problem.limits.length);
  problem.evaluate(genes, objectives, violations);
  return { objectives, violations };
}

describe.each(RAIL_NAMES)('%s', (name) => {
  const problem = shippedProblem(name);

  it('evaluate, judge and assess say the same to the last bit', () => {
    for (const genes of designs(problem, 60)) {
      const { objectives, violations } = evaluated(problem, genes);
      const judged = problem.judge(genes);
      const story = problem.assess(genes);
      expect(judged.objectives).toEqual([...objectives]);
      expect(story.objectives.map(({ value }) => value)).toEqual([...objectives]);
      expect(story.worstMargin).toBe(judged.worstMargin);
      expect(story.feasible).toBe(judged.feasible);
      expect(Object.fromEntries(story.limits.map(({ name: limit, margin }) => [limit, margin]))).toEqual(
        judged.margins,
      );
      const missed = Object.fromEntries(story.limits.map((limit) => [limit.name, limit.violation]));
      for (const [k, limit] of problem.limits.entries()) if (limit in missed) expect(missed[limit]).toBe(violations[k]);
    }
  });

  it('keeps no memory: the same design after a hundred others gives the same bits', () => {
    const all = designs(problem, 100, 3);
    const first = all.map((genes) => evaluated(problem, genes));
    for (const [i, genes] of all.entries()) expect(evaluated(problem, genes)).toEqual(first[i]);
    const fresh = shippedProblem(name);
    for (const [i, genes] of [...all.entries()].reverse()) expect(evaluated(fresh, genes)).toEqual(first[i]);
  });

  it('nothing is infinite, nothing negative, and every one of 2000 random designs can be computed', () => {
    // Five rails make 10⁴ designs. What could not be computed would be NaN here: none is on the shipped rails.
    const next = randomFrom(11);
    const broken: number[][] = [];
    for (let i = 0; i < 2000; i++) {
      const { objectives, violations } = evaluated(problem, randomGenes(problem, next));
      const figures = [...objectives, ...violations];
      if (!figures.every((figure) => Number.isFinite(figure) && figure >= 0)) broken.push(figures);
    }
    expect(broken).toEqual([]);
  });

  it('the parts sum to the objectives: losses of the profile, volumes, costs', () => {
    for (const genes of designs(problem, 40, 5)) {
      const story = problem.assess(genes);
      const sums: Record<string, number> = {
        loss: story.losses.reduce((sum, item) => sum + item.watts, 0),
        volume: story.volumes.reduce((sum, item) => sum + item.value, 0),
        cost: story.costs.reduce((sum, item) => sum + item.value, 0),
      };
      for (const { name: objective, value } of story.objectives) {
        if (objective in sums) expect(Math.abs(sums[objective] / value - 1)).toBeLessThan(1e-12);
      }
      const off = story.points.map(({ losses, loss }) => losses.reduce((sum, item) => sum + item.watts, 0) / loss - 1);
      expect(Math.max(...off.map(Math.abs))).toBeLessThan(1e-12);
      const negative = story.points.flatMap(({ losses }) => losses.filter(({ watts }) => watts < 0));
      expect(negative).toEqual([]);
    }
  });

  it('snapping a snapped design moves nothing, whatever was put in', () => {
    const next = randomFrom(2);
    const broken: Float64Array[] = [];
    for (let i = 0; i < 1000; i++) {
      const wild = Float64Array.from(problem.genes, ({ low, high }) => low + (3 * next() - 1) * (high - low));
      if (i % 50 === 0) wild[i % wild.length] = Number.NaN;
      problem.snap(wild);
      const again = Float64Array.from(wild);
      problem.snap(again);
      const kept = problem.genes.every(
        ({ low, high }, k) => Object.is(again[k], wild[k]) && wild[k] >= low && wild[k] <= high,
      );
      if (!kept) broken.push(wild);
    }
    expect(broken).toEqual([]);
  });

  it('a record gives its design back, and so does a spec through its file', () => {
    for (const genes of designs(problem, 60, 9)) {
      const record = problem.record(genes);
      expect(need(problem.genesFrom(record))).toEqual(genes);
      const text = JSON.stringify(writeSpec(problem, genes), null, 2);
      const spec = need(readSpec(text, 'spec.json'));
      expect(spec.id).toBe(problem.id(genes));
      const back = need(problem.genesFrom(recordOfSpec(spec), 'spec.json'));
      expect(problem.assess(back)).toEqual(problem.assess(genes));
      expect(spec.objectives).toEqual(problem.assess(back).objectives);
    }
  });

  it('every family can be reached, and confining a design to it lands in it', () => {
    const next = randomFrom(4);
    for (const family of problem.families.names.keys()) {
      const genes = randomGenes(problem, next);
      problem.families.confine(genes, family);
      problem.snap(genes);
      expect(problem.families.of(genes)).toBe(family);
    }
  });

  it('ids are unlike for unlike designs and alike for the same record', () => {
    const all = designs(problem, 400, 12);
    const byId = new Map<string, string>();
    for (const genes of all) {
      const id = problem.id(genes);
      expect(id).toMatch(/^[a-z][0-9a-z]{12}$/);
      const text = JSON.stringify(problem.record(genes));
      expect(byId.get(id) ?? text).toBe(text);
      byId.set(id, text);
    }
  });

  it('the reference point of the hypervolume comes from the sheet, not from designs', () => {
    for (const { reference, ideal, resolution } of problem.objectives) {
      expect(reference).toBeGreaterThan(ideal);
      expect(resolution).toBeGreaterThan(0);
      expect(resolution).toBeLessThan(reference - ideal);
    }
  });
});

describe('what an id is made of', () => {
  const rail = shippedRail('buoy-sensors');
  const problem = shippedProblem('buoy-sensors');

  it('survives a new price list', () => {
    const tables = builtInTables();
    const dearer = {
      ...tables,
      switches: tables.switches.map((row) => ({
        ...row,
        prices: row.prices.map(({ from, price }) => ({ from, price: 2 * price })),
      })),
    };
    const later = need(createRailProblem(rail, dearer));
    for (const genes of designs(problem, 50, 21)) {
      const back = need(later.genesFrom(problem.record(genes)));
      expect(later.id(back)).toBe(problem.id(genes));
    }
  });

  it('survives rows that are added to the tables', () => {
    const tables = builtInTables();
    const [row] = tables.ceramics;
    const more = { ...tables, ceramics: [{ ...row, name: 'added', voltageRating: 25 }, ...tables.ceramics] };
    const later = need(createRailProblem(rail, more));
    for (const genes of designs(problem, 50, 22)) {
      const back = need(later.genesFrom(problem.record(genes)));
      expect(later.id(back)).toBe(problem.id(genes));
    }
  });

  it('does not change with a gene that plays no part', () => {
    const next = randomFrom(23);
    for (let i = 0; i < 60; i++) {
      const genes = randomGenes(problem, next);
      const { parts } = problem.record(genes);
      const idle = ['lowSwitch', 'diode', 'outputBulk', 'inputBulk'].filter((slot) => !(slot in parts));
      for (const slot of idle) {
        const at = problem.genes.findIndex(({ name }) => name === slot);
        const other = Float64Array.from(genes);
        other[at] = problem.genes[at].high;
        problem.snap(other);
        expect(other).toEqual(genes);
      }
    }
  });
});
