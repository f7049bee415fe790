import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  DIMENSIONS,
  type Dimension,
  engineeringText,
  parseQuantity,
  toEngineering,
} from '../../../model/quantity/index.ts';

const value = (text: string, dimension: Dimension): number => {
  const reading = parseQuantity(text, dimension);
  if (!reading.ok) throw new Error(`${text}: found ${reading.found}`);
  return reading.value;
};

describe('a quantity is read as people write it', () => {
  // SI prefixes: BIPM, The International System of Units, 9th edition, table 7; litre: table 8.
  const written: readonly (readonly [string, Dimension, number])[] = [
    ['48 V', 'voltage', 48],
    ['48V', 'voltage', 48],
    ['10 mV', 'voltage', 0.01],
    ['500 kHz', 'frequency', 500e3],
    ['4.7 \u00B5H', 'inductance', 4.7e-6],
    ['4.7 \u03BCH', 'inductance', 4.7e-6],
    ['4.7 uH', 'inductance', 4.7e-6],
    ['3.3 uH', 'inductance', 3.3e-6],
    ['22 µF', 'capacitance', 22e-6],
    ['2 m\u03A9', 'resistance', 2e-3],
    ['2 m\u2126', 'resistance', 2e-3],
    ['2 mohm', 'resistance', 2e-3],
    ['2 mOhm', 'resistance', 2e-3],
    ['2.2 kΩ', 'resistance', 2200],
    ['5 A/us', 'slew', 5e6],
    ['5 A/µs', 'slew', 5e6],
    ['25 cm²', 'area', 25e-4],
    ['25 cm2', 'area', 25e-4],
    ['25 cm^2', 'area', 25e-4],
    ['8 cm³', 'volume', 8e-6],
    ['1.0 L', 'volume', 1e-3],
    ['30 g', 'mass', 0.03],
    ['10 nC', 'charge', 10e-9],
    ['2.2 K/W', 'thermal resistance', 2.2],
    ['0.005 1/K', 'change per kelvin', 0.005],
    ['-1.2 mV/K', 'voltage per kelvin', -1.2e-3],
    ['2000 h', 'time', 7.2e6],
    ['2 m/s', 'speed', 2],
    ['4.8 g/cm³', 'density', 4800],
    ['390 mT', 'flux density', 0.39],
    ['85 %', 'fraction', 0.85],
    ['0.85', 'fraction', 0.85],
    ['\u221250 %', 'fraction', -0.5],
    ['1.5e3 V', 'voltage', 1500],
    ['55\u00A0°C', 'temperature', 328.15],
    ['0 °C', 'temperature', 273.15],
    ['300 K', 'temperature', 300],
  ];
  test.each(written)('%s is %s of %d in SI', (text, dimension, si) => {
    expect(value(text, dimension)).toBe(si);
  });
});

describe('what is not a quantity is refused with an example', () => {
  const wrong: readonly (readonly [string, Dimension, string, string])[] = [
    ['48', 'voltage', '48 without a unit', 'a voltage such as 48 V'],
    ['48 A', 'voltage', '48 A, which is a current', 'a voltage such as 48 V'],
    ['55 C', 'temperature', '55 C, which is a charge', 'a temperature such as 55 °C'],
    ['40 °C', 'temperature difference', '40 °C, which is a temperature', 'a temperature difference such as 40 K'],
    ['2 m', 'resistance', '2 m, which is a length', 'a resistance such as 2.8 mΩ'],
    ['3 %', 'number', '3 %, which is a share', 'a number without a unit such as 3'],
    ['1,5 V', 'voltage', '1,5 V', 'a voltage such as 48 V, with a point and no comma'],
    ['zz', 'length', 'zz', 'a length such as 8 mm'],
    ['12 zz', 'length', '12 zz with an unknown unit', 'a length such as 8 mm'],
    ['1e999 V', 'voltage', '1e999 V, which is beyond any number', 'a voltage such as 48 V'],
    ['Infinity V', 'voltage', 'Infinity V', 'a voltage such as 48 V'],
    ['NaN V', 'voltage', 'NaN V', 'a voltage such as 48 V'],
    ['', 'voltage', 'nothing', 'a voltage such as 48 V'],
    ['1.2.3 V', 'voltage', '1.2.3 V', 'a voltage such as 48 V'],
    ['4 constructor', 'voltage', '4 constructor with an unknown unit', 'a voltage such as 48 V'],
  ];
  test.each(wrong)('%j as %s: found %s', (text, dimension, found, allowed) => {
    expect(parseQuantity(text, dimension)).toMatchObject({ ok: false, found, allowed });
  });

  test('an unknown unit names the nearest known one', () => {
    expect(parseQuantity('500 KHz', 'frequency')).toMatchObject({ nearest: 'kHz' });
    expect(parseQuantity('4.7 uh', 'inductance')).toMatchObject({ ok: false });
  });

  test('every dimension reads its own example', () => {
    for (const [name, { example }] of Object.entries(DIMENSIONS)) {
      expect(parseQuantity(example, name as Dimension), example).toMatchObject({ ok: true });
    }
  });
});

describe('reading never throws and inverts writing', () => {
  test('any text is read or refused', () => {
    const names = Object.keys(DIMENSIONS) as Dimension[];
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 200 }), fc.constantFrom(...names), (text, dimension) => {
        const reading = parseQuantity(text, dimension);
        expect(reading.ok ? Number.isFinite(reading.value) : reading.found.length > 0).toBe(true);
      }),
      { numRuns: 3000 },
    );
  });

  test('a value in its engineering unit reads back to the same double', () => {
    const kinds = (Object.keys(DIMENSIONS) as Dimension[]).filter(
      (name) => name !== 'temperature difference' && DIMENSIONS[name].unit !== '',
    );
    const double = fc.double({ noNaN: true, noDefaultInfinity: true, min: 1e-300, max: 1e300 });
    fc.assert(
      fc.property(double, fc.constantFrom(...kinds), (si, dimension) => {
        fc.pre(dimension !== 'temperature' || (si > 150 && si < 1000));
        const { unit } = DIMENSIONS[dimension];
        expect(value(`${engineeringText(si, unit)} ${toEngineering(unit).unit}`, dimension)).toBe(si);
      }),
      { numRuns: 3000 },
    );
  });
});
