import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  editDistance,
  engineeringText,
  formatDifference,
  formatQuantity,
  fromEngineering,
  nearest,
  readDecimal,
  shiftDecimal,
  toEngineering,
} from '../../../model/quantity/index.ts';

describe('formatQuantity writes four digits and an engineering prefix', () => {
  test.each([
    [4.7e-6, 'H', '4.7 µH'],
    [500e3, 'Hz', '500 kHz'],
    [328.15, 'K', '55 °C'],
    [8e-6, 'm³', '8 cm³'],
    [1e-3, 'm³', '1 L'],
    [25e-4, 'm²', '25 cm²'],
    [0.03, 'kg', '30 g'],
    [5e6, 'A/s', '5 A/µs'],
    [2.8e-3, 'Ω', '2.8 mΩ'],
    [-0.0123, 'V', '-12.3 mV'],
    [40.6e-6, 'V', '40.6 µV'],
    [0, 'W', '0 W'],
    [0.99996e-3, 'H', '1 mH'],
    [2.345, 'EUR', '2.35 EUR'],
    [0.0157, 'EUR', '0.0157 EUR'],
    [0.123456, '', '0.1235'],
    [2.2, 'K/W', '2.2 K/W'],
    [3e-13, 'F', '0.3 pF'],
  ])('%d %s is %s', (value, unit, text) => {
    expect(formatQuantity(value, unit)).toBe(text);
  });

  test('a difference of temperatures stays in kelvin', () => {
    expect(formatDifference(12.5, 'K')).toBe('12.5 K');
  });

  test('what cannot be a number is said as it is', () => {
    expect(formatQuantity(Number.NaN, 'V')).toBe('NaN V');
    expect(formatQuantity(Number.POSITIVE_INFINITY, '')).toBe('Infinity');
  });
});

describe('engineering columns are exact', () => {
  test.each([
    ['H', 'µH', -6],
    ['F', 'µF', -6],
    ['Hz', 'kHz', 3],
    ['Ω', 'mΩ', -3],
    ['m³', 'cm³', -6],
    ['V', 'V', 0],
    ['EUR', 'EUR', 0],
  ])('%s stands in %s', (si, unit, exponent) => {
    expect(toEngineering(si)).toMatchObject({ unit, exponent, offset: 0 });
  });

  test('shortest digits: 4.7e-6 H is 4.7 and not 4.699999', () => {
    expect(engineeringText(4.7e-6, 'H')).toBe('4.7');
    expect(engineeringText(3.3e-6, 'H')).toBe('3.3');
    expect(engineeringText(318.15, 'K')).toBe('45');
  });

  test('value → text → value is the same double, for every finite double', () => {
    const units = ['H', 'F', 'Hz', 'Ω', 's', 'm', 'm²', 'm³', 'kg', 'J', 'C', 'A/s', 'V', 'EUR', ''];
    const double = fc.double({ noNaN: true, noDefaultInfinity: true, min: -1e290, max: 1e290 });
    fc.assert(
      fc.property(double, fc.constantFrom(...units), (value, unit) => {
        fc.pre(value === 0 || Math.abs(value) > 1e-290);
        expect(fromEngineering(engineeringText(value, unit), unit)).toBe(value === 0 ? 0 : value);
      }),
      { numRuns: 3000 },
    );
  });

  test('temperatures too, wherever parts work', () => {
    fc.assert(
      fc.property(fc.double({ min: 150, max: 1000, noNaN: true }), (kelvin) => {
        expect(fromEngineering(engineeringText(kelvin, 'K'), 'K')).toBe(kelvin);
      }),
      { numRuns: 2000 },
    );
  });

  test('a decimal shifts without rounding', () => {
    expect(shiftDecimal(1.2345e-7, 9)).toBe('123.45');
    expect(readDecimal('123.45', -9)).toBe(1.2345e-7);
    expect(readDecimal('12 ')).toBeNaN();
    expect(readDecimal('0x10')).toBeNaN();
  });
});

describe('the nearest word', () => {
  // Damerau 1964: a swap of neighbours is one error, as are one letter too many, too few or wrong.
  test.each([
    ['rial', 'rail', 1],
    ['kitten', 'sitting', 3],
    ['', 'abc', 3],
    ['same', 'same', 0],
  ])('%s and %s are %d edits apart', (a, b, edits) => {
    expect(editDistance(a, b)).toBe(edits);
    expect(editDistance(b, a)).toBe(edits);
  });

  test('nothing near gives nothing', () => {
    expect(nearest('voltage', ['current', 'ripple'])).toBeUndefined();
    expect(nearest('votlage', ['voltage', 'ripple'])).toBe('voltage');
    expect(nearest('x'.repeat(100000), ['voltage'])).toBeUndefined();
  });
});
