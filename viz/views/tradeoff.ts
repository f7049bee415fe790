/** The trade-off picture: every design of the front on two objectives, the evaluated cloud behind it. */
import type { Quantity } from '../dataset.ts';
import { titled } from '../labels.ts';
import { bottomAxis, leftAxis, type Scale } from '../marks/axis.ts';
import { colourOf, lookOf, markPath } from '../marks/mark.ts';
import { clear, moved, type Root } from '../marks/root.ts';
import { axisUnit } from '../units.ts';
import { coarseCloud } from './cloud-cells.ts';
import { renderOverlay } from './overlay.ts';
import {
  radiusOf,
  share,
  type TradeoffInput,
  type TradeoffOptions,
  type TradeoffScales,
  tradeoffDefaults,
  tradeoffScales,
} from './tradeoff-scales.ts';

/** Shades of the third quantity, from the best value to the worst. */
const SHADES = 6;

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
