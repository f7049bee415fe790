/** Columns of a table of ceramic capacitors, and what physics asks of each row. */
import type { Ceramic } from '../ceramic.ts';
import { BOX_COLUMNS, plain, positive, quantity, type TableSchema, word } from '../column.ts';

/** No ceramic holds more: ½·C·V² at the halving bias over boxed volume, J/m³ (1 mJ/mm³). */
const DENSEST = 1e6;

export const CERAMIC_SCHEMA: TableSchema<Ceramic> = {
  priced: true,
  columns: {
    name: word('name'),
    dielectric: word('dielectric'),
    capacitance: positive('capacitance', 'µF', 'capacitance', 0.01),
    tolerance: quantity('tolerance', '%', 'fraction', { from: 0, to: 0.8 }),
    voltageRating: positive('voltage', 'V', 'voltage', 10000),
    halvingVoltage: positive('v_half', 'V', 'voltage', 1e6),
    biasExponent: plain('bias_exponent', { from: 1, to: 4 }),
    smallSignalFactor: plain('small_signal', { from: 0.5, to: 1 }),
    temperatureDrop: quantity('temperature_drop', '%', 'fraction', { from: 0, to: 0.85 }),
    ageing: quantity('ageing', '%', 'fraction', { from: 0, to: 0.1 }),
    seriesResistance: positive('esr', 'mΩ', 'resistance', 100),
    seriesInductance: positive('esl', 'nH', 'inductance', 1e-7),
    rippleRating: positive('i_ripple', 'A', 'current', 100),
    ...BOX_COLUMNS,
  },
  checks: [
    {
      field: 'capacitance',
      holds: (row) => {
        const bias = Math.min(row.halvingVoltage, row.voltageRating);
        return 0.5 * row.capacitance * bias * bias <= DENSEST * row.length * row.width * row.height;
      },
      allowed: 'a stored energy of at most 1 mJ in each mm³ of the box',
    },
  ],
};
