/** One segment of a pair's walk: its matrices, its forced solution, the state across it. A kernel: it speaks through one record. */
import { expAt, sincosAt } from '../../optimizer/maths/index.ts';
import type { Waveform } from '../waveform/waveform.ts';
import { CURRENT, counts, FORCED, KEPT, kept, pair, STEP, WHOLE } from './pair-state.ts';

/** The angle of ringing that one step may turn through, its time constants of decay, and the most steps of a segment. */
const TURN = 1;
const DECAY = 1.2;
const MOST = 67_108_864;
/** Lengths that differ by less than this share are one. */
const SAME = 1e-12;

const scratch = new Float64Array(2);

/**
 * Works out what segment `i` keeps: its matrices, forced solution and current.
 * @derivation the network of `pair`
 * @valid a segment that lasts; those before it have been prepared
 */
export function prepareSegment(current: Waveform, i: number): void {
  const twin = twinOf(current, i);
  if (twin < 0) prepareSteps(current, i);
  else copyMatrices(twin, i);
  force(current, i);
}

/** An earlier segment of the same length, as copies of one waveform bring again and again; −1 where there is none. */
function twinOf(current: Waveform, i: number): number {
  const d = current.duration[i];
  for (let j = 0; j < i; j++) if (Math.abs(current.duration[j] - d) <= SAME * d) return j;
  return -1;
}

function copyMatrices(from: number, to: number): void {
  counts[to] = counts[from];
  const a = KEPT * from;
  const b = KEPT * to;
  for (let k = STEP; k < FORCED; k++) kept[b + k] = kept[a + k];
}

/** Matrix of one step, e^(A·h) with A − α·1 = [[−α, −g], [1/L, α]], ringing or, with more damping, two decays; and of all steps. */
function prepareSteps(current: Waveform, i: number): void {
  const d = current.duration[i];
  const { alpha, omega, g, l, rings } = pair;
  let n = pair.fewest;
  const fastest = rings ? Math.max(omega / TURN, -alpha / DECAY) : (omega - alpha) / DECAY;
  while (n < MOST && fastest * d > n) n *= 2;
  counts[i] = n;
  const h = d / n;
  let even = 0;
  let odd = 0;
  if (rings) {
    scratch[0] = alpha * h;
    expAt(scratch, 0);
    const e = scratch[0];
    scratch[0] = omega * h;
    sincosAt(scratch, 0);
    odd = (e * scratch[0]) / omega;
    even = e * scratch[1];
  } else {
    // α + ω by its twin, for the sum itself would cancel.
    scratch[0] = (g / l / (alpha - omega)) * h;
    scratch[1] = (alpha - omega) * h;
    expAt(scratch, 0);
    expAt(scratch, 1);
    even = 0.5 * (scratch[0] + scratch[1]);
    odd = omega * h > 1e-9 ? (scratch[0] - scratch[1]) / (2 * omega) : h * scratch[0];
  }
  const at = KEPT * i;
  kept[at + STEP] = even - alpha * odd;
  kept[at + STEP + 1] = -g * odd;
  kept[at + STEP + 2] = odd / l;
  kept[at + STEP + 3] = even + alpha * odd;
  multiplySteps(at, n);
}

/** The matrix of the whole segment: its steps are a power of two, so theirs is squared. */
function multiplySteps(at: number, steps: number): void {
  let a = kept[at + STEP];
  let b = kept[at + STEP + 1];
  let c = kept[at + STEP + 2];
  let d = kept[at + STEP + 3];
  for (let n = steps; n > 1; n >>= 1) {
    const bc = b * c;
    const sum = a + d;
    a = a * a + bc;
    b *= sum;
    c *= sum;
    d = d * d + bc;
  }
  kept[at + WHOLE] = a;
  kept[at + WHOLE + 1] = b;
  kept[at + WHOLE + 2] = c;
  kept[at + WHOLE + 3] = d;
}

/** The solution that the state of segment `i` rings about, w0 + w1·t and y0 + y1·t, and the current a + s·t that forces it. */
function force(current: Waveform, i: number): void {
  const { perG, bulkShare, r, r1, l, l1, average } = pair;
  const a = current.start[i] - average;
  const s = (current.end[i] - current.start[i]) / current.duration[i];
  // 1/(g·C1) is the bulk's share of all capacitance.
  const y1 = s * bulkShare;
  const w1 = r * y1 - r1 * s;
  const y0 = a * bulkShare - w1 * perG;
  const at = KEPT * i;
  kept[at + FORCED] = l * y1 - r1 * a - l1 * s + r * y0;
  kept[at + FORCED + 1] = w1;
  kept[at + FORCED + 2] = y0;
  kept[at + FORCED + 3] = y1;
  kept[at + CURRENT] = a;
  kept[at + CURRENT + 1] = s;
}

/**
 * Takes the state across segment `i`: a jump of the current before it splits by inductance, then it rings about the forced solution.
 * @derivation the network of `pair`
 * @valid a segment that `prepareSegment` has seen
 */
export function crossSegment(current: Waveform, i: number): void {
  const at = KEPT * i;
  const d = current.duration[i];
  const z = pair.w - kept[at + FORCED];
  const u = pair.y + (current.start[i] - pair.before) * pair.jump - kept[at + FORCED + 2];
  const zEnd = kept[at + WHOLE] * z + kept[at + WHOLE + 1] * u;
  const uEnd = kept[at + WHOLE + 2] * z + kept[at + WHOLE + 3] * u;
  pair.d = d;
  pair.z = z;
  pair.u = u;
  pair.zEnd = zEnd;
  pair.uEnd = uEnd;
  pair.w = zEnd + kept[at + FORCED] + kept[at + FORCED + 1] * d;
  pair.y = uEnd + kept[at + FORCED + 2] + kept[at + FORCED + 3] * d;
  pair.before = current.end[i];
}
