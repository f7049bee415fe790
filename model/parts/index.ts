/** Parts tables: reading, joining, canonical form, templates, profiles. */
export { BUILT_IN_TABLES } from './built-in.ts';
export { LARGEST_TABLE } from './csv.ts';
export { canonicalParts, joinTables, type ReadTable } from './join.ts';
export { type ColumnRange, type Outlier, type TableProfile, tableProfile } from './profile.ts';
export { inspectTable, readTable, type TableInspection } from './read-table.ts';
export { PART_KINDS, type RowOf } from './schemas.ts';
export type { PartKind, PartsTables } from './tables.ts';
export { explainedTemplate, tableTemplate } from './template.ts';
