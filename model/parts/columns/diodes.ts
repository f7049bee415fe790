/** Columns of a table of diodes, and what physics asks of each row. */
import { BOX_COLUMNS, choice, positive, quantity, type TableSchema, word } from '../column.ts';
import type { Diode } from '../diode.ts';

export const DIODE_SCHEMA: TableSchema<Diode> = {
  priced: true,
  columns: {
    name: word('name'),
    technology: choice('technology', ['schottky', 'junction']),
    voltageRating: positive('voltage', 'V', 'voltage', 5000),
    currentRating: positive('current', 'A', 'current', 5000),
    forwardDrop: positive('v_f0', 'V', 'voltage', 5),
    slopeResistance: quantity('r_slope', 'mΩ', 'resistance', { from: 0, to: 10 }),
    dropTempco: quantity('v_f_tempco', 'mV/K', 'voltage per kelvin', { from: -0.005, to: 0 }),
    junctionCharge: quantity('q_j', 'nC', 'charge', { from: 0, to: 1e-4 }),
    chargeVoltage: positive('v_qj', 'V', 'voltage', 5000),
    recoveryCharge: quantity('q_rr', 'nC', 'charge', { from: 0, to: 1e-3 }),
    recoveryCurrent: quantity('i_rr', 'A', 'current', { from: 0, to: 5000 }),
    leakage: quantity('leakage', 'µA', 'current', { from: 0, to: 1 }),
    leakageDoubling: quantity('leakage_doubling', 'K', 'temperature difference', { from: 3, to: 50 }),
    thermalResistance: positive('r_th', 'K/W', 'thermal resistance', 500),
    maximumJunction: quantity('t_j_max', '°C', 'temperature', { from: 323.15, to: 573.15 }),
    ...BOX_COLUMNS,
  },
  checks: [
    {
      field: 'recoveryCharge',
      holds: (row) => row.technology === 'junction' || row.recoveryCharge === 0,
      allowed: '0 for a Schottky diode',
    },
    {
      field: 'recoveryCurrent',
      holds: (row) => row.recoveryCharge === 0 || row.recoveryCurrent > 0,
      allowed: 'above 0 where q_rr is above 0',
    },
    {
      field: 'chargeVoltage',
      holds: (row) => row.chargeVoltage <= row.voltageRating,
      allowed: 'at most the rated voltage',
    },
  ],
};
