/**
 * An ordered set of whole numbers: links between neighbours, and a tree of 32-way bit words (the idea of van Emde Boas 1977) that finds where a
 * newcomer belongs in a few machine operations. Sweeps keep their staircase in it, by position in a presorted order: no balancing, no allocation,
 * no bad case.
 */

import { highestBit } from '../ranking/word-bits.ts';

/** Most positions a set can hold: four levels of 32. */
const MOST_POSITIONS = 1 << 20;

/** Set of positions between two guards, 0 and `end`, that are always in it. */
export class PositionSet {
  /** Next larger and next smaller member of each member. */
  readonly next: Int32Array;
  readonly previous: Int32Array;
  private readonly words: Int32Array;
  private readonly groups: Int32Array;
  private readonly regions: Int32Array;
  private root: number;

  /** A set of positions below `capacity`, at most 1,048,576; a RangeError above. */
  constructor(capacity: number) {
    if (capacity > MOST_POSITIONS)
      throw new RangeError(`a position set holds at most ${MOST_POSITIONS}, not ${capacity}`);
    this.next = new Int32Array(capacity);
    this.previous = new Int32Array(capacity);
    this.words = new Int32Array((capacity >> 5) + 1);
    this.groups = new Int32Array((capacity >> 10) + 1);
    this.regions = new Int32Array((capacity >> 15) + 1);
    this.root = 0;
  }

  /** Empties the set but for the guards 0 and `end`, the largest position from now on. */
  reset(end: number): void {
    this.words.fill(0, 0, (end >> 5) + 1);
    this.groups.fill(0, 0, (end >> 10) + 1);
    this.regions.fill(0, 0, (end >> 15) + 1);
    this.words[0] = this.groups[0] = this.regions[0] = this.root = 1;
    this.next[0] = end;
    this.previous[end] = 0;
  }

  /** Adds a position right after the member `before`, which `before(position)` told. */
  insertAfter(position: number, before: number): void {
    const { next, previous } = this;
    const after = next[before];
    next[before] = position;
    previous[position] = before;
    next[position] = after;
    previous[after] = position;
    this.words[position >> 5] |= 1 << (position & 31);
    this.groups[position >> 10] |= 1 << ((position >> 5) & 31);
    this.regions[position >> 15] |= 1 << ((position >> 10) & 31);
    this.root |= 1 << (position >> 15);
  }

  /** Removes a member that is no guard. */
  remove(position: number): void {
    const { next, previous } = this;
    next[previous[position]] = next[position];
    previous[next[position]] = previous[position];
    const word = position >> 5;
    this.words[word] &= ~(1 << (position & 31));
    if (this.words[word] !== 0) return;
    const group = position >> 10;
    this.groups[group] &= ~(1 << (word & 31));
    if (this.groups[group] !== 0) return;
    const region = position >> 15;
    this.regions[region] &= ~(1 << (group & 31));
    if (this.regions[region] === 0) this.root &= ~(1 << region);
  }

  /** Largest member below `position`, which is above 0 and need not be a member. */
  before(position: number): number {
    let word = position >> 5;
    let bits = this.words[word] & ((1 << (position & 31)) - 1);
    if (bits === 0) {
      let group = word >> 5;
      bits = this.groups[group] & ((1 << (word & 31)) - 1);
      if (bits === 0) {
        let region = group >> 5;
        bits = this.regions[region] & ((1 << (group & 31)) - 1);
        if (bits === 0) {
          region = highestBit(this.root & ((1 << region) - 1));
          bits = this.regions[region];
        }
        group = (region << 5) | highestBit(bits);
        bits = this.groups[group];
      }
      word = (group << 5) | highestBit(bits);
      bits = this.words[word];
    }
    return (word << 5) | highestBit(bits);
  }
}
