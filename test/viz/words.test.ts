/** Units, labels and marks: what a reader sees of a number or a name. */
import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { GENE } from '../../model/genes.ts';
import { ARCHITECTURES, OBJECTIVES } from '../../model/index.ts';
import { LOSS_SLOTS } from '../../model/ledger.ts';
import { limitsOf } from '../../model/limits/list.ts';
import type { Rail } from '../../model/rail/rail.ts';
import {
  ARCHITECTURE_WORDS,
  counted,
  EFFECTS,
  inWords,
  LIMITS,
  listed,
  OBJECTIVE_WORDS,
  PARTS,
  spoken,
  spokenLimit,
  thousands,
  titled,
  VARIABLES,
} from '../../viz/labels.ts';
import { markPath } from '../../viz/marks/mark.ts';
import { axisUnit, digits, percent, show, showDifference } from '../../viz/units.ts';
import { isLeast } from '../../viz/views/limits.ts';
import { duration } from '../../viz/views/trust.ts';
import { RAIL } from './fixture.ts';

/** Words as a person writes them: no capital inside, no underscore. */
const WORDS = /^[a-z0-9 ,.’%\u00a0-]+$/;

const plain = (text: string) => text.replaceAll('\u00a0', ' ').replaceAll('\u202f', ' ');

describe('quantities', () => {
  test.each([
    [4.7e-6, 'H', '4.7 µH'],
    [500e3, 'Hz', '500 kHz'],
    [328.15, 'K', '55 °C'],
    [1.46e-6, 'm³', '1.46 cm³'],
    [0.0123456, 'V', '12.3 mV'],
    [2.345, 'EUR', '2.35 EUR'],
    [3, '', '3'],
    [1440, '', '1440'],
    [-0.5, 'A', '−500 mA'],
    [Number.NaN, 'W', 'none'],
    [Number.POSITIVE_INFINITY, 'W', 'none'],
  ])('%d %s is shown as %s', (value, unit, text) => {
    expect(plain(show(value, unit))).toBe(text);
  });

  test('a difference of temperatures stays in kelvin and carries its sign', () => {
    expect(plain(showDifference(-12.5, 'K'))).toBe('−12.5 K');
    expect(plain(showDifference(0.004, 'V'))).toBe('+4 mV');
  });

  test('an axis takes the one unit that suits its largest value', () => {
    expect(axisUnit('W', 0.6)).toEqual({ label: 'mW', factor: 1e-3, offset: 0 });
    expect(axisUnit('m³', 4e-6)).toEqual({ label: 'cm³', factor: 1e-6, offset: 0 });
    expect(axisUnit('K', 400)).toEqual({ label: '°C', factor: 1, offset: 273.15 });
    expect(axisUnit('EUR', 5)).toEqual({ label: 'EUR', factor: 1, offset: 0 });
  });

  test('three digits, never an exponent', () => {
    expect([0.000123456, 12.3456, 999.6, 123456, 0].map(digits)).toEqual(['0.000123', '12.3', '1000', '123456', '0']);
    expect(plain(percent(0.0375))).toBe('3.8 %');
  });
});

describe('names', () => {
  test('camel case and hyphens become words', () => {
    expect(spoken('highSwitch')).toBe('high switch');
    expect(titled('output-ripple')).toBe('Output ripple');
    expect(listed(['a', 'b', 'c'])).toBe('a, b and c');
    expect(counted(1, 'design')).toBe('1 design');
    expect(plain(counted(2041, 'design'))).toBe('2 041 designs');
    expect(plain(thousands(1234567))).toBe('1 234 567');
  });

  test.each([
    [61.2, '61.2 s'],
    [720, '12 min'],
    [30000, '8 h 20 min'],
  ])('%d seconds read as %s', (seconds, text) => {
    expect(plain(duration(seconds))).toBe(text);
  });
});

/** A sheet that has every limit there is. */
const EVERYTHING: Rail = {
  ...RAIL,
  input: { ...RAIL.input, ripple: 0.1, sourceRipple: 0.01 },
  search: { ...RAIL.search, architectures: ARCHITECTURES, woundChokes: true },
  limits: {
    ...RAIL.limits,
    boardArea: 1e-3,
    mass: 0.1,
    cost: 10,
    noLoadPower: 0.1,
    efficiency: [
      { load: 1, atLeast: 0.9 },
      { load: -0.5, atLeast: 0.9 },
    ],
  },
};

/** Slots that the parts list fills, read from its source. */
function partSlots(): string[] {
  const text = readFileSync(new URL('../../model/parts-list.ts', import.meta.url), 'utf8');
  return [...text.matchAll(/put\(list, '(\w+)'/g)].map(([, slot = '']) => slot);
}

describe('every name that the model can emit has words of its own', () => {
  test.each(LOSS_SLOTS)('loss: %s, %s', (part, effect) => {
    expect(Object.keys(PARTS)).toContain(part);
    expect(Object.keys(EFFECTS)).toContain(effect);
  });

  const limits = limitsOf(EVERYTHING);

  test('limits, with whether more or less is better', () => {
    expect(limits.length).toBeGreaterThan(42);
    for (const { name, sense } of limits) {
      if (!name.startsWith('efficiency@')) expect(Object.keys(LIMITS)).toContain(name);
      expect(spokenLimit(name)).toMatch(WORDS);
      expect(isLeast(name), name).toBe(sense === 'least');
    }
  });

  test('parts, genes, objectives, architectures', () => {
    expect(partSlots().length).toBeGreaterThan(12);
    for (const slot of partSlots()) expect(Object.keys(PARTS)).toContain(slot);
    for (const gene of Object.keys(GENE)) expect([...Object.keys(VARIABLES), ...Object.keys(PARTS)]).toContain(gene);
    for (const name of OBJECTIVES) expect(Object.keys(OBJECTIVE_WORDS)).toContain(name);
    for (const name of ARCHITECTURES) expect(Object.keys(ARCHITECTURE_WORDS)).toContain(name);
    for (const words of [PARTS, EFFECTS, VARIABLES, LIMITS, OBJECTIVE_WORDS, ARCHITECTURE_WORDS])
      for (const name of Object.keys(words)) expect(spoken(name)).toMatch(WORDS);
  });

  test('an efficiency at a load in reverse says so', () => {
    expect(plain(spokenLimit('efficiency@-50%'))).toBe('efficiency at 50 % load in reverse');
    expect(plain(spokenLimit('efficiency@2.5%'))).toBe('efficiency at 2.5 % load');
  });

  test('a sentence of the model is put into words', () => {
    expect(plain(inWords('missed most often: avoidedBands by 40 %, efficiency@100% by 3 %'))).toBe(
      'missed most often: clearance from avoided bands by 40 %, efficiency at 100 % load by 3 %',
    );
  });
});

describe('marks', () => {
  test('every architecture and phase count has a mark of its own', () => {
    const architectures = [
      'buck-synchronous',
      'buck-diode',
      'two-switch-forward',
      'half-bridge-centre-tap',
      'half-bridge-current-doubler',
      'full-bridge-centre-tap',
      'full-bridge-current-doubler',
    ];
    const all = architectures.flatMap((architecture) =>
      [1, 2, 3, 4, 5, 6, 7, 8].map((phases) => markPath({ architecture, phases }, 5)),
    );
    expect(new Set(all).size).toBe(56);
  });
});
