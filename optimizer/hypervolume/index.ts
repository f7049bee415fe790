export { createContributions } from './contributions.ts';
export { selectSubset } from './subset.ts';
export { createTruncation, type Truncation } from './truncate.ts';
export { createHypervolume } from './volume.ts';
