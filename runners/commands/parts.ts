/** `chopfront parts`: a user's own parts tables: what is wrong in one, what it holds, and an empty one to begin from. */
import { Argument, type Command } from 'commander';
import { KIND_NAMES } from '../../model/parts/built-in.ts';
import { refusal, STATUS } from '../errors.ts';
import { examples, type SetStatus } from './shared.ts';

interface CheckOptions {
  readonly json?: boolean;
}

interface TemplateOptions {
  readonly out?: string;
  readonly force?: boolean;
}

const CHECK_MORE = `
Each rejected row is named with its line, its column, what was found and what is allowed. Rows that are allowed but far
from what such parts usually are get listed too: they may be right. Rejected rows give exit status 2, odd ones 0.`;

/** Adds the command to the program. */
export function defineParts(program: Command, setStatus: SetStatus): void {
  const parts = program
    .command('parts')
    .description('check your own parts tables, or begin one')
    .addHelpText('after', examples(['parts check my-switches.csv', 'parts template inductors --out my-inductors.csv']));
  parts
    .command('check')
    .description('explain every rejected row; show ranges and odd rows')
    .argument('<file...>', 'parts tables, such as my-switches.csv')
    .option('--json', 'print machine-readable output and nothing else')
    .addHelpText('after', CHECK_MORE)
    .addHelpText('after', examples(['parts check my-switches.csv', 'parts check parts/*.csv --json']))
    .action(async (files: string[], options: CheckOptions) => setStatus(await runCheck(files, options)));
  parts
    .command('template')
    .description('write an empty table: its header, each column explained')
    .addArgument(new Argument('<kind>', `kind of part: ${KIND_NAMES.join(', ')}`))
    .option('--out <file>', 'write into this file instead of printing')
    .option('--force', 'replace the file if it exists')
    .addHelpText('after', examples(['parts template switches', 'parts template ceramics --out my-ceramics.csv']))
    .action(runTemplate);
}

async function runCheck(files: readonly string[], options: CheckOptions): Promise<number> {
  const { inspectOwnTable, rejectedIn } = await import('./parts-report.ts');
  const { sayJson, sayPainted } = await import('../terminal/output.ts');
  const reports = files.map(inspectOwnTable);
  if (options.json === true) sayJson(reports);
  else {
    const { reportText } = await import('./parts-text.ts');
    const { painter } = await import('../terminal/colour.ts');
    sayPainted(reports.map((report) => reportText(report, painter(process.stdout))).join('\n\n'));
  }
  const rejected = rejectedIn(reports);
  if (rejected === '') return STATUS.done;
  throw refusal('rows-rejected', { rejected });
}

async function runTemplate(name: string, options: TemplateOptions): Promise<void> {
  const { explainedTemplate, nearest } = await import('../../model/index.ts');
  const { kindNamed } = await import('../table-kind.ts');
  const kind = kindNamed(name);
  if (kind === undefined) {
    const near = nearest(name, KIND_NAMES);
    const hint = near === undefined ? '' : `; did you mean ${near}?`;
    throw refusal('unknown-kind', { name, names: KIND_NAMES.join(', '), nearest: hint });
  }
  const text = explainedTemplate(kind);
  if (options.out === undefined) {
    process.stdout.write(text);
    return;
  }
  const { writeNew } = await import('./write-new.ts');
  const { remark } = await import('../terminal/output.ts');
  writeNew(options.out, text, options.force === true);
  remark(`${options.out}: written; fill it in, then look at it with: chopfront parts check ${options.out}`);
}
