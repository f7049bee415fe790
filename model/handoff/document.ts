/** A short document as data: headings, paragraphs, lists and tables, so that Markdown and HTML say the same. */

/** A table; every cell is plain text. */
export interface DocumentTable {
  readonly head: readonly string[];
  readonly rows: readonly (readonly string[])[];
}

/** One section. */
export interface Section {
  readonly title: string;
  readonly paragraphs?: readonly string[];
  readonly list?: readonly string[];
  readonly table?: DocumentTable;
}

/** A document. */
export interface Document {
  readonly title: string;
  /** A line under the title. */
  readonly subtitle: string;
  readonly sections: readonly Section[];
}

/** The document as Markdown. Texts cannot leave their cell or become markup. */
export function markdown(document: Document): string {
  const blocks = [`# ${safe(document.title)}`, safe(document.subtitle), ...document.sections.flatMap(sectionBlocks)];
  return `${blocks.join('\n\n')}\n`;
}

function sectionBlocks(section: Section): string[] {
  const list = (section.list ?? []).map((text) => `- ${safe(text)}`).join('\n');
  return [
    `## ${safe(section.title)}`,
    ...(section.paragraphs ?? []).map(safe),
    ...(list === '' ? [] : [list]),
    ...(section.table === undefined ? [] : [tableText(section.table)]),
  ];
}

function tableText({ head, rows }: DocumentTable): string {
  const line = (cells: readonly string[]): string => `| ${cells.map(safe).join(' | ')} |`;
  return [line(head), line(head.map(() => '---')), ...rows.map(line)].join('\n');
}

/** One line, with what Markdown or HTML would read as markup escaped. */
function safe(text: string): string {
  return text.replace(/\s+/g, ' ').replace(/[\\`*_<>|[\]#]/g, (mark) => (text === '---' ? mark : `\\${mark}`));
}
