/** Statements as a section of the evidence. */
import type { Section } from '../reference/markdown.ts';
import type { Statement } from '../scenarios/statement.ts';

/** Facts of the trade have no source. */
export const TRADE = 'common practice, no source';

/** A heading, what leads in, and the statements as a table. */
export function section(title: string, lead: readonly string[], statements: readonly Statement[]): Section {
  const rows = statements.map(({ where, says, source, ours, holds }) =>
    line([where, says, source, ours, holds ? 'holds' : '**fails**']),
  );
  const head = ['| where | statement | source | ours | |', '|---|---|---|---|---|'];
  const passed = statements.filter(({ holds }) => holds).length;
  const text = [`## ${title}`, '', ...lead, '', ...head, ...rows, ''].join('\n');
  return { text, passed, failed: statements.length - passed };
}

/** One line of a table. */
export function line(cells: readonly string[]): string {
  return `| ${cells.map((cell) => cell.replaceAll('|', '\\|')).join(' | ')} |`;
}
