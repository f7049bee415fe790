/** Columns of a table of switches, and what physics asks of each row. */
import { BOX_COLUMNS, choice, plain, positive, quantity, type TableSchema, word, yesNo } from '../column.ts';
import type { Switch } from '../switch.ts';

export const SWITCH_SCHEMA: TableSchema<Switch> = {
  priced: true,
  columns: {
    name: word('name'),
    technology: choice('technology', ['si', 'gan']),
    voltageRating: positive('voltage', 'V', 'voltage', 5000),
    currentRating: positive('current', 'A', 'current', 5000),
    onResistance: positive('rds_on', 'mΩ', 'resistance', 100),
    resistanceTempco: quantity('rds_tempco', '1/K', 'change per kelvin', { from: 0, to: 0.03 }),
    dynamicFactor: plain('dynamic_factor', { from: 1, to: 3 }),
    driveVoltage: positive('drive', 'V', 'voltage', 30),
    gateRating: positive('gate_max', 'V', 'voltage', 40),
    plateauVoltage: positive('plateau', 'V', 'voltage', 30),
    gateCharge: positive('q_g', 'nC', 'charge', 1e-4),
    gateChargeSwitch: positive('q_gs2', 'nC', 'charge', 1e-4),
    gateDrainCharge: positive('q_gd', 'nC', 'charge', 1e-4),
    gateResistance: quantity('r_gate', 'Ω', 'resistance', { from: 0, to: 100 }),
    outputCharge: positive('q_oss', 'nC', 'charge', 1e-3),
    outputEnergy: positive('e_oss', 'nJ', 'energy', 1),
    outputTestVoltage: positive('v_oss', 'V', 'voltage', 5000),
    recoveryCharge: quantity('q_rr', 'nC', 'charge', { from: 0, to: 1e-3 }),
    recoveryCurrent: quantity('i_rr', 'A', 'current', { from: 0, to: 5000 }),
    recoveryHoldsOutput: yesNo('q_rr_holds_q_oss'),
    bodyDrop: positive('v_sd', 'V', 'voltage', 10),
    commonSourceInductance: quantity('l_cs', 'nH', 'inductance', { from: 0, to: 1e-7 }),
    thermalResistance: positive('r_th', 'K/W', 'thermal resistance', 500),
    maximumJunction: quantity('t_j_max', '°C', 'temperature', { from: 323.15, to: 573.15 }),
    ...BOX_COLUMNS,
  },
  checks: [
    {
      field: 'gateDrainCharge',
      holds: (row) => row.gateDrainCharge + row.gateChargeSwitch < row.gateCharge,
      allowed: 'together with q_gs2 less than the total gate charge q_g',
    },
    {
      field: 'plateauVoltage',
      holds: (row) => row.plateauVoltage < row.driveVoltage,
      allowed: 'less than the drive voltage',
    },
    {
      field: 'gateRating',
      holds: (row) => row.gateRating >= row.driveVoltage,
      allowed: 'at least the drive voltage',
    },
    {
      field: 'outputTestVoltage',
      holds: (row) => row.outputTestVoltage <= row.voltageRating,
      allowed: 'at most the rated voltage',
    },
    {
      // An output capacitance that falls with voltage stores at most half of charge times voltage.
      field: 'outputEnergy',
      holds: (row) => row.outputEnergy <= 0.5 * row.outputCharge * row.outputTestVoltage * 1.001,
      allowed: 'at most q_oss × v_oss / 2, which a constant capacitance would store',
    },
    {
      field: 'recoveryCharge',
      holds: (row) => row.technology === 'si' || row.recoveryCharge === 0,
      allowed: '0 for gallium nitride, which has no body diode',
    },
    {
      field: 'recoveryCurrent',
      holds: (row) => row.recoveryCharge === 0 || row.recoveryCurrent > 0,
      allowed: 'above 0 where q_rr is above 0',
    },
  ],
};
