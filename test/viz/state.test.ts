/** The address fragment: what goes in comes out, and no text from outside can break the page. */
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { changesBetween } from '../../viz/changes.ts';
import { benchOf, firstState } from '../../viz/scene.ts';
import { fromFragment, MOST_PINNED, type State, toFragment } from '../../viz/state.ts';
import { fixture, fixtureAssessor } from './fixture.ts';

const bench = benchOf(fixture(40, 50), fixtureAssessor());
const first = firstState(bench);
const ids = bench.dataset.designs.map((design) => design.id);
const number = fc.double({ noNaN: true, noDefaultInfinity: true });
const interval = fc.tuple(number, number).map(([a, b]): [number, number] => (a <= b ? [a, b] : [b, a]));

const state: fc.Arbitrary<State> = fc.record({
  x: fc.constant('volume'),
  y: fc.constantFrom('loss', 'cost'),
  third: fc.constantFrom('', 'cost', 'loss'),
  as: fc.constantFrom('size' as const, 'shade' as const),
  open: fc.constantFrom(...ids),
  pinned: fc.uniqueArray(fc.constantFrom(...ids), { maxLength: MOST_PINNED }),
  ranges: fc.dictionary(fc.constantFrom('o.loss', 'v.frequency', 'm.output-ripple'), interval),
  hidden: fc.uniqueArray(fc.constantFrom(...bench.dataset.families)),
  point: fc.nat(11),
  changes: fc.dictionary(
    fc.constantFrom('frequency', 'highSwitch', 'rail.ambient'),
    fc.constantFrom('120000', 'SW-30-5m', '<b> & = #', '300.5'),
  ),
});

describe('state in the address', () => {
  test('a state survives the way through the fragment', () => {
    fc.assert(
      fc.property(state, (one) => {
        const back = fromFragment(`#${toFragment(one)}`, first, bench.known);
        const as = one.third === '' ? 'size' : one.as;
        expect({ ...back, ranges: zeroless(back.ranges) }).toEqual({ ...one, as, ranges: zeroless(one.ranges) });
        expect([...changesBetween({ ...one, as }, back)]).toEqual([]);
      }),
    );
  });

  test('any text gives a state that the page can show', () => {
    fc.assert(
      fc.property(fc.oneof(fc.string(), fc.string({ unit: 'binary' }), fc.webFragments()), (text) => {
        const read = fromFragment(text, first, bench.known);
        expect(bench.known.objectives).toContain(read.x);
        expect(bench.known.objectives).toContain(read.y);
        expect(read.x).not.toBe(read.y);
        expect(ids).toContain(read.open);
      }),
    );
  });

  test('an empty fragment is the first view', () => {
    expect(fromFragment('', first, bench.known)).toEqual(first);
  });

  test('what is unknown is dropped: a design of another run, a range on nothing, too many pins', () => {
    const pins = ids
      .slice(0, 12)
      .map((id) => `pin=${id}`)
      .join('&');
    const read = fromFragment(
      `#open=nobody&range=o.nothing 1 2&range=o.loss 3 1&hide=no-family&point=-3&${pins}`,
      first,
      bench.known,
    );
    expect(read.open).toBe(first.open);
    expect(read.ranges).toEqual({});
    expect(read.hidden).toEqual([]);
    expect(read.point).toBe(0);
    expect(read.pinned).toHaveLength(MOST_PINNED);
  });
});

/** −0 and 0 are one value in a text. */
function zeroless(ranges: State['ranges']): Record<string, number[]> {
  return Object.fromEntries(Object.entries(ranges).map(([key, values]) => [key, values.map((value) => value + 0)]));
}
