/** What an architecture must say of itself. Adding one is a file that fills this in and a line in `list.ts`. */
import type { Design } from '../design.ts';
import type { Architecture, Rail } from '../rail/rail.ts';
import type { StageState } from './state.ts';

export interface Stage {
  readonly architecture: Architecture;
  /** Whether power can run from output to input. */
  readonly twoWay: boolean;
  /** Whether the low position holds a diode instead of a switch. */
  readonly diode: boolean;
  /** Ideal duty at one input and output voltage (V), 0 … 1. */
  idealDuty(inputVoltage: number, outputVoltage: number): number;
  /** Why this architecture cannot serve `rail`, in one line; undefined where it can. */
  refusal(rail: Rail): string | undefined;
  /** Solves one operating point: reads the asked fields and the round's resistances of `state`, fills its results. */
  solve(design: Design, state: StageState): void;
}
