/** The one static file: drawn once with D3 in jsdom, with its data, style and script inside. */
import { createHash } from 'node:crypto';
import { JSDOM } from 'jsdom';
import type { Assessor } from './assessor.ts';
import type { PageAssets, PageData } from './data.ts';
import { layout } from './layout.ts';
import { pack } from './pack.ts';
import { paintAll } from './paint.ts';
import { benchOf, firstState, sceneOf } from './scene.ts';

/** The page of `data`, judged by `assessor`: same arguments, same bytes. */
export function staticPage(data: PageData, assets: PageAssets, assessor: Assessor): string {
  const body = drawnBody(data, assessor);
  const style = assets.style.trim();
  const script = assets.script.trim();
  if (/<\/script|<!--/i.test(script) || /<\//.test(style)) throw new Error('an asset would end its own element');
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta http-equiv="Content-Security-Policy" content="${policy(style, script)}">
<meta name="viewport" content="width=device-width, initial-scale=1">
<meta name="color-scheme" content="light dark">
<meta name="referrer" content="no-referrer">
<title>${escaped(data.rail.name.slice(0, 120))}: trade-off</title>
<style>${style}</style>
</head>
<body>
${body}
<script type="application/json" id="data">${pack(data)}</script>
<script>${script}</script>
</body>
</html>
`;
}

/** Nothing may be loaded or sent; only this style and this script run. */
function policy(style: string, script: string): string {
  return [
    "default-src 'none'",
    `script-src '${digest(script)}'`,
    `style-src '${digest(style)}'`,
    "base-uri 'none'",
    "form-action 'none'",
  ].join('; ');
}

function digest(text: string): string {
  return `sha256-${createHash('sha256').update(text).digest('base64')}`;
}

function drawnBody(data: PageData, assessor: Assessor): string {
  const dom = new JSDOM(`<!doctype html><body>${layout()}</body>`);
  try {
    const { document } = dom.window;
    const bench = benchOf(data, assessor);
    paintAll(document, bench, sceneOf(bench, firstState(bench)), true);
    return document.body.innerHTML;
  } finally {
    dom.window.close();
  }
}

function escaped(text: string): string {
  return text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;').replaceAll('"', '&quot;');
}
