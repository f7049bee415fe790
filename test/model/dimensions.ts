/** Units as exponents of metre, kilogram, second, ampere and kelvin, and odd factors to rescale those by. */

/** Exponents of m, kg, s, A, K. */
type Dimension = readonly [number, number, number, number, number];

const UNITS: Readonly<Record<string, Dimension>> = {
  '1': [0, 0, 0, 0, 0],
  m: [1, 0, 0, 0, 0],
  'm²': [2, 0, 0, 0, 0],
  'm³': [3, 0, 0, 0, 0],
  kg: [0, 1, 0, 0, 0],
  s: [0, 0, 1, 0, 0],
  Hz: [0, 0, -1, 0, 0],
  A: [0, 0, 0, 1, 0],
  'A²': [0, 0, 0, 2, 0],
  '1/s': [0, 0, -1, 0, 0],
  'C/A': [0, 0, 1, 0, 0],
  's/A': [0, 0, 1, -1, 0],
  '1/K²': [0, 0, 0, 0, -2],
  'kg/m³': [-3, 1, 0, 0, 0],
  'T/A': [0, 1, -2, -2, 0],
  'A/s': [0, 0, -1, 1, 0],
  '(A/s)²': [0, 0, -2, 2, 0],
  'A/m': [-1, 0, 0, 1, 0],
  K: [0, 0, 0, 0, 1],
  '1/K': [0, 0, 0, 0, -1],
  V: [2, 1, -3, -1, 0],
  'V/K': [2, 1, -3, -1, -1],
  Ω: [2, 1, -3, -2, 0],
  'Ω/m': [1, 1, -3, -2, 0],
  Ω·m: [3, 1, -3, -2, 0],
  H: [2, 1, -2, -2, 0],
  F: [-2, -1, 4, 2, 0],
  C: [0, 0, 1, 1, 0],
  J: [2, 1, -2, 0, 0],
  W: [2, 1, -3, 0, 0],
  'W/m': [1, 1, -3, 0, 0],
  T: [0, 1, -2, -1, 0],
  'W/K': [2, 1, -3, 0, -1],
  'K/W': [-2, -1, 3, 0, 1],
  'W/(K·m³)': [-1, 1, -3, 0, -1],
};

/**
 * Base factors: none; all free; µ0 unchanged (kg = s²·A²/m); kelvin unchanged, for formulas that hold 25 °C or 10 K; with it henry unchanged,
 * for the stated inductance of a loop; volt, for a modulator's ramp; all but ampere, for board copper and coefficients fitted in SI units.
 */
export const FACTORS = {
  plain: [1, 1, 1, 1, 1],
  free: [1.7, 0.6, 2.3, 1.9, 0.7],
  permeability: [1.7, (2.3 * 1.9) ** 2 / 1.7, 2.3, 1.9, 0.7],
  kelvin: [1.7, 0.6, 2.3, 1.9, 1],
  henry: [1.7, (2.3 * 1.9) ** 2 / 1.7 ** 2, 2.3, 1.9, 1],
  volt: [1.7, (2.3 ** 3 * 1.9) / 1.7 ** 2, 2.3, 1.9, 1],
  ampere: [1, 1.9 ** 2, 1, 1.9, 1],
} as const;

/** Which factors a test uses. */
export type Base = keyof typeof FACTORS;

/** What a value in `unit` is multiplied by. */
export function factorOf(unit: string, base: readonly number[]): number {
  const dimension = UNITS[unit];
  if (dimension === undefined) throw new Error(`unit ${unit} is not in the table`);
  return dimension.reduce((product, exponent, i) => product * base[i] ** exponent, 1);
}

/** Units of a record's numbers by field; a field of bare numbers has '1'. */
export type FieldUnits = Readonly<Record<string, string>>;

/** A copy of `record` with every number, and every element of every typed array, rescaled. A number without a unit is an error. */
export function rescaled<T extends object>(record: T, units: FieldUnits, base: Base): T {
  const copy: T = Object.create(Object.getPrototypeOf(record));
  for (const [field, value] of Object.entries(record)) {
    Object.defineProperty(copy, field, { value: scaledValue(field, value, units, base), ...OPEN });
  }
  return copy;
}

const OPEN = { writable: true, enumerable: true, configurable: true } as const;

function scaledValue(field: string, value: unknown, units: FieldUnits, base: Base): unknown {
  if (typeof value === 'number') return value * factorOf(unitOf(field, units), FACTORS[base]);
  if (!(value instanceof Float64Array)) return value;
  const factor = factorOf(unitOf(field, units), FACTORS[base]);
  return value.map((each) => each * factor);
}

function unitOf(field: string, units: FieldUnits): string {
  const unit = units[field];
  if (unit === undefined) throw new Error(`field ${field} has no unit in the test's table`);
  return unit;
}

/** Fields whose numbers in `other` are not those of `plain` rescaled, with both; empty where all are. */
export function misfits(plain: object, other: object, units: FieldUnits, base: Base): string[] {
  const theirs = new Map<string, unknown>(Object.entries(other));
  return Object.entries(plain).flatMap(([field, value]: [string, unknown]) => {
    const pairs = pairsOf(value, theirs.get(field));
    if (pairs.length === 0) return [];
    const factor = factorOf(unitOf(field, units), FACTORS[base]);
    const wrong = pairs.find(([a, b]) => !(Math.abs(b - a * factor) <= 1e-9 * Math.abs(a * factor)));
    return wrong === undefined ? [] : [`${field}: ${wrong[0]} became ${wrong[1]}, not ${wrong[0] * factor}`];
  });
}

function pairsOf(a: unknown, b: unknown): (readonly [number, number])[] {
  if (typeof a === 'number' && typeof b === 'number') return Number.isNaN(a) && Number.isNaN(b) ? [] : [[a, b]];
  if (a instanceof Float64Array && b instanceof Float64Array) return Array.from(a, (x, i) => [x, b[i]] as const);
  return [];
}
