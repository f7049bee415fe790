/** Cases as a Markdown table: what the evidence prints. */
import { SOURCES } from '../../model/sources.ts';
import { type CaseGroup, checkCase, type ReferenceCase } from './case.ts';

/** A printed section with its count. */
export interface Section {
  readonly text: string;
  readonly passed: number;
  readonly failed: number;
}

const HEAD = [
  '| source, place | what is checked | unit | expected | ours | difference | tolerance | known from | |',
  '|---|---|---|---:|---:|---:|---:|---|---|',
];

/** All groups under one heading. */
export function publishedSection(groups: readonly CaseGroup[]): Section {
  let passed = 0;
  let failed = 0;
  const lines = ['## Published values', '', ...SUMMARY, ''];
  for (const group of groups) {
    lines.push(`### ${group.title}`, '', ...HEAD);
    for (const item of group.cases) {
      const [row, ok] = rowOf(item);
      lines.push(row);
      if (ok) passed += 1;
      else failed += 1;
    }
    lines.push('');
  }
  return { text: lines.join('\n'), passed, failed };
}

const SUMMARY = [
  'Difference and tolerance are shares of the expected value, or in its unit where that is 0. "Seen": the printed page was read;',
  '"from memory": recalled, the page was not at hand; "computed": worked out from the published formula by other means than the model.',
];

function rowOf(item: ReferenceCase): [string, boolean] {
  const verdict = checkCase(item);
  const cells = [
    `${item.source}: ${item.place}`,
    item.what,
    item.unit,
    figure(verdict.expected, 8),
    figure(verdict.got, 8),
    figure(verdict.difference, 2),
    figure(verdict.tolerance, 2),
    item.mark,
    verdict.passed ? 'holds' : '**fails**',
  ].map((cell) => cell.replaceAll('|', '\\|'));
  return [`| ${cells.join(' | ')} |`, verdict.passed];
}

/** A number in the fewest digits that show `digits` figures. */
function figure(value: number, digits: number): string {
  return Number.isFinite(value) ? String(Number(value.toPrecision(digits))) : String(value);
}

/** The sources behind the ids of the tables. */
export function sourceSection(): Section {
  const rows = Object.entries(SOURCES).map(
    ([id, { author, title, year, place }]) => `| ${id} | ${author} | ${title} | ${year} | ${place} |`,
  );
  const text = ['## Sources', '', '| id | author | title | year | place |', '|---|---|---|---:|---|', ...rows, ''].join(
    '\n',
  );
  return { text, passed: 0, failed: 0 };
}
