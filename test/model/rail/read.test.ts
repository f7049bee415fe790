import { describe, expect, test } from 'vitest';
import { canonicalRail } from '../../../model/rail/canonical.ts';
import { DEFAULTS } from '../../../model/rail/defaults.ts';
import { SHIPPED_RAILS } from '../../../model/rail/shipped.ts';
import { starterSheet } from '../../../model/rail/starter.ts';
import { railOf, SOUND, shipped } from './sheets.ts';

describe('the shipped sheets say what their requirements say', () => {
  test('buoy-sensors', () => {
    expect(railOf(shipped('buoy-sensors.yaml'))).toMatchObject({
      name: 'buoy-sensors',
      input: { minimum: 10.5, nominal: 12.8, maximum: 15 },
      output: { minimum: 3.3, nominal: 3.3, maximum: 3.3, current: 8, ripple: 0.02 },
      step: { current: 4, slew: 5e6, deviation: 0.1 },
      ambient: 318.15,
      airSpeed: 0,
      coolingArea: 25e-4,
      limits: { height: 8e-3, volume: 8e-6, efficiency: [{ load: 1, atLeast: 0.92 }] },
      avoid: [{ from: 485e3, to: 525e3, harmonics: 1 }],
      search: { frequency: { minimum: 30e3, maximum: 5e6 } },
    });
    expect(railOf(shipped('buoy-sensors.yaml')).profile).toContainEqual({ fraction: 0.02, share: 0.4 });
  });

  test('buoy-processor', () => {
    expect(railOf(shipped('buoy-processor.yaml'))).toMatchObject({
      input: { minimum: 40, nominal: 48, maximum: 57 },
      output: { nominal: 1, current: 60, ripple: 0.01 },
      step: { current: 20, slew: 100e6, deviation: 0.045 },
      ambient: 313.15,
      airSpeed: 2,
      limits: { height: 0.01, volume: 40e-6, efficiency: [{ load: 1, atLeast: 0.85 }] },
    });
  });

  test('hut-link flows both ways', () => {
    expect(railOf(shipped('hut-link.yaml'))).toMatchObject({
      input: { minimum: 42, nominal: 48, maximum: 56, ripple: 0.2, takesPower: true },
      output: { minimum: 10.5, nominal: 12.8, maximum: 14.6, current: 60, ripple: 0.1, battery: true },
      profile: [
        { fraction: 1, share: 0.1 },
        { fraction: 0.5, share: 0.3 },
        { fraction: 0.1, share: 0.3 },
        { fraction: -0.5, share: 0.2 },
        { fraction: -1, share: 0.1 },
      ],
      ambient: 308.15,
      limits: {
        height: 0.045,
        volume: 1e-3,
        efficiency: [
          { load: 0.5, atLeast: 0.96 },
          { load: -0.5, atLeast: 0.96 },
        ],
      },
    });
  });

  test('hut-shelf', () => {
    expect(railOf(shipped('hut-shelf.yaml'))).toMatchObject({
      input: { minimum: 360, nominal: 400, maximum: 420 },
      output: { nominal: 12, current: 40, ripple: 0.12 },
      step: { current: 20, slew: 1e6, deviation: 0.4 },
      limits: { height: 0.04, volume: 0.6e-3, efficiency: [{ load: 1, atLeast: 0.93 }] },
    });
  });

  test('buoy-winch', () => {
    expect(railOf(shipped('buoy-winch.yaml'))).toMatchObject({
      input: { minimum: 18, nominal: 24, maximum: 32 },
      output: { nominal: 5, current: 12, ripple: 0.005 },
      step: { current: 6, slew: 10e6, deviation: 0.15 },
      airSpeed: 1,
      coolingArea: 30e-4,
      limits: { height: 3.5e-3, volume: 6e-6, efficiency: [{ load: 1, atLeast: 0.92 }] },
      avoid: [{ from: 530e3, to: 1710e3 }],
    });
  });

  test.each(SHIPPED_RAILS)('the profile of %s fills all of the time', (file) => {
    const sum = railOf(shipped(file)).profile.reduce((total, { share }) => total + share, 0);
    expect(sum).toBeCloseTo(1, 12);
  });
});

describe('ready-made profiles carry their published weights', () => {
  const profile = (name: string) => railOf(`${SOUND}load-profile: ${name}\n`).profile;

  test('CEC weights: 10 % 0.04, 20 % 0.05, 30 % 0.12, 50 % 0.21, 75 % 0.53, 100 % 0.05', () => {
    expect(profile('cec').map(({ fraction, share }) => [fraction, share])).toEqual([
      [0.1, 0.04],
      [0.2, 0.05],
      [0.3, 0.12],
      [0.5, 0.21],
      [0.75, 0.53],
      [1, 0.05],
    ]);
  });

  test('European weights: 5 % 0.03, 10 % 0.06, 20 % 0.13, 30 % 0.10, 50 % 0.48, 100 % 0.20', () => {
    expect(profile('european').map(({ fraction, share }) => [fraction, share])).toEqual([
      [0.05, 0.03],
      [0.1, 0.06],
      [0.2, 0.13],
      [0.3, 0.1],
      [0.5, 0.48],
      [1, 0.2],
    ]);
  });

  // Efficiencies of one invented curve at 5, 10, 20, 25, 30, 50, 75, 100 % load; sums computed by hand from the printed weights.
  test.each([
    ['european', 0.9436],
    ['cec', 0.95116],
    ['average-25-50-75-100', 0.9515],
  ])('%s weighs one efficiency curve to %d', (name, weighted) => {
    const curve: Readonly<Record<string, number>> = {
      0.05: 0.86,
      0.1: 0.9,
      0.2: 0.93,
      0.25: 0.944,
      0.3: 0.945,
      0.5: 0.955,
      0.75: 0.957,
      1: 0.95,
    };
    const sum = profile(name).reduce(
      (total, { fraction, share }) => total + share * (curve[fraction] ?? Number.NaN),
      0,
    );
    expect(sum).toBeCloseTo(weighted, 9);
  });
});

describe('reading', () => {
  test('the starter sheet reads clean and its commented defaults are the defaults', () => {
    railOf(starterSheet());
    const opened = starterSheet().replace(/^# (tolerances|derating|advanced): /gm, '$1: ');
    expect(canonicalRail(railOf(opened))).toBe(canonicalRail(railOf(starterSheet())));
  });

  test('a sheet with the least it must hold gets every default', () => {
    expect(railOf(SOUND)).toMatchObject({
      currency: 'EUR',
      quantity: 1000,
      airSpeed: 0,
      objectives: ['loss', 'volume', 'cost'],
    });
    expect(new Set(DEFAULTS.map(({ key }) => key)).size).toBe(DEFAULTS.length);
  });

  test('a default written out changes nothing', () => {
    const written = SOUND.replace(
      'rail: test\n',
      'rail: test\ncurrency: EUR\nquantity: 1000\nobjectives: [loss, volume, cost]\navoid: []\n',
    );
    expect(canonicalRail(railOf(written))).toBe(canonicalRail(railOf(SOUND)));
  });

  test('the canonical form does not depend on the order of keys or the spelling of units', () => {
    const [name, ...rest] = SOUND.split('input:');
    const turned = `output:${rest.join('input:').split('output:')[1]}input:${rest.join('input:').split('output:')[0]}${name}`;
    const spelt = turned.replace('30 mV', '0.03 V').replace('24 V', '24000 mV');
    expect(canonicalRail(railOf(spelt))).toBe(canonicalRail(railOf(SOUND)));
  });

  test('sections left empty, a byte order mark and Windows line ends do not matter', () => {
    const text = `\uFEFF${SOUND}limits:\navoid:\nsearch:\nadvanced:\n`.replaceAll('\n', '\r\n');
    expect(canonicalRail(railOf(text))).toBe(canonicalRail(railOf(SOUND)));
  });

  test('shares that miss 100 % by rounding are scaled', () => {
    const text = `${SOUND}load-profile:\n  - {load: 10 %, share: 33.3 %}\n  - {load: 50 %, share: 33.3 %}\n  - {load: 100 %, share: 33.3 %}\n`;
    expect(railOf(text).profile.map(({ share }) => share)).toEqual(
      [1 / 3, 1 / 3, 1 / 3].map((share) => expect.closeTo(share, 12)),
    );
  });

  test('a cost limit may name the currency of the sheet', () => {
    expect(railOf(`${SOUND}limits: {cost: 12.5 EUR}\n`).limits.cost).toBe(12.5);
    expect(railOf(`${SOUND}limits: {cost: 12.5}\n`).limits.cost).toBe(12.5);
  });
});
