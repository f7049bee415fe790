/** Columns of a table of controllers, and what must hold between them. */
import { BOX_COLUMNS, choices, plain, positive, quantity, type TableSchema, whole, word, yesNo } from '../column.ts';
import type { Controller } from '../controller.ts';

export const CONTROLLER_SCHEMA: TableSchema<Controller> = {
  priced: true,
  columns: {
    name: word('name'),
    stages: choices('stages', ['buck', 'forward', 'bridge']),
    inputMinimum: quantity('v_in_min', 'V', 'voltage', { from: 0, to: 5000 }),
    inputMaximum: positive('v_in_max', 'V', 'voltage', 5000),
    outputMinimum: quantity('v_out_min', 'V', 'voltage', { from: 0, to: 5000 }),
    outputMaximum: positive('v_out_max', 'V', 'voltage', 5000),
    phasesMaximum: whole('phases_max', 1, 64),
    frequencyMinimum: positive('f_min', 'kHz', 'frequency', 1e9),
    frequencyMaximum: positive('f_max', 'kHz', 'frequency', 1e9),
    minimumOnTime: quantity('t_on_min', 'ns', 'time', { from: 0, to: 1e-3 }),
    minimumOffTime: quantity('t_off_min', 'ns', 'time', { from: 0, to: 1e-3 }),
    jitter: quantity('jitter', 'ns', 'time', { from: 0, to: 1e-6 }),
    driveVoltage: positive('drive', 'V', 'voltage', 30),
    linearDriveSupply: yesNo('linear_drive'),
    driverSourceResistance: positive('r_source', 'Ω', 'resistance', 1000),
    driverSinkResistance: positive('r_sink', 'Ω', 'resistance', 1000),
    deadTime: quantity('dead_time', 'ns', 'time', { from: 0, to: 1e-5 }),
    quiescentCurrent: quantity('i_q', 'mA', 'current', { from: 0, to: 10 }),
    sharingError: quantity('sharing_error', '%', 'fraction', { from: 0, to: 1 }),
    currentLimitSpread: plain('limit_spread', { from: 1, to: 3 }),
    diodeEmulation: yesNo('diode_emulation'),
    phaseShedding: yesNo('phase_shedding'),
    phasePriceShare: quantity('phase_price', '%', 'fraction', { from: 0, to: 2 }),
    ...BOX_COLUMNS,
  },
  checks: [
    {
      field: 'inputMaximum',
      holds: (row) => row.inputMaximum > row.inputMinimum,
      allowed: 'above v_in_min',
    },
    {
      field: 'outputMaximum',
      holds: (row) => row.outputMaximum > row.outputMinimum,
      allowed: 'above v_out_min',
    },
    {
      field: 'frequencyMaximum',
      holds: (row) => row.frequencyMaximum > row.frequencyMinimum,
      allowed: 'above f_min',
    },
    {
      field: 'minimumOnTime',
      holds: (row) => (row.minimumOnTime + row.minimumOffTime) * row.frequencyMinimum < 1,
      allowed: 'with t_off_min less than one period of f_min',
    },
  ],
};
