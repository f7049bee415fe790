/** Columns of a table of bulk capacitors, and what physics asks of each row. */
import type { Bulk } from '../bulk.ts';
import { BOX_COLUMNS, choice, positive, quantity, type TableSchema, word } from '../column.ts';

/** No bulk capacitor holds more: ½·C·V² over boxed volume, J/m³ (3 mJ/mm³). */
const DENSEST = 3e6;

export const BULK_SCHEMA: TableSchema<Bulk> = {
  priced: true,
  columns: {
    name: word('name'),
    technology: choice('technology', ['polymer', 'electrolytic', 'film']),
    capacitance: positive('capacitance', 'µF', 'capacitance', 10),
    tolerance: quantity('tolerance', '%', 'fraction', { from: 0, to: 0.8 }),
    voltageRating: positive('voltage', 'V', 'voltage', 10000),
    seriesResistance: positive('esr', 'mΩ', 'resistance', 1000),
    seriesInductance: positive('esl', 'nH', 'inductance', 1e-6),
    rippleRating: positive('i_ripple', 'A', 'current', 1000),
    ratedRise: quantity('rated_rise', 'K', 'temperature difference', { from: 1, to: 60 }),
    maximumTemperature: quantity('t_max', '°C', 'temperature', { from: 323.15, to: 473.15 }),
    ratedLife: positive('life', 'h', 'time', 3.6e9),
    ...BOX_COLUMNS,
  },
  checks: [
    {
      field: 'capacitance',
      holds: (row) =>
        0.5 * row.capacitance * row.voltageRating * row.voltageRating <= DENSEST * row.length * row.width * row.height,
      allowed: 'a stored energy of at most 3 mJ in each mm³ of the box',
    },
  ],
};
