/** A thin bar inside a table cell: the number stays the message, the bar only lets the eye rank. */
import { px, type Root } from './root.ts';

/** Appends a bar that fills `fraction` (0 … 1) of its track; `mark` (0 … 1) draws a tick on it. */
export function bar<E extends Element>(cell: Root<E>, fraction: number, name = '', mark?: number): void {
  const svg = cell
    .append('svg')
    .attr('class', `bar ${name}`.trim())
    .attr('viewBox', '0 0 100 6')
    .attr('preserveAspectRatio', 'none')
    .attr('aria-hidden', 'true');
  const size = Number.isFinite(fraction) ? Math.max(0, Math.min(1, fraction)) : 0;
  svg.append('rect').attr('class', 'track').attr('width', 100).attr('height', 6);
  svg
    .append('rect')
    .attr('class', 'fill')
    .attr('width', px(100 * size))
    .attr('height', 6);
  if (mark !== undefined)
    svg
      .append('rect')
      .attr('class', 'tick')
      .attr('x', px(100 * Math.min(0.99, mark)))
      .attr('width', 1.4)
      .attr('height', 6);
}
