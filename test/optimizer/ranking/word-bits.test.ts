import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { highestBit, lowestBit } from '../../../optimizer/ranking/word-bits.ts';

describe('bits of a word', () => {
  it.each(Array.from({ length: 32 }, (_, bit) => bit))('finds bit %i standing alone', (bit) => {
    expect([lowestBit(1 << bit), highestBit(1 << bit)]).toEqual([bit, bit]);
  });

  it('finds the first and the last 1 of the binary digits', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 2 ** 32 - 1 }), (word) => {
        const digits = word.toString(2);
        expect(highestBit(word | 0)).toBe(digits.length - 1);
        expect(lowestBit(word | 0)).toBe(digits.length - 1 - digits.lastIndexOf('1'));
      }),
    );
  });
});
