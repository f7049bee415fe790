/**
 * An ordered set of whole numbers with neighbours in a few machine operations: a tree of 32-way bit words (the idea of van Emde Boas 1977).
 * Sweeps keep their staircase in it, by position in a presorted order: no balancing, no allocation, no bad case.
 */

import { highestBit, lowestBit } from '../ranking/word-bits.ts';

/** Most positions a set can hold: four levels of 32. */
export const MOST_POSITIONS = 1 << 20;

/** Set of positions 0 … capacity − 1. `before` and `after` ask for a neighbour that must exist: sweeps put a guard at each end. */
export class PositionSet {
  private readonly words: Int32Array;
  private readonly groups: Int32Array;
  private readonly regions: Int32Array;
  private root: number;

  /** An empty set; `capacity` at most MOST_POSITIONS. */
  constructor(capacity: number) {
    if (capacity > MOST_POSITIONS)
      throw new RangeError(`a position set holds at most ${MOST_POSITIONS}, not ${capacity}`);
    this.words = new Int32Array((capacity >> 5) + 1);
    this.groups = new Int32Array((capacity >> 10) + 1);
    this.regions = new Int32Array((capacity >> 15) + 1);
    this.root = 0;
  }

  /** Empties the set, whose positions are all below `end`. */
  clear(end: number): void {
    this.words.fill(0, 0, (end >> 5) + 1);
    this.groups.fill(0, 0, (end >> 10) + 1);
    this.regions.fill(0, 0, (end >> 15) + 1);
    this.root = 0;
  }

  add(position: number): void {
    this.words[position >> 5] |= 1 << (position & 31);
    this.groups[position >> 10] |= 1 << ((position >> 5) & 31);
    this.regions[position >> 15] |= 1 << ((position >> 10) & 31);
    this.root |= 1 << (position >> 15);
  }

  remove(position: number): void {
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

  /** Largest member below `position`. */
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

  /** Smallest member above `position`. */
  after(position: number): number {
    let word = position >> 5;
    let bits = this.words[word] & (-2 << (position & 31));
    if (bits === 0) {
      let group = word >> 5;
      bits = this.groups[group] & (-2 << (word & 31));
      if (bits === 0) {
        let region = group >> 5;
        bits = this.regions[region] & (-2 << (group & 31));
        if (bits === 0) {
          const later = this.root & (-2 << region);
          region = lowestBit(later);
          bits = this.regions[region];
        }
        group = (region << 5) | lowestBit(bits);
        bits = this.groups[group];
      }
      word = (group << 5) | lowestBit(bits);
      bits = this.words[word];
    }
    return (word << 5) | lowestBit(bits);
  }
}
