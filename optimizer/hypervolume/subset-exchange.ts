/**
 * Exchange: a chosen point gives way to one that adds more in its place, until no such exchange is found. Greedy inclusion alone stays about a per cent of
 * the gap short, as its first choices were made for fewer points.
 */
import type { ChosenSet } from './chosen-set.ts';

/** Candidates tried in the place of a chosen point: its nearest. */
const NEAREST = 24;
/** Candidates tried anywhere, the most promising first, when no near exchange is left. */
const FAR = 40;
/** An exchange must gain more than this part of what it replaces, or rounding could keep it going for ever. */
const LEAST_GAIN = 1e-9;

/**
 * Improves the points marked in `chosen` (those in `set`), of 0 … n − 1 in `m` objectives, by exchanges that each add hypervolume. Near
 * exchanges go round the chosen until a whole round finds none; then far ones; again from the start if a far one helped. Ends after
 * `budget` measurements at the latest.
 */
export function exchange(
  set: ChosenSet,
  points: Float64Array,
  n: number,
  m: number,
  chosen: Uint8Array,
  budget: number,
): void {
  const scale = inverseRanges(points, n, m);
  const near = new Int32Array(NEAREST);
  const distance = new Float64Array(NEAREST);
  let left = budget;
  for (;;) {
    for (let improved = true; improved && left > 0; ) {
      improved = false;
      for (let point = 0; point < n && left > 0; point++) {
        if (chosen[point] === 0) continue;
        const found = nearest(points, n, m, scale, chosen, point, near, distance);
        left -= found + 1;
        if (replaceByBest(set, chosen, point, near, found)) improved = true;
      }
    }
    left -= n;
    if (left <= 0 || !exchangeFar(set, n, chosen)) return;
  }
}

/** Puts the best of the first `count` candidates in the place of `point`, if one adds more than it. */
function replaceByBest(
  set: ChosenSet,
  chosen: Uint8Array,
  point: number,
  candidates: Int32Array,
  count: number,
): boolean {
  set.remove(point);
  const own = set.gain(point);
  let best = own * (1 + LEAST_GAIN);
  let by = point;
  for (let k = 0; k < count; k++) {
    const gain = set.gain(candidates[k]);
    if (gain > best) {
      best = gain;
      by = candidates[k];
    }
  }
  set.add(by);
  chosen[point] = 0;
  chosen[by] = 1;
  return by !== point;
}

/** Adds the candidate that adds most and drops whoever is then least, if that is another: once for each of the FAR best candidates. */
function exchangeFar(set: ChosenSet, n: number, chosen: Uint8Array): boolean {
  const gains = new Float64Array(n);
  const others: number[] = [];
  for (let point = 0; point < n; point++) {
    if (chosen[point] === 1) continue;
    gains[point] = set.gain(point);
    others.push(point);
  }
  others.sort((a, b) => gains[b] - gains[a] || a - b);
  let improved = false;
  for (const candidate of others.slice(0, FAR)) {
    const gain = set.gain(candidate);
    set.add(candidate);
    let least = gain;
    let at = candidate;
    for (let point = 0; point < n; point++) {
      if (chosen[point] === 0) continue;
      const value = set.gain(point);
      if (value * (1 + LEAST_GAIN) < least) {
        least = value;
        at = point;
      }
    }
    set.remove(at);
    if (at === candidate) continue;
    chosen[at] = 0;
    chosen[candidate] = 1;
    improved = true;
  }
  return improved;
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

/** Lists the unchosen points nearest to `point`, nearest first, in objectives scaled by their range; returns how many. */
function nearest(
  points: Float64Array,
  n: number,
  m: number,
  scale: Float64Array,
  chosen: Uint8Array,
  point: number,
  near: Int32Array,
  distance: Float64Array,
): number {
  let count = 0;
  for (let other = 0; other < n; other++) {
    let squares = 0;
    for (let c = 0; c < m; c++) {
      const step = (points[other * m + c] - points[point * m + c]) * scale[c];
      squares += step * step;
    }
    if ((count === NEAREST && squares >= distance[count - 1]) || chosen[other] === 1) continue;
    let at = count < NEAREST ? count++ : NEAREST - 1;
    for (; at > 0 && distance[at - 1] > squares; at--) {
      distance[at] = distance[at - 1];
      near[at] = near[at - 1];
    }
    distance[at] = squares;
    near[at] = other;
  }
  return count;
}
