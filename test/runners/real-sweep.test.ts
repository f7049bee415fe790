/** The whole path on a shipped sheet: sweep, show, assess, handoff, page, merge, compare, with the built program. */
import { cpSync, existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import type { FrontFile } from '../../model/index.ts';
import { OPERATORS } from '../../optimizer/index.ts';
import { checkpointNames } from '../../runners/run-folder/checkpoint.ts';
import { chopfront, newFolder, startChopfront, until } from './processes.ts';

const SHEET = new URL('../../model/rails/buoy-sensors.yaml', import.meta.url).pathname;
const ARGS = ['--evaluations', '16k', '--seed', 'test', '--no-page'];
const BYTES = ['front.csv', 'front.json', 'near-misses.csv', 'history.csv', 'archive.bin', 'restarts.bin'];
const run = join(newFolder(), 'run');
const bytesOf = (folder: string): string[] => BYTES.map((name) => readFileSync(join(folder, name), 'latin1'));
let front: FrontFile;

beforeAll(async () => {
  const ended = await chopfront('sweep', SHEET, '--out', run, '--threads', '2', ...ARGS);
  expect(await chopfront('page', run)).toMatchObject({ status: 0, stdout: `${join(run, 'page.html')}\n` });
  expect(ended).toMatchObject({ status: 0 });
  front = JSON.parse(readFileSync(join(run, 'front.json'), 'utf8'));
});

describe('a swept folder', () => {
  it('holds every file, and no lock', () => {
    for (const name of ['rail.yaml', 'parts', 'run.json', 'page.html', ...BYTES])
      expect(existsSync(join(run, name))).toBe(true);
    expect(existsSync(join(run, 'lock.json'))).toBe(false);
    expect(checkpointNames(run).length).toBeGreaterThan(0);
  });

  it('has a record with the documented fields', () => {
    const record = JSON.parse(readFileSync(join(run, 'run.json'), 'utf8'));
    expect(record).toMatchObject({ status: 'done', seed: 'test', threads: 2, version: '0.1.0' });
    for (const name of ['evaluations', 'epochs', 'seconds', 'feasible', 'frontSize', 'hypervolume']) {
      expect(record[name]).toBeGreaterThan(0);
    }
    expect(record.railHash).toMatch(/^[0-9a-f]{64}$/);
    expect(record.partsHash).toMatch(/^[0-9a-f]{64}$/);
    expect(record.evaluations).toBe(16_000);
  });

  it('has a trust record: agreement, shares, duplicates, restarts and where the time went', () => {
    const record = JSON.parse(readFileSync(join(run, 'run.json'), 'utf8'));
    const { trust } = record;
    expect(record.feasibleShare).toBeCloseTo(record.feasible / record.evaluations, 12);
    expect(trust.agreement).toHaveLength(record.islands);
    const shares = Object.values<number>(trust.operatorShares);
    expect(Object.keys(trust.operatorShares)).toEqual([...OPERATORS]);
    expect(shares.reduce((sum, share) => sum + share, 0)).toBeCloseTo(1, 9);
    expect(Math.min(...shares)).toBeGreaterThan(0);
    // Snapping meets the same design again and again; none of these is judged twice.
    expect(trust.duplicates).toBeGreaterThan(0);
    expect([trust.restarts, trust.notComputable].every(Number.isInteger)).toBe(true);
    const { model, variation, ranking, archive, transfer, saving } = trust.timeSplit;
    for (const seconds of [model, variation, ranking, archive, transfer]) expect(seconds).toBeGreaterThan(0);
    // The record stands in what is saved: it tells of the saves before it, and of none where the run was over first.
    expect(saving).toBeGreaterThanOrEqual(0);
    // Two threads at work for the length of the run at most, and the model has most of it.
    expect(model + variation + ranking + archive + transfer).toBeLessThan(2 * record.seconds);
    expect(model).toBeGreaterThan(ranking);
  });

  it('has a history of hypervolume by evaluations that never falls and ends where the record stands', () => {
    const record = JSON.parse(readFileSync(join(run, 'run.json'), 'utf8'));
    const [head = '', ...lines] = readFileSync(join(run, 'history.csv'), 'utf8').trimEnd().split('\n');
    const names = head.split(',');
    const rows = lines.map((line) => line.split(','));
    const column = (name: string): number[] => rows.map((row) => Number(row[names.indexOf(name)]));
    const [evaluations, hypervolume] = [column('evaluations'), column('hypervolume')];
    expect(rows.length).toBeGreaterThan(1);
    for (let i = 1; i < rows.length; i++) {
      expect(evaluations[i]).toBeGreaterThan(evaluations[i - 1] ?? 0);
      expect(hypervolume[i]).toBeGreaterThanOrEqual(hypervolume[i - 1] ?? 0);
    }
    expect([evaluations.at(-1), hypervolume.at(-1)]).toEqual([record.evaluations, record.hypervolume]);
    expect(column('feasible').at(-1)).toBeCloseTo(record.feasibleShare, 12);
    expect(column('front').at(-1)).toBe(record.frontSize);
    // An island's agreement is its own hypervolume over that of all.
    for (const [i, agreement] of record.trust.agreement.entries()) {
      expect(column(`island ${i}`).at(-1)).toBeCloseTo(agreement * record.hypervolume, 12);
      expect(agreement).toBeGreaterThan(0);
      expect(agreement).toBeLessThanOrEqual(1);
    }
  });

  it('has a front whose rows keep every limit, do not dominate each other and have unique ids', () => {
    expect(front.designs.length).toBeGreaterThan(5);
    expect(new Set(front.designs.map((design) => design.id)).size).toBe(front.designs.length);
    for (const a of front.designs) {
      for (const margin of Object.values(a.margins)) expect(margin).toBeGreaterThanOrEqual(0);
      for (const b of front.designs) {
        const beaten = a !== b && b.objectives.every((value, i) => value <= (a.objectives[i] ?? 0));
        expect(beaten).toBe(false);
      }
    }
    expect(readFileSync(join(run, 'front.csv'), 'utf8').trimEnd().split('\n')).toHaveLength(front.designs.length + 1);
  });

  it('is started again where a start was killed before its snapshot was whole; no other folder is taken for that', async () => {
    const begun = join(newFolder(), 'run');
    mkdirSync(join(begun, 'parts'), { recursive: true });
    cpSync(join(run, 'run.json'), join(begun, 'run.json'));
    const resumed = await chopfront('sweep', '--out', begun, '--resume');
    expect([resumed.status, resumed.stderr]).toEqual([2, expect.stringContaining('nothing to resume here')]);
    const other = join(newFolder(), 'run');
    cpSync(begun, other, { recursive: true });
    expect((await chopfront('sweep', SHEET, '--out', begun, ...ARGS)).status).toBe(0);
    expect(bytesOf(begun)).toEqual(bytesOf(run));
    writeFileSync(join(other, 'run.json'), '{"kilometres": 12}');
    const refused = await chopfront('sweep', SHEET, '--out', other, ...ARGS);
    expect([refused.status, refused.stderr]).toEqual([2, expect.stringContaining('holds files but no run')]);
  });

  it('is the same to the byte with one thread', async () => {
    const other = join(newFolder(), 'run');
    expect(await chopfront('sweep', SHEET, '--out', other, '--threads', '1', ...ARGS)).toMatchObject({ status: 0 });
    expect(bytesOf(other)).toEqual(bytesOf(run));
  });

  it('is the same to the byte when killed in the middle, stopped in the middle, and resumed without the sheet', async () => {
    const other = join(newFolder(), 'run');
    const begin = ['sweep', SHEET, '--out', other, '--threads', '2', '--checkpoint', '1s', ...ARGS];
    const first = startChopfront(begin);
    await until(() => existsSync(other) && checkpointNames(other).length > 0);
    first.child.kill('SIGKILL');
    await first.ended;
    const second = startChopfront(['sweep', '--out', other, '--resume', '--threads', '1']);
    const owns = (): boolean => readFileSync(join(other, 'lock.json'), 'utf8').includes(`"pid":${second.child.pid}`);
    await until(() => second.child.exitCode !== null || owns());
    await new Promise((done) => setTimeout(done, 300));
    second.child.kill('SIGINT');
    const stopped = await second.ended;
    expect([0, 130]).toContain(stopped.status);
    if (stopped.status === 130) expect(stopped.stderr).toContain(`go on with: chopfront sweep --out ${other} --resume`);
    expect(await chopfront('sweep', '--out', other, '--resume')).toMatchObject({ status: 0 });
    expect(bytesOf(other)).toEqual(bytesOf(run));
  });

  it('refuses another seed, another sheet (with the difference) and other parts on resuming', async () => {
    const text = readFileSync(SHEET, 'utf8');
    const sheet = join(newFolder(), 'rail.yaml');
    writeFileSync(sheet, text.replace('ripple: 20 mV', 'ripple: 10 mV'));
    const changed = await chopfront('sweep', sheet, '--out', run, '--resume');
    expect(changed.status).toBe(2);
    expect(changed.stderr).toContain(
      'the sheet has changed since this run began:\n  output.ripple: 20 mV became 10 mV',
    );
    const seeded = await chopfront('sweep', SHEET, '--out', run, '--resume', '--seed', 'x');
    expect(seeded).toMatchObject({ status: 2 });
    expect(seeded.stderr).toContain('this run began with seed test, not x');
    expect((await chopfront('sweep', SHEET, '--out', run)).stderr).toContain('holds a run already; add --resume');
  });
});

describe('one design', () => {
  it('is shown, by the beginning of its id too, and as JSON alone', async () => {
    const id = front.designs[0]?.id ?? '';
    const shown = await chopfront('show', run, id.slice(0, 8));
    expect(shown.status).toBe(0);
    for (const text of [id, 'Where the watts go', 'Limits, tightest first', 'Parts'])
      expect(shown.stdout).toContain(text);
    expect(shown.stdout).not.toContain('\u001b');
    const json = await chopfront('show', run, id, '--json');
    expect(json.stderr).toBe('');
    expect(JSON.parse(json.stdout)).toMatchObject({ id, feasible: true });
    const unknown = await chopfront('show', run, 'zzz');
    expect(unknown).toMatchObject({ status: 2, stdout: '' });
    expect(unknown.stderr).toMatch(/no design zzz in this run; it holds, for example, /);
  });

  it('is handed over and assessed again to the same figures; nothing is overwritten unasked', async () => {
    const design = front.designs[1];
    const out = join(newFolder(), 'handoff');
    expect(await chopfront('handoff', run, design?.id ?? '', '--out', out)).toMatchObject({ status: 0 });
    expect((await chopfront('handoff', run, design?.id ?? '', '--out', out)).stderr).toContain('exists already');
    const { stdout, stderr } = await chopfront('assess', SHEET, join(out, 'spec.json'), '--run', run, '--json');
    expect(stderr).toBe('');
    const assessed = JSON.parse(stdout);
    expect(assessed.id).toBe(design?.id);
    expect(assessed.objectives.map((one: { value: number }) => one.value)).toEqual(design?.objectives);
    expect(assessed.margins).toEqual(design?.margins);
    expect(assessed).toMatchObject({ feasible: true, dominatedBy: [] });
  });

  it('that is no spec is refused', async () => {
    const file = join(newFolder(), 'odd.json');
    writeFileSync(file, '{"format":"shopping-list"}');
    const ended = await chopfront('assess', SHEET, file);
    expect(ended).toMatchObject({ status: 2, stdout: '' });
    expect(ended.stderr).toContain('odd.json');
  });
});

describe('what cannot be met', () => {
  it('ends with status 3, the limits in the way, by how much, and the nearest designs', async () => {
    const sheet = join(newFolder(), 'rail.yaml');
    writeFileSync(sheet, readFileSync(SHEET, 'utf8').replace('volume: 8 cm³', 'volume: 8 mm³'));
    const ended = await chopfront(
      'sweep',
      sheet,
      '--out',
      join(newFolder(), 'run'),
      '--evaluations',
      '8k',
      '--no-page',
    );
    expect(ended.status).toBe(3);
    expect(ended.stderr).toMatch(/no design keeps every limit after \d+ evaluations/);
    expect(ended.stderr).toMatch(/volume +broken by \d of \d, by [\d.]+ % or more/);
    expect(ended.stderr).toContain('nearest designs:');
  });
});

describe('several runs', () => {
  const shards = newFolder();
  const ARGS_OF_SHARDS = ['--evaluations', '12k', '--seed', 's', '--shards', '2', '--no-page'];

  it('shards merged in any order, twice, equal the same shards on one machine, to the byte', async () => {
    const whole = join(newFolder(), 'run');
    expect(await chopfront('sweep', SHEET, '--out', whole, ...ARGS_OF_SHARDS)).toMatchObject({ status: 0 });
    const folders = ['shard-00000', 'shard-00001'].map((name) => join(shards, name));
    const environment = { SLURM_ARRAY_TASK_ID: '1' };
    const one = startChopfront(
      ['sweep', SHEET, '--out', shards, ...ARGS_OF_SHARDS, '--shard', 'auto'],
      environment,
    ).ended;
    const zero = chopfront('sweep', SHEET, '--out', folders[0] ?? '', ...ARGS_OF_SHARDS, '--shard', '0/2');
    expect([(await one).status, (await zero).status]).toEqual([0, 0]);
    const merged = newFolder();
    expect(await chopfront('merge', merged, ...folders.reverse(), '--expect', '2')).toMatchObject({ status: 0 });
    expect(bytesOf(merged)).toEqual(bytesOf(whole));
    expect(await chopfront('merge', merged, shards)).toMatchObject({ status: 0 });
    expect(bytesOf(merged)).toEqual(bytesOf(whole));
    // What a merge leaves that is killed before its snapshot is whole.
    const begun = newFolder();
    for (const name of ['run.json', 'archive.bin']) cpSync(join(merged, name), join(begun, name));
    expect(await chopfront('merge', begun, shards)).toMatchObject({ status: 0 });
    expect(bytesOf(begun)).toEqual(bytesOf(whole));
  });

  it('missing shards are named, with how to run them', async () => {
    const ended = await chopfront('merge', newFolder(), shards, '--expect', '4');
    expect(ended.status).toBe(1);
    expect(ended.stderr).toContain('shards 2, 3 of 4 are not done; submit them again with: sbatch --array=2,3');
  });

  it('runs of other sheets are not merged', async () => {
    const sheet = join(newFolder(), 'rail.yaml');
    writeFileSync(sheet, readFileSync(SHEET, 'utf8').replace('ripple: 20 mV', 'ripple: 30 mV'));
    const other = join(newFolder(), 'run');
    await chopfront('sweep', sheet, '--out', other, '--evaluations', '8k', '--no-page');
    const ended = await chopfront('merge', newFolder(), run, other);
    expect(ended).toMatchObject({ status: 2 });
    expect(ended.stderr).toContain('was made from another sheet');
    const compared = await chopfront('compare', run, other, '--json');
    expect(JSON.parse(compared.stdout)).toMatchObject({ same: { sheet: false, parts: true, version: true } });
  });

  it('a run compared with itself has gained, lost and moved nothing', async () => {
    const { stdout } = await chopfront('compare', run, run);
    expect(stdout).toContain('same sheet, parts and version');
    expect(stdout).toMatch(/\n0 designs gained, 0 lost, 0 moved, \d+ the same\./);
    expect((await chopfront('status', run)).stdout).toMatch(/done +100 % +16\.0 k/);
  });
});

describe('progress for machines', () => {
  it('--log json writes one JSON object a line, and one about the end on stdout', async () => {
    const folder = join(newFolder(), 'run');
    const { stdout, stderr } = await chopfront('sweep', SHEET, '--out', folder, '--evaluations', '8k', '--log', 'json');
    const lines = stderr.split('\n').filter((text) => text !== '');
    for (const line of lines) expect(['progress', 'message']).toContain(JSON.parse(line).event);
    expect(JSON.parse(stdout)).toMatchObject({
      event: 'end',
      folder,
      evaluations: 8000,
      page: join(folder, 'page.html'),
    });
  });
});
