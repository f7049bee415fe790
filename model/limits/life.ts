/** Life of wet electrolytics: what each operating point of the profile wears off, with usual values. */
import { electrolyticLifeAt } from '../capacitors/index.ts';
import type { Evaluator } from '../evaluate.ts';
import type { Bulk } from '../parts/bulk.ts';
import type { PlannedPoint } from '../plan.ts';

/** Rated life, s, rated temperature and temperature of a piece, K; then its wear, 1/s, in the first place: no double crosses a call. */
const piece = new Float64Array(3);

/**
 * Adds the wear of the solved usual point, weighted by its share of the time (Miner: rates of wear add), 1/s.
 * @source ncp5314, page 20: life halves each 10 K; rates of wear add (Miner)
 * @valid wet electrolytics
 */
export function addWear(e: Evaluator, { share }: PlannedPoint): void {
  if (!(share > 0) || e.places.bulkLife < 0) return;
  const { heat } = e.solver;
  const { outputBulk, inputBulk } = e.design;
  if (isWet(outputBulk)) {
    piece[2] = heat.boardTemperature + heat.outputBulkRise;
    findWear(outputBulk);
    e.wear[0] += share * piece[0];
  }
  if (isWet(inputBulk)) {
    piece[2] = heat.boardTemperature + heat.inputBulkRise;
    findWear(inputBulk);
    e.wear[1] += share * piece[0];
  }
}

/** Judges the shorter life of both banks against the sheet's. */
export function judgeLife(e: Evaluator): void {
  const asked = e.rail.limits.life;
  const worst = Math.max(e.wear[0], e.wear[1]);
  if (asked === undefined || !(worst > 0)) return;
  e.book.found = 1 / worst;
  e.book.bound = asked;
  e.book.weigh(e.places.bulkLife, -1);
}

function isWet(bulk: Bulk | undefined): bulk is Bulk {
  return bulk !== undefined && bulk.technology === 'electrolytic';
}

/**
 * Writes the wear of one piece, 1/s, at the temperature that stands in `piece`.
 * @source ncp5314, page 20
 * @valid wet electrolytics
 */
function findWear(bulk: Bulk): void {
  piece[0] = bulk.ratedLife;
  piece[1] = bulk.maximumTemperature;
  electrolyticLifeAt(piece);
  piece[0] = 1 / piece[0];
}
