/** Columns of a table of stocked inductors, and what physics asks of each row. */
import { BOX_COLUMNS, plain, positive, quantity, type TableSchema, whole, word } from '../column.ts';
import type { Inductor } from '../inductor.ts';

/** No core holds more: stored energy over boxed volume, J/m³ (5 µJ/mm³, twice the densest pressed powder of the trade). */
const DENSEST = 5000;

export const INDUCTOR_SCHEMA: TableSchema<Inductor> = {
  priced: true,
  columns: {
    name: word('name'),
    series: word('series'),
    inductance: positive('inductance', 'µH', 'inductance', 1),
    tolerance: quantity('tolerance', '%', 'fraction', { from: 0, to: 0.5 }),
    saturationCurrent: positive('i_sat', 'A', 'current', 5000),
    saturationDrop: quantity('sat_drop', '%', 'fraction', { from: 0.01, to: 0.9 }),
    saturationExponent: plain('sat_exponent', { from: 1, to: 20 }),
    dcResistance: positive('dcr', 'mΩ', 'resistance', 1000),
    conductorThickness: positive('conductor', 'mm', 'length', 0.02),
    layers: whole('layers', 1, 40),
    coreCoefficient: quantity('core_k', '', 'number', { from: 0, to: 1 }),
    coreFrequencyExponent: plain('core_alpha', { from: 1, to: 2.5 }),
    coreSwingExponent: plain('core_beta', { from: 1.5, to: 3.5 }),
    ratedCurrent: positive('i_rated', 'A', 'current', 5000),
    ratedRise: quantity('rated_rise', 'K', 'temperature difference', { from: 5, to: 150 }),
    maximumTemperature: quantity('t_max', '°C', 'temperature', { from: 323.15, to: 523.15 }),
    ...BOX_COLUMNS,
  },
  checks: [
    {
      field: 'saturationCurrent',
      holds: (row) => 0.5 * row.inductance * row.saturationCurrent * row.saturationCurrent <= DENSEST * boxOf(row),
      allowed: 'a stored energy of at most 5 µJ in each mm³ of the box',
    },
    {
      field: 'conductorThickness',
      holds: (row) => row.conductorThickness * row.layers < Math.min(row.length, row.width),
      allowed: 'all layers together thinner than the part is wide',
    },
  ],
};

function boxOf(row: Inductor): number {
  return row.length * row.width * row.height;
}
