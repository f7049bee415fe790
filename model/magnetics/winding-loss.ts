/**
 * Loss of a layered winding under a periodic current: dc, a number of harmonics each with Dowell's factor, and a bound on all
 * the harmonics beyond. "One more harmonic changes little" is no bound: nulls at k = j/D fool it.
 */

/**
 * Upper bound on Σ over the left-out harmonics of ½·c_k²·F(x1·√k), in A². `meanSquare`: what is left of the current's ac mean
 * square after the summed harmonics (A²), `slopeSquare`: the same of (di/dt)²/ω² (A²), `x1` thickness over skin depth at the
 * fundamental, `layers` m. Both rests are known exactly (Parseval) when the current has finite edges.
 * Two bounds hold, the smaller counts:
 * F ≤ 1 + (5·m² − 1)·x⁴/45 gives rest + (5·m² − 1)·x1⁴/45·slopeRest (the form of Hurley, Gath and Breslin);
 * F ≤ 1 + x·(1 + (2/3)·1.1·|m² − 1|) with Hölder Σc²·√k ≤ (Σc²)^¾·(Σc²·k²)^¼ gives the other, which grows only with √k.
 * @derivation Parseval and Hölder as above; that both bounds on F hold is tested over x and m
 * @valid finite edges
 * @example tailBound(0.01, 1, 0.5, 2) = 0.0363889
 */
export function tailBound(meanSquare: number, slopeSquare: number, x1: number, layers: number): number {
  const rest = Math.max(meanSquare, 0);
  const slope = Math.max(slopeSquare, rest);
  const square = layers * layers;
  const curved = rest + ((5 * square - 1) * x1 * x1 * x1 * x1 * slope) / 45;
  const quarter = Math.sqrt(Math.sqrt(rest));
  const weight = quarter * quarter * quarter * Math.sqrt(Math.sqrt(slope));
  const linear = rest + x1 * (1 + 0.73334 * Math.abs(square - 1)) * weight;
  return Math.min(curved, linear);
}

/** Where the loss functions below write. */
export const WINDING_AC = 0;
export const WINDING_BOUND = 1;

/**
 * Ac loss per Ω of dc resistance of a winding, A²: Σ ½·(a_k² + b_k²)·F_k over `count` harmonics plus the tail's bound,
 * to `into[0]`; the bound alone to `into[1]`. Times Rdc it is W: an upper figure, never below the truth.
 * `coefficients` from `harmonics`, `factors` from `dowellHarmonics`, `acMeanSquare` A² (mean square minus mean²),
 * `slopeMeanSquare` (A/s)², `frequency` Hz, `x1`, `layers` as in `tailBound`.
 * @source dowell-1966 for the factor of each harmonic; tail by the derivation in `tailBound`
 * @valid currents with finite edges
 */
export function harmonicLoss(
  coefficients: Float64Array,
  factors: Float64Array,
  count: number,
  acMeanSquare: number,
  slopeMeanSquare: number,
  frequency: number,
  x1: number,
  layers: number,
  into: Float64Array,
): void {
  Object.assign(current, { acMeanSquare, slopeMeanSquare, frequency, x1, layers });
  harmonicLossAt(current, coefficients, factors, count, into);
}

/** What `harmonicLoss` asks of a current and a winding, in its words. */
export interface HarmonicLoss {
  acMeanSquare: number;
  slopeMeanSquare: number;
  frequency: number;
  x1: number;
  layers: number;
}

/** One to be filled. */
export function createHarmonicLoss(): HarmonicLoss {
  return { acMeanSquare: 0.5, slopeMeanSquare: 0.5, frequency: 0.5, x1: 0.5, layers: 1.5 };
}

const current = createHarmonicLoss();

/**
 * As `harmonicLoss`: no double crosses the call.
 * @source dowell-1966 for the factor of each harmonic; tail by the derivation in `tailBound`
 * @valid currents with finite edges
 */
export function harmonicLossAt(
  of: HarmonicLoss,
  coefficients: Float64Array,
  factors: Float64Array,
  count: number,
  into: Float64Array,
): void {
  const { x1, layers } = of;
  const omega = 2 * Math.PI * of.frequency;
  let loss = 0;
  let rest = of.acMeanSquare;
  let slope = of.slopeMeanSquare / (omega * omega);
  for (let k = 0; k < count; k++) {
    const a = coefficients[2 * k];
    const b = coefficients[2 * k + 1];
    const half = 0.5 * (a * a + b * b);
    loss += half * factors[k];
    rest -= half;
    slope -= half * (k + 1) * (k + 1);
  }
  const bound = tailBound(rest, slope, x1, layers);
  into[WINDING_AC] = loss + bound;
  into[WINDING_BOUND] = bound;
}

/**
 * Effective over dc resistance by the rms of the derivative: 1 + (5·m² − 1)/45·x⁴·(I'rms/(ω·Irms))². `x1` thickness over skin
 * depth at the fundamental, `layers` m, `slopeMeanSquare` (A/s)², `meanSquare` A² (dc included), `frequency` Hz.
 * An upper bound on the harmonic sum, tight for thin layers.
 * @source hurley-2000, effective resistance from the rms of the derivative
 * @valid x small against 1 at every harmonic that carries current
 * @example effectiveResistanceFactor(0.5, 2, 39.478418, 1, 1) = 1.0263889
 */
export function effectiveResistanceFactor(
  x1: number,
  layers: number,
  slopeMeanSquare: number,
  meanSquare: number,
  frequency: number,
): number {
  const omega = 2 * Math.PI * frequency;
  const psi = (5 * layers * layers - 1) / 45;
  return 1 + (psi * x1 * x1 * x1 * x1 * slopeMeanSquare) / (omega * omega * meanSquare);
}
