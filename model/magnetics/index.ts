/** Magnetics: copper, windings, core loss, gaps, saturation, stocked inductors and wound parts. */
export { besselJ } from './bessel.ts';
export {
  COPPER_DENSITY,
  COPPER_RESISTIVITY,
  COPPER_TEMPCO,
  copperResistivity,
  MU0,
  skinDepth,
  wireResistance,
} from './copper.ts';
export {
  cosinePowerIntegral,
  dutyCorrectionAt,
  igseAt,
  igseConstant,
  igseConstantApproximate,
  steinmetz,
  trapezoidLossDensity,
  triangleLossDensity,
} from './core-loss.ts';
export {
  dowell,
  dowellAt,
  dowellHarmonics,
  dowellHarmonicsAt,
  optimumThickness,
  roundWireThickness,
} from './dowell.ts';
export {
  type EffectiveParameters,
  effectiveParameters,
  effectivePermeability,
  inductanceFactor,
  toroidParameters,
} from './effective.ts';
export { fluxOfCurrent, fluxSwing, saturationFlux } from './flux.ts';
export { gamma } from './gamma.ts';
export { BARE, fringingFactor, gapAt, gapFor, HEIGHT, ROOT_AREA } from './gap.ts';
export { idleLayerFactor } from './idle-layer.ts';
export { leakageInductance, magnetizingInductance } from './leakage.ts';
export { roundWireProximity, roundWireSkin } from './round-wire.ts';
export {
  type Bend,
  currentOfLinkage,
  fluxLinkage,
  inductanceAt,
  inductanceInPlaceAt,
  meanInductanceAt,
  swingAt,
} from './saturation.ts';
export {
  createInductorAtFrequency,
  type InductorAtFrequency,
  inductorThermalResistance,
  prepareInductor,
  prepareInductorAt,
  RIPPLE_HARMONICS,
  stockedCoreLoss,
  stockedCoreLossAt,
  windingResistance,
} from './stocked.ts';
export { type LayeredWinding, triangleLoss, triangleLossAt } from './triangle-loss.ts';
export {
  createWindingAtFrequency,
  prepareWinding,
  WINDING_HARMONICS,
  type WindingAtFrequency,
  windingLossAt,
} from './winding-frequency.ts';
export {
  createWinding,
  gapKeepOut,
  layWinding,
  layWindingAt,
  parallelThatFit,
  parallelThatFitAt,
  type Winding,
  windowFill,
} from './winding-layout.ts';
export {
  createHarmonicLoss,
  effectiveResistanceFactor,
  type HarmonicLoss,
  harmonicLoss,
  harmonicLossAt,
  tailBound,
  WINDING_AC,
  WINDING_BOUND,
} from './winding-loss.ts';
export { gaugeDiameter, litzLoss, roundArea } from './wire.ts';
export { knownConstants, type MaterialConstants, materialConstants, woundCoreLossAt } from './wound-core.ts';
export {
  copperMass,
  coreTemperatureFactor,
  createWoundBill,
  hotSpotRise,
  materialViolation,
  type WoundBill,
  woundCost,
  woundCostAt,
} from './wound-part.ts';
