/** Special functions that the magnetics rest on. */
import { besselJ } from '../../model/magnetics/bessel.ts';
import { gamma } from '../../model/magnetics/gamma.ts';
import { litzLoss } from '../../model/magnetics/wire.ts';
import { type CaseGroup, type Common, make } from './case.ts';

const GAMMA: Common = {
  source: 'lanczos-1964',
  place: 'the function at known arguments',
  unit: '1',
  mark: 'computed',
  tolerance: 1e-14,
};
const gammas = [
  make(GAMMA, 'Γ(1/2) = √π', 1.772453850905516, () => gamma(0.5)),
  make(GAMMA, 'Γ(5) = 24', 24, () => gamma(5)),
  make(GAMMA, 'Γ(1.5)', 0.886226925452758, () => gamma(1.5)),
];

const BESSEL: Common = {
  source: 'abramowitz-stegun',
  place: 'table 9.1',
  unit: '1',
  mark: 'from memory',
  tolerance: 1e-9,
};
const out = new Float64Array(4);
const real = (x: number, index: number) => {
  besselJ(x, 0, out);
  return out[index];
};
const bessels = [
  make(BESSEL, 'J0(1)', 0.7651976866, () => real(1, 0)),
  make(BESSEL, 'J1(1)', 0.4400505857, () => real(1, 2)),
  make(BESSEL, 'J0(10)', -0.2459357645, () => real(10, 0)),
  make({ ...BESSEL, tolerance: 1e-8 }, 'J1(10)', 0.0434727462, () => real(10, 2)),
];

const LITZ: Common = {
  source: 'guillod-2017',
  place: 'one strand in no field is a round wire: R·F·I²/2',
  unit: 'W',
  mark: 'computed',
  tolerance: 1e-6,
};
const litz = [
  // 100 strands of 0.1 mm at δ = 1 mm: 0.11 W of dc, 2.148 µW of strands in each other's field, 0.014 µW of skin effect.
  make(LITZ, '100 strands, 10 A peak, no field', 0.110002163, () => litzLoss(100, 1e-4, 2e-3, 1e-3, 0.22, 10, 0)),
];

export const MATHS: readonly CaseGroup[] = [
  { title: 'Gamma function', cases: gammas },
  { title: 'Bessel functions', cases: bessels },
  { title: 'Litz', cases: litz },
];
