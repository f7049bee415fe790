/**
 * Exchange: a chosen point gives way to one that adds more in its place, until no such exchange is found; then neighbourhoods are scattered and settled
 * again, which is kept when it gained (iterated local search; Lourenço, Martin, Stützle 2003). Greedy inclusion alone stays short,
 * as its first choices were made for fewer points.
 */
import type { ChosenSet } from './chosen-set.ts';
import { Neighbourhood } from './neighbourhood.ts';

/** Chosen points looked at again when one near them has changed. */
const AFFECTED = 10;
/** Chosen points scattered at a time. */
const SCATTERED = 8;
/** Candidates tried anywhere, the most promising first. */
const FAR = 40;
/** Looking at 2^LOOK points costs about as much as measuring one contribution. */
const LOOK = 8;
/** An exchange must gain more than this part of what it replaces, or rounding could keep it going for ever. */
const LEAST_GAIN = 1e-9;

/**
 * Improves the points marked in `chosen` (those in `set`), of 0 … n − 1 in `m` objectives, until about `budget` contributions have been
 * measured. Deterministic: the scattering follows one fixed sequence.
 */
export function exchange(
  set: ChosenSet,
  points: Float64Array,
  n: number,
  m: number,
  chosen: Uint8Array,
  budget: number,
): void {
  const search = new ExchangeSearch(set, points, n, m, chosen, budget);
  search.markAll();
  search.settle();
  while (search.exchangeFar()) search.settle();
  search.scatterRepeatedly();
}

class ExchangeSearch {
  private readonly set: ChosenSet;
  private readonly n: number;
  private readonly chosen: Uint8Array;
  private readonly neighbourhood: Neighbourhood;
  /** Chosen points still to be looked at, and whether a point is among them. */
  private readonly queue: number[] = [];
  private readonly queued: Uint8Array;
  /** The chosen points, in no particular order, and the place of each there. */
  private readonly roster: Int32Array;
  private readonly place: Int32Array;
  private members = 0;
  /** Hypervolume gained since the start. */
  private gained = 0;
  private left: number;
  private state = 1;

  constructor(set: ChosenSet, points: Float64Array, n: number, m: number, chosen: Uint8Array, budget: number) {
    this.set = set;
    this.n = n;
    this.chosen = chosen;
    this.neighbourhood = new Neighbourhood(points, n, m);
    this.queued = new Uint8Array(n);
    this.left = budget;
    this.place = new Int32Array(n);
    const roster: number[] = [];
    for (let point = 0; point < n; point++) {
      if (chosen[point] === 0) continue;
      this.place[point] = roster.length;
      roster.push(point);
    }
    this.members = roster.length;
    this.roster = Int32Array.from([...roster, 0]);
  }

  markAll(): void {
    for (let k = 0; k < this.members; k++) this.mark(this.roster[k]);
  }

  /** Exchanges with near candidates until none gains. */
  settle(): void {
    for (let next = 0; next < this.queue.length; next++) {
      const point = this.queue[next];
      this.queued[point] = 0;
      if (this.chosen[point] === 0 || this.left <= 0) continue;
      const by = this.replaceByBest(point);
      if (by !== point) this.markAround(by);
    }
    this.queue.length = 0;
  }

  /** Adds a promising candidate from anywhere and drops whoever is then least: true when that was another, at least once. */
  exchangeFar(): boolean {
    if (this.left <= 0) return false;
    const { set, chosen, n } = this;
    const gains = new Float64Array(n);
    const others: number[] = [];
    for (let point = 0; point < n; point++) {
      if (chosen[point] === 1) continue;
      gains[point] = set.gain(point);
      others.push(point);
    }
    this.left -= n;
    others.sort((a, b) => gains[b] - gains[a] || a - b);
    let improved = false;
    for (const candidate of others.slice(0, FAR)) {
      const gain = set.gain(candidate);
      this.add(candidate);
      const least = this.leastOf(candidate, gain);
      this.remove(least);
      this.gained += gain - set.gain(least);
      if (least === candidate) continue;
      improved = true;
      this.markAround(candidate);
    }
    return improved;
  }

  /** Scatters one neighbourhood after the other and keeps what gained, while the budget lasts. */
  scatterRepeatedly(): void {
    const best = this.roster.slice(0, this.members);
    const inBest = Uint8Array.from(this.chosen);
    let bestGained = this.gained;
    while (this.left > 0) {
      this.scatter(best[this.random(best.length)]);
      this.settle();
      if (this.gained > bestGained + LEAST_GAIN * Math.abs(bestGained)) {
        best.set(this.roster.subarray(0, this.members));
        inBest.set(this.chosen);
        bestGained = this.gained;
      } else {
        this.restore(best, inBest);
        this.gained = bestGained;
      }
    }
  }

  /** Takes out the chosen points around `centre` and puts as many of the points in that region back in, drawn without looking. */
  private scatter(centre: number): void {
    const { neighbourhood, roster } = this;
    const count = neighbourhood.among(roster, this.members, centre, SCATTERED);
    const around = neighbourhood.near.slice(0, count);
    const reach = neighbourhood.distance[count - 1];
    for (const point of around) {
      this.remove(point);
      this.gained -= this.set.gain(point);
    }
    const region: number[] = [];
    for (let point = 0; point < this.n; point++) {
      if (this.chosen[point] === 0 && neighbourhood.squares(point, centre) <= reach) region.push(point);
    }
    for (let k = 0; k < count; k++) {
      const at = k + this.random(region.length - k);
      const point = region[at];
      region[at] = region[k];
      this.gained += this.set.gain(point);
      this.add(point);
      this.mark(point);
    }
    this.left -= 2 * count + (this.n >> LOOK);
    this.markAround(centre);
  }

  /** Puts the best of the nearest candidates in the place of `point`, if one adds more than it. Returns who stands there now. */
  private replaceByBest(point: number): number {
    const { set, chosen } = this;
    if (!this.neighbourhood.knows(point)) this.left -= this.n >> LOOK;
    const candidates = this.neighbourhood.of(point);
    this.left -= candidates.length + 1;
    this.remove(point);
    const own = set.gain(point);
    let best = own * (1 + LEAST_GAIN);
    let by = point;
    for (const candidate of candidates) {
      if (chosen[candidate] === 1) continue;
      const gain = set.gain(candidate);
      if (gain > best) {
        best = gain;
        by = candidate;
      }
    }
    this.add(by);
    if (by !== point) this.gained += best - own;
    return by;
  }

  private leastOf(candidate: number, gain: number): number {
    let least = gain;
    let at = candidate;
    this.left -= this.members;
    for (let k = 0; k < this.members; k++) {
      const point = this.roster[k];
      const value = this.set.gain(point);
      if (value * (1 + LEAST_GAIN) < least) {
        least = value;
        at = point;
      }
    }
    return at;
  }

  private restore(best: Int32Array, inBest: Uint8Array): void {
    for (const point of this.roster.slice(0, this.members)) if (inBest[point] === 0) this.remove(point);
    for (const point of best) if (this.chosen[point] === 0) this.add(point);
  }

  private add(point: number): void {
    this.set.add(point);
    this.chosen[point] = 1;
    this.place[point] = this.members;
    this.roster[this.members++] = point;
  }

  private remove(point: number): void {
    this.set.remove(point);
    this.chosen[point] = 0;
    const last = this.roster[--this.members];
    this.roster[this.place[point]] = last;
    this.place[last] = this.place[point];
  }

  private mark(point: number): void {
    if (this.queued[point] === 1) return;
    this.queued[point] = 1;
    this.queue.push(point);
  }

  private markAround(point: number): void {
    const count = this.neighbourhood.among(this.roster, this.members, point, AFFECTED);
    for (let k = 0; k < count; k++) this.mark(this.neighbourhood.near[k]);
  }

  /** Next whole number below `limit` of a fixed sequence (mulberry32). */
  private random(limit: number): number {
    this.state = (this.state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(this.state ^ (this.state >>> 15), this.state | 1);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) % limit;
  }
}
