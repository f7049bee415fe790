/** An engine: every epoch runs twice and must come out the same. */
import type { Recipe } from './recipe.ts';

export const ENGINE: Recipe = {
  heading: 'An engine',
  edits: [
    {
      path: 'runners/engines/checked.ts',
      text: `/** The engine that trusts nothing: runs every epoch twice, and fails it where the two differ. */
import type { Problem } from '../../optimizer/problem.ts';
import { inlineEngine } from './inline.ts';
import type { Engine, EpochResult, EpochTask } from './protocol.ts';

export function checkedEngine(problem: Problem): Engine {
  const engine = inlineEngine(problem);
  const run = async (task: EpochTask): Promise<EpochResult> => {
    const [first, second] = [await engine.run(task), await engine.run(task)];
    if (!first.ok || !second.ok) return first;
    return Buffer.compare(first.island, second.island) === 0 ? first : { ok: false, reason: 'two runs of it differ' };
  };
  return { ...engine, run };
}
`,
    },
    {
      path: 'runners/sweep/command.ts',
      before: 'import { THREAD_LIMITS',
      text: "import { checkedEngine } from '../engines/checked.ts';\n",
    },
    {
      path: 'runners/sweep/command.ts',
      instead: '    engine,\n',
      text: "    engine: process.env.CHECKED === 'yes' ? () => checkedEngine(problem) : engine,\n",
    },
  ],
  besides: ['runners/engines/protocol.ts', 'runners/engines/inline.ts', 'runners/cluster/shard.ts'],
};
