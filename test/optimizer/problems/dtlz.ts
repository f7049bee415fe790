/**
 * The scalable problems of Deb, Thiele, Laumanns, Zitzler (2005), "Scalable test problems for evolutionary multiobjective optimization",
 * with the sizes given there (k = 5, 10, 20), and their constrained forms by Jain, Deb (2014), IEEE Trans. Evol. Comp. 18(4), 602–622.
 */
import { cos, sin } from '../../../optimizer/maths/index.ts';
import { type Published, publish, reals } from './make.ts';

const HALF_PI = Math.PI / 2;

/** Plane front Σf = 0.5 behind 11⁵ local ones. */
export function dtlz1(m = 3, k = 5): Published {
  return publish({
    ...unit(m, 0.5),
    name: 'DTLZ1',
    genes: reals(m - 1 + k, 0, 1),
    evaluate: (x, f) => linear(x, f, m),
  });
}

/** Sphere front Σf² = 1. */
export function dtlz2(m = 3, k = 10): Published {
  return publish({ ...unit(m, 1), name: 'DTLZ2', genes: reals(m - 1 + k, 0, 1), evaluate: (x, f) => sphere(x, f, m) });
}

/** Four separate pieces; range of its front with three objectives: f1, f2 to 0.8594008566, f3 from 2.6140086322 to 6. */
export function dtlz7(k = 20): Published {
  return publish({
    name: 'DTLZ7',
    genes: reals(2 + k, 0, 1),
    ideal: [0, 0, 2.6140086322],
    nadir: [0.8594008566, 0.8594008566, 6],
    evaluate(x, f) {
      let g = 0;
      for (let i = 2; i < x.length; i++) g += x[i];
      g = 1 + (9 * g) / (x.length - 2);
      let h = 3;
      for (let i = 0; i < 2; i++) {
        f[i] = x[i];
        h -= (x[i] / (1 + g)) * (1 + sin(3 * Math.PI * x[i]));
      }
      f[2] = (1 + g) * h;
    },
  });
}

/** DTLZ1 whose feasible region is a thin layer above the front: 1 − f_m/0.6 − Σ f_i/0.5 ≥ 0. */
export function c1dtlz1(m = 3, k = 5): Published {
  return publish({
    ...unit(m, 0.5),
    name: 'C1-DTLZ1',
    genes: reals(m - 1 + k, 0, 1),
    limits: ['layer'],
    evaluate(x, f, v) {
      linear(x, f, m);
      let left = 1 - f[m - 1] / 0.6;
      for (let i = 0; i < m - 1; i++) left -= f[i] / 0.5;
      v[0] = Math.max(0, -left);
    },
  });
}

/** DTLZ2 whose feasible front is cut to discs of radius 0.4 about its corners and its middle. */
export function c2dtlz2(m = 3, k = 10, radius = 0.4): Published {
  return publish({
    ...unit(m, 1),
    name: 'C2-DTLZ2',
    genes: reals(m - 1 + k, 0, 1),
    limits: ['discs'],
    evaluate(x, f, v) {
      sphere(x, f, m);
      let squares = 0;
      let middle = 0;
      for (let i = 0; i < m; i++) {
        squares += f[i] * f[i];
        middle += (f[i] - 1 / Math.sqrt(m)) * (f[i] - 1 / Math.sqrt(m));
      }
      let nearest = middle - radius * radius;
      for (let i = 0; i < m; i++) {
        nearest = Math.min(nearest, (f[i] - 1) * (f[i] - 1) + squares - f[i] * f[i] - radius * radius);
      }
      v[0] = Math.max(0, nearest);
    },
  });
}

function unit(m: number, high: number): { ideal: number[]; nadir: number[] } {
  return { ideal: new Array<number>(m).fill(0), nadir: new Array<number>(m).fill(high) };
}

function linear(x: Float64Array, f: Float64Array, m: number): void {
  let g = x.length - m + 1;
  for (let i = m - 1; i < x.length; i++) g += (x[i] - 0.5) * (x[i] - 0.5) - cos(20 * Math.PI * (x[i] - 0.5));
  let product = 0.5 * (1 + 100 * g);
  for (let i = 0; i < m - 1; i++) {
    f[m - 1 - i] = product * (1 - x[i]);
    product *= x[i];
  }
  f[0] = product;
}

function sphere(x: Float64Array, f: Float64Array, m: number): void {
  let product = 1;
  for (let i = m - 1; i < x.length; i++) product += (x[i] - 0.5) * (x[i] - 0.5);
  for (let i = 0; i < m - 1; i++) {
    f[m - 1 - i] = product * sin(x[i] * HALF_PI);
    product *= cos(x[i] * HALF_PI);
  }
  f[0] = product;
}
