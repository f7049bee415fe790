/** Life of wet electrolytics: what each operating point of the profile wears off, with usual values. */
import { electrolyticLife } from '../capacitors/index.ts';
import type { Evaluator } from '../evaluate.ts';
import type { Bulk } from '../parts/bulk.ts';

/**
 * Adds the wear of the solved usual point, weighted by its share of the time (Miner: rates of wear add), 1/s.
 * @source ncp5314, page 20: life halves each 10 K; rates of wear add (Miner)
 * @valid wet electrolytics
 */
export function addWear(e: Evaluator, share: number): void {
  if (!(share > 0) || e.places.bulkLife < 0) return;
  const { heat } = e.solver;
  const { outputBulk, inputBulk } = e.design;
  if (isWet(outputBulk)) e.wear[0] += share * wear(outputBulk, heat.boardTemperature + heat.outputBulkRise);
  if (isWet(inputBulk)) e.wear[1] += share * wear(inputBulk, heat.boardTemperature + heat.inputBulkRise);
}

/** Judges the shorter life of both banks against the sheet's. */
export function judgeLife(e: Evaluator): void {
  const asked = e.rail.limits.life;
  const worst = Math.max(e.wear[0], e.wear[1]);
  if (asked === undefined || !(worst > 0)) return;
  e.book.judge(e.places.bulkLife, 1 / worst, asked, -1);
}

function isWet(bulk: Bulk | undefined): bulk is Bulk {
  return bulk !== undefined && bulk.technology === 'electrolytic';
}

/**
 * Wear of one piece at `temperature` K, 1/s.
 * @source ncp5314, page 20
 * @valid wet electrolytics
 */
function wear(bulk: Bulk, temperature: number): number {
  return 1 / electrolyticLife(bulk.ratedLife, bulk.maximumTemperature, temperature);
}
