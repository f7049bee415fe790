/** `chopfront merge`: joins runs of the same sheet and parts into one. */
import type { Command } from 'commander';
import { examples, type SetStatus, wholeOption } from './shared.ts';

interface MergeCommandOptions {
  readonly expect?: number;
}

/** Adds the command to the program. */
export function defineMerge(program: Command, setStatus: SetStatus): void {
  program
    .command('merge')
    .description('join runs of the same sheet and parts; order does not matter')
    .argument('<out>', 'run folder to write; may be an earlier merge')
    .argument('<run...>', 'run folders, or a folder that holds shards')
    .option(
      '--expect <count>',
      'refuse unless this many shards are done; name those that are missing',
      wholeOption(1, 100_000),
    )
    .addHelpText('after', examples(['merge runs/all runs/monday runs/tuesday', 'merge runs/big runs/big --expect 16']))
    .action(async (out: string, folders: string[], options: MergeCommandOptions) => {
      const { mergeRuns } = await import('../cluster/merge-runs.ts');
      setStatus(await mergeRuns(out, folders, options.expect));
    });
}
