/**
 * The last step of `npm run build`, after the compiler: bundles the page's live script, writes what is not TypeScript but is
 * needed beside the built code, and removes built files whose source is gone.
 */
import { chmodSync, copyFileSync, existsSync, mkdirSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { SPEC_SCHEMA } from '../model/index.ts';
import { packagePath } from './package-path.ts';

const LIVE = packagePath('viz', 'live.ts');
const STYLE = packagePath('viz', 'theme.css');

await bundleLive();
copyBeside(STYLE, packagePath('dist', 'viz', 'theme.css'));
writeFileSync(packagePath('dist', 'model', 'spec.schema.json'), `${JSON.stringify(SPEC_SCHEMA, undefined, 2)}\n`);
for (const room of ['optimizer', 'model', 'runners', 'viz', 'test']) removeOrphans(room);
chmodSync(packagePath('dist', 'runners', 'chopfront.js'), 0o755);

/** One script without imports, for the strict content policy of a page that opens from disk. */
async function bundleLive(): Promise<void> {
  const { build } = await import('esbuild');
  await build({
    entryPoints: [LIVE],
    outfile: packagePath('dist', 'viz', 'live.js'),
    bundle: true,
    format: 'iife',
    platform: 'browser',
    target: 'es2022',
    minify: true,
    legalComments: 'none',
    logLevel: 'warning',
  });
}

function copyBeside(from: string, to: string): void {
  if (!existsSync(from)) throw new Error(`${from} is missing`);
  mkdirSync(dirname(to), { recursive: true });
  copyFileSync(from, to);
}

/** Built files of a source that was renamed or removed would otherwise go into the package. */
function removeOrphans(folder: string): void {
  for (const entry of readdirSync(packagePath('dist', folder), { withFileTypes: true })) {
    const path = join(folder, entry.name);
    if (entry.isDirectory()) removeOrphans(path);
    const source = path.replace(/\.(js|d\.ts)$/, '.ts');
    const built = source !== path && path !== join('viz', 'live.js');
    if (built && !existsSync(packagePath(source))) rmSync(packagePath('dist', path));
  }
}
