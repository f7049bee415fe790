/** `chopfront assess`: judges a design that came from elsewhere, in spec form, and says what of a run dominates it. */
import type { Command } from 'commander';
import { examples, type SetStatus } from './shared.ts';

interface AssessOptions {
  readonly json?: boolean;
  readonly run?: string;
}

/** Adds the command to the program. */
export function defineAssess(program: Command, _setStatus: SetStatus): void {
  program
    .command('assess')
    .description('assess a design that came from elsewhere, in spec form')
    .argument('<sheet>', 'rail sheet to judge it against')
    .argument('<design>', 'spec file, such as the spec.json of a handoff')
    .option('--run <folder>', 'say which designs of this run dominate it')
    .option('--json', 'print machine-readable output and nothing else')
    .addHelpText('after', examples(['assess rail.yaml old.json', 'assess rail.yaml old.json --run runs/first --json']))
    .action(runAssess);
}

async function runAssess(sheet: string, file: string, options: AssessOptions): Promise<void> {
  const { readSheet, problemOf, take } = await import('../inputs.ts');
  const { readSpec, recordOfSpec } = await import('../../model/index.ts');
  const { readText } = await import('../run-folder/files.ts');
  const { dominatedBy } = await import('../run-folder/standing.ts');
  const { sayJson, sayPainted } = await import('../terminal/output.ts');
  const problem = problemOf(readSheet(sheet));
  const spec = take(readSpec(readText(file, 'a design in spec form'), file));
  const genes = take(problem.genesFrom(recordOfSpec(spec), file));
  const assessment = problem.assess(genes);
  const betters = options.run === undefined ? undefined : dominatedBy(options.run, assessment);
  if (options.json === true) {
    const { id, feasible, objectives, limits } = assessment;
    const margins = Object.fromEntries(limits.map((limit) => [limit.name, limit.margin]));
    sayJson({ id, feasible, objectives, margins, ...(betters === undefined ? {} : { dominatedBy: betters }) });
    return;
  }
  const { designText } = await import('./design-text.ts');
  const { painter } = await import('../terminal/colour.ts');
  sayPainted(designText(assessment, problem.rail, painter(process.stdout)));
  if (betters !== undefined) sayPainted(`\n${standing(betters)}`);
}

function standing(betters: readonly string[]): string {
  if (betters.length === 0) return 'No design of the run is better in every objective.';
  const some = betters.slice(0, 10).join(' ');
  return `Dominated by ${betters.length} design${betters.length === 1 ? '' : 's'} of the run: ${some}${betters.length > 10 ? ' …' : ''}`;
}
