/** Loss effects of switches and diodes, one effect a file. */
export { conductionLoss, onResistance, RESISTANCE_REFERENCE } from './conduction.ts';
export { deadTimeEnergy, transitionTime } from './dead-time.ts';
export { diodeChargeEnergy, diodeDrop, diodeForwardLoss, diodeLeakageLoss } from './diode.ts';
export { gateChargeAfterSwing, gateChargeAt, gateLoss } from './gate.ts';
export { loopEnergy, overshoot } from './loop.ts';
export {
  chargeCapacitance,
  chargeExponent,
  energyCapacitance,
  hardEdgeEnergy,
  OUTPUT_CHARGE,
  OUTPUT_ENERGY,
  outputAt,
  outputInPlaceAt,
} from './output-charge.ts';
export { edgeTime, overlapEnergy, overlapLossMiller, sharedGateResistance } from './overlap.ts';
export { recoveryCharge, recoveryLoss, recoveryLossTriangle } from './recovery.ts';
export { partialEdgeEnergyAt, swingFraction, swungSharesAt, zeroVoltageCurrent } from './zero-voltage.ts';
