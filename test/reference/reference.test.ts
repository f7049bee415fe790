/** Every published case holds, and there are enough of them. */
import { describe, expect, it } from 'vitest';
import { CASES, checkCase } from './index.ts';
import { publishedSection } from './markdown.ts';

for (const group of CASES) {
  describe(group.title, () => {
    it.each(group.cases.map((item) => [item.what, item] as const))('%s', (_, item) => {
      const { got, difference, tolerance } = checkCase(item);
      expect(got, `${item.what}: got ${got}, published ${item.expected} (${item.source}, ${item.place})`).not.toBeNaN();
      expect(Math.abs(difference), `got ${got}, published ${item.expected}`).toBeLessThanOrEqual(tolerance);
    });
  });
}

describe('The set of published cases', () => {
  const cases = CASES.flatMap((group) => group.cases);
  it('holds at least 60 values from pages that were seen and 300 in all', () => {
    expect(cases.filter((item) => item.mark === 'seen').length).toBeGreaterThanOrEqual(60);
    expect(cases.length).toBeGreaterThanOrEqual(300);
  });
  it('says of each value where it stands and in what unit', () => {
    for (const item of cases)
      expect(
        [item.place, item.what, item.unit].every((text) => text.length > 0),
        item.what,
      ).toBe(true);
  });
  it('allows no difference above a third of the value', () => {
    for (const item of cases) if (item.expected !== 0) expect(item.tolerance, item.what).toBeLessThanOrEqual(1 / 3);
  });
});

describe('The evidence table', () => {
  it('has a row for every case and counts a wrong value as failed', () => {
    const wrong = { ...CASES[0].cases[0], expected: 1, tolerance: 0.01 };
    const { text, passed, failed } = publishedSection([{ title: 'mixed', cases: [CASES[0].cases[0], wrong] }]);
    expect([passed, failed]).toEqual([1, 1]);
    expect(text.split('\n').filter((line) => line.endsWith('**fails** |'))).toHaveLength(1);
    expect(text.split('\n').filter((line) => line.endsWith('holds |'))).toHaveLength(1);
  });
});
