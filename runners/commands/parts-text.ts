/** How `parts check` lays out a table in the terminal. */
import { describeFinding, formatDifference, formatQuantity } from '../../model/index.ts';
import type { Paint } from '../terminal/colour.ts';
import { table } from '../terminal/table.ts';
import { plain } from '../terminal/text.ts';
import type { ComparedRange, OddRow, PartsReport } from './parts-report.ts';

/** The text of a report, several sections. */
export function reportText(report: PartsReport, paint: Paint): string {
  const { file, kind, rows, rejected, currency, findings, ranges, odd, remarks } = report;
  const verdict = findings.length === 0 ? paint('all good', 'good') : paint(`${rejected} rejected`, 'bad');
  const priced = currency === undefined ? '' : `, prices in ${currency}`;
  const sections = [
    [`${paint(plain(file), 'bold')}: ${kind}, ${rows} row${rows === 1 ? '' : 's'}, ${verdict}${priced}`],
    section('Rejected', bullets(findings.map(describeFinding))),
    section('Worth a second look', oddLines(odd)),
    section('Ranges', rangeLines(ranges)),
    section('Remarks', bullets(remarks)),
  ];
  return sections
    .filter((lines) => lines.length > 0)
    .map((lines) => lines.join('\n'))
    .join('\n\n');
}

function section(head: string, lines: readonly string[]): string[] {
  return lines.length === 0 ? [] : [head, ...lines];
}

function bullets(texts: readonly string[]): string[] {
  return texts.map((text) => `  - ${plain(text)}`);
}

const right = (head: string): { head: string; right: boolean } => ({ head, right: true });

function oddLines(odd: readonly OddRow[]): string[] {
  const rows = odd.map(({ line, name, what, unit, value, usual }) => [
    String(line),
    name,
    what,
    formatDifference(value, unit),
    `${formatDifference(usual[0], unit)} to ${formatDifference(usual[1], unit)}`,
  ]);
  if (rows.length === 0) return [];
  return table([right('line'), { head: 'part' }, { head: 'what' }, right('has'), { head: 'usual' }], rows);
}

function rangeLines(ranges: readonly ComparedRange[]): string[] {
  const rows = ranges.map((range) => {
    const [low, high] = range.builtIn ?? [undefined, undefined];
    return [range.column, ...[range.smallest, range.largest, low, high].map((value) => shown(value, range))];
  });
  if (rows.length === 0) return [];
  const heads = [right('from'), right('to'), right('built-in from'), right('to')];
  return table([{ head: 'column' }, ...heads], rows);
}

function shown(value: number | undefined, { dimension, unit }: ComparedRange): string {
  if (value === undefined) return '';
  if (dimension === 'fraction') return `${formatQuantity(100 * value, '')} %`;
  return dimension === 'temperature' ? formatQuantity(value, unit) : formatDifference(value, unit);
}
