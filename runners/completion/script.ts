/** The completion script of a shell. Everything in it is written down when it is printed, so that completing starts no program. */
import type { Command } from 'commander';
import { fishScript } from './fish.ts';
import { grammarOf } from './grammar.ts';
import { bashScript, zshScript } from './posix.ts';
import type { Shell } from './shells.ts';

/** The script of `shell` for the commands of `program`. */
export function completionScript(shell: Shell, program: Command): string {
  const grammar = grammarOf(program);
  if (shell === 'fish') return fishScript(grammar);
  return shell === 'bash' ? bashScript(grammar) : zshScript(grammar);
}
