/** The command line as a person meets it: one clear line for each mistake, the documented exit status, never a stack trace. */
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { chopfront, type Ended, newFolder } from './processes.ts';

const SHEET = new URL('../../model/rails/buoy-sensors.yaml', import.meta.url).pathname;
const COMMANDS = ['draft', 'check', 'sweep', 'page', 'show', 'assess', 'handoff', 'merge', 'status', 'compare'];

function expectRefusal(ended: Ended, status: number, text: string | RegExp): void {
  expect(ended.stderr).toMatch(text);
  expect(ended.stderr).toMatch(/^chopfront: /);
  expect(ended.stderr).not.toMatch(/\n\s+at /);
  expect(ended.stdout).toBe('');
  expect(ended.status).toBe(status);
}

const sheetWith = (change: (text: string) => string): string => {
  const path = join(newFolder(), 'rail.yaml');
  writeFileSync(path, change(readFileSync(SHEET, 'utf8')));
  return path;
};

describe('help', () => {
  it('names every command and every exit status', async () => {
    const { stdout, status } = await chopfront('--help');
    expect(status).toBe(0);
    for (const command of COMMANDS) expect(stdout).toMatch(new RegExp(`^  ${command} `, 'm'));
    expect(stdout).toContain('0 done, 1 internal fault, 2 bad input, 3 no feasible design, 4 run folder in use');
    expect(stdout).toContain(
      '129/130/143 stopped by HUP/INT/TERM with everything saved, 75 stopped inside a cluster shard',
    );
  });

  it.each(COMMANDS)('of %s has an example', async (command) => {
    const { stdout, status } = await chopfront(command, '--help');
    expect(status).toBe(0);
    expect(stdout).toContain(`  chopfront ${command} `);
  });

  it('prints the version of the package', async () => {
    const { version } = JSON.parse(readFileSync(new URL('../../package.json', import.meta.url), 'utf8'));
    expect(await chopfront('--version')).toMatchObject({ status: 0, stdout: `${version}\n` });
  });
});

describe('a mistyped command line is one line and status 2', () => {
  it.each<[string, string[], string]>([
    ['unknown command', ['swep'], "unknown command 'swep'; did you mean sweep?"],
    ['unknown option', ['check', SHEET, '--jsn'], "unknown option '--jsn'; did you mean --json?"],
    ['missing argument', ['check'], "missing required argument 'sheet'"],
    ['missing --out', ['sweep', SHEET], "required option '--out <folder>' not specified"],
    ['too many arguments', ['page', 'a', 'b'], 'too many arguments'],
    [
      'bad count',
      ['sweep', SHEET, '--out', 'x', '--evaluations', '10q'],
      'give a whole number above zero, such as 200000',
    ],
    ['bad duration', ['sweep', SHEET, '--out', 'x', '--time', 'soon'], 'give a duration, such as 90s, 30min, 8h'],
    ['bad share', ['sweep', SHEET, '--out', 'x', '--until-steady', '2'], 'give a share, such as 0.001 or 0.1%'],
    ['bad form of log', ['sweep', SHEET, '--out', 'x', '--log', 'xml'], 'the only form is json'],
    ['bad threads', ['sweep', SHEET, '--out', 'x', '--threads', '0'], 'give a whole number from 1 to 1024'],
    [
      'no shard',
      ['sweep', SHEET, '--out', 'x', '--shard', 'first'],
      'give I/K, such as 0/4 for the first shard of four',
    ],
    ['bad shard', ['sweep', SHEET, '--out', 'x', '--shard', '4/4'], 'shards count from 0, so the last of 4 is 3'],
    [
      'contradicting shards',
      ['sweep', SHEET, '--out', 'x', '--shard', '1/4', '--shards', '5'],
      'contradict each other',
    ],
    [
      'no index',
      ['sweep', SHEET, '--out', 'x', '--shards', '4', '--shard', 'auto'],
      'no scheduler has set an index here',
    ],
    ['no sheet', ['sweep', '--out', 'x'], 'name the sheet to sweep'],
    ['unknown scheduler', ['sweep', SHEET, '--out', 'x', '--on', 'moon'], 'Allowed choices are slurm'],
    ['unknown scenario', ['draft', 'x.yaml', '--scenario', 'moon'], 'no scenario named moon; there are: buoy-sensors,'],
  ])('%s', async (_, args, text) => {
    const ended = await chopfront(...args);
    expectRefusal(ended, 2, new RegExp(escaped(text)));
    expect(ended.stderr.trimEnd().split('\n')).toHaveLength(1);
  });

  it('no command at all shows the help and status 2', async () => {
    const ended = await chopfront();
    expect(ended.status).toBe(2);
    expect(ended.stderr).toContain('Usage: chopfront');
  });
});

describe('a bad sheet is named with its place and status 2', () => {
  it.each<[string, (text: string) => string, RegExp]>([
    [
      'missing unit',
      (text) => text.replace(/current: 8 A/, 'current: 8'),
      /rail\.yaml:\d+:\d+: output\.current: found 8/,
    ],
    [
      'wrong dimension',
      (text) => text.replace(/current: 8 A/, 'current: 8 V'),
      /rail\.yaml:\d+:\d+: output\.current: found 8 V/,
    ],
    ['unknown key', (text) => text.replace(/^output:/m, 'outptu:'), /outptu.*nearest known: output/],
    ['not YAML', () => 'rail: [\n  {', /rail\.yaml:/],
    ['empty', () => '', /rail\.yaml/],
  ])('%s', async (_, change, text) => {
    expectRefusal(await chopfront('check', sheetWith(change)), 2, text);
  });

  it('missing file, folder, 10 MB of noise', async () => {
    expectRefusal(
      await chopfront('check', '/nowhere/rail.yaml'),
      2,
      /\/nowhere\/rail\.yaml: no such file; give the path of a rail sheet/,
    );
    expectRefusal(await chopfront('check', newFolder()), 2, /is a folder; give the path of a rail sheet/);
    const noise = sheetWith(() => 'x7#{[\u0001'.repeat(1_800_000));
    expectRefusal(await chopfront('check', noise), 2, /is 10\.\d MB; a rail sheet is never above 1\.0 MB/);
  });

  it('a table that is not there, or of no kind', async () => {
    const missing = sheetWith((text) => `${text}\nparts:\n  tables: [built-in, mine.csv]\n`);
    expectRefusal(await chopfront('check', missing), 2, /mine\.csv: no such file; give the path of a parts table/);
    const odd = sheetWith((text) => `${text}\nparts:\n  tables: [built-in, mine.csv]\n`);
    writeFileSync(join(odd, '..', 'mine.csv'), 'name,colour,taste\na,red,sour\n');
    expectRefusal(await chopfront('check', odd), 2, /mine\.csv: its header fits no kind of parts table \(switches, /);
  });
});

describe('draft and check', () => {
  it('a drafted sheet checks, and is not overwritten without --force', async () => {
    const path = join(newFolder(), 'rail.yaml');
    expect(await chopfront('draft', path)).toMatchObject({ status: 0, stdout: '' });
    expect((await chopfront('check', path)).status).toBe(0);
    expectRefusal(await chopfront('draft', path), 2, /exists already; choose another name, or add --force/);
    expect((await chopfront('draft', path, '--force', '--scenario', 'hut-link')).status).toBe(0);
    expect(readFileSync(path, 'utf8')).toContain('hut-link');
  });

  it('check --json prints one JSON value and nothing else', async () => {
    const { stdout, stderr, status } = await chopfront('check', SHEET, '--json');
    expect(status).toBe(0);
    expect(stderr).toBe('');
    const value = JSON.parse(stdout);
    // Series regulator: efficiency Vo/Vi (any textbook), 3.3 V from 12.8 V.
    expect(value.baseline.efficiency).toBeCloseTo(3.3 / 12.8, 12);
    expect(value.architectures.length).toBeGreaterThan(1);
  });

  it('a hostile rail name cannot steer the terminal', async () => {
    const path = sheetWith((text) => text.replace(/^rail: .*$/m, 'rail: "evil\\e[2J\\u202E"'));
    const { stdout, stderr } = await chopfront('check', path);
    expect((stdout + stderr).replaceAll('\n', '')).not.toMatch(/[\p{Cc}\p{Cf}]/u);
  });
});

describe('folders', () => {
  it('a folder with other files is not swept into', async () => {
    const folder = newFolder();
    writeFileSync(join(folder, 'thesis.txt'), 'years');
    expectRefusal(
      await chopfront('sweep', SHEET, '--out', folder),
      2,
      /holds files but no run; give a new or empty folder/,
    );
    expect(existsSync(join(folder, 'rail.yaml'))).toBe(false);
  });

  it('a file is no folder, a missing run is named', async () => {
    const file = join(newFolder(), 'file');
    writeFileSync(file, '');
    expectRefusal(await chopfront('sweep', SHEET, '--out', file), 2, /cannot be made or written \(it is a file\)/);
    for (const command of [['page'], ['status'], ['show', 'x']]) {
      const [name = '', ...rest] = command;
      expectRefusal(await chopfront(name, '/nowhere/run', ...rest), 2, /no such run; make one with: chopfront sweep/);
    }
    expectRefusal(await chopfront('sweep', '--out', '/nowhere/run', '--resume'), 2, /nothing to resume here/);
  });

  it('a damaged run.json is named with what is wrong', async () => {
    const folder = newFolder();
    mkdirSync(folder, { recursive: true });
    writeFileSync(join(folder, 'rail.yaml'), '');
    writeFileSync(join(folder, 'run.json'), '{"format":"chopfront-run"}');
    expectRefusal(await chopfront('status', folder), 2, /run\.json: cannot be understood \(status: /);
    writeFileSync(join(folder, 'run.json'), '{{{');
    expectRefusal(await chopfront('show', folder, 'x'), 2, /run\.json: cannot be understood/);
  });
});

function escaped(text: string): string {
  return text.replace(/[.*+?^${}()|[\]\\]/g, '\\$&');
}
