/** The registry of sources is in force: no formula without a source or a derivation, no source without a check, examples that run. */
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { SOURCES } from '../../model/sources.ts';
import { CASES } from '../reference/index.ts';

const MODEL = join(import.meta.dirname, '../../model');
const PHYSICS = ['waveform', 'switches', 'magnetics', 'capacitors', 'control', 'heat'];
/** Functions that make or fill a record and hold no physics. */
const RECORDS = /^(create|clear|add|set)/;

interface Documented {
  readonly file: string;
  readonly name: string;
  readonly parameters: string;
  readonly comment: string;
}

/** Every exported function of the physics folders with the comment above it. */
function documentedFunctions(): Documented[] {
  return PHYSICS.flatMap((folder) =>
    readdirSync(join(MODEL, folder))
      .filter((name) => name.endsWith('.ts') && name !== 'index.ts')
      .flatMap((name) => functionsOf(join(MODEL, folder, name))),
  );
}

function functionsOf(file: string): Documented[] {
  const text = readFileSync(file, 'utf8');
  const pattern = /(\/\*\*(?:(?!\*\/)[\s\S])*\*\/\n)?export function (\w+)\(([^)]*)\)/g;
  return [...text.matchAll(pattern)].map((m) => ({ file, name: m[2], parameters: m[3], comment: m[1] ?? '' }));
}

const functions = documentedFunctions();
const physics = functions.filter(({ name }) => !RECORDS.test(name));
const idsIn = (text: string) => [...text.matchAll(/(?:@source|Source id:) ([a-z0-9-]+)/g)].map((m) => m[1]);
const label = (f: Documented) => `${f.file.slice(MODEL.length + 1)}: ${f.name}`;

describe('Every physics function', () => {
  it('is found by this test', () => expect(physics.length).toBeGreaterThan(90));
  it.each(physics.map((f) => [label(f), f] as const))('%s names its source or derivation and its range', (_, f) => {
    expect(f.comment).toMatch(/@(source [a-z0-9-]+|derivation \S+)/);
    expect(f.comment).toMatch(/@valid \S+/);
    for (const id of idsIn(f.comment)) expect(Object.keys(SOURCES)).toContain(id);
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
    const module: Record<string, unknown> = await import(f.file);
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
