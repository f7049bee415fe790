/** `chopfront completion`: a script that lets the shell complete commands, options, scenarios, kinds and design ids. */
import { Argument, type Command } from 'commander';
import { SHELLS } from '../completion/shells.ts';
import { refusal } from '../errors.ts';
import { examples, type SetStatus } from './shared.ts';

const MORE = `
Design ids are read from front.csv of the run named before them; nothing is started for it.

To switch it on for good:
  bash  chopfront completion bash > ~/.local/share/bash-completion/completions/chopfront
  zsh   chopfront completion zsh > a folder of $fpath/_chopfront
  fish  chopfront completion fish > ~/.config/fish/completions/chopfront.fish`;

/** Adds the command to the program. */
export function defineCompletion(program: Command, _setStatus: SetStatus): void {
  program
    .command('completion')
    .description('print a script that completes this program in a shell')
    .addArgument(new Argument('<shell>', SHELLS.join(', ')))
    .addHelpText('after', MORE)
    .addHelpText('after', examples(['completion bash', 'completion fish | source']))
    .action(async (shell: string) => {
      const found = SHELLS.find((one) => one === shell);
      if (found === undefined) throw refusal('unknown-shell', { name: shell, names: SHELLS.join(', ') });
      const { completionScript } = await import('../completion/script.ts');
      process.stdout.write(completionScript(found, program));
    });
}
