/** Where the package's own files are, whether this runs as built code in `dist/runners/` or as source in `runners/`. */
import { existsSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** Path of a file of the package, by its name from the package's folder. */
export function packagePath(...names: string[]): string {
  return join(ROOT, ...names);
}

const ROOT = rootOf(dirname(fileURLToPath(import.meta.url)));

function rootOf(folder: string): string {
  if (existsSync(join(folder, 'package.json'))) return folder;
  const above = dirname(folder);
  return above === folder ? folder : rootOf(above);
}
