/** What may stand where on the command line, taken from the commands as they define themselves: all that completion knows. */
import type { Command } from 'commander';
import { KIND_NAMES } from '../../model/parts/built-in.ts';
import { SCENARIO_NAMES } from '../commands/draft.ts';
import { SHELLS } from './shells.ts';

/** What completes a word: files, folders, ids of the run named before, some words, or nothing. */
export type Answer = 'files' | 'folders' | 'ids' | 'nothing' | readonly string[];

/** An option: how it is written and what completes its value; no value where `value` is absent. */
export interface GrammarOption {
  readonly flags: readonly string[];
  readonly about: string;
  readonly value?: Answer;
}

/** A command with what may follow it. */
export interface GrammarCommand {
  /** Words that name it, such as `parts check`; empty for the program itself. */
  readonly path: string;
  readonly about: string;
  readonly commands: readonly string[];
  readonly options: readonly GrammarOption[];
  /** Answers by place; the last one holds for all further places where `repeats` is set. */
  readonly places: readonly Answer[];
  readonly repeats: boolean;
}

/** Every command of the program, itself first. */
export function grammarOf(program: Command, path = ''): readonly GrammarCommand[] {
  const commands = program.commands.map((command) => command.name());
  const args = program.registeredArguments;
  const names = args.map((argument) => argument.name());
  const own: GrammarCommand = {
    path,
    about: program.description(),
    commands,
    options: [
      ...program.options
        .filter((option) => !option.hidden)
        .map((option) => {
          const flags = [option.short, option.long].filter((flag) => flag !== undefined && flag !== null);
          const wants = option.required || option.optional;
          const value = option.argChoices ?? answerForOption(option.attributeName(), option.flags);
          return { flags, about: option.description, ...(wants ? { value } : {}) };
        }),
      { flags: ['-h', '--help'], about: 'display help for command' },
    ],
    places: args.map((argument, i) => argument.argChoices ?? answerForPlace(names, i)),
    repeats: args.at(-1)?.variadic ?? false,
  };
  const below = program.commands.flatMap((command) => grammarOf(command, `${path} ${command.name()}`.trim()));
  return [own, ...below];
}

function answerForOption(name: string, flags: string): Answer {
  if (name === 'scenario') return SCENARIO_NAMES;
  if (name === 'log') return ['json'];
  if (flags.includes('<folder>')) return 'folders';
  return flags.includes('<file>') ? 'files' : 'nothing';
}

/** By the names that our commands give to their arguments. */
function answerForPlace(names: readonly string[], place: number): Answer {
  const name = names[place] ?? '';
  if (name === 'kind') return KIND_NAMES;
  if (name === 'shell') return SHELLS;
  if (name === 'design' && names[0] === 'run') return 'ids';
  return name === 'out' || name.startsWith('run') ? 'folders' : 'files';
}
