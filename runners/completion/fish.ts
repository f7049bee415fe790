/** Completion for fish: one `complete` line for each command, option and place, under the condition that its command was typed. */
import type { Answer, GrammarCommand } from './grammar.ts';

/** The script for fish. */
export function fishScript(grammar: readonly GrammarCommand[]): string {
  const lines = grammar.flatMap((command) => linesFor(command, grammar));
  return `# Completion of chopfront for fish.
function __chopfront_ids
  for word in (commandline -opc)
    if test -f "$word/front.csv"
      # Nothing but what an id is made of reaches the shell from a file.
      cut -d, -f1 -- "$word/front.csv" | string match -r '^[a-z][a-z0-9]{1,30}$' | string match -v id | head -n 500
    end
  end
end
complete -c chopfront -f
${lines.join('\n')}
`;
}

function linesFor(command: GrammarCommand, grammar: readonly GrammarCommand[]): string[] {
  const { path, commands, options, places } = command;
  const when = `-n '${conditionOf(path, commands, grammar)}'`;
  const aboutOf = (name: string): string => grammar.find((one) => one.path === `${path} ${name}`.trim())?.about ?? '';
  return [
    ...commands.map((name) => `complete -c chopfront ${when} -a ${name} -d ${quoted(aboutOf(name))}`),
    ...options.map(({ flags, about, value }) => {
      const spelled = flags.map((flag) => (flag.startsWith('--') ? `-l ${flag.slice(2)}` : `-s ${flag.slice(1)}`));
      return `complete -c chopfront ${when} ${spelled.join(' ')}${value === undefined ? '' : ` ${wordOf(value)}`} -d ${quoted(about)}`;
    }),
    ...new Set(places.map((answer) => `complete -c chopfront ${when} ${placeOf(answer)}`)),
  ];
}

/** Every word of the path was typed, and none that leads elsewhere. */
function conditionOf(path: string, commands: readonly string[], grammar: readonly GrammarCommand[]): string {
  if (path === '') return '__fish_use_subcommand';
  const words = path.split(' ');
  const parents = grammar.filter((one) => one.path !== '' && one.commands.length > 0 && !path.startsWith(one.path));
  const seen = words.map((word) => `__fish_seen_subcommand_from ${word}`);
  const elsewhere = [...(words.length === 1 ? parents.map((one) => one.path) : []), ...commands];
  const others = elsewhere.map((name) => `not __fish_seen_subcommand_from ${name}`);
  return [...seen, ...others].join('; and ');
}

function wordOf(answer: Answer): string {
  if (answer === 'files') return '-r -F';
  return answer === 'nothing' ? '-x' : `-x ${placeOf(answer)}`;
}

function placeOf(answer: Answer): string {
  if (answer === 'files') return '-F';
  if (answer === 'folders') return "-a '(__fish_complete_directories)'";
  if (answer === 'ids') return "-a '(__chopfront_ids)'";
  return answer === 'nothing' ? '-f' : `-a '${answer.join(' ')}'`;
}

function quoted(text: string): string {
  return `'${text.replace(/['\\]/g, '\\$&')}'`;
}
