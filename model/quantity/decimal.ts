/** Decimal numbers as text, shifted by powers of ten without rounding, so that a value survives its engineering form. */

const DECIMAL = /^([+-]?)(\d+\.?\d*|\.\d+)(?:[eE]([+-]?\d{1,4}))?$/;
/** Longest number read, characters. */
const LONGEST = 48;

/** Whether `text` is one decimal number. */
export function isDecimal(text: string): boolean {
  return text.length <= LONGEST && DECIMAL.test(text);
}

/** The double nearest to the number `text` times 10^`exponent`; NaN where `text` is no number. */
export function readDecimal(text: string, exponent = 0): number {
  if (text.length > LONGEST) return Number.NaN;
  const match = DECIMAL.exec(text);
  if (match === null) return Number.NaN;
  return Number(`${match[1]}${match[2]}e${Number(match[3] ?? 0) + exponent}`);
}

/**
 * The shortest digits of `value` (as in ECMA-262 Number::toString) with the decimal point moved by `exponent` places:
 * `shiftDecimal(4.7e-6, 6)` is `4.7`. Reading it back with `readDecimal(text, -exponent)` gives the same double.
 */
export function shiftDecimal(value: number, exponent: number): string {
  if (value === 0 || !Number.isFinite(value)) return String(value === 0 ? 0 : value);
  const match = /^(-?)(\d)(?:\.(\d+))?e([+-]\d+)$/.exec(value.toExponential());
  if (match === null) return String(value);
  const [, sign = '', first = '', rest = '', power = '0'] = match;
  return sign + plain(first + rest, Number(power) + exponent);
}

/** `digits` with the point after the first one, times 10^`power`, without an exponent where it stays readable. */
function plain(digits: string, power: number): string {
  if (power < -7 || power > 20) {
    const tail = digits.length > 1 ? `.${digits.slice(1)}` : '';
    return `${digits[0]}${tail}e${power < 0 ? '' : '+'}${power}`;
  }
  if (power < 0) return `0.${'0'.repeat(-power - 1)}${digits}`;
  const whole = digits.slice(0, power + 1).padEnd(power + 1, '0');
  const tail = digits.slice(power + 1);
  return tail === '' ? whole : `${whole}.${tail}`;
}
