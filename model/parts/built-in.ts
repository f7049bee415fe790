/** The shipped parts tables: file names inside model/tables/. */
import type { PartKind } from './tables.ts';

export const BUILT_IN_TABLES: readonly { readonly kind: PartKind; readonly file: string }[] = [
  { kind: 'switches', file: 'switches.csv' },
  { kind: 'diodes', file: 'diodes.csv' },
  { kind: 'inductors', file: 'inductors.csv' },
  { kind: 'ceramics', file: 'ceramics.csv' },
  { kind: 'bulks', file: 'bulks.csv' },
  { kind: 'controllers', file: 'controllers.csv' },
  { kind: 'cores', file: 'cores.csv' },
  { kind: 'materials', file: 'materials.csv' },
  { kind: 'conductors', file: 'conductors.csv' },
  { kind: 'powerStages', file: 'power-stages.csv' },
];

/** What each kind is called by people: the name of its built-in table's file. */
export const KIND_NAMES: readonly string[] = BUILT_IN_TABLES.map(({ file }) => file.replace(/\.csv$/, ''));
