/** Quantities as an engineer writes them, and one common prefix for a whole axis. */

import { formatQuantity } from '../model/quantity/format.ts';

const PREFIXES: readonly (readonly [string, number])[] = [
  ['G', 1e9],
  ['M', 1e6],
  ['k', 1e3],
  ['', 1],
  ['m', 1e-3],
  ['µ', 1e-6],
  ['n', 1e-9],
  ['p', 1e-12],
];
const PREFIXED = new Set(['V', 'A', 'Ω', 'H', 'F', 'Hz', 's', 'W', 'J', 'C']);
const POWERS: Readonly<Record<string, readonly (readonly [string, number])[]>> = {
  m: [
    ['m', 1],
    ['mm', 1e-3],
  ],
  'm²': [
    ['m²', 1],
    ['cm²', 1e-4],
    ['mm²', 1e-6],
  ],
  'm³': [
    ['L', 1e-3],
    ['cm³', 1e-6],
    ['mm³', 1e-9],
  ],
  kg: [
    ['kg', 1],
    ['g', 1e-3],
  ],
};

/** How the numbers of one axis or column are written: shown = (value − offset) / factor. */
export interface AxisUnit {
  readonly label: string;
  readonly factor: number;
  readonly offset: number;
}

/** The unit with the prefix that suits values up to `largest` (SI). A fraction (no unit) is shown in percent if asked. */
export function axisUnit(unit: string, largest: number): AxisUnit {
  const size = Math.abs(largest);
  if (unit === 'K') return { label: '°C', factor: 1, offset: 273.15 };
  const powers = POWERS[unit];
  if (powers !== undefined) return pick(powers, size, '');
  if (PREFIXED.has(unit)) return pick(PREFIXES, size, unit);
  return { label: unit, factor: 1, offset: 0 };
}

function pick(steps: readonly (readonly [string, number])[], size: number, unit: string): AxisUnit {
  const last = steps[steps.length - 1] ?? ['', 1];
  const [prefix, factor] = steps.find(([, step]) => size >= step * 0.9995) ?? (size === 0 ? ['', 1] : last);
  if (size === 0 && unit === '') return { label: last[0], factor: last[1], offset: 0 };
  return { label: `${prefix}${unit}`, factor, offset: 0 };
}

/** A difference of two quantities: like `show`, but kelvin stay kelvin; with a sign. */
export function showDifference(value: number, unit: string): string {
  const text = unit === 'K' ? `${digits(Math.abs(value))}\u00a0K` : show(Math.abs(value), unit);
  return `${value < 0 ? '−' : '+'}${text}`;
}

/** `value` as the model writes it for people, to three digits: `4.7 µH`, `55 °C`, `3.21 EUR`. Not a number: `none`. */
export function show(value: number, unit: string): string {
  if (!Number.isFinite(value)) return 'none';
  const isMoney = /^[A-Z]{3}$/.test(unit);
  const rounded = unit === 'K' ? Math.round((value - 273.15) * 10) / 10 + 273.15 : isMoney ? value : threeDigits(value);
  return minus(formatQuantity(rounded, unit).replace(' ', '\u00a0'));
}

/** Three digits; whole numbers of four stay whole. */
function threeDigits(value: number): number {
  return Number.isInteger(value) && Math.abs(value) < 1e4 ? value : Number(value.toPrecision(3));
}

/** A fraction in percent. */
export function percent(fraction: number, places = 1): string {
  return Number.isFinite(fraction) ? `${minus((fraction * 100).toFixed(places))}\u00a0%` : 'none';
}

/** A margin as a fraction, in percent: what would round to nothing says so. */
export function marginPercent(fraction: number): string {
  if (fraction > 0 && fraction < 0.0005) return 'under\u00a00.1\u00a0%';
  return percent(fraction);
}

/** `50 % load`; where power flows back, `50 % load in reverse`. */
export function loadWords(fraction: number): string {
  return fraction < 0 ? `${percent(-fraction, 0)} load in reverse` : `${percent(fraction, 0)} load`;
}

/** Three significant digits without exponent; whole numbers of at most four digits stay whole. */
export function digits(value: number): string {
  if (value === 0) return '0';
  const size = Math.abs(value);
  if (Number.isInteger(value) && size < 1e4) return minus(String(value));
  if (size >= 1000) return minus(value.toFixed(0));
  const places = Math.max(0, 2 - Math.floor(Math.log10(size * 1.0000001)));
  return minus(value.toFixed(Math.min(places, 12)));
}

function minus(text: string): string {
  return text.replace('-', '−');
}
