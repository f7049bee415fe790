/** The files of a handoff: the same numbers as the assessment, readable by others, harmless to spreadsheets and browsers. */
import { readFileSync } from 'node:fs';
import { Ajv2020 } from 'ajv/dist/2020.js';
import { describe, expect, it } from 'vitest';
import {
  fullLoad,
  readSpec,
  recordOfSpec,
  SPEC_SCHEMA,
  solveAt,
  stageNetlist,
  takeAway,
} from '../../../model/index.ts';
import { spokenLimit } from '../../../viz/labels.ts';
import { takeAwayFiles } from '../../../viz/note/take-away.ts';
import { type FoundDesign, foundDesigns } from '../../circuit/designs.ts';
import { handMade, need, plainRail } from '../support.ts';

const fixture = readFileSync(new URL('spec-0.1.0.json', import.meta.url), 'utf8');
const validate = new Ajv2020({ strict: false }).compile(SPEC_SCHEMA);
// One of each architecture.
const found = [...new Map(foundDesigns().map((one) => [one.problem.record(one.genes).architecture, one])).values()];

function fileOf({ problem, genes }: FoundDesign, name: string): string {
  return takeAway(problem, genes).find((file) => file.name === name)?.text ?? '';
}

/** Rows of a CSV without quotes inside. */
function rowsOf(csv: string): string[][] {
  return csv
    .trimEnd()
    .split('\n')
    .map((line) => line.split(','));
}

describe.each(found)('$name', (design) => {
  const { problem, genes } = design;

  it('spec.json is valid by an independent validator, and gives back the same design with the same numbers', () => {
    const text = fileOf(design, 'spec.json');
    expect(validate(JSON.parse(text)), JSON.stringify(validate.errors)).toBe(true);
    const spec = need(readSpec(text, 'spec.json'));
    const again = need(problem.genesFrom(recordOfSpec(spec)));
    expect(problem.assess(again).objectives).toEqual(problem.assess(genes).objectives);
    expect(spec.objectives).toEqual(problem.assess(genes).objectives);
  });

  it('parts.csv adds up to the cost objective', () => {
    const rows = rowsOf(fileOf(design, 'parts.csv'));
    const costs = rows.slice(1, -1).map((row) => Number(row[4]));
    const total = Number(rows.at(-1)?.[4]);
    const cost = problem.assess(genes).objectives.find(({ name }) => name === 'cost')?.value ?? Number.NaN;
    expect(costs.reduce((a, b) => a + b, 0) / cost).toBeCloseTo(1, 12);
    expect(total / cost).toBeCloseTo(1, 12);
  });

  it('the netlist has the values of the design, in plain ASCII', () => {
    const text = fileOf(design, 'stage.cir');
    expect(text).toMatch(/^[\x20-\x7e\n]*$/);
    const parameter = (name: string): number => Number(new RegExp(`^\\.param ${name}=(\\S+)$`, 'm').exec(text)?.[1]);
    const point = solveAt(problem, genes, fullLoad(problem.rail));
    expect(parameter('lchoke')).toBe(point.state.effectiveInductance);
    expect(parameter('c_o1')).toBe(point.output.c1);
    expect(parameter('c_i1')).toBe(point.input.c1);
    expect(parameter('vbus')).toBe(problem.rail.input.nominal);
    expect(parameter('vout')).toBe(problem.rail.output.nominal);
    expect(parameter('rhigh')).toBe(point.state.highResistance);
    expect(parameter('fsw') / (problem.record(genes).genes.frequency ?? 0)).toBeCloseTo(1, 9);
  });

  it('the compensator that is handed over keeps at least 40° of phase margin', () => {
    const spec = need(readSpec(fileOf(design, 'spec.json'), 'spec.json'));
    expect(spec.compensator?.phaseMargin).toBeGreaterThan(40);
    expect(spec.compensator?.crossover).toBeGreaterThan(0);
  });

  it('magnetics.md lists every wound part with turns, gap or ratio, currents and losses', () => {
    const text = fileOf(design, 'magnetics.md');
    const { parts } = problem.record(genes);
    expect(text).toContain('## Choke currents');
    if (parts.chokeCore !== undefined) expect(text).toContain(parts.chokeCore);
    if (parts.transformerCore !== undefined) {
      expect(text).toContain(parts.transformerCore);
      expect(text).toContain('## Transformer insulation');
    }
  });

  it('the note says requirement, choice, losses, margins, risks and every caution, in Markdown and HTML alike', () => {
    const files = new Map(takeAwayFiles(problem, genes).map(({ name, text }) => [name, text]));
    expect([...files.keys()]).toEqual(['spec.json', 'stage.cir', 'parts.csv', 'magnetics.md', 'note.md', 'note.html']);
    for (const head of ['Requirement', 'Choice', 'Alternatives', 'Losses', 'Margins', 'Risks', 'Cautions']) {
      expect(files.get('note.md')).toContain(`## ${head}`);
      expect(files.get('note.html')).toContain(`<h2>${head}</h2>`);
    }
    for (const caution of problem.assess(genes).cautions) {
      expect(files.get('note.html')?.replaceAll('&#39;', "'")).toContain(caution);
    }
  });

  it('the note speaks in words, and lists no limit as tight that only counts whole things and is met', () => {
    const note = takeAwayFiles(problem, genes).find(({ name }) => name === 'note.md')?.text ?? '';
    const names = problem.limits.filter((name) => /[a-z][A-Z]/.test(name));
    for (const name of [...names, 'highSwitch', 'outputCeramic', 'outputCharge']) expect(note).not.toContain(name);
    const [, margins = ''] = note.split('## Margins');
    expect(margins.split('##')[0]).not.toContain('phases of the controller');
  });
});

describe('a design that breaks a limit', () => {
  const rail = plainRail({ input: 12, output: 3.3, current: 5 });
  const { problem, genes } = handMade({ frequency: 1e5, high: { onResistance: 1e-3 } }, rail);

  it('has a note that says which, what it has and what is allowed', () => {
    const broken = problem.assess(genes).limits.filter(({ violation }) => violation > 0);
    const note = takeAwayFiles(problem, genes).find(({ name }) => name === 'note.md')?.text ?? '';
    expect(broken.length).toBeGreaterThan(0);
    expect(note).toContain('It does NOT keep every limit of the sheet; it breaks: ');
    for (const { name } of broken) expect(note).toContain(`${spokenLimit(name)} (`);
  });
});

describe('a spec of version 0.1.0', () => {
  it('stays readable and valid', () => {
    expect(validate(JSON.parse(fixture)), JSON.stringify(validate.errors)).toBe(true);
    const spec = need(readSpec(fixture, 'spec-0.1.0.json'));
    expect(spec.version).toBe(1);
    expect(recordOfSpec(spec).architecture).toBe('buck-synchronous');
    expect(spec.compensator?.form).toBe('type-III');
  });
});

describe('names that would do harm', () => {
  const evil = '=HYPERLINK("http://x")</script><img onerror=x>';
  const rail = { ...plainRail({ input: 12, output: 3.3, current: 5 }), name: evil };
  const { problem, genes } = handMade({ frequency: 3e5, high: { onResistance: 1e-3 } }, rail);
  const named = {
    ...problem.assess(genes),
    design: problem.record(genes),
  };

  it('a formula in a cell is text: no cell begins with =, +, - or @ unless it is a number', () => {
    const csv = takeAway(problem, genes).find((file) => file.name === 'parts.csv')?.text ?? '';
    for (const row of rowsOf(csv)) {
      for (const cell of row) expect(cell).not.toMatch(/^"?[=+\-@](?![\d.])/);
    }
    expect(named.parts.length).toBeGreaterThan(0);
  });

  it('markup in a name is shown as text', () => {
    const files = new Map(takeAwayFiles(problem, genes).map(({ name, text }) => [name, text]));
    expect(files.get('note.html')).not.toContain('<img');
    expect(files.get('note.html')).toContain('&lt;img onerror=x&gt;');
    expect(files.get('note.md')).not.toMatch(/(?<!\\)<img/);
    expect(files.get('stage.cir')).toMatch(/^[\x20-\x7e\n]*$/);
  });

  it('a line break in a name cannot add a line to the netlist', () => {
    const broken = handMade({ frequency: 3e5, high: { onResistance: 1e-3 } }, { ...rail, name: 'a\n.include b' });
    const point = solveAt(broken.problem, broken.genes, fullLoad(broken.problem.rail));
    expect(stageNetlist(broken.problem, 'd', point).text).not.toMatch(/^\.include/m);
  });
});
