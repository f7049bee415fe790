/**
 * Two runs compared: what a price list, a requirement or nothing at all did to the front. Real fronts of the shipped buoy-sensors sheet, judged by the sheet and
 * the parts of the other side too. The laws: a comparison reversed is its mirror image; prices move cost alone; a design is lost for a reason that can be checked.
 */
import { JSDOM } from 'jsdom';
import { describe, expect, it } from 'vitest';
import { frontFile } from '../../model/index.ts';
import { search } from '../../optimizer/index.ts';
import { compareCsv, compareText } from '../../runners/commands/compare-text.ts';
import { type Inputs, problemOf, readInputs, readSheet } from '../../runners/inputs.ts';
import { compareFronts, type Side } from '../../runners/run-folder/compare.ts';
import { chooseFront } from '../../runners/sweep/grid.ts';
import type { Comparison } from '../../viz/compare-data.ts';
import { buildComparePage } from '../../viz/compare-page.ts';

const before = readSheet(new URL('../../model/rails/buoy-sensors.yaml', import.meta.url).pathname);

/** The same inputs with another sheet or other tables. */
function changed(sheet: (text: string) => string, table: (text: string, kind: string) => string): Inputs {
  const { rail, tables } = before.texts;
  return readInputs({
    rail: { ...rail, text: sheet(rail.text) },
    tables: tables.map((one) => ({ ...one, text: table(one.text, one.kind) })),
  });
}

const same = (text: string): string => text;

/** The front that a short search finds. */
function sideOf(inputs: Inputs): Side {
  const problem = problemOf(inputs);
  const { front } = search(problem, { evaluations: 6000, seed: 1 });
  return { problem, front: frontFile(problem, chooseFront(problem, front, 60)) };
}

/** A table with every price doubled. */
function dearer(text: string): string {
  const lines = text.split('\n');
  const head = lines.findIndex((line) => line.startsWith('name,'));
  const names = (lines[head] ?? '').split(',');
  return lines
    .map((line, i) => {
      if (i <= head || line.trim() === '') return line;
      const cells = line.split(',');
      return cells
        .map((cell, k) => (names[k]?.startsWith('price') && cell !== '' ? String(2 * Number(cell)) : cell))
        .join(',');
    })
    .join('\n');
}

const a = sideOf(before);
const cost = a.problem.objectives.findIndex((objective) => objective.name === 'cost');
const whole = (x: Side, y: Side): Comparison => ({
  a: 'runs/<i>before</i>',
  b: 'runs/after',
  objectives: x.problem.objectives.map(({ name, unit }) => ({ name, unit })),
  same: { sheet: true, parts: false, version: true },
  differences: ['parts: </style><script>alert(1)</script>.csv differs'],
  ...compareFronts(x, y),
});

describe('a front compared with itself', () => {
  const { kept, moved, gained, lost, carried, restated, hypervolume } = compareFronts(a, a);
  it('has kept every design, and every design keeps every limit and its figures', () => {
    expect(a.front.designs.length).toBeGreaterThan(20);
    expect([kept.length, moved.length, gained.length, lost.length]).toEqual([a.front.designs.length, 0, 0, 0]);
    expect(carried.a).toEqual({ buildable: kept.length, feasible: kept.length, hypervolume: hypervolume.byA.a });
    expect(restated).toEqual({ a: 0, b: 0 });
  });
});

describe('doubled prices of inductors', () => {
  const inputs = changed(same, (text, kind) => (kind === 'inductors' ? dearer(text) : text));
  const problem = problemOf(inputs);
  // The old front under the new prices, so that every design is on both.
  const b: Side = {
    problem,
    front: frontFile(
      problem,
      a.front.designs.map((design) => genesOf(problem, design)),
    ),
  };
  const result = compareFronts(a, b);

  it('move every design in cost, and in nothing else', () => {
    expect(result.moved.length).toBe(a.front.designs.length);
    for (const { before: was, after: is } of result.moved) {
      a.problem.objectives.forEach((_, c) => {
        if (c === cost) expect(is?.[c]).toBeGreaterThan(was?.[c] ?? Number.NaN);
        else expect(is?.[c]).toBe(was?.[c]);
      });
    }
  });

  it('lower the hypervolume, by either scale', () => {
    for (const volumes of [result.hypervolume.byA, result.hypervolume.byB]) {
      expect(volumes.b).toBeLessThan(volumes.a);
      expect(volumes.together).toBeGreaterThanOrEqual(volumes.a);
    }
  });

  it('say so when a front carries figures that its own sheet does not give', () => {
    expect(compareFronts(a, { problem: a.problem, front: b.front }).restated).toEqual({
      a: 0,
      b: a.front.designs.length,
    });
  });
});

describe('a higher efficiency asked for and a controller no longer sold', () => {
  const sold = a.front.designs[0]?.parts.controller ?? '';
  const inputs = changed(
    (text) => text.replace('at-least: 92 %', 'at-least: 96.5 %'),
    (text) =>
      text
        .split('\n')
        .filter((line) => !line.startsWith(`${sold},`))
        .join('\n'),
  );
  const b = sideOf(inputs);
  const result = whole(a, b);
  const mirrored = whole(b, a);

  it('lose designs for these two reasons, each named', () => {
    const [unbuildable, breaks] = (['unbuildable', 'breaks'] as const).map((kind) =>
      result.lost.filter((one) => one.why?.kind === kind),
    );
    const users = new Set(a.front.designs.filter(({ parts }) => parts.controller === sold).map((design) => design.id));
    expect(users.size).toBeGreaterThan(0);
    const named = unbuildable?.filter((one) => users.has(one.id)) ?? [];
    expect(named).toHaveLength(users.size);
    for (const { why, after } of named) {
      expect(why?.words).toContain(sold);
      expect(after).toBeUndefined();
    }
    for (const { why } of breaks ?? []) expect(why?.words).toMatch(/^breaks .*[\d.]+ %/);
    expect(result.lost.filter((one) => one.why?.words.includes('efficiency')).length).toBeGreaterThan(0);
  });

  it('gain designs that the other front beats, or that it had not found; all could be built before', () => {
    for (const { before: was, why } of result.gained) {
      expect(was).toHaveLength(a.problem.objectives.length);
      expect(['beaten', 'unbeaten']).toContain(why?.kind);
    }
    expect(result.carried.b.feasible).toBe(b.front.designs.length);
    expect(result.carried.a.feasible).toBeLessThan(a.front.designs.length);
  });

  it('reversed are the mirror image', () => {
    const ids = (changes: Comparison['lost']): string[] => changes.map((one) => one.id).sort();
    expect(ids(mirrored.gained)).toEqual(ids(result.lost));
    expect(ids(mirrored.lost)).toEqual(ids(result.gained));
    expect(ids(mirrored.moved)).toEqual(ids(result.moved));
    expect(mirrored.carried).toEqual({ a: result.carried.b, b: result.carried.a });
    const { byA, byB } = result.hypervolume;
    expect(mirrored.hypervolume).toEqual({ byA: { ...byB, a: byB.b, b: byB.a }, byB: { ...byA, a: byA.b, b: byA.a } });
  });

  it('are told in text, with the number of designs for each reason', () => {
    const text = compareText(result);
    expect(text).toContain(`${result.gained.length} designs gained, ${result.lost.length} lost`);
    expect(text).toMatch(/Of those lost, under the sheet and parts after: \d+ cannot be built/);
    expect(text).toMatch(
      /Designs from before, under the sheet and parts after: \d+ of \d+ keep every limit, \d+ cannot be built/,
    );
  });

  it('are a table with a line for each design that changed, every line of the same length', () => {
    const [head = '', ...lines] = compareCsv(result).trimEnd().split('\n');
    expect(head).toMatch(/^change,id,family,loss \[W\] before,/);
    expect(lines).toHaveLength(result.gained.length + result.lost.length + result.moved.length);
    // Commas inside quotes do not count.
    const cells = (line: string): number => line.replace(/"(?:[^"]|"")*"/g, '').split(',').length;
    for (const line of lines) expect(cells(line)).toBe(cells(head));
  });

  it('are a page without scripts: a mark for each design, a table behind, and names shown as text', () => {
    const page = buildComparePage(result, ':root { --ink: #000; }');
    expect(buildComparePage(result, ':root { --ink: #000; }')).toBe(page);
    const { document } = new JSDOM(page).window;
    expect(document.querySelectorAll('script, img, link')).toHaveLength(0);
    expect(document.querySelector('meta[http-equiv]')?.getAttribute('content')).toMatch(
      /^default-src 'none'; style-src 'sha256-[\w+/=]+'; base-uri 'none'; form-action 'none'$/,
    );
    expect(document.body.textContent).toContain('</style><script>alert(1)</script>.csv differs');
    expect(document.body.textContent).toContain('Before: runs/<i>before</i>');
    // Three objectives make three pictures.
    expect(document.querySelectorAll('svg.drawing[role=img][aria-label]')).toHaveLength(3);
    for (const change of ['gained', 'lost', 'moved', 'kept'] as const) {
      expect(document.querySelectorAll(`svg.drawing .${change}`)).toHaveLength(3 * result[change].length);
      expect(document.querySelectorAll(`#${change} tbody tr`)).toHaveLength(result[change].length);
    }
    expect(page).not.toMatch(/NaN|undefined|Infinity/);
  });
});

function genesOf(problem: Side['problem'], design: Side['front']['designs'][number]): Float64Array {
  const architecture = problem.architectures.find((name) => design.family.startsWith(name)) ?? 'buck-synchronous';
  const genes = problem.genesFrom({ architecture, genes: design.genes, parts: design.parts });
  if (!genes.ok) throw new Error(`cannot build ${design.id}`);
  return genes.value;
}
