/** Thousands of damaged sheets, tables, specs, checkpoints and run files in process: every one is read or refused in words. */
import { mkdtempSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  createRailProblem,
  describeFinding,
  explainRail,
  type Finding,
  readRail,
  readSpec,
  recordOfSpec,
  writeSpec,
} from '../../model/index.ts';
import { inspectTableText } from '../../runners/commands/parts-report.ts';
import { reportText } from '../../runners/commands/parts-text.ts';
import { Refusal, reasonOf } from '../../runners/errors.ts';
import { readInputs, readSheet } from '../../runners/inputs.ts';
import { unpackCheckpoint, writeCheckpoint } from '../../runners/run-folder/checkpoint.ts';
import { readFront } from '../../runners/run-folder/front.ts';
import { readRecord } from '../../runners/run-folder/record.ts';
import { seal } from '../../runners/run-folder/sealed.ts';
import { resumeFrom } from '../../runners/sweep/resume.ts';
import { damaged, edited, nasty, renumbered, SHEETS, TABLES } from './cases.ts';

const BUOY = new URL('../../model/rails/buoy-sensors.yaml', import.meta.url).pathname;
const inputs = readSheet(BUOY);
const made = createRailProblem(inputs.rail, inputs.tables);
if (!made.ok) throw new Error('the demo sheet has no space');
const problem = made.value;

/** Lines that a person can read, each naming what was found. */
function expectWords(findings: readonly Finding[]): void {
  expect(findings.length).toBeGreaterThan(0);
  for (const finding of findings) {
    const line = describeFinding(finding);
    expect(line).toMatch(/found .*; allowed: /s);
    expect(line).not.toMatch(/undefined|\[object|TypeError|RangeError/);
    expect(line.length).toBeLessThan(2500);
  }
}

/** What `act` gives, or undefined where it refuses in words; anything else that it throws fails the test. */
function orRefusal<T>(act: () => T): T | undefined {
  try {
    return act();
  } catch (error) {
    if (!(error instanceof Refusal)) throw error;
    expect(error.message).not.toMatch(/undefined|\[object|\n\s+at /);
    expect([2, 3]).toContain(error.status);
    return undefined;
  }
}

describe('sheets', () => {
  test('400 with other numbers are refused in words, or explained without a figure that is none', () => {
    fc.assert(
      fc.property(renumbered(SHEETS), (text) => {
        const outcome = readRail(text, 'rail.yaml');
        if (!outcome.ok) return expectWords(outcome.findings);
        const explained = explainRail(outcome.value, inputs.tables);
        if (!explained.ok) return expectWords(explained.findings);
        expect(JSON.stringify(explained.value)).not.toMatch(/NaN|undefined/);
        const space = createRailProblem(outcome.value, inputs.tables);
        if (!space.ok) expectWords(space.findings);
      }),
      { numRuns: 400 },
    );
  });

  test('1000 with pieces cut out and nasty ones put in are read with their tables or refused', () => {
    fc.assert(
      fc.property(edited(SHEETS), (text) => {
        orRefusal(() => readInputs({ rail: { file: 'rail.yaml', text }, tables: [] }));
      }),
      { numRuns: 1000 },
    );
  });
});

describe('parts tables', () => {
  test('2000 with pieces cut out and nasty ones put in are reported, in text that cannot steer a terminal', () => {
    fc.assert(
      fc.property(edited(TABLES), (text) => {
        const report = orRefusal(() => inspectTableText(text, 'mine.csv'));
        if (report === undefined) return;
        expect(report.rejected).toBeLessThanOrEqual(report.rows);
        if (report.findings.length > 0) expectWords(report.findings);
        const lines = reportText(report, (line) => line).split('\n');
        for (const line of lines) expect(line).not.toMatch(/[\p{Cc}\p{Cf}\p{Zl}\p{Zp}]/u);
      }),
      { numRuns: 2000 },
    );
  });
});

describe('specs', () => {
  const genes = new Float64Array(problem.genes.length);
  problem.snap(genes);
  const spec: unknown = JSON.parse(JSON.stringify(writeSpec(problem, genes)));

  test('2000 with one value replaced are refused in words, or give a design that is assessed', () => {
    let assessed = 0;
    fc.assert(
      fc.property(damaged(spec), (value) => {
        const read = readSpec(JSON.stringify(value) ?? '', 'design.json');
        if (!read.ok) return expectWords(read.findings);
        const record = problem.genesFrom(recordOfSpec(read.value), 'design.json');
        if (!record.ok) return expectWords(record.findings);
        assessed++;
        if (assessed % 20 === 0) expect(problem.assess(record.value).objectives).toHaveLength(3);
      }),
      { numRuns: 2000 },
    );
    expect(assessed).toBeGreaterThan(50);
  });

  test('1000 texts cut, edited or of any kind never throw', () => {
    const text = JSON.stringify(spec, undefined, 1);
    fc.assert(
      fc.property(fc.oneof(edited([text]), nasty, fc.json()), (changed) => {
        const read = readSpec(changed, 'design.json');
        if (!read.ok) expectWords(read.findings);
      }),
      { numRuns: 1000 },
    );
  });
});

describe('checkpoints', () => {
  const good = seal('checkpoint 1', {
    header: { number: 3, node: 'v20.0.0', state: { seconds: 1 } },
    parts: [Uint8Array.of(1, 2, 3), new Uint8Array(40)],
  });
  const unpack = (bytes: Uint8Array): boolean => {
    try {
      unpackCheckpoint(bytes);
      return true;
    } catch (error) {
      expect(reasonOf(error)).toMatch(/^[^\n]{3,200}$/);
      return false;
    }
  };

  const changed = (how: number | Uint8Array | readonly (readonly [number, number])[]): Uint8Array => {
    if (typeof how === 'number') return good.subarray(0, how);
    if (how instanceof Uint8Array) return how;
    const bytes = Uint8Array.from(good);
    for (const [at, by] of how) bytes[at] = (bytes[at] ?? 0) ^ by;
    return bytes;
  };

  test('2000 with any bytes changed are all refused, each with a reason', () => {
    const change = fc.array(fc.tuple(fc.nat(good.length - 1), fc.integer({ min: 1, max: 255 })), {
      minLength: 1,
      maxLength: 5,
    });
    fc.assert(
      fc.property(fc.oneof(change, fc.nat(good.length - 1), fc.uint8Array({ maxLength: 200 })), (how) => {
        const bytes = changed(how);
        const same = bytes.length === good.length && bytes.every((byte, i) => byte === good[i]);
        expect(unpack(bytes)).toBe(same);
      }),
      { numRuns: 2000 },
    );
    expect(unpack(good)).toBe(true);
  });

  test('1000 whole ones with any header are read or refused with a reason', () => {
    fc.assert(
      fc.property(fc.oneof(fc.jsonValue(), damaged({ number: 1, node: 'v20', state: {} })), (header) => {
        unpack(seal('checkpoint 1', { header, parts: [] }));
      }),
      { numRuns: 1000 },
    );
  });
});

describe('checkpoints that are whole but not ours', () => {
  const folder = mkdtempSync(join(tmpdir(), 'chopfront-fuzz-'));
  const ring = {
    ...{ shard: 0, epoch: 4, epochEvaluations: 100, islands: 1, faults: [] },
    history: { stride: 1, rows: [] },
    spent: { model: 1, search: 1 },
  };
  const state = { seconds: 1, saving: 0, started: '2026-01-01T00:00:00.000Z', rings: [ring] };
  const resume = (value: unknown, islands = 1) => {
    const parts = Array.from({ length: islands }, () => Uint8Array.of(1));
    writeCheckpoint(folder, { number: 1, node: process.version, state: value, islands: parts });
    return resumeFrom(folder, () => ({ evaluations: 100, feasible: 10 }));
  };

  test('300 of any state are taken up or refused', () => {
    expect(resume(state).rings).toHaveLength(1);
    expect(() => resume(state, 0)).toThrow(/its checkpoint: cannot be understood \(islands are missing\)/);
    fc.assert(
      fc.property(damaged(state), (value) => {
        orRefusal(() => resume(value));
      }),
      { numRuns: 300 },
    );
  });
});

describe('files of a run', () => {
  const folder = mkdtempSync(join(tmpdir(), 'chopfront-fuzz-'));
  const named = { name: 'loss', unit: 'W' };
  const design = { id: 'd1', family: 'buck ×1', genes: { phases: 1 }, parts: { inductor: 'A' }, objectives: [1] };
  const front = {
    ...{ format: 'chopfront-front', version: 1, rail: 'a', objectives: [named], limits: [named], genes: [named] },
    designs: [{ ...design, margins: { height: 1 }, worstMargin: 1 }],
  };

  test('500 damaged fronts and 500 damaged records are read or refused', () => {
    fc.assert(
      fc.property(damaged(front), nasty, (value, text) => {
        writeFileSync(join(folder, 'front.json'), JSON.stringify(value) ?? '');
        const read = orRefusal(() => readFront(folder));
        for (const { id, family } of read?.designs ?? []) expect(`${id}${family}`).toBeTypeOf('string');
        writeFileSync(join(folder, 'run.json'), text);
        orRefusal(() => readRecord(folder));
      }),
      { numRuns: 500 },
    );
  });
});
