/** Laws of capacitor banks, against the textbook limits and a slow step-by-step solution. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  bankCurrents,
  bankRipple,
  bankTrace,
  ceramicWorstFactor,
  createBank,
  createBankRipple,
  inputMeanSquare,
  setGroup1,
  setGroup2,
} from '../../../model/capacitors/index.ts';
import {
  addSegment,
  chargeSwing,
  createWaveform,
  mean,
  meanSquare,
  sample,
  sumShifted,
  type Waveform,
} from '../../../model/waveform/index.ts';

function chain(...segments: readonly (readonly [number, number, number])[]): Waveform {
  const w = createWaveform(segments.length);
  for (const [d, a, b] of segments) addSegment(w, d, a, b);
  return w;
}
const result = createBankRipple();
const solve = (values: Partial<ReturnType<typeof createBank>>, w: Waveform) => {
  bankRipple(Object.assign(createBank(), values), w, result);
  return result;
};
const triangle = (duty: number, f = 5e5) => chain([duty / f, -1, 1], [(1 - duty) / f, 1, -1]);
const share = fc.double({ min: 0.05, max: 0.95, noNaN: true });
const pulses = share.chain((duty) =>
  fc.double({ min: 0.1, max: 20, noNaN: true }).map((i) => chain([duty / 3e5, i, 1.3 * i], [(1 - duty) / 3e5, 0, 0])),
);

describe('A bank of one group', () => {
  it('without resistance ripples by its charge swing over C', () => {
    fc.assert(
      fc.property(pulses, (w) => {
        expect(solve({ c1: 1e-4 }, w).ripple).toBeCloseTo(chargeSwing(w) / 1e-4, 9);
      }),
    );
  });
  it('takes the whole ac current', () => {
    fc.assert(
      fc.property(pulses, (w) => {
        const ac = meanSquare(w) - mean(w) ** 2;
        expect(solve({ c1: 1e-4, r1: 1e-3 }, w).meanSquare1 / ac).toBeCloseTo(1, 9);
        expect(result.meanSquare2).toBeCloseTo(0, 12);
      }),
    );
  });
  it('split into two of equal time constants behaves as one', () => {
    fc.assert(
      fc.property(pulses, share, (w, part) => {
        const whole = solve({ c1: 1e-4, r1: 4e-3 }, w).ripple;
        const both = solve({ c1: part * 1e-4, r1: 4e-3 / part, c2: (1 - part) * 1e-4, r2: 4e-3 / (1 - part) }, w);
        expect(both.ripple / whole).toBeCloseTo(1, 9);
        expect(both.meanSquare1 / both.meanSquare2).toBeCloseTo((part / (1 - part)) ** 2, 6);
      }),
    );
  });
  it('with inductance alone steps by ESL·Vin/L: 1 nH on 10 A/µs against 6.67 A/µs is 16.7 mV', () => {
    const w = chain([1e-6, -5, 5], [1.5e-6, 5, -5]);
    expect(solve({ c1: 1, l1: 1e-9 }, w).ripple).toBeCloseTo(16.6667e-3, 6);
  });
});

describe('A bank of two groups', () => {
  const anyBank = fc.record({
    c1: fc.double({ min: 5e-6, max: 2e-4, noNaN: true }),
    r1: fc.double({ min: 2e-4, max: 2e-2, noNaN: true }),
    c2: fc.double({ min: 2e-5, max: 1e-3, noNaN: true }),
    r2: fc.double({ min: 2e-3, max: 5e-2, noNaN: true }),
  });
  it('agrees with a slow step-by-step solution', () => {
    fc.assert(
      fc.property(anyBank, pulses, (bank, w) => {
        const exact = solve(bank, w).ripple;
        expect(slowRipple(bank, w) / exact).toBeCloseTo(1, 2);
      }),
      { numRuns: 20 },
    );
  });
  it('never ripples more than its better part alone', () => {
    fc.assert(
      fc.property(anyBank, pulses, (bank, w) => {
        const both = solve(bank, w).ripple;
        const first = solve({ c1: bank.c1, r1: bank.r1 }, w).ripple;
        const second = solve({ c1: bank.c2, r1: bank.r2 }, w).ripple;
        expect(both).toBeLessThanOrEqual(Math.min(first, second) * (1 + 1e-9));
      }),
    );
  });
  it('splits a current so that both shares heat: Σ rms of the groups is at least the whole rms', () => {
    fc.assert(
      fc.property(anyBank, pulses, (bank, w) => {
        const ac = Math.sqrt(meanSquare(w) - mean(w) ** 2);
        solve(bank, w);
        const sum = Math.sqrt(result.meanSquare1) + Math.sqrt(result.meanSquare2);
        expect(sum).toBeGreaterThanOrEqual(ac * (1 - 1e-6));
      }),
    );
  });
  it('goes over into one group continuously as the second vanishes', () => {
    const w = triangle(0.3);
    const alone = solve({ c1: 5e-5, r1: 2e-3 }, w).ripple;
    expect(solve({ c1: 5e-5, r1: 2e-3, c2: 1e-12, r2: 0.05 }, w).ripple / alone).toBeCloseTo(1, 6);
  });
  it('keeps its rms exact across the change of integration rule for short segments', () => {
    const w = triangle(0.3);
    const near = (r2: number) => {
      solve({ c1: 5e-5, r1: 1e-3, c2: 5e-4, r2 }, w);
      return result.meanSquare2;
    };
    // τ = (R1 + R2)·C1·C2/(C1 + C2): segments of 0.6 and 1.4 µs pass 0.05·τ near 264 mΩ and 615 mΩ
    for (const edge of [0.263, 0.615]) {
      const steps = [0.996, 0.998, 1.002, 1.004].map((factor) => near(edge * factor) * (edge * factor) ** 2);
      expect(Math.abs(steps[3] - steps[2] - (steps[1] - steps[0])) / steps[1]).toBeLessThan(1e-3);
    }
  });
});

describe('The cheaper and the drawn form', () => {
  const bank = Object.assign(createBank(), { c1: 4e-5, r1: 1e-3, l1: 1e-10, c2: 3e-4, r2: 0.02, l2: 2e-9 });
  it('have the same currents to the bit, and a trace inside the ripple that nearly fills it', () => {
    const currents = createBankRipple();
    fc.assert(
      fc.property(pulses, (w) => {
        solve(bank, w);
        bankCurrents(bank, w, currents);
        expect([currents.meanSquare1, currents.meanSquare2]).toEqual([result.meanSquare1, result.meanSquare2]);
        const { time, value } = bankTrace(bank, w, 60);
        const drawn = Math.max(...value) - Math.min(...value);
        expect(drawn).toBeLessThanOrEqual(result.ripple * (1 + 1e-9));
        expect(drawn / result.ripple).toBeGreaterThan(0.999);
        expect(time.at(-1)).toBeCloseTo(w.period, 15);
        // Periodic: it ends where it began, but for the step of the inductances between last and first segment.
        const step = (1e-10 * 2e-9) / 2.1e-9;
        const slopes = [w.count - 1, 0].map((i) => (w.end[i] - w.start[i]) / w.duration[i]);
        const jump = ((w.start[0] - w.end[w.count - 1]) * 1e-3 * 0.02) / 0.021;
        expect(value[0] - (value.at(-1) ?? Number.NaN)).toBeCloseTo(step * (slopes[1] - slopes[0]) + jump, 6);
      }),
    );
  });
});

describe('Groups of parts', () => {
  it('add their capacitances and divide the rest', () => {
    const bank = createBank();
    setGroup1(bank, 4, 1e-5, 4e-3, 8e-10);
    setGroup2(bank, 0, 1e-4, 1e-2, 2e-9);
    expect(bank).toEqual({ c1: 4e-5, r1: 1e-3, l1: 2e-10, c2: 0, r2: 0, l2: 0 });
  });
  it('never grow by tolerance, cold or age', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 0.3, noNaN: true }),
        fc.double({ min: 1, max: 1e6, noNaN: true }),
        (x, hours) => {
          const factor = ceramicWorstFactor(x, x, 0.05, hours);
          expect(factor).toBeGreaterThan(0);
          expect(factor).toBeLessThanOrEqual(1);
        },
      ),
    );
  });
});

describe('The closed multiphase form of the input current', () => {
  it('is the mean square of the summed waveform, at any duty and ripple', () => {
    const into = createWaveform(40);
    fc.assert(
      fc.property(
        share,
        fc.integer({ min: 1, max: 8 }),
        fc.double({ min: 0, max: 2, noNaN: true }),
        (duty, n, swing) => {
          sumShifted(chain([duty, 1 / n - swing / 2, 1 / n + swing / 2], [1 - duty, 0, 0]), n, into);
          expect(inputMeanSquare(n, duty, 1, swing)).toBeCloseTo(meanSquare(into) - mean(into) ** 2, 8);
        },
      ),
    );
  });
});

/** Ripple by small implicit-midpoint steps to the periodic state. */
function slowRipple(b: { c1: number; r1: number; c2: number; r2: number }, w: Waveform): number {
  const steps = 4000;
  const dt = w.period / steps;
  const average = mean(w);
  const tau = ((b.r1 + b.r2) * b.c1 * b.c2) / (b.c1 + b.c2);
  const periods = Math.min(200, 5 + Math.ceil((20 * tau) / w.period));
  let d = 0;
  let q = 0;
  let high = 0;
  let low = 0;
  for (let n = 0; n < periods * steps; n++) {
    const i = sample(w, (n + 0.5) * dt) - average;
    const target = ((b.r2 * b.c2 - b.r1 * b.c1) / (b.c1 + b.c2)) * i;
    const next = target + (d - target) * Math.exp(-dt / tau);
    const middle = (d + next) / 2;
    q += i * dt;
    d = next;
    if (n % steps === 0) {
      high = Number.NEGATIVE_INFINITY;
      low = Number.POSITIVE_INFINITY;
    }
    const v = (q - (i * dt) / 2 + b.c2 * middle) / (b.c1 + b.c2) + (b.r1 * (b.r2 * i - middle)) / (b.r1 + b.r2);
    high = Math.max(high, v);
    low = Math.min(low, v);
  }
  return high - low;
}
