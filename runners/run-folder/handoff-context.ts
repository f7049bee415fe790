/** What a run adds to a design's handoff, gathered as for its page, so that both give the same bytes. */
import type { HandoffContext } from '../../model/index.ts';
import { gatherPage } from './page-data.ts';

/** Front, near misses and hashes of the run in `folder`. Throws refusals where there is none. */
export function handoffContext(folder: string): HandoffContext {
  const { front, nearMisses, relaxations, run } = gatherPage(folder);
  return { designs: front.designs, nearMisses, relaxations, hashes: { rail: run.railHash, parts: run.partsHash } };
}
