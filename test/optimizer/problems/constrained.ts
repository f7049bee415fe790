/** Two-objective problems with limits, as collected by Deb (2001), "Multi-Objective Optimization Using Evolutionary Algorithms", section 8.3. */
import { atan, cos } from '../../../optimizer/maths/index.ts';
import { type Published, publish, reals } from './make.ts';

/** Binh, Korn (1997). Front: x1 = x2 from 0 to 3, then x2 = 3 with x1 from 3 to 5. */
export function binhKorn(): Published {
  return publish({
    name: 'Binh–Korn',
    genes: [...reals(1, 0, 5), ...reals(1, 0, 3, 2)],
    ideal: [0, 4],
    nadir: [136, 50],
    limits: ['disc', 'hole'],
    evaluate([x, y], f, v) {
      f[0] = 4 * x * x + 4 * y * y;
      f[1] = (x - 5) * (x - 5) + (y - 5) * (y - 5);
      v[0] = Math.max(0, ((x - 5) * (x - 5) + y * y) / 25 - 1);
      v[1] = Math.max(0, 1 - ((x - 8) * (x - 8) + (y + 3) * (y + 3)) / 7.7);
    },
  });
}

/** Srinivas, Deb (1994). Front: x1 = −2.5, x2 from 2.5 to √218.75: the line f1 + f2 = −0.25. */
export function srinivas(): Published {
  return publish({
    name: 'Srinivas',
    genes: reals(2, -20, 20),
    ideal: [24.5, -212.66],
    nadir: [212.41, -24.75],
    limits: ['disc', 'line'],
    evaluate([x, y], f, v) {
      f[0] = 2 + (x - 2) * (x - 2) + (y - 1) * (y - 1);
      f[1] = 9 * x - (y - 1) * (y - 1);
      v[0] = Math.max(0, (x * x + y * y) / 225 - 1);
      v[1] = Math.max(0, (x - 3 * y) / 10 + 1);
    },
  });
}

/** Tanaka and others (1995). Front: pieces of the wavy edge x1² + x2² = 1 + 0.1 cos(16 arctan(x1/x2)) inside a disc. */
export function tanaka(): Published {
  return publish({
    name: 'Tanaka',
    genes: reals(2, 1e-9, Math.PI),
    ideal: [0.0416, 0.0416],
    nadir: [1.0384, 1.0384],
    limits: ['wave', 'disc'],
    evaluate([x, y], f, v) {
      f[0] = x;
      f[1] = y;
      v[0] = Math.max(0, 1 + 0.1 * cos(16 * atan(x / y)) - x * x - y * y);
      v[1] = Math.max(0, ((x - 0.5) * (x - 0.5) + (y - 0.5) * (y - 0.5)) / 0.5 - 1);
    },
  });
}

/** Osyczka, Kundu (1995). Front: five pieces along different limits (`osyczkaKunduSet`). */
export function osyczkaKundu(): Published {
  return publish({
    name: 'Osyczka–Kundu',
    genes: [
      ...reals(2, 0, 10),
      ...reals(1, 1, 5, 3),
      ...reals(1, 0, 6, 4),
      ...reals(1, 1, 5, 5),
      ...reals(1, 0, 10, 6),
    ],
    ideal: [-274, 4],
    nadir: [-42, 76],
    limits: ['c1', 'c2', 'c3', 'c4', 'c5', 'c6'],
    evaluate([a, b, c, d, e, g], f, v) {
      f[0] = -(25 * (a - 2) * (a - 2) + (b - 2) * (b - 2) + (c - 1) * (c - 1) + (d - 4) * (d - 4) + (e - 1) * (e - 1));
      f[1] = a * a + b * b + c * c + d * d + e * e + g * g;
      v[0] = Math.max(0, 1 - (a + b) / 2);
      v[1] = Math.max(0, (a + b) / 6 - 1);
      v[2] = Math.max(0, (b - a) / 2 - 1);
      v[3] = Math.max(0, (a - 3 * b) / 2 - 1);
      v[4] = Math.max(0, ((c - 3) * (c - 3) + d) / 4 - 1);
      v[5] = Math.max(0, 1 - ((e - 3) * (e - 3) + g) / 4);
    },
  });
}

/**
 * Points of the Pareto set of Osyczka–Kundu, `steps` a piece: with x4 = x6 = 0, pieces (x1, x2, x3, x5) AB (5, 1, 1…5, 5), BC (5, 1, 1…5, 1),
 * CD (4.056…5, (x1 − 2)/3, 1, 1), DE (0, 2, 1…3.732, 1), EF (0…1, 2 − x1, 1, 1) (Deb 2001, table 26, from memory).
 */
export function osyczkaKunduSet(steps: number): Float64Array[] {
  const set: Float64Array[] = [];
  for (let k = 0; k <= steps; k++) {
    const t = k / steps;
    const cd = 4.056 + 0.944 * t;
    set.push(Float64Array.of(5, 1, 1 + 4 * t, 0, 5, 0), Float64Array.of(5, 1, 1 + 4 * t, 0, 1, 0));
    set.push(Float64Array.of(cd, (cd - 2) / 3, 1, 0, 1, 0), Float64Array.of(0, 2, 1 + 2.732 * t, 0, 1, 0));
    set.push(Float64Array.of(t, 2 - t, 1, 0, 1, 0));
  }
  return set;
}
