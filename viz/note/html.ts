/** `note.html`: the design note as one small page that prints well; no script, no network. */
import type { Document, DocumentTable, Section } from '../../model/handoff/document.ts';

/** Two to three pages of A4: small type, tables that do not break inside a row. */
const STYLE = `:root{color-scheme:light dark}
body{font:15px/1.45 system-ui,sans-serif;max-width:48rem;margin:2rem auto;padding:0 1rem}
h1{font-size:1.5rem;margin:0}h2{font-size:1.1rem;margin:1.4rem 0 .4rem;break-after:avoid}
p,ul{margin:.4rem 0}table{border-collapse:collapse;width:100%;font-size:.9rem}
th,td{text-align:left;vertical-align:top;padding:.15rem .6rem .15rem 0;border-bottom:1px solid #8886;overflow-wrap:anywhere}
tr{break-inside:avoid}
@media print{body{font-size:9.5pt;max-width:none;margin:0;padding:0}@page{size:A4;margin:16mm}}`;

/** The page of `document`. Every text is escaped. */
export function noteHtml(document: Document): string {
  const body = [
    `<h1>${escaped(document.title)}</h1>`,
    `<p>${escaped(document.subtitle)}</p>`,
    ...document.sections.map(sectionHtml),
  ];
  return [
    '<!doctype html>',
    '<html lang="en">',
    '<head>',
    '<meta charset="utf-8">',
    '<meta name="viewport" content="width=device-width, initial-scale=1">',
    `<meta http-equiv="Content-Security-Policy" content="default-src 'none'; style-src 'unsafe-inline'">`,
    `<title>${escaped(document.title)}</title>`,
    `<style>${STYLE}</style>`,
    '</head>',
    '<body>',
    ...body,
    '</body>',
    '</html>',
    '',
  ].join('\n');
}

function sectionHtml(section: Section): string {
  const list = (section.list ?? []).map((text) => `<li>${escaped(text)}</li>`).join('\n');
  return [
    '<section>',
    `<h2>${escaped(section.title)}</h2>`,
    ...(section.paragraphs ?? []).map((text) => `<p>${escaped(text)}</p>`),
    ...(list === '' ? [] : [`<ul>\n${list}\n</ul>`]),
    ...(section.table === undefined ? [] : [tableHtml(section.table)]),
    '</section>',
  ].join('\n');
}

function tableHtml({ head, rows }: DocumentTable): string {
  const cells = (tag: string, texts: readonly string[]): string =>
    texts.map((text) => `<${tag}>${escaped(text)}</${tag.split(' ')[0]}>`).join('');
  return [
    '<table>',
    `<thead><tr>${cells('th scope="col"', head)}</tr></thead>`,
    '<tbody>',
    ...rows.map((row) => `<tr>${cells('td', row)}</tr>`),
    '</tbody>',
    '</table>',
  ].join('\n');
}

const ENTITIES: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

function escaped(text: string): string {
  return text.replace(/[&<>"']/g, (mark) => ENTITIES[mark] ?? mark);
}
