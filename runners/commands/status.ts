/** `chopfront status`: how one run, or every shard of a sweep, stands. */
import type { Command } from 'commander';
import { STATUS } from '../errors.ts';
import { examples, type SetStatus } from './shared.ts';

interface StatusOptions {
  readonly json?: boolean;
}

/** Adds the command to the program. */
export function defineStatus(program: Command, setStatus: SetStatus): void {
  program
    .command('status')
    .description('progress, speed and faults of runs')
    .argument('<run...>', 'run folders, or a folder that holds shards')
    .option('--json', 'print machine-readable output and nothing else')
    .addHelpText('after', examples(['status runs/night', 'status runs/cluster']))
    .action(async (folders: string[], options: StatusOptions) => setStatus(await runStatus(folders, options)));
}

async function runStatus(folders: readonly string[], options: StatusOptions): Promise<number> {
  const { standingsOf } = await import('../cluster/standing.ts');
  const { say, sayJson, sayPainted } = await import('../terminal/output.ts');
  const { statusLines, remarkLines } = await import('./status-text.ts');
  const standings = standingsOf(folders);
  if (options.json === true) {
    const runs = standings.runs.map(({ folder, record, state }) => ({ folder, state, ...record }));
    const missing = standings.missing.map((one) => ({ ...one, state: 'missing' }));
    sayJson([...runs, ...missing]);
    return STATUS.done;
  }
  for (const line of statusLines(standings.runs)) sayPainted(line);
  for (const line of remarkLines(standings)) say(line);
  return STATUS.done;
}
