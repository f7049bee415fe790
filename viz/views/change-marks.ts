/** Two fronts in one picture: what both have, what was gained, what was lost, and how far designs of both moved. */
import { scaleLinear } from 'd3';
import type { Change, Comparison } from '../compare-data.ts';
import { titled } from '../labels.ts';
import { bottomAxis, canvasOf, leftAxis, type Scale } from '../marks/axis.ts';
import { px, type Root } from '../marks/root.ts';
import { axisUnit } from '../units.ts';

const changesDefaults = { width: 420, height: 320, left: 52, right: 14, top: 30, bottom: 42, radius: 3.6 };

type Options = typeof changesDefaults;
type Objective = Comparison['objectives'][number];

/** Draws objectives number `cx` and `cy` of every change; told apart by shape, not by colour alone. */
export function renderChanges<E extends Element>(
  root: Root<E>,
  comparison: Comparison,
  cx: number,
  cy: number,
  o: Options = changesDefaults,
): void {
  const [across, up] = [comparison.objectives[cx], comparison.objectives[cy]];
  const { kept, moved, gained, lost } = comparison;
  const all = [...kept, ...lost, ...moved, ...gained];
  if (across === undefined || up === undefined) return;
  const svg = canvasOf(
    root,
    o,
    `${titled(up.name)} against ${titled(across.name)}: designs kept, moved, gained and lost`,
  );
  const x = scaleOf(all, cx).range([o.left, o.width - o.right]);
  const y = scaleOf(all, cy).range([o.height - o.bottom, o.top]);
  bottomAxis(svg, x, o, { title: titled(across.name), unit: unitOf(across, x), ticks: 6 });
  leftAxis(svg, y, o, { title: titled(up.name), unit: unitOf(up, y), ticks: 6 });
  const at = (figures: readonly number[] | undefined): readonly [number, number] => [
    px(x(figures?.[cx] ?? Number.NaN)),
    px(y(figures?.[cy] ?? Number.NaN)),
  ];
  for (const change of kept) mark(svg, 'kept', at(change.after), o.radius);
  for (const change of moved) trail(svg, at(change.before), at(change.after));
  for (const change of lost) mark(svg, 'lost', at(change.before), o.radius);
  for (const change of moved) mark(svg, 'moved', at(change.after), o.radius);
  for (const change of gained) mark(svg, 'gained', at(change.after), o.radius);
}

/** The same mark by itself, for the legend. */
export function renderChangeMark<E extends Element>(root: Root<E>, change: Change['change']): void {
  const svg = root
    .append('svg')
    .attr('class', 'change-sample')
    .attr('viewBox', '-7 -7 14 14')
    .attr('aria-hidden', 'true')
    .attr('focusable', 'false');
  mark(svg, change, [0, 0], 4.5);
}

function mark(svg: Root<SVGSVGElement>, change: Change['change'], [x, y]: readonly [number, number], r: number): void {
  svg
    .append('path')
    .attr('class', `change ${change}`)
    .attr('transform', `translate(${x},${y})`)
    .attr('d', outline(change, r));
}

/** Kept: small disc; gained: triangle; lost: open ring; moved: diamond. */
function outline(change: Change['change'], r: number): string {
  if (change === 'gained') return `M0 ${px(-1.3 * r)}L${px(1.2 * r)} ${px(0.9 * r)}H${px(-1.2 * r)}Z`;
  if (change === 'moved') return `M0 ${px(-1.3 * r)}L${px(1.3 * r)} 0L0 ${px(1.3 * r)}L${px(-1.3 * r)} 0Z`;
  const size = change === 'kept' ? px(0.7 * r) : px(r);
  return `M${-size} 0a${size} ${size} 0 1 1 ${2 * size} 0a${size} ${size} 0 1 1 ${-2 * size} 0Z`;
}

function trail(svg: Root<SVGSVGElement>, from: readonly [number, number], to: readonly [number, number]): void {
  svg.append('path').attr('class', 'change-trail').attr('d', `M${from[0]} ${from[1]}L${to[0]} ${to[1]}`);
}

/** Over every figure that is drawn; what one side lacks is not. */
function scaleOf(changes: readonly Change[], c: number): Scale {
  const drawn = changes.flatMap((one) =>
    one.change === 'gained' ? [one.after] : one.change === 'lost' ? [one.before] : [one.before, one.after],
  );
  const values = drawn.flatMap((figures) => figures?.[c] ?? []);
  const low = values.reduce((least, value) => Math.min(least, value), Number.POSITIVE_INFINITY);
  const high = values.reduce((most, value) => Math.max(most, value), Number.NEGATIVE_INFINITY);
  if (!(high >= low)) return scaleLinear().domain([0, 1]);
  const room = 0.05 * (high - low || Math.abs(high) || 1);
  return scaleLinear().domain([low - room, high + room]);
}

function unitOf({ unit }: Objective, scale: Scale) {
  return axisUnit(unit, 0.7 * Math.max(...scale.domain()));
}
