/** The schema of every kind of parts table. */
import type { TableSchema } from './column.ts';
import { BULK_SCHEMA } from './columns/bulks.ts';
import { CERAMIC_SCHEMA } from './columns/ceramics.ts';
import { CONDUCTOR_SCHEMA } from './columns/conductors.ts';
import { CONTROLLER_SCHEMA } from './columns/controllers.ts';
import { CORE_SCHEMA } from './columns/cores.ts';
import { DIODE_SCHEMA } from './columns/diodes.ts';
import { INDUCTOR_SCHEMA } from './columns/inductors.ts';
import { MATERIAL_SCHEMA } from './columns/materials.ts';
import { POWER_STAGE_SCHEMA } from './columns/power-stages.ts';
import { SWITCH_SCHEMA } from './columns/switches.ts';
import type { PartKind, PartsTables } from './tables.ts';

/** The part that a table of kind `K` holds. */
export type RowOf<K extends PartKind> = PartsTables[K][number];

/** How each kind is read. */
export const SCHEMAS: { readonly [K in PartKind]: TableSchema<RowOf<K>> } = {
  switches: SWITCH_SCHEMA,
  diodes: DIODE_SCHEMA,
  inductors: INDUCTOR_SCHEMA,
  ceramics: CERAMIC_SCHEMA,
  bulks: BULK_SCHEMA,
  controllers: CONTROLLER_SCHEMA,
  cores: CORE_SCHEMA,
  materials: MATERIAL_SCHEMA,
  conductors: CONDUCTOR_SCHEMA,
  powerStages: POWER_STAGE_SCHEMA,
};

/** Every kind, in the order of `PartsTables`. */
export const PART_KINDS: readonly PartKind[] = [
  'switches',
  'diodes',
  'inductors',
  'ceramics',
  'bulks',
  'controllers',
  'cores',
  'materials',
  'conductors',
  'powerStages',
];
