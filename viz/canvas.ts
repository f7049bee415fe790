/** The cloud as pixels: drawn once into a buffer wider than the window, then moved with the pan as one bitmap. */
import type { Cloud } from './data.ts';
import type { TradeoffScales } from './views/tradeoff-scales.ts';

/** Buffer over window, in each direction: how far a pan goes before it must be drawn again. */
const ROOM = 1.6;

/** The cloud behind the picture. */
export interface CloudLayer {
  /** Draws all points for these scales; once a gesture. */
  draw(scales: TradeoffScales): void;
  /** Draws the marks of `group` into the buffer too, so that a pan moves one bitmap and not thousands of shapes. */
  carry(group: SVGGElement): void;
  /** Shows the drawn buffer moved by `dx`, `dy` (px) and scaled by `k` about the picture's corner. */
  shift(dx: number, dy: number, k: number): void;
}

/** A layer on `canvas` for objectives number `kx` and `ky` of `cloud`; colours are read from the style each time. */
export function cloudLayer(canvas: HTMLCanvasElement, cloud: Cloud, axes: () => readonly [number, number]): CloudLayer {
  const buffer = canvas.ownerDocument.createElement('canvas');
  const pen = canvas.getContext('2d');
  const brush = buffer.getContext('2d', { willReadFrequently: true });
  let frame = { width: 1, height: 1, left: 0, top: 0, right: 0, bottom: 0 };
  let room = { x: 0, y: 0 };
  const shift = (dx: number, dy: number, k: number) => {
    if (pen === null) return;
    pen.setTransform(1, 0, 0, 1, 0, 0);
    pen.clearRect(0, 0, canvas.width, canvas.height);
    pen.beginPath();
    pen.rect(
      frame.left,
      frame.top - 6,
      frame.width - frame.left - frame.right,
      frame.height - frame.top - frame.bottom + 6,
    );
    pen.save();
    pen.clip();
    pen.setTransform(k, 0, 0, k, dx, dy);
    pen.drawImage(buffer, -room.x, -room.y);
    pen.restore();
  };
  return {
    draw: (scales) => {
      frame = scales.frame;
      canvas.width = Math.round(frame.width);
      canvas.height = Math.round(frame.height);
      buffer.width = Math.round(frame.width * ROOM);
      buffer.height = Math.round(frame.height * ROOM);
      room = { x: Math.round((buffer.width - canvas.width) / 2), y: Math.round((buffer.height - canvas.height) / 2) };
      if (brush !== null) fill(brush, buffer, cloud, scales, axes(), room);
      shift(0, 0, 1);
    },
    carry: (group) => {
      if (brush !== null) carryMarks(brush, group, room);
    },
    shift,
  };
}

interface Ink {
  readonly fill: string;
  readonly stroke: string;
  readonly width: number;
}

/** Paints the paths and circles of a drawing as the style shows them. */
function carryMarks(
  brush: CanvasRenderingContext2D,
  group: SVGGElement,
  room: { readonly x: number; readonly y: number },
): void {
  const inks = new Map<string, Ink>();
  for (const shape of group.querySelectorAll<SVGGraphicsElement>('path, circle')) {
    const key = `${shape.parentElement?.getAttribute('class')} ${shape.getAttribute('class')}`;
    const ink = inks.get(key) ?? inkOf(shape);
    inks.set(key, ink);
    const [x = 0, y = 0] =
      /translate\(([-\d.]+),([-\d.]+)/
        .exec(shape.getAttribute('transform') ?? '')
        ?.slice(1)
        .map(Number) ?? [];
    brush.setTransform(1, 0, 0, 1, x + room.x, y + room.y);
    const outline = outlineOf(shape);
    brush.fillStyle = ink.fill;
    brush.strokeStyle = ink.stroke;
    brush.lineWidth = ink.width;
    if (ink.fill !== 'none') brush.fill(outline, 'evenodd');
    if (ink.stroke !== 'none') brush.stroke(outline);
  }
  brush.setTransform(1, 0, 0, 1, 0, 0);
}

function inkOf(shape: SVGGraphicsElement): Ink {
  const style = shape.ownerDocument.defaultView?.getComputedStyle(shape);
  return {
    fill: style?.fill ?? 'none',
    stroke: style?.stroke ?? 'none',
    width: Number.parseFloat(style?.strokeWidth ?? '1'),
  };
}

function outlineOf(shape: SVGGraphicsElement): Path2D {
  const number = (name: string) => Number(shape.getAttribute(name) ?? 0);
  if (shape.localName === 'path') return new Path2D(shape.getAttribute('d') ?? '');
  const outline = new Path2D();
  outline.arc(number('cx'), number('cy'), number('r'), 0, 2 * Math.PI);
  return outline;
}

/** Every point as a square of two pixels whose ink adds up where points meet. */
function fill(
  brush: CanvasRenderingContext2D,
  buffer: HTMLCanvasElement,
  cloud: Cloud,
  { x, y }: TradeoffScales,
  [kx, ky]: readonly [number, number],
  room: { readonly x: number; readonly y: number },
): void {
  const image = brush.createImageData(buffer.width, buffer.height);
  const [red = 0, green = 0, blue = 0] = ink(buffer);
  const { data, width, height } = image;
  const count = cloud.family.length === 0 ? 1 : cloud.objectives.length / cloud.family.length;
  for (let i = 0; i < cloud.family.length; i++) {
    const column = Math.round(x(cloud.objectives[i * count + kx] ?? 0)) + room.x;
    const row = Math.round(y(cloud.objectives[i * count + ky] ?? 0)) + room.y;
    if (!(column >= 0 && row >= 0 && column < width - 1 && row < height - 1)) continue;
    for (const at of [
      row * width + column,
      row * width + column + 1,
      (row + 1) * width + column,
      (row + 1) * width + column + 1,
    ]) {
      data[4 * at] = red;
      data[4 * at + 1] = green;
      data[4 * at + 2] = blue;
      data[4 * at + 3] = Math.min(170, (data[4 * at + 3] ?? 0) + 60);
    }
  }
  brush.putImageData(image, 0, 0);
}

/** The style's ink for the cloud. */
function ink(element: Element): readonly number[] {
  const view = element.ownerDocument.defaultView;
  const colour = view?.getComputedStyle(element.ownerDocument.documentElement).getPropertyValue('--cloud').trim() ?? '';
  const hex = /^#([0-9a-f]{6})$/i.exec(colour)?.[1] ?? '808080';
  return [0, 2, 4].map((from) => Number.parseInt(hex.slice(from, from + 2), 16));
}
