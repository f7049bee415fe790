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
  const { readRecord } = await import('../run-folder/record.ts');
  const { shardFoldersIn } = await import('../cluster/shards.ts');
  const { say, sayJson, sayPainted } = await import('../terminal/output.ts');
  const { statusLines, faultLines } = await import('./status-text.ts');
  const all = folders.flatMap((folder) => shardFoldersIn(folder) ?? [folder]);
  const rows = all.map((folder) => ({ folder, record: readRecord(folder) }));
  if (options.json === true) {
    sayJson(rows.map(({ folder, record }) => ({ folder, ...record })));
    return STATUS.done;
  }
  for (const line of statusLines(rows)) sayPainted(line);
  for (const line of faultLines(rows)) say(line);
  return STATUS.done;
}
