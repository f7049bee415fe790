import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { CellTree } from '../../../optimizer/archive/cell-tree.ts';

describe('cell tree', () => {
  it('answers as a plain list does, through insertions, removals, splits and rebuilds', () => {
    const m = 3;
    const coordinate = fc.integer({ min: 0, max: 12 });
    const cell = fc.array(coordinate, { minLength: m, maxLength: m });
    const step = fc.record({ cell, remove: fc.boolean() });
    fc.assert(
      fc.property(fc.array(step, { minLength: 50, maxLength: 400 }), (steps) => {
        const cells = new Float64Array(512 * m);
        const tree = new CellTree(m, cells);
        const list = new Map<number, number[]>();
        const removed: number[] = [];
        steps.forEach(({ cell: query, remove }, slot) => {
          const asked = Float64Array.from(query);
          const below = [...list].filter(([, held]) => held.every((v, c) => v <= query[c])).map(([s]) => s);
          const found = tree.atMost(asked);
          expect(below.length === 0 ? found === -1 : below.includes(found)).toBe(true);
          if (remove && slot % 4 === 0) {
            const above = [...list].filter(([, held]) => held.every((v, c) => v >= query[c])).map(([s]) => s);
            tree.removeAtLeast(asked, removed);
            expect(removed.toSorted((a, b) => a - b)).toEqual(above.toSorted((a, b) => a - b));
            for (const s of above) list.delete(s);
          } else if (![...list.values()].some((held) => held.every((v, c) => v === query[c]))) {
            cells.set(query, slot * m);
            tree.insert(slot);
            list.set(slot, query);
          }
          expect(tree.count).toBe(list.size);
        });
        expect(tree.slots()).toEqual([...list.keys()].sort((a, b) => a - b));
      }),
    );
  });
});
