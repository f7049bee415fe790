/** What an architecture must say of itself. Adding one is a file that fills this in and a line in `list.ts`. */
import type { Design } from '../design.ts';
import type { Rail } from '../rail/rail.ts';
import type { WindingForm } from '../transformer.ts';
import type { IsolatedForm } from './isolated.ts';
import type { Architecture } from './list.ts';
import type { StageState } from './state.ts';

/** `Name` is the architecture's own in the file that declares it, and any of the list elsewhere. */
export interface Stage<Name extends string = Architecture> {
  /** Name in sheets, records and families: lower case, hyphens. */
  readonly architecture: Name;
  /** The same as an engineer says it. */
  readonly words: string;
  /** Whether power can run from output to input. */
  readonly twoWay: boolean;
  /** Whether the low position holds a diode instead of a switch. */
  readonly diode: boolean;
  /** Whether a power stage, a half-bridge with its driver, may serve as one phase's leg. */
  readonly packagedLegs: boolean;
  /** How the transformer between input and output is driven and rectified; absent without one. */
  readonly form?: IsolatedForm;
  readonly windings?: WindingForm;
  /** Kind of controller that runs it. */
  readonly control: 'buck' | 'forward' | 'bridge';
  /** Switches in the high and devices in the low position, and chokes, of one phase. */
  readonly highDevices: number;
  readonly lowDevices: number;
  readonly chokes: number;
  /** Ripple frequency of one choke over the switching frequency. */
  readonly chokeMultiple: number;
  /** Highest duty of the choke's rising interval that the architecture allows, 0 … 1. */
  readonly highestDuty: number;
  /** Ideal duty of the choke's rising interval at one input and output voltage (V) and turns ratio Np/Ns (1 without transformer). */
  idealDuty(inputVoltage: number, outputVoltage: number, turnsRatio: number): number;
  /** Volts that a low device blocks at `inputVoltage`, without ringing. */
  lowBlocking(inputVoltage: number, turnsRatio: number): number;
  /** Why this architecture cannot serve `rail`, in one line; undefined where it can. */
  refusal(rail: Rail): string | undefined;
  /** Solves one operating point: reads the asked fields and the round's resistances of `state`, fills its results. */
  solve(design: Design, state: StageState): void;
  /** Adds the switching losses of all active phases at the solved `state` to `ledger`, W. */
  addEdgeLosses(design: Design, state: StageState, ledger: Float64Array): void;
}
