/** What a person is told when a sweep has ended: the front and where to look at it, or what stood in the way of any design. */
import type { RailProblem } from '../../model/index.ts';
import { Refusal, refusal, STATUS } from '../errors.ts';
import { writePage } from '../run-folder/page.ts';
import { remark, say } from '../terminal/output.ts';
import { describeValues } from './describe.ts';
import { explainNothing } from './nothing.ts';
import type { RunEnd } from './run.ts';

/** What to do at the end. */
export interface EndWishes {
  readonly page: boolean;
  /** One JSON object instead of words. */
  readonly json: boolean;
}

/** Prints the end of a run; draws the page where asked. Returns the exit status. Throws the refusal `no-design`. */
export async function reportEnd(folder: string, problem: RailProblem, end: RunEnd, wanted: EndWishes): Promise<number> {
  const { record, found } = end;
  if (found.archive.count === 0) {
    throw refusal('no-design', { evaluations: record.evaluations, explanation: explainNothing(problem, end.atHand) });
  }
  const page = wanted.page ? await drawPage(folder) : undefined;
  if (wanted.json) {
    const { evaluations, frontSize, hypervolume, faults } = record;
    process.stdout.write(
      `${JSON.stringify({ event: 'end', folder, evaluations, frontSize, hypervolume, faults, page })}\n`,
    );
    return STATUS.done;
  }
  say(`${folder}: ${record.frontSize} designs on the front after ${record.evaluations} evaluations`);
  say(`best: ${describeValues(problem.objectives, end.best).join(', ')}`);
  if (record.faults.length > 0) say(`${record.faults.length} islands were lost; see: chopfront status ${folder}`);
  if (page !== undefined) say(`page: ${page}`);
  return STATUS.done;
}

// A page that cannot be drawn does not undo the sweep.
async function drawPage(folder: string): Promise<string | undefined> {
  try {
    return await writePage(folder);
  } catch (error) {
    if (!(error instanceof Refusal) || error.code !== 'page-failed') throw error;
    remark(`${error.message}; try again with: chopfront page ${folder}`);
    return undefined;
  }
}
