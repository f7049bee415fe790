/** The trade-off picture: every design of the front on two objectives, the evaluated cloud behind it. */
import { scaleLinear, scaleLog } from 'd3';
import type { Rail } from '../../model/rail/rail.ts';
import { bandOf } from '../bands.ts';
import type { Cloud } from '../data.ts';
import type { Dataset, Quantity } from '../dataset.ts';
import { titled } from '../labels.ts';
import { bottomAxis, type Frame, leftAxis, type Scale } from '../marks/axis.ts';
import { colourOf, lookOf, markPath } from '../marks/mark.ts';
import { clear, moved, px, type Root } from '../marks/root.ts';
import { axisUnit } from '../units.ts';

/** What the picture shows. */
export interface TradeoffInput {
  readonly dataset: Dataset;
  readonly rail: Rail;
  readonly x: Quantity;
  readonly y: Quantity;
  readonly third?: Quantity | undefined;
  readonly as: 'size' | 'shade';
  readonly window?: readonly [number, number, number, number] | undefined;
  /** Indices of the designs that the ranges leave. */
  readonly kept: readonly number[];
  readonly open?: number | undefined;
  /** Designs that the model cannot tell from the open one. */
  readonly alike: readonly number[];
  readonly pinned: readonly number[];
  readonly incumbents: readonly number[];
  /** Objectives of the moved design, in the front's order. */
  readonly changed?: readonly number[] | undefined;
  /** Drawn as a coarse shade; the live page paints its points instead. */
  readonly cloud?: Cloud | undefined;
}

export const tradeoffDefaults = {
  width: 570,
  height: 390,
  left: 52,
  right: 14,
  top: 34,
  bottom: 42,
  /** Radius of a mark, px; with a third quantity as size, from the smallest to the largest. */
  radius: 4,
  smallest: 2.9,
  largest: 6.6,
  ticks: 8,
  /** Cells of the coarse cloud across and down. */
  across: 84,
  down: 52,
  /** Id of the clipping path; two pictures in one page need two. */
  clip: 'plot-clip',
};

/** The small picture beside the knobs. */
export const smallTradeoff: TradeoffOptions = {
  ...tradeoffDefaults,
  width: 400,
  height: 230,
  radius: 2.4,
  smallest: 1.9,
  largest: 4,
  ticks: 5,
  clip: 'small-clip',
};
export type TradeoffOptions = typeof tradeoffDefaults;

/** Shades of the third quantity, from the best value to the worst. */
export const SHADES = 6;

/** The scales of the picture, for the live page's canvas, hover and zoom. */
export interface TradeoffScales {
  readonly x: Scale;
  readonly y: Scale;
  readonly frame: Frame;
}

export function renderTradeoff(
  root: Root<SVGSVGElement>,
  input: TradeoffInput,
  options: TradeoffOptions = tradeoffDefaults,
): TradeoffScales {
  const scales = tradeoffScales(input, options);
  clear(root).attr('viewBox', `0 0 ${options.width} ${options.height}`);
  clip(root, options);
  if (input.cloud !== undefined) coarseCloud(root, input, input.cloud, scales, options);
  root.append('g').attr('class', 'axes');
  renderAxes(root, input, scales, options);
  const plot = root.append('g').attr('clip-path', `url(#${options.clip})`).append('g').attr('class', 'plot-marks');
  plot.append('g').attr('class', 'under');
  marks(plot, input, scales, options);
  plot.append('g').attr('class', 'over');
  renderOverlay(root, input, scales, options);
  return scales;
}

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

/** Scales over the window, or over all designs with a little room around. */
export function tradeoffScales(input: TradeoffInput, options: TradeoffOptions = tradeoffDefaults): TradeoffScales {
  const [x0, x1, y0, y1] = input.window ?? [...roomy(input.x), ...roomy(input.y)];
  return {
    x: scaleOf(input.x)
      .domain([x0, x1])
      .range([options.left, options.width - options.right]),
    y: scaleOf(input.y)
      .domain([y0, y1])
      .range([options.height - options.bottom, options.top]),
    frame: options,
  };
}

function scaleOf(quantity: Quantity): Scale {
  return quantity.log ? scaleLog() : scaleLinear();
}

function roomy({ low, high, log }: Quantity): readonly [number, number] {
  if (!(high >= low)) return [0, 1];
  if (log) return [low / 1.12, high * 1.3];
  const span = high - low || Math.abs(high) || 1;
  return [low - 0.06 * span, high + 0.06 * span];
}

function clip(root: Root<SVGSVGElement>, o: TradeoffOptions): void {
  root
    .append('clipPath')
    .attr('id', o.clip)
    .append('rect')
    .attr('x', o.left)
    .attr('y', o.top - 6)
    .attr('width', o.width - o.left - o.right)
    .attr('height', o.height - o.top - o.bottom + 6);
}

/** Redraws the axes alone, as during a pan. */
export function renderAxes(
  root: Root<SVGSVGElement>,
  input: TradeoffInput,
  { x, y }: Pick<TradeoffScales, 'x' | 'y' | 'frame'>,
  o: TradeoffOptions = tradeoffDefaults,
): void {
  const group = clear(root.select<SVGGElement>('g.axes') as unknown as Root<SVGGElement>);
  const unit = (q: Quantity, scale: Scale) => axisUnit(q.unit, Math.max(...scale.domain()) * 0.7);
  const ticks = Math.max(3, Math.round((o.ticks * o.width) / 570));
  bottomAxis(group, x, o, { title: titled(input.x.label), unit: unit(input.x, x), ticks });
  leftAxis(group, y, o, { title: titled(input.y.label), unit: unit(input.y, y), ticks: 7 });
}

function marks(plot: Root<SVGGElement>, input: TradeoffInput, scales: TradeoffScales, o: TradeoffOptions): void {
  const left = new Set(input.kept);
  const order = drawingOrder(input, left);
  plot
    .append('g')
    .attr('class', 'front')
    .selectAll('path')
    .data(order)
    .join('path')
    .attr('class', (i) => markClass(input, i, left.has(i)))
    .attr('d', (i) => markPath(lookOf(input.dataset.designs[i]?.family ?? ''), left.has(i) ? radiusOf(input, i, o) : 2))
    .attr('fill-rule', 'evenodd')
    .attr('transform', (i) => moved(scales.x(input.x.values[i] ?? 0), scales.y(input.y.values[i] ?? 0)));
}

/** Excluded marks first, then large ones before small ones, so that none is buried. */
function drawingOrder(input: TradeoffInput, left: ReadonlySet<number>): readonly number[] {
  const all = input.dataset.designs.map((_, i) => i);
  const size = (i: number) => (input.as === 'size' ? (input.third?.values[i] ?? 0) : 0);
  return all.sort((a, b) => Number(left.has(a)) - Number(left.has(b)) || size(b) - size(a) || a - b);
}

function markClass(input: TradeoffInput, i: number, isLeft: boolean): string {
  if (!isLeft) return 'mark out';
  const kind = colourOf(lookOf(input.dataset.designs[i]?.family ?? ''));
  if (input.third === undefined || input.as === 'size') return `mark kind-${kind}`;
  return `mark shade-${Math.min(SHADES - 1, Math.floor(share(input.third, i) * SHADES))}`;
}

function radiusOf(input: TradeoffInput, i: number, o: TradeoffOptions): number {
  if (input.third === undefined || input.as === 'shade') return o.radius;
  const area = o.smallest ** 2 + (o.largest ** 2 - o.smallest ** 2) * share(input.third, i);
  return Math.sqrt(area);
}

function share(quantity: Quantity, i: number): number {
  return ((quantity.values[i] ?? quantity.low) - quantity.low) / (quantity.high - quantity.low || 1);
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
  if (input.open !== undefined) crosshair(plot, input, input.open, { x, y, frame: o });
}

function crosshair(plot: Root<SVGGElement>, input: TradeoffInput, open: number, { x, y, frame }: TradeoffScales): void {
  const [cx, cy] = [px(x(input.x.values[open] ?? 0)), px(y(input.y.values[open] ?? 0))];
  const gap = 13;
  const lines = `M${cx} ${frame.top - 6}V${cy - gap}M${cx} ${cy + gap}V${frame.height - frame.bottom}M${frame.left} ${cy}H${cx - gap}M${cx + gap} ${cy}H${frame.width - frame.right}`;
  plot.append('path').attr('class', 'hair').attr('d', lines);
  plot.append('circle').attr('class', 'open-ring').attr('cx', cx).attr('cy', cy).attr('r', gap);
}

/** The moved design, tied to the open one. */
function change(
  plot: Root<SVGGElement>,
  input: TradeoffInput,
  changed: readonly number[],
  { x, y }: TradeoffScales,
): void {
  const names = input.dataset.objectives.map((objective) => objective.name);
  const [tx, ty] = [x(changed[names.indexOf(input.x.name)] ?? 0), y(changed[names.indexOf(input.y.name)] ?? 0)];
  const open = input.open ?? 0;
  const [fx, fy] = [x(input.x.values[open] ?? 0), y(input.y.values[open] ?? 0)];
  plot
    .append('path')
    .attr('class', 'moved-line')
    .attr('d', `M${px(fx)} ${px(fy)}L${px(tx)} ${px(ty)}`);
  plot.append('path').attr('class', 'moved-mark').attr('d', 'M-7-7L7 7M7-7L-7 7').attr('transform', moved(tx, ty));
}

/** Counts of the cloud in cells, in three shades. */
function coarseCloud(
  root: Root<SVGSVGElement>,
  input: TradeoffInput,
  cloud: Cloud,
  { x, y, frame }: TradeoffScales,
  o: TradeoffOptions,
): void {
  const names = input.dataset.objectives.map((objective) => objective.name);
  const [kx, ky, count] = [names.indexOf(input.x.name), names.indexOf(input.y.name), names.length];
  const cell = {
    w: (frame.width - frame.left - frame.right) / o.across,
    h: (frame.height - frame.top - frame.bottom) / o.down,
  };
  const counts = new Uint32Array(o.across * o.down);
  for (let i = 0; i < cloud.family.length; i++) {
    const column = Math.floor((x(cloud.objectives[i * count + kx] ?? 0) - frame.left) / cell.w);
    const row = Math.floor((y(cloud.objectives[i * count + ky] ?? 0) - frame.top) / cell.h);
    if (column < 0 || row < 0 || column >= o.across || row >= o.down) continue;
    counts[row * o.across + column] = (counts[row * o.across + column] ?? 0) + 1;
  }
  const group = root.append('g').attr('class', 'cloud-cells');
  for (const level of [1, 2, 3]) {
    const d = cellPath(counts, level, o.across, cell, frame);
    if (d !== '') group.append('path').attr('class', `level-${level}`).attr('d', d);
  }
}

function cellPath(
  counts: Uint32Array,
  level: number,
  across: number,
  cell: { w: number; h: number },
  frame: Frame,
): string {
  let d = '';
  counts.forEach((count, i) => {
    const mine = count === 0 ? 0 : count < 4 ? 1 : count < 16 ? 2 : 3;
    if (mine !== level) return;
    d += `M${px(frame.left + (i % across) * cell.w)} ${px(frame.top + Math.floor(i / across) * cell.h)}h${px(cell.w - 1)}v${px(cell.h - 1)}h${px(1 - cell.w)}Z`;
  });
  return d;
}

/** A, B, C … for the designs side by side. */
export function letter(rank: number): string {
  return String.fromCharCode(65 + rank);
}
