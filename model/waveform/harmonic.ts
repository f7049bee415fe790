/** Fourier coefficients of a waveform in closed form: straight segments need no numerical integration. */
import { sincosAt } from '../../optimizer/maths/index.ts';
import type { Waveform } from './waveform.ts';

const angle = new Float64Array(2);

/**
 * Writes a_k, b_k of x(t) = mean + Σ a_k·cos(kωt) + b_k·sin(kωt) for k = 1 … highest to `into[2(k − 1)]`, `into[2k − 1]`.
 * For a segment from t0 to t1 with slope s, integrating by parts:
 * ∫x·cos = [x·sin/(kω)] + s·[cos/(kω)²], ∫x·sin = [−x·cos/(kω)] + s·[sin/(kω)²].
 * One sine and cosine a breakpoint, whatever `highest`: higher k by the angle sum.
 * @derivation integration by parts of each straight segment, as above; closed form checked against a square wave's 4/(πk)
 * @valid highest ≥ 1; error grows as k·2⁻⁵² by the recurrence
 */
export function harmonics(w: Waveform, highest: number, into: Float64Array): void {
  const omega = (2 * Math.PI) / w.period;
  for (let k = 0; k < 2 * highest; k++) into[k] = 0;
  let time = 0;
  let c0 = 1;
  let s0 = 0;
  for (let i = 0; i < w.count; i++) {
    const d = w.duration[i];
    time += d;
    angle[0] = omega * time;
    sincosAt(angle, 0);
    if (d > 0) addSegmentTo(into, highest, omega, d, w.start[i], w.end[i], c0, s0, angle[1], angle[0]);
    s0 = angle[0];
    c0 = angle[1];
  }
  const scale = 2 / w.period;
  for (let k = 0; k < 2 * highest; k++) into[k] *= scale;
}

/** Adds one segment's integrals, given cosine and sine of ω·t at its ends. */
function addSegmentTo(
  into: Float64Array,
  highest: number,
  omega: number,
  d: number,
  a: number,
  b: number,
  c0: number,
  s0: number,
  c1: number,
  s1: number,
): void {
  const slope = (b - a) / d;
  let p0 = c0;
  let q0 = s0;
  let p1 = c1;
  let q1 = s1;
  for (let k = 1; k <= highest; k++) {
    const kw = k * omega;
    const bend = slope / (kw * kw);
    into[2 * k - 2] += (b * q1 - a * q0) / kw + bend * (p1 - p0);
    into[2 * k - 1] += (a * p0 - b * p1) / kw + bend * (q1 - q0);
    const p2 = p0 * c0 - q0 * s0;
    q0 = q0 * c0 + p0 * s0;
    p0 = p2;
    const p3 = p1 * c1 - q1 * s1;
    q1 = q1 * c1 + p1 * s1;
    p1 = p3;
  }
}

/**
 * Writes a_k and b_k of one harmonic k ≥ 1 to `into[0]` and `into[1]`, each sine and cosine taken afresh: the plain oracle
 * of `harmonics`, for high k.
 * @derivation as `harmonics`
 * @valid k ≥ 1
 */
export function harmonic(w: Waveform, k: number, into: Float64Array): void {
  const kw = (2 * Math.PI * k) / w.period;
  let time = 0;
  let a = 0;
  let b = 0;
  for (let i = 0; i < w.count; i++) {
    const d = w.duration[i];
    if (d <= 0) continue;
    angle[0] = kw * time;
    sincosAt(angle, 0);
    const s0 = angle[0];
    const c0 = angle[1];
    time += d;
    angle[0] = kw * time;
    sincosAt(angle, 0);
    const bend = (w.end[i] - w.start[i]) / (d * kw * kw);
    a += (w.end[i] * angle[0] - w.start[i] * s0) / kw + bend * (angle[1] - c0);
    b += (w.start[i] * c0 - w.end[i] * angle[1]) / kw + bend * (angle[0] - s0);
  }
  into[0] = (2 * a) / w.period;
  into[1] = (2 * b) / w.period;
}
