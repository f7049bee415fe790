/** How much of its budget a sweep has used, ring by ring. */
import { type Budget, shareUsed } from './budget.ts';
import { type Ring, tallyOf } from './ring.ts';

/** Share of its budget that a ring has used, 0 … 1; at 1 it ends. */
export function ringShare(budget: Budget, shards: number, ring: Ring, seconds: number): number {
  // A small space runs out of designs that were not seen before, and must still come to an end: planned ones count too.
  const evaluations = Math.max(tallyOf(ring).evaluations, ring.epoch * ring.epochEvaluations);
  return shareUsed(budget, shards, { evaluations, seconds, history: ring.history });
}

/** Mean over the rings. */
export function meanShare(budget: Budget, shards: number, rings: readonly Ring[], seconds: number): number {
  const shares = rings.map((ring) => (ring.done ? 1 : ringShare(budget, shards, ring, seconds)));
  return shares.reduce((sum, share) => sum + share, 0) / Math.max(1, shares.length);
}
