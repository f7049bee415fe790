/** Columns of a table of half-bridge power stages. */
import { BOX_COLUMNS, positive, quantity, type TableSchema, word } from '../column.ts';
import type { PowerStage } from '../power-stage.ts';

export const POWER_STAGE_SCHEMA: TableSchema<PowerStage> = {
  priced: true,
  columns: {
    name: word('name'),
    voltageRating: positive('voltage', 'V', 'voltage', 5000),
    currentRating: positive('current', 'A', 'current', 5000),
    highResistance: positive('rds_high', 'mΩ', 'resistance', 100),
    lowResistance: positive('rds_low', 'mΩ', 'resistance', 100),
    resistanceTempco: quantity('rds_tempco', '1/K', 'change per kelvin', { from: 0, to: 0.03 }),
    highGateCharge: positive('q_g_high', 'nC', 'charge', 1e-4),
    lowGateCharge: positive('q_g_low', 'nC', 'charge', 1e-4),
    highOutputCharge: positive('q_oss_high', 'nC', 'charge', 1e-3),
    highOutputEnergy: positive('e_oss_high', 'nJ', 'energy', 1),
    lowOutputCharge: positive('q_oss_low', 'nC', 'charge', 1e-3),
    lowOutputEnergy: positive('e_oss_low', 'nJ', 'energy', 1),
    outputTestVoltage: positive('v_oss', 'V', 'voltage', 5000),
    recoveryCharge: quantity('q_rr', 'nC', 'charge', { from: 0, to: 1e-3 }),
    recoveryCurrent: positive('i_rr', 'A', 'current', 5000),
    bodyDrop: positive('v_sd', 'V', 'voltage', 10),
    turnOnTime: positive('t_on', 'ns', 'time', 1e-5),
    turnOffTime: positive('t_off', 'ns', 'time', 1e-5),
    driveVoltage: positive('drive', 'V', 'voltage', 30),
    deadTime: quantity('dead_time', 'ns', 'time', { from: 0, to: 1e-5 }),
    quiescentCurrent: quantity('i_q', 'mA', 'current', { from: 0, to: 10 }),
    thermalResistance: positive('r_th', 'K/W', 'thermal resistance', 500),
    maximumJunction: quantity('t_j_max', '°C', 'temperature', { from: 323.15, to: 573.15 }),
    ...BOX_COLUMNS,
  },
  checks: [
    {
      field: 'driveVoltage',
      holds: (row) => row.driveVoltage > 2.5,
      allowed: 'above 2.5 V',
    },
    {
      field: 'outputTestVoltage',
      holds: (row) => row.outputTestVoltage <= row.voltageRating,
      allowed: 'at most the rated voltage',
    },
    {
      field: 'highOutputEnergy',
      holds: (row) => row.highOutputEnergy <= 0.5 * row.highOutputCharge * row.outputTestVoltage * 1.001,
      allowed: 'at most q_oss_high × v_oss / 2, which a constant capacitance would store',
    },
    {
      field: 'lowOutputEnergy',
      holds: (row) => row.lowOutputEnergy <= 0.5 * row.lowOutputCharge * row.outputTestVoltage * 1.001,
      allowed: 'at most q_oss_low × v_oss / 2, which a constant capacitance would store',
    },
  ],
};
