/** A user's own parts: checked row by row, begun from a template, mixed with the built-in ones or instead of them, barred, preferred. */
import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import {
  BUILT_IN_TABLES,
  createRailProblem,
  describeFinding,
  PART_KINDS,
  type RailProblem,
  readTable,
  tableTemplate,
} from '../../model/index.ts';
import { inspectTableText } from '../../runners/commands/parts-report.ts';
import { reportText } from '../../runners/commands/parts-text.ts';
import { stockLines } from '../../runners/commands/stock-text.ts';
import { readSheet } from '../../runners/inputs.ts';
import { chopfront, newFolder } from './processes.ts';

const projectText = (path: string): string => readFileSync(new URL(`../../${path}`, import.meta.url), 'utf8');
const BUOY = projectText('model/rails/buoy-sensors.yaml');
const SWITCHES = projectText('model/tables/switches.csv')
  .split('\n')
  .filter((line) => !line.startsWith('#'));
const [HEADER = '', FIRST = '', SECOND = '', THIRD = ''] = SWITCHES;
/** A row of the built-in table under a name of its own; `edits` by column name, without unit. */
const own = (row: string, name: string, edits: Readonly<Record<string, string>> = {}): string => {
  const columns = HEADER.split(',').map((cell) => cell.replace(/ \[.*/, ''));
  return row
    .split(',')
    .map((cell, i) => (i === 0 ? name : (edits[columns[i] ?? ''] ?? cell)))
    .join(',');
};
const table = (...rows: readonly string[]): string => `${[HEADER, ...rows].join('\n')}\n`;

describe('parts check', () => {
  test('names each rejected row with line, column, found and allowed; status 2', async () => {
    const folder = newFolder();
    const bad = table(own(FIRST, 'A1'), own(SECOND, 'A2', { rds_on: '0' }), own(THIRD, 'A3', { technology: 'sic' }));
    writeFileSync(join(folder, 'mine.csv'), bad);
    const { status, stdout, stderr } = await chopfront('parts', 'check', join(folder, 'mine.csv'));
    expect(status).toBe(2);
    expect(stdout).toMatch(/mine\.csv: switches, 3 rows, 2 rejected, prices in EUR/);
    expect(stdout).toMatch(/mine\.csv:3:\d+: rds_on: found 0; allowed: above 0, at most 100 Ω/);
    expect(stdout).toMatch(/mine\.csv:4:4: technology: found sic; allowed: si, gan/);
    expect(stderr).toMatch(/^chopfront: 2 of 3 rows in .*mine\.csv rejected; mend them as listed, then check again\n$/);
  });

  test('--json is one JSON value with the same findings', async () => {
    const folder = newFolder();
    writeFileSync(join(folder, 'mine.csv'), table(own(FIRST, 'A1'), own(SECOND, 'A2', { rds_on: '0' })));
    const { status, stdout } = await chopfront('parts', 'check', join(folder, 'mine.csv'), '--json');
    expect(status).toBe(2);
    expect(JSON.parse(stdout)).toMatchObject([
      { kind: 'switches', rows: 2, rejected: 1, currency: 'EUR', findings: [{ line: 3, field: 'rds_on', found: '0' }] },
    ]);
  });

  test('a good table ends with status 0 and shows its ranges beside the built-in ones', () => {
    const report = inspectTableText(table(own(FIRST, 'A1'), own(SECOND, 'A2')), 'mine.csv');
    expect(report).toMatchObject({ rows: 2, rejected: 0, findings: [], odd: [], remarks: [] });
    const range = report.ranges.find(({ column }) => column === 'rds_on');
    expect(range).toMatchObject({ smallest: 0.8e-3, largest: 1.2e-3, unit: 'Ω' });
    expect(range?.builtIn?.[1]).toBeGreaterThan(0.1);
    expect(reportText(report, (text) => text)).toMatch(/rds_on +800 µΩ +1\.2 mΩ +800 µΩ +200 mΩ/);
  });

  // Milliohms typed under a header of ohms: the commonest slip of a unit.
  test('a value a thousand times off is listed with its line, though it is allowed', () => {
    const rows = table(own(FIRST, 'A1'), own(SECOND, 'A2', { rds_on: '1200' }));
    const { odd, rejected } = inspectTableText(rows, 'mine.csv');
    expect(rejected).toBe(0);
    expect(odd.map(({ line, name, what }) => [line, name, what])).toEqual([
      [3, 'A2', 'on-resistance × gate charge'],
      [3, 'A2', 'on-resistance × output charge'],
    ]);
  });

  test('a kind without a law between its columns is held against the built-in ranges', () => {
    const lines = projectText('model/tables/controllers.csv')
      .split('\n')
      .filter((line) => !line.startsWith('#'));
    const columns = (lines[0] ?? '').split(',').map((cell) => cell.replace(/ \[.*/, ''));
    const row = (lines[1] ?? '')
      .split(',')
      .map((cell, i) => (i === 0 ? 'C1' : columns[i] === 'f_max' ? '90000' : cell));
    const { odd } = inspectTableText([lines[0], row.join(',')].join('\n'), 'mine.csv');
    expect(odd.map(({ name, what }) => [name, what])).toEqual([['C1', 'f_max']]);
  });

  test('names that the built-in table has, another currency, a price that rises with the pieces: remarks', () => {
    const header = HEADER.replaceAll('[EUR]', '[CHF]');
    const rows = [header, FIRST, own(SECOND, 'A2', { price_1: '0.1', price_100: '0.4' })].join('\n');
    const { remarks, currency } = inspectTableText(rows, 'mine.csv');
    expect(currency).toBe('CHF');
    expect(remarks).toEqual([
      `the built-in switches have ${FIRST.split(',')[0]} too: a sheet cannot use both tables`,
      'more pieces cost more each: A2',
      'prices are in CHF, those of the built-in tables in EUR: a sheet cannot use both',
    ]);
  });
});

describe('parts template', () => {
  test.each(BUILT_IN_TABLES)(
    'of $file explains every column and reads once rows stand below it',
    async ({ kind, file }) => {
      const { stdout, status } = await chopfront('parts', 'template', file.replace('.csv', ''));
      expect(status).toBe(0);
      const lines = stdout.trimEnd().split('\n');
      const header = `${lines.at(-1)}\n`;
      expect(header).toBe(tableTemplate(kind));
      for (const cell of header
        .trim()
        .split(',')
        .filter((name) => !/^price_1000+ /.test(name))) {
        const comment = lines.find((line) => line.startsWith(`#   ${cell} `));
        expect(comment?.length ?? 0, cell).toBeGreaterThan(`#   ${cell} `.length + 8);
      }
      // The built-in rows, put under the template's header by the names of their columns.
      const [head = '', ...rows] = projectText(`model/tables/${file}`)
        .split('\n')
        .filter((line) => !/^#|^$/.test(line));
      const names = head.split(',');
      const moved = rows.map((row) => {
        const cells = row.split(',');
        return header
          .trim()
          .split(',')
          .map((name) => cells[names.indexOf(name)] ?? '')
          .join(',');
      });
      const read = readTable(kind, `${stdout}${moved.join('\n')}\n`, 'mine.csv');
      expect(read.ok ? [] : read.findings.map(describeFinding)).toEqual([]);
    },
  );

  test('there is one for each kind, written to a file only where none stands', async () => {
    expect(BUILT_IN_TABLES.map(({ kind }) => kind)).toEqual(PART_KINDS);
    const path = join(newFolder(), 'mine.csv');
    expect(await chopfront('parts', 'template', 'diodes', '--out', path)).toMatchObject({ status: 0, stdout: '' });
    expect(await chopfront('parts', 'template', 'diodes', '--out', path)).toMatchObject({ status: 2 });
    expect(await chopfront('parts', 'template', 'diodes', '--out', path, '--force')).toMatchObject({ status: 0 });
    const empty = await chopfront('parts', 'check', path);
    expect(empty.stdout).toContain('found a header without rows; allowed: one row for each part');
    expect(empty.status).toBe(2);
  });

  test('an unknown kind is answered with the nearest', async () => {
    const { status, stderr } = await chopfront('parts', 'template', 'inductor');
    expect(status).toBe(2);
    expect(stderr).toContain('no kind of parts table named inductor; there are: switches, ');
    expect(stderr).toContain('did you mean inductors?');
  });
});

/** The demo sheet in a folder with other files beside it, and `parts` in it. */
function sheetWith(parts: string, files: Readonly<Record<string, string>> = {}, sheet = BUOY): string {
  const folder = newFolder();
  for (const [name, text] of Object.entries(files)) writeFileSync(join(folder, name), text);
  writeFileSync(join(folder, 'rail.yaml'), `${sheet}\nparts:\n  ${parts}\n`);
  return join(folder, 'rail.yaml');
}

function problemIn(path: string): RailProblem {
  const inputs = readSheet(path);
  const made = createRailProblem(inputs.rail, inputs.tables);
  if (!made.ok) throw new Error(made.findings.map(describeFinding).join('\n'));
  return made.value;
}

const switchesOf = (problem: RailProblem): string[] => problem.catalogue.highSwitches.map(({ name }) => name);
const lineOf = (path: string, text: string): number =>
  readFileSync(path, 'utf8')
    .split('\n')
    .findIndex((line) => line.includes(text)) + 1;

describe('own tables in a sheet', () => {
  const mine = table(own(FIRST, 'MINE-1'), own(SECOND, 'MINE-2'));

  test('stand beside the built-in ones', () => {
    const names = switchesOf(problemIn(sheetWith('tables: [built-in, mine.csv]', { 'mine.csv': mine })));
    expect(names).toContain('MINE-1');
    expect(names).toContain(FIRST.split(',')[0]);
  });

  test('stand instead of them where the sheet leaves built-in out', () => {
    const others = Object.fromEntries(
      BUILT_IN_TABLES.filter(({ kind }) => kind !== 'switches').map(({ file }) => [
        file,
        projectText(`model/tables/${file}`),
      ]),
    );
    const files = { ...others, 'mine.csv': mine };
    const names = switchesOf(problemIn(sheetWith(`tables: [${Object.keys(files).join(', ')}]`, files)));
    expect(names.sort()).toEqual(['MINE-1', 'MINE-2']);
  });

  test('must not repeat a built-in name', () => {
    const path = sheetWith('tables: [built-in, mine.csv]', { 'mine.csv': table(FIRST) });
    expect(() => readSheet(path)).toThrow(
      `mine.csv: name: found ${FIRST.split(',')[0]}, which switches.csv has too; allowed: each name once over all tables`,
    );
  });

  test('must be in the currency of the sheet, and so must the built-in ones', () => {
    const swiss = mine.replaceAll('[EUR]', '[CHF]');
    expect(() => readSheet(sheetWith('tables: [built-in, mine.csv]', { 'mine.csv': swiss }))).toThrow(
      'mine.csv: currency: found prices in CHF; allowed: prices in EUR, one currency for a sheet and its tables',
    );
    const sheet = BUOY.replace('quantity: 1000', 'quantity: 1000\ncurrency: CHF');
    expect(() => readSheet(sheetWith('tables: [built-in]', {}, sheet))).toThrow(
      'switches.csv: currency: found prices in EUR; allowed: prices in CHF',
    );
  });

  test('have price breaks: the quantity of the sheet chooses the price of a piece', () => {
    const breaks = own(FIRST, 'MINE-1', { price_1: '4', price_100: '3', price_1000: '2', price_10000: '1' });
    const priceFor = (pieces: number): number | undefined => {
      const sheet = BUOY.replace('quantity: 1000', `quantity: ${pieces}`);
      const parts = 'tables: [built-in, mine.csv]\n  prefer: [MINE-1]';
      const problem = problemIn(sheetWith(parts, { 'mine.csv': table(breaks) }, sheet));
      const genes = new Float64Array(problem.genes.length);
      problem.snap(genes);
      const part = problem.assess(genes).parts.find(({ name }) => name === 'MINE-1');
      return part === undefined ? undefined : part.cost / part.count;
    };
    expect([1, 99, 100, 1000, 9999, 10_000].map(priceFor)).toEqual([4, 4, 3, 2, 2, 1]);
  });

  test('have stock: a design that needs more pieces than there are says so', () => {
    const rows = `${HEADER},stock\n${own(FIRST, 'MINE-1')},300\n`;
    const parts = 'tables: [built-in, mine.csv]\n  prefer: [MINE-1]';
    const problem = problemIn(sheetWith(parts, { 'mine.csv': rows }));
    const genes = new Float64Array(problem.genes.length);
    problem.snap(genes);
    const assessment = problem.assess(genes);
    const count = assessment.parts.reduce((sum, part) => sum + (part.name === 'MINE-1' ? part.count : 0), 0);
    expect(stockLines(assessment, problem)).toEqual([`  - MINE-1: 300 in stock, ${1000 * count} needed`]);
  });
});

describe('parts barred and preferred', () => {
  const name = FIRST.split(',')[0] ?? '';

  test('a barred part is never chosen from', () => {
    expect(switchesOf(problemIn(sheetWith('bar: []')))).toContain(name);
    expect(switchesOf(problemIn(sheetWith(`bar: [${name}]`)))).not.toContain(name);
  });

  test('preferred parts alone are chosen from, for their kind', () => {
    const problem = problemIn(sheetWith(`prefer: [${name}]`));
    expect(switchesOf(problem)).toEqual([name]);
    expect(problem.catalogue.controllers.length).toBeGreaterThan(1);
  });

  test('materials and conductors can be barred too', () => {
    const sheet = BUOY.replace('search:', 'search:\n  wound-chokes: yes');
    const before = problemIn(sheetWith('bar: []', {}, sheet)).catalogue;
    const [material, conductor] = [before.materials[0]?.name ?? '', before.conductors[0]?.name ?? ''];
    const after = problemIn(sheetWith(`bar: [${material}, ${conductor}]`, {}, sheet)).catalogue;
    expect(after.materials.map((row) => row.name)).not.toContain(material);
    expect(after.conductors.map((row) => row.name)).not.toContain(conductor);
    expect(after.materials).toHaveLength(before.materials.length - 1);
  });

  test('a name that no table holds is refused at its line, with the nearest', () => {
    const path = sheetWith(`bar: [SW-025-0.9]\n  prefer:\n    - ${name}\n    - nothing-like-it`);
    const file = path;
    expect(() => readSheet(path)).toThrow(
      `${file}:${lineOf(path, 'bar:')}:9: parts.bar[1]: found SW-025-0.9, which no table holds; ` +
        `allowed: the name of a part in one of the sheet's tables; nearest known: ${name}`,
    );
    expect(() => readSheet(path)).toThrow(
      `${file}:${lineOf(path, 'nothing-like-it')}:7: parts.prefer[2]: found nothing-like-it, which no table holds`,
    );
  });

  test('where nothing usable is left, the message says what left it so', async () => {
    const switches = readTable('switches', projectText('model/tables/switches.csv'), 'switches.csv');
    if (!switches.ok) throw new Error('the built-in switches do not read');
    const path = sheetWith(`bar: [${switches.value.map((row) => row.name).join(', ')}]`);
    const { status, stderr } = await chopfront('sweep', path, '--out', join(newFolder(), 'run'));
    expect(status).toBe(3);
    expect(stderr).toContain('parts.switches: found no usable row; allowed: at least one row with a rating');
    expect(stderr).toContain('among those that parts.bar and parts.prefer leave');
  });
});

describe('hostile names', () => {
  const HOSTILE = ['<b>x</b>', '</script>', '"quoted', '\u001b[2J', '\u202egnp', '=1+1', 'x'.repeat(10_000)];
  const expectMereText = (text: string): void => {
    for (const line of text.split('\n')) {
      expect(line).not.toMatch(/[\p{Cc}\p{Cf}]/u);
      expect(line.length).toBeLessThan(1000);
    }
  };

  test.each(HOSTILE)('%j as a part is refused, and shown as text', async (name) => {
    const text = table(own(FIRST, `"${name.replaceAll('"', '""')}"`));
    const report = inspectTableText(text, 'mine.csv');
    expect(report.rejected).toBe(1);
    expectMereText(reportText(report, (line) => line));
  });

  test.each(HOSTILE)('%j as a rail, a part to bar and a table is refused, and shown as text', (name) => {
    const quoted = JSON.stringify(name);
    const path = sheetWith(
      `tables: [built-in, ${quoted}]\n  bar: [${quoted}]`,
      {},
      BUOY.replace('rail: buoy-sensors', `rail: ${quoted}`),
    );
    expect(() => readSheet(path)).toThrow(/rail\.yaml:\d+:\d+: /);
    try {
      readSheet(path);
    } catch (error) {
      expectMereText(error instanceof Error ? error.message : '');
    }
  });

  test('JSON on stdout holds them escaped: it reads back the same and steers no terminal', async () => {
    const folder = newFolder();
    const name = 'mine\u202e\u009b2J.csv';
    writeFileSync(join(folder, name), table(own(FIRST, 'A1')));
    const { stdout, status } = await chopfront('parts', 'check', join(folder, name), '--json');
    expect(status).toBe(0);
    expectMereText(stdout);
    expect(JSON.parse(stdout)[0].file).toBe(join(folder, name));
  });

  // Names that a table may hold: what a spreadsheet would take for a formula, or for two cells, is not among them.
  test('no allowed name begins a formula or breaks a row of a CSV', () => {
    for (const name of ['=A', '+A', '-A', '@A', 'A,B', 'A"B', 'A\tB', 'A;B']) {
      const { rejected } = inspectTableText(table(own(FIRST, `"${name.replaceAll('"', '""')}"`)), 'mine.csv');
      expect(rejected, name).toBe(1);
    }
  });
});
