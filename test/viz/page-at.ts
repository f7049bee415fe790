/** A place to render into, as a page at build time gives it. */
import { select } from 'd3';
import { JSDOM } from 'jsdom';
import type { Root } from '../../viz/marks/root.ts';

/** One for all places: a document costs far more than an element. */
const { document } = new JSDOM('<!doctype html>').window;

/** A fresh empty `div`, as a D3 selection. */
export function place(): Root<HTMLDivElement> {
  return select(document.createElement('div')) as unknown as Root<HTMLDivElement>;
}

/** Text of the cells, row by row, of the first table under `root`. */
export function cellsOf(root: Root<HTMLDivElement>): string[][] {
  const rows = root.node()?.querySelector('table')?.querySelectorAll('tr') ?? [];
  return Array.from(rows, (row) =>
    Array.from(row.children, (cell) => (cell.textContent ?? '').replaceAll('\u00a0', ' ')),
  );
}
