/** Effective parameters of a core and the inductance that they give, with or without a gap. */
import { log } from '../../optimizer/maths/index.ts';
import { MU0 } from './copper.ts';

/** Effective length m, area m², volume m³. */
export interface EffectiveParameters {
  readonly length: number;
  readonly area: number;
  readonly volume: number;
}

/**
 * Effective parameters from the core constants C1 = Σl/A (1/m) and C2 = Σl/A² (1/m³): le = C1²/C2, Ae = C1/C2, Ve = C1³/C2².
 * @source iec-60205, definitions
 * @valid any closed core
 */
export function effectiveParameters(c1: number, c2: number): EffectiveParameters {
  return { length: (c1 * c1) / c2, area: c1 / c2, volume: (c1 * c1 * c1) / (c2 * c2) };
}

/**
 * Effective parameters of a toroid of rectangular section: C1 = 2π/(h·ln(r2/r1)), C2 = 2π·(1/r1 − 1/r2)/(h²·ln³(r2/r1)).
 * `outerDiameter`, `innerDiameter`, `height` in m.
 * @source iec-60205, ring cores
 * @valid outer above inner diameter; sharp edges
 */
export function toroidParameters(outerDiameter: number, innerDiameter: number, height: number): EffectiveParameters {
  const ratio = log(outerDiameter / innerDiameter);
  const c1 = (2 * Math.PI) / (height * ratio);
  const c2 = (2 * Math.PI * (2 / innerDiameter - 2 / outerDiameter)) / (height * height * ratio * ratio * ratio);
  return effectiveParameters(c1, c2);
}

/**
 * Effective permeability of a core: AL·le/(µ0·Ae). `inductanceFactor` AL in H, `length` le m, `area` Ae m².
 * @source iec-60205, inductance factor
 * @valid closed or gapped cores
 * @example effectivePermeability(2.35e-6, 0.072, 7.6e-5) = 1771.6
 */
export function effectivePermeability(inductanceFactor: number, length: number, area: number): number {
  return (inductanceFactor * length) / (MU0 * area);
}

/**
 * Inductance factor AL, H, of a core with a gap: µ0·Ae/(lg/F + le/µi), F the fringing factor (1 without).
 * `area` Ae m², `gap` lg m, `fringing` F ≥ 1, `length` le m, `permeability` µi.
 * @source mclyman-2004, chapter 8 (inductance of a gapped core with fringing)
 * @valid gap ≥ 0
 * @example inductanceFactor(1e-4, 1e-3, 1, 0, 1000) = 1.2566371e-7
 */
export function inductanceFactor(
  area: number,
  gap: number,
  fringing: number,
  length: number,
  permeability: number,
): number {
  return (MU0 * area) / (gap / fringing + length / permeability);
}
