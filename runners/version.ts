/** The version of this tool, from the package's own description. */
import { readFileSync } from 'node:fs';
import { packagePath } from './package-path.ts';

/** Version of the package, such as `1.2.3`. */
export const VERSION: string = readVersion();

function readVersion(): string {
  const description: unknown = JSON.parse(readFileSync(packagePath('package.json'), 'utf8'));
  const named = typeof description === 'object' && description !== null && 'version' in description;
  return named ? String(description.version) : 'unknown';
}
