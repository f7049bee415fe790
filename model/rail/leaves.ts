/** The leaves of a sheet as zod schemas whose issues carry what was found, what is allowed and what is near. */
import { z } from 'zod';
import { type Bounds, boundsText, within } from '../quantity/bounds.ts';
import { type Dimension, exampleOf } from '../quantity/dimension.ts';
import { nearest } from '../quantity/nearest.ts';
import { parseQuantity, shorten } from '../quantity/parse.ts';

/** What an issue of ours carries beside its path. */
export interface Complaint {
  readonly found: string;
  readonly allowed: string;
  readonly nearest?: string;
}

/** A leaf, read, or a complaint. */
type Leaf<T> = { readonly value: T } | { readonly complaint: Complaint };

/** What stands at a node, for a message. */
export function foundText(value: unknown): string {
  if (value === undefined || value === null || value === '') return 'nothing';
  if (typeof value === 'string') return shorten(value);
  if (Array.isArray(value)) return value.length === 0 ? 'an empty list' : 'a list';
  return Object.keys(value).length === 0 ? 'an empty map' : 'a map';
}

/** A leaf that is read from text; `allowed` is said where no text stands. */
export function leaf<T>(allowed: string, read: (text: string) => Leaf<T>) {
  return z.unknown().transform((value, context): T => {
    const result =
      typeof value === 'string' && value !== '' ? read(value) : { complaint: { found: foundText(value), allowed } };
    if ('value' in result) return result.value;
    context.addIssue({ code: 'custom', message: result.complaint.allowed, params: { ...result.complaint } });
    return z.NEVER;
  });
}

/** A quantity within bounds; at any place where a temperature stands, °C is usual. */
export function amount(dimension: Dimension, bounds: Bounds) {
  return leaf(exampleOf(dimension), (text): Leaf<number> => {
    const reading = parseQuantity(text, dimension);
    if (!reading.ok) {
      const { found, allowed } = reading;
      return {
        complaint: reading.nearest === undefined ? { found, allowed } : { found, allowed, nearest: reading.nearest },
      };
    }
    if (within(reading.value, bounds)) return { value: reading.value };
    return {
      complaint: { found: shorten(text), allowed: `${exampleOf(dimension)}, ${boundsText(bounds, dimension)}` },
    };
  });
}

/** A quantity above 0 and up to `most` (SI). */
export function upTo(dimension: Dimension, most: number) {
  return amount(dimension, { above: 0, to: most });
}

/** A whole number in a range. */
export function count(from: number, to: number) {
  const allowed = `a whole number from ${from} to ${to}`;
  return leaf(allowed, (text): Leaf<number> => {
    const reading = parseQuantity(text, 'number');
    const good = reading.ok && Number.isInteger(reading.value) && within(reading.value, { from, to });
    return good ? { value: reading.value } : { complaint: { found: shorten(text), allowed } };
  });
}

/** One of a few words. */
export function oneOf<const O extends readonly string[]>(options: O) {
  const allowed = options.join(', ');
  return leaf(allowed, (text): Leaf<O[number]> => {
    const value = options.find((option) => option === text);
    if (value !== undefined) return { value };
    const near = nearest(text, options);
    const complaint = { found: shorten(text), allowed };
    return { complaint: near === undefined ? complaint : { ...complaint, nearest: near } };
  });
}

/** `yes` or `no`, or YAML's own `true` and `false`. */
export function yesNo() {
  return leaf('yes, no', (text): Leaf<boolean> => {
    if (text === 'yes' || text === 'true') return { value: true };
    if (text === 'no' || text === 'false') return { value: false };
    return { complaint: { found: shorten(text), allowed: 'yes, no' } };
  });
}

/** A text that matches `pattern`. */
export function matching(pattern: RegExp, allowed: string) {
  return leaf(
    allowed,
    (text): Leaf<string> => (pattern.test(text) ? { value: text } : { complaint: { found: shorten(text), allowed } }),
  );
}

/** A map with fixed keys; the message of its own issues is what is allowed. */
export function keyed<const S extends z.ZodRawShape>(shape: S) {
  const keys = Object.keys(shape).join(', ');
  return z.strictObject(shape, {
    error: (issue) => (issue.code === 'unrecognized_keys' ? keys : `a map with the keys ${keys}`),
  });
}

/** A list with a least and a largest length. */
export function listOf<T extends z.ZodType>(item: T, from: number, to: number, what: string) {
  return z.array(item, { error: () => `a list of ${what}` }).superRefine((list, context) => {
    if (list.length >= from && list.length <= to) return;
    const allowed = to >= 50 ? `${from} or more ${what}` : `${from} to ${to} ${what}`;
    const found = list.length === 0 ? 'an empty list' : list.length === 1 ? 'one entry' : `${list.length} entries`;
    context.addIssue({ code: 'custom', message: allowed, params: { found, allowed } });
  });
}

/** A text in one form, anything else in another; complaints keep their paths. */
export function textOr<A extends z.ZodType, B extends z.ZodType>(text: A, other: B) {
  return z.unknown().transform((value, context): z.output<A> | z.output<B> => {
    const result = (typeof value === 'string' || value === null || value === undefined ? text : other).safeParse(value);
    if (result.success) return result.data;
    for (const issue of result.error.issues)
      context.addIssue({ ...issue, input: value } as Parameters<typeof context.addIssue>[0]);
    return z.NEVER;
  });
}
