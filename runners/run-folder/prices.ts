/** What the requirements of a run's sheet cost: its near misses against its front. */
import { type RequirementPrice, requirementPrices } from '../../model/index.ts';
import { gatherPage } from './page-data.ts';

/** The table of the run in `folder`. Throws refusals where it has no front. */
export function pricesIn(folder: string): RequirementPrice[] {
  const { front, nearMisses } = gatherPage(folder);
  return requirementPrices(front, nearMisses);
}
