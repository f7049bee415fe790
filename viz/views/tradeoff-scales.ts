/** What the trade-off picture draws, its defaults, and its scales: shared by the picture and by what is laid over it. */
import { scaleLinear, scaleLog } from 'd3';
import type { Rail } from '../../model/rail/rail.ts';
import type { Cloud } from '../data.ts';
import type { Dataset, Quantity } from '../dataset.ts';
import type { Frame, Scale } from '../marks/axis.ts';

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
  /** Row of the open design; beyond the front's designs it is a near miss. */
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

/** The scales of the picture, for the live page's canvas, hover and zoom. */
export interface TradeoffScales {
  readonly x: Scale;
  readonly y: Scale;
  readonly frame: Frame;
}

/** Scales over the window, or over all designs with a little room around. */
export function tradeoffScales(input: TradeoffInput, options: TradeoffOptions = tradeoffDefaults): TradeoffScales {
  const [x0, x1, y0, y1] = input.window ?? [...roomy(input.x, input.open), ...roomy(input.y, input.open)];
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

/** Room around the front, and around an open near miss that may lie outside it. */
function roomy({ values, low: least, high: most, log }: Quantity, open: number | undefined): readonly [number, number] {
  if (!(most >= least)) return [0, 1];
  const own = values[open ?? 0] ?? least;
  const [low, high] = [Math.min(least, own), Math.max(most, own)];
  if (log) return [low / 1.12, high * 1.3];
  const span = high - low || Math.abs(high) || 1;
  return [low - 0.06 * span, high + 0.06 * span];
}

export function radiusOf(input: TradeoffInput, i: number, o: TradeoffOptions): number {
  if (input.third === undefined || input.as === 'shade') return o.radius;
  const area = o.smallest ** 2 + (o.largest ** 2 - o.smallest ** 2) * share(input.third, i);
  return Math.sqrt(area);
}

export function share(quantity: Quantity, i: number): number {
  return ((quantity.values[i] ?? quantity.low) - quantity.low) / (quantity.high - quantity.low || 1);
}
