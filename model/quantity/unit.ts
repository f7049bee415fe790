/**
 * Units as people write them. js-quantities knows dimensions and sizes; this file decides which spellings reach it, because by
 * itself it reads `mΩ` as metre times ohm and `zz` as a length, and knows neither °C nor K/W.
 */
import Qty from 'js-quantities';
import { DIMENSIONS, type Dimension } from './dimension.ts';
import { nearest } from './nearest.ts';

/** Our spelling of each unit, and the library's. */
const SYMBOLS: Readonly<Record<string, string>> = {
  V: 'V',
  A: 'A',
  Ω: 'ohm',
  ohm: 'ohm',
  Ohm: 'ohm',
  H: 'H',
  F: 'F',
  Hz: 'Hz',
  s: 's',
  min: 'min',
  h: 'h',
  K: 'degK',
  m: 'm',
  L: 'L',
  l: 'L',
  g: 'g',
  W: 'W',
  J: 'J',
  C: 'C',
  T: 'T',
};
const PREFIXES = 'pnumckMG';
const CELSIUS = new Set(['°C', 'degC']);
/** Zero of the Celsius scale, K. */
const CELSIUS_ZERO = 273.15;
const LONGEST = 16;

/** A unit, read: SI value = number × 10^`exponent` × `factor` + `offset`. */
export interface UnitReading {
  /** Power of ten in the unit's size. */
  readonly exponent: number;
  /** What is left of its size: 1 for nearly all, 3600 for h. */
  readonly factor: number;
  /** K; not 0 for °C alone. */
  readonly offset: number;
  /** The unit in the library's spelling, empty for none. */
  readonly base: string;
}

/** Reads a unit; undefined where it is not one that sheets and tables know. */
export function readUnit(text: string): UnitReading | undefined {
  const plain = text.normalize('NFKC').replaceAll(' ', '').replaceAll('μ', 'u');
  if (plain.length > LONGEST) return undefined;
  if (plain === '' || plain === '1') return { exponent: 0, factor: 1, offset: 0, base: '' };
  if (plain === '%') return { exponent: -2, factor: 1, offset: 0, base: '' };
  if (CELSIUS.has(plain)) return { exponent: 0, factor: 1, offset: CELSIUS_ZERO, base: 'degK' };
  const base = libraryText(plain);
  return base === undefined ? undefined : sizeOf(base);
}

/** Whether a unit measures `dimension`. */
export function measures(unit: UnitReading, dimension: Dimension): boolean {
  if (unit.offset !== 0) return dimension === 'temperature';
  const wanted = libraryText(DIMENSIONS[dimension].unit.normalize('NFKC'));
  if (dimension === 'number') return unit.base === '' && unit.exponent === 0;
  if (unit.base === '' || wanted === undefined) return unit.base === '' && wanted === undefined;
  return Qty(`1 ${unit.base}`).isCompatible(wanted);
}

/** The known unit nearest to `text`, in the unit's own spelling. */
export function nearestUnit(text: string): string | undefined {
  return nearest(text, COMMON);
}

/** `a`, `a/b` or `1/a`, each a prefix, a symbol and a power, in the library's spelling. */
function libraryText(plain: string): string | undefined {
  const [above = '', below, ...more] = plain.split('/');
  if (more.length > 0) return undefined;
  const top = above === '1' && below !== undefined ? '' : atom(above);
  if (below === undefined) return top;
  const bottom = atom(below);
  return top === undefined || bottom === undefined ? undefined : `${top === '' ? '1' : top}/${bottom}`;
}

function atom(text: string): string | undefined {
  const match = /^(\D+?)(?:\^?([23]))?$/u.exec(text);
  const name = match?.[1] ?? '';
  const power = match?.[2] ?? '';
  if (Object.hasOwn(SYMBOLS, name)) return `${SYMBOLS[name]}${power}`;
  const symbol = name.slice(1);
  if (!PREFIXES.includes(name.slice(0, 1)) || !Object.hasOwn(SYMBOLS, symbol)) return undefined;
  return `${name[0]}${SYMBOLS[symbol]}${power}`;
}

function sizeOf(base: string): UnitReading {
  const size = Qty(base.startsWith('1/') ? base : `1 ${base}`).toBase().scalar;
  const exponent = Number(size.toExponential(12).split('e')[1]);
  const mantissa = Number(size.toExponential(12).split('e')[0]);
  return mantissa === 1
    ? { exponent, factor: 1, offset: 0, base }
    : { exponent: 0, factor: Number(size.toPrecision(12)), offset: 0, base };
}

const COMMON = (
  'mV V kV mA A µΩ mΩ Ω kΩ nH µH mH pF nF µF mF Hz kHz MHz GHz ns µs ms s min h °C K µm mm cm m mm² cm² m² mm³ cm³ L m³ mg g kg ' +
  'µW mW W kW nJ µJ mJ J pC nC µC % A/µs A/ms A/s K/W m/s 1/K mV/K V/K mT T kg/m³ g/cm³'
).split(' ');
