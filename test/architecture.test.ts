/** The rooms keep to the README's folder map, and the whole tree to what a stranger may expect of it. */
import { spawnSync } from 'node:child_process';
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { readFolderMap } from './support/folder-map.ts';
import { ROOT, readText, trackedPaths, trackedTexts } from './support/project.ts';
import { brokenImports, cycles, forbiddenImports, forbiddenNames, unportableMaths } from './support/rules.ts';
import { parseFile } from './support/syntax.ts';
import { packagesOf, unusedExports } from './support/unused.ts';
import { wordsToAvoid } from './support/words.ts';

const map = readFolderMap(readText('README.md'));
const tracked = trackedPaths();
const files = trackedTexts(/\.ts$/).map(parseFile);
/** What the package's `exports` open to other programs. */
const FACES = ['optimizer/index.ts', 'model/index.ts'];
/** Files that are started, or loaded by their name, and not imported. */
const STARTED =
  /^(runners\/(chopfront|demo|build|refresh|engines\/(worker|rail-problem))|viz\/live|test\/(.*(\.test|\.config|\.d)|runners\/toy|support\/(temporary|seeded)))\.ts$/;

const manifest: Record<'dependencies' | 'devDependencies' | 'peerDependencies', Record<string, string>> = JSON.parse(
  readText('package.json'),
);
const runtime = Object.keys(manifest.dependencies);
/** Used where they are installed, and done without where not. */
const optional = Object.keys(manifest.peerDependencies);
const development = Object.keys(manifest.devDependencies);
const inRooms = files.filter(({ path }) => !path.startsWith('test/'));

/** A file that is not there, to show that a rule sees what it forbids. */
const planted = (path: string, text: string) => [parseFile({ path, text })];

describe('the rooms', () => {
  test('import what the folder map allows and nothing else', () => {
    expect(forbiddenImports(files, map)).toEqual([]);
  });

  test.each([
    ['optimizer/x.ts', "import { a } from '../model/index.ts';"],
    ['optimizer/x.ts', "import type { Rail } from '../model/rail/rail.ts';"],
    ['model/x.ts', "import { a } from '../optimizer/search.ts';"],
    ['model/x.ts', "export * from '../viz/page.ts';"],
    ['model/x.ts', "type P = import('../runners/errors.ts').Refusal;"],
    ['model/x.ts', "const fs = await import('node:fs');"],
    ['viz/x.ts', "import { a } from '../runners/main.ts';"],
    ['viz/x.ts', "import { readFileSync } from 'node:fs';"],
    ['runners/x.ts', "import { test } from 'vitest';"],
    ['runners/x.ts', "import { a } from '../test/support/project.ts';"],
  ])('%s: %s would be refused', (path, text) => {
    expect(forbiddenImports(planted(path, text), map)).toHaveLength(1);
  });

  test('use neither Node, nor the DOM, nor the clock, nor chance where the map does not say so', () => {
    expect(forbiddenNames(files, map)).toEqual([]);
  });

  test.each([
    ['model/x.ts', 'export const now = Date.now();'],
    ['optimizer/x.ts', 'export const now = () => performance.now();'],
    ['optimizer/x.ts', 'export const draw = Math.random;'],
    ['model/x.ts', 'export const id = process.pid;'],
    ['model/x.ts', 'export const here = import.meta.url;'],
    ['model/x.ts', 'export const f = (e: HTMLElement) => e;'],
    ['optimizer/x.ts', 'export const g = globalThis;'],
    ['viz/x.ts', 'export const year = new Date().getFullYear();'],
    ['runners/x.ts', 'export const d = document.body;'],
  ])('%s: %s would be refused', (path, text) => {
    expect(forbiddenNames(planted(path, text), map)).toHaveLength(1);
  });

  test('a local name, a key or a comment is no use of the platform', () => {
    const text =
      '/** Date, process */ export function f(document: number, o: { Date: 1 }) { return document + o.Date; }';
    expect(forbiddenNames(planted('model/x.ts', text), map)).toEqual([]);
  });

  test('do not load each other in a circle', () => {
    expect(cycles(files)).toEqual([]);
    const a = planted('model/a.ts', "import { b } from './b.ts'; export const a = b;");
    const b = planted('model/b.ts', "import { a } from './a.ts'; export const b = () => a;");
    expect(cycles([...a, ...b])).toEqual(['model/a.ts → model/b.ts → model/a.ts']);
    const contract = planted('model/b.ts', "import type { a } from './a.ts'; export const b = (f: typeof a) => f;");
    expect(cycles([...a, ...contract])).toEqual([]);
  });

  test('import only files that git tracks', () => {
    expect(brokenImports(files, new Set(tracked))).toEqual([]);
  });
});

describe('the same bits on every engine', () => {
  test('the pure rooms use no function of Math that engines disagree on', () => {
    expect(unportableMaths(files)).toEqual([]);
  });

  // One list of examples for both guards: this test's own rule, and the lint rule that an editor shows.
  const refused = [
    'Math.exp(1)',
    'Math.pow(2, 3)',
    'Math.hypot(1, 2)',
    '[1].map(Math.sin)',
    '2 ** 3',
    'Math["log"](2)',
  ];
  const allowed = ['Math.sqrt(2)', 'Math.max(1, 2) + Math.PI', 'Math.imul(3, 4)', '[1].map(Math.fround)'];
  const example = (expression: string) => `/** Example. */\nexport const value = ${expression};\n`;

  test.each(refused)('%s is refused', (expression) => {
    expect(unportableMaths(planted('model/x.ts', example(expression)))).toHaveLength(1);
  });

  test.each(allowed)('%s is allowed', (expression) => {
    expect(unportableMaths(planted('model/x.ts', example(expression)))).toEqual([]);
  });

  test('the lint rule refuses and allows the same in both pure rooms, and leaves the others alone', () => {
    const folder = lintFolder();
    for (const room of ['model', 'optimizer', 'viz', 'runners']) {
      refused.forEach((expression, i) => {
        folder.write(`${room}/refused-${i}.ts`, example(expression));
      });
      allowed.forEach((expression, i) => {
        folder.write(`${room}/allowed-${i}.ts`, example(expression));
      });
    }
    const expected = ['model', 'optimizer'].flatMap((room) => refused.map((_, i) => `${room}/refused-${i}.ts`));
    expect([...folder.complainedOf()].sort()).toEqual(expected);
    folder.remove();
  });
});

/** A folder with the project's lint rules, for files that break them. */
function lintFolder() {
  const folder = mkdtempSync(join(tmpdir(), 'chopfront-lint-'));
  const write = (path: string, text: string): void => {
    mkdirSync(dirname(join(folder, path)), { recursive: true });
    writeFileSync(join(folder, path), text);
  };
  const settings = JSON.parse(readText('.biome.json'));
  write('.biome.json', JSON.stringify({ ...settings, vcs: { enabled: false } }));
  for (const { path, text } of trackedTexts(/^test\/lint\//)) write(path, text);
  return {
    write,
    /** The files in which a rule of the project's own finds something. */
    complainedOf(): ReadonlySet<string> {
      const biome = join(ROOT, 'node_modules', '.bin', 'biome');
      const { stdout, stderr } = spawnSync(biome, ['lint', '--max-diagnostics=none'], {
        cwd: folder,
        encoding: 'utf8',
      });
      return new Set([...`${stdout}\n${stderr}`.matchAll(/^(\S+\.ts):\d+:\d+ plugin/gm)].map(([, path = '']) => path));
    },
    remove: () => rmSync(folder, { recursive: true }),
  };
}

describe('the tree', () => {
  test('holds at its top the five rooms and the few files a package needs', () => {
    const top = new Set(tracked.map((path) => path.split('/')[0] ?? ''));
    const visible = [...top].filter((name) => !name.startsWith('.')).sort();
    expect(visible).toEqual(
      ['DEVELOPERS.md', 'LICENSE', 'README.md', 'model', 'optimizer', 'package-lock.json', 'package.json'].concat([
        'runners',
        'test',
        'tsconfig.json',
        'viz',
      ]),
    );
  });

  test('says at the top of each file of the rooms why it exists', () => {
    const silent = inRooms.filter(({ path, hasHeader }) => !hasHeader && !path.endsWith('/index.ts'));
    expect(silent.map(({ path }) => path)).toEqual([]);
  });

  test('keeps index files to re-exports', () => {
    const indexes = inRooms.filter(({ path }) => path.endsWith('/index.ts'));
    expect(indexes.length).toBeGreaterThan(5);
    expect(indexes.filter(({ onlyReexports }) => !onlyReexports).map(({ path }) => path)).toEqual([]);
  });

  test('names nothing of the place where it was written', () => {
    const texts = trackedTexts(/^(?!DEVELOPERS\.md$)(?!.*\.(png|bin)$)/);
    expect(texts.flatMap(wordsToAvoid)).toEqual([]);
    expect(wordsToAvoid({ path: 'a.md', text: `see ${['', 'tmp', 'x'].join('/')}` })).toHaveLength(1);
  });
});

describe('nothing is left over', () => {
  test('every export is used by another file or opened to other programs', () => {
    const started = new Set(files.filter(({ path }) => STARTED.test(path)).map(({ path }) => path));
    const unused = unusedExports(files, FACES).filter((id) => !started.has(id.split(':')[0] ?? ''));
    expect(unused).toEqual([]);
  });

  test('an export that nothing takes, or only a re-export nobody takes, is seen', () => {
    const pair = [
      ...planted('model/a.ts', 'export const a = 1; export const b = 2; export const c = 3;'),
      ...planted('model/part/index.ts', "export { b } from '../a.ts';"),
      ...planted('model/d.ts', "import { c } from './a.ts'; c;"),
    ];
    expect(unusedExports(pair, [])).toEqual(['model/a.ts: a', 'model/a.ts: b', 'model/part/index.ts: b']);
  });

  test('the rooms use the runtime dependencies and the optional ones, all of them and no other package', () => {
    const used = packagesOf(inRooms.filter(({ path }) => path !== 'runners/build.ts'));
    expect([...used].sort()).toEqual([...runtime, ...optional].sort());
  });

  test('every development dependency is imported, typed for or started by name', () => {
    const scripts = ['package.json', '.ci/run', 'tsconfig.json', 'test/vitest.config.ts', ...STARTED_BY_NAME]
      .map(readText)
      .join('\n');
    const used = packagesOf(files);
    const unused = development.filter((name) => !used.has(name) && !isNeeded(name, scripts));
    expect(unused).toEqual([]);
  });
});

/** Files that name a package's own file by path. */
const STARTED_BY_NAME = trackedPaths().filter((path) => /^test\/(browser|viz|bench)\/.*\.ts$/.test(path));

function isNeeded(name: string, scripts: string): boolean {
  if (name.startsWith('@types/')) return [...runtime, ...development, 'node'].includes(name.slice('@types/'.length));
  const commands: Record<string, string> = {
    typescript: 'tsc -p',
    '@biomejs/biome': 'biome check',
    vitest: 'vitest run',
  };
  const command = commands[name] ?? `${name}/`;
  return scripts.includes(command);
}
