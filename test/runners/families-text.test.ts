/** Why families lost, as the terminal says it: one line each, limits in words. */
import { describe, expect, it } from 'vitest';
import { familyReason, type RailProblem } from '../../model/index.ts';
import { familiesText } from '../../runners/commands/families-text.ts';

const problem = {
  objectives: [{ name: 'loss', unit: 'W' }],
  limits: ['outputRipple', 'avoidedBands'],
} as unknown as RailProblem;
const winner = { id: 'd1', family: 'a ×1', genes: {}, parts: {}, objectives: [1.5], margins: {}, worstMargin: 0.1 };
const note = (family: string, evaluated: number, feasible: number, best: number[], violated: number[]) => ({
  family,
  evaluated,
  feasible,
  front: family === winner.family ? 1 : 0,
  reason: familyReason(problem, family, { evaluated, feasible, best, violated }, [winner]),
});

describe('families in the terminal', () => {
  it('names the limits that a family missed most often, or by how much its best was beaten; winners have no line', () => {
    const text = familiesText([
      note('a ×1', 100, 50, [1.5], [10, 40]),
      note('b ×1', 200, 0, [], [150, 20]),
      note('c ×1', 80, 8, [2], [0, 72]),
      note('d ×1', 0, 0, [], [0, 0]),
    ]);
    const lines = text.replaceAll('\u00a0', ' ').split('\n');
    expect(lines).toHaveLength(4);
    expect(lines[1]).toContain(
      'no design of 200 kept every limit; missed most often: output ripple by 75 %, clearance from avoided bands by 10 %',
    );
    expect(lines[2]).toContain('kept every limit 8 times but was always beaten; its best loss 2 W against 1.5 W');
    expect(lines[3]).toContain('not tried: the budget ended before its turn');
  });

  it('says nothing where every family is on the front', () => {
    expect(familiesText([note('a ×1', 100, 50, [1.5], [10, 40])])).toBe('');
  });
});
