/** Fifty damaged inputs through the real command: never a stack trace, a hang, a half-written file or an undocumented status. */
import { cpSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import fc from 'fast-check';
import { beforeAll, describe, expect, test } from 'vitest';
import { chopfront, type Ended, newFolder, startChopfront } from '../runners/processes.ts';
import { damaged, edited, NASTY, SHEETS, TABLES } from './cases.ts';

/** A hang is what has not ended after this long, ms; the slowest of these commands takes a few seconds. */
const PATIENCE = 60_000;
const SHEET = new URL('../../model/rails/buoy-sensors.yaml', import.meta.url).pathname;
const run = join(newFolder(), 'run');
const hand = newFolder();

beforeAll(async () => {
  const sweep = await chopfront('sweep', SHEET, '--out', run, '--evaluations', '10k', '--threads', '1');
  expect(sweep).toMatchObject({ status: 0 });
  const design: string = JSON.parse(readFileSync(join(run, 'front.json'), 'utf8')).designs[0].id;
  expect(await chopfront('handoff', run, design, '--out', hand)).toMatchObject({ status: 0 });
}, 120_000);

/** The same cases every time; another number tries others. */
const samples = <T>(cases: fc.Arbitrary<T>, count: number): T[] => fc.sample(cases, { numRuns: count, seed: 8 });

async function ended(args: readonly string[], cwd: string): Promise<Ended> {
  const { child, ended } = startChopfront(args, {}, cwd);
  const timer = setTimeout(() => child.kill('SIGKILL'), PATIENCE);
  const result = await ended;
  clearTimeout(timer);
  return result;
}

/** Runs a command line in `folder` and holds its end to what every end must keep. */
async function expectDecentEnd(folder: string, args: readonly string[]): Promise<void> {
  const { status, stdout, stderr } = await ended(args, folder);
  const what = `${args.join(' ').slice(0, 200)}\n${stderr.slice(0, 600)}`;
  expect([0, 2, 3], what).toContain(status);
  expect(stderr, what).not.toMatch(/: internal fault|\n\s+at |undefined|\[object/);
  if (status !== 0) expect(stderr, what).toMatch(/^(chopfront: |Usage: )/m);
  for (const line of (stdout + stderr).split(/[\r\n]/)) expect(line).not.toMatch(/[\p{Cc}\p{Cf}]/u);
  const names = readdirSync(folder, { recursive: true }).map(String);
  expect(names.filter((name) => name.endsWith('.tmp'))).toEqual([]);
}

function folderWith(name: string, text: string | Uint8Array): string {
  const folder = newFolder();
  writeFileSync(join(folder, name), text);
  return folder;
}

describe.concurrent('through the real command', () => {
  test.each(samples(edited(SHEETS), 12))('sheet %#', async (text) => {
    await expectDecentEnd(folderWith('rail.yaml', text), ['check', 'rail.yaml']);
  });

  test.each(samples(edited(TABLES), 10))('parts table %#', async (text) => {
    await expectDecentEnd(folderWith('mine.csv', text), ['parts', 'check', 'mine.csv']);
  });

  test.each(samples(fc.nat(), 8))('spec %#', async (seed) => {
    const folder = newFolder();
    const spec: unknown = JSON.parse(readFileSync(join(hand, 'spec.json'), 'utf8'));
    const [changed] = fc.sample(damaged(spec), { numRuns: 1, seed });
    writeFileSync(join(folder, 'spec.json'), JSON.stringify(changed) ?? '');
    await expectDecentEnd(folder, ['assess', SHEET, 'spec.json', '--run', run]);
  });

  const harms: readonly (readonly [file: RegExp, args: readonly string[]])[] = [
    [/^checkpoint-/, ['sweep', '--out', 'run', '--resume']],
    [/^checkpoint-.*[02468]\.bin$/, ['sweep', '--out', 'run', '--resume']],
    [/^run\.json$/, ['status', 'run']],
    [/^run\.json$/, ['sweep', '--out', 'run', '--resume']],
    [/^front\.json$/, ['show', 'run', 'd']],
    [/^front\.json$/, ['handoff', 'run', 'd', '--out', 'hand']],
    [/^archive\.bin$/, ['page', 'run']],
    [/^archive\.bin$/, ['merge', 'all', 'run']],
    [/^rail\.yaml$/, ['compare', 'run', run]],
    [/^rail\.yaml$/, ['show', 'run', 'd']],
  ];
  test.each(harms)('a run with damage in %s', async (file, args) => {
    const folder = newFolder();
    cpSync(run, join(folder, 'run'), { recursive: true });
    const [change] = samples(edited(['']), 1);
    for (const name of readdirSync(run).filter((one) => file.test(one))) {
      const bytes = readFileSync(join(run, name));
      const half = bytes.subarray(0, bytes.length / 2);
      writeFileSync(join(folder, 'run', name), Buffer.concat([half, Buffer.from(change ?? '')]));
    }
    await expectDecentEnd(folder, args);
  });

  const words = fc.array(fc.constantFrom(...NASTY, '--json', '--out', '--force', 'x'), { minLength: 1, maxLength: 4 });
  const commands = ['draft', 'check', 'parts', 'sweep', 'page', 'show', 'assess', 'handoff', 'merge', 'compare'];
  test.each(samples(words, 10).map((list, i) => [commands[i] ?? '', list] as const))(
    '%s of any words',
    async (name, list) => {
      await expectDecentEnd(newFolder(), [name, ...list.map((word) => word.replaceAll('\0', ''))]);
    },
  );
});
