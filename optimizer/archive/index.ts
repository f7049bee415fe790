export type { Designs, Widths } from './designs.ts';
export {
  type Archive,
  type ArchiveGrid,
  createArchive,
  insertAll,
  mergeArchive,
  packArchive,
  unpackArchive,
} from './epsilon.ts';
export {
  createNearMisses,
  insertAllNearMisses,
  type NearMissDesigns,
  type NearMisses,
  type NearMissGrid,
  packNearMisses,
  selectNearMisses,
} from './near-misses.ts';
