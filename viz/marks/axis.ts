/** Axes in one engineering unit each: light grid, plain numbers, the unit once in the title. */
import type { ScaleContinuousNumeric } from 'd3';
import { type AxisUnit, digits } from '../units.ts';
import { moved, px, type Root } from './root.ts';

export type Scale = ScaleContinuousNumeric<number, number>;

/** Where a chart draws inside its box, px. */
export interface Frame {
  readonly width: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

export interface AxisOptions {
  readonly title: string;
  readonly unit: AxisUnit;
  /** About how many ticks. */
  readonly ticks: number;
}

/** An svg of `frame`'s size with a screen-reader name. */
export function canvasOf<E extends Element>(root: Root<E>, frame: Frame, name: string): Root<SVGSVGElement> {
  return root
    .append('svg')
    .attr('viewBox', `0 0 ${frame.width} ${frame.height}`)
    .attr('class', 'drawing')
    .attr('role', 'img')
    .attr('aria-label', name);
}

/** Draws the axis under the frame. */
export function bottomAxis(
  svg: Root<SVGSVGElement> | Root<SVGGElement>,
  scale: Scale,
  frame: Frame,
  options: AxisOptions,
): void {
  const base = frame.height - frame.bottom;
  const group = (svg as Root<SVGGElement>).append('g').attr('class', 'axis').attr('transform', moved(0, base));
  const ticks = ticksOf(scale, options);
  for (const tick of ticks) {
    const x = px(scale(tick));
    group
      .append('path')
      .attr('class', 'grid')
      .attr('d', `M${x} 0V${px(frame.top - base)}`);
    group
      .append('text')
      .attr('x', x)
      .attr('y', 16)
      .attr('text-anchor', 'middle')
      .text(written(tick, ticks, options.unit));
  }
  group
    .append('path')
    .attr('class', 'base')
    .attr('d', `M${frame.left} 0H${frame.width - frame.right}`);
  title(group, frame.width - frame.right, 33, 'end', options);
}

/** Draws the axis left of the frame, its title above the top tick. */
export function leftAxis(
  svg: Root<SVGSVGElement> | Root<SVGGElement>,
  scale: Scale,
  frame: Frame,
  options: AxisOptions,
): void {
  const group = (svg as Root<SVGGElement>).append('g').attr('class', 'axis').attr('transform', moved(frame.left, 0));
  const ticks = ticksOf(scale, options);
  for (const tick of ticks) {
    const y = px(scale(tick));
    group
      .append('path')
      .attr('class', 'grid')
      .attr('d', `M0 ${y}H${px(frame.width - frame.right - frame.left)}`);
    group
      .append('text')
      .attr('x', -7)
      .attr('y', y)
      .attr('dy', '0.32em')
      .attr('text-anchor', 'end')
      .text(written(tick, ticks, options.unit));
  }
  title(group, -frame.left + 2, frame.top - 10, 'start', options);
}

function title(
  group: Root<SVGGElement>,
  x: number,
  y: number,
  anchor: string,
  { title: words, unit }: AxisOptions,
): void {
  const text = group
    .append('text')
    .attr('class', 'title')
    .attr('x', x)
    .attr('y', y)
    .attr('text-anchor', anchor)
    .text(words);
  if (unit.label !== '') text.append('tspan').attr('class', 'unit').attr('dx', 5).text(unit.label);
}

/** Round values in the shown unit, inside the scale's domain; on a logarithmic scale at 1, 2 and 5. */
function ticksOf(scale: Scale, { unit, ticks }: Pick<AxisOptions, 'unit' | 'ticks'>): readonly number[] {
  const shown = scale.copy().domain(scale.domain().map((value) => (value - unit.offset) / unit.factor));
  const [low = 0, high = 1] = shown.domain();
  const all = shown.ticks(ticks).filter((tick) => tick >= low && tick <= high);
  const isLog = 'base' in scale;
  const chosen = isLog && all.length > ticks ? all.filter((tick) => '125'.includes(leading(tick))) : all;
  const few = isLog && chosen.length > 1.6 * ticks ? chosen.filter((tick) => leading(tick) === '1') : chosen;
  return few.map((tick) => tick * unit.factor + unit.offset);
}

function leading(value: number): string {
  return value.toExponential().charAt(0);
}

/** A tick in the axis' unit, with as many decimals as its neighbours need; far-apart values each with their own. */
function written(tick: number, ticks: readonly number[], unit: AxisUnit): string {
  const shown = (value: number) => Number(((value - unit.offset) / unit.factor).toPrecision(6));
  const places = Math.max(...ticks.map((one) => String(shown(one)).split('.')[1]?.length ?? 0));
  const isWide = Math.max(...ticks.map(Math.abs)) > 100 * Math.min(...ticks.map(Math.abs)) && !ticks.includes(0);
  return isWide ? digits(shown(tick)) : shown(tick).toFixed(Math.min(places, 6)).replace('-', '−');
}
