/** The live picture: drawn at its own size, with pointer, keyboard, zoom and the cloud behind it. */
import { Delaunay } from 'd3';
import { cloudLayer } from './canvas.ts';
import { type Desk, need } from './desk.ts';
import { at, hover } from './hovering.ts';
import { paintMoved, paintOverlay, paintPicture } from './paint-picture.ts';
import { type TradeoffOptions, type TradeoffScales, tradeoffDefaults } from './views/tradeoff-scales.ts';
import { keys } from './walking.ts';
import { zooming } from './zooming.ts';

/** What a state change asks of the picture. */
export interface Picture {
  /** Everything: axes, marks, cloud. */
  redraw(): void;
  /** Only what follows the open, pinned and moved designs. */
  overlay(): void;
  /** Only the moved design. */
  moved(): void;
}

/** Widest distance from pointer to mark that still means the mark, px. */
const REACH = 28;

export function attachPicture(document: Document, desk: Desk): Picture {
  const box = need(document, 'picture');
  const svg = box.querySelector('svg');
  const canvas = box.querySelector('canvas');
  if (svg === null || canvas === null) throw new Error('the picture has lost its drawing');
  const { data, known } = desk.bench;
  const axes = () =>
    [known.objectives.indexOf(desk.scene().state.x), known.objectives.indexOf(desk.scene().state.y)] as const;
  const cloud = cloudLayer(canvas, data.cloud, axes);
  let options = sized(box);
  let scales: TradeoffScales | undefined;
  let finder: Delaunay<number> | undefined;
  const draw = () => {
    options = sized(box);
    scales = paintPicture(document, desk.bench, desk.scene(), false, options);
    if (scales === undefined) return;
    cloud.draw(scales);
    finder = finderOf(desk, scales);
  };
  const nearest = (x: number, y: number): number | undefined => {
    const { kept } = desk.scene();
    if (finder === undefined || scales === undefined || kept.length === 0) return undefined;
    const index = kept[finder.find(x, y)];
    if (index === undefined) return undefined;
    const [px, py] = at(desk, scales, index);
    return Math.hypot(px - x, py - y) <= REACH ? index : undefined;
  };
  draw();
  hover(document, box, desk, nearest, () => scales);
  const gestures = zooming(
    svg,
    desk,
    () => scales,
    () => options,
    cloud,
  );
  keys(box, desk, gestures);
  new ResizeObserver(() => {
    const next = sized(box);
    if (next.width !== options.width || next.height !== options.height) draw();
  }).observe(box);
  document.defaultView?.matchMedia('(prefers-color-scheme: dark)').addEventListener('change', draw);
  for (const name of ['closer', 'further', 'whole'] as const) {
    document.querySelector(`[data-act=${name}]`)?.addEventListener('click', () => gestures(name));
  }
  return {
    redraw: draw,
    overlay: () => {
      if (scales !== undefined) paintOverlay(document, desk.bench, desk.scene(), scales, options);
    },
    moved: () => {
      if (scales !== undefined) paintMoved(document, desk.bench, desk.scene(), scales);
    },
  };
}

/** The picture at the box's own size, so that text keeps its size on every screen. */
function sized(box: HTMLElement): TradeoffOptions {
  const width = Math.max(280, Math.round(box.clientWidth));
  const height = Math.max(260, Math.round(box.clientHeight));
  return { ...tradeoffDefaults, width, height };
}

function finderOf(desk: Desk, scales: TradeoffScales): Delaunay<number> | undefined {
  const { kept } = desk.scene();
  if (kept.length === 0) return undefined;
  return Delaunay.from(
    [...kept],
    (i) => at(desk, scales, i)[0],
    (i) => at(desk, scales, i)[1],
  );
}
