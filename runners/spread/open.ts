/** Opens the designs of a run for a spread, with whatever draws their samples. */
import { pathToFileURL } from 'node:url';
import type { FrontFile, RailProblem } from '../../model/index.ts';
import { problemOf, take } from '../inputs.ts';
import { packagePath } from '../package-path.ts';
import { missDesigns, recordOf } from '../run-folder/design.ts';
import { findDesign, readFront } from '../run-folder/front.ts';
import { readRecord } from '../run-folder/record.ts';
import { readSnapshot } from '../run-folder/snapshot.ts';
import { type Drawer, inlineDrawer, threadDrawer } from './blocks.ts';

/** Designs to sample and how. */
export interface OpenRun {
  readonly problem: RailProblem;
  readonly front: FrontFile;
  readonly designs: readonly Float64Array[];
  readonly drawer: Drawer;
}

/** The designs `ids` of the run in `folder`, or all of its front. Throws refusals. Close the drawer when done. */
export function openRun(folder: string, ids: readonly string[], threads: number): OpenRun {
  const inputs = readSnapshot(folder, readRecord(folder));
  const problem = problemOf(inputs);
  const front = readFront(folder);
  const chosen =
    ids.length > 0 ? ids.map((id) => findDesign(folder, front, id, () => missDesigns(folder, problem))) : front.designs;
  const designs = chosen.map((design) => take(problem.genesFrom(recordOf(design))));
  if (threads === 1) return { problem, front, designs, drawer: inlineDrawer(problem) };
  const module = pathToFileURL(packagePath('dist', 'runners', 'engines', 'rail-problem.js')).href;
  const worker = packagePath('dist', 'runners', 'spread', 'worker.js');
  return { problem, front, designs, drawer: threadDrawer(worker, { module, source: inputs.texts }, threads) };
}
