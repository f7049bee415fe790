/** Laws of piecewise-linear waveforms: moments, harmonics, sums of shifted copies. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  addSegment,
  affine,
  chargeSwing,
  clearWaveform,
  createWaveform,
  harmonic,
  harmonics,
  MEAN,
  MEAN_SQUARE,
  mean,
  meanSquare,
  measure,
  PEAK,
  peak,
  rms,
  sample,
  setSegment,
  slopeMeanSquare,
  slopePowerMean,
  sumShifted,
  sumUnequal,
  VALLEY,
  valley,
  type Waveform,
} from '../../../model/waveform/index.ts';

function chain(...segments: readonly (readonly [number, number, number])[]): Waveform {
  const w = createWaveform(segments.length);
  for (const [d, a, b] of segments) addSegment(w, d, a, b);
  return w;
}

/** Up to six segments, some of no length, some with jumps between them. */
const anyWaveform = fc
  .array(
    fc.tuple(
      fc.oneof(
        { weight: 5, arbitrary: fc.double({ min: 0.01, max: 1, noNaN: true }) },
        { weight: 1, arbitrary: fc.constant(0) },
      ),
      fc.double({ min: -10, max: 10, noNaN: true }),
      fc.double({ min: -10, max: 10, noNaN: true }),
    ),
    { minLength: 1, maxLength: 6 },
  )
  .map((segments) => chain([0.3, 1, -2], ...segments));

/** Mean of f(x) over the period by the midpoint rule in each segment: the slow oracle. */
function slowMean(w: Waveform, f: (x: number, t: number) => number): number {
  let sum = 0;
  let time = 0;
  const steps = 2000;
  for (let i = 0; i < w.count; i++) {
    const d = w.duration[i];
    for (let j = 0; j < steps; j++) {
      const u = (j + 0.5) / steps;
      sum += f(w.start[i] + (w.end[i] - w.start[i]) * u, time + d * u) * (d / steps);
    }
    time += d;
  }
  return sum / w.period;
}

describe('Moments', () => {
  it('agree with slow integration', () => {
    fc.assert(
      fc.property(anyWaveform, (w) => {
        expect(mean(w)).toBeCloseTo(
          slowMean(w, (x) => x),
          9,
        );
        expect(meanSquare(w)).toBeCloseTo(
          slowMean(w, (x) => x * x),
          4,
        );
      }),
      { numRuns: 50 },
    );
  });
  it('are the same in one pass as one by one', () => {
    const into = new Float64Array(4);
    fc.assert(
      fc.property(anyWaveform, (w) => {
        measure(w, into);
        expect(into[MEAN]).toBeCloseTo(mean(w), 12);
        expect(into[MEAN_SQUARE]).toBeCloseTo(meanSquare(w), 10);
        expect([into[PEAK], into[VALLEY]]).toEqual([peak(w), valley(w)]);
      }),
    );
  });
  it('give 1/√3 for a triangle and 1 for a square wave of unit peak', () => {
    expect(rms(chain([1, -1, 1], [1, 1, -1]))).toBeCloseTo(1 / Math.sqrt(3), 15);
    expect(rms(chain([1, 1, 1], [1, -1, -1]))).toBe(1);
  });
  it('change as an affine map says', () => {
    fc.assert(
      fc.property(anyWaveform, fc.double({ min: -3, max: 3, noNaN: true }), (w, factor) => {
        const into = createWaveform(w.count);
        affine(w, factor, 2, into);
        expect(mean(into)).toBeCloseTo(factor * mean(w) + 2, 9);
        expect(slopeMeanSquare(into)).toBeCloseTo(factor * factor * slopeMeanSquare(w), 5);
      }),
    );
  });
});

describe('Segments', () => {
  it('may be written one by one, and cleared', () => {
    const w = createWaveform(2);
    setSegment(w, 0, 1, 0, 2);
    setSegment(w, 1, 1, 2, 0);
    w.count = 2;
    w.period = 2;
    expect(mean(w)).toBe(1);
    clearWaveform(w);
    expect([w.count, w.period]).toEqual([0, 0]);
  });
  it('repeat: a sample one period later, or earlier, is the same', () => {
    const w = chain([1, 0, 2], [0, 2, 5], [1, 5, 1]);
    for (const t of [0.25, 0.75, 1.5])
      expect([sample(w, t + 2), sample(w, t - 4)]).toEqual([sample(w, t), sample(w, t)]);
    expect([sample(w, 0.5), sample(w, 1), sample(w, 1.5)]).toEqual([1, 5, 3]);
  });
});

describe('Charge swing', () => {
  it('of a triangle is ΔI/(8·f), whatever its duty', () => {
    for (const duty of [0.1, 0.37, 0.5, 0.9])
      expect(chargeSwing(chain([duty, -1, 1], [1 - duty, 1, -1]))).toBeCloseTo(0.25, 14);
  });
  it('of a rectangle is I·D·(1 − D)/f', () => {
    expect(chargeSwing(chain([0.2, 5, 5], [0.8, 0, 0]))).toBeCloseTo(0.8, 14);
  });
});

describe('Slope', () => {
  it('to the power α of a trapezoid is what its ramps give', () => {
    const w = chain([0.1, 0, 1], [0.4, 1, 1], [0.1, 1, 0], [0.4, 0, 0]);
    expect(slopePowerMean(w, 2)).toBeCloseTo(20, 10);
    expect(slopePowerMean(w, 1)).toBeCloseTo(2, 12);
    expect(slopeMeanSquare(w)).toBeCloseTo(20, 10);
  });
});

describe('Harmonics', () => {
  it('of a square wave are 4/(π·k) for odd k and nothing for even k', () => {
    const into = new Float64Array(20);
    harmonics(chain([0.5, 1, 1], [0.5, -1, -1]), 10, into);
    for (let k = 1; k <= 10; k++) {
      expect(into[2 * k - 2]).toBeCloseTo(0, 12);
      expect(into[2 * k - 1]).toBeCloseTo(k % 2 === 1 ? 4 / (Math.PI * k) : 0, 12);
    }
  });
  it('agree with the oracle that takes every sine afresh, up to the 40th', () => {
    const all = new Float64Array(80);
    const one = new Float64Array(2);
    fc.assert(
      fc.property(anyWaveform, (w) => {
        harmonics(w, 40, all);
        for (const k of [1, 2, 7, 40]) {
          harmonic(w, k, one);
          expect(all[2 * k - 2]).toBeCloseTo(one[0], 10);
          expect(all[2 * k - 1]).toBeCloseTo(one[1], 10);
        }
      }),
      { numRuns: 50 },
    );
  });
  it('carry the whole ac mean square of a triangle (Parseval), to the tail that falls as k⁻³', () => {
    const w = chain([0.3, -1, 1], [0.7, 1, -1]);
    const into = new Float64Array(400);
    harmonics(w, 200, into);
    const sum = into.reduce((total, x) => total + 0.5 * x * x, 0);
    expect(sum).toBeLessThan(meanSquare(w));
    expect(sum / meanSquare(w)).toBeGreaterThan(1 - 1e-6);
  });
});

describe('Sums of shifted copies', () => {
  const into = createWaveform(80);
  it('equal the sum of samples, away from corners', () => {
    fc.assert(
      fc.property(
        anyWaveform,
        fc.integer({ min: 1, max: 8 }),
        fc.double({ min: 0.001, max: 0.999, noNaN: true }),
        (w, n, u) => {
          sumShifted(w, n, into);
          expect(into.period).toBeCloseTo(w.period / n, 12);
          const t = u * into.period;
          const near = corners(w, n).some((corner) => Math.abs(corner - t) < 1e-6 * into.period);
          if (near) return;
          let sum = 0;
          for (let j = 0; j < n; j++) sum += sample(w, t + (j * w.period) / n);
          expect(sample(into, t)).toBeCloseTo(sum, 7);
        },
      ),
      { numRuns: 300 },
    );
  });
  it('hold n times the mean', () => {
    fc.assert(
      fc.property(anyWaveform, fc.integer({ min: 1, max: 8 }), (w, n) => {
        sumShifted(w, n, into);
        expect(mean(into)).toBeCloseTo(n * mean(w), 7);
      }),
    );
  });
  it('cancel wholly at D = j/N and never jump there', () => {
    for (const n of [2, 3, 4, 5, 6, 8]) {
      for (let j = 1; j < n; j++) {
        const duty = j / n;
        sumShifted(chain([duty, -0.5, 0.5], [1 - duty, 0.5, -0.5]), n, into);
        expect(peak(into) - valley(into)).toBeLessThan(1e-8);
        sumShifted(chain([duty * (1 + 1e-12), 1, 1], [1 - duty * (1 + 1e-12), 0, 0]), n, into);
        expect(peak(into) - valley(into)).toBeLessThan(1 + 1e-8);
        expect(mean(into)).toBeCloseTo(j, 6);
      }
    }
  });
  it('with unequal scales of one are the equal sum, over the whole period', () => {
    const whole = createWaveform(80);
    fc.assert(
      fc.property(anyWaveform, fc.integer({ min: 1, max: 6 }), (w, n) => {
        sumShifted(w, n, into);
        sumUnequal(w, n, new Float64Array(n).fill(1), whole);
        expect(whole.period).toBeCloseTo(w.period, 12);
        expect(meanSquare(whole)).toBeCloseTo(meanSquare(into), 6);
        expect(peak(whole) - valley(whole)).toBeCloseTo(peak(into) - valley(into), 6);
      }),
    );
  });
  it('with L ± 20 % and four phases at D = 1/4 leave more than half of a phase’s ripple', () => {
    const scales = Float64Array.of(1 / 0.8, 1 / 0.8, 1 / 1.2, 1 / 1.2);
    sumUnequal(chain([0.25, -0.5, 0.5], [0.75, 0.5, -0.5]), 4, scales, into);
    expect(peak(into) - valley(into)).toBeGreaterThan(0.5);
  });
});

/** Times within the window at which a copy has a breakpoint. */
function corners(w: Waveform, n: number): number[] {
  const window = w.period / n;
  const times: number[] = [];
  let time = 0;
  for (let i = 0; i < w.count; i++) {
    times.push(time % window);
    time += w.duration[i];
  }
  return [...times, 0, window];
}
