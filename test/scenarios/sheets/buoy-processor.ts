/** One to forty at 60 A: the shortest on-time against transformer stages, mixed banks. */
import type { Architecture } from '../../../model/stages/list.ts';
import { least, objectiveIndex, type Sweep, searching, spaceOf, sweep } from '../spaces.ts';
import { type Statement, stated } from '../statement.ts';
import { turnsNear } from './questions.ts';

const BUCK: Architecture = 'buck-synchronous';
const DOUBLER: Architecture = 'half-bridge-current-doubler';

/** What its row says; each side search may spend `evaluations`: families meet one by one, for forty at once ask more. */
export function processor({ problem }: Sweep, evaluations: number): Statement[] {
  const name = 'buoy-processor';
  const { rail } = problem;
  // At 85 % the duty is at most 1 V/(0.85 · 57 V); 50 ns of it make a period of 2.42 µs.
  const fast = searching(rail, { architectures: [BUCK], frequency: { minimum: 413e3, maximum: 2e6 } });
  const beyond = sweep(spaceOf(fast), evaluations);
  const kept = beyond.record.feasible.reduce((sum, count) => sum + count, 0);
  const bucks = sweep(spaceOf(searching(rail, { architectures: [BUCK] })), evaluations);
  const doublers = sweep(spaceOf(searching(rail, { architectures: [DOUBLER] })), evaluations);
  const mixed = doublers.members.filter(({ genes }) => doublers.problem.record(genes).genes.outputBulkCount > 0).length;
  const [buck, doubler] = [bucks, doublers].map(leastLoss);
  return [
    stated(
      name,
      'with 50 ns and 85 % no plain buck runs above 1 V/(0.85 · 57 V · 50 ns) = 413 kHz',
      `${kept} of ${beyond.evaluations} designs from there on`,
      kept === 0,
    ),
    stated(
      name,
      'the coolest transformer stage loses less than the coolest plain buck',
      `${doubler.toPrecision(3)} W against ${buck.toPrecision(3)} W`,
      doubler < buck,
      'common practice, no source',
    ),
    turnsNear(name, DOUBLER, 6, evaluations),
    turnsNear(name, 'full-bridge-current-doubler', 12, evaluations),
    stated(
      name,
      'ceramic and bulk capacitors share the output of a transformer stage',
      `${mixed} of ${doublers.members.length}`,
      mixed > 0,
      'the sheet',
    ),
  ];
}

/** Profile-weighted loss of the coolest design, W; Infinity where none keeps every limit. */
function leastLoss(found: Sweep): number {
  if (found.members.length === 0) return Number.POSITIVE_INFINITY;
  return least(found, 'loss').objectives[objectiveIndex(found.problem, 'loss')];
}
