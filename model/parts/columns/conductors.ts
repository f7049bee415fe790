/** Columns of a table of conductors to wind with, and what must hold between them. */
import { choice, positive, pricePerMass, type TableSchema, whole, word } from '../column.ts';
import type { Conductor } from '../conductor.ts';

export const CONDUCTOR_SCHEMA: TableSchema<Conductor> = {
  priced: false,
  columns: {
    name: word('name'),
    kind: choice('kind', ['solid', 'foil', 'litz']),
    size: positive('size', 'mm', 'length', 0.02),
    strands: whole('strands', 1, 100000),
    outerSize: positive('outer', 'mm', 'length', 0.05),
    pricePerMass: pricePerMass('price_kg'),
  },
  checks: [
    {
      field: 'strands',
      holds: (row) => (row.kind === 'litz' ? row.strands > 1 : row.strands === 1),
      allowed: '1 for solid and foil, more for litz',
    },
    {
      // Round strands fill at most 0.9069 of a plane (Thue, hexagonal packing).
      field: 'outerSize',
      holds: (row) =>
        row.outerSize * row.outerSize >= (row.strands * row.size * row.size) / (row.strands > 1 ? 0.9069 : 1),
      allowed: 'room for all strands',
    },
  ],
};
