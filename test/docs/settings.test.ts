/** Every advanced setting of the README's table has the default that it states and the effect that it states: a sweep is run with it moved. */
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { FrontFile } from '../../model/index.ts';
import { starterSheet } from '../../model/rail/starter.ts';
import { shippedRail } from '../model/shipped.ts';
import { chopfront } from '../runners/processes.ts';
import { readText } from '../support/project.ts';

/** What a sweep left, as far as a setting shows in it. */
interface Ran {
  readonly islands: number;
  readonly columns: number;
  readonly firstEpoch: number;
  readonly epochs: number;
  /** Designs of the front file, and the least that they have of each objective. */
  readonly front: number;
  readonly best: readonly number[];
}

const folder = mkdtempSync(join(tmpdir(), 'chopfront-settings-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const SHEET = readText('model/rails/buoy-sensors.yaml');
const EVALUATIONS = 2400;
/** Where every sweep starts from; each setting is then moved alone. */
const BASE: Readonly<Record<string, number>> = {
  islands: 3,
  population: 20,
  'epoch-generations': 10,
  'front-size': 500,
};

async function ran(settings: Readonly<Record<string, number>>): Promise<Ran> {
  const run = mkdtempSync(join(folder, 'run-'));
  const sheet = `${run}.yaml`;
  const advanced = Object.entries(settings).map(([key, value]) => `${key}: ${value}`);
  writeFileSync(sheet, `${SHEET}\nadvanced: {${advanced.join(', ')}}\n`);
  const asked = ['--evaluations', `${EVALUATIONS}`, '--seed', 'settings', '--threads', '1', '--no-page'];
  const ended = await chopfront('sweep', sheet, '--out', join(run, 'out'), ...asked);
  expect([ended.status, ended.stderr.includes('failed')], ended.stderr).toEqual([0, false]);
  const textOf = (name: string): string => readFileSync(join(run, 'out', name), 'utf8');
  const record = JSON.parse(textOf('run.json'));
  const front: FrontFile = JSON.parse(textOf('front.json'));
  const [head, ...rows] = textOf('history.csv').trimEnd().split('\n');
  const islandColumns = (head ?? '').split(',').filter((name) => name.startsWith('island ')).length;
  return {
    islands: record.islands,
    columns: islandColumns,
    firstEpoch: Number(rows[0]?.split(',')[3]),
    epochs: record.epochs,
    front: front.designs.length,
    best: front.objectives.map((_, k) =>
      Math.min(...front.designs.map(({ objectives }) => objectives[k] ?? Number.NaN)),
    ),
  };
}

/** What a setting's value shows as: the README's sentence on it, as figures of a sweep. */
const EFFECTS: Readonly<Record<string, { readonly moved: number; shows(value: number, run: Ran, base: Ran): void }>> = {
  islands: {
    moved: 4,
    shows: (value, run) => expect([run.islands, run.columns]).toEqual([value, value]),
  },
  population: {
    moved: 40,
    // A generation is as many evaluations as an island breeds from.
    shows: (value, run, base) => expect(run.firstEpoch / base.firstEpoch).toBeCloseTo(value / 20, 12),
  },
  'epoch-generations': {
    moved: 5,
    shows: (value, run, base) => {
      expect(run.firstEpoch / base.firstEpoch).toBeCloseTo(value / 10, 12);
      expect(run.epochs).toBe(2 * base.epochs);
    },
  },
  'front-size': {
    moved: 10,
    shows: (value, run, base) => {
      expect(base.front).toBeGreaterThan(value);
      // Three places are held for the best of each objective; one that is among the chosen anyway leaves its place empty.
      expect(run.front).toBeLessThanOrEqual(value);
      expect(run.front).toBeGreaterThanOrEqual(value - run.best.length);
      expect(run.best).toEqual(base.best);
    },
  },
};

/** Rows of the table: key, default and effect in words. */
const rows = [...readText('README.md').matchAll(/^\| `([a-z-]+)` \| (\d+) \| (\S.*) \|$/gm)].map(
  ([, key, standard]) => ({
    key: key ?? '',
    standard: Number(standard),
  }),
);

describe('the advanced settings of the README', () => {
  let base: Ran;
  beforeAll(async () => {
    base = await ran(BASE);
  });

  it('are all that the sheet knows, each with an effect that is tried here', () => {
    expect(rows.map(({ key }) => key).sort()).toEqual(Object.keys(EFFECTS).sort());
    const settings = Object.keys(shippedRail('buoy-sensors').settings);
    expect(settings).toHaveLength(rows.length);
  });

  it('have the defaults of the table, in the starter sheet too', () => {
    const { islands, population, epochGenerations, frontSize } = shippedRail('buoy-sensors').settings;
    const ours = { islands, population, 'epoch-generations': epochGenerations, 'front-size': frontSize };
    expect(Object.fromEntries(rows.map(({ key, standard }) => [key, standard]))).toEqual(ours);
    const inStarter = rows.map(({ key, standard }) => `${key}: ${standard}`).join(', ');
    expect(starterSheet()).toContain(`advanced: {${inStarter}}`);
  });

  it.each(rows.map(({ key }) => key))('%s shows its effect in a sweep', async (key) => {
    const effect = EFFECTS[key];
    if (effect === undefined) throw new Error(`no effect of ${key} is tried`);
    effect.shows(effect.moved, await ran({ ...BASE, [key]: effect.moved }), base);
  });
});
