/** The inductance that a choke shows in one round of the solution. */
import type { Design } from '../design.ts';
import { inductanceAt, meanInductanceAt } from '../magnetics/index.ts';
import type { StageState } from './state.ts';

const henries = new Float64Array(1);

/** Inductance at the mean current in the first round; in later ones its mean over the ripple that the round before found. */
export function chokeInductance(design: Design, state: StageState, current: number): number {
  const half = 0.5 * state.rippleCurrent;
  if (state.round === 0) inductanceAt(design.inductor, current, henries);
  else meanInductanceAt(design.inductor, current - half, current + half, henries);
  return henries[0] * (state.inductance / design.inductance);
}
