/** `chopfront compare`: what a changed price list, requirement or version did to the front. */
import type { Command } from 'commander';
import type { Comparison } from '../../viz/compare-data.ts';
import { examples, type SetStatus } from './shared.ts';

interface CompareOptions {
  readonly json?: boolean;
  readonly csv?: string;
  readonly page?: string;
}

/** Adds the command to the program. */
export function defineCompare(program: Command, _setStatus: SetStatus): void {
  program
    .command('compare')
    .description('what changed from the front of one run to that of another')
    .argument('<run-a>', 'run folder, before')
    .argument('<run-b>', 'run folder, after')
    .option('--csv <file>', 'write every design gained, lost or moved as a table')
    .option('--page <file>', 'draw the comparison as one static page')
    .option('--json', 'print machine-readable output and nothing else')
    .addHelpText(
      'after',
      examples([
        'compare runs/old-prices runs/new-prices',
        'compare runs/a runs/b --csv changes.csv --page changes.html',
      ]),
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
  if (options.page !== undefined) await drawPage(options.page, comparison);
  if (options.json === true) sayJson(comparison);
  else sayPainted(compareText(comparison));
}

async function drawPage(file: string, comparison: Comparison): Promise<void> {
  const { reasonOf, refusal } = await import('../errors.ts');
  const { pageAsset } = await import('../run-folder/page.ts');
  const { buildComparePage } = await import('../../viz/compare-page.ts');
  const { writeNew } = await import('./write-new.ts');
  let text: string;
  try {
    text = buildComparePage(comparison, pageAsset('theme.css'));
  } catch (error) {
    throw refusal('page-failed', { reason: reasonOf(error) });
  }
  writeNew(file, text, true);
}
