/** `chopfront draft`: writes a commented starter sheet, or one of the shipped ones. */
import { existsSync } from 'node:fs';
import type { Command } from 'commander';
import { reasonOf, refusal } from '../errors.ts';
import type { SetStatus } from '../main.ts';
import { examples } from './shared.ts';

interface DraftOptions {
  readonly scenario?: string;
  readonly force?: boolean;
}

/** Adds the command to the program. */
export function defineDraft(program: Command, _setStatus: SetStatus): void {
  program
    .command('draft')
    .description('write a commented starter sheet')
    .argument('<sheet>', 'file to write, such as rail.yaml')
    .option('--scenario <name>', 'start from one of the shipped sheets instead')
    .option('--force', 'replace the file if it exists')
    .addHelpText('after', examples(['draft rail.yaml', 'draft winch.yaml --scenario buoy-winch']))
    .action(runDraft);
}

async function runDraft(path: string, options: DraftOptions): Promise<void> {
  const { starterSheet } = await import('../../model/index.ts');
  const { writeWhole } = await import('../run-folder/files.ts');
  const { remark } = await import('../terminal/output.ts');
  const text = options.scenario === undefined ? starterSheet() : await scenario(options.scenario);
  if (existsSync(path) && options.force !== true) throw refusal('file-exists', { file: path });
  try {
    writeWhole(path, text);
  } catch (error) {
    throw refusal('file-unwritable', { file: path, reason: reasonOf(error) });
  }
  remark(`${path}: written; edit it, then look at what it means with: chopfront check ${path}`);
}

async function scenario(name: string): Promise<string> {
  const { SHIPPED_RAILS } = await import('../../model/index.ts');
  const { packagePath } = await import('../package-path.ts');
  const { readText } = await import('../run-folder/files.ts');
  const bare = (file: string): string => file.replace(/\.yaml$/, '');
  const found = SHIPPED_RAILS.find((file) => bare(file) === bare(name));
  if (found === undefined) throw refusal('unknown-scenario', { name, names: SHIPPED_RAILS.map(bare).join(', ') });
  return readText(packagePath('model', 'rails', `${bare(found)}.yaml`), 'a shipped sheet');
}
