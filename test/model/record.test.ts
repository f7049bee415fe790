/** A design as names and numbers: what is refused, by name, and what is snapped. */
import { describe, expect, it } from 'vitest';
import type { DesignRecord } from '../../model/assessment.ts';
import { describeFinding } from '../../model/outcome.ts';
import { readSpec } from '../../model/spec.ts';
import { shippedProblem } from './shipped.ts';
import { need, randomFrom, randomGenes } from './support.ts';

const problem = shippedProblem('buoy-sensors');
const good = problem.record(randomGenes(problem, randomFrom(1)));

function refusals(record: DesignRecord): string {
  const outcome = problem.genesFrom(record, 'design.json');
  expect(outcome.ok).toBe(false);
  return outcome.ok ? '' : outcome.findings.map(describeFinding).join('\n');
}

describe('what a record is refused for', () => {
  it('a part that no table has: its slot and its name', () => {
    const text = refusals({ ...good, parts: { ...good.parts, highSwitch: 'NOPE-1' } });
    expect(text).toContain('design.json');
    expect(text).toContain('parts.highSwitch');
    expect(text).toContain('NOPE-1');
  });

  it('a slot, a gene, an architecture that do not exist', () => {
    expect(refusals({ ...good, parts: { ...good.parts, flywheel: 'x' } })).toContain('parts.flywheel');
    expect(refusals({ ...good, genes: { ...good.genes, gears: 3 } })).toContain('genes.gears');
    expect(refusals({ ...good, architecture: 'half-bridge-centre-tap' })).toContain('half-bridge-centre-tap');
  });

  it('a number outside what the sheet allows, with both ends of it', () => {
    const { low, high } = problem.genes.find(({ name }) => name === 'frequency') ?? { low: 0, high: 0 };
    const text = refusals({ ...good, genes: { ...good.genes, frequency: 2 * high } });
    expect(text).toContain('genes.frequency');
    expect(text).toContain(String(low));
    expect(text).toContain(String(high));
    expect(refusals({ ...good, genes: { ...good.genes, phases: Number.NaN } })).toContain('genes.phases');
  });

  it.each(['highSwitch', 'inductor', 'controller', 'outputCeramic', 'inputCeramic'])(
    'a design without its %s',
    (slot) => {
      const { [slot]: _, ...parts } = good.parts;
      expect(refusals({ ...good, parts })).toContain(slot);
    },
  );

  it.each(['frequency', 'phases', 'outputCeramicCount'])('a design without its %s', (gene) => {
    const { [gene]: _, ...genes } = good.genes;
    expect(refusals({ ...good, genes })).toContain(gene);
  });

  it('everything wrong at once, not only the first', () => {
    const text = refusals({
      ...good,
      genes: { ...good.genes, gears: 1 },
      parts: { ...good.parts, diode: 'D', inductor: 'L' },
    });
    for (const name of ['gears', 'diode', 'inductor']) expect(text).toContain(name);
  });
});

describe('what a record is snapped to', () => {
  it('a frequency has three digits', () => {
    const genes = need(problem.genesFrom({ ...good, genes: { ...good.genes, frequency: 123456.7 } }));
    expect(problem.record(genes).genes.frequency).toBe(123e3);
  });
});

describe('what a spec file is refused for', () => {
  const text = (data: unknown): string => {
    const outcome = readSpec(typeof data === 'string' ? data : JSON.stringify(data), 'a.json');
    return outcome.ok ? '' : outcome.findings.map(describeFinding).join('\n');
  };

  it('not being JSON, not being a spec, a wrong type deep inside', () => {
    expect(text('{')).toMatch(/^a\.json/);
    expect(text([])).toMatch(/^a\.json/);
    const shell = { format: 'chopfront-spec', version: 1, tool: 't', id: 'd', rail: 'r', ...good };
    expect(text({ ...shell, format: 'other' })).toContain('format');
    expect(text({ ...shell, genes: { frequency: 'fast' } })).toContain('genes.frequency');
    expect(text({ ...shell, genes: { frequency: 'fast' } })).toContain('"fast"');
    expect(text(shell)).toBe('');
  });
});
