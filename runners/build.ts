/**
 * The last step of `npm run build`, after the compiler: bundles the page's live script and copies what is not TypeScript
 * but is needed beside the built code.
 */
import { chmodSync, copyFileSync, existsSync, mkdirSync } from 'node:fs';
import { dirname } from 'node:path';
import { packagePath } from './package-path.ts';

const LIVE = packagePath('viz', 'live.ts');
const STYLE = packagePath('viz', 'theme.css');

await bundleLive();
copyBeside(STYLE, packagePath('dist', 'viz', 'theme.css'));
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
