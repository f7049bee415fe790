/** `chopfront handoff`: writes what others need of a chosen design into a folder. */
import type { Command } from 'commander';
import { reasonOf, refusal } from '../errors.ts';
import { examples, type SetStatus } from './shared.ts';

interface HandoffOptions {
  readonly out: string;
  readonly force?: boolean;
}

/** Adds the command to the program. */
export function defineHandoff(program: Command, _setStatus: SetStatus): void {
  program
    .command('handoff')
    .description('write a chosen design as a spec that others can use')
    .argument('<run>', 'run folder')
    .argument('<design>', 'id of the design, or how it begins')
    .requiredOption('--out <folder>', 'folder to write into')
    .option('--force', 'replace files that exist')
    .addHelpText('after', examples(['handoff runs/demo d4f2 --out handoff']))
    .action(runHandoff);
}

async function runHandoff(folder: string, id: string, options: HandoffOptions): Promise<void> {
  const { openDesign } = await import('../run-folder/design.ts');
  const { writeSpec } = await import('../../model/index.ts');
  const { remark } = await import('../terminal/output.ts');
  const { problem, genes } = openDesign(folder, id);
  const files = { 'spec.json': `${JSON.stringify(writeSpec(problem, genes), undefined, 2)}\n` };
  const written = await writeFiles(options.out, files, options.force === true);
  for (const path of written) remark(`${path}: written`);
}

async function writeFiles(out: string, files: Readonly<Record<string, string>>, force: boolean): Promise<string[]> {
  const { existsSync, mkdirSync } = await import('node:fs');
  const { join } = await import('node:path');
  const { writeWhole } = await import('../run-folder/files.ts');
  const paths = Object.entries(files).map(([name, text]) => ({ path: join(out, name), text }));
  const standing = paths.find(({ path }) => existsSync(path));
  if (standing !== undefined && !force) throw refusal('file-exists', { file: standing.path });
  try {
    mkdirSync(out, { recursive: true });
    for (const { path, text } of paths) writeWhole(path, text);
  } catch (error) {
    throw refusal('file-unwritable', { file: out, reason: reasonOf(error) });
  }
  return paths.map(({ path }) => path);
}
