/** Which designs stand for a front. */
import { describe, expect, it } from 'vitest';
import { representativesOf } from '../../model/representatives.ts';

describe('representatives of a front', () => {
  const names = ['loss', 'volume', 'cost'];

  it('the best of each objective, and last the one nearest to the best of everything', () => {
    const values = [
      [1, 9, 9],
      [9, 1, 9],
      [9, 9, 1],
      [3, 3, 3],
    ];
    expect(representativesOf(names, values)).toEqual([
      { title: 'coolest', index: 0 },
      { title: 'smallest', index: 1 },
      { title: 'cheapest', index: 2 },
      { title: 'balanced', index: 3 },
    ]);
  });

  it('a corner of the front is never the balanced one where something lies between, however small its product', () => {
    const values = [
      [8, 1, 1],
      [4, 3, 2],
      [1, 20, 9],
    ];
    expect(representativesOf(names, values).at(-1)).toEqual({ title: 'balanced', index: 1 });
  });

  it('a per mille of loss buys no doubled cost: among alike designs the better bargain stands for them', () => {
    const values = [
      [1, 2, 20],
      [1.001, 2, 10],
      [5, 1, 30],
    ];
    expect(representativesOf(names, values)[0]).toEqual({ title: 'coolest', index: 1 });
  });

  it('nothing for an empty front', () => {
    expect(representativesOf(names, [])).toEqual([]);
  });
});
