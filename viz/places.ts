/** Places of the page and small controls in them: found by id, measured, filled with options. */
import { select } from 'd3';
import type { Root } from './marks/root.ts';

/** The element of a view. */
export function placeOf(document: Document, id: string): Root<HTMLElement> {
  const element = document.getElementById(id);
  if (element === null) throw new Error(`the page has no place called ${id}`);
  return select(element) as unknown as Root<HTMLElement>;
}

/** A chart's width on this screen, so that its text keeps its size; none where nothing is laid out, as at build time. */
export function measured(document: Document, id: string): { readonly width?: number } {
  const width = Math.min(620, document.getElementById(id)?.clientWidth ?? 0);
  return width > 0 ? { width } : {};
}

/** Draws a view anew and leaves the table behind it open if it was. */
export function redraw(root: Root<HTMLElement>, draw: (root: Root<HTMLElement>) => void): void {
  const wasOpen = root.select<HTMLDetailsElement>('details.numbers').node()?.open === true;
  draw(root);
  if (wasOpen) root.select('details.numbers').attr('open', '');
}

export function fill(
  document: Document,
  id: string,
  options: readonly (readonly [string, string])[],
  chosen: string,
): void {
  const root = placeOf(document, id);
  root
    .selectAll('option')
    .data(options)
    .join('option')
    .attr('value', ([value]) => value)
    .text(([, text]) => text);
  choose(document, id, chosen);
}

function choose(document: Document, id: string, value: string): void {
  placeOf(document, id)
    .selectAll<HTMLOptionElement, unknown>('option')
    .each(function mark() {
      this.toggleAttribute('selected', this.value === value);
      this.selected = this.value === value;
    });
}
