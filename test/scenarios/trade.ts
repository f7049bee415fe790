/** Facts of the trade, common practice with no source, asked of a sweep; no part is tuned to them. */
import type { Assessment } from '../../model/assessment.ts';
import { chooseSubset } from '../../optimizer/index.ts';
import { balanced, least, type Member, membersOf, type Sweep } from './spaces.ts';

/** Total loss over output power at every usual point of half load or more, the largest of one design. */
function worstLossShare(found: Sweep, member: Member): number {
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

/** Chosen designs of one band of frequencies: mean shares of their full-load loss. */
export interface LossBand {
  /** Hz. */
  readonly from: number;
  readonly to: number;
  readonly count: number;
  /** Overlap, output charge, recovery, loop, gate and dead time. */
  readonly switching: number;
  readonly winding: number;
  readonly conduction: number;
  /** Mean, m³. */
  readonly volume: number;
}

const SWITCHING = ['overlap', 'outputCharge', 'recovery', 'loop', 'gate', 'deadTime'];
const BANDS = [30e3, 100e3, 300e3, 1e6, 3e6, 5e6];

/** Where the chosen designs' full-load losses go, band by band; empty bands are left out. */
export function lossesByFrequency(found: Sweep, count: number): LossBand[] {
  const chosen = membersOf(found.problem, chooseSubset(found.front, count));
  const told = chosen.map((member) => found.problem.assess(member.genes));
  return BANDS.slice(1).flatMap((to, k) => {
    const from = BANDS[k];
    const own = told.filter(({ design }) => design.genes.frequency >= from && design.genes.frequency < to);
    if (own.length === 0) return [];
    const share = (wanted: (part: string, effect: string) => boolean): number =>
      mean(own.map((one) => lossShare(one, wanted)));
    return {
      from,
      to,
      count: own.length,
      switching: share((_, effect) => SWITCHING.includes(effect)),
      winding: share((part) => part === 'inductor'),
      conduction: share((part, effect) => part !== 'inductor' && effect === 'conduction'),
      volume: mean(own.map((one) => one.objectives.find(({ name }) => name === 'volume')?.value ?? Number.NaN)),
    };
  });
}

/** Share of the loss at full load and nominal input that falls to the wanted items. */
function lossShare(one: Assessment, wanted: (part: string, effect: string) => boolean): number {
  const point = one.points.find(({ load, share }) => load === 1 && share > 0);
  if (point === undefined) return Number.NaN;
  return (
    point.losses.reduce((sum, { part, effect, watts }) => sum + (wanted(part, effect) ? watts : 0), 0) / point.loss
  );
}

function mean(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}
