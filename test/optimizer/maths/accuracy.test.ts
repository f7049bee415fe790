/**
 * The portable elementary functions against @stdlib's (independent ports, the oracle), in units in the last place, over
 * everyday arguments, random bit patterns and the edges that IEEE 754-2019 section 9.2 fixes.
 */
import oracleAtan from '@stdlib/math-base-special-atan';
import oracleCbrt from '@stdlib/math-base-special-cbrt';
import oracleCos from '@stdlib/math-base-special-cos';
import oracleCosh from '@stdlib/math-base-special-cosh';
import oracleExp from '@stdlib/math-base-special-exp';
import oracleExpm1 from '@stdlib/math-base-special-expm1';
import oracleHypot from '@stdlib/math-base-special-hypot';
import oracleLog from '@stdlib/math-base-special-ln';
import oracleLog2 from '@stdlib/math-base-special-log2';
import oracleLog10 from '@stdlib/math-base-special-log10';
import oraclePow from '@stdlib/math-base-special-pow';
import oracleSin from '@stdlib/math-base-special-sin';
import oracleSinh from '@stdlib/math-base-special-sinh';
import oracleTan from '@stdlib/math-base-special-tan';
import oracleTanh from '@stdlib/math-base-special-tanh';
import { describe, expect, it } from 'vitest';
import * as maths from '../../../optimizer/maths/index.ts';
import { argumentStream, SUBJECTS } from './hash.ts';

type Two = (x: number, y: number) => number;

/** Oracle of each function and the largest distance allowed: each side's stated error, added up. */
const ORACLES: Record<string, { oracle: Two; ulps: number }> = {
  exp: { oracle: oracleExp, ulps: 1 },
  expm1: { oracle: oracleExpm1, ulps: 1 },
  log: { oracle: oracleLog, ulps: 1 },
  log2: { oracle: oracleLog2, ulps: 1 },
  log10: { oracle: oracleLog10, ulps: 1 },
  pow: { oracle: oraclePow, ulps: 1 },
  sin: { oracle: oracleSin, ulps: 1 },
  cos: { oracle: oracleCos, ulps: 1 },
  tan: { oracle: oracleTan, ulps: 1 },
  atan: { oracle: oracleAtan, ulps: 2 },
  sinh: { oracle: oracleSinh, ulps: 3 },
  cosh: { oracle: oracleCosh, ulps: 3 },
  tanh: { oracle: oracleTanh, ulps: 3 },
  cbrt: { oracle: oracleCbrt, ulps: 1 },
  hypot: { oracle: oracleHypot, ulps: 2 },
};

/** How many doubles apart two values are; 0 for two NaNs. */
function ulpsApart(a: number, b: number): number {
  if (Number.isNaN(a) || Number.isNaN(b)) return Number.isNaN(a) && Number.isNaN(b) ? 0 : Number.POSITIVE_INFINITY;
  return Number(place(a) > place(b) ? place(a) - place(b) : place(b) - place(a));
}

/** Position of a double among all doubles in order. */
function place(x: number): bigint {
  const view = new DataView(new ArrayBuffer(8));
  view.setFloat64(0, x);
  const bits = view.getBigInt64(0);
  return bits < 0n ? -(bits & 0x7fffffffffffffffn) : bits;
}

describe('portable functions beside @stdlib', () => {
  for (const subject of SUBJECTS) {
    it(`${subject.name} stays within ${ORACLES[subject.name].ulps} ulp over 100,000 arguments`, () => {
      const { oracle, ulps } = ORACLES[subject.name];
      const next = argumentStream(subject.low, subject.high);
      let worst = 0;
      let at = '';
      for (let i = 0; i < 100_000; i++) {
        const x = next();
        const y = next();
        const apart = ulpsApart(subject.call(x, y), oracle(x, y));
        if (apart > worst) {
          worst = apart;
          at = `${x}, ${y}: ${subject.call(x, y)} against ${oracle(x, y)}`;
        }
      }
      expect(worst, at).toBeLessThanOrEqual(ulps);
    });
  }

  it('reduces huge angles exactly', () => {
    // Muller, Elementary Functions, 2nd ed., section 9.1: the double worst placed for reduction by pi/2 is
    // 6381956970095103 * 2^797, whose cosine is -4.6871659242546277e-19.
    const worst = 6381956970095103 * maths.pow(2, 797);
    expect(maths.cos(worst)).toBe(-4.6871659242546277e-19);
    expect(ulpsApart(maths.sin(1e300), oracleSin(1e300))).toBeLessThanOrEqual(1);
    expect(ulpsApart(maths.tan(-1.7e308), oracleTan(-1.7e308))).toBeLessThanOrEqual(1);
  });

  it('powers near one with huge exponents', () => {
    for (const x of [1 + 2 ** -52, 1 - 2 ** -53, 1 + 3 * 2 ** -40, 0.9999999]) {
      for (const y of [1e9, 2 ** 31, 3e10, -5e12, 1e15, 9e15, 1e17, 2e18, 1e25, -1e30]) {
        expect(ulpsApart(maths.pow(x, y), oraclePow(x, y)), `${x}^${y}`).toBeLessThanOrEqual(1);
      }
    }
  });
});

describe('edges', () => {
  const infinity = Number.POSITIVE_INFINITY;
  it('pow follows IEEE 754-2019, section 9.2.1', () => {
    expect(maths.pow(Number.NaN, 0)).toBe(1);
    expect(maths.pow(1, Number.NaN)).toBe(1);
    expect(maths.pow(-1, infinity)).toBe(1);
    expect(maths.pow(-8, 1 / 3)).toBeNaN();
    expect(maths.pow(-2, 3)).toBe(-8);
    expect(maths.pow(-2, 4)).toBe(16);
    expect(maths.pow(-0, -3)).toBe(-infinity);
    expect(maths.pow(-0, 3)).toBe(-0);
    expect(maths.pow(0, -2)).toBe(infinity);
    expect(maths.pow(-infinity, 3)).toBe(-infinity);
    expect(maths.pow(-infinity, -3)).toBe(-0);
    expect(maths.pow(-infinity, 0.5)).toBe(infinity);
    expect(maths.pow(0.5, infinity)).toBe(0);
    expect(maths.pow(0.5, -infinity)).toBe(infinity);
    expect(maths.pow(2, 1024)).toBe(infinity);
    expect(maths.pow(2, -1074)).toBe(5e-324);
    expect(maths.pow(2, -1076)).toBe(0);
    expect(maths.pow(10, 3)).toBe(1000);
  });

  it('exp, expm1 and the logarithms', () => {
    expect(maths.exp(0)).toBe(1);
    expect(maths.exp(-infinity)).toBe(0);
    expect(maths.exp(infinity)).toBe(infinity);
    expect(maths.exp(709.8)).toBe(infinity);
    expect(maths.exp(-746)).toBe(0);
    expect(maths.expm1(-0)).toBe(-0);
    expect(maths.expm1(-50)).toBe(-1);
    expect(maths.expm1(1e-300)).toBe(1e-300);
    expect(maths.log(0)).toBe(-infinity);
    expect(maths.log(1)).toBe(0);
    expect(maths.log(-1)).toBeNaN();
    for (let k = -1074; k < 1024; k++) expect(maths.log2(2 ** k)).toBe(k);
    for (let k = 0; k <= 22; k++) expect(maths.log10(10 ** k)).toBe(k);
  });

  it('circular and hyperbolic functions keep signs and limits', () => {
    for (const f of [maths.sin, maths.tan, maths.atan, maths.sinh, maths.tanh, maths.cbrt]) {
      expect(f(0)).toBe(0);
      expect(f(-0)).toBe(-0);
      expect(f(-0.7)).toBe(-f(0.7));
      expect(f(5e-324)).toBe(5e-324 * (f === maths.cbrt ? f(5e-324) / 5e-324 : 1));
    }
    expect(maths.cos(0)).toBe(1);
    expect(maths.sin(infinity)).toBeNaN();
    expect(maths.tan(Number.NaN)).toBeNaN();
    expect(maths.atan(infinity)).toBe(Math.PI / 2);
    expect(maths.atan(1)).toBe(Math.PI / 4);
    expect(maths.tanh(-infinity)).toBe(-1);
    expect(maths.sinh(-infinity)).toBe(-infinity);
    expect(maths.cosh(-infinity)).toBe(infinity);
    expect(maths.cbrt(-27)).toBe(-3);
    expect(maths.hypot(3 * 2 ** 700, -4 * 2 ** 700)).toBe(5 * 2 ** 700);
    expect(maths.hypot(Number.NaN, -infinity)).toBe(infinity);
    expect(maths.hypot(0, Number.NaN)).toBeNaN();
  });

  it('array twins give the same bits', () => {
    const a = new Float64Array(3);
    for (const x of [-3.7, -0, 0.3, 2.5, 47.1, 1e10]) {
      a.set([x, x, x]);
      maths.sincosAt(a, 1);
      expect([a[1], a[2]]).toEqual([maths.sin(x), maths.cos(x)]);
      a.set([x, 1.7, 0]);
      maths.powAt(a, 0);
      expect(a[0]).toEqual(maths.pow(x, 1.7));
      for (const [at, plain] of [
        [maths.expAt, maths.exp],
        [maths.logAt, maths.log],
        [maths.sinAt, maths.sin],
        [maths.cosAt, maths.cos],
      ] as const) {
        a[2] = x;
        at(a, 2);
        expect(a[2]).toEqual(plain(x));
      }
    }
  });
});
