/** `chopfront show`: one design of a run in the terminal. */
import type { Command } from 'commander';
import { examples, type SetStatus } from './shared.ts';

interface ShowOptions {
  readonly json?: boolean;
}

/** Adds the command to the program. */
export function defineShow(program: Command, _setStatus: SetStatus): void {
  program
    .command('show')
    .description('show one design: values, parts, losses, margins, temperatures')
    .argument('<run>', 'run folder')
    .argument('<design>', 'id of the design, or how it begins')
    .option('--json', 'print the whole assessment as JSON and nothing else')
    .addHelpText('after', examples(['show runs/demo d4f2', 'show runs/demo d4f2 --json']))
    .action(runShow);
}

async function runShow(folder: string, id: string, options: ShowOptions): Promise<void> {
  const { openDesign } = await import('../run-folder/design.ts');
  const { sayJson, sayPainted } = await import('../terminal/output.ts');
  const { problem, genes } = openDesign(folder, id);
  const assessment = problem.assess(genes);
  if (options.json === true) {
    sayJson(assessment);
    return;
  }
  const { designText } = await import('./design-text.ts');
  const { painter } = await import('../terminal/colour.ts');
  sayPainted(designText(assessment, problem, painter(process.stdout)));
  const { requirementPrices } = await import('../../model/index.ts');
  const { gatherPage } = await import('../run-folder/page-data.ts');
  const { pricesText } = await import('./prices-text.ts');
  const { familiesText } = await import('./families-text.ts');
  const { front, nearMisses, relaxations, families } = gatherPage(folder);
  const prices = requirementPrices(front, nearMisses, relaxations);
  for (const text of [pricesText(prices, relaxations), familiesText(families)]) {
    if (text !== '') sayPainted(`\n${text}`);
  }
}
