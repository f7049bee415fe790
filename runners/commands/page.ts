/** `chopfront page`: rebuilds the page of a run from what the run folder holds. */
import type { Command } from 'commander';
import { examples, type SetStatus } from './shared.ts';

/** Adds the command to the program. */
export function definePage(program: Command, _setStatus: SetStatus): void {
  program
    .command('page')
    .description('rebuild the page of a run')
    .argument('<run>', 'run folder')
    .addHelpText('after', examples(['page runs/demo']))
    .action(runPage);
}

async function runPage(folder: string): Promise<void> {
  const { writePage } = await import('../run-folder/page.ts');
  const { say } = await import('../terminal/output.ts');
  say(await writePage(folder));
}
