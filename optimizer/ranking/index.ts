export { type ConstrainedRanker, createConstrainedRanker } from './constrained.ts';
export { createCrowding } from './crowding.ts';
export { createRanker } from './ranker.ts';
