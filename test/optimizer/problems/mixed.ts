/** Classic mixed-variable designs in two-objective form, with the best published single-objective designs as anchors. */
import type { Gene } from '../../../optimizer/index.ts';
import { type Published, publish } from './make.ts';

/** Step of the plate thicknesses that can be bought, inch. */
const PLATE = 0.0625;

/**
 * Pressure vessel (Sandgren 1990): shell and head thickness in whole plates, radius and length real; cost against volume. Best known cost
 * for a volume of at least 1,296,000 in³: 6059.714 at (13, 7) plates, R 42.0984, L 176.6366 (Gandomi, Yang, Alavi 2013, table 4).
 */
export function pressureVessel(): Published {
  return publish({
    name: 'pressure vessel',
    genes: [
      { name: 'shell', unit: 'plates', kind: 'whole', low: 1, high: 99 },
      { name: 'head', unit: 'plates', kind: 'whole', low: 1, high: 99 },
      { name: 'radius', unit: 'in', kind: 'real', low: 10, high: 200 },
      { name: 'length', unit: 'in', kind: 'real', low: 10, high: 200 },
    ],
    ideal: [0, -6_500_000],
    nadir: [20_000, 0],
    limits: ['shell', 'head'],
    evaluate([a, b, r, l], f, v) {
      const shell = a * PLATE;
      const head = b * PLATE;
      f[0] = 0.6224 * shell * r * l + 1.7781 * head * r * r + 3.1661 * shell * shell * l + 19.84 * shell * shell * r;
      f[1] = -(Math.PI * r * r * l + (4 / 3) * Math.PI * r * r * r);
      v[0] = Math.max(0, (0.0193 * r) / shell - 1);
      v[1] = Math.max(0, (0.00954 * r) / head - 1);
    },
  });
}

/** Wire diameters of ASTM A228 that can be bought, inch (Sandgren 1990). */
const WIRES = [
  0.009, 0.0095, 0.0104, 0.0118, 0.0128, 0.0132, 0.014, 0.015, 0.0162, 0.0173, 0.018, 0.02, 0.023, 0.025, 0.028, 0.032,
  0.035, 0.041, 0.047, 0.054, 0.063, 0.072, 0.08, 0.092, 0.105, 0.12, 0.135, 0.148, 0.162, 0.177, 0.192, 0.207, 0.225,
  0.244, 0.263, 0.283, 0.307, 0.331, 0.362, 0.394, 0.4375, 0.5,
];

/**
 * Coil spring under 1000 lb (Sandgren 1990; two objectives as in Deb 2001, section 8.6): coils whole, wire a choice, coil diameter real; volume against shear
 * stress. Smallest known volume within the stress limit of 189,000 psi: 2.6586 in³ at 9 coils, wire 0.283, diameter 1.223. (The seventh limit of the
 * statement, that the deflections add up, holds by definition of the free length and is left out.)
 */
export function spring(): Published {
  return publish({
    name: 'spring',
    genes: [
      { name: 'coils', unit: '', kind: 'whole', low: 1, high: 32 },
      { name: 'wire', unit: '', kind: 'choice', low: 0, high: WIRES.length - 1, options: WIRES.map(String) },
      { name: 'diameter', unit: 'in', kind: 'real', low: 1, high: 30 },
    ],
    ideal: [0, 0],
    nadir: [30, 189_000],
    limits: ['stress', 'length', 'thin', 'wide', 'index', 'preload', 'stroke'],
    evaluate([coils, option, diameter], f, v) {
      const wire = WIRES[option];
      const index = diameter / wire;
      const stiffness = (11.5e6 * wire * wire * wire * wire) / (8 * coils * diameter * diameter * diameter);
      const factor = (4 * index - 1) / (4 * index - 4) + 0.615 / index;
      const length = 1000 / stiffness + 1.05 * (coils + 2) * wire;
      f[0] = (Math.PI * Math.PI * diameter * wire * wire * (coils + 2)) / 4;
      f[1] = (8 * factor * 1000 * diameter) / (Math.PI * wire * wire * wire);
      v[0] = Math.max(0, f[1] / 189_000 - 1);
      v[1] = Math.max(0, length / 14 - 1);
      v[2] = Math.max(0, 1 - wire / 0.2);
      v[3] = Math.max(0, (diameter + wire) / 3 - 1);
      v[4] = Math.max(0, 1 - index / 3);
      v[5] = Math.max(0, 300 / stiffness / 6 - 1);
      v[6] = Math.max(0, 1 - 700 / stiffness / 1.25);
    },
  });
}

/** Error of a gear train's ratio from 1/6.931. */
export function gearError(a: number, b: number, c: number, d: number): number {
  return Math.abs(1 / 6.931 - (a * b) / (c * d));
}

/**
 * Gear train (Sandgren 1990; two objectives as in Deb 2001): four whole numbers of teeth, 12 … 60; error of the ratio against the largest
 * gear. Smallest known squared error: 2.70e−12 with 16, 19, 43, 49 teeth.
 */
export function gearTrain(): Published {
  const genes: Gene[] = ['a', 'b', 'c', 'd'].map((name) => ({ name, unit: '', kind: 'whole', low: 12, high: 60 }));
  return publish({
    name: 'gear train',
    genes,
    ideal: [0, 12],
    nadir: [0.9, 60],
    snap: (x) => {
      // The two drivers commute, and so do the two driven.
      if (x[0] > x[1]) x.subarray(0, 2).reverse();
      if (x[2] > x[3]) x.subarray(2, 4).reverse();
    },
    evaluate([a, b, c, d], f) {
      f[0] = gearError(a, b, c, d);
      f[1] = Math.max(a, b, c, d);
    },
  });
}
