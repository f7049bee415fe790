export { type ConstrainedRanker, createConstrainedRanker } from './constrained.ts';
export { type Crowding, createCrowding } from './crowding.ts';
export { createRanker, type Ranker } from './ranker.ts';
