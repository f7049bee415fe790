/**
 * A slow plain twin of a pair's ripple: the network's two states by the series of its matrix exponential in steps of a fiftieth of a
 * radian, the periodic start by linear superposition of three runs, every voltage looked at.
 */
import type { Bank } from '../../../model/capacitors/index.ts';
import type { Waveform } from '../../../model/waveform/index.ts';

/** Angle (or share of a time constant) of a step. */
const FINE = 0.02;

/** Rates of the network, 1/s: the size of its fastest eigenvalue. */
function fastest({ c1, c2, r1, r2, l1, l2 }: Bank): number {
  const l = l1 + l2;
  const half = (0.5 * (r1 + r2)) / l;
  const g = (1 / c1 + 1 / c2) / l;
  return half * half > g ? half + Math.sqrt(half * half - g) : Math.sqrt(g);
}

/** One run over a period from the difference `w` and bulk current `y`: its end and the extremes about a charge of 0 at its start. */
function run(bank: Bank, current: Waveform, w: number, y: number) {
  const { c1, c2, r1, r2, l1, l2 } = bank;
  const l = l1 + l2;
  const r = r1 + r2;
  let area = 0;
  for (let k = 0; k < current.count; k++) area += 0.5 * current.duration[k] * (current.start[k] + current.end[k]);
  const mean = area / current.period;
  let last = current.count - 1;
  while (!(current.duration[last] > 0)) last--;
  let before = current.end[last];
  let q = 0;
  let highest = -Infinity;
  let lowest = Infinity;
  for (let k = 0; k < current.count; k++) {
    const d = current.duration[k];
    if (!(d > 0)) continue;
    y += ((current.start[k] - before) * l1) / l;
    before = current.end[k];
    const s = (current.end[k] - current.start[k]) / d;
    const steps = Math.max(50, Math.ceil((fastest(bank) * d) / FINE));
    const h = d / steps;
    for (let n = 0; n <= steps; n++) {
      const i = current.start[k] - mean + s * h * n;
      const rate = (w + r1 * i + l1 * s - r * y) / l;
      // v1 = (q + C2·w)/(C1 + C2)
      const v = (q + c2 * w) / (c1 + c2) + r1 * (i - y) + l1 * (s - rate);
      highest = Math.max(highest, v);
      lowest = Math.min(lowest, v);
      if (n === steps) break;
      let dw = (i - y) / c1 - y / c2;
      let dy = rate;
      let scale = h;
      // Derivatives of both states, one after the other: the current's own slope enters the second ones alone.
      for (let order = 1; order <= 10; order++) {
        w += scale * dw;
        y += scale * dy;
        const [pushW, pushY] = order === 1 ? [s / c1, (r1 * s) / l] : [0, 0];
        [dw, dy] = [pushW - dy / c1 - dy / c2, pushY + (dw - r * dy) / l];
        scale *= h / (order + 1);
      }
      q += (i + 0.5 * s * h) * h;
    }
  }
  return { w, y, highest, lowest };
}

/** Peak-to-peak terminal voltage in the periodic steady state under the ac part of `current`, V. */
export function denseRipple(bank: Bank, current: Waveform): number {
  const zero = run(bank, current, 0, 0);
  const first = run(bank, current, 1, 0);
  const second = run(bank, current, 0, 1);
  const [a, b, c, d] = [first.w - zero.w, second.w - zero.w, first.y - zero.y, second.y - zero.y];
  const determinant = (1 - a) * (1 - d) - b * c;
  const w = ((1 - d) * zero.w + b * zero.y) / determinant;
  const y = (c * zero.w + (1 - a) * zero.y) / determinant;
  const { highest, lowest } = run(bank, current, w, y);
  return highest - lowest;
}
