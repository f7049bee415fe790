/**
 * Efficiency against load at the lowest, usual and highest input, over the time the profile spends at each load. A load below
 * zero is power that flows from the output back to the input.
 */
import { line, scaleLinear } from 'd3';
import type { Assessment } from '../../model/assessment.ts';
import type { Rail } from '../../model/rail/rail.ts';
import { bottomAxis, canvasOf, leftAxis } from '../marks/axis.ts';
import { numbersTable } from '../marks/numbers.ts';
import { clear, px, type Root } from '../marks/root.ts';
import { percent, show } from '../units.ts';

export const efficiencyDefaults = {
  width: 560,
  height: 260,
  left: 44,
  right: 64,
  top: 30,
  bottom: 42,
  /** The axis starts no lower than this, so that light load does not flatten the rest. */
  floor: 0.5,
};

type Curve = Assessment['efficiencyCurves'][number];

export function renderEfficiency<E extends Element>(
  root: Root<E>,
  design: Assessment,
  rail: Rail,
  o = efficiencyDefaults,
): void {
  const curves = design.efficiencyCurves;
  const least = Math.min(
    ...curves.flatMap((curve) => curve.efficiency.filter((_, i) => Math.abs(curve.load[i] ?? 0) >= 0.1)),
    0.95,
  );
  const loads = [...curves.flatMap((curve) => curve.load), ...rail.profile.map((point) => point.fraction)];
  const x = scaleLinear()
    .domain([Math.min(0, ...loads), Math.max(1, ...loads)])
    .range([o.left, o.width - o.right]);
  const y = scaleLinear()
    .domain([Math.max(o.floor, Math.floor(least * 20) / 20), 1])
    .range([o.height - o.bottom, o.top]);
  const svg = canvasOf(clear(root), o, 'Efficiency against load at three input voltages');
  const unit = { label: '%', factor: 0.01, offset: 0 };
  bottomAxis(svg, x, o, { title: 'Load', unit, ticks: 5 });
  leftAxis(svg, y, o, { title: 'Efficiency', unit, ticks: 5 });
  time(svg, rail, x, o);
  if ((x.domain()[0] ?? 0) < 0) directions(svg, x, o);
  const labels = spread(
    curves.map((curve) => y(Math.max(y.domain()[0] ?? 0, last(curve)))),
    13,
  );
  curves.forEach((curve, i) => {
    svg
      .append('path')
      .attr('class', `line input-${i}`)
      .attr('d', pathOf(curve, -1, x, y) + pathOf(curve, 1, x, y));
    svg
      .append('text')
      .attr('class', 'line-name')
      .attr('x', o.width - o.right + 6)
      .attr('y', px(labels[i] ?? 0))
      .attr('dy', '0.32em')
      .text(show(curve.inputVoltage, 'V'));
  });
  root
    .append('p')
    .attr('class', 'note')
    .text('Grey bars on the axis: the share of its time that the rail spends at each load.');
  numbers(root, curves);
}

function last(curve: Curve): number {
  return curve.efficiency[curve.efficiency.length - 1] ?? 0;
}

/** The curve on one side of no load: between the two directions there is none. */
function pathOf(
  curve: Curve,
  side: -1 | 1,
  x: (value: number) => number,
  y: { (value: number): number; domain(): number[] },
): string {
  const floor = y.domain()[0] ?? 0;
  const points = curve.load
    .map((load, i) => ({ load, efficiency: curve.efficiency[i] ?? 0 }))
    .filter((point) => Math.sign(point.load) === side && point.efficiency >= floor);
  return (
    line<{ load: number; efficiency: number }>(
      (point) => px(x(point.load)),
      (point) => px(y(point.efficiency)),
    )(points) ?? ''
  );
}

/** Which way power flows, left and right of no load. */
function directions(svg: Root<SVGSVGElement>, x: (value: number) => number, o: typeof efficiencyDefaults): void {
  const zero = px(x(0));
  svg
    .append('path')
    .attr('class', 'zero')
    .attr('d', `M${zero} ${o.top}V${o.height - o.bottom}`);
  for (const [words, anchor, dx] of [
    ['← to the input', 'end', -8],
    ['to the output →', 'start', 8],
  ] as const)
    svg
      .append('text')
      .attr('class', 'line-name')
      .attr('x', zero + dx)
      .attr('y', o.top - 10)
      .attr('text-anchor', anchor)
      .text(words);
}

/** Share of time at each load as bars that stand on the axis. */
function time(svg: Root<SVGSVGElement>, rail: Rail, x: (value: number) => number, o: typeof efficiencyDefaults): void {
  for (const point of rail.profile) {
    const height = 0.28 * (o.height - o.top - o.bottom) * point.share;
    svg
      .append('rect')
      .attr('class', 'time-share')
      .attr('x', px(x(point.fraction) - 3))
      .attr('y', px(o.height - o.bottom - height))
      .attr('width', 6)
      .attr('height', px(height));
  }
}

/** Label positions at least `gap` apart, in the order given by height. */
function spread(heights: readonly number[], gap: number): readonly number[] {
  const order = heights.map((height, i) => ({ height, i })).sort((a, b) => a.height - b.height);
  const placed = [...heights];
  let previous = Number.NEGATIVE_INFINITY;
  for (const { height, i } of order) {
    previous = Math.max(height, previous + gap);
    placed[i] = previous;
  }
  return placed;
}

function numbers<E extends Element>(root: Root<E>, curves: readonly Curve[]): void {
  const first = curves[0];
  if (first === undefined) return;
  const rows = first.load.map((load, i) => [
    percent(load, 0),
    ...curves.map((curve) => percent(curve.efficiency[i] ?? Number.NaN, 2)),
  ]);
  numbersTable(
    root,
    {
      summary: 'Numbers',
      caption: isTwoWay(curves) ? 'Efficiency over load; below zero, back to the input' : 'Efficiency over load',
    },
    ['Load', ...curves.map((curve) => `at ${show(curve.inputVoltage, 'V')}`)],
    rows,
  );
}

function isTwoWay(curves: readonly Curve[]): boolean {
  return curves.some((curve) => curve.load.some((load) => load < 0));
}
