/** What the README says of agreement with print is what test/evidence.md shows. */
import { expect, test } from 'vitest';
import { readText } from '../support/project.ts';

interface Row {
  readonly group: string;
  readonly difference: number;
  readonly known: string;
  readonly verdict: string;
}

const rows = readRows(readText('test/evidence.md'));
const differences = rows.map(({ difference }) => difference).sort((a, b) => a - b);
const quantile = (share: number): number => differences[Math.floor(share * (differences.length - 1))] ?? Number.NaN;
const worstOf = (group: RegExp): number =>
  Math.max(...rows.filter((row) => group.test(row.group)).map(({ difference }) => difference));

test('more than 800 figures, half to a millionth, nine in ten to 0.2 %, the worst 25 %, all within their tolerance', () => {
  expect(rows.length).toBeGreaterThan(800);
  expect(quantile(0.5)).toBeLessThan(1e-6);
  expect(quantile(0.9)).toBeLessThan(0.002);
  expect(quantile(1)).toBeLessThanOrEqual(0.25);
  expect(rows.filter(({ verdict }) => verdict !== 'holds')).toEqual([]);
});

test('the worst are measured core loss, then surfaces and bias curves; nothing else differs by more than 5 %', () => {
  expect(worstOf(/^Core loss/)).toBe(quantile(1));
  expect(worstOf(/^(Heat: surfaces|Ceramics: bias)/)).toBeLessThan(0.12);
  expect(worstOf(/^(?!Core loss|Heat: surfaces|Ceramics: bias)/)).toBeLessThan(0.05);
});

test('about one in nine was read from the printed page', () => {
  const seen = rows.filter(({ known }) => known === 'seen').length / rows.length;
  expect(seen).toBeGreaterThan(0.1);
  expect(seen).toBeLessThan(0.15);
});

/** Rows of published values whose difference is a share of the expected value. */
function readRows(markdown: string): readonly Row[] {
  let group = '';
  return markdown.split('\n').flatMap((line) => {
    if (line.startsWith('### ')) group = line.slice(4);
    const cells = line.split('|').map((cell) => cell.trim());
    const [, , , , expected, , difference, , known = '', verdict = ''] = cells;
    if (cells.length !== 11 || !(Math.abs(Number(expected)) > 0)) return [];
    return [{ group, difference: Math.abs(Number(difference)), known, verdict }];
  });
}
