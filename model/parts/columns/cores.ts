/** Columns of a table of cores for wound parts, and what geometry asks of each row. */
import { BOX_COLUMNS, choice, positive, type TableSchema, word } from '../column.ts';
import type { Core } from '../core.ts';

export const CORE_SCHEMA: TableSchema<Core> = {
  priced: true,
  columns: {
    name: word('name'),
    shape: choice('shape', ['E', 'ETD', 'RM', 'PQ', 'ELP', 'ring']),
    area: positive('area', 'mm²', 'area', 0.1),
    minimumArea: positive('area_min', 'mm²', 'area', 0.1),
    pathLength: positive('path', 'mm', 'length', 5),
    coreVolume: positive('core_volume', 'mm³', 'volume', 0.1),
    windowBreadth: positive('window_breadth', 'mm', 'length', 1),
    windowHeight: positive('window_height', 'mm', 'length', 1),
    turnLength: positive('turn_length', 'mm', 'length', 5),
    surface: positive('surface', 'mm²', 'area', 5),
    ...BOX_COLUMNS,
  },
  checks: [
    {
      field: 'minimumArea',
      holds: (row) => row.minimumArea <= row.area * 1.001,
      allowed: 'at most the effective area',
    },
    {
      // IEC 60205: the effective volume is the product of effective area and length.
      field: 'coreVolume',
      holds: (row) => Math.abs(row.coreVolume / (row.area * row.pathLength) - 1) <= 0.05,
      allowed: 'area × path within 5 %, as IEC 60205 has it',
    },
  ],
};
