import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { highestBit } from '../../../optimizer/ranking/word-bits.ts';

describe('highest bit of a word', () => {
  it.each(Array.from({ length: 32 }, (_, bit) => bit))('is bit %i when that stands alone', (bit) => {
    expect(highestBit(1 << bit)).toBe(bit);
  });

  it('is the first of the binary digits', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 2 ** 32 - 1 }), (word) => {
        expect(highestBit(word | 0)).toBe(word.toString(2).length - 1);
      }),
    );
  });
});
