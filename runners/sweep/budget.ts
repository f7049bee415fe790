/** When a sweep ends: after so many evaluations, after so long, or when the front no longer grows; first reached wins. */
import { type History, lastGain } from './history.ts';

/** Any combination; a missing one does not bind. */
export interface Budget {
  /** Designs evaluated, all shards together. */
  readonly evaluations?: number;
  /** Seconds of sweeping, over all resumptions. */
  readonly seconds?: number;
  /** Share of hypervolume gained over the last tenth of the work under which the front counts as steady. */
  readonly steady?: number;
}

/** What a sweep does when no budget is given: enough for a first look, less where the front settles before. */
export const DEFAULT_BUDGET: Budget = { evaluations: 1_000_000, steady: 0.0002 };

/** Nearest to 1 that a front comes which is not steady yet. */
const BELOW = 0.999;

/** Where a ring of islands stands. */
export interface Standing {
  readonly evaluations: number;
  readonly seconds: number;
  readonly history: History;
}

/**
 * Share of the budget that is used, 0 … 1; at 1 the ring ends. `shards` divides the evaluations. A front on its way to being steady has used
 * as much as the gain that is asked for has of the present one: about as much as of the time, since late gains fall about as it passes.
 */
export function shareUsed(budget: Budget, shards: number, standing: Standing): number {
  const shares = [0];
  if (budget.evaluations !== undefined) shares.push(standing.evaluations / Math.ceil(budget.evaluations / shards));
  if (budget.seconds !== undefined) shares.push(standing.seconds / budget.seconds);
  const gain = budget.steady === undefined ? undefined : lastGain(standing.history);
  if (budget.steady !== undefined && gain !== undefined)
    shares.push(gain < budget.steady ? 1 : BELOW * (budget.steady / gain));
  return Math.min(1, Math.max(...shares));
}
