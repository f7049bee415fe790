/** Reads what the documents' tests need of a Markdown file: fenced blocks, links, headings, code spans. */

/** A fenced block. */
export interface Block {
  /** What stands after the fence, such as `console`. */
  readonly language: string;
  readonly text: string;
  /** Line of the file on which its text begins, from 0. */
  readonly line: number;
}

/** One command of a `console` block and the lines that it printed. */
export interface Exchange {
  readonly command: string;
  readonly output: readonly string[];
}

/** The fenced blocks of `markdown`, in order. */
export function blocksOf(markdown: string): readonly Block[] {
  const lines = markdown.split('\n');
  const fences = lines.flatMap((line, index) => (line.startsWith('```') ? [index] : []));
  if (fences.length % 2 !== 0) throw new Error('a fenced block is not closed');
  const opening = fences.filter((_, i) => i % 2 === 0);
  return opening.map((start, i) => {
    const end = fences[2 * i + 1] ?? lines.length;
    const language = (lines[start] ?? '').slice(3).trim();
    return { language, text: lines.slice(start + 1, end).join('\n'), line: start + 1 };
  });
}

/** The commands (lines that begin with `$ `) of a `console` block, each with what follows it. */
export function exchangesOf(block: Block): readonly Exchange[] {
  const exchanges: { command: string; output: string[] }[] = [];
  for (const line of block.text.split('\n')) {
    if (line.startsWith('$ ')) exchanges.push({ command: line.slice(2), output: [] });
    else exchanges.at(-1)?.output.push(line);
  }
  return exchanges;
}

/** Text without fenced blocks. */
function proseOf(markdown: string): string {
  return markdown.replace(/^```[\s\S]*?^```$/gm, '');
}

/** Targets of links and pictures. */
export function linksOf(markdown: string): readonly string[] {
  return [...proseOf(markdown).matchAll(/\]\(([^)\s]+)\)/g)].map(([, target = '']) => target);
}

/** Text of code spans. */
export function spansOf(markdown: string): readonly string[] {
  return [...proseOf(markdown).matchAll(/`([^`\n]+)`/g)].map(([, text = '']) => text);
}

/** Anchors that headings make, as the usual forges build them. */
export function anchorsOf(markdown: string): readonly string[] {
  const headings = [...proseOf(markdown).matchAll(/^#+ (.*)$/gm)].map(([, text = '']) => text);
  return headings.map((text) =>
    text
      .toLowerCase()
      .replace(/[^\p{L}\p{N} _-]/gu, '')
      .replaceAll(' ', '-'),
  );
}
