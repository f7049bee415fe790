/** A round wire: skin effect of its own current and proximity loss in a field from outside. Once a design, not hot. */
import { besselJ } from './bessel.ts';

const bessel = new Float64Array(4);

/**
 * Rac/Rdc of a round wire of diameter `diameter` over skin depth `depth` (both m): Re{(z/2)·J0(z)/J1(z)}, z = (1 − j)·d/(2·δ).
 * @source ferreira-1994, skin effect of a round conductor (Kelvin functions)
 * @valid d/δ from 0 to 1000; the wire alone
 * @example roundWireSkin(1e-3, 5e-4) = 1.0204924
 */
export function roundWireSkin(diameter: number, depth: number): number {
  const x = diameter / (2 * depth);
  if (x < 1e-3) return 1;
  besselJ(x, -x, bessel);
  const [ar, ai, br, bi] = bessel;
  const size = br * br + bi * bi;
  const qr = (ar * br + ai * bi) / size;
  const qi = (ai * br - ar * bi) / size;
  return 0.5 * (x * qr + x * qi);
}

/**
 * Proximity factor G in m², so that a wire of dc resistance R in a transverse field of peak H (A/m) loses R·G·H² (W).
 * G = −(π²·d²/2)·Re{z·J1(z)/J0(z)}, z = (1 − j)·d/(2·δ); low-frequency limit (π²/128)·d²·(d/δ)⁴.
 * `diameter` d and `depth` δ in m.
 * @source ferreira-1994, proximity effect of a round conductor (Kelvin functions)
 * @valid uniform field, peak value
 * @example roundWireProximity(1, 1) = 0.076558183
 */
export function roundWireProximity(diameter: number, depth: number): number {
  const x = diameter / (2 * depth);
  if (x < 0.02) return lowFrequency(diameter, depth);
  besselJ(x, -x, bessel);
  const [ar, ai, br, bi] = bessel;
  const size = ar * ar + ai * ai;
  const qr = (br * ar + bi * ai) / size;
  const qi = (bi * ar - br * ai) / size;
  return -0.5 * Math.PI * Math.PI * diameter * diameter * (x * qr + x * qi);
}

/** (π²/128)·d²·(d/δ)⁴. */
function lowFrequency(diameter: number, depth: number): number {
  const ratio = diameter / depth;
  const square = ratio * ratio;
  return ((Math.PI * Math.PI) / 128) * diameter * diameter * square * square;
}
