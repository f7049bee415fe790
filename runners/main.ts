/** From command line to exit status: builds the commands, runs the one asked for, turns whatever it throws into one line. */
import { Command, CommanderError } from 'commander';
import { defineAssess } from './commands/assess.ts';
import { defineCheck } from './commands/check.ts';
import { defineCompare } from './commands/compare.ts';
import { defineCompletion } from './commands/completion.ts';
import { defineDraft } from './commands/draft.ts';
import { defineHandoff } from './commands/handoff.ts';
import { defineMerge } from './commands/merge.ts';
import { definePage } from './commands/page.ts';
import { defineParts } from './commands/parts.ts';
import { defineProve } from './commands/prove.ts';
import type { SetStatus } from './commands/shared.ts';
import { defineShow } from './commands/show.ts';
import { defineSpread } from './commands/spread.ts';
import { defineStatus } from './commands/status.ts';
import { defineSweep } from './commands/sweep.ts';
import { Refusal, reasonOf, refusal, STATUS } from './errors.ts';
import { plainLines, short } from './terminal/text.ts';
import { VERSION } from './version.ts';

/** Each command's file; the order is that of `--help`. */
const DEFINITIONS = [
  defineDraft,
  defineCheck,
  defineParts,
  defineSweep,
  definePage,
  defineShow,
  defineAssess,
  defineHandoff,
  defineProve,
  defineSpread,
  defineMerge,
  defineStatus,
  defineCompare,
  defineCompletion,
];

const AFTER_HELP = `
Exit status: 0 done, 1 internal fault, 2 bad input, 3 no feasible design, 4 run folder in use,
129/130/143 stopped by HUP/INT/TERM with everything saved, 75 stopped inside a cluster shard (run it again).

Examples:
  chopfront draft rail.yaml                     a commented sheet to start from
  chopfront check rail.yaml                     what the sheet means, before any search
  chopfront sweep rail.yaml --out runs/first    search; Ctrl-C saves, --resume goes on
`;

/** Runs the command line `args` (without node and script); returns the exit status. Never throws. */
export async function main(args: readonly string[]): Promise<number> {
  let status: number = STATUS.done;
  const program = build((result) => {
    status = result;
  });
  try {
    await program.parseAsync([...args], { from: 'user' });
    return status;
  } catch (error) {
    return explain(error, commandNamed(program, args));
  }
}

function build(setStatus: SetStatus): Command {
  const program = new Command('chopfront')
    .description('Searches the design space of a step-down DC-DC rail and leaves its whole trade-off to choose from.')
    .version(VERSION, '-V, --version', 'print the version')
    .helpCommand('help [command]', 'explain a command')
    .addHelpText('after', AFTER_HELP);
  for (const define of DEFINITIONS) define(program, setStatus);
  for (const command of withBelow(program)) {
    command
      .exitOverride()
      .showSuggestionAfterError(true)
      .configureOutput({ outputError: () => {} });
  }
  return program;
}

/** A command and all below it. */
function withBelow(command: Command): Command[] {
  return [command, ...command.commands.flatMap(withBelow)];
}

/** How the command that `args` ask for is called in `see: chopfront … --help`: its words, each with a space behind it. */
function commandNamed(command: Command, [first, ...rest]: readonly string[]): string {
  const found = command.commands.find((one) => one.name() === first);
  return found === undefined ? '' : `${found.name()} ${commandNamed(found, rest)}`;
}

/** Writes the one line that an error deserves; returns its exit status. `command` is the one that was asked for. */
export function explain(error: unknown, command = ''): number {
  if (error instanceof CommanderError) return explainUsage(error, command);
  if (error instanceof Refusal) {
    process.stderr.write(`chopfront: ${plainLines(error.message)}\n`);
    return error.status;
  }
  const trace = (process.env.CHOPFRONT_TRACE ?? '') !== '';
  const more = trace ? '' : ' (set CHOPFRONT_TRACE=1 to see where)';
  process.stderr.write(`chopfront: internal fault: ${plainLines(reasonOf(error))}${more}\n`);
  if (trace && error instanceof Error) process.stderr.write(`${plainLines(error.stack ?? '')}\n`);
  return STATUS.fault;
}

const LONGEST_USAGE = 400;

// Commander ends `--help` and `--version` by an error with status 0, and shows help with status 1 where no command is named.
function explainUsage(error: CommanderError, command: string): number {
  if (error.exitCode === 0) return STATUS.done;
  if (error.code === 'commander.help') return STATUS.badInput;
  const text = error.message.replace(/^error: /, '').replace(/\n\(?Did you mean ([^)]*)\)?$/, '; did you mean $1');
  return explain(refusal('usage', { text: short(text.replace(/\n/g, ' '), LONGEST_USAGE), command }));
}
