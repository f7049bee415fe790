/**
 * Exchange: a chosen point gives way to one that adds more in its place, until no such exchange is found; then neighbourhoods are scattered and settled
 * again, which is kept when it gained (iterated local search; Lourenço, Martin, Stützle 2003). Greedy inclusion alone stays short,
 * as its first choices were made for fewer points.
 */
import type { ChosenSet } from './chosen-set.ts';

/** Candidates tried in the place of a chosen point: its nearest. */
const NEAREST = 24;
/** Chosen points looked at again when one near them has changed. */
const AFFECTED = 10;
/** Chosen points scattered at a time. */
const SCATTERED = 8;
/** Candidates tried anywhere, the most promising first. */
const FAR = 40;
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
  private readonly points: Float64Array;
  private readonly n: number;
  private readonly m: number;
  private readonly chosen: Uint8Array;
  private readonly scale: Float64Array;
  /** Chosen points still to be looked at, and whether a point is among them. */
  private readonly queue: number[] = [];
  private readonly queued: Uint8Array;
  private readonly near = new Int32Array(NEAREST);
  private readonly distance = new Float64Array(NEAREST);
  /** Hypervolume gained since the start. */
  private gained = 0;
  private left: number;
  private state = 1;

  constructor(set: ChosenSet, points: Float64Array, n: number, m: number, chosen: Uint8Array, budget: number) {
    this.set = set;
    this.points = points;
    this.n = n;
    this.m = m;
    this.chosen = chosen;
    this.scale = inverseRanges(points, n, m);
    this.queued = new Uint8Array(n);
    this.left = budget;
  }

  markAll(): void {
    for (let point = 0; point < this.n; point++) if (this.chosen[point] === 1) this.mark(point);
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
    const best = this.members();
    const inBest = Uint8Array.from(this.chosen);
    let bestGained = this.gained;
    while (this.left > 0) {
      this.scatter(best[this.random(best.length)]);
      this.settle();
      if (this.gained > bestGained + LEAST_GAIN * Math.abs(bestGained)) {
        best.set(this.members());
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
    const count = this.nearest(centre, SCATTERED, 1);
    const around = Array.from(this.near.subarray(0, count));
    const reach = this.distance[count - 1];
    for (const point of around) {
      this.remove(point);
      this.gained -= this.set.gain(point);
    }
    const region: number[] = [];
    for (let point = 0; point < this.n; point++) {
      if (this.chosen[point] === 0 && this.squares(point, centre) <= reach) region.push(point);
    }
    for (let k = 0; k < count; k++) {
      const at = k + this.random(region.length - k);
      const point = region[at];
      region[at] = region[k];
      this.gained += this.set.gain(point);
      this.add(point);
      this.mark(point);
    }
    this.left -= 2 * count;
    this.markAround(centre);
  }

  /** Puts the best of the nearest candidates in the place of `point`, if one adds more than it. Returns who stands there now. */
  private replaceByBest(point: number): number {
    const { set, near } = this;
    const count = this.nearest(point, NEAREST, 0);
    this.left -= count + 1;
    this.remove(point);
    const own = set.gain(point);
    let best = own * (1 + LEAST_GAIN);
    let by = point;
    for (let k = 0; k < count; k++) {
      const gain = set.gain(near[k]);
      if (gain > best) {
        best = gain;
        by = near[k];
      }
    }
    this.add(by);
    if (by !== point) this.gained += best - own;
    return by;
  }

  private leastOf(candidate: number, gain: number): number {
    let least = gain;
    let at = candidate;
    for (let point = 0; point < this.n; point++) {
      if (this.chosen[point] === 0) continue;
      this.left--;
      const value = this.set.gain(point);
      if (value * (1 + LEAST_GAIN) < least) {
        least = value;
        at = point;
      }
    }
    return at;
  }

  private restore(best: Int32Array, inBest: Uint8Array): void {
    for (const point of this.members()) if (inBest[point] === 0) this.remove(point);
    for (const point of best) if (this.chosen[point] === 0) this.add(point);
  }

  private members(): Int32Array {
    const members: number[] = [];
    for (let point = 0; point < this.n; point++) if (this.chosen[point] === 1) members.push(point);
    return Int32Array.from(members);
  }

  private add(point: number): void {
    this.set.add(point);
    this.chosen[point] = 1;
  }

  private remove(point: number): void {
    this.set.remove(point);
    this.chosen[point] = 0;
  }

  private mark(point: number): void {
    if (this.queued[point] === 1) return;
    this.queued[point] = 1;
    this.queue.push(point);
  }

  private markAround(point: number): void {
    const count = this.nearest(point, AFFECTED, 1);
    for (let k = 0; k < count; k++) this.mark(this.near[k]);
  }

  /** Fills `near` with the `most` points nearest to `point` that are chosen (`kind` 1) or not (0), nearest first; returns how many. */
  private nearest(point: number, most: number, kind: number): number {
    const { near, distance, chosen, n } = this;
    let count = 0;
    for (let other = 0; other < n; other++) {
      if (chosen[other] !== kind) continue;
      const squares = this.squares(other, point);
      if (count === most && squares >= distance[count - 1]) continue;
      let at = count < most ? count++ : most - 1;
      for (; at > 0 && distance[at - 1] > squares; at--) {
        distance[at] = distance[at - 1];
        near[at] = near[at - 1];
      }
      distance[at] = squares;
      near[at] = other;
    }
    return count;
  }

  /** Squared distance in objectives scaled by their range. */
  private squares(a: number, b: number): number {
    const { points, scale, m } = this;
    let sum = 0;
    for (let c = 0; c < m; c++) {
      const step = (points[a * m + c] - points[b * m + c]) * scale[c];
      sum += step * step;
    }
    return sum;
  }

  /** Next whole number below `limit` of a fixed sequence (mulberry32). */
  private random(limit: number): number {
    this.state = (this.state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(this.state ^ (this.state >>> 15), this.state | 1);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) % limit;
  }
}

function inverseRanges(points: Float64Array, n: number, m: number): Float64Array {
  const scale = new Float64Array(m);
  for (let c = 0; c < m; c++) {
    let low = Number.POSITIVE_INFINITY;
    let high = Number.NEGATIVE_INFINITY;
    for (let i = 0; i < n; i++) {
      low = Math.min(low, points[i * m + c]);
      high = Math.max(high, points[i * m + c]);
    }
    scale[c] = high > low ? 1 / (high - low) : 0;
  }
  return scale;
}
