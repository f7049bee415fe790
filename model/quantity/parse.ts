/** A quantity as a person writes it, such as `4.7 µH`, to its SI value; or what is wrong with it, with an example of what is right. */
import { isDecimal, readDecimal } from './decimal.ts';
import { DIMENSIONS, type Dimension, exampleOf } from './dimension.ts';
import { measures, nearestUnit, readUnit, type UnitReading } from './unit.ts';

/** An SI value, or the reason why there is none. */
export type Reading =
  | { readonly ok: true; readonly value: number }
  | {
      readonly ok: false;
      /** What stands there and what is wrong with it. */
      readonly found: string;
      /** What may stand there. */
      readonly allowed: string;
      /** Nearest known unit. */
      readonly nearest?: string;
    };

/** Longest text of a quantity, characters. */
const LONGEST = 64;
const PARTS = /^([+-]?[\d.,]+(?:[eE][+-]?\d+)?)\s*(.*)$/su;

/**
 * Reads `text` as a quantity of `dimension`: number, optional space, unit. Both micro signs and both ohm signs count, and so
 * do `u`, `ohm` and `^2`. A share may stand without a unit (0.85) or in per cent (85 %).
 */
export function parseQuantity(text: string, dimension: Dimension): Reading {
  const allowed = exampleOf(dimension);
  const clean = text.normalize('NFKC').replaceAll('−', '-').trim();
  if (clean === '') return { ok: false, found: 'nothing', allowed };
  if (clean.length > LONGEST) return { ok: false, found: shorten(clean), allowed };
  const parts = PARTS.exec(clean);
  const number = parts?.[1] ?? '';
  if (number.includes(',')) return { ok: false, found: clean, allowed: `${allowed}, with a point and no comma` };
  if (!isDecimal(number)) return { ok: false, found: clean, allowed };
  const unit = parts?.[2] ?? '';
  return withUnit(clean, number, unit, dimension);
}

/** The SI value of the number `text` in `unit`; NaN where it is no number. */
export function inUnit(text: string, unit: UnitReading): number {
  return readDecimal(text, unit.exponent) * unit.factor + unit.offset;
}

/** At most 60 characters of `text`, on one line. */
export function shorten(text: string): string {
  const line = text.slice(0, 80).replace(/[\p{C}\s]+/gu, ' ');
  return line.length > 60 || text.length > 80 ? `${line.slice(0, 57)}…` : line;
}

function withUnit(clean: string, number: string, unit: string, dimension: Dimension): Reading {
  const allowed = exampleOf(dimension);
  if (unit === '' && DIMENSIONS[dimension].unit !== '') return { ok: false, found: `${clean} without a unit`, allowed };
  const reading = readUnit(unit);
  if (reading === undefined) {
    const near = nearestUnit(unit);
    const found = `${clean} with an unknown unit`;
    return near === undefined ? { ok: false, found, allowed } : { ok: false, found, allowed, nearest: near };
  }
  if (!measures(reading, dimension)) return { ok: false, found: `${clean}, which is ${wordsOf(reading)}`, allowed };
  const value = inUnit(number, reading);
  return Number.isFinite(value)
    ? { ok: true, value }
    : { ok: false, found: `${clean}, which is beyond any number`, allowed };
}

function wordsOf(unit: UnitReading): string {
  if (unit.base === '' && unit.exponent === 0) return 'a number without a unit';
  for (const name of Object.keys(DIMENSIONS) as Dimension[]) {
    if (measures(unit, name)) return DIMENSIONS[name].words;
  }
  return 'something else';
}
