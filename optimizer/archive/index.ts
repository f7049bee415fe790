export type { Designs, NearMissDesigns } from './designs.ts';
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
  type NearMisses,
  type NearMissGrid,
  packNearMisses,
  selectNearMisses,
} from './near-misses.ts';
export { createSampler, type DesignSample, NO_SAMPLE, type Sampler } from './sample.ts';
