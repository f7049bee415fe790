import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  type Archive,
  type ArchiveGrid,
  createArchive,
  type Designs,
  insertAll,
  mergeArchive,
  packArchive,
  unpackArchive,
} from '../../../optimizer/archive/index.ts';
import { createHypervolume } from '../../../optimizer/hypervolume/index.ts';
import { createRanker } from '../../../optimizer/ranking/index.ts';
import { type PlainDesign, plainArchive } from '../oracles/archive.ts';
import { allRows, generator } from '../oracles/points.ts';

function gridOf(m: number, resolution: number): ArchiveGrid {
  return {
    genes: 2,
    objectives: m,
    violations: 1,
    ideal: new Float64Array(m).fill(-1),
    resolution: new Float64Array(m).fill(resolution),
  };
}

function designsOf(list: readonly PlainDesign[], violation = 0): Designs {
  return {
    count: list.length,
    genes: Float64Array.from(list.flatMap((d) => d.genes)),
    objectives: Float64Array.from(list.flatMap((d) => d.objectives)),
    violations: new Float64Array(list.length).fill(violation),
  };
}

function filled(grid: ArchiveGrid, list: readonly PlainDesign[]): Archive {
  return unpackArchive(grid, designsOf(list));
}

/** The bytes of an archive, as a run folder would hold them. */
function bytes(archive: Archive): string {
  const { genes, objectives, violations } = packArchive(archive);
  return [genes, objectives, violations]
    .map((a) => Buffer.from(a.buffer, a.byteOffset, a.byteLength).toString('hex'))
    .join('|');
}

/** Designs with few distinct values, so that ties, shared cells and equal designs abound; −0 too. */
function designs(m: number, most: number): fc.Arbitrary<PlainDesign[]> {
  const value = fc.constantFrom(-0, 0, 0.2, 0.5, 0.9, 1, 1.3, 1.7, 2.2, 3, 3.4, 4.1);
  const gene = fc.constantFrom(-0, 0, 1, 2);
  const design = fc.record({
    genes: fc.array(gene, { minLength: 2, maxLength: 2 }),
    objectives: fc.array(value, { minLength: m, maxLength: m }),
  });
  return fc.array(design, { maxLength: most });
}

describe.each([2, 3, 4])('ε-grid archive, %i objectives', (m) => {
  const grid = gridOf(m, 1);

  it('holds the first of each cell no other dominates, and the first in each objective', () => {
    fc.assert(
      fc.property(designs(m, 30), (list) => {
        const expected = plainArchive(
          list.map((d) => ({ genes: d.genes.map((v) => v + 0), objectives: d.objectives.map((v) => v + 0) })),
          Array.from(grid.ideal),
          Array.from(grid.resolution),
        );
        const archive = filled(grid, list);
        expect(archive.size()).toBe(expected.length);
        expect(packArchive(archive)).toEqual(designsOf(expected));
      }),
      { numRuns: 300 },
    );
  });

  it('holds the same bytes whatever the order of arrival', () => {
    const shuffles = designs(m, 40).chain((list) =>
      fc.tuple(fc.constant(list), fc.shuffledSubarray(list, { minLength: list.length })),
    );
    fc.assert(
      fc.property(shuffles, ([list, shuffled]) => {
        expect(bytes(filled(grid, shuffled))).toBe(bytes(filled(grid, list)));
      }),
      { numRuns: 300 },
    );
  });

  it('merges like a union: in either order, in any grouping, with itself, with nothing', () => {
    const merged = (...parts: Archive[]): Archive => {
      const whole = createArchive(grid);
      for (const part of parts) mergeArchive(whole, part);
      return whole;
    };
    fc.assert(
      fc.property(designs(m, 15), designs(m, 15), designs(m, 15), (listA, listB, listC) => {
        const [a, b, c] = [listA, listB, listC].map((list) => filled(grid, list));
        const all = bytes(filled(grid, [...listA, ...listB, ...listC]));
        expect(bytes(merged(a, b))).toBe(bytes(merged(b, a)));
        expect(bytes(merged(merged(a, b), c))).toBe(all);
        expect(bytes(merged(a, merged(b, c)))).toBe(all);
        expect(bytes(merged(a, a))).toBe(bytes(a));
        expect(bytes(merged(createArchive(grid), a))).toBe(bytes(a));
        expect(bytes(unpackArchive(grid, packArchive(a)))).toBe(bytes(a));
      }),
    );
  });

  it('never lets its guaranteed hypervolume fall', () => {
    const reference = new Float64Array(m).fill(6);
    const guaranteed = (archive: Archive): number => {
      const corners = archive.corners();
      const n = corners.length / m;
      return createHypervolume(Math.max(1, n), m).volume(corners, allRows(n), n, reference);
    };
    fc.assert(
      fc.property(designs(m, 20), (list) => {
        const archive = createArchive(grid);
        const shown = designsOf(list);
        let before = 0;
        for (let i = 0; i < shown.count; i++) {
          archive.insert(shown.genes, shown.objectives, shown.violations, i);
          const after = guaranteed(archive);
          expect(after).toBeGreaterThanOrEqual(before);
          before = after;
        }
      }),
    );
  });

  it('holds its laws for 100,000 designs: members never dominate each other, every design is answered by a member’s cell', () => {
    const n = 100_000;
    const fine = gridOf(m, m === 4 ? 0.05 : 0.01);
    const draw = generator(m);
    const objectives = Float64Array.from({ length: n * m }, draw);
    for (let i = 0; i < n; i++) {
      const row = objectives.subarray(i * m, i * m + m);
      const stretch = (1 + 0.3 * draw()) / Math.sqrt(row.reduce((sum, v) => sum + v * v, 0));
      for (let c = 0; c < m; c++) row[c] *= stretch;
    }
    const genes = Float64Array.from({ length: 2 * n }, draw);
    const archive = createArchive(fine);
    insertAll(archive, { count: n, genes, objectives, violations: new Float64Array(n) });
    const members = packArchive(archive);
    expect(createRanker(members.count, m).rank(members.objectives, members.count, new Int32Array(members.count))).toBe(
      1,
    );
    const corners = archive.corners();
    for (let k = 0; k < 500; k++) {
      const row = Math.floor(draw() * n) * m;
      let answered = false;
      for (let at = 0; at < corners.length && !answered; at += m) {
        answered = true;
        for (let c = 0; c < m; c++)
          if (corners[at + c] - fine.resolution[c] > objectives[row + c] + 1e-9) answered = false;
      }
      expect(answered).toBe(true);
    }
    for (let c = 0; c < m; c++) {
      const column = (values: Float64Array): number[] => Array.from(values).filter((_, k) => k % m === c);
      const least = column(objectives).reduce((a, b) => Math.min(a, b));
      expect(column(members.objectives).reduce((a, b) => Math.min(a, b))).toBe(least);
    }
  });
});

describe('ε-grid archive', () => {
  const grid = gridOf(2, 1);
  const insert = (archive: Archive, objectives: number[], violation: number, genes = [0, 0]): number =>
    archive.insert(Float64Array.from(genes), Float64Array.from(objectives), Float64Array.of(violation), 0);

  it('tells whether its members changed', () => {
    const archive = createArchive(grid);
    expect(insert(archive, [2.5, 2.5], 0)).toBe(1);
    expect(insert(archive, [2.5, 2.5], 0)).toBe(0);
    expect(insert(archive, [2.6, 2.6], 0)).toBe(0);
    expect(insert(archive, [2.4, 2.5], 0)).toBe(1);
    expect(insert(archive, [9, 9], 0)).toBe(0);
    expect(archive.size()).toBe(1);
  });

  it.each([
    ['a broken limit', [1, 1], 1e-12, [0, 0]],
    ['a violation that is NaN', [1, 1], Number.NaN, [0, 0]],
    ['an objective that is NaN', [1, Number.NaN], 0, [0, 0]],
    ['an infinite objective', [1, Number.NEGATIVE_INFINITY], 0, [0, 0]],
    ['a gene that is NaN', [1, 1], 0, [0, Number.NaN]],
    ['objectives too large to place', [1.7e308, 1.7e308], 0, [0, 0]],
  ])('refuses %s', (_, objectives, violation, genes) => {
    const archive = createArchive({ ...grid, resolution: Float64Array.of(0.1, 0.1) });
    expect(insert(archive, objectives, violation, genes)).toBe(0);
    expect(archive.size()).toBe(0);
  });

  it('keeps what it took when the caller’s arrays change', () => {
    const archive = createArchive(grid);
    const objectives = Float64Array.of(1, 2);
    archive.insert(Float64Array.of(7, 8), objectives, Float64Array.of(0), 0);
    objectives.fill(99);
    expect(packArchive(archive)).toEqual(designsOf([{ genes: [7, 8], objectives: [1, 2] }]));
  });
});

describe('a member drawn at random', () => {
  it('is a member, each about as often, and there is none in an empty archive', () => {
    const grid = gridOf(2, 1);
    const random = generator(3);
    const whole = (count: number): number => Math.floor(random() * count);
    const genes = new Float64Array(4);
    const objectives = new Float64Array(4);
    expect(createArchive(grid).draw(whole, genes, objectives, 1)).toBe(false);
    const list = [0, 1, 2, 3, 4].map((k) => ({ genes: [k, 10 + k], objectives: [k + 0.5, 4.5 - k] }));
    const archive = filled(grid, list);
    const counts = [0, 0, 0, 0, 0];
    for (let k = 0; k < 5000; k++) {
      expect(archive.draw(whole, genes, objectives, 1)).toBe(true);
      expect([genes[3], objectives[2], objectives[3]]).toEqual([10 + genes[2], genes[2] + 0.5, 4.5 - genes[2]]);
      counts[genes[2]]++;
    }
    for (const count of counts) expect(count / 5000).toBeCloseTo(0.2, 1);
  });
});
