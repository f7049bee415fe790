/** One phase of a transformer stage while its netlist is written: what both sides of the transformer need. */
import type { SolvedPoint } from '../solved-point.ts';
import type { Lines } from './lines.ts';
import type { PulseTimes } from './pulses.ts';

/** One phase while it is written. */
export interface PhaseSite {
  readonly lines: Lines;
  readonly point: SolvedPoint;
  readonly times: PulseTimes;
  /** Number of the phase, from 0, and its delay, s. */
  readonly k: number;
  readonly shift: number;
}
