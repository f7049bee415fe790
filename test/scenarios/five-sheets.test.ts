/** Each shipped sheet has designs, and a sweep of it shows what its row says. */
import { describe, expect, it } from 'vitest';
import { SHEETS, sheetStatements } from './five-sheets.ts';
import { shippedRail, spaceOf, sweep } from './spaces.ts';

/** Small, seeded budgets: a search of minutes is in the evidence. */
const EVALUATIONS = 12_000;
const SIDE_EVALUATIONS = 5_000;

describe.each(Object.keys(SHEETS))('%s', (name) => {
  it('shows what its row says', () => {
    const found = sweep(spaceOf(shippedRail(name)), EVALUATIONS);
    const statements = sheetStatements(name, found, SIDE_EVALUATIONS);
    const broken = statements.filter(({ holds }) => !holds).map(({ says, ours }) => `${says}: ${ours}`);
    expect(broken).toEqual([]);
    expect(statements.length).toBeGreaterThanOrEqual(5);
  }, 300_000);
});
