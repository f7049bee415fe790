/** A switching controller with its gate drivers. */
import type { Part } from './common.ts';

export interface Controller extends Part {
  /** Stages it can run: 'buck', 'forward', 'bridge'. */
  readonly stages: readonly ('buck' | 'forward' | 'bridge')[];
  /** V. */
  readonly inputMinimum: number;
  readonly inputMaximum: number;
  /** V. */
  readonly outputMinimum: number;
  readonly outputMaximum: number;
  readonly phasesMaximum: number;
  /** Hz. */
  readonly frequencyMinimum: number;
  readonly frequencyMaximum: number;
  /** Shortest on-time, s. */
  readonly minimumOnTime: number;
  /** Shortest off-time, s. */
  readonly minimumOffTime: number;
  /** Cycle-to-cycle jitter of the edge, s. */
  readonly jitter: number;
  /** V. */
  readonly driveVoltage: number;
  /** Whether gate charge comes from the input through a linear supply (its whole drop is lost). */
  readonly linearDriveSupply: boolean;
  /** Driver pull-up and pull-down resistance, Ω. */
  readonly driverSourceResistance: number;
  readonly driverSinkResistance: number;
  /** Each gap between the two switches of a leg, s. */
  readonly deadTime: number;
  /** Supply current without gate charge, A. */
  readonly quiescentCurrent: number;
  /** Largest deviation of a phase current from its share, fraction. */
  readonly sharingError: number;
  /** Current limit over the peak it must pass, at the accuracy's far end: 1.3 means the limit may sit 30 % high. */
  readonly currentLimitSpread: number;
  /** Whether it can turn the low switch off at zero current. */
  readonly diodeEmulation: boolean;
  /** Whether it can drop phases at light load. */
  readonly phaseShedding: boolean;
  /** Price for each phase beyond the first, over the price of the part (drivers), fraction. */
  readonly phasePriceShare: number;
}
