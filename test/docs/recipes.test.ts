/**
 * The recipes of DEVELOPERS.md, followed for real in a copy of the tree: each adds one thing by changing the files that its text
 * names and no other; the copy builds, keeps the tests that the recipes point to, and its command uses everything added.
 */
import { execFileSync, spawnSync } from 'node:child_process';
import { cpSync, mkdirSync, mkdtempSync, readFileSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { ROOT, readText, trackedPaths } from '../support/project.ts';
import { spansOf } from './markdown.ts';
import { ARCHITECTURE } from './recipes/architecture.ts';
import { COMMAND } from './recipes/command.ts';
import { ENGINE } from './recipes/engine.ts';
import { LIMIT } from './recipes/limit.ts';
import { OBJECTIVE } from './recipes/objective.ts';
import { PART_KIND } from './recipes/part-kind.ts';
import { isNew, makeEdits, type Recipe } from './recipes/recipe.ts';
import { VIEW } from './recipes/view.ts';

const RECIPES = [ARCHITECTURE, LIMIT, PART_KIND, OBJECTIVE, ENGINE, VIEW, COMMAND];
const developers = readText('DEVELOPERS.md');
const PATH = /^(?:model|optimizer|runners|viz|test)\/[\w./-]*$|^README\.md$/;

/** Text of the recipe under `heading`. */
function textOf(heading: string): string {
  const [, after = ''] = developers.split(`\n### ${heading}\n`);
  return after.split(/\n##+ /)[0] ?? '';
}

describe.each(RECIPES)('the recipe “$heading”', ({ heading, edits, besides }: Recipe) => {
  const named = spansOf(textOf(heading)).filter((span) => PATH.test(span));
  const touched = edits.map(({ path }) => path);
  // A new file may be named by the folder that it goes into.
  const names = (path: string): boolean => named.includes(path) || named.includes(`${dirname(path)}/`);

  test('names every file that following it touches', () => {
    const unnamed = edits.filter((edit) => !(isNew(edit) ? names(edit.path) : named.includes(edit.path)));
    expect(unnamed.map(({ path }) => path)).toEqual([]);
  });

  test('names nothing that this example neither touches nor sets aside', () => {
    const used = (span: string): boolean =>
      touched.includes(span) || touched.some((path) => dirname(path) === span.slice(0, -1));
    expect(named.filter((span) => !used(span)).sort()).toEqual([...besides].sort());
  });
});

test('DEVELOPERS.md has no recipe that is not followed here', () => {
  const [, recipes = ''] = developers.split('\n## Recipes\n');
  const headings = [...(recipes.split('\n## ')[0] ?? '').matchAll(/^### (.*)$/gm)].map(([, heading]) => heading);
  expect(headings).toEqual(RECIPES.map(({ heading }) => heading));
});

test('an architecture is one new file and one list, but for the name in the README', () => {
  expect([...new Set(ARCHITECTURE.edits.map(({ path }) => path))]).toEqual([
    'model/stages/half-duty-buck.ts',
    'model/stages/list.ts',
    'README.md',
  ]);
});

describe('a copy of the tree in which all of them were followed', () => {
  const copy = mkdtempSync(join(tmpdir(), 'chopfront-recipes-'));
  const work = join(copy, 'work');
  afterAll(() => rmSync(copy, { recursive: true, force: true }));

  beforeAll(() => {
    for (const path of trackedPaths()) cpSync(join(ROOT, path), join(copy, path), { recursive: true });
    symlinkSync(join(ROOT, 'node_modules'), join(copy, 'node_modules'));
    for (const { edits } of RECIPES) makeEdits(copy, edits);
    mkdirSync(work);
    writeFileSync(join(work, 'rail.yaml'), SHEET);
    // Tests that read the tree ask git for its files.
    execFileSync('git', ['init', '--quiet'], { cwd: copy });
    execFileSync('git', ['add', '--all', '--', '.', ':!node_modules'], { cwd: copy });
  });

  test('compiles, strict, and is built', () => {
    const { status, stdout, stderr } = spawnSync('npm', ['run', '--silent', 'build'], { cwd: copy, encoding: 'utf8' });
    expect(`${stdout}${stderr}`).toBe('');
    expect(status).toBe(0);
  });

  test('keeps the tests that the recipes point to', () => {
    const files = [
      'docs/links',
      'viz/words',
      'viz/drawings',
      'runners/errors-table',
      'model/limits',
      'model/parts/join',
    ];
    const args = ['run', '--config', 'test/vitest.config.ts', ...files.map((file) => `test/${file}.test.ts`)];
    const program = join(ROOT, 'node_modules', 'vitest', 'vitest.mjs');
    const { status, stdout } = spawnSync(process.execPath, [program, ...args], { cwd: copy, encoding: 'utf8' });
    expect(stdout).toContain('passed');
    expect(stdout).not.toContain('failed');
    expect(status).toBe(0);
  });

  test('searches the new architecture with the new fuse under the new limit for the new objective, and draws the new view', () => {
    run('sweep', 'rail.yaml', '--out', 'plain', '--evaluations', '4k', '--threads', '2');
    const [header = '', first = ''] = textIn('plain/front.csv').split(/\r?\n/);
    const columns = header.split(',');
    expect(columns).toEqual(expect.arrayContaining(['fuse', 'tallness [mm]']));
    expect(header).toContain('placements');
    const cell = (name: string): string => first.split(',')[columns.indexOf(name)] ?? '';
    expect(cell('family')).toMatch(/^half-duty-buck ×\d$/);
    expect(cell('fuse')).toMatch(/^FU-(4|10)$/);
    const page = textIn('plain/page.html');
    expect(page).toMatch(/<table class="tally"><tr><th scope="row">half-duty-buck ×\d<\/th><td>\d+<\/td>/);
    const shown = run('show', 'plain', cell('id'));
    expect(shown).toMatch(/fuse\s+1 ×\s+FU-/);
    expect(shown).toMatch(/holds {2}parts to place\s+\d+\s+at most 40/);
  });

  test('comes to the same bytes on the new engine', () => {
    run('sweep', 'rail.yaml', '--out', 'checked', '--evaluations', '4k', '--no-page');
    expect(textIn('checked/front.csv')).toBe(textIn('plain/front.csv'));
  });

  test('reads a table of the new kind, and runs the new command', () => {
    expect(run('parts', 'template', 'fuses')).toContain('rated current');
    expect(run('parts', 'check', '../model/tables/fuses.csv')).toContain('fuses, 2 rows');
    expect(run('age', 'plain')).toMatch(/^plain: began \d{4}-/);
  });

  function run(...args: readonly string[]): string {
    const program = join(copy, 'dist', 'runners', 'chopfront.js');
    const env = { ...process.env, CHECKED: args.includes('checked') ? 'yes' : 'no' };
    const { status, stdout, stderr } = spawnSync(process.execPath, [program, ...args], {
      cwd: work,
      env,
      encoding: 'utf8',
    });
    expect(status, stderr).toBe(0);
    return stdout;
  }

  function textIn(path: string): string {
    return readFileSync(join(work, path), 'utf8');
  }
});

const SHEET = `rail: recipes
input: {voltage: {min: 18 V, nominal: 24 V, max: 32 V}}
output: {voltage: 5 V, current: 6 A, ripple: 30 mV}
limits: {placements: 40, height: 8 mm}
search: {architectures: [half-duty-buck], phases: {from: 1, to: 2}}
objectives: [loss, volume, tallness]
advanced: {islands: 4, population: 50, epoch-generations: 10}
`;
