/** Builds the page that a run folder holds. */
import type { PageAssets, PageData } from './data.ts';
import { modelAssessor } from './model-assessor.ts';
import { staticPage } from './static-page.ts';

/**
 * The page's text, complete and deterministic: same data and assets, same bytes.
 * The runner reads `assets` from `dist/viz/` (see PageAssets) and writes the result to `page.html`.
 */
export function buildPage(data: PageData, assets: PageAssets): string {
  return staticPage(data, assets, modelAssessor(data));
}
