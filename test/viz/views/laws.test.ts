/** What the views must say whatever the data: sums that add up, order that means something, nothing hidden. */
import { describe, expect, test } from 'vitest';
import { renderCompare } from '../../../viz/views/compare.ts';
import { brokenLimits, renderLimits } from '../../../viz/views/limits.ts';
import { renderLosses } from '../../../viz/views/losses.ts';
import { renderMakeup } from '../../../viz/views/makeup.ts';
import { renderParts } from '../../../viz/views/parts.ts';
import { renderTemperatures } from '../../../viz/views/temperatures.ts';
import { renderWaveforms } from '../../../viz/views/waveforms.ts';
import { RAIL } from '../fixture.ts';
import { bench, open, scene } from '../gallery.ts';
import { cellsOf, place } from '../page-at.ts';

const number = (text: string | undefined) => Number((text ?? '').replace('·', '0').replace('−', '-'));

describe('where the watts go', () => {
  const root = place();
  renderLosses(root, open, RAIL.profile.length);
  const rows = cellsOf(root);

  test('one column for the mean and one for each load point of the profile', () => {
    expect(rows[0]).toEqual(['Loss, mW', 'mean', '2 %', '25 %', '50 %', '100 %']);
  });

  test('the parts sum to the total in every column, to the printed digits', () => {
    const parts = new Set(open.losses.map((item) => item.part));
    const whole = rows.slice(1).filter((row) => [...parts].some((part) => spokenLike(part) === row[0]));
    expect(whole).toHaveLength(parts.size);
    const total = rows.find((row) => row[0] === 'All') ?? [];
    for (let column = 1; column < 6; column++) {
      const sum = whole.reduce((all, row) => all + number(row[column]), 0);
      expect(Math.abs(sum - number(total[column])) / number(total[column])).toBeLessThan(0.02);
    }
  });

  test('the mean total is the design’s loss', () => {
    const total = rows.find((row) => row[0] === 'All') ?? [];
    expect(number(total[1]) / 1000 / (open.objectives[0]?.value ?? 0)).toBeCloseTo(1, 2);
  });
});

describe('limits', () => {
  const root = place();
  renderLimits(root, open);
  const rows = cellsOf(root).slice(1);

  test('every limit is there, the tightest first', () => {
    expect(rows).toHaveLength(open.limits.length);
    const slack = rows.map(
      (row) => open.limits.find((limit) => row[0]?.startsWith(spokenLike(limit.name)))?.slack ?? Number.NaN,
    );
    expect(slack).toEqual([...slack].sort((a, b) => a - b));
  });

  test('a limit that depends on the operating point names its worst corner', () => {
    const ripple = rows.find((row) => row[0]?.startsWith('Output ripple'));
    expect(ripple?.[4]).toBe('15 V in, 100 %');
  });

  test('a broken limit says has, allowed and by how much', () => {
    const broken = {
      name: 'output-ripple',
      unit: 'V',
      value: 0.03,
      allowed: 0.02,
      margin: -0.01,
      slack: -0.5,
      violation: 0.5,
    };
    expect(brokenLimits([broken, ...open.limits]).map((text) => text.replaceAll('\u00a0', ' '))).toEqual([
      'Output ripple: 30 mV where 20 mV is allowed, missed by 50.0 %',
    ]);
  });

  test.each([
    [
      'efficiency@100%',
      '',
      0.9,
      0.92,
      'Efficiency at 100 % load: 90.00 % where at least 92.00 % is asked, short by 2.00 points',
    ],
    ['avoidedBands', 'Hz', -18e3, 0, 'Clearance from avoided bands: 18 kHz inside a band that the sheet avoids'],
    ['controllerAbilities', '', 0, 1, 'Controller drives this stage: no'],
  ])('%s broken reads as a sentence', (name, unit, value, allowed, sentence) => {
    const broken = { name, unit, value, allowed, margin: value - allowed, slack: value - allowed, violation: 0.2 };
    expect(brokenLimits([broken]).map((text) => text.replaceAll('\u00a0', ' '))).toEqual([sentence]);
  });
});

describe('what a design is made of', () => {
  test('volume and cost list every contribution once and close with the objectives’ own figures', () => {
    const root = place();
    renderMakeup(root, open, 'EUR');
    const rows = cellsOf(root);
    const names = new Set([...open.volumes, ...open.costs].map((share) => share.name));
    expect(rows).toHaveLength(names.size + 2);
    expect(rows.at(-1)).toEqual([
      'All',
      `${((open.objectives[1]?.value ?? 0) * 1e6).toFixed(2)} cm³`,
      `${(open.objectives[2]?.value ?? 0).toFixed(2)} EUR`,
    ]);
  });

  test('the parts list has every part with its pieces', () => {
    const root = place();
    renderParts(root, open, 'EUR');
    expect(
      cellsOf(root)
        .slice(1)
        .map((row) => [row[1], row[2]]),
    ).toEqual(open.parts.map((use) => [use.name, String(use.count)]));
  });

  test('temperatures name the point where each part is hottest', () => {
    const root = place();
    const point = open.points[0];
    if (point === undefined) throw new Error('no points');
    renderTemperatures(root, open, point, RAIL.ambient);
    for (const row of cellsOf(root).slice(1)) expect(row[3]).toMatch(/V, \d+ %$/);
  });

  test('a waveform starts and ends on the same value: the state is periodic', () => {
    const root = place();
    const point = open.points[0];
    if (point === undefined) throw new Error('no points');
    renderWaveforms(root, point);
    const paths = Array.from(
      root.node()?.querySelectorAll('path.line') ?? [],
      (path) => path.getAttribute('d') ?? '',
    ).filter((d) => d.includes('L'));
    expect(paths).toHaveLength(point.traces.length);
    for (const d of paths) {
      const heights = d
        .slice(1)
        .split('L')
        .map((pair) => pair.split(',')[1]);
      expect(heights[0]).toBe(heights.at(-1));
    }
  });
});

describe('side by side', () => {
  test('differences come first and alike lines stand apart, none lost', () => {
    const root = place();
    renderCompare(root, bench.dataset, scene.pinned);
    const tables = Array.from(root.node()?.querySelectorAll('table') ?? []);
    const rows = tables.map((table) =>
      Array.from(table.querySelectorAll('tbody tr'), (row) =>
        Array.from(row.children, (cell) => cell.textContent?.replace('best', '') ?? ''),
      ).filter((cells) => cells.length > 1),
    );
    for (const [, ...cells] of rows[0] ?? []) expect(new Set(cells).size, 'a difference').toBeGreaterThan(1);
    for (const [, ...cells] of rows[1] ?? []) expect(new Set(cells).size, 'alike').toBe(1);
    const slots = new Set(scene.pinned.flatMap((i) => Object.keys(bench.dataset.designs[i]?.parts ?? {})));
    expect(rows.flat()).toHaveLength(bench.dataset.quantities.length + slots.size + 1);
  });

  test('with nothing pinned it says how to pin', () => {
    const root = place();
    renderCompare(root, bench.dataset, []);
    expect(root.text()).toContain('Pin designs');
  });
});

function spokenLike(name: string): string {
  const words = name
    .replace(/([a-z])([A-Z])/g, '$1 $2')
    .replaceAll('-', ' ')
    .toLowerCase();
  return words.charAt(0).toUpperCase() + words.slice(1);
}
