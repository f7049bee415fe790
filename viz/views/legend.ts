/** Families with their marks: a press hides or shows one. */
import type { Dataset } from '../dataset.ts';
import { thousands, titled } from '../labels.ts';
import { colourOf, lookOf, markPath } from '../marks/mark.ts';
import type { Root } from '../marks/root.ts';

export function renderLegend<E extends Element>(
  root: Root<E>,
  dataset: Dataset,
  hidden: readonly string[],
  kept: readonly number[],
): void {
  const counts = new Map<string, number>();
  for (const i of kept) {
    const family = dataset.designs[i]?.family ?? '';
    counts.set(family, (counts.get(family) ?? 0) + 1);
  }
  const list = root.selectAll<HTMLUListElement, number>('ul').data([0]).join('ul').attr('class', 'legend');
  const items = list.selectAll<HTMLLIElement, string>('li').data([...dataset.families], (family) => family);
  const made = items.join((enter) => {
    const item = enter.append('li');
    const button = item
      .append('button')
      .attr('type', 'button')
      .attr('data-act', 'family')
      .attr('data-family', (family) => family);
    drawMark(button.append('svg'));
    button
      .append('span')
      .attr('class', 'family-name')
      .text((family) => familyName(family));
    button.append('span').attr('class', 'family-count');
    return item;
  });
  made.select('button').attr('aria-pressed', (family) => String(!hidden.includes(family)));
  made.select('.family-count').text((family) => thousands(counts.get(family) ?? 0));
}

type MarkSelection = import('d3').Selection<SVGSVGElement, string, Element, unknown>;

function drawMark(svg: MarkSelection): void {
  svg.attr('class', 'mark-sample').attr('viewBox', '-9 -9 18 18').attr('aria-hidden', 'true');
  svg
    .append('path')
    .attr('class', (family) => `mark kind-${colourOf(lookOf(family))}`)
    .attr('fill-rule', 'evenodd')
    .attr('d', (family) => markPath(lookOf(family), 5.4));
}

/** A family's mark alone, for tables. */
export function familyMark<E extends Element>(root: Root<E>, family: string): void {
  drawMark(
    root.selectAll<SVGSVGElement, string>('svg.mark-sample').data([family]).join('svg') as unknown as MarkSelection,
  );
}

/** `buck-synchronous ×2` → `Synchronous buck ×2`. */
export function familyName(family: string): string {
  const { architecture, phases } = lookOf(family);
  return `${titled(architecture)} ×${phases}`;
}
