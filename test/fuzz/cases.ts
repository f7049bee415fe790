/** What hostile or clumsy hands make of a good text: the cases that all fuzz tests share. */
import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import { BUILT_IN_TABLES, SHIPPED_RAILS, starterSheet } from '../../model/index.ts';

/** Texts that readers, terminals, shells, pages and spreadsheets have each been known to trip over. */
export const NASTY: readonly string[] = [
  '',
  ' ',
  '-',
  '--',
  '\n',
  '\t',
  '\r\n',
  '\u001b[2J\u001b[1;31m',
  '\u009b31m',
  '\u202egnp.exe',
  '\u200b\ufeff',
  '<script>alert(1)</script>',
  '</script><img src=x onerror=alert(1)>',
  '"><b>',
  "'; rm -rf x; '",
  '$(touch owned)',
  '`touch owned`',
  '=1+1',
  '%s%n',
  '{name}',
  '__proto__',
  'constructor',
  'NaN',
  'Infinity',
  '-0',
  '1e400',
  '9'.repeat(400),
  'x'.repeat(10_000),
  'ÅΩ漢字🙂',
  '\ud800',
];

/** One nasty text, or any text. */
export const nasty = fc.oneof(fc.constantFrom(...NASTY), fc.string({ unit: 'binary', maxLength: 20 }));

/** The text of a file of the project. */
const projectText = (path: string): string => readFileSync(new URL(`../../${path}`, import.meta.url), 'utf8');

/** The starter and the shipped sheets. */
export const SHEETS: readonly string[] = [
  starterSheet(),
  ...SHIPPED_RAILS.map((file) => projectText(`model/rails/${file}`)),
];

/** The built-in tables, each cut to its first rows. */
export const TABLES: readonly string[] = BUILT_IN_TABLES.map(({ file }) =>
  projectText(`model/tables/${file}`)
    .split('\n')
    .filter((line) => !line.startsWith('#'))
    .slice(0, 8)
    .join('\n'),
);

/** One of `texts` with pieces cut out and nasty ones put in. */
export function edited(texts: readonly string[]): fc.Arbitrary<string> {
  const edit = fc.record({ at: fc.double({ min: 0, max: 1, noNaN: true }), cut: fc.nat(30), put: nasty });
  return fc.tuple(fc.constantFrom(...texts), fc.array(edit, { minLength: 1, maxLength: 4 })).map(([text, edits]) =>
    edits.reduce((all, { at, cut, put }) => {
      const from = Math.floor(at * all.length);
      return all.slice(0, from) + put + all.slice(from + cut);
    }, text),
  );
}

/** One of `texts` with some of its numbers replaced by others. */
export function renumbered(texts: readonly string[]): fc.Arbitrary<string> {
  const number = fc.oneof(
    fc.constantFrom('0', '-1', '1e-9', '1e9', '0.5', '100'),
    fc.integer({ min: 1, max: 500 }).map(String),
    fc.double({ min: 0.001, max: 1000, noNaN: true }).map((value) => value.toPrecision(3)),
  );
  return fc
    .tuple(fc.constantFrom(...texts), fc.array(fc.tuple(fc.nat(200), number), { maxLength: 3 }))
    .map(([text, changes]) =>
      changes.reduce((all, [which, put]) => {
        const found = [...all.matchAll(/(?<![\w.#-])\d+(?:\.\d+)?(?=[ %,}\n])/g)];
        const place = found[which % Math.max(1, found.length)];
        return place === undefined ? all : all.slice(0, place.index) + put + all.slice(place.index + place[0].length);
      }, text),
    );
}

/** `value` with one of its inner values replaced or removed. */
export function damaged(value: unknown): fc.Arbitrary<unknown> {
  return fc
    .tuple(fc.array(fc.nat(1000), { minLength: 1, maxLength: 4 }), fc.oneof(fc.jsonValue(), nasty))
    .map(([path, put]) => replaced(value, path, put));
}

function replaced(value: unknown, [step, ...rest]: readonly number[], put: unknown): unknown {
  if (step === undefined || typeof value !== 'object' || value === null) return put;
  const keys = Object.keys(value);
  const key = keys[step % Math.max(1, keys.length)];
  if (key === undefined) return put;
  const inner = replaced(Reflect.get(value, key), rest, put);
  if (Array.isArray(value)) return value.map((one, i) => (String(i) === key ? inner : one));
  return { ...value, [key]: inner };
}
