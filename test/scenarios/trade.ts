/** Facts of the trade, common practice with no source, asked of a sweep; no part is tuned to them. */
import { chooseSubset } from '../../optimizer/index.ts';
import { balanced, least, type Member, membersOf, type Sweep } from './spaces.ts';

/** Total loss over output power at every usual point of half load or more, the largest of one design. */
export function worstLossShare(found: Sweep, member: Member): number {
  const points = found.problem.assess(member.genes).points.filter((p) => p.share > 0 && Math.abs(p.load) >= 0.5);
  return Math.max(...points.map((p) => p.loss / Math.abs(p.outputPower)));
}

/** The same of the best-efficiency design and of the balanced one. */
export function lossShares(found: Sweep): { readonly best: number; readonly balanced: number } {
  return {
    best: worstLossShare(found, least(found, 'loss')),
    balanced: worstLossShare(found, balanced(found)),
  };
}

/** Frequencies of the `count` designs that together keep most of the front's hypervolume, rising, Hz. */
export function chosenFrequencies(found: Sweep, count: number): number[] {
  const chosen = membersOf(found.problem, chooseSubset(found.front, count));
  return chosen.map((member) => found.problem.record(member.genes).genes.frequency).sort((a, b) => a - b);
}

/** Share of frequencies between two bounds, inclusive. */
export function shareWithin(frequencies: readonly number[], from: number, to: number): number {
  return frequencies.filter((f) => f >= from && f <= to).length / frequencies.length;
}
