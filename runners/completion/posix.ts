/**
 * Completion for bash and zsh. Both run the same function over the words typed so far: it finds the command and the place of
 * the word in hand, and sets `answer` to what completes it; only how words come in and answers go out differs.
 */
import type { Answer, GrammarCommand } from './grammar.ts';

/** The script for bash. */
export function bashScript(grammar: readonly GrammarCommand[]): string {
  return `# Completion of chopfront for bash.
${sharedFunctions(grammar)}
_chopfront() {
  local answer options ids hand="\${COMP_WORDS[COMP_CWORD]}"
  _chopfront_answer "$COMP_CWORD" "\${COMP_WORDS[@]}"
  COMPREPLY=()
  if [[ $hand == -* ]]; then
    COMPREPLY=($(compgen -W "$options" -- "$hand"))
    return
  fi
  case $answer in
    files) compopt -o filenames 2>/dev/null; mapfile -t COMPREPLY < <(compgen -f -- "$hand") ;;
    folders) compopt -o filenames 2>/dev/null; mapfile -t COMPREPLY < <(compgen -d -- "$hand") ;;
    nothing) ;;
    *) COMPREPLY=($(compgen -W "$answer" -- "$hand")) ;;
  esac
}
complete -F _chopfront chopfront
`;
}

/** The script for zsh; works both sourced and from a folder of `fpath`. */
export function zshScript(grammar: readonly GrammarCommand[]): string {
  return `#compdef chopfront
# Completion of chopfront for zsh.
${sharedFunctions(grammar)}
_chopfront() {
  local answer options hand="\${words[CURRENT]}"
  _chopfront_answer "$((CURRENT - 1))" "\${words[@]}"
  if [[ $hand == -* ]]; then
    compadd -- \${=options}
    return
  fi
  case $answer in
    files) _files ;;
    folders) _files -/ ;;
    nothing) ;;
    *) compadd -- \${=answer} ;;
  esac
}
if [ "\${funcstack[1]}" = _chopfront ]; then _chopfront "$@"; else compdef _chopfront chopfront; fi
`;
}

/** Written in what both shells understand; `${list[@]:i:1}` counts from 0 in both. */
function sharedFunctions(grammar: readonly GrammarCommand[]): string {
  return `_chopfront_ids() {
  # Nothing but what an id is made of reaches the shell from a file.
  cut -d, -f1 -- "\${1/#\\~/$HOME}/front.csv" 2>/dev/null | grep -E '^[a-z][a-z0-9]{1,30}$' | head -n 501 | grep -vx id
}
_chopfront_answer() {
  local at="$1" command= place=0 run= i word before
  local -a typed
  shift
  typed=("$@")
  for ((i = 1; i < at; i++)); do
    word="\${typed[@]:$i:1}"
    case "$command/$word" in
${entering(grammar)}
    esac
    case "$command/$word" in
      ${valued(grammar) || '//'}) i=$((i + 1)) ;;
      *) case "$word" in -*) continue ;; esac
         place=$((place + 1)); [ "$place" = 1 ] && run="$word" ;;
    esac
  done
  before="\${typed[@]:$((at - 1)):1}"
  answer=nothing options=
  case "$command" in
${cases(grammar.map(({ path, options }) => [path, `options='${options.flatMap(({ flags }) => flags).join(' ')}'`]))}
  esac
  case "$command/$before" in
${cases(grammar.flatMap(optionAnswers))}
  esac
  case "$command/$place" in
${cases(grammar.flatMap(placeAnswers))}
  esac
}`;
}

/** A typed word that names a command below the one so far. */
function entering(grammar: readonly GrammarCommand[]): string {
  const steps = grammar.flatMap(({ path, commands }) =>
    commands.map((name): Case => [`${path}/${name}`, `command='${`${path} ${name}`.trim()}' place=0; continue`]),
  );
  return cases(steps, 6);
}

/** Options whose next word is their value. */
function valued(grammar: readonly GrammarCommand[]): string {
  return grammar
    .flatMap(({ path, options }) =>
      options.flatMap(({ flags, value }) => (value === undefined ? [] : flags.map((flag) => `'${path}/${flag}'`))),
    )
    .join(' | ');
}

type Case = readonly [string, string];

function optionAnswers({ path, options }: GrammarCommand): Case[] {
  return options.flatMap(({ flags, value }) =>
    value === undefined ? [] : flags.map((flag): Case => [`${path}/${flag}`, `${answering(value)}; return`]),
  );
}

function placeAnswers({ path, commands, places, repeats }: GrammarCommand): Case[] {
  if (commands.length > 0) return [[`${path}/0`, answering(commands)]];
  const each = places.map((answer, i): Case => [`${path}/${i}`, answering(answer)]);
  const last = places.at(-1);
  return repeats && last !== undefined ? [...each, [`${path}/*`, answering(last)]] : each;
}

function answering(answer: Answer): string {
  if (answer === 'ids') return 'answer="$(_chopfront_ids "$run")"';
  return `answer='${typeof answer === 'string' ? answer : answer.join(' ')}'`;
}

/** Patterns are quoted but for a star at their end. */
function cases(list: readonly Case[], indent = 4): string {
  const pad = ' '.repeat(indent);
  return list
    .map(
      ([pattern, action]) =>
        `${pad}${pattern.endsWith('/*') ? `'${pattern.slice(0, -1)}'*` : `'${pattern}'`}) ${action} ;;`,
    )
    .join('\n');
}
