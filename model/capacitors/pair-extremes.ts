/** Extremes of the terminal voltage within one crossed segment of a pair: the hottest loop of the model. A kernel. */
import { CURRENT, counts, FORCED, KEPT, kept, pair, STEP } from './pair-state.ts';
import { curve, turn } from './pair-turn.ts';

/** Every fourth step it is asked whether the rest can matter; ringing below this share of the swing found so far is over. */
const LOOK = 3;
const OVER = 1e-6;
/** The parabola through three voltages shows by how much a turn passes the middle one; this many times it is taken for the most. */
const SURE = 2;
/** Steps after which a decay of one step's time constant is over, and the least ratio of two decays that are told apart. */
const FADED = 20;
const APART = 4;
/** Most steps that ringing is followed through; from there on all of its amplitude counts everywhere. */
const LONGEST = 4096;

/**
 * Takes the voltages of segment `i` into the extremes. The voltage is a parabola plus a part e that rings or fades, whose values in
 * equal steps obey e″ = trace·e′ − det·e (Cayley and Hamilton). Near a voltage that passes both of its neighbours, and next to an end
 * whose slope points the other way, lies a turn: sought where it may pass what was found. The walk ends where the rest cannot:
 * e stays within √(e² + e'²·L/g), for d(e'² + e²·g/L)/dt = −2·R/L·e'² (the energy that it loses).
 * @derivation the network of `pair`
 * @valid a crossed segment
 */
export function addExtremes(i: number): void {
  takeCurve(i);
  if (nothingLeft()) return;
  const at = KEPT * i;
  const n = counts[i];
  const { p0, p1, p2 } = curve;
  const m00 = kept[at + STEP];
  const m01 = kept[at + STEP + 2] * pair.l;
  const m10 = kept[at + STEP + 1] / pair.l;
  const m11 = kept[at + STEP + 3];
  const trace = m00 + m11;
  const det = m00 * m11 - m01 * m10;
  const h = pair.d / n;
  curve.length = h;
  curve.rate = curve.product / (pair.omega - pair.alpha);
  const fades = !pair.rings && pair.omega - pair.alpha > APART * curve.rate;
  const steps = fades ? Math.min(n, FADED) : Math.min(n, LONGEST);
  let e0 = curve.e;
  let e1 = m00 * e0 + m01 * curve.f;
  let v0 = p0 + e0;
  let v1 = p0 + (p1 + p2 * h) * h + e1;
  if ((p1 + curve.f) * (v1 - v0) <= 0) {
    curve.v = v0;
    firstTurn();
  }
  let { highest, lowest } = pair;
  if (v1 > highest) highest = v1;
  if (v1 < lowest) lowest = v1;
  let k = 1;
  for (; k < steps; k++) {
    const e2 = trace * e1 - det * e0;
    const t = (k + 1) * h;
    const v2 = p0 + (p1 + p2 * t) * t + e2;
    if (v2 > highest) highest = v2;
    if (v2 < lowest) lowest = v2;
    const bend = 2 * v1 - v0 - v2;
    if ((v1 - v0) * (v1 - v2) > 0) {
      const more = (SURE * (v0 - v2) * (v0 - v2)) / (8 * bend);
      if (v1 + more > highest || v1 + more < lowest) {
        curve.t = k * h;
        curve.e = e1;
        curve.f = (e2 - m00 * e1) / m01;
        curve.from = -1;
        curve.to = 1;
        curve.guess = (0.5 * (v2 - v0)) / bend;
        pair.highest = highest;
        pair.lowest = lowest;
        turn();
        highest = pair.highest;
        lowest = pair.lowest;
      }
    }
    e0 = e1;
    e1 = e2;
    v0 = v1;
    v1 = v2;
    if ((k & LOOK) === 0) {
      curve.t = t;
      curve.e = e1;
      curve.f = m10 * e0 + (m11 * (e1 - m00 * e0)) / m01;
      pair.highest = highest;
      pair.lowest = lowest;
      if (nothingLeft()) return;
    }
  }
  pair.highest = highest;
  pair.lowest = lowest;
  if (k === n) {
    curve.v = v0;
    lastTurn();
    return;
  }
  curve.t = k * h;
  curve.e = e1;
  curve.f = m10 * e0 + (m11 * (e1 - m00 * e0)) / m01;
  if (fades) {
    curve.kept = 0.5 * trace + pair.omega * m01;
    followSlow();
  } else addRest();
}

/** The voltage at time t of segment `i`, p0 + p1·t + p2·t² + e with e'' = sum·e' − product·e, and both its ends. */
function takeCurve(i: number): void {
  const at = KEPT * i;
  const { d, z, u, zEnd, uEnd, bulkShare, r, r1, l, l1, g, perTotal, jump: share } = pair;
  const a = kept[at + CURRENT];
  const s = kept[at + CURRENT + 1];
  const w0 = kept[at + FORCED];
  const w1 = kept[at + FORCED + 1];
  const y0 = kept[at + FORCED + 2];
  const y1 = kept[at + FORCED + 3];
  const p0 = pair.q * perTotal + bulkShare * w0 + r1 * (a - y0) + l1 * s - share * (w0 + r1 * a + l1 * s - r * y0);
  const p1 = a * perTotal + bulkShare * w1 + r1 * (s - y1) - share * (w1 + r1 * s - r * y1);
  const p2 = 0.5 * s * perTotal;
  const cz = bulkShare - share;
  const cu = share * r - r1;
  const perL = 1 / l;
  const first = p0 + cz * z + cu * u;
  curve.t = 0;
  curve.p0 = p0;
  curve.p1 = p1;
  curve.p2 = p2;
  curve.e = cz * z + cu * u;
  curve.f = cu * (z - r * u) * perL - cz * g * u;
  curve.eEnd = cz * zEnd + cu * uEnd;
  curve.fEnd = cu * (zEnd - r * uEnd) * perL - cz * g * uEnd;
  curve.sum = 2 * pair.alpha;
  curve.product = g * perL;
  curve.pEnd = p0 + (p1 + p2 * d) * d;
  // The parabola turns at −p1/(2·p2), if that lies within.
  const top = -0.5 * p1;
  const turns = top * (top - p2 * d) < 0;
  curve.turnTime = turns ? top / p2 : -1;
  curve.turnValue = turns ? p0 + (0.5 * p1 * top) / p2 : 0;
  const last = curve.pEnd + curve.eEnd;
  if (first > pair.highest) pair.highest = first;
  if (first < pair.lowest) pair.lowest = first;
  if (last > pair.highest) pair.highest = last;
  if (last < pair.lowest) pair.lowest = last;
}

/** A turn within the first step, which starts at `curve.v`, if a tangent lets it pass the extremes. */
function firstTurn(): void {
  const tip = curve.v + (curve.p1 + curve.f) * curve.length;
  if (tip <= pair.highest && tip >= pair.lowest) return;
  curve.from = 0;
  curve.to = 1;
  guessBySlope();
  turn();
}

/** A turn within the last step, likewise. */
function lastTurn(): void {
  const { d } = pair;
  const slope = curve.p1 + 2 * curve.p2 * d + curve.fEnd;
  const end = curve.pEnd + curve.eEnd;
  if (slope * (end - curve.v) >= 0) return;
  const tip = end - slope * curve.length;
  if (tip <= pair.highest && tip >= pair.lowest) return;
  curve.t = d;
  curve.e = curve.eEnd;
  curve.f = curve.fEnd;
  curve.from = -1;
  curve.to = 0;
  guessBySlope();
  turn();
}

/** Guesses the turn from slope and bend where `curve` stands. */
function guessBySlope(): void {
  const { p1, p2, t, e, f, sum, product, length } = curve;
  curve.guess = -(p1 + 2 * p2 * t + f) / ((2 * p2 + sum * f - product * e) * length);
}

/** Whether nothing from `curve.t` on can pass the extremes; where e is over it takes what the parabola still has. */
function nothingLeft(): boolean {
  const { p0, p1, p2, t, e, f, product, pEnd, turnTime, turnValue } = curve;
  const { highest, lowest } = pair;
  const here = p0 + (p1 + p2 * t) * t;
  let high = Math.max(here, pEnd);
  let low = Math.min(here, pEnd);
  if (turnTime > t) {
    if (turnValue > high) high = turnValue;
    if (turnValue < low) low = turnValue;
  }
  const above = highest - high;
  const below = low - lowest;
  const room = Math.min(above, below);
  const square = e * e + (f * f) / product;
  if (room >= 0 && square <= room * room) return true;
  const small = OVER * (highest - lowest);
  if (square > small * small) return false;
  addRest();
  return true;
}

/** Takes what is left from `curve.t` on: the parabola's turn, with all that e may still do. */
function addRest(): void {
  const { e, f, product, turnTime, turnValue, t } = curve;
  if (turnTime <= t) return;
  const most = Math.sqrt(e * e + (f * f) / product);
  if (turnValue + most > pair.highest) pair.highest = turnValue + most;
  if (turnValue - most < pair.lowest) pair.lowest = turnValue - most;
}

/** Goes on from `curve.t` with the slower of two decays alone, in steps of up to its own time constant; `curve.kept` is what a first step keeps of it. */
function followSlow(): void {
  const { d } = pair;
  const { p0, p1, p2 } = curve;
  const { rate } = curve;
  let h = curve.length;
  let keeps = curve.kept;
  while (2 * rate * h <= 1 && curve.t + h < d) {
    h *= 2;
    keeps *= keeps;
  }
  curve.sum = -rate;
  curve.product = 0;
  curve.from = 0;
  curve.to = 1;
  let { t, e } = curve;
  while (t < d) {
    const last = !(t + h < d);
    const t1 = last ? d : t + h;
    const e1 = last ? curve.eEnd : keeps * e;
    const v = p0 + (p1 + p2 * t1) * t1 + e1;
    if (v > pair.highest) pair.highest = v;
    if (v < pair.lowest) pair.lowest = v;
    const slope = p1 + 2 * p2 * t - rate * e;
    const slope1 = p1 + 2 * p2 * t1 - rate * e1;
    if (slope * slope1 < 0) {
      curve.t = t;
      curve.length = t1 - t;
      curve.e = e;
      curve.f = -rate * e;
      curve.guess = slope / (slope - slope1);
      turn();
    }
    t = t1;
    e = e1;
    if (Math.abs(e) <= OVER * (pair.highest - pair.lowest)) break;
  }
  curve.t = t;
  curve.e = e;
  curve.f = 0;
  curve.product = 1;
  addRest();
}
