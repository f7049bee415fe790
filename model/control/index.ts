/** Control room: load step, crossover, compensator, input filter. */
export {
  type Compensator,
  compensatorResponse,
  designCompensator,
  type LoopPlant,
  plantResponse,
} from './compensator.ts';
export { amplifierResponse, type CompensatorParts, compensatorParts } from './compensator-parts.ts';
export {
  dampedPeak,
  dampingResistance,
  filterCorner,
  filteredRipple,
  filterImpedance,
  filterImpedanceLimit,
} from './input-filter.ts';
export {
  bandwidthExcursion,
  crossoverLimit,
  jitterCurrent,
  rightHalfPlaneZero,
  slewedExcursion,
  slewedExcursionAt,
  stepExcursion,
} from './load-step.ts';
export { type LoopMargin, loopMargin } from './loop-margin.ts';
