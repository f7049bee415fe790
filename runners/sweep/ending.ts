/** What a person is told when a sweep has ended: the front and where to look at it, or what stood in the way of any design. */
import type { RailProblem } from '../../model/index.ts';
import { type ErrorCode, Refusal, reasonOf, refusal, STATUS } from '../errors.ts';
import { writePage } from '../run-folder/page.ts';
import { say } from '../terminal/output.ts';
import { describeValues } from './describe.ts';
import { explainNothing } from './nothing.ts';
import type { RunEnd } from './run.ts';

/** Prints the end of a run; draws the page where asked. Returns the exit status. Throws the refusal `no-design`. */
export async function reportEnd(
  folder: string,
  problem: RailProblem,
  end: RunEnd,
  wanted: { readonly page: boolean },
): Promise<number> {
  const { record, found } = end;
  if (found.archive.count === 0) {
    throw refusal('no-design', { evaluations: record.evaluations, explanation: explainNothing(problem, end.atHand) });
  }
  const best = describeValues(problem.objectives, end.best);
  say(`${folder}: ${record.frontSize} designs on the front after ${record.evaluations} evaluations`);
  say(`best: ${best.join(', ')}`);
  if (record.faults.length > 0) say(`${record.faults.length} islands were lost; see: chopfront status ${folder}`);
  if (wanted.page) await drawPage(folder);
  return STATUS.done;
}

// A page that cannot be drawn does not undo the sweep.
async function drawPage(folder: string): Promise<void> {
  const soft: readonly ErrorCode[] = ['page-failed'];
  try {
    say(`page: ${await writePage(folder)}`);
  } catch (error) {
    if (!(error instanceof Refusal) || !soft.includes(error.code)) throw error;
    process.stderr.write(`${reasonOf(error)}; try again with: chopfront page ${folder}\n`);
  }
}
