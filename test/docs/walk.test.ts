/**
 * The README, followed word for word: each `console` block's commands run in one new folder, in order, and print what the text
 * says; each `js` block runs as a program that has the package, and prints the `text` block after it. Figures follow the
 * model: after a change to it, `npm run readme` writes the README's outputs anew.
 */
import { execFileSync, spawnSync } from 'node:child_process';
import { mkdirSync, mkdtempSync, readFileSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { delimiter, join } from 'node:path';
import { afterAll, describe, expect, test } from 'vitest';
import { parse } from 'yaml';
import { balancedOf } from '../../runners/run-folder/representatives.ts';
import { ROOT, readText } from '../support/project.ts';
import { type Block, blocksOf, exchangesOf } from './markdown.ts';

const folder = mkdtempSync(join(tmpdir(), 'chopfront-walk-'));
mkdirSync(join(folder, 'bin'));
mkdirSync(join(folder, 'walk'));
symlinkSync(join(ROOT, 'dist', 'runners', 'chopfront.js'), join(folder, 'bin', 'chopfront'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

/** Whether to write instead of compare. */
const WRITING = (process.env.CHOPFRONT_WRITE_README ?? '') !== '';
/** How a progress line begins; how many there are depends on the machine, so the text shows none. */
const PROGRESS = /^\d+(\.\d+)? % done/;

let readme = readText('README.md');

describe('the walk of README.md', () => {
  const count = blocksOf(readme).filter(({ language }) => language === 'console').length;

  test('has commands', () => {
    expect(count).toBeGreaterThan(3);
  });

  test.each(Array.from({ length: count }, (_, index) => index))('console block %i prints what it says', (index) => {
    const block = blocksOf(readme).filter(({ language }) => language === 'console')[index];
    if (block === undefined) throw new Error('a block has gone');
    const really = exchangesOf(block).flatMap(({ command }) => {
      const now = current(command);
      return [`$ ${now}`, ...run(now)];
    });
    if (WRITING) write(block, really);
    else expect(really.join('\n')).toBe(block.text);
  });
});

/** Commands that need more than an empty folder: where each is run, and what stands there. */
const ELSEWHERE: Readonly<Record<string, readonly [file: string, ...words: string[]]>> = {
  'npm ci && npm run demo': ['.ci/run', 'npm ci ', 'npm run --silent demo'],
  'npm ci && npm test': ['.ci/run', 'npm ci ', 'npm test'],
  'npm ci && npm pack && npm install --global ./chopfront-0.1.0.tgz': [
    'test/package/package.test.ts',
    "'npm', ['pack'",
    "'install', '--global'",
  ],
  'chopfront sweep rail.yaml --out runs/big --on slurm --shards 16 --time 2h --partition batch --time-limit 03:00:00': [
    'test/cluster/slurm.test.ts',
    "'--on', 'slurm', '--partition'",
  ],
  'chopfront status runs/big': ['test/cluster/slurm.test.ts', "chopfront('status'"],
};

describe('the other commands of README.md', () => {
  const blocks = blocksOf(readme);

  test('are each run by a test or by the checks of a clean clone', () => {
    const shown = blocks.filter(({ language }) => language === 'sh').flatMap(({ text }) => text.split('\n'));
    expect(shown.map((line) => line.replace(/\s+# .*/, ''))).toEqual(Object.keys(ELSEWHERE));
    for (const [command, [file, ...words]] of Object.entries(ELSEWHERE)) {
      for (const word of words) expect(readText(file), command).toContain(word);
    }
  });

  test('the manifest for Kubernetes asks for as many shards as pods, and its command sweeps the shard of its pod', () => {
    const manifest = parse(blocks.find(({ text }) => text.includes('kind: Job'))?.text ?? '');
    const { completions, completionMode, template } = manifest.spec;
    const [{ command, volumeMounts }] = template.spec.containers;
    expect([completionMode, String(completions)]).toEqual(['Indexed', command[command.indexOf('--shards') + 1]]);
    expect(volumeMounts[0]).toEqual({ name: template.spec.volumes[0].name, mountPath: '/runs' });
    mkdirSync(join(folder, 'pod'));
    writeFileSync(join(folder, 'pod', 'rail.yaml'), readText('model/rails/buoy-sensors.yaml'));
    // The volume is a folder here, and a pod's share of the work an epoch.
    const [program, ...args]: string[] = command.map((word: string) =>
      word.replace('/runs', join(folder, 'pod')).replace('4M', '128k'),
    );
    const pod = spawnSync(join(folder, 'bin', program ?? ''), args, {
      env: { ...process.env, JOB_COMPLETION_INDEX: '3' },
      encoding: 'utf8',
    });
    expect(pod.status, pod.stderr).toBe(0);
    const record = JSON.parse(readFileSync(join(folder, 'pod', 'big', 'shard-00003', 'run.json'), 'utf8'));
    expect(record).toMatchObject({ status: 'done', shard: 3, shards: 16 });
  });
});

describe('the programs of README.md', () => {
  const blocks = blocksOf(readme);
  const programs = blocks.flatMap((block, i) => (block.language === 'js' ? [{ i, line: block.line }] : []));

  test.each(programs)('the program on line $line runs and prints the block after it', ({ i }) => {
    const [program, shown] = blocksOf(readme).slice(i, i + 2);
    if (program === undefined || shown?.language !== 'text')
      throw new Error('a js block without a text block after it');
    const output = execFileSync(process.execPath, ['--input-type=module', '-e', program.text], {
      cwd: ROOT,
      encoding: 'utf8',
    });
    if (WRITING) write(shown, output.trimEnd().split('\n'));
    else expect(output.trimEnd()).toBe(shown.text);
  });
});

/** Runs one command in the walk's folder; what it printed, line by line. */
function run(command: string): readonly string[] {
  const path = [join(folder, 'bin'), process.env.PATH].join(delimiter);
  const { stdout } = spawnSync('bash', ['-o', 'pipefail', '-c', `{ ${command}; } 2>&1`], {
    cwd: join(folder, 'walk'),
    env: { ...process.env, PATH: path, NO_COLOR: '1' },
    encoding: 'utf8',
  });
  const lines = stdout
    .replace(/\n$/, '')
    .split('\n')
    .filter((line) => !PROGRESS.test(line));
  return lines.length === 1 && lines[0] === '' ? [] : lines.map((line) => line.trimEnd());
}

/** The command as it stands, or, when writing, with the balanced design of the walk's run in place of the one named before. */
function current(command: string): string {
  const [named] = /\bd[0-9a-z]{12}\b/.exec(command) ?? [];
  if (!WRITING || named === undefined) return command;
  const front = JSON.parse(readFileSync(join(folder, 'walk', 'runs', 'first', 'front.json'), 'utf8'));
  const id = balancedOf(front)?.id ?? named;
  readme = readme.replaceAll(named, id);
  return command.replaceAll(named, id);
}

function write(block: Block, lines: readonly string[]): void {
  const all = readme.split('\n');
  all.splice(block.line, block.text === '' ? 0 : block.text.split('\n').length, ...lines);
  readme = all.join('\n');
  writeFileSync(join(ROOT, 'README.md'), readme);
}
