/** Quantities for people: an engineering prefix and at most four digits. */

/** SI units that take the prefixes of thousands, and the range of powers each is spoken in. */
const PREFIXED: Readonly<Record<string, readonly [number, number]>> = {
  V: [-6, 3],
  A: [-6, 3],
  Ω: [-6, 6],
  H: [-9, 0],
  F: [-12, 0],
  Hz: [0, 9],
  s: [-12, 0],
  W: [-6, 6],
  J: [-9, 3],
  C: [-12, 0],
  T: [-3, 0],
};
const PREFIX: Readonly<Record<number, string>> = {
  [-12]: 'p',
  [-9]: 'n',
  [-6]: 'µ',
  [-3]: 'm',
  0: '',
  3: 'k',
  6: 'M',
  9: 'G',
};
/** Units that have names of their own instead: name and power of ten, smallest first. */
const NAMED: Readonly<Record<string, readonly (readonly [string, number])[]>> = {
  m: [
    ['µm', -6],
    ['mm', -3],
    ['m', 0],
  ],
  'm²': [
    ['mm²', -6],
    ['cm²', -4],
    ['m²', 0],
  ],
  'm³': [
    ['mm³', -9],
    ['cm³', -6],
    ['L', -3],
    ['m³', 0],
  ],
  kg: [
    ['mg', -6],
    ['g', -3],
    ['kg', 0],
  ],
  'A/s': [
    ['A/s', 0],
    ['A/ms', 3],
    ['A/µs', 6],
  ],
};
const DIGITS = 4;
const CELSIUS_ZERO = 273.15;

/**
 * `4.7 µH`, `500 kHz`, `55 °C` (from kelvin), `8 cm³`, `2.35 EUR`: `value` in the SI unit `unit` for a reader. A unit that
 * is not known (a currency, a compound) is written as it is, a bare number for the empty unit.
 */
export function formatQuantity(value: number, unit: string): string {
  if (!Number.isFinite(value)) return unit === '' ? String(value) : `${value} ${unit}`;
  if (unit === 'K') return `${digits(value - CELSIUS_ZERO)} °C`;
  if (/^[A-Z]{3}$/.test(unit)) return `${money(value)} ${unit}`;
  const scale = scaleFor(value, unit);
  return scale.name === '' ? digits(value) : `${digits(scaled(value, scale.power))} ${scale.name}`;
}

/** As `formatQuantity`, for a difference: kelvin stay kelvin. */
export function formatDifference(value: number, unit: string): string {
  return unit === 'K' ? `${digits(value)} K` : formatQuantity(value, unit);
}

interface Scale {
  readonly name: string;
  readonly power: number;
}

function scaleFor(value: number, unit: string): Scale {
  const scales = scalesOf(unit);
  const size = Math.abs(Number(value.toPrecision(DIGITS)));
  let chosen = scales[0] ?? { name: unit, power: 0 };
  if (size === 0) return scales.find(({ power }) => power === 0) ?? chosen;
  for (const scale of scales) {
    if (size >= Number(`1e${scale.power}`)) chosen = scale;
  }
  return chosen;
}

function scalesOf(unit: string): readonly Scale[] {
  if (Object.hasOwn(NAMED, unit)) return (NAMED[unit] ?? []).map(([name, power]) => ({ name, power }));
  if (!Object.hasOwn(PREFIXED, unit)) return [{ name: unit, power: 0 }];
  const [low, high] = PREFIXED[unit] ?? [0, 0];
  const scales: Scale[] = [];
  for (let power = low; power <= high; power += 3) scales.push({ name: `${PREFIX[power]}${unit}`, power });
  return scales;
}

function scaled(value: number, power: number): number {
  const [mantissa, exponent] = value.toExponential(DIGITS + 2).split('e');
  return Number(`${mantissa}e${Number(exponent) - power}`);
}

function digits(value: number): string {
  const rounded = Number(value.toPrecision(DIGITS));
  return Math.abs(rounded) >= 1e7 || (rounded !== 0 && Math.abs(rounded) < 1e-4) ? String(rounded) : plainZero(rounded);
}

/** A number without an exponent and without a minus before zero. */
function plainZero(value: number): string {
  return value === 0 ? '0' : String(value);
}

function money(value: number): string {
  return Math.abs(value) < 0.1 && value !== 0 ? value.toFixed(4) : value.toFixed(2);
}
