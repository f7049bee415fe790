/** What a value may be: bounds, and the words for them. */
import { DIMENSIONS, type Dimension } from './dimension.ts';
import { formatDifference, formatQuantity } from './format.ts';

/** Bounds of a value in SI units; `above` excludes, the others include. */
export interface Bounds {
  readonly above?: number;
  readonly from?: number;
  readonly to?: number;
}

/** Whether `value` is finite and keeps `bounds`. */
export function within(value: number, { above, from, to }: Bounds): boolean {
  if (!Number.isFinite(value) || (above !== undefined && value <= above)) return false;
  return (from === undefined || value >= from) && (to === undefined || value <= to);
}

/** Bounds in words, such as `above 0, at most 100 Ω`. */
export function boundsText({ above, from, to }: Bounds, dimension: Dimension): string {
  const parts: string[] = [];
  if (above !== undefined) parts.push(`above ${show(above, dimension)}`);
  if (from !== undefined) parts.push(`at least ${show(from, dimension)}`);
  if (to !== undefined) parts.push(`at most ${show(to, dimension)}`);
  return parts.length === 0 ? 'any number' : parts.join(', ');
}

function show(value: number, dimension: Dimension): string {
  const { unit } = DIMENSIONS[dimension];
  if (dimension === 'temperature') return formatQuantity(value, unit);
  if (value === 0) return '0';
  return dimension === 'fraction' ? `${formatQuantity(value * 100, '')} %` : formatDifference(value, unit);
}
