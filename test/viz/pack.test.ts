/** The island inside the page: what goes in comes out, small, and as text that no parser of HTML can be led astray by. */
import { describe, expect, test } from 'vitest';
import { pack, unpack } from '../../viz/pack.ts';
import { fixture } from './fixture.ts';

const HOSTILE = '</script><img src=x onerror=alert(1)>\u2028"\'&\u202e';

describe('the data island', () => {
  const data = fixture(50, 500);

  test('designs come back to the bit, margins to single precision', () => {
    const back = unpack(pack(data));
    expect(
      back.front.designs.map(({ id, family, genes, parts, objectives }) => ({ id, family, genes, parts, objectives })),
    ).toEqual(
      data.front.designs.map(({ id, family, genes, parts, objectives }) => ({ id, family, genes, parts, objectives })),
    );
    back.front.designs.forEach((design, i) => {
      for (const [name, margin] of Object.entries(data.front.designs[i]?.margins ?? {})) {
        expect(design.margins[name]).toBe(Math.fround(margin));
      }
    });
    expect(back.front.designs.every((design) => !('yield' in design))).toBe(true);
    expect(back.rail).toEqual(data.rail);
    expect(back.nearMisses.map((miss) => miss.design.id)).toEqual(data.nearMisses.map((miss) => miss.design.id));
  });

  test('cloud points come back within a pixel of any screen: 1/65535 of their range', () => {
    const back = unpack(pack(data)).cloud;
    const columns = [0, 1, 2].map((k) => Array.from({ length: 500 }, (_, i) => data.cloud.objectives[3 * i + k] ?? 0));
    columns.forEach((column, k) => {
      const step = (Math.max(...column) - Math.min(...column)) / 65535;
      column.forEach((value, i) => {
        expect(Math.abs((back.objectives[3 * i + k] ?? 0) - value)).toBeLessThanOrEqual(step * 0.51);
      });
    });
    expect([...Array.from(back.family)]).toEqual([...Array.from(data.cloud.family)]);
  });

  test('hostile names stay text: no sign that ends a script element, and the same name comes back', () => {
    const text = pack({ ...data, rail: { ...data.rail, name: HOSTILE } });
    expect(text).not.toMatch(/[<\u2028\u2029]/);
    expect(unpack(text).rail.name).toBe(HOSTILE);
  });

  test('yields come back where there are any, and only where', () => {
    const designs = data.front.designs.map((design, i) => (i % 2 === 0 ? { ...design, yield: i / 64 } : design));
    const back = unpack(pack({ ...data, front: { ...data.front, designs } })).front.designs;
    expect(back.map((design) => design.yield)).toEqual(designs.map((design) => design.yield));
  });

  test('an empty front and an empty cloud pack too', () => {
    const empty = {
      ...data,
      front: { ...data.front, designs: [] },
      nearMisses: [],
      cloud: { families: [], family: [], objectives: [] },
    };
    expect(unpack(pack(empty)).front.designs).toEqual([]);
  });
});
