/** `chopfront assess`: judges a design that came from elsewhere, as a spec or a plain list, and says where it stands in a run. */
import type { Command } from 'commander';
import { examples, type SetStatus } from './shared.ts';

interface AssessOptions {
  readonly json?: boolean;
  readonly run?: string;
}

const MORE = `
A plain list has a line for each value and part, named as in front.csv: "architecture: buck-synchronous",
"frequency: 400 kHz", "phases: 2", "highSwitch: NAME". Lines that start with # are remarks.
`;

/** Adds the command to the program. */
export function defineAssess(program: Command, _setStatus: SetStatus): void {
  program
    .command('assess')
    .description('assess a design that came from elsewhere, as a spec or a plain list of values and parts')
    .argument('<sheet>', 'rail sheet to judge it against')
    .argument('<design>', 'spec file, such as the spec.json of a handoff, or a plain list')
    .option('--run <folder>', 'say where it stands against this run')
    .option('--json', 'print machine-readable output and nothing else')
    .addHelpText('after', MORE)
    .addHelpText('after', examples(['assess rail.yaml old.json', 'assess rail.yaml old.json --run runs/first --json']))
    .action(runAssess);
}

async function runAssess(sheet: string, file: string, options: AssessOptions): Promise<void> {
  const { readDesign, readSheet, problemOf, take } = await import('../inputs.ts');
  const { readText } = await import('../run-folder/files.ts');
  const { standingIn } = await import('../run-folder/standing.ts');
  const { sayJson, sayPainted } = await import('../terminal/output.ts');
  const problem = problemOf(readSheet(sheet));
  const record = readDesign({ file, text: readText(file, 'a design as a spec or a plain list') });
  const genes = take(problem.genesFrom(record, file));
  const assessment = problem.assess(genes);
  const standing = options.run === undefined ? undefined : standingIn(options.run, problem, genes);
  if (options.json === true) {
    const { id, feasible, objectives, limits } = assessment;
    const margins = Object.fromEntries(limits.map((limit) => [limit.name, limit.margin]));
    sayJson({ id, feasible, objectives, margins, ...standing });
    return;
  }
  const { designText } = await import('./design-text.ts');
  const { painter } = await import('../terminal/colour.ts');
  sayPainted(designText(assessment, problem, painter(process.stdout)));
  if (standing === undefined) return;
  const { standingText } = await import('./standing-text.ts');
  sayPainted(`\n${standingText(standing, problem)}`);
}
