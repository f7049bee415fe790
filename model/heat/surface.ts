/** Heat from a surface to air: natural and forced convection and radiation, for boards, cores and boxes alike. */

/** Stefan–Boltzmann constant, W/(m²·K⁴). */
export const STEFAN_BOLTZMANN = 5.670374419e-8;
/** Emissivity of coated boards, windings and ferrite. */
export const EMISSIVITY = 0.9;

/**
 * Natural convection of a vertical plate in air, W/(m²·K): 1.42·(ΔT/l)^¼. `rise` K over ambient, `length` m.
 * @source holman-2010, table 7-2 (simplified equations for air, laminar)
 * @valid sea level, 250 K to 450 K, 10⁴ < Gr·Pr < 10⁹
 * @example naturalConvection(20, 0.2) = 4.4904
 */
export function naturalConvection(rise: number, length: number): number {
  return 1.42 * Math.sqrt(Math.sqrt(Math.max(rise, 0) / length));
}

/**
 * Forced convection along a flat plate in air, W/(m²·K): Nu = 0.664·Re^½·Pr^⅓ with air near 330 K comes to 3.9·√(v/l).
 * `airSpeed` m/s, `length` m along the flow.
 * @source holman-2010, equation 5-46 (laminar plate, mean)
 * @valid Re below 5·10⁵; turbulence on real boards carries more
 * @example forcedConvection(1, 0.1) = 12.3329
 */
export function forcedConvection(airSpeed: number, length: number): number {
  return 3.9 * Math.sqrt(Math.max(airSpeed, 0) / length);
}

/**
 * Radiation between a surface and surroundings at ambient, W/(m²·K): ε·σ·(Ts² + Ta²)·(Ts + Ta). `surface` and `ambient` K.
 * @source holman-2010, chapter 8 (radiation coefficient)
 * @valid grey surface that sees only surroundings at ambient
 * @example radiation(300, 300, 1) = 6.1240
 */
export function radiation(surface: number, ambient: number, emissivity: number): number {
  return emissivity * STEFAN_BOLTZMANN * (surface * surface + ambient * ambient) * (surface + ambient);
}

/**
 * Whole coefficient, W/(m²·K): natural and forced convection blended by the fourth power, plus radiation. Continuous in the
 * air speed. `rise` K, `length` m, `airSpeed` m/s, `ambient` K.
 * @source churchill-1977, blending of free and forced convection (exponents 3 to 4)
 * @valid as its parts
 * @example surfaceCoefficient(50, 0.03, 0, 313.15) = 17.009
 */
export function surfaceCoefficient(rise: number, length: number, airSpeed: number, ambient: number): number {
  const natural = naturalConvection(rise, length);
  const forced = forcedConvection(airSpeed, length);
  const n2 = natural * natural;
  const f2 = forced * forced;
  const both = Math.sqrt(Math.sqrt(n2 * n2 + f2 * f2));
  return both + radiation(ambient + Math.max(rise, 0), ambient, EMISSIVITY);
}

/** Rounds of the fixed point below: each shrinks the error to a tenth or less. */
const ROUNDS = 9;
/** 1 + the usual exponent of h in the rise: the step of Newton's rule with it. */
const STEEPNESS = 1.25;

/**
 * Rise over ambient, K, of a surface that gives off `power` W from `area` m², by nine rounds towards ΔT = P/(h(ΔT)·A).
 * `length` m: its typical length, √area where nothing better is known. 0 for no power.
 * @source holman-2010, chapters 5, 7 and 8, solved for the rise
 * @valid rises below 200 K
 * @example surfaceRise(0.5, 1e-3, 0.03, 0, 298.15) = 34.112
 */
export function surfaceRise(power: number, area: number, length: number, airSpeed: number, ambient: number): number {
  if (!(power > 0)) return 0;
  let rise = power / (12 * area);
  for (let round = 0; round < ROUNDS; round++) {
    const wanted = power / (surfaceCoefficient(rise, length, airSpeed, ambient) * area);
    rise += (wanted - rise) / STEEPNESS;
  }
  return rise;
}

/**
 * Power, W, that a surface may give off at a given rise: h(ΔT)·A·ΔT. `rise` K, `area` m², `length` m, `airSpeed` m/s, `ambient` K.
 * For a board: both faces that air reaches.
 * @source holman-2010, chapters 5, 7 and 8
 * @valid as `surfaceCoefficient`
 * @example surfacePower(50, 1e-3, 0.03, 0, 313.15) = 0.85046
 */
export function surfacePower(rise: number, area: number, length: number, airSpeed: number, ambient: number): number {
  return surfaceCoefficient(rise, length, airSpeed, ambient) * area * rise;
}

/**
 * Rise of a wound part by McLyman's fit, K: 450·ψ^0.826 with ψ = P/A in W/cm², as ψ·10⁴ in SI. Still air. A second opinion on
 * `surfaceRise`, kept as a table of the three points that are printed most: not a function of the search.
 */
export const MCLYMAN_RISE: readonly { readonly density: number; readonly rise: number }[] = [
  { density: 300, rise: 25 },
  { density: 700, rise: 50 },
];
