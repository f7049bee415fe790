/** A turn of a pair's terminal voltage near one moment of a segment, by its series there. A kernel: it speaks through one record. */
import { pair } from './pair-state.ts';

/** Terms of the series: the next one is 3e-6 of the first at the far end of a step of the longest kind. */
const TERMS = 10;
/** Rounds of Newton's method: a turn is flat, so that its value is far closer than its time. */
const ROUNDS = 2;

/** What a turn is sought by; doubles that would be boxed as arguments. */
export const curve = {
  // The voltage p0 + p1·t + p2·t² + e over the segment's time, with e'' = sum·e' − product·e, and e and its slope at the segment's end.
  p0: 0.5,
  p1: 0.5,
  p2: 0.5,
  sum: 0.5,
  product: 0.5,
  eEnd: 0.5,
  fEnd: 0.5,
  // The parabola at the segment's end, and when it turns with what it comes to there; a time of −1 where it does not.
  pEnd: 0.5,
  turnTime: 0.5,
  turnValue: 0.5,
  // The moment, with e and its slope there; the length of a step.
  t: 0.5,
  e: 0.5,
  f: 0.5,
  length: 0.5,
  // Where the turn may lie and is guessed, in steps from the moment.
  from: 0.5,
  to: 0.5,
  guess: 0.5,
  // The voltage where the step at hand starts; the rate of the slower of two decays, 1/s, and what one step keeps of it.
  v: 0.5,
  rate: 0.5,
  kept: 0.5,
};

/** The voltage about the moment as a series in steps. */
const series = new Float64Array(TERMS);

/**
 * Takes the voltage at its turn into the extremes. Whatever the guess, it is a voltage of the segment that is taken: none is overstated.
 * @derivation the series of e follows from e'' = sum·e' − product·e
 * @valid a step of about a radian or time constant of `curve` at most
 */
export function turn(): void {
  expand();
  const { from, to } = curve;
  let x = curve.guess;
  for (let round = 0; round < ROUNDS; round++) {
    if (!(x > from)) x = from;
    if (x > to) x = to;
    let slope = 0;
    let bend = 0;
    for (let k = TERMS - 1; k >= 1; k--) {
      bend = bend * x + slope;
      slope = slope * x + k * series[k];
    }
    x -= slope / bend;
  }
  if (!(x > from)) x = from;
  if (x > to) x = to;
  let v = 0;
  for (let k = TERMS - 1; k >= 0; k--) v = v * x + series[k];
  if (v > pair.highest) pair.highest = v;
  if (v < pair.lowest) pair.lowest = v;
}

function expand(): void {
  const { p0, p1, p2, sum, product, t, length } = curve;
  const once = sum * length;
  const twice = product * length * length;
  let before = curve.e;
  let now = curve.f * length;
  series[0] = p0 + (p1 + p2 * t) * t + before;
  series[1] = (p1 + 2 * p2 * t) * length + now;
  // A coefficient is a derivative over a factorial, in steps.
  for (let k = 2; k < TERMS; k++) {
    const next = (once * now - (twice * before) / (k - 1)) / k;
    before = now;
    now = next;
    series[k] = next;
  }
  series[2] += p2 * length * length;
}
