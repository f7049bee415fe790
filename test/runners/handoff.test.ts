/** What leaves a run: handoff, proof, spread, with the built program on a shipped sheet. */
import { existsSync, mkdirSync, readdirSync, readFileSync, symlinkSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import type { FrontFile, Proof, Spread } from '../../model/index.ts';
import { needs } from '../support/needs.ts';
import { chopfront, newFolder } from './processes.ts';

const SHEET = new URL('../../model/rails/buoy-sensors.yaml', import.meta.url).pathname;
const FILES = ['magnetics.md', 'note.html', 'note.md', 'parts.csv', 'spec.json', 'stage.cir'];
const run = join(newFolder(), 'run');
let id = '';

beforeAll(async () => {
  const args = ['--evaluations', '8k', '--seed', 'handoff', '--threads', '2', '--no-page'];
  expect(await chopfront('sweep', SHEET, '--out', run, ...args)).toMatchObject({ status: 0 });
  const front: FrontFile = JSON.parse(readFileSync(join(run, 'front.json'), 'utf8'));
  id = front.designs[0].id;
});

describe('handoff', () => {
  const out = join(newFolder(), 'out');

  it('writes six files and nothing beside them', async () => {
    expect(await chopfront('handoff', run, id, '--out', out)).toMatchObject({ status: 0 });
    expect(readdirSync(out).sort()).toEqual(FILES);
    expect(readFileSync(join(out, 'note.md'), 'utf8')).toContain('other designs on the front');
    expect(JSON.parse(readFileSync(join(out, 'spec.json'), 'utf8')).hashes.rail).toMatch(/^[0-9a-f]{64}$/);
  });

  it('replaces nothing that stands there without --force, and the same bytes with it', async () => {
    const before = FILES.map((name) => readFileSync(join(out, name), 'utf8'));
    const refused = await chopfront('handoff', run, id, '--out', out);
    expect(refused).toMatchObject({ status: 2 });
    expect(refused.stderr).toContain('add --force');
    expect(await chopfront('handoff', run, id, '--out', out, '--force')).toMatchObject({ status: 0 });
    expect(FILES.map((name) => readFileSync(join(out, name), 'utf8'))).toEqual(before);
  });

  it('one file in the way stops all of them', async () => {
    const other = join(newFolder(), 'other');
    mkdirSync(other);
    writeFileSync(join(other, 'parts.csv'), 'mine');
    expect(await chopfront('handoff', run, id, '--out', other)).toMatchObject({ status: 2 });
    expect(readdirSync(other)).toEqual(['parts.csv']);
    expect(readFileSync(join(other, 'parts.csv'), 'utf8')).toBe('mine');
  });

  it('does not write through a link that leads out of the folder', async () => {
    const folder = newFolder();
    const [outside, linked] = [join(folder, 'outside.txt'), join(folder, 'linked')];
    writeFileSync(outside, 'mine');
    mkdirSync(linked);
    symlinkSync(outside, join(linked, 'note.md'));
    expect(await chopfront('handoff', run, id, '--out', linked)).toMatchObject({ status: 2 });
    expect(await chopfront('handoff', run, id, '--out', linked, '--force')).toMatchObject({ status: 0 });
    expect(readFileSync(outside, 'utf8')).toBe('mine');
  });

  it('spec → assess gives the same numbers', async () => {
    const spec = join(out, 'spec.json');
    const { stdout, status } = await chopfront('assess', SHEET, spec, '--run', run, '--json');
    expect(status).toBe(0);
    const assessed = JSON.parse(stdout);
    expect(assessed.id).toBe(id);
    expect(assessed.objectives).toEqual(JSON.parse(readFileSync(spec, 'utf8')).objectives);
    expect(assessed.dominatedBy).toEqual([]);
  });

  it('a sheet that names the spec as an incumbent starts from it', async () => {
    const folder = newFolder();
    writeFileSync(join(folder, 'old.json'), readFileSync(join(out, 'spec.json')));
    writeFileSync(join(folder, 'rail.yaml'), `${readFileSync(SHEET, 'utf8')}\nincumbents: [old.json]\n`);
    const second = join(folder, 'run');
    const args = ['--evaluations', '4k', '--seed', 'x', '--threads', '1', '--no-page'];
    const ended = await chopfront('sweep', join(folder, 'rail.yaml'), '--out', second, ...args);
    expect(ended).toMatchObject({ status: 0 });
    expect(existsSync(join(second, 'incumbents', '01.txt'))).toBe(true);
    const objectives: number[] = JSON.parse(readFileSync(join(out, 'spec.json'), 'utf8')).objectives.map(
      ({ value }: { value: number }) => value,
    );
    const front: FrontFile = JSON.parse(readFileSync(join(second, 'front.json'), 'utf8'));
    // The incumbent is on the front, or something found is no worse in everything.
    expect(front.designs.some((one) => one.objectives.every((value, k) => value <= objectives[k]))).toBe(true);
  });
});

describe('a near miss', () => {
  it('is shown, handed over and assessed like any other design, with the limit that it breaks', async () => {
    const [limit = '', miss = ''] = readFileSync(join(run, 'near-misses.csv'), 'utf8').split('\n')[1]?.split(',') ?? [];
    const shown = await chopfront('show', run, miss, '--json');
    expect(shown).toMatchObject({ status: 0 });
    const { feasible, limits } = JSON.parse(shown.stdout);
    expect(feasible).toBe(false);
    const broken = limits.filter(({ violation }: { violation: number }) => violation > 0);
    expect(broken.map(({ name }: { name: string }) => name)).toEqual([limit]);
    const out = join(newFolder(), 'miss');
    expect(await chopfront('handoff', run, miss, '--out', out)).toMatchObject({ status: 0 });
    expect(readdirSync(out).sort()).toEqual(FILES);
    const assessed = await chopfront('assess', SHEET, join(out, 'spec.json'), '--run', run, '--json');
    expect(JSON.parse(assessed.stdout)).toMatchObject({ id: miss, feasible: false });
  });
});

describe('spread', () => {
  it('gives the same with one thread and with two', async () => {
    const one = await chopfront('spread', run, id, '--samples', '600', '--json');
    const two = await chopfront('spread', run, id, '--samples', '600', '--threads', '2', '--json');
    expect(one).toMatchObject({ status: 0 });
    expect(two.stdout).toBe(one.stdout);
    const [spread]: Spread[] = JSON.parse(one.stdout);
    expect(spread?.samples).toBe(600);
    expect(spread?.yields[0]?.name).toBe('all limits');
  });

  it('of the whole front becomes a column of the front', async () => {
    expect(await chopfront('spread', run, '--samples', '50')).toMatchObject({ status: 0 });
    const front: FrontFile = JSON.parse(readFileSync(join(run, 'front.json'), 'utf8'));
    for (const design of front.designs) expect(design.yield).toBeGreaterThanOrEqual(0);
    expect(readFileSync(join(run, 'front.csv'), 'utf8').split('\n', 1)[0]).toMatch(/,yield$/);
  });
});

describe.runIf(needs('ngspice'))('prove', () => {
  it('keeps predicted beside simulated in the run folder, and agrees at full load', async () => {
    const { status, stdout } = await chopfront('prove', run, id, '--json');
    expect(status).toBe(0);
    const proof: Proof = JSON.parse(readFileSync(join(run, `proof-${id}.json`), 'utf8'));
    expect(JSON.parse(stdout)).toEqual([proof]);
    expect(proof.corners.map(({ inputVoltage, load }) => [inputVoltage, load])).toEqual([
      [12.8, 1],
      [10.5, 1],
      [15, 1],
      [12.8, 0.02],
    ]);
    for (const corner of proof.corners.slice(0, 3)) {
      expect(corner.failure).toBeUndefined();
      expect(corner.figures.filter(({ agrees }) => !agrees)).toEqual([]);
    }
    expect(proof.limits.filter(({ holds }) => !holds)).toEqual([]);
  });

  it('asks for designs where none are named', async () => {
    const refused = await chopfront('prove', run);
    expect(refused.status).toBe(2);
    expect(refused.stderr).toContain('--top');
  });
});
