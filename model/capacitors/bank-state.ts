/** The record that the walk over a bank's segments speaks through. */

/**
 * What the walk over the segments needs of the bank, and where it stands. One record of numbers written in place, so that no
 * double crosses a call (a double that does is boxed: garbage).
 */
export const walkState = {
  // The bank.
  total: 0.5,
  tau: 0.5,
  h: 0.5,
  parallel: 0.5,
  share: 0.5,
  sum: 0.5,
  esl: 0.5,
  // The walk.
  average: 0.5,
  w: 0.5,
  q: 0.5,
  highest: 0.5,
  lowest: 0.5,
  square1: 0.5,
  square2: 0.5,
  // The segment: current a + s·t for d s, e = e^(−d/τ), difference base + drift·t + k·e^(−t/τ).
  a: 0.5,
  s: 0.5,
  d: 0.5,
  e: 0.5,
  base: 0.5,
  drift: 0.5,
  k: 0.5,
  // v'(t) = slope + beta·t + gamma·e^(−t/τ), and its values at the ends of the bracket that a zero is sought in.
  slope: 0.5,
  beta: 0.5,
  gamma: 0.5,
  from: 0.5,
  to: 0.5,
  atFrom: 0.5,
  atTo: 0.5,
  // A time in the segment, its e^(−t/τ), the terminal voltage there.
  t: 0.5,
  et: 0.5,
  v: 0.5,
  // A group's current p + r·t + f·e^(−t/τ).
  p: 0.5,
  r: 0.5,
  f: 0.5,
};
