/** A command: says when a run began. */
import type { Recipe } from './recipe.ts';

export const COMMAND: Recipe = {
  heading: 'A command',
  edits: [
    {
      path: 'runners/commands/age.ts',
      text: `/** \`chopfront age\`: when a run began. */
import type { Command } from 'commander';
import { refusal } from '../errors.ts';
import { examples, type SetStatus } from './shared.ts';

export function defineAge(program: Command, _setStatus: SetStatus): void {
  program
    .command('age')
    .description('say when a run began')
    .argument('<run>', 'run folder')
    .addHelpText('after', examples(['age runs/demo']))
    .action(async (folder: string) => {
      const { readRecord } = await import('../run-folder/record.ts');
      const { say } = await import('../terminal/output.ts');
      const { started } = readRecord(folder);
      if (Number.isNaN(Date.parse(started))) throw refusal('run-ageless', { folder });
      say(\`\${folder}: began \${started}\`);
    });
}
`,
    },
    {
      path: 'runners/main.ts',
      before: 'import { defineAssess }',
      text: "import { defineAge } from './commands/age.ts';\n",
    },
    { path: 'runners/main.ts', before: '  defineCompletion,\n];', text: '  defineAge,\n' },
    {
      path: 'runners/errors.ts',
      before: "  'page-failed':",
      text: "  'run-ageless': [2, '{folder}: says nothing of when it began; look into its run.json'],\n",
    },
    {
      path: 'test/runners/errors-table.test.ts',
      before: "  'page-failed': [",
      text: `  'run-ageless': [{ folder }, 2, 'runs/night: says nothing of when it began; look into its run.json'],\n`,
    },
    {
      path: 'README.md',
      before: '| `chopfront completion SHELL` |',
      text: '| `chopfront age RUN` | says when a run began |\n',
    },
  ],
  besides: [],
};
