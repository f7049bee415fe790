/** `chopfront compare`: what a changed price list, requirement or version did to the front. */
import type { Command } from 'commander';
import { examples, type SetStatus } from './shared.ts';

interface CompareOptions {
  readonly json?: boolean;
  readonly csv?: string;
}

/** Adds the command to the program. */
export function defineCompare(program: Command, _setStatus: SetStatus): void {
  program
    .command('compare')
    .description('what changed from the front of one run to that of another')
    .argument('<run-a>', 'run folder, before')
    .argument('<run-b>', 'run folder, after')
    .option('--csv <file>', 'write every design gained, lost or moved as a table')
    .option('--json', 'print machine-readable output and nothing else')
    .addHelpText(
      'after',
      examples(['compare runs/old-prices runs/new-prices', 'compare runs/a runs/b --csv changes.csv']),
    )
    .action(runCompare);
}

async function runCompare(a: string, b: string, options: CompareOptions): Promise<void> {
  const { compareRuns } = await import('../run-folder/compare.ts');
  const { compareText, compareCsv } = await import('./compare-text.ts');
  const { sayJson, sayPainted } = await import('../terminal/output.ts');
  const comparison = compareRuns(a, b);
  if (options.csv !== undefined) {
    const { writeNew } = await import('./write-new.ts');
    writeNew(options.csv, compareCsv(comparison), true);
  }
  if (options.json === true) sayJson(comparison);
  else sayPainted(compareText(comparison));
}
