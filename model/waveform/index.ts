/** Piecewise-linear periodic waveforms. */
export { chargeSwing } from './charge.ts';
export { harmonic, harmonics } from './harmonic.ts';
export { MEAN, MEAN_SQUARE, mean, meanSquare, measure, PEAK, peak, rms, VALLEY, valley } from './moments.ts';
export { sample } from './sample.ts';
export { measureSlope, slopeMeanSquare, slopePowerMean } from './slope.ts';
export { sumShifted, sumUnequal } from './superpose.ts';
export { addSegment, affine, clearWaveform, createWaveform, setSegment, type Waveform } from './waveform.ts';
