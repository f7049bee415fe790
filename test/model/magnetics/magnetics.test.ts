/** Laws of magnetics: limits reduce to the textbook case, bounds hold, fast forms equal slow ones. */
import besselj0 from '@stdlib/math-base-special-besselj0';
import besselj1 from '@stdlib/math-base-special-besselj1';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  type Bend,
  besselJ,
  createInductorAtFrequency,
  currentOfLinkage,
  dowell,
  dowellHarmonics,
  dutyCorrectionAt,
  effectiveResistanceFactor,
  fluxLinkage,
  fringingFactor,
  gapFor,
  harmonicLoss,
  igseAt,
  igseConstant,
  inductanceAt,
  inductanceFactor,
  inductorThermalResistance,
  meanInductanceAt,
  prepareInductor,
  RIPPLE_HARMONICS,
  roundWireProximity,
  roundWireSkin,
  steinmetz,
  stockedCoreLoss,
  swingAt,
  tailBound,
  trapezoidLossDensity,
  triangleLoss,
  triangleLossDensity,
  WINDING_AC,
  WINDING_BOUND,
  windingResistance,
} from '../../../model/magnetics/index.ts';
import type { Inductor } from '../../../model/parts/inductor.ts';
import {
  addSegment,
  createWaveform,
  harmonics,
  mean,
  meanSquare,
  slopeMeanSquare,
  type Waveform,
} from '../../../model/waveform/index.ts';

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const out = new Float64Array(4);
function chain(...segments: readonly (readonly [number, number, number])[]): Waveform {
  const w = createWaveform(segments.length);
  for (const [d, a, b] of segments) addSegment(w, d, a, b);
  return w;
}

describe('Bessel functions', () => {
  it('of real arguments agree with a general-purpose library', () => {
    fc.assert(
      fc.property(between(0.01, 60), (x) => {
        besselJ(x, 0, out);
        // Towards the end of the power series its terms reach e^20: some digits go.
        expect(out[0]).toBeCloseTo(besselj0(x), x < 12 ? 9 : x <= 20 ? 6 : 12);
        expect(out[2]).toBeCloseTo(besselj1(x), x < 12 ? 9 : x <= 20 ? 6 : 12);
      }),
    );
  });
  it('keep the wire’s resistance smooth where the series gives way to the expansion (d/δ = 28.28)', () => {
    const edge = 2 * Math.sqrt(200);
    const steps = [edge - 2e-4, edge - 1e-4, edge + 1e-4, edge + 2e-4].map((x) => roundWireSkin(x, 1));
    expect(Math.abs(steps[2] - steps[1] - 2 * (steps[1] - steps[0]))).toBeLessThan(1e-10);
  });
});

describe('Round wires', () => {
  it('far below the skin depth carry dc, far above it a shell: R → d/(4·δ) + 1/4', () => {
    expect(roundWireSkin(0.01, 1)).toBeCloseTo(1, 9);
    expect(roundWireSkin(200, 1)).toBeCloseTo(200 / 4 + 1 / 4, 2);
  });
  it('in a field lose as f² at first: G/d² → (π²/128)·(d/δ)⁴', () => {
    expect(roundWireProximity(0.05, 1) / 0.05 ** 2 / ((Math.PI ** 2 / 128) * 0.05 ** 4)).toBeCloseTo(1, 6);
  });
});

describe("Dowell's factor", () => {
  it('is never below one, rises with thickness, and is that of half the layer at m = 1/2', () => {
    fc.assert(
      fc.property(between(0, 30), between(1, 10), (x, m) => {
        expect(dowell(x, m)).toBeGreaterThanOrEqual(1);
        expect(dowell(x * 1.01, m)).toBeGreaterThanOrEqual(dowell(x, m) * (1 - 1e-3));
        expect(dowell(x, 0.5)).toBeCloseTo(dowell(x / 2, 1), 8);
      }),
    );
  });
  it('passes from its series and to its limit without a step', () => {
    for (const edge of [0.05, 20])
      for (const m of [0.5, 1, 3, 8]) {
        expect(dowell(edge * (1 + 1e-9), m) / dowell(edge * (1 - 1e-9), m)).toBeCloseTo(1, 7);
      }
  });
  it('splits into the first term, skin, and the layer term, proximity, which both rise with frequency', () => {
    const skin = (x: number) => dowell(x, 1);
    const layers = (x: number) => dowell(x, 3) - dowell(x, 1);
    expect(skin(0.8)).toBeGreaterThan(skin(0.4));
    expect(layers(0.8)).toBeGreaterThan(layers(0.4));
  });
  it('obeys both bounds that the tail is judged by', () => {
    fc.assert(
      fc.property(between(0.001, 100), between(0.5, 20), (x, m) => {
        expect(dowell(x, m)).toBeLessThanOrEqual((1 + ((5 * m * m - 1) * x ** 4) / 45) * (1 + 1e-9));
        expect(dowell(x, m)).toBeLessThanOrEqual(1 + x * (1 + 0.73334 * Math.abs(m * m - 1)));
      }),
    );
  });
});

describe('Winding loss over harmonics', () => {
  /** Sum over very many harmonics. */
  function full(w: Waveform, x1: number, m: number): number {
    const many = 3000;
    const coefficients = new Float64Array(2 * many);
    harmonics(w, many, coefficients);
    let sum = 0;
    for (let k = 1; k <= many; k++) {
      const [a, b] = [coefficients[2 * k - 2], coefficients[2 * k - 1]];
      sum += 0.5 * (a * a + b * b) * dowell(x1 * Math.sqrt(k), m);
    }
    return sum;
  }
  /** A trapezoid with edges of a few per cent, as transformer windings carry. */
  const trapezoid = fc
    .record({ on: between(0.1, 0.8), edge: between(0.005, 0.05), tilt: between(0, 0.5) })
    .map(({ on, edge, tilt }) =>
      chain([edge, 0, 1], [on - edge, 1, 1 + tilt], [edge, 1 + tilt, 0], [1 - on - edge, 0, 0]),
    );
  function summed(w: Waveform, x1: number, m: number, count: number): void {
    const coefficients = new Float64Array(2 * count);
    const factors = new Float64Array(count);
    harmonics(w, count, coefficients);
    dowellHarmonics(x1, m, count, factors);
    const ac = meanSquare(w) - mean(w) ** 2;
    harmonicLoss(coefficients, factors, count, ac, slopeMeanSquare(w), 1 / w.period, x1, m, out);
  }
  it('is never below the full sum, and within its own bound of it', () => {
    fc.assert(
      fc.property(trapezoid, between(0.05, 3), fc.constantFrom(0.5, 1, 2, 4), (w, x1, m) => {
        const truth = full(w, x1, m);
        for (const count of [3, 8, 20]) {
          summed(w, x1, m, count);
          expect(out[WINDING_AC]).toBeGreaterThanOrEqual(truth * (1 - 2e-3));
          expect(out[WINDING_AC] - out[WINDING_BOUND]).toBeLessThanOrEqual(truth * (1 + 1e-9));
        }
      }),
      { numRuns: 25 },
    );
  });
  it('has a bound that shrinks as harmonics are added, nulls or not', () => {
    const w = chain([0.02, 0, 1], [0.23, 1, 1], [0.02, 1, 0], [0.73, 0, 0]);
    const bounds = [2, 4, 8, 16, 32].map((count) => {
      summed(w, 0.5, 2, count);
      return out[WINDING_BOUND];
    });
    for (let i = 1; i < bounds.length; i++) expect(bounds[i]).toBeLessThanOrEqual(bounds[i - 1]);
  });
  it('for a triangle is the general sum from its closed harmonics', () => {
    fc.assert(
      fc.property(between(0.05, 0.95), between(0.05, 2), (duty, x1) => {
        const w = chain([duty, -0.5, 0.5], [1 - duty, 0.5, -0.5]);
        summed(w, x1, 2, RIPPLE_HARMONICS);
        const general = out[WINDING_AC];
        const factors = new Float64Array(RIPPLE_HARMONICS);
        dowellHarmonics(x1, 2, RIPPLE_HARMONICS, factors);
        triangleLoss({ factors, x1, layers: 2 }, 1, duty, out);
        expect(out[0] / general).toBeCloseTo(1, 9);
      }),
    );
  });
  it('of a triangle is at most 5 % above the full sum at duties from 0.1 to 0.9', () => {
    for (const duty of [0.1, 0.25, 0.5, 0.75, 0.9])
      for (const x1 of [0.1, 0.5, 1])
        for (const m of [1, 2, 4]) {
          const truth = full(chain([duty, -0.5, 0.5], [1 - duty, 0.5, -0.5]), x1, m);
          const factors = new Float64Array(RIPPLE_HARMONICS);
          dowellHarmonics(x1, m, RIPPLE_HARMONICS, factors);
          triangleLoss({ factors, x1, layers: m }, 1, duty, out);
          expect(out[0] / truth).toBeGreaterThan(1 - 1e-6);
          expect(out[0] / truth).toBeLessThan(1.05);
        }
  });
  it('by the rms of the derivative agrees with the harmonics for thin layers', () => {
    const w = chain([0.3, -0.5, 0.5], [0.7, 0.5, -0.5]);
    const factor = effectiveResistanceFactor(0.2, 2, slopeMeanSquare(w), meanSquare(w), 1);
    expect(factor / (full(w, 0.2, 2) / meanSquare(w))).toBeCloseTo(1, 3);
  });
  it('has no tail without a rest', () => expect(tailBound(0, 0, 1, 3)).toBe(0));
});

describe('Core loss', () => {
  it('rises as f^α at fixed flux swing and falls as f^(α − β) at fixed inductance and voltage', () => {
    const [alpha, beta] = [1.4, 2.5];
    const at = (f: number, swing: number) => triangleLossDensity(1, alpha, beta, f, swing, 0.3);
    expect(at(2e5, 0.1) / at(1e5, 0.1)).toBeCloseTo(2 ** alpha, 9);
    expect(at(2e5, 0.05) / at(1e5, 0.1)).toBeCloseTo(2 ** (alpha - beta), 9);
  });
  it('of straight pieces is that of the closed forms', () => {
    fc.assert(
      fc.property(between(0.05, 0.45), between(1.05, 2), between(2, 3), (d, alpha, beta) => {
        igseAt(1, alpha, beta, chain([d, 0, 0.2], [1 - d, 0.2, 0]), 0.2, out);
        expect(out[0] / triangleLossDensity(1, alpha, beta, 1, 0.2, d)).toBeCloseTo(1, 10);
        igseAt(1, alpha, beta, chain([d, 0, 0.2], [0.5 - d, 0.2, 0.2], [d, 0.2, 0], [0.5 - d, 0, 0]), 0.2, out);
        expect(out[0] / trapezoidLossDensity(1, alpha, beta, 1, 0.2, d)).toBeCloseTo(1, 10);
      }),
    );
  });
  it('of a sine laid out in 400 straight pieces is Steinmetz’s', () => {
    const pieces = 400;
    const w = createWaveform(pieces);
    const b = (i: number) => 0.1 * Math.cos((2 * Math.PI * i) / pieces);
    for (let i = 0; i < pieces; i++) addSegment(w, 1e-5 / pieces, b(i), b(i + 1));
    igseAt(igseConstant(2, 1.45, 2.6), 1.45, 2.6, w, 0.2, out);
    expect(out[0] / steinmetz(2, 1.45, 2.6, 1e5, 0.1)).toBeCloseTo(1, 4);
  });
  it('of a still core is nothing', () => {
    igseAt(1, 1.4, 2.5, chain([1, 0.1, 0.1]), 0, out);
    expect(out[0]).toBe(0);
  });
  it('carries a duty correction of one at half duty, symmetric about it', () => {
    fc.assert(
      fc.property(between(1.05, 2.2), between(0.02, 0.98), (alpha, duty) => {
        dutyCorrectionAt(alpha, 0.5, out);
        expect(out[0]).toBeCloseTo(1, 12);
        dutyCorrectionAt(alpha, duty, out);
        const one = out[0];
        dutyCorrectionAt(alpha, 1 - duty, out);
        expect(out[0] / one).toBeCloseTo(1, 10);
        expect(one).toBeGreaterThanOrEqual(1 - 1e-12);
      }),
    );
  });
});

describe('Gaps', () => {
  it('found for an inductance give it back', () => {
    fc.assert(
      fc.property(between(2e-6, 2e-4), fc.integer({ min: 5, max: 40 }), (inductance, turns) => {
        const gap = gapFor(inductance, turns, 6.3e-5, 0.0384, 2000, 0.0108);
        if (gap === 0 || gap > 5e-3) return;
        const al = inductanceFactor(6.3e-5, gap, fringingFactor(gap, 6.3e-5, 0.0108), 0.0384, 2000);
        expect((al * turns * turns) / inductance).toBeCloseTo(1, 8);
      }),
    );
  });
  it('are none where the bare core gives less than asked', () => {
    expect(gapFor(1, 5, 6.3e-5, 0.0384, 2000, 0.0108)).toBe(0);
  });
});

describe('Soft saturation', () => {
  const bend = fc
    .record({ saturationCurrent: between(2, 50), saturationDrop: between(0.1, 0.4), saturationExponent: between(2, 8) })
    .map((values): Bend => ({ inductance: 1e-6, ...values }));
  it('has lost its drop at the saturation current and nothing at zero', () => {
    fc.assert(
      fc.property(bend, (b) => {
        inductanceAt(b, b.saturationCurrent, out);
        expect(out[0] / 1e-6).toBeCloseTo(1 - b.saturationDrop, 12);
        inductanceAt(b, 0, out);
        expect(out[0]).toBe(1e-6);
      }),
    );
  });
  it('has the linkage of its closed form for s = 2', () => {
    const b = { inductance: 1e-6, saturationCurrent: 20, saturationDrop: 0.3, saturationExponent: 2 };
    const root = Math.sqrt(0.3 / 0.7);
    expect(fluxLinkage(b, 30) / ((1e-6 * 20 * Math.atan(root * 1.5)) / root)).toBeCloseTo(1, 10);
  });
  it('has an odd, rising linkage that its inverse undoes', () => {
    fc.assert(
      fc.property(bend, between(-2, 2), (b, share) => {
        const current = share * b.saturationCurrent;
        expect(fluxLinkage(b, -current)).toBeCloseTo(-fluxLinkage(b, current), 18);
        expect(currentOfLinkage(b, fluxLinkage(b, current))).toBeCloseTo(current, 6);
      }),
      { numRuns: 30 },
    );
  });
  it('makes a ripple that carries the volt-seconds: λ(peak) − λ(valley) = V·t', () => {
    fc.assert(
      fc.property(bend, between(0.1, 1), between(0.05, 0.5), (b, mean, share) => {
        const voltSeconds = share * 1e-6 * b.saturationCurrent;
        swingAt(b, mean * b.saturationCurrent, voltSeconds, 6, out);
        const [high, low] = [0.5, -0.5].map((half) => mean * b.saturationCurrent + half * out[0]);
        expect((fluxLinkage(b, high) - fluxLinkage(b, low)) / voltSeconds).toBeCloseTo(1, 1.7);
      }),
    );
  });
  it('has a mean over a range between its values at the ends', () => {
    fc.assert(
      fc.property(bend, between(0, 1), between(0, 1), (b, from, width) => {
        const [low, high] = [from * b.saturationCurrent, (from + width) * b.saturationCurrent];
        meanInductanceAt(b, low, high, out);
        const mid = out[0];
        inductanceAt(b, low, out);
        expect(mid).toBeLessThanOrEqual(out[0] * (1 + 1e-12));
        inductanceAt(b, high, out);
        expect(mid).toBeGreaterThanOrEqual(out[0] * (1 - 1e-12));
      }),
    );
  });
});

describe('A stocked inductor', () => {
  const row: Inductor = {
    name: 'test',
    series: 'test',
    length: 1e-2,
    width: 1e-2,
    height: 4e-3,
    mass: 2e-3,
    prices: [{ from: 1, price: 1 }],
    inductance: 1e-6,
    tolerance: 0.2,
    saturationCurrent: 20,
    saturationDrop: 0.3,
    saturationExponent: 2.3,
    dcResistance: 5e-3,
    conductorThickness: 4e-4,
    layers: 2,
    coreCoefficient: 1e-9,
    coreFrequencyExponent: 1.32,
    coreSwingExponent: 2.15,
    ratedCurrent: 10,
    ratedRise: 40,
    maximumTemperature: 428,
  };
  it('loses k·f^α·ΔI^β in its core at half duty, more at any other, nothing without ripple', () => {
    const at = createInductorAtFrequency();
    prepareInductor(row, 5e5, 343, at);
    stockedCoreLoss(row, at, 3, 0.5, out);
    expect(out[0] / (1e-9 * 5e5 ** 1.32 * 3 ** 2.15)).toBeCloseTo(1, 10);
    const half = out[0];
    stockedCoreLoss(row, at, 3, 0.2, out);
    expect(out[0]).toBeGreaterThan(half);
    stockedCoreLoss(row, at, 0, 0.2, out);
    expect(out[0]).toBe(0);
  });
  it('heats by its rated rise at its rated current', () => {
    const resistance = inductorThermalResistance(10, 40, 5e-3);
    expect(resistance * 100 * windingResistance(5e-3, 338.15)).toBeCloseTo(40, 10);
  });
  it('has ac factors that rise with harmonic and frequency', () => {
    const [slow, fast] = [createInductorAtFrequency(), createInductorAtFrequency()];
    prepareInductor(row, 2e5, 343, slow);
    prepareInductor(row, 1e6, 343, fast);
    for (let k = 0; k < RIPPLE_HARMONICS; k++) expect(fast.factors[k]).toBeGreaterThan(slow.factors[k]);
    expect(slow.factors[3]).toBeGreaterThan(slow.factors[0]);
  });
});
