/** Test pages on disk: bundled and built as the build does, in a folder of the system's temporary place. */
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { build } from 'esbuild';
import { packagePath } from '../../runners/package-path.ts';
import type { PageAssets, PageData } from '../../viz/data.ts';
import { buildPage } from '../../viz/page.ts';
import { staticPage } from '../../viz/static-page.ts';
import { fixtureAssessor } from '../viz/fixture.ts';

const ROOT = packagePath();

/** One script for the browser, as the build makes it. */
export async function bundle(entry: string): Promise<string> {
  const result = await build({
    entryPoints: [join(ROOT, entry)],
    bundle: true,
    format: 'iife',
    platform: 'browser',
    target: 'es2022',
    minify: true,
    legalComments: 'none',
    write: false,
  });
  return result.outputFiles[0]?.text ?? '';
}

function style(): string {
  return readFileSync(join(ROOT, 'viz/theme.css'), 'utf8');
}

/** The real page of `data`. */
export async function realPage(data: PageData): Promise<string> {
  const assets: PageAssets = { script: await bundle('viz/live.ts'), style: style() };
  return buildPage(data, assets);
}

/** The page of an invented sweep over the invented model. */
export async function inventedPage(data: PageData): Promise<string> {
  const assets: PageAssets = { script: await bundle('test/viz/live-fixture.ts'), style: style() };
  return staticPage(data, assets, fixtureAssessor());
}

/** A folder for pages. */
export interface PagesFolder {
  /** Writes a page; gives its address. */
  write(name: string, text: string): string;
  remove(): void;
}

/** A folder for pages that goes away with `remove`. */
export function pagesFolder(): PagesFolder {
  const folder = mkdtempSync(join(tmpdir(), 'chopfront-pages-'));
  return {
    write: (name, text) => {
      const path = join(folder, name);
      writeFileSync(path, text);
      return pathToFileURL(path).href;
    },
    remove: () => rmSync(folder, { recursive: true, force: true }),
  };
}
