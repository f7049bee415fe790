/** A small made-up problem with every kind of gene, families, a seed, a limit and designs that cannot be computed. */

import type { Problem } from '../../../optimizer/index.ts';
import { log } from '../../../optimizer/maths/index.ts';

const SHAPES = ['round', 'square', 'long'];

/**
 * Rooms to furnish: shape (choice, the family), seats (whole), width (real, steps of 0.1 m), light (logarithmic). Costs and discomfort are to be small; a room must
 * not be crowded; a long room under 2 m cannot be computed.
 */
export function rooms(): Problem {
  return {
    name: 'rooms',
    genes: [
      { name: 'shape', unit: '', kind: 'choice', low: 0, high: 2, options: SHAPES },
      { name: 'seats', unit: '', kind: 'whole', low: 1, high: 40 },
      { name: 'width', unit: 'm', kind: 'real', low: 1, high: 20 },
      { name: 'light', unit: 'lx', kind: 'log', low: 10, high: 10_000 },
    ],
    objectives: [
      { name: 'cost', unit: '', resolution: 1, ideal: 0, reference: 2000 },
      { name: 'discomfort', unit: '', resolution: 0.01, ideal: 0, reference: 20 },
    ],
    limits: ['crowding'],
    families: {
      names: SHAPES,
      of: (x) => x[0],
      confine: (x, family) => {
        x[0] = family;
      },
    },
    seeds: [Float64Array.of(1, 10, 6, 300)],
    snap: (x) => {
      x[2] = Math.round(x[2] * 10) / 10;
    },
    evaluate([shape, seats, width, light], f, v) {
      const area = shape === 0 ? 0.785 * width * width : shape === 1 ? width * width : 3 * width;
      f[0] = 4 * area + 20 * seats + 0.05 * light + 30 * shape;
      f[1] = shape === 2 && width < 2 ? Number.NaN : 40 / seats + Math.abs(log(light / 500)) + 10 / area;
      v[0] = Math.max(0, (1.2 * seats) / area - 1);
    },
  };
}
