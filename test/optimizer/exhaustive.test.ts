/**
 * The search against every design of a converter space: the demo's rail with a handful of parts and frequencies in steps of 100 kHz, almost 600,000 designs, so
 * that the true front is known without any search. It is held to 99.5 % of that after judging a fiftieth of the space.
 */
import { describe, expect, it } from 'vitest';
import { hypervolumeOf, search } from '../../optimizer/index.ts';
import { judgeAll, smallProblem } from '../support/small-rail.ts';
import { SMALL_PARTS, SMALL_STEPS } from '../support/small-spaces.ts';

describe('a converter space judged whole', () => {
  const problem = smallProblem({ parts: SMALL_PARTS, ceramics: 6, frequencies: SMALL_STEPS });
  const { designs, feasible, front } = judgeAll(problem, SMALL_STEPS);
  const truth = hypervolumeOf(problem, front);

  it('is large enough to be searched, and most of it breaks a limit', () => {
    expect(designs).toBeGreaterThan(500_000);
    expect(feasible).toBeGreaterThan(1000);
    expect(feasible / designs).toBeLessThan(0.2);
    expect(front.count).toBeGreaterThan(20);
  });

  it.each([1, 2, 3])('yields all but 0.005 of its hypervolume to a search of a fiftieth of it, seed %i', (seed) => {
    const found = search(problem, { evaluations: Math.floor(designs / 50), seed });
    expect(found.hypervolume / truth).toBeGreaterThanOrEqual(0.995);
    // Nothing beats the true front by more than the archive's grid rounds.
    expect(found.hypervolume / truth).toBeLessThanOrEqual(1 + 1e-3);
  });
});
