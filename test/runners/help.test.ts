/** Help: each command explains itself with examples that the program understands, in no colour, without loading what is heavy. */
import { spawnSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, test } from 'vitest';
import { SHIPPED_RAILS } from '../../model/index.ts';
import { STATUS } from '../../runners/errors.ts';
import { chopfront, newFolder, startChopfront } from './processes.ts';

const CHOPFRONT = new URL('../../dist/runners/chopfront.js', import.meta.url);
/** Every command by its words, such as `parts check`, with its help. */
const helps = new Map<string, string>();

beforeAll(async () => {
  await gather('');
});

async function gather(path: string): Promise<void> {
  const { stdout, stderr, status } = await chopfront(...path.split(' ').filter((word) => word !== ''), '--help');
  expect([status, stderr]).toEqual([0, '']);
  helps.set(path, stdout);
  const below = /^Commands:\n((?: .*\n)+)/m.exec(stdout)?.[1] ?? '';
  for (const [, name = ''] of below.matchAll(/^ {2}(\w+)/gm)) {
    if (name !== 'help') await gather(`${path} ${name}`.trim());
  }
}

/** Lines of the examples, each as words without the program's name. */
function examplesIn(help: string): string[][] {
  const block = help.slice(help.indexOf('Examples:'));
  return [...block.matchAll(/^ {2}chopfront (.+)$/gm)].map(([, line = '']) =>
    (line.split(/ {2,}|\s\|/)[0] ?? '').trim().split(' '),
  );
}

describe('the help of every command', () => {
  test('reaches all of them', () => {
    expect(helps.size).toBeGreaterThan(14);
    expect([...helps.keys()]).toContain('parts template');
  });

  test('has examples, and each begins with the command itself', () => {
    for (const [path, help] of helps) {
      const examples = examplesIn(help);
      expect(examples.length, path).toBeGreaterThan(0);
      for (const words of examples) expect(words.join(' '), path).toMatch(new RegExp(`^${path}`));
    }
  });

  test('has only examples that the program understands: none is refused as a command line', async () => {
    const lines = [...new Set([...helps.values()].flatMap(examplesIn).map((words) => words.join(' ')))];
    for (const line of lines) {
      // Each in an empty folder of its own, where a sheet or run that it names is missing: no example sweeps here.
      const { stderr } = await startChopfront(line.split(' '), {}, newFolder()).ended;
      expect(stderr, line).not.toMatch(/; see: chopfront|internal fault/);
    }
  });

  test('says what each command and option is for', () => {
    for (const [path, help] of helps) {
      expect(help, path).toMatch(/^Usage: chopfront/);
      for (const line of help.split('\n').filter((one) => /^ {2}-/.test(one))) {
        expect(line.trim(), path).toMatch(/ {2,}\S|>$/);
      }
    }
  });

  test('has no colour, on whatever it is printed', () => {
    for (const help of helps.values()) expect(help).not.toContain('\u001b');
  });

  test('fits into 120 columns', () => {
    for (const [path, help] of helps) {
      for (const line of help.split('\n')) expect(line.length, `${path}: ${line}`).toBeLessThanOrEqual(120);
    }
  });

  test('lists every exit status', () => {
    const help = helps.get('') ?? '';
    for (const status of Object.values(STATUS)) expect(help).toMatch(new RegExp(`\\b${status}\\b`));
  });

  test('of draft lists every scenario with a word about it', () => {
    for (const file of SHIPPED_RAILS) {
      expect(helps.get('draft')).toMatch(new RegExp(`^  ${file.replace('.yaml', '')} {2,}\\S`, 'm'));
    }
  });
});

describe('a mistyped command line', () => {
  test.each([
    [['check'], "missing required argument 'sheet'; see: chopfront check --help"],
    [['parts', 'check'], "missing required argument 'file'; see: chopfront parts check --help"],
    [['swep'], "unknown command 'swep'; did you mean sweep?; see: chopfront --help"],
  ])('%j names the help of its command', async (args, text) => {
    const { stderr, status } = await chopfront(...args);
    expect([status, stderr]).toEqual([2, `chopfront: ${text}\n`]);
  });
});

describe('start-up', () => {
  /** Files that Node loads for a command line, its own left out. */
  function loaded(...args: string[]): string[] {
    const hook = `data:text/javascript,${encodeURIComponent(
      "import { register } from 'node:module'; register('data:text/javascript,' + encodeURIComponent(" +
        "`import { appendFileSync } from 'node:fs'; export async function load(url, context, next) {" +
        " appendFileSync(process.env.LOADED, url + '\\\\n'); return next(url, context); }`));",
    )}`;
    const list = join(newFolder(), 'loaded');
    const { status } = spawnSync(process.execPath, ['--import', hook, CHOPFRONT.pathname, ...args], {
      env: { ...process.env, LOADED: list },
    });
    expect(status).toBe(0);
    return readFileSync(list, 'utf8')
      .split('\n')
      .filter((url) => url.startsWith('file:'));
  }

  test.each(['--help', '--version', 'sweep --help', 'parts --help'])('%s loads no heavy module', (line) => {
    const files = loaded(...line.split(' '));
    expect(files.length).toBeGreaterThan(10);
    expect(files.length).toBeLessThan(50);
    const packages = files.flatMap((url) => /node_modules\/((?:@[^/]+\/)?[^/]+)/.exec(url)?.[1] ?? []);
    expect([...new Set(packages)]).toEqual(['commander']);
    expect(files.filter((url) => /dist\/(viz|optimizer|model\/index)/.test(url))).toEqual([]);
  });
});
