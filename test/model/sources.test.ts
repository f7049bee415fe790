/** The registry of sources is in force: no formula without a source or a derivation, no source without a check, examples that run. */
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { SOURCES } from '../../model/sources.ts';
import { CASES } from '../reference/index.ts';

const MODEL = join(import.meta.dirname, '../../model');
/** Folders of formulas, one idea a file: what they export is held to the registry. */
const FORMULAS = ['waveform', 'switches', 'magnetics', 'capacitors', 'control', 'heat'];
/** Folders where formulas stand inside what a stage or a limit does: every function is held to it, exported or not. */
const INSIDE = ['stages', 'limits', 'spread'];
/** Files of other folders with figures of their own. */
const OTHERS = [
  'parts/power-stage.ts',
  'handoff/loop.ts',
  'handoff/winding-currents.ts',
  'handoff/netlist/pulses.ts',
  'handoff/netlist/surroundings.ts',
];
/** Files beside the folders that bring together, name, read or write, and work out nothing physical. A new one is held to the registry. */
const NO_FORMULAS: readonly string[] = [
  ...['assess', 'assessment', 'canonical', 'catalogue', 'cautions', 'evaluate', 'explain', 'families', 'front-file'],
  ...[
    'genes',
    'hash',
    'index',
    'ledger',
    'objectives',
    'outcome',
    'parts-choice',
    'parts-list',
    'plain-design',
    'plan',
  ],
  ...['point', 'point-solver', 'prices', 'problem', 'record', 'representatives', 'snap', 'sources', 'spec', 'standing'],
  ...['traces', 'version', 'write-spec'],
];
/** Functions that make or fill a record and hold no physics. */
const RECORDS = /^(create|clear|add|set)/;
/** The same in files of which every function is looked at: they call, choose, copy, compare or say why not. */
const PLUMBING: Readonly<Record<string, readonly string[]>> = {
  'assembly.ts': ['forgetOtherQuantity', 'figuresOf', 'writeRow', 'writeTransformer', 'writeChoke', 'add'],
  'design.ts': [
    ...['resolveDesign', 'resolveLeg', 'resolveChoke', 'stockedHeat', 'woundIndex', 'resolveTransformer'],
    'controllerCost',
  ],
  'edge-figures.ts': ['lookUpBus'],
  'flavour.ts': ['prepareFlavour', 'bank'],
  'handoff/netlist/surroundings.ts': ['writeInput', 'writeOutput', 'wrap', 'writeGroup'],
  'handoff/winding-currents.ts': ['chokeCurrent', 'figures'],
  'heat-balance.ts': ['warm', 'left'],
  'input-filter.ts': ['chooseFilterChoke'],
  'limits/construction.ts': ['judgeConstruction', 'judgeGate', 'judgeController', 'judgeBands', 'judgeSize'],
  'limits/life.ts': ['judgeLife', 'isWet'],
  'limits/list.ts': ['limitsOf', 'efficiencyLimitName'],
  'limits/magnetics.ts': ['judgeMagnetics'],
  'limits/places.ts': ['limitPlaces'],
  'limits/point.ts': [
    ...['judgePoint', 'judgeRipple', 'judgeHeat', 'judgeHot', 'judgeTemperature', 'judgeBulkHeat', 'judgeAsked'],
    ...['judgeRippleAt', 'judgeBulk', 'judgeStep'],
  ],
  'modes.ts': ['shared'],
  'point-heat.ts': ['addSlots'],
  'point-losses.ts': ['addOtherLosses'],
  'spread/chance.ts': ['seedOf', 'mix'],
  'spread/sample.ts': ['sampleLayout', 'drawSamples', 'clipped', 'copyBank'],
  'spread/spread.ts': ['spreadOf', 'summarise', 'yieldsOf', 'percentiles', 'worstSlack', 'variance'],
  'stages/buck.ts': ['stepsDown', 'keepDriving'],
  'stages/isolated.ts': ['isolatedRefusal'],
  'stages/list.ts': ['stageOf'],
  'stages/state.ts': ['pauses'],
  'stages/transformer-stages.ts': ['transformerStage'],
};

interface Documented {
  readonly file: string;
  readonly name: string;
  readonly parameters: string;
  readonly comment: string;
}

/** Names of the source files in a folder of the model. */
function filesIn(folder: string): string[] {
  return readdirSync(join(MODEL, folder))
    .filter((name) => name.endsWith('.ts') && name !== 'index.ts')
    .map((name) => (folder === '' ? name : `${folder}/${name}`));
}

/** Files of which every function is held to the registry. */
function wholeFiles(): string[] {
  const beside = filesIn('').filter((name) => !NO_FORMULAS.includes(name.slice(0, -'.ts'.length)));
  return [...beside, ...INSIDE.flatMap(filesIn), ...OTHERS];
}

/** Functions of `file` with the comment above each: all of them, or only those it exports. */
function functionsOf(file: string, all: boolean): Documented[] {
  const text = readFileSync(join(MODEL, file), 'utf8');
  const pattern = /(\/\*\*(?:(?!\*\/)[\s\S])*\*\/\n)?(export )?function (\w+)(?:<[^(]*>)?\(([^)]*)\)/g;
  return [...text.matchAll(pattern)]
    .filter(([, , exported]) => all || exported !== undefined)
    .map((m) => ({ file, name: m[3], parameters: m[4], comment: m[1] ?? '' }));
}

const formulas = FORMULAS.flatMap(filesIn)
  .flatMap((file) => functionsOf(file, false))
  .filter(({ name }) => !RECORDS.test(name));
const inside = wholeFiles().flatMap((file) => functionsOf(file, true));
const physics = [...formulas, ...inside.filter(({ file, name }) => PLUMBING[file]?.includes(name) !== true)];
const idsIn = (text: string) => [...text.matchAll(/(?:@source|Source id:) ([a-z0-9-]+)/g)].map((m) => m[1]);
const label = (f: Documented) => `${f.file}: ${f.name}`;

describe('Every physics function', () => {
  it('is found by this test', () => expect(physics.length).toBeGreaterThan(210));
  it.each(physics.map((f) => [label(f), f] as const))('%s names its source or derivation and its range', (_, f) => {
    expect(f.comment).toMatch(/@(source [a-z0-9-]+|derivation \S+)/);
    expect(f.comment).toMatch(/@valid \S+/);
    for (const id of idsIn(f.comment)) expect(Object.keys(SOURCES)).toContain(id);
  });
  it('is none of those left out, and those left out exist', () => {
    const names = Object.entries(PLUMBING).flatMap(([file, left]) => left.map((name) => `${file}: ${name}`));
    expect(names.filter((name) => !inside.some((f) => label(f) === name))).toEqual([]);
    const files = filesIn('').map((name) => name.slice(0, -'.ts'.length));
    expect(NO_FORMULAS.filter((name) => name !== 'index' && !files.includes(name))).toEqual([]);
  });
});

describe('Every source', () => {
  const cited = new Set(CASES.flatMap((group) => group.cases.map((item) => item.source)));
  it.each(Object.keys(SOURCES))('%s is cited by at least one check', (id) => {
    expect([...cited]).toContain(id);
  });
  it('named anywhere in the model is in the registry', () => {
    for (const file of readdirSync(MODEL, { recursive: true, encoding: 'utf8' }).filter((name) =>
      name.endsWith('.ts'),
    )) {
      for (const id of idsIn(readFileSync(join(MODEL, file), 'utf8'))) {
        expect(Object.keys(SOURCES), `${file} names "${id}"`).toContain(id);
      }
    }
  });
});

/** Numeric parameters only, and a number back: such a function shows an example. */
const scalar = physics.filter((f) => {
  const parts = f.parameters
    .split(',')
    .map((part) => part.trim())
    .filter((part) => part !== '');
  return parts.length > 0 && parts.every((part) => /: (number|boolean)$/.test(part)) && !/At$/.test(f.name);
});

describe('Every function of plain numbers shows an example, and the example runs', () => {
  const returnsRecord = new Set(['effectiveParameters', 'toroidParameters']);
  it.each(scalar.filter((f) => !returnsRecord.has(f.name)).map((f) => [label(f), f] as const))('%s', async (_, f) => {
    const examples = [...f.comment.matchAll(/@example (\w+)\(([^)]*)\) = (\S+)/g)];
    expect(examples.length).toBeGreaterThan(0);
    const module: Record<string, unknown> = await import(join(MODEL, f.file));
    for (const [, name, list, printed] of examples) {
      const run = module[name];
      if (typeof run !== 'function') throw new Error(`${name} is not exported by ${f.file}`);
      const values = list.split(',').map((text) => parse(text.trim()));
      const got: unknown = Reflect.apply(run, undefined, values);
      expect(Math.abs(Number(got) - Number(printed)), `${name}(${list}) gives ${got}`).toBeLessThanOrEqual(
        lastDigit(printed),
      );
    }
  });
});

function parse(text: string): number | boolean {
  if (text === 'true' || text === 'false') return text === 'true';
  return Number(text);
}

/** One unit of the last printed digit; for a whole figure such as 1 or 1.2e6 a ten-thousandth of it. */
function lastDigit(printed: string): number {
  const [mantissa, exponent] = printed.split('e');
  const places = mantissa.split('.')[1]?.length ?? 0;
  const unit = 10 ** (Number(exponent ?? 0) - places);
  return places >= 3 ? unit : Math.max(1e-12, 1e-4 * Math.abs(Number(printed)));
}
