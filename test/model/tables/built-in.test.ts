import { readdirSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { BUILT_IN_TABLES } from '../../../model/parts/built-in.ts';
import { tableProfile } from '../../../model/parts/profile.ts';
import { PART_KINDS } from '../../../model/parts/schemas.ts';
import { builtIn, tableText } from '../parts/tables.ts';

describe('the built-in tables', () => {
  test('every file of the folder is a table of a kind, and each says that its parts are invented', () => {
    const files = readdirSync(new URL('../../../model/tables', import.meta.url)).sort();
    expect(BUILT_IN_TABLES.map(({ file }) => file).sort()).toEqual(files);
    for (const kind of PART_KINDS)
      expect(tableText(kind).split('\n').slice(0, 2).join(' ')).toMatch(/invented|no maker/i);
  });

  test('they hold what was asked of them', () => {
    const switches = builtIn('switches');
    const silicon = switches.filter((row) => row.technology === 'si');
    const classes = new Set(silicon.map((row) => row.voltageRating));
    for (const volts of [25, 30, 40, 60, 80, 100, 120, 150]) expect(classes).toContain(volts);
    expect(silicon.filter((row) => row.voltageRating <= 150).length).toBeGreaterThanOrEqual(48);
    expect(
      switches.filter((row) => row.technology === 'gan' && row.voltageRating <= 200).length,
    ).toBeGreaterThanOrEqual(12);
    expect(switches.filter((row) => row.voltageRating >= 200).length).toBeGreaterThanOrEqual(12);
    expect(builtIn('diodes').length).toBeGreaterThanOrEqual(16);
    expect(builtIn('inductors').length).toBeGreaterThanOrEqual(120);
    expect(new Set(builtIn('inductors').map((row) => row.series)).size).toBeGreaterThanOrEqual(12);
    expect(builtIn('ceramics').length).toBeGreaterThanOrEqual(80);
    expect(builtIn('bulks').length).toBeGreaterThanOrEqual(40);
    expect(builtIn('controllers').length).toBeGreaterThanOrEqual(16);
  });

  test.each(PART_KINDS)('no row of %s is far off the trends of the trade', (kind) => {
    expect(tableProfile(kind, builtIn(kind)).outliers).toEqual([]);
  });

  test('a price never rises with the quantity', () => {
    for (const { name, prices } of PART_KINDS.flatMap((kind) => builtIn(kind)).filter((row) => 'prices' in row)) {
      const values = prices.map(({ price }) => price);
      expect(values, name).toEqual([...values].sort((a, b) => b - a));
    }
  });
});

describe('preferred numbers', () => {
  // IEC 60063:2015, E12 series.
  const E12 = [1.0, 1.2, 1.5, 1.8, 2.2, 2.7, 3.3, 3.9, 4.7, 5.6, 6.8, 8.2];
  const mantissa = (value: number): number => Number(value.toExponential(3).split('e')[0]);

  test.each(['inductors', 'ceramics', 'bulks'] as const)('values of %s are of IEC 60063, E12', (kind) => {
    const values =
      kind === 'inductors' ? builtIn(kind).map((row) => row.inductance) : builtIn(kind).map((row) => row.capacitance);
    for (const value of values) expect(E12, String(value)).toContain(mantissa(value));
  });
});

describe('bias curves', () => {
  // Capacitance over nominal at 0, 25, 50, 75, 100 % of rated voltage, small signal, 25 °C; per-part curves collected in the
  // public repository CDFER/Ceramic-Capacitor-Derating (MIT, 2025).
  const measured: readonly (readonly [string, readonly number[]])[] = [
    ['MC-X7R-1206-4.7u-50', [0.962, 0.819, 0.539, 0.349, 0.244]],
    ['MC-X5R-1206-10u-50', [0.715, 0.351, 0.175, 0.115, 0.087]],
    ['MC-X5R-1206-22u-25', [0.815, 0.462, 0.223, 0.134, 0.094]],
    ['MC-X5R-1206-22u-10', [0.798, 0.714, 0.532, 0.384, 0.284]],
    ['MC-X5R-1206-100u-6.3', [0.823, 0.7, 0.498, 0.346, 0.25]],
    ['MC-X5R-0805-10u-25', [0.59, 0.324, 0.164, 0.109, 0.08]],
    ['MC-X5R-0805-4.7u-25', [0.677, 0.396, 0.207, 0.135, 0.101]],
    ['MC-X5R-0805-47u-6.3', [0.715, 0.567, 0.354, 0.23, 0.164]],
    ['MC-X5R-0603-2.2u-16', [0.86, 0.601, 0.347, 0.217, 0.149]],
    ['MC-X5R-0603-10u-10', [0.818, 0.564, 0.312, 0.186, 0.123]],
    ['MC-X5R-0402-1u-25', [0.752, 0.413, 0.211, 0.14, 0.106]],
    ['MC-X5R-0402-10u-6.3', [0.735, 0.568, 0.325, 0.206, 0.147]],
  ];
  const share = (name: string, fraction: number): number => {
    const row = builtIn('ceramics').find((candidate) => candidate.name === name);
    if (row === undefined) throw new Error(`no part ${name}`);
    const over = (fraction * row.voltageRating) / row.halvingVoltage;
    return row.smallSignalFactor / (1 + over ** row.biasExponent);
  };

  test.each(measured)('%s lies within 0.15 of the measured curve of such a part', (name, curve) => {
    curve.forEach((value, i) => {
      expect(Math.abs(share(name, i / 4) - value), `${25 * i} %`).toBeLessThanOrEqual(0.15);
    });
  });

  // Band of the twenty measured X5R parts: 0.126 to 0.532 at half the rated voltage, 0.066 to 0.284 at all of it.
  test('such X5R parts lie in the measured band at half the rated voltage, and at all of it within 0.01', () => {
    for (const [name] of measured.filter(([part]) => part.includes('X5R'))) {
      expect(share(name, 0.5), name).toBeGreaterThanOrEqual(0.126);
      expect(share(name, 0.5), name).toBeLessThanOrEqual(0.532);
      expect(share(name, 1), name).toBeGreaterThanOrEqual(0.066 - 0.01);
      expect(share(name, 1), name).toBeLessThanOrEqual(0.284 + 0.01);
    }
  });
});

describe('trends within the tables', () => {
  test('in a voltage class of silicon, less resistance costs more gate charge and more money', () => {
    for (const prefix of ['SW-025', 'SW-060', 'SW-100', 'SW-150', 'SJ-600']) {
      const rows = builtIn('switches')
        .filter((row) => row.name.startsWith(prefix))
        .sort((a, b) => a.onResistance - b.onResistance);
      expect(rows.length, prefix).toBeGreaterThanOrEqual(4);
      for (let i = 1; i < rows.length; i++) {
        expect(rows[i]?.gateCharge).toBeLessThan(rows[i - 1]?.gateCharge ?? 0);
        expect(rows[i]?.prices[0]?.price).toBeLessThan(rows[i - 1]?.prices[0]?.price ?? 0);
      }
    }
  });

  test('in a series, more inductance has more resistance and less saturation current', () => {
    const series = new Set(builtIn('inductors').map((row) => row.series));
    for (const name of series) {
      const rows = builtIn('inductors')
        .filter((row) => row.series === name)
        .sort((a, b) => a.inductance - b.inductance);
      expect(new Set(rows.map((row) => `${row.length} ${row.width} ${row.height}`)).size, name).toBe(1);
      const first = rows[0];
      const last = rows.at(-1);
      expect(last?.dcResistance, name).toBeGreaterThan(first?.dcResistance ?? 0);
      expect(last?.saturationCurrent, name).toBeLessThan(first?.saturationCurrent ?? 0);
    }
  });

  test('every controller of a stage that the sheets use has switches that its drive voltage fits', () => {
    for (const controller of builtIn('controllers')) {
      const fitting = builtIn('switches').filter(
        (row) => row.driveVoltage <= controller.driveVoltage && row.gateRating >= controller.driveVoltage,
      );
      expect(fitting.length, controller.name).toBeGreaterThan(3);
    }
  });
});
