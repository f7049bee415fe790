import { describe, expect, test } from 'vitest';
import { describeFinding } from '../../../model/outcome.ts';
import { canonicalParts, joinTables, type ReadTable } from '../../../model/parts/join.ts';
import { tableProfile } from '../../../model/parts/profile.ts';
import { PART_KINDS } from '../../../model/parts/schemas.ts';
import { builtIn } from './tables.ts';

const ALL: readonly ReadTable[] = PART_KINDS.map((kind) => ({ kind, rows: builtIn(kind), file: `${kind}.csv` }));
const first = builtIn('diodes').slice(0, 1);

describe('joining', () => {
  test('all built-in tables join: names are unique over all of them', () => {
    const joined = joinTables(ALL, 'EUR');
    expect(joined.ok && joined.value.switches).toHaveLength(builtIn('switches').length);
  });

  test('two tables of a kind stand one after the other', () => {
    const own = first.map((row) => ({ ...row, name: 'OWN-1' }));
    const joined = joinTables([...ALL, { kind: 'diodes', rows: own, file: 'own.csv' }]);
    expect(joined.ok && joined.value.diodes.at(-1)?.name).toBe('OWN-1');
  });

  test('a name in two tables is refused, and so is a second currency', () => {
    const own = first.map((row) => ({ ...row, currency: 'CHF' }));
    const joined = joinTables([...ALL, { kind: 'diodes', rows: own, file: 'own.csv' }]);
    expect(joined.ok ? [] : joined.findings.map(describeFinding)).toEqual([
      `own.csv: name: found ${first[0]?.name}, which diodes.csv has too; allowed: each name once over all tables`,
      'own.csv: currency: found prices in CHF; allowed: prices in EUR, one currency for a sheet and its tables',
    ]);
  });

  test('the canonical text does not depend on the order of tables or rows', () => {
    const turned = [...ALL].reverse().map((table) => ({ ...table, rows: [...table.rows].reverse() }));
    const a = joinTables(ALL);
    const b = joinTables(turned);
    expect(a.ok && b.ok && canonicalParts(a.value) === canonicalParts(b.value)).toBe(true);
  });

  test('a changed price changes it', () => {
    const a = joinTables([{ kind: 'diodes', rows: first }]);
    const b = joinTables([{ kind: 'diodes', rows: first.map((row) => ({ ...row, prices: [{ from: 1, price: 9 }] })) }]);
    expect(a.ok && b.ok && canonicalParts(a.value) === canonicalParts(b.value)).toBe(false);
  });
});

describe('profiles', () => {
  test('ranges cover the rows', () => {
    const { rows, ranges } = tableProfile('inductors', builtIn('inductors'));
    expect(rows).toBe(builtIn('inductors').length);
    expect(ranges.find(({ column }) => column === 'inductance')).toMatchObject({
      unit: 'H',
      smallest: 1e-7,
      largest: 1e-4,
    });
  });

  test('a resistance typed a thousand times too small stands out by name and trend', () => {
    const wrong = builtIn('switches')
      .slice(0, 1)
      .map((row) => ({ ...row, onResistance: row.onResistance / 1000 }));
    expect(tableProfile('switches', wrong).outliers.map(({ name, trend }) => [name, trend])).toEqual([
      [wrong[0]?.name, 'on-resistance × gate charge'],
      [wrong[0]?.name, 'on-resistance × output charge'],
    ]);
  });
});
