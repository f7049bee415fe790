/** The inductance that a choke shows at a mean current, with the ripple that it itself allows. */
import type { Design } from '../design.ts';
import { inductanceInPlaceAt } from '../magnetics/index.ts';
import { type ChokeSteadyState, settleGaps, solveChoke } from '../modes.ts';
import type { StageState } from './state.ts';

const henries = new Float64Array(1);

/**
 * Solves `steady` for the choke of `design`: first with the inductance at zero bias and no gaps, then with the inductance at the rms
 * current and the gaps' drops at the edges' currents which the first solution shows. For a bend that goes with I² this is the mean inductance over the ripple; it is close to it
 * for any bend while the peak stays below saturation, which is a limit.
 * @derivation for L falling with I² the mean of L over a triangle is L at its rms current
 * @valid peak below saturation
 */
export function solveBentChoke(design: Design, state: StageState, steady: ChokeSteadyState): void {
  const scale = state.inductance / design.inductance;
  steady.inductance = state.inductance;
  steady.gapVolts = 0;
  solveChoke(steady);
  const square = steady.current * steady.current + (steady.ripple * steady.ripple) / 12;
  henries[0] = Math.sqrt(square);
  inductanceInPlaceAt(design.inductor, henries);
  steady.inductance = henries[0] * scale;
  settleGaps(steady);
  solveChoke(steady);
}
