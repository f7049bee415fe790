/** What lies over and under the marks: the model's band, rings, the crosshair of the open design, the moved design. */
import { bandOf } from '../bands.ts';
import { DISPUTED } from '../dataset.ts';
import { colourOf, lookOf, markPath } from '../marks/mark.ts';
import { clear, moved, px, type Root } from '../marks/root.ts';
import {
  radiusOf,
  type TradeoffInput,
  type TradeoffOptions,
  type TradeoffScales,
  tradeoffDefaults,
} from './tradeoff-scales.ts';

/** Redraws what follows the open, pinned and moved designs, and leaves the thousands of marks alone. */
export function renderOverlay(
  root: Root<SVGSVGElement>,
  input: TradeoffInput,
  scales: TradeoffScales,
  options: TradeoffOptions = tradeoffDefaults,
): void {
  const under = clear(root.select<SVGGElement>('g.under') as unknown as Root<SVGGElement>);
  const over = clear(root.select<SVGGElement>('g.over') as unknown as Root<SVGGElement>);
  if (input.open !== undefined) band(under, input, input.open, scales);
  rings(over, input, scales, options);
  over.append('g').attr('class', 'move');
  renderMovedMark(root, input, scales);
}

/** Redraws the moved design alone. */
export function renderMovedMark(root: Root<SVGSVGElement>, input: TradeoffInput, scales: TradeoffScales): void {
  const group = clear(root.select<SVGGElement>('g.move') as unknown as Root<SVGGElement>);
  if (input.changed !== undefined) change(group, input, input.changed, scales);
}

/** The model's own band about the open design: inside it, a difference may be the model's and not the design's. */
function band(plot: Root<SVGGElement>, input: TradeoffInput, open: number, { x, y }: TradeoffScales): void {
  const [atX, atY] = [input.x.values[open] ?? 0, input.y.values[open] ?? 0];
  const wx = bandOf(input.x.name, atX, input.rail);
  const wy = bandOf(input.y.name, atY, input.rail);
  const [x0, x1] = [x(Math.max(atX - wx, x.domain()[0] ?? 0)), x(atX + wx)];
  const [y0, y1] = [y(atY + wy), y(Math.max(atY - wy, y.domain()[0] ?? 0))];
  plot
    .append('rect')
    .attr('class', 'band')
    .attr('x', px(x0))
    .attr('y', px(y0))
    .attr('width', px(Math.max(2, x1 - x0)))
    .attr('height', px(Math.max(2, y1 - y0)));
}

function rings(plot: Root<SVGGElement>, input: TradeoffInput, { x, y }: TradeoffScales, o: TradeoffOptions): void {
  const left = new Set(input.kept);
  const at = (i: number) => moved(x(input.x.values[i] ?? 0), y(input.y.values[i] ?? 0));
  const ring = (indices: readonly number[], name: string, grow: number) =>
    plot
      .append('g')
      .attr('class', name)
      .selectAll('circle')
      .data(indices)
      .join('circle')
      .attr('r', (i) => px((left.has(i) ? radiusOf(input, i, o) : 2) + grow))
      .attr('transform', at);
  ring(
    input.alike.filter((i) => left.has(i)),
    'alike',
    2.6,
  );
  ring(input.incumbents, 'incumbent', 4.5);
  ring(input.pinned, 'pinned', 4);
  input.pinned.forEach((i, rank) => {
    plot
      .append('text')
      .attr('class', 'pin-letter')
      .attr('transform', at(i))
      .attr('dx', rank % 4 < 2 ? 10 : -19)
      .attr('dy', rank % 2 === 0 ? -8 : 17)
      .text(letter(rank));
  });
  const disputed = input.dataset.designs.flatMap((_, i) => (isDisputed(input, i) ? [i] : []));
  ring(disputed, 'disputed', 5.5);
  if (input.open !== undefined) crosshair(plot, input, input.open, { x, y, frame: o });
}

function crosshair(plot: Root<SVGGElement>, input: TradeoffInput, open: number, { x, y, frame }: TradeoffScales): void {
  const [cx, cy] = [px(x(input.x.values[open] ?? 0)), px(y(input.y.values[open] ?? 0))];
  const gap = 13;
  const lines = `M${cx} ${frame.top - 6}V${cy - gap}M${cx} ${cy + gap}V${frame.height - frame.bottom}M${frame.left} ${cy}H${cx - gap}M${cx + gap} ${cy}H${frame.width - frame.right}`;
  if (open >= input.dataset.designs.length) missMark(plot, input, open, moved(cx, cy));
  const state = open >= input.dataset.designs.length ? ' missed' : '';
  plot.append('path').attr('class', `hair${state}`).attr('d', lines);
  plot.append('circle').attr('class', `open-ring${state}`).attr('cx', cx).attr('cy', cy).attr('r', gap);
}

/** A near miss is drawn only while it is open: its family's mark, hollow. */
function missMark(plot: Root<SVGGElement>, input: TradeoffInput, open: number, place: string): void {
  const look = lookOf(input.dataset.rows[open]?.family ?? '');
  plot
    .append('path')
    .attr('class', `miss-mark kind-${colourOf(look)}`)
    .attr('d', markPath(look, 5))
    .attr('fill-rule', 'evenodd')
    .attr('transform', place);
}

/** Whether a circuit simulation contradicts the model about this design. */
export function isDisputed({ dataset }: TradeoffInput, row: number): boolean {
  return dataset.remarks.get(row)?.includes(DISPUTED) === true;
}

/** Direction of a step on the screen, degrees. */
function angle(dx: number, dy: number): number {
  return (180 / Math.PI) * Math.atan2(dy, dx);
}

/** The moved design, tied to the open one; beyond the picture's edge an arrow points to it. */
function change(
  plot: Root<SVGGElement>,
  input: TradeoffInput,
  changed: readonly number[],
  { x, y, frame }: TradeoffScales,
): void {
  const names = input.dataset.objectives.map((objective) => objective.name);
  const [toX, toY] = [x(changed[names.indexOf(input.x.name)] ?? 0), y(changed[names.indexOf(input.y.name)] ?? 0)];
  const tx = Math.max(frame.left + 10, Math.min(frame.width - frame.right - 10, toX));
  const ty = Math.max(frame.top + 4, Math.min(frame.height - frame.bottom - 10, toY));
  const open = input.open ?? 0;
  const [fx, fy] = [x(input.x.values[open] ?? 0), y(input.y.values[open] ?? 0)];
  plot
    .append('path')
    .attr('class', 'moved-line')
    .attr('d', `M${px(fx)} ${px(fy)}L${px(tx)} ${px(ty)}`);
  const mark = plot.append('path').attr('class', 'moved-mark');
  if (tx === toX && ty === toY) mark.attr('d', 'M-7-7L7 7M7-7L-7 7').attr('transform', moved(tx, ty));
  else mark.attr('d', 'M-9-7L3 0L-9 7').attr('transform', `${moved(tx, ty)}rotate(${px(angle(toX - fx, toY - fy))})`);
}

/** A, B, C … for the designs side by side. */
export function letter(rank: number): string {
  return String.fromCharCode(65 + rank);
}
