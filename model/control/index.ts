/** Control room: load step, crossover, compensator, input filter. */
export {
  amplifierResponse,
  type Compensator,
  type CompensatorParts,
  compensatorParts,
  compensatorResponse,
  designCompensator,
  type LoopMargin,
  type LoopPlant,
  loopMargin,
  plantResponse,
} from './compensator.ts';
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
  stepExcursion,
} from './load-step.ts';
