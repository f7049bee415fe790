/** The live picture: hover, select, walk by keyboard, zoom and pan, and the cloud behind it. */
import { Delaunay, select, type ZoomTransform, zoom, zoomIdentity } from 'd3';
import { cloudLayer } from './canvas.ts';
import type { Root } from './marks/root.ts';
import { paintMoved, paintOverlay, paintPicture, pictureInput } from './paint.ts';
import type { Desk } from './start.ts';
import { opened, togglePin } from './start.ts';
import type { State } from './state.ts';
import { designWords } from './views/picture-words.ts';
import { renderAxes, type TradeoffOptions, type TradeoffScales, tradeoffDefaults } from './views/tradeoff.ts';

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

function need(document: Document, id: string): HTMLElement {
  const element = document.getElementById(id);
  if (element === null) throw new Error(`the page has no place called ${id}`);
  return element;
}

/** The picture at the box's own size, so that text keeps its size on every screen. */
function sized(box: HTMLElement): TradeoffOptions {
  const width = Math.max(280, Math.round(box.clientWidth));
  const height = Math.max(260, Math.round(box.clientHeight));
  return { ...tradeoffDefaults, width, height };
}

function at(desk: Desk, { x, y }: TradeoffScales, index: number): readonly [number, number] {
  const { dataset } = desk.bench;
  const { state } = desk.scene();
  const value = (name: string) => dataset.byKey.get(`o.${name}`)?.values[index] ?? 0;
  return [x(value(state.x)), y(value(state.y))];
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

type Finder = (x: number, y: number) => number | undefined;

function hover(
  document: Document,
  box: HTMLElement,
  desk: Desk,
  nearest: Finder,
  scales: () => TradeoffScales | undefined,
): void {
  const card = need(document, 'hover');
  let shown: number | undefined;
  const place = (event: PointerEvent | MouseEvent): readonly [number, number] => {
    const bounds = box.getBoundingClientRect();
    return [event.clientX - bounds.left, event.clientY - bounds.top];
  };
  const hide = () => {
    shown = undefined;
    card.hidden = true;
  };
  box.addEventListener('pointermove', (event) => {
    if (event.buttons > 0) return hide();
    const index = nearest(...place(event));
    const drawn = scales();
    if (index === undefined || drawn === undefined) return hide();
    if (index === shown) return;
    shown = index;
    fillCard(card, designWords(desk.bench.dataset, index));
    const [x, y] = at(desk, drawn, index);
    const isLeft = x > drawn.frame.width * 0.6;
    card.style.transform = `translate(${box.offsetLeft + x + (isLeft ? -14 : 14)}px, ${box.offsetTop + y}px) translate(${isLeft ? '-100%' : '0'}, -50%)`;
    card.hidden = false;
  });
  box.addEventListener('pointerleave', hide);
  box.addEventListener('click', (event) => {
    const index = nearest(...place(event));
    if (index !== undefined) desk.set(opened(desk.bench.dataset.designs[index]?.id ?? ''));
  });
}

function fillCard(card: HTMLElement, words: readonly string[]): void {
  card.replaceChildren(
    ...words.map((word, i) => {
      const line = card.ownerDocument.createElement(i === 0 ? 'strong' : 'span');
      line.textContent = word;
      return line;
    }),
  );
}

type Gesture = (name: 'closer' | 'further' | 'whole') => void;

/** Drag to pan, pinch or ctrl-wheel to zoom (a plain wheel scrolls the page); the window goes into the state at the end. */
function zooming(
  svg: SVGSVGElement,
  desk: Desk,
  scales: () => TradeoffScales | undefined,
  options: () => TradeoffOptions,
  cloud: ReturnType<typeof cloudLayer>,
): Gesture {
  const root = select(svg);
  const behaviour = zoom<SVGSVGElement, unknown>()
    .scaleExtent([0.2, 40])
    .filter((event: Event) => allowed(event))
    .on('zoom', (event: { transform: ZoomTransform; sourceEvent: unknown }) => {
      if (event.sourceEvent !== null && event.sourceEvent !== undefined)
        preview(svg, desk, scales(), options(), cloud, event.transform);
    })
    .on('end', (event: { transform: ZoomTransform; sourceEvent: unknown }) => {
      if (event.sourceEvent !== null && event.sourceEvent !== undefined)
        settle(svg, desk, scales(), event.transform, behaviour.transform);
    });
  root.call(behaviour).on('dblclick.zoom', null);
  return (name) => {
    const drawn = scales();
    if (name === 'whole') desk.set({ window: undefined });
    else if (drawn !== undefined) {
      const k = name === 'closer' ? 1.5 : 1 / 1.5;
      const { width, height } = drawn.frame;
      desk.set({
        window: windowOf(drawn, zoomIdentity.translate((width / 2) * (1 - k), (height / 2) * (1 - k)).scale(k)),
      });
    }
  };
}

function allowed(event: Event): boolean {
  if (event.type === 'wheel') return (event as WheelEvent).ctrlKey || (event as WheelEvent).metaKey;
  if (event.type === 'touchstart') return (event as TouchEvent).touches.length > 1;
  return (event as MouseEvent).button === 0;
}

/** Moves what is drawn, and redraws only the axes. */
function preview(
  svg: SVGSVGElement,
  desk: Desk,
  drawn: TradeoffScales | undefined,
  options: TradeoffOptions,
  cloud: ReturnType<typeof cloudLayer>,
  transform: ZoomTransform,
): void {
  const input = pictureInput(desk.bench, desk.scene(), false);
  if (drawn === undefined || input === undefined) return;
  const root = select<SVGSVGElement, unknown>(svg) as unknown as Root<SVGSVGElement>;
  const x = drawn.x
    .copy()
    .domain(
      [transform.invertX(drawn.x.range()[0] ?? 0), transform.invertX(drawn.x.range()[1] ?? 1)].map((px) =>
        drawn.x.invert(px),
      ),
    );
  const y = drawn.y
    .copy()
    .domain(
      [transform.invertY(drawn.y.range()[0] ?? 0), transform.invertY(drawn.y.range()[1] ?? 1)].map((px) =>
        drawn.y.invert(px),
      ),
    );
  const marks = root.select<SVGGElement>('g.plot-marks');
  const group = marks.node();
  if (group !== null && marks.attr('display') === null) {
    cloud.carry(group);
    marks.attr('display', 'none');
  }
  renderAxes(root, input, { x, y, frame: drawn.frame }, options);
  cloud.shift(transform.x, transform.y, transform.k);
}

/** Takes the gesture into the state: the picture is drawn afresh in its new window. */
function settle(
  svg: SVGSVGElement,
  desk: Desk,
  drawn: TradeoffScales | undefined,
  transform: ZoomTransform,
  reset: (selection: ReturnType<typeof select<SVGSVGElement, unknown>>, transform: ZoomTransform) => void,
): void {
  if (drawn === undefined || (transform.k === 1 && transform.x === 0 && transform.y === 0)) {
    select(svg).select('g.plot-marks').attr('display', null);
    return;
  }
  const window = windowOf(drawn, transform);
  reset(select<SVGSVGElement, unknown>(svg), zoomIdentity);
  desk.set({ window });
}

function windowOf({ x, y, frame }: TradeoffScales, transform: ZoomTransform): NonNullable<State['window']> {
  const back = (value: number) => Number(value.toPrecision(6));
  const [left, right] = [transform.invertX(frame.left), transform.invertX(frame.width - frame.right)];
  const [top, bottom] = [transform.invertY(frame.top), transform.invertY(frame.height - frame.bottom)];
  return [back(x.invert(left)), back(x.invert(right)), back(y.invert(bottom)), back(y.invert(top))];
}

/** Arrow keys walk along an axis, P pins, + − 0 zoom. */
function keys(box: HTMLElement, desk: Desk, gestures: Gesture): void {
  box.addEventListener('keydown', (event) => {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const isDone = walk(desk, event.key) || press(desk, gestures, event.key);
    if (isDone) event.preventDefault();
  });
}

function press(desk: Desk, gestures: Gesture, key: string): boolean {
  const zooms: Readonly<Record<string, 'closer' | 'further' | 'whole'>> = {
    '+': 'closer',
    '=': 'closer',
    '-': 'further',
    '0': 'whole',
  };
  const gesture = zooms[key];
  if (gesture !== undefined) gestures(gesture);
  else if (key === 'p' || key === 'P') togglePin(desk, desk.scene().state.open);
  else return false;
  return true;
}

function walk(desk: Desk, key: string): boolean {
  const { state, kept, open } = desk.scene();
  const isAcross = ['ArrowLeft', 'ArrowRight', 'Home', 'End'].includes(key);
  if (!isAcross && key !== 'ArrowUp' && key !== 'ArrowDown') return false;
  const values = desk.bench.dataset.byKey.get(`o.${isAcross ? state.x : state.y}`)?.values;
  if (values === undefined || kept.length === 0) return true;
  const order = [...kept].sort((a, b) => (values[a] ?? 0) - (values[b] ?? 0) || a - b);
  const here = open === undefined ? -1 : order.indexOf(open);
  const step = key === 'ArrowRight' || key === 'ArrowUp' ? 1 : -1;
  const from = here >= 0 ? here + step : nearestRank(order, values, values[open ?? 0] ?? 0);
  const place = key === 'Home' ? 0 : key === 'End' ? order.length - 1 : from;
  const next = order[Math.max(0, Math.min(order.length - 1, place))];
  if (next !== undefined && next !== open) desk.set(opened(desk.bench.dataset.designs[next]?.id ?? ''));
  return true;
}

function nearestRank(order: readonly number[], values: Float64Array, value: number): number {
  const after = order.findIndex((i) => (values[i] ?? 0) >= value);
  return after < 0 ? order.length - 1 : after;
}
