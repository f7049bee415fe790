/** Narrowing, first picks, the model's band, prices of limits, what-if moves: the page's own reckoning. */
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { bandOf, indistinguishable } from '../../viz/bands.ts';
import type { FrontDesign } from '../../viz/data.ts';
import { datasetOf } from '../../viz/dataset.ts';
import { kept } from '../../viz/narrow.ts';
import { picksOf } from '../../viz/picks.ts';
import { firstState, sceneOf } from '../../viz/scene.ts';
import { designWords } from '../../viz/views/picture-words.ts';
import { renderPrices } from '../../viz/views/prices.ts';
import { place as placeOn, valueAt } from '../../viz/views/ranges.ts';
import { verdicts } from '../../viz/views/trust.ts';
import { knobValue } from '../../viz/views/whatif.ts';
import { applied, designKnobs, railKnobs } from '../../viz/whatif.ts';
import { fixture, fixtureAssessor, RAIL } from './fixture.ts';
import { bench, open, PROOF } from './gallery.ts';
import { cellsOf, place } from './page-at.ts';

const { data, dataset } = bench;

describe('narrowing', () => {
  const quantities = dataset.quantities.filter((quantity) => quantity.high > quantity.low);
  const range = fc.tuple(
    fc.constantFrom(...quantities),
    fc.double({ min: 0, max: 1, noNaN: true }),
    fc.double({ min: 0, max: 1, noNaN: true }),
  );

  test('what is left lies inside every range, what is out breaks one', () => {
    fc.assert(
      fc.property(fc.array(range, { maxLength: 3 }), (chosen) => {
        const ranges = Object.fromEntries(
          chosen.map(([q, a, b]) => [q.key, [valueAt(q, Math.min(a, b)), valueAt(q, Math.max(a, b))] as const]),
        );
        const left = new Set(kept(dataset, { ranges, hidden: [] }));
        dataset.designs.forEach((_, i) => {
          const isInside = Object.entries(ranges).every(([key, [low, high]]) => {
            const value = dataset.byKey.get(key)?.values[i] ?? Number.NaN;
            return value >= low && value <= high;
          });
          expect(left.has(i)).toBe(isInside);
        });
      }),
    );
  });

  test('the two ends of a thumb’s way are the quantity’s own ends, so that a whole range leaves all', () => {
    for (const quantity of quantities) {
      expect(valueAt(quantity, 0)).toBe(quantity.low);
      expect(valueAt(quantity, 1)).toBe(quantity.high);
      expect(placeOn(quantity, valueAt(quantity, 1))).toBe(1);
    }
  });

  test('a hidden family is out', () => {
    const family = dataset.designs[0]?.family ?? '';
    for (const i of kept(dataset, { ranges: {}, hidden: [family] }))
      expect(dataset.designs[i]?.family).not.toBe(family);
  });
});

describe('first picks', () => {
  const all = dataset.designs.map((_, i) => i);

  test('each is within one per cent of the best in its objective', () => {
    const [, ...best] = picksOf(dataset, all);
    best.forEach((pick, k) => {
      const values = dataset.objectives[k]?.front ?? new Float64Array();
      expect(values[pick.index]).toBeLessThanOrEqual(1.01 * Math.min(...values));
    });
  });

  test('with nothing left there is nothing to pick', () => {
    expect(picksOf(dataset, [])).toEqual([]);
  });
});

describe('the model’s band', () => {
  test('a quarter of a point of efficiency: 100 W out at 4 W loss is 0.26 W either way', () => {
    const rail = {
      ...RAIL,
      output: { ...RAIL.output, nominal: 10, current: 10 },
      profile: [{ fraction: 1, share: 1 }],
    };
    expect(bandOf('loss', 4, rail)).toBeCloseTo(0.26, 12);
    expect(bandOf('inefficiency', 0.04, rail)).toBe(0.0025);
    expect(bandOf('volume', 5e-6, rail)).toBeCloseTo(1e-6, 18);
    expect(bandOf('cost', 3, rail)).toBe(0);
  });

  test('what the model cannot tell apart is near in every objective that carries a band; price does not count', () => {
    const row = (loss: number, volume: number, cost: number) => ({ objectives: [loss, volume, cost] });
    const rows = [row(1, 1e-6, 3), row(1.0001, 1.1e-6, 9), row(1, 1.5e-6, 3), row(2, 1e-6, 3)];
    expect(indistinguishable(['loss', 'volume', 'cost'], rows, row(1, 1e-6, 3), RAIL)).toEqual([0, 1]);
  });
});

describe('what a limit costs', () => {
  const design = (id: string, objectives: number[]): FrontDesign => ({
    id,
    family: 'buck-synchronous ×1',
    genes: {},
    parts: {},
    objectives,
    margins: {},
    worstMargin: 0,
  });
  const front = {
    objectives: [
      { name: 'loss', unit: 'W' },
      { name: 'volume', unit: 'm³' },
    ],
    limits: [{ name: 'outputRipple', unit: 'V' }],
    genes: [],
    designs: [design('a', [2, 1e-6]), design('b', [1.6, 2e-6])],
  };
  const made = { steps: [0.025, 0.1], limits: ['outputRipple', 'height'], evaluations: 3000, level: [] };
  const shownFor = (objectives: number[]) => {
    const root = place();
    const nearMisses = [
      { limit: 'outputRipple', value: 0.022, allowed: 0.02, violation: 0.1, design: design('m', objectives) },
    ];
    renderPrices(root, { front, nearMisses, relaxations: made, rail: RAIL });
    return root;
  };

  test('20 mV of ripple relaxed by a tenth lowers the best loss from 1.6 to 1.5 W; against the design with no more volume it is a quarter', () => {
    expect(cellsOf(shownFor([1.5, 1e-6]))[1]).toEqual([
      'Output ripple',
      '20 mV → 22 mV (+10.0 %)',
      '−6.3 %1.6 W → 1.5 W',
      '·',
      'loss −25.0 % m',
    ]);
  });

  test('it says how limits were relaxed, and which gained nothing', () => {
    const words = shownFor([1.5, 1e-6]).selectAll('.hint').text();
    expect(words).toContain('2 limits were relaxed, one at a time, by 2.5\u00a0and 10\u00a0% of what is allowed');
    expect(words).toContain('3000 evaluations each time');
    expect(words).toContain('Relaxed without any gain: height.');
  });

  test('a miss that beats nothing is no offer, yet it can still be opened', () => {
    const root = shownFor([2.5, 1e-6]);
    expect(root.select('.prices').empty()).toBe(true);
    expect(root.select('[data-act="open"]').attr('data-id')).toBe('m');
  });
});

describe('a near miss', () => {
  const [miss] = data.nearMisses;
  if (miss === undefined) throw new Error('the invented sweep has near misses');
  const scene = sceneOf(bench, { ...firstState(bench), open: miss.design.id, pinned: [miss.design.id] });

  test('opens like any other design and is judged to break its limit', () => {
    expect(scene.own?.ok === true && scene.own.value.limits.filter((limit) => limit.violation > 0).length).toBe(1);
    expect(scene.own?.ok === true && scene.own.value.id).toBe(miss.design.id);
    expect(scene.pinned).toEqual([bench.dataset.index.get(miss.design.id)]);
  });

  test('is in no count, range or pick', () => {
    const row = bench.dataset.index.get(miss.design.id) ?? 0;
    expect(row).toBeGreaterThanOrEqual(bench.dataset.designs.length);
    expect(scene.kept).not.toContain(row);
    expect(scene.kept).toHaveLength(bench.dataset.designs.length);
    expect(picksOf(bench.dataset, scene.kept).map((one) => one.index)).not.toContain(row);
  });
});

describe('remarks', () => {
  const [first, second, third] = data.front.designs.map((design) => design.id);
  const told = datasetOf({
    ...data,
    incumbents: [first ?? '', 'one that is not on the front'],
    proofs: [
      { ...PROOF, id: second ?? '', agrees: false },
      { ...PROOF, id: third ?? '', agrees: true },
    ],
  });

  test('an existing design, a design that simulation contradicts and a near miss say so; nobody else', () => {
    const words = [first, second, third].map((id) => told.remarks.get(told.index.get(id ?? '') ?? -1));
    expect(words).toEqual([['exists already'], ['simulation disagrees'], undefined]);
    expect(told.remarks.size).toBe(2 + told.misses.size);
  });

  test('the hover card carries them', () => {
    expect(designWords(told, told.index.get(first ?? '') ?? -1)).toContain('exists already');
  });
});

describe('what-if', () => {
  const genes = bench.assessor.genes;

  test('a change moves one gene or the rail and nothing else; nonsense changes nothing', () => {
    const { moves, rail } = applied(RAIL, genes, {
      frequency: '120000',
      highSwitch: 'SW-30-5m',
      'rail.ambient': '300',
      nothing: '1',
      inductance: 'much',
    });
    expect(moves).toEqual({ frequency: 120000, highSwitch: 'SW-30-5m' });
    expect(rail).toEqual({ ...RAIL, ambient: 300 });
    expect(applied(RAIL, genes, {}).rail).toBe(RAIL);
  });

  test('input voltages stay in order whichever is moved', () => {
    fc.assert(
      fc.property(
        fc.constantFrom('rail.minimum', 'rail.nominal', 'rail.maximum'),
        fc.double({ min: 9, max: 15, noNaN: true }),
        (name, volts) => {
          const { input } = applied(RAIL, genes, { [name]: String(volts) }).rail;
          expect(input.minimum).toBeLessThanOrEqual(input.nominal);
          expect(input.nominal).toBeLessThanOrEqual(input.maximum);
        },
      ),
    );
  });

  test('each knob covers its gene’s span, three digits at most in between', () => {
    for (const knob of [...designKnobs(bench.assessor.values(open.design), genes), ...railKnobs(RAIL)]) {
      if ('gene' in knob && (knob.gene.options !== undefined || knob.gene.kind === 'whole')) continue;
      const value = knobValue(knob, 137);
      expect(Number(value.toPrecision(3))).toBe(value);
    }
  });

  test('a design beyond the rail’s space comes back as a reason, not as a failure', () => {
    const verdict = fixtureAssessor().assess(open.design, RAIL, { frequency: 9e6 });
    expect(verdict).toEqual({ ok: false, why: 'frequency above the sheet’s range' });
  });
});

describe('trust', () => {
  const data = fixture(20, 20);
  const row = (evaluations: number, hypervolume: number) => ({ evaluations, hypervolume, islands: [] });

  test('a front that still grows is said to grow', () => {
    expect(verdicts(data.run, [row(100, 0.5), row(200, 0.6)], 0.005)[0]).toMatch(/^Still growing: .* 16\.67/);
  });

  test('a front that stands is said to have settled', () => {
    expect(verdicts(data.run, [row(100, 0.6), row(200, 0.601)], 0.005)[0]).toMatch(/^Settled/);
  });

  test('an unfinished run says so first', () => {
    expect(verdicts({ ...data.run, status: 'running' }, [], 0.005)[0]).toContain('still running');
  });
});
