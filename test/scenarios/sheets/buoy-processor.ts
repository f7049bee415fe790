/** One to forty at 60 A: the shortest on-time against transformer stages, mixed banks. */
import { type Sweep, searching, spaceOf, sweep } from '../spaces.ts';
import { type Statement, stated } from '../statement.ts';
import { turnsNear } from './questions.ts';

/** What its row says; each side search may spend `evaluations`. */
export function processor(found: Sweep, evaluations: number): Statement[] {
  const name = 'buoy-processor';
  const { rail } = found.problem;
  // At 85 % the duty is at most 1 V/(0.85 · 57 V); 50 ns of it make a period of 2.42 µs.
  const fast = searching(rail, { architectures: ['buck-synchronous'], frequency: { minimum: 413e3, maximum: 2e6 } });
  const bucks = sweep(spaceOf(fast), evaluations);
  const kept = bucks.record.feasible.reduce((sum, count) => sum + count, 0);
  const isolated = found.members.filter((member) => !member.family.startsWith('buck')).length;
  const mixed = found.members.filter((member) => found.problem.record(member.genes).genes.outputBulkCount > 0).length;
  return [
    stated(
      name,
      'with 50 ns and 85 % no plain buck runs above 1 V/(0.85 · 57 V · 50 ns) = 413 kHz',
      `${kept} of ${bucks.evaluations} designs from there on`,
      kept === 0,
    ),
    stated(
      name,
      'transformer stages carry most of the front',
      `${isolated} of ${found.members.length}`,
      2 * isolated > found.members.length,
      'the sheet',
    ),
    turnsNear(name, 'half-bridge-current-doubler', 6, evaluations),
    turnsNear(name, 'full-bridge-current-doubler', 12, evaluations),
    stated(
      name,
      'ceramic and bulk capacitors share the output',
      `${mixed} of ${found.members.length}`,
      mixed > 0,
      'the sheet',
    ),
  ];
}
