/** Zoom and pan of the picture: while the hand moves one bitmap moves, at its end the picture is drawn afresh. */
import { select, type ZoomTransform, zoom, zoomIdentity } from 'd3';
import type { CloudLayer } from './canvas.ts';
import type { Desk } from './desk.ts';
import type { Root } from './marks/root.ts';
import { pictureInput } from './paint-picture.ts';
import type { State } from './state.ts';
import { renderAxes } from './views/tradeoff.ts';
import type { TradeoffOptions, TradeoffScales } from './views/tradeoff-scales.ts';

export type Gesture = (name: 'closer' | 'further' | 'whole') => void;

/** Drag to pan, pinch or ctrl-wheel to zoom (a plain wheel scrolls the page); the window goes into the state at the end. */
export function zooming(
  svg: SVGSVGElement,
  desk: Desk,
  scales: () => TradeoffScales | undefined,
  options: () => TradeoffOptions,
  cloud: CloudLayer,
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
  cloud: CloudLayer,
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
