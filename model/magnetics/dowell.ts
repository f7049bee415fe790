/** Ac resistance of layered windings after Dowell: skin and proximity loss of a layer, as a factor on the dc resistance. */
import { expAt, sincosAt } from '../../optimizer/maths/index.ts';

const wave = new Float64Array(2);
const growth = new Float64Array(1);

/** Below this x the series is exact to rounding and the closed form would cancel. */
const SMALL = 0.05;
/** Above this x hyperbolic functions equal ½·e^x to rounding and their ratios are 1. */
const LARGE = 20;

/**
 * Writes F = Rac/Rdc to `factors[i]`, taking the layer thickness over skin depth x from `x[i]`; `layers` m (a half-layer
 * arrangement is m = 1/2, m layers between zero and full field otherwise).
 * F = x·[(sinh 2x + sin 2x)/(cosh 2x − cos 2x) + (2/3)·(m² − 1)·(sinh x − sin x)/(cosh x + cos x)].
 * One exponential and one sine-cosine a value; the double angles follow from them. Free of garbage.
 * For small x: F ≈ 1 + (5·m² − 1)·x⁴/45.
 * @source dowell-1966, equations for the real part of the layer impedance; the small-x form is hurley-2000
 * @valid one-dimensional field, layers that fill the window's width (round wire by porosity); x ≥ 0
 */
export function dowellAt(x: Float64Array, layers: number, factors: Float64Array, i: number): void {
  const h = x[i];
  const more = (2 / 3) * (layers * layers - 1);
  if (h < SMALL) {
    const h4 = h * h * h * h;
    factors[i] = 1 + ((5 * layers * layers - 1) * h4) / 45;
    return;
  }
  if (h > LARGE) {
    factors[i] = h * (1 + more);
    return;
  }
  wave[0] = h;
  sincosAt(wave, 0);
  growth[0] = h;
  expAt(growth, 0);
  const s = wave[0];
  const c = wave[1];
  const up = growth[0];
  const down = 1 / up;
  const sinh = 0.5 * (up - down);
  const cosh = 0.5 * (up + down);
  const skin = (2 * sinh * cosh + 2 * s * c) / (2 * sinh * sinh + 2 * s * s);
  factors[i] = h * (skin + (more * (sinh - s)) / (cosh + c));
}

/** √(k + 1). */
const ROOTS = Float64Array.from({ length: 64 }, (_, k) => Math.sqrt(k + 1));

const single = new Float64Array(1);
const result = new Float64Array(1);

/**
 * The same for one value: F at `x` with `layers` m. For tests and one-off use.
 * @source dowell-1966
 * @valid x ≥ 0
 * @example dowell(1, 1) = 1.085636
 */
export function dowell(x: number, layers: number): number {
  single[0] = x;
  dowellAt(single, layers, result, 0);
  return result[0];
}

/**
 * Fills `factors[0 … count − 1]` with F at the harmonics k = 1 … count: x1·√k, x1 = thickness over skin depth at the
 * fundamental. Once a design; every operating point then needs only a weighted sum.
 * @source dowell-1966
 * @valid as `dowellAt`
 */
export function dowellHarmonics(x1: number, layers: number, count: number, factors: Float64Array): void {
  layer.x1 = x1;
  layer.layers = layers;
  dowellHarmonicsAt(layer, count, factors);
}

const layer = { x1: 0.5, layers: 1.5 };

/**
 * The same for `x1` and `layers` that stand in a record: no double crosses the call.
 * @source dowell-1966
 * @valid as `dowellAt`
 */
export function dowellHarmonicsAt(
  at: { readonly x1: number; readonly layers: number },
  count: number,
  factors: Float64Array,
): void {
  for (let k = 0; k < count; k++) {
    factors[k] = at.x1 * ROOTS[k];
    dowellAt(factors, at.layers, factors, k);
  }
}

/**
 * Thickness over skin depth of the layer that equals a round wire of diameter `diameter` m at `pitch` m between centres:
 * h = (√π/2)·d with porosity η = (√π/2)·d/pitch, the depth growing by 1/√η: x = h·√η/δ. `depth` δ in m.
 * @source dowell-1966, porosity of round conductors
 * @valid pitch ≥ diameter
 * @example roundWireThickness(1e-3, 1e-3, 1e-3) = 0.83429
 */
export function roundWireThickness(diameter: number, pitch: number, depth: number): number {
  const height = 0.5 * Math.sqrt(Math.PI) * diameter;
  return (height * Math.sqrt(height / pitch)) / depth;
}

/**
 * Thickness over skin depth with the least ac resistance (least F/x), near (15/(5·m² − 1))^¼; `layers` m ≥ 1.
 * @source hurley-2000, optimum thickness for sinusoids
 * @valid small-x form: 2 % low at m = 2, better above; 11 % low at m = 1
 * @example optimumThickness(4) = 0.66011
 */
export function optimumThickness(layers: number): number {
  return Math.sqrt(Math.sqrt(15 / (5 * layers * layers - 1)));
}
