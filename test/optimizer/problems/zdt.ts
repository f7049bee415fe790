/**
 * The two-objective problems of Zitzler, Deb, Thiele (2000), "Comparison of multiobjective evolutionary algorithms: empirical results",
 * Evolutionary Computation 8(2), 173–195, with the sizes given there.
 */
import { cos, exp, sin } from '../../../optimizer/maths/index.ts';
import { type Published, publish, reals } from './make.ts';

const UNIT = { ideal: [0, 0], nadir: [1, 1] };

/** Convex front f2 = 1 − √f1. */
export function zdt1(n = 30): Published {
  return publish({
    name: 'ZDT1',
    genes: reals(n, 0, 1),
    ...UNIT,
    evaluate(x, f) {
      const g = 1 + 9 * meanOfTail(x);
      f[0] = x[0];
      f[1] = g * (1 - Math.sqrt(x[0] / g));
    },
  });
}

/** Concave front f2 = 1 − f1². */
export function zdt2(n = 30): Published {
  return publish({
    name: 'ZDT2',
    genes: reals(n, 0, 1),
    ...UNIT,
    evaluate(x, f) {
      const g = 1 + 9 * meanOfTail(x);
      const ratio = x[0] / g;
      f[0] = x[0];
      f[1] = g * (1 - ratio * ratio);
    },
  });
}

/** Five separate pieces; the range of its front: f1 to 0.8518328654, f2 from −0.7733690137 (Deb 1999's stationary points). */
export function zdt3(n = 30): Published {
  return publish({
    name: 'ZDT3',
    genes: reals(n, 0, 1),
    ideal: [0, -0.7733690137],
    nadir: [0.8518328654, 1],
    evaluate(x, f) {
      const g = 1 + 9 * meanOfTail(x);
      const ratio = x[0] / g;
      f[0] = x[0];
      f[1] = g * (1 - Math.sqrt(ratio) - ratio * sin(10 * Math.PI * x[0]));
    },
  });
}

/** Front of ZDT1 behind 21⁹ local ones. */
export function zdt4(n = 10): Published {
  return publish({
    name: 'ZDT4',
    genes: [...reals(1, 0, 1), ...reals(n - 1, -5, 5, 2)],
    ...UNIT,
    evaluate(x, f) {
      let g = 1 + 10 * (x.length - 1);
      for (let i = 1; i < x.length; i++) g += x[i] * x[i] - 10 * cos(4 * Math.PI * x[i]);
      f[0] = x[0];
      f[1] = g * (1 - Math.sqrt(x[0] / g));
    },
  });
}

/** Concave front from f1 = 0.2807753191 on, reached through a strong bias. */
export function zdt6(n = 10): Published {
  return publish({
    name: 'ZDT6',
    genes: reals(n, 0, 1),
    ideal: [0.2807753191, 0],
    nadir: [1, 0.9211652202],
    evaluate(x, f) {
      const wave = sin(6 * Math.PI * x[0]);
      const g = 1 + 9 * Math.sqrt(Math.sqrt(meanOfTail(x)));
      f[0] = 1 - exp(-4 * x[0]) * wave * wave * wave * wave * wave * wave;
      f[1] = g * (1 - (f[0] / g) * (f[0] / g));
    },
  });
}

function meanOfTail(x: Float64Array): number {
  let sum = 0;
  for (let i = 1; i < x.length; i++) sum += x[i];
  return sum / (x.length - 1);
}
