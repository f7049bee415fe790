/** Drawing a run's page: gathers what the page embeds from the run folder and writes `page.html`. */
import { existsSync } from 'node:fs';
import { reasonOf, refusal } from '../errors.ts';
import { packagePath } from '../package-path.ts';
import { readText, writeWhole } from './files.ts';
import { runFile } from './folder.ts';
import { gatherPage } from './page-data.ts';

/** Writes the page of a run; returns its path. Throws refusals. */
export async function writePage(folder: string): Promise<string> {
  const data = gatherPage(folder);
  const { buildPage } = await import('../../viz/page.ts');
  try {
    const assets = { script: pageAsset('live.js'), style: pageAsset('theme.css') };
    const path = runFile(folder, 'page');
    writeWhole(path, buildPage(data, assets));
    return path;
  } catch (error) {
    throw refusal('page-failed', { reason: reasonOf(error) });
  }
}

/** A text that the build left for pages. Throws an `Error` where it is missing. */
export function pageAsset(name: string): string {
  const path = packagePath('dist', 'viz', name);
  if (!existsSync(path)) throw new Error(`${path} is missing; run: npm run build`);
  return readText(path, 'a part of the page');
}
