/** What the documents name is there: links, anchors, paths, scripts, commands, exit statuses, tables, sheets. */
import { existsSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { BUILT_IN_TABLES, OBJECTIVES, readRail, SHIPPED_RAILS } from '../../model/index.ts';
import { STAGES } from '../../model/stages/list.ts';
import { STATUS } from '../../runners/errors.ts';
import { ROOT, readText, trackedPaths, trackedTexts } from '../support/project.ts';
import { anchorsOf, blocksOf, linksOf, spansOf } from './markdown.ts';

const tracked = trackedPaths();
const documents = trackedTexts(/\.md$/).filter(({ path }) => path !== 'test/evidence.md');
const readme = readText('README.md');
const scripts = Object.keys(JSON.parse(readText('package.json')).scripts);
const commands = trackedTexts(/^runners\/commands\/.*\.ts$/).flatMap(({ text }) =>
  [...text.matchAll(/\.command\('([\w ]+)'/g)].map(([, name = '']) => name),
);
/** A folder of the project, or a file in one, written as code. */
const PATH = /^(?:model|optimizer|runners|viz|test|\.ci)\/[\w./@-]*$/;

describe.each(documents.map(({ path, text }) => ({ path, text })))('$path', ({ path, text }) => {
  test('every link leads to a file or heading that is there', () => {
    const broken = linksOf(text).filter((target) => {
      const [file = '', anchor] = target.split('#');
      if (/^[a-z]+:/.test(file)) return false;
      const there = file === '' ? path : join(dirname(path), file);
      if (!existsSync(join(ROOT, there))) return true;
      return anchor !== undefined && !anchorsOf(readText(there)).includes(anchor);
    });
    expect(broken).toEqual([]);
  });

  test('every path written as code is tracked', () => {
    const missing = spansOf(text).filter(
      (span) => PATH.test(span) && !tracked.some((file) => file === span || file.startsWith(span.replace(/\/?$/, '/'))),
    );
    expect(missing).toEqual([]);
  });

  test('every npm script and chopfront command that is named exists', () => {
    const named = [...text.matchAll(/npm run (?:--silent )?([\w:-]+)/g)].map(([, name = '']) => name);
    expect(named.filter((name) => !scripts.includes(name))).toEqual([]);
    const used = [...text.matchAll(/(?:^\$ |`|&& )chopfront ([a-z]+)/gm)].map(([, name = '']) => name);
    expect(used.filter((name) => ![...commands, 'help'].includes(name))).toEqual([]);
  });
});

describe('DEVELOPERS.md', () => {
  test('names every variable of the environment that is the project’s own', () => {
    const texts = [...trackedTexts(/^(runners|test)\/.*\.ts$/), ...trackedTexts(/^\.ci\/run$/)].map(({ text }) => text);
    const used = new Set(texts.flatMap((text) => text.match(/\bCHOPFRONT_[A-Z]\w+/g) ?? []));
    expect(used.size).toBeGreaterThan(3);
    expect([...used].filter((name) => !readText('DEVELOPERS.md').includes(name))).toEqual([]);
  });
});

describe('README.md', () => {
  test('names every command, exit status, scenario, kind of table, objective and architecture', () => {
    const unnamed = commands.filter((name) => !new RegExp(`chopfront (\\w+ )?${name}\\b`).test(readme));
    expect(unnamed).toEqual([]);
    const names = [
      ...Object.values(STATUS).map((status) => `| ${status} |`),
      ...SHIPPED_RAILS.map((file) => `\`${file.replace('.yaml', '')}\``),
      ...BUILT_IN_TABLES.map(({ file }) => `\`${file}\``),
      ...OBJECTIVES.map((name) => `\`${name}\``),
      ...STAGES.map(({ architecture }) => `\`${architecture}\``),
    ];
    expect(names.filter((name) => !readme.includes(name))).toEqual([]);
  });

  test('every rail sheet shown is a good sheet', () => {
    const sheets = blocksOf(readme).filter(({ language, text }) => language === 'yaml' && /^rail:/m.test(text));
    expect(sheets.length).toBeGreaterThan(0);
    for (const { text } of sheets) expect(readRail(text, 'shown.yaml')).toMatchObject({ ok: true });
  });
});
