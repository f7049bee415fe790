/** Currents and ripple over one switching period at one operating point, currents above ripples on the same time axis. */
import { line, scaleLinear } from 'd3';
import type { PointReport, Trace } from '../../model/assessment.ts';
import { spoken, titled } from '../labels.ts';
import { bottomAxis, canvasOf, type Frame, leftAxis, type Scale } from '../marks/axis.ts';
import { numbersTable } from '../marks/numbers.ts';
import { clear, px, type Root } from '../marks/root.ts';
import { axisUnit, loadWords, percent, show } from '../units.ts';

export const waveformsDefaults = { width: 560, left: 50, right: 14, top: 44, bottom: 26, panel: 88, foot: 18 };

export function renderWaveforms<E extends Element>(root: Root<E>, point: PointReport, o = waveformsDefaults): void {
  const groups = panelsOf(point.traces);
  const height = Math.max(1, groups.length) * (o.panel + o.top) + o.bottom + o.foot;
  const svg = canvasOf(clear(root), { ...o, height }, `Waveforms over one period at ${operatingPoint(point)}`);
  const period = Math.max(...point.traces.map((trace) => trace.period), 1e-12);
  const x = scaleLinear()
    .domain([0, period])
    .range([o.left, o.width - o.right]);
  groups.forEach((traces, row) => {
    const top = row * (o.panel + o.top) + o.top;
    const frame = { width: o.width, height: top + o.panel, left: o.left, right: o.right, top, bottom: 0 };
    panel(svg, traces, traces[0]?.unit ?? '', x, frame);
  });
  bottomAxis(
    svg,
    x,
    { ...o, height: height - o.foot, top: height - o.foot - o.bottom, bottom: o.bottom },
    { title: 'Time', unit: axisUnit('s', period), ticks: 6 },
  );
  numbers(root, point);
}

/** Currents share one panel; each ripple has its own, for one may be a hundredth of another. */
function panelsOf(traces: readonly Trace[]): readonly (readonly Trace[])[] {
  const currents = traces.filter(({ unit }) => unit === 'A');
  const others = traces.filter(({ unit }) => unit !== 'A').map((trace) => [trace]);
  return currents.length > 0 ? [currents, ...others] : others;
}

/** `12.8 V in, 50 % load, continuous`; `24 V in, 50 % load in reverse, reverse`. */
export function operatingPoint(point: PointReport): string {
  return `${show(point.inputVoltage, 'V')} in, ${loadWords(point.load)}, ${spoken(point.mode)}`;
}

function panel(svg: Root<SVGSVGElement>, traces: readonly Trace[], unit: string, x: Scale, frame: Frame): void {
  const whole = x.domain()[1] ?? 1;
  const all = traces.flatMap((trace) => trace.value);
  const [low, high] = [Math.min(...all), Math.max(...all)];
  const span = high - low || 1;
  const near = low > 0 && low < 1.5 * span ? 0 : low - 0.08 * span;
  const y = scaleLinear()
    .domain([near, high + 0.08 * span])
    .range([frame.height, frame.top]);
  leftAxis(svg, y, frame, { title: '', unit: axisUnit(unit, Math.max(Math.abs(low), Math.abs(high))), ticks: 3 });
  if (near < 0)
    svg
      .append('path')
      .attr('class', 'zero')
      .attr('d', `M${frame.left} ${px(y(0))}H${frame.width - frame.right}`);
  let at = { x: frame.left + 26, y: frame.top - 26 };
  traces.forEach((trace, i) => {
    svg
      .append('path')
      .attr('class', `line trace-${i % 4}`)
      .attr('d', pathOf(trace, whole, x, y));
    at = key(svg, trace.name, i, at, frame);
  });
}

interface Place {
  readonly x: number;
  readonly y: number;
}

/** A short stroke and the trace's name, on a second line where the first is full; returns where the next key starts. */
function key(svg: Root<SVGSVGElement>, name: string, i: number, from: Place, frame: Frame): Place {
  const words = titled(name);
  const width = 38 + 6.6 * words.length;
  const isFull = from.x + width > frame.width - frame.right + 14;
  const { x, y } = isFull ? { x: frame.left + 26, y: from.y + 15 } : from;
  svg
    .append('path')
    .attr('class', `line trace-${i % 4}`)
    .attr('d', `M${x} ${y}h18`);
  svg
    .append('text')
    .attr('class', 'line-name')
    .attr('x', x + 23)
    .attr('y', y)
    .attr('dy', '0.32em')
    .text(words);
  return { x: px(x + width), y };
}

/** The trace from 0 to the drawing's whole period: one that repeats sooner, as a summed current does, is drawn as often. */
function pathOf(trace: Trace, whole: number, x: (value: number) => number, y: (value: number) => number): string {
  const turns = Math.max(1, Math.round(whole / trace.period));
  const points: [number, number][] = [];
  for (let turn = 0; turn < turns; turn++) {
    trace.time.forEach((time, i) => {
      points.push([turn * trace.period + time, trace.value[i] ?? 0]);
    });
  }
  const first = points[0];
  if (first !== undefined) points.push([turns * trace.period + first[0], first[1]]);
  const inside = points.filter(([time]) => time <= whole * 1.0000001);
  return (
    line<[number, number]>(
      ([time]) => px(x(time)),
      ([, value]) => px(y(value)),
    )(inside) ?? ''
  );
}

function numbers<E extends Element>(root: Root<E>, point: PointReport): void {
  const rows = point.traces.flatMap((trace) =>
    trace.time.map((time, i) => [titled(trace.name), show(time, 's'), show(trace.value[i] ?? 0, trace.unit)]),
  );
  const facts = [
    ['Duty', percent(point.dutyCycle, 1)],
    ['Switching frequency', show(point.frequency, 'Hz')],
    ['Active phases', String(point.activePhases)],
    ['Current ripple per phase', show(point.rippleCurrent, 'A')],
    ['Peak and valley', `${show(point.peakCurrent, 'A')}, ${show(point.valleyCurrent, 'A')}`],
    ['Output ripple', show(point.outputRipple, 'V')],
    ['Input ripple', show(point.inputRipple, 'V')],
  ];
  const list = root.append('dl').attr('class', 'facts');
  for (const [name, value] of facts) {
    const pair = list.append('div');
    pair.append('dt').text(name ?? '');
    pair.append('dd').text(value ?? '');
  }
  numbersTable(
    root,
    { summary: 'Numbers', caption: 'Corner points of the waveforms' },
    ['Trace', 'Time', 'Value'],
    rows,
  );
}
