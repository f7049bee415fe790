/** Columns of a table of core materials, and what must hold between them. */
import { choice, plain, positive, pricePerMass, quantity, type TableSchema, word } from '../column.ts';
import type { Material } from '../material.ts';

export const MATERIAL_SCHEMA: TableSchema<Material> = {
  priced: false,
  columns: {
    name: word('name'),
    kind: choice('kind', ['MnZn', 'NiZn', 'powder']),
    lossCoefficient: plain('core_k', { above: 0, to: 1e9 }),
    frequencyExponent: plain('core_alpha', { from: 1, to: 2.5 }),
    fluxExponent: plain('core_beta', { from: 1.5, to: 3.5 }),
    lossSlope: plain('loss_slope', { from: -0.05, to: 0.05 }),
    lossCurvature: plain('loss_curvature', { from: 0, to: 0.001 }),
    frequencyMinimum: positive('f_min', 'kHz', 'frequency', 1e9),
    frequencyMaximum: positive('f_max', 'kHz', 'frequency', 1e9),
    fluxMaximum: positive('b_max', 'mT', 'flux density', 3),
    saturation25: positive('b_sat_25', 'mT', 'flux density', 3),
    saturation100: positive('b_sat_100', 'mT', 'flux density', 3),
    permeability: plain('permeability', { from: 1, to: 1e6 }),
    density: quantity('density', 'kg/m³', 'density', { from: 100, to: 20000 }),
    pricePerMass: pricePerMass('price_kg'),
  },
  checks: [
    {
      field: 'frequencyMaximum',
      holds: (row) => row.frequencyMaximum > row.frequencyMinimum,
      allowed: 'above f_min',
    },
    {
      field: 'saturation100',
      holds: (row) => row.saturation100 <= row.saturation25,
      allowed: 'at most b_sat_25: saturation falls with temperature',
    },
    {
      field: 'fluxMaximum',
      holds: (row) => row.fluxMaximum <= row.saturation25,
      allowed: 'at most b_sat_25',
    },
  ],
};
