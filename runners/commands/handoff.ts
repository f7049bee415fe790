/** `chopfront handoff`: writes what others need of a chosen design into a folder. */
import type { Command } from 'commander';
import { reasonOf, refusal } from '../errors.ts';
import { examples, type SetStatus } from './shared.ts';

interface HandoffOptions {
  readonly out: string;
  readonly force?: boolean;
}

const MORE = `
Writes spec.json (every value, for programs and for "assess"), stage.cir (netlist for a circuit simulator), parts.csv
(bill of materials), magnetics.md (order sheet of wound parts), note.md and note.html (design note).
`;

/** Adds the command to the program. */
export function defineHandoff(program: Command, _setStatus: SetStatus): void {
  program
    .command('handoff')
    .description('write a chosen design for simulation, purchasing, winding and review')
    .argument('<run>', 'run folder')
    .argument('<design>', 'id of the design, or how it begins')
    .requiredOption('--out <folder>', 'folder to write into')
    .option('--force', 'replace files that exist')
    .addHelpText('after', MORE)
    .addHelpText('after', examples(['handoff runs/demo d4f2 --out handoff']))
    .action(runHandoff);
}

async function runHandoff(folder: string, id: string, options: HandoffOptions): Promise<void> {
  const { openDesign } = await import('../run-folder/design.ts');
  const { handoffContext } = await import('../run-folder/handoff-context.ts');
  const { takeAwayFiles } = await import('../../viz/note/take-away.ts');
  const { remark } = await import('../terminal/output.ts');
  const { problem, genes } = openDesign(folder, id);
  const files = takeAwayFiles(problem, genes, handoffContext(folder));
  for (const path of await writeFiles(options.out, files, options.force === true)) remark(`${path}: written`);
}

/** Writes `files` into `out`, each beside its name and renamed. Throws the refusals `file-exists` and `file-unwritable`. */
async function writeFiles(
  out: string,
  files: readonly { readonly name: string; readonly text: string }[],
  force: boolean,
): Promise<string[]> {
  const { existsSync, lstatSync, mkdirSync } = await import('node:fs');
  const { basename, join } = await import('node:path');
  const { writeWhole } = await import('../run-folder/files.ts');
  const paths = files.map(({ name, text }) => {
    if (name !== basename(name) || /^\.+$/.test(name) || name === '') throw new Error(`${name} is no file name`);
    return { path: join(out, name), text };
  });
  const standing = paths.find(({ path }) => existsSync(path) || lstatSync(path, { throwIfNoEntry: false }));
  if (standing !== undefined && !force) throw refusal('file-exists', { file: standing.path });
  try {
    mkdirSync(out, { recursive: true });
    for (const { path, text } of paths) writeWhole(path, text);
  } catch (error) {
    throw refusal('file-unwritable', { file: out, reason: reasonOf(error) });
  }
  return paths.map(({ path }) => path);
}
