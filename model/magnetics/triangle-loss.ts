/** Winding loss of an inductor under a triangular ripple: harmonics in closed form from one sine, for the hot path. */
import { sincosAt } from '../../optimizer/maths/index.ts';
import { tailBound } from './winding-loss.ts';

const angle = new Float64Array(2);
/** 1/k². */
const PER_SQUARE = Float64Array.from({ length: 32 }, (_, k) => 1 / (k * k));

/** A layered winding at one frequency: Dowell's factors at harmonics 1 … n, thickness over skin depth at the first, layers. */
export interface LayeredWinding {
  readonly factors: Float64Array;
  readonly x1: number;
  readonly layers: number;
}

/**
 * Writes to `into[0]` the ac loss per Ω of dc resistance, A², of a triangle of `swing` A peak to peak that rises for `duty`
 * (0 < D < 1) of the period; to `into[1]` the bound on the tail within it. Harmonic k of the triangle has the amplitude
 * ΔI·|sin(π·k·D)|/(π²·k²·D·(1 − D)); its ac mean square is ΔI²/12, that of its slope over ω² is ΔI²/(4·π²·D·(1 − D)).
 * @source dowell-1966; amplitude by the derivation in `harmonics`, checked against it
 * @valid 0 < D < 1; a triangle with a pause (discontinuous operation) takes `harmonics`
 */
export function triangleLoss(winding: LayeredWinding, swing: number, duty: number, into: Float64Array): void {
  into[0] = swing;
  into[1] = duty;
  triangleLossAt(winding, into);
}

/**
 * The same for the swing in `into[0]` and the duty in `into[1]`: no double crosses the call.
 * @source dowell-1966
 * @valid as `triangleLoss`
 */
export function triangleLossAt(winding: LayeredWinding, into: Float64Array): void {
  const { factors } = winding;
  const count = factors.length;
  const swing = into[0];
  const duty = into[1];
  const both = duty * (1 - duty);
  angle[0] = Math.PI * duty;
  sincosAt(angle, 0);
  const s1 = angle[0];
  const c1 = angle[1];
  const scale = swing / (Math.PI * Math.PI * both);
  let s = s1;
  let c = c1;
  let loss = 0;
  let rest = (swing * swing) / 12;
  let slope = (swing * swing) / (4 * Math.PI * Math.PI * both);
  for (let k = 1; k <= count; k++) {
    const amplitude = scale * s * PER_SQUARE[k];
    const half = 0.5 * amplitude * amplitude;
    loss += half * factors[k - 1];
    rest -= half;
    slope -= half * k * k;
    const next = s * c1 + c * s1;
    c = c * c1 - s * s1;
    s = next;
  }
  const bound = tailBound(rest, slope, winding.x1, winding.layers);
  into[0] = loss + bound;
  into[1] = bound;
}
