/** Values in the one engineering unit of their kind, for columns of a table: exact both ways. */
import { readDecimal, shiftDecimal } from './decimal.ts';

/** SI value = number × 10^`exponent` + `offset`, the number being in `unit`. */
export interface EngineeringUnit {
  readonly unit: string;
  /** 10^`exponent`, for a reader that need not be exact. */
  readonly factor: number;
  /** Power of ten. */
  readonly exponent: number;
  /** K for temperatures, else 0. */
  readonly offset: number;
}

const UNITS: Readonly<Record<string, readonly [string, number]>> = {
  Ω: ['mΩ', -3],
  H: ['µH', -6],
  F: ['µF', -6],
  Hz: ['kHz', 3],
  s: ['ns', -9],
  m: ['mm', -3],
  'm²': ['cm²', -4],
  'm³': ['cm³', -6],
  kg: ['g', -3],
  J: ['µJ', -6],
  C: ['nC', -9],
  'A/s': ['A/µs', 6],
};
const CELSIUS_ZERO = 273.15;

/** The engineering unit for values in the SI unit `unit`; a unit without one (V, A, W, a currency) stays. */
export function toEngineering(unit: string): EngineeringUnit {
  if (unit === 'K') return { unit: '°C', factor: 1, exponent: 0, offset: CELSIUS_ZERO };
  const known = Object.hasOwn(UNITS, unit) ? UNITS[unit] : undefined;
  const [name, exponent] = known ?? [unit, 0];
  return { unit: name, factor: Number(`1e${exponent}`), exponent, offset: 0 };
}

/** `value` (SI, in `unit`) in the engineering unit, with the shortest digits that `fromEngineering` reads back to the same double. */
export function engineeringText(value: number, unit: string): string {
  const { exponent, offset } = toEngineering(unit);
  return offset === 0 ? shiftDecimal(value, -exponent) : celsiusText(value, offset);
}

/** The SI value of a number in the engineering unit of `unit`; NaN where `text` is no number. */
export function fromEngineering(text: string, unit: string): number {
  const { exponent, offset } = toEngineering(unit);
  const value = readDecimal(text, exponent);
  return offset === 0 ? value : value + offset;
}

/** The shortest number that gives `value` when the offset is added. */
function celsiusText(value: number, offset: number): string {
  const celsius = value - offset;
  for (let digits = 1; digits <= 17; digits++) {
    const text = shiftDecimal(Number(celsius.toPrecision(digits)), 0);
    if (Number(text) + offset === value) return text;
  }
  return shiftDecimal(celsius, 0);
}
