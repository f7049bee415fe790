/**
 * A million results of every portable function, as one number each, written down once (Node 20.20, x64). The page's test
 * runs the same code in a browser against the same numbers.
 */
import { describe, expect, it } from 'vitest';
import { hashOf, SUBJECTS } from './hash.ts';
import { HASHES } from './hashes.ts';

describe('a million results to the bit', () => {
  it('has a number for every function', () => {
    expect(Object.keys(HASHES)).toEqual(SUBJECTS.map((subject) => subject.name));
  });

  for (const { name } of SUBJECTS) {
    it(name, () => {
      expect(hashOf(name)).toBe(HASHES[name]);
    });
  }
});
