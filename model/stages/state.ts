/**
 * One operating point of a stage while it is solved: what goes in, and the currents that come out. Every architecture
 * fills the same fields, so losses, capacitors, heat and limits are written once. Fields are reused from point to point;
 * nothing is allocated.
 */
import { createWaveform, type Waveform } from '../waveform/waveform.ts';

/** Codes of the modes, in the order of `MODES`. */
export const MODE = { continuous: 0, forced: 1, discontinuous: 2, skipping: 3, reverse: 4, off: 5 } as const;
/** Names of the modes by code. */
export const MODES = ['continuous', 'forced-continuous', 'discontinuous', 'pulse-skipping', 'reverse', 'off'] as const;

/** Whether the choke's current rests at zero in `mode`. */
export function pauses(mode: number): boolean {
  return mode === MODE.discontinuous || mode === MODE.skipping || mode === MODE.off;
}

/** Inputs and results of one operating point. SI units; currents of one phase unless a field says otherwise. */
export class StageState {
  // What the point asks.
  /** V. */
  inputVoltage = 0.5;
  /** V. */
  outputVoltage = 0.5;
  /** Load current of all phases together, A; negative runs from output to input. */
  loadCurrent = 0.5;
  /** Phases that switch. */
  activePhases = 1;
  /** Zero-bias inductance of one choke after tolerance, H. */
  inductance = 0.5;
  /** Factor on every on-resistance (tolerance). */
  resistanceScale = 1.5;

  // Temperatures of the round, K.
  highTemperature = 300.5;
  lowTemperature = 300.5;
  inductorTemperature = 300.5;
  transformerTemperature = 300.5;
  boardTemperature = 300.5;

  // Resistances of the round, Ω, for one phase.
  highResistance = 0.5;
  lowResistance = 0.5;
  /** Choke and board copper. */
  pathResistance = 0.5;
  /** Primary and one secondary winding, ac loss included. */
  primaryResistance = 0.5;
  secondaryResistance = 0.5;

  // Results.
  mode = 0;
  /** Effective switching frequency, Hz; below the set one while pulses are skipped. */
  frequency = 0.5;
  /** Share of the effective period in which the high switch conducts, 0 … 1. */
  highShare = 0.5;
  /** Share in which the low switch or diode conducts; less than 1 − highShare in discontinuous operation. */
  lowShare = 0.5;
  /** Duty the converter is set to while pulses come, on-time over the set period. */
  dutyCycle = 0.5;
  /** Mean choke current, A, signed. */
  meanCurrent = 0.5;
  /** Peak to peak, A. */
  rippleCurrent = 0.5;
  /** Signed current at the end of the high switch's conduction, A. */
  peakCurrent = 0.5;
  /** Signed current at its start, A. */
  valleyCurrent = 0.5;
  /** Inductance that the ripple saw, H. */
  effectiveInductance = 0.5;
  /** Mean square of the choke current and of its two conduction intervals over the period, A². */
  chokeMeanSquare = 0.5;
  highMeanSquare = 0.5;
  lowMeanSquare = 0.5;
  /** Mean over the period of the current in the low position, A. */
  lowMean = 0.5;
  /** Mean over the period of the current drawn from the input by one phase, A. */
  highMean = 0.5;

  // What an architecture multiplies, for one phase.
  /** Switches in the high position, each with `highMeanSquare`. */
  highDevices = 1;
  /** Switches or diodes in the low position, each with `lowMeanSquare`. */
  lowDevices = 1;
  /** Chokes, each with `chokeMeanSquare`. */
  chokes = 1;
  /** Copies of `draw` that the input sees over its period, all phases. */
  drawCopies = 1;

  // What a transformer stage adds, for one phase.
  /** Mean square current of the primary, and of each secondary winding, A². */
  primaryMeanSquare = 0.5;
  secondaryMeanSquare = 0.5;
  /** Peak-to-peak swing of flux density, T, and the share of the switching period that one ramp of it takes. */
  fluxSwing = 0.5;
  fluxRamp = 0.5;
  /** Peak magnetizing current, primary side, A. */
  magnetizingPeak = 0.5;
  /** Duty lost while the current commutates through the leakage, of the rectified wave, 0 … 1. */
  lostDuty = 0.5;
  /** Volts across the rectifier while it blocks, without ringing. */
  rectifierVoltage = 0.5;

  /** Choke current of one phase over its effective period. */
  readonly choke: Waveform = createWaveform(6);
  /** Current that one phase draws from the input over its repetition period. */
  readonly draw: Waveform = createWaveform(6);
}
