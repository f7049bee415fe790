/** The evaluated cloud as counts in cells, for where no script runs and for paper. */
import type { Cloud } from '../data.ts';
import type { Frame } from '../marks/axis.ts';
import { px, type Root } from '../marks/root.ts';
import type { TradeoffInput, TradeoffOptions, TradeoffScales } from './tradeoff-scales.ts';

/** Counts of the cloud in cells, in three shades. */
export function coarseCloud(
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
