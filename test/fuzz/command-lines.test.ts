/** Command lines of any kind in process: each ends with a documented status, in words, and leaves no half-written file. */
import { mkdtempSync, readdirSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import fc from 'fast-check';
import { afterAll, beforeAll, describe, expect, test, vi } from 'vitest';
import { main } from '../../runners/main.ts';
import { nasty } from './cases.ts';

const before = process.cwd();
const folder = mkdtempSync(join(tmpdir(), 'chopfront-fuzz-'));
let said = { out: '', err: '' };

beforeAll(() => {
  process.chdir(folder);
  writeFileSync('broken.yaml', 'rail: [\n');
  writeFileSync('broken.json', '{"format":"chopfront-spec"');
  writeFileSync('broken.csv', 'name,technology,voltage [V]\nA,si\n');
  writeFileSync('noise.bin', Buffer.from(Array.from({ length: 4000 }, (_, i) => (i * 7919) % 256)));
  const keep = (key: 'out' | 'err') => (text: string | Uint8Array) => {
    said[key] += String(text);
    return true;
  };
  vi.spyOn(process.stdout, 'write').mockImplementation(keep('out'));
  vi.spyOn(process.stderr, 'write').mockImplementation(keep('err'));
});

afterAll(() => {
  vi.restoreAllMocks();
  process.chdir(before);
});

const COMMANDS = [
  ...['draft', 'check', 'parts', 'parts check', 'parts template', 'page', 'show', 'assess', 'handoff', 'merge'],
  ...['prove', 'spread', 'status', 'compare', 'completion', 'sweep', 'help', ''],
];
const OPTIONS = [
  ...['--json', '--force', '--resume', '--help', '-h', '-V', '--version', '--no-such', '-x', '--', '--json=1'],
  ...['--out', '--run', '--scenario', '--csv', '--expect', '--seed', '--threads', '--evaluations', '--time', '--shard'],
  ...['--shards', '--on', '--log', '--until-steady', '--index-from', '--page', '--no-page', '--partition', '--samples'],
  ...['--time-limit', '--top', '--simulator', '--checkpoint', '--epoch-limit'],
];
const VALUES = [
  'broken.yaml',
  'broken.json',
  'broken.csv',
  'noise.bin',
  '.',
  'nowhere/x',
  'hut-link',
  'switches',
  'bash',
];
const NUMBERS = ['0', '1', '-1', '3/2', '1/4', '10q', '1e9', '8h', '0.5%', 'auto', 'slurm', 'json', 'NaN'];
const word = fc.oneof(
  fc.constantFrom(...OPTIONS),
  fc.constantFrom(...VALUES),
  fc.constantFrom(...NUMBERS),
  // The system passes no text with a zero character to a program.
  nasty.map((text) => text.replaceAll('\0', '')),
);
const line = fc
  .tuple(fc.constantFrom(...COMMANDS), fc.array(word, { maxLength: 6 }))
  .map(([command, words]) => [...command.split(' ').filter((part) => part !== ''), ...words]);

describe('command lines', () => {
  test('2000 of any kind end with status 0 or 2, in words', async () => {
    const statuses = new Map<number, number>();
    await fc.assert(
      fc.asyncProperty(line, async (args) => {
        said = { out: '', err: '' };
        const status = await main(args);
        statuses.set(status, (statuses.get(status) ?? 0) + 1);
        expect([0, 2]).toContain(status);
        expect(said.err).not.toMatch(/: internal fault|\n\s+at |undefined|\[object/);
        if (status === 2) expect(said.err).toMatch(/^(chopfront: |Usage: )/m);
        for (const text of (said.err + said.out).split('\n')) expect(text).not.toMatch(/[\p{Cc}\p{Cf}]/u);
        expect(readdirSync('.').filter((name) => name.endsWith('.tmp'))).toEqual([]);
      }),
      { numRuns: 2000 },
    );
    expect(statuses.get(0) ?? 0).toBeGreaterThan(100);
    expect(statuses.get(2) ?? 0).toBeGreaterThan(1000);
  });
});
