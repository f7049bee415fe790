/** The page of a comparison: one static file without scripts, drawn with D3 in jsdom, in the style of the run's page. */
import { createHash } from 'node:crypto';
import { select } from 'd3';
import { JSDOM } from 'jsdom';
import type { Comparison } from './compare-data.ts';
import { renderComparison } from './views/changes.ts';

/** The page's text: same comparison and style, same bytes. `theme` is the text of `dist/viz/theme.css`. */
export function buildComparePage(comparison: Comparison, theme: string): string {
  const style = `${theme.trim()}\n${STYLE}`;
  if (/<\//.test(style)) throw new Error('the style would end its own element');
  const digest = createHash('sha256').update(style).digest('base64');
  const policy = `default-src 'none'; style-src 'sha256-${digest}'; base-uri 'none'; form-action 'none'`;
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta http-equiv="Content-Security-Policy" content="${policy}">
<meta name="viewport" content="width=device-width, initial-scale=1">
<meta name="color-scheme" content="light dark">
<meta name="referrer" content="no-referrer">
<title>What changed: two runs compared</title>
<style>${style}</style>
</head>
<body>
${drawn(comparison)}
</body>
</html>
`;
}

/** What this page adds to the theme. */
const STYLE = `
.compared { margin-bottom: 0.8rem; }
.compared > h2 { margin-bottom: 0.4rem; }
:is(.compared td:last-child, #figures th, #carried th) { white-space: normal; }
.differences { padding-left: 1.1rem; overflow-wrap: anywhere; }
.pairs { display: grid; gap: 1.2rem; grid-template-columns: repeat(auto-fit, minmax(min(100%, 24rem), 1fr)); }
.change-legend { display: flex; flex-wrap: wrap; gap: 0.3rem 1.1rem; list-style: none; padding: 0; margin: 0.5rem 0; }
.change-legend li { display: flex; align-items: center; gap: 0.35rem; }
.change-sample { width: 16px; height: 16px; }
.change { stroke: var(--card); stroke-width: 0.7px; }
.change.kept { fill: var(--soft); }
.change.gained { fill: var(--good); }
.change.moved { fill: var(--hand); }
.change.lost { fill: none; stroke: var(--bad); stroke-width: 1.6px; }
.change-trail { fill: none; stroke: var(--hand); stroke-width: 1px; }
`.trim();

function drawn(comparison: Comparison): string {
  const dom = new JSDOM('<!doctype html><body></body>');
  try {
    const { body } = dom.window.document;
    renderComparison(select(body), comparison);
    return body.innerHTML;
  } finally {
    dom.window.close();
  }
}
