/** `chopfront check`: what a sheet means before any search: facts, architectures, baseline, size of the space, cautions. */
import type { Command } from 'commander';
import { STATUS } from '../errors.ts';
import { examples, type SetStatus } from './shared.ts';

interface CheckOptions {
  readonly json?: boolean;
}

/** Adds the command to the program. */
export function defineCheck(program: Command, setStatus: SetStatus): void {
  program
    .command('check')
    .description('validate a sheet; show what it means; search nothing')
    .argument('<sheet>', 'rail sheet, such as rail.yaml')
    .option('--json', 'print machine-readable output and nothing else')
    .addHelpText('after', examples(['check rail.yaml', 'check rail.yaml --json']))
    .action(async (sheet: string, options: CheckOptions) => setStatus(await runCheck(sheet, options)));
}

async function runCheck(sheet: string, options: CheckOptions): Promise<number> {
  const { readSheet, take } = await import('../inputs.ts');
  const { explainRail } = await import('../../model/index.ts');
  const { hashesOf } = await import('../run-folder/snapshot.ts');
  const { remark, sayJson } = await import('../terminal/output.ts');
  const inputs = readSheet(sheet);
  const explanation = take(explainRail(inputs.rail, inputs.tables));
  if (options.json === true) {
    sayJson({ rail: inputs.rail.name, ...hashesOf(inputs), remarks: inputs.remarks, ...explanation });
  } else {
    for (const line of inputs.remarks) remark(line);
    const { showExplanation } = await import('./check-text.ts');
    showExplanation(inputs.rail, explanation);
  }
  return STATUS.done;
}
