/**
 * Bessel functions J0 and J1 of a complex argument, portable: power series near the origin, Hankel's expansion far out.
 * Only what round wires need: arguments on the ray (1 − j)·t, where |J| grows as e^t.
 */
import { exp, sincosAt } from '../../optimizer/maths/index.ts';

/** Largest |z| for the power series: its terms reach e^|z|·2^-52 against a sum of e^(|z|/√2). */
const SERIES_LIMIT = 20;

const result = new Float64Array(4);
const angle = new Float64Array(2);

/**
 * Writes J0(z) and J1(z), z = re + j·im, to `into` as [re J0, im J0, re J1, im J1]; beyond |z| = 20 both are divided by
 * e^|im z| so that they stay finite (ratios are unaffected).
 * @source abramowitz-stegun, 9.1.10 (series) and 9.2.5 (Hankel's asymptotic expansion)
 * @valid re z > 0 beyond |z| = 20; accurate to about 1e-12 of |J|
 */
export function besselJ(re: number, im: number, into: Float64Array): void {
  if (re * re + im * im <= SERIES_LIMIT * SERIES_LIMIT) series(re, im, into);
  else asymptotic(re, im, into);
}

/** Σ (−z²/4)^k/(k!)² and (z/2)·Σ (−z²/4)^k/(k!·(k + 1)!). */
function series(re: number, im: number, into: Float64Array): void {
  const ur = -0.25 * (re * re - im * im);
  const ui = -0.5 * re * im;
  let tr = 1;
  let ti = 0;
  let zeroRe = 1;
  let zeroIm = 0;
  let oneRe = 1;
  let oneIm = 0;
  for (let k = 1; k < 80; k++) {
    const r = (tr * ur - ti * ui) / (k * k);
    ti = (tr * ui + ti * ur) / (k * k);
    tr = r;
    zeroRe += tr;
    zeroIm += ti;
    oneRe += tr / (k + 1);
    oneIm += ti / (k + 1);
    if (Math.abs(tr) + Math.abs(ti) < 1e-20 * (Math.abs(zeroRe) + Math.abs(zeroIm))) break;
  }
  into[0] = zeroRe;
  into[1] = zeroIm;
  into[2] = 0.5 * (re * oneRe - im * oneIm);
  into[3] = 0.5 * (re * oneIm + im * oneRe);
}

/** √(2/πz)·[P·cos χ − Q·sin χ], χ = z − (2ν + 1)·π/4, P and Q by Hankel's series, for ν = 0 and 1. */
function asymptotic(re: number, im: number, into: Float64Array): void {
  for (let order = 0; order < 2; order++) {
    hankel(re, im, order);
    const [pr, pi, qr, qi] = result;
    // e^(±jχ): one of the two dominates; both are kept, scaled by e^−|im|.
    const grow = Math.abs(im);
    angle[0] = re - (2 * order + 1) * (Math.PI / 4);
    sincosAt(angle, 0);
    const plus = exp(-im - grow);
    const minus = exp(im - grow);
    const cr = 0.5 * angle[1] * (plus + minus);
    const ci = 0.5 * angle[0] * (plus - minus);
    const sr = 0.5 * angle[0] * (plus + minus);
    const si = -0.5 * angle[1] * (plus - minus);
    const nr = pr * cr - pi * ci - (qr * sr - qi * si);
    const ni = pr * ci + pi * cr - (qr * si + qi * sr);
    rootTimes(re, im, nr, ni, into, 2 * order);
  }
}

/** Hankel's P and Q to `result`, up to the smallest term. */
function hankel(re: number, im: number, order: number): void {
  const mu = 4 * order * order;
  const size = re * re + im * im;
  const ir = re / (8 * size);
  const ii = -im / (8 * size);
  let tr = 1;
  let ti = 0;
  result.fill(0);
  result[0] = 1;
  let last = Number.POSITIVE_INFINITY;
  for (let k = 1; k < 40; k++) {
    const factor = (mu - (2 * k - 1) * (2 * k - 1)) / k;
    const r = factor * (tr * ir - ti * ii);
    ti = factor * (tr * ii + ti * ir);
    tr = r;
    const now = Math.abs(tr) + Math.abs(ti);
    if (now > last || now < 1e-18) break;
    last = now;
    const sign = (k & 2) === 0 ? 1 : -1;
    const place = (k & 1) === 0 ? 0 : 2;
    result[place] += sign * tr;
    result[place + 1] += sign * ti;
  }
}

/** Writes √(2/(π·z))·n to `into[at]`, `into[at + 1]`. */
function rootTimes(re: number, im: number, nr: number, ni: number, into: Float64Array, at: number): void {
  const size = re * re + im * im;
  const xr = (2 * re) / (Math.PI * size);
  const xi = (-2 * im) / (Math.PI * size);
  const modulus = Math.sqrt(xr * xr + xi * xi);
  const rr = Math.sqrt(0.5 * (modulus + xr));
  const ri = (xi < 0 ? -1 : 1) * Math.sqrt(0.5 * (modulus - xr));
  into[at] = rr * nr - ri * ni;
  into[at + 1] = rr * ni + ri * nr;
}
