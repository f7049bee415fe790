/**
 * A screenshot with few colours: the same pixels through a palette, which makes the file a third as large. PNG as in its
 * specification (ISO/IEC 15948): eight bits a sample, not interlaced, as browsers write it.
 */
import { crc32, deflateSync, inflateSync } from 'node:zlib';

const SIGNATURE = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);
const MOST = 128;

interface Pixels {
  readonly width: number;
  readonly height: number;
  /** 0xRRGGBB of each pixel, row by row. */
  readonly rgb: Uint32Array;
}

/** `png` with at most 128 colours; transparency is dropped. Throws an `Error` where it is no such file. */
export function smallPng(png: Buffer): Buffer {
  const { width, height, rgb } = decoded(png);
  const { palette, places } = paletteOf(rgb);
  const rows = Buffer.alloc(height * (width + 1));
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) rows[y * (width + 1) + 1 + x] = places.get(rgb[y * width + x] ?? 0) ?? 0;
  }
  const header = Buffer.alloc(13);
  header.writeUInt32BE(width, 0);
  header.writeUInt32BE(height, 4);
  header.set([8, 3, 0, 0, 0], 8);
  const colours = Buffer.from(palette.flatMap((colour) => [colour >> 16, (colour >> 8) & 255, colour & 255]));
  return Buffer.concat([
    SIGNATURE,
    chunk('IHDR', header),
    chunk('PLTE', colours),
    chunk('IDAT', deflateSync(rows, { level: 9, memLevel: 9 })),
    chunk('IEND', Buffer.alloc(0)),
  ]);
}

function chunk(type: string, data: Buffer): Buffer {
  const body = Buffer.concat([Buffer.from(type, 'latin1'), data]);
  const length = Buffer.alloc(4);
  length.writeUInt32BE(data.length);
  const check = Buffer.alloc(4);
  check.writeUInt32BE(crc32(body));
  return Buffer.concat([length, body, check]);
}

function decoded(png: Buffer): Pixels {
  const data: Buffer[] = [];
  let header = Buffer.alloc(13);
  for (let at = SIGNATURE.length; at < png.length; ) {
    const length = png.readUInt32BE(at);
    const type = png.toString('latin1', at + 4, at + 8);
    const body = png.subarray(at + 8, at + 8 + length);
    if (type === 'IHDR') header = Buffer.from(body);
    if (type === 'IDAT') data.push(body);
    at += 12 + length;
  }
  const samples = header[9] === 6 ? 4 : 3;
  if (!png.subarray(0, 8).equals(SIGNATURE) || header[8] !== 8 || (header[9] !== 2 && samples !== 4))
    throw new Error('expected a PNG of eight bits in colour');
  const [width, height] = [header.readUInt32BE(0), header.readUInt32BE(4)];
  const bytes = unfiltered(inflateSync(Buffer.concat(data)), width * samples, height, samples);
  const rgb = Uint32Array.from({ length: width * height }, (_, i) => bytes.readUIntBE(i * samples, 3));
  return { width, height, rgb };
}

/** Undoes the filter of each row: none, left, up, their mean, or the nearest of three (Paeth). */
function unfiltered(raw: Buffer, stride: number, height: number, step: number): Buffer {
  const out = Buffer.alloc(stride * height);
  for (let y = 0; y < height; y++) {
    const filter = raw[y * (stride + 1)] ?? 0;
    for (let i = 0; i < stride; i++) {
      const at = y * stride + i;
      const left = i >= step ? (out[at - step] ?? 0) : 0;
      const up = y > 0 ? (out[at - stride] ?? 0) : 0;
      const corner = i >= step && y > 0 ? (out[at - stride - step] ?? 0) : 0;
      const guesses = [0, left, up, (left + up) >> 1, paeth(left, up, corner)];
      out[at] = (raw[y * (stride + 1) + 1 + i] ?? 0) + (guesses[filter] ?? 0);
    }
  }
  return out;
}

function paeth(left: number, up: number, corner: number): number {
  const [a, b, c] = [Math.abs(up - corner), Math.abs(left - corner), Math.abs(left + up - 2 * corner)];
  return a <= b && a <= c ? left : b <= c ? up : corner;
}

interface Coloured {
  readonly colour: number;
  readonly count: number;
}

/** Colours by median cut (Heckbert, 1982): the box that spreads most, weighed by its pixels, is halved until there are enough. */
function paletteOf(rgb: Uint32Array): {
  readonly palette: readonly number[];
  readonly places: ReadonlyMap<number, number>;
} {
  const counts = new Map<number, number>();
  for (const colour of rgb) counts.set(colour, (counts.get(colour) ?? 0) + 1);
  const boxes = [[...counts].map(([colour, count]): Coloured => ({ colour, count }))];
  while (boxes.length < MOST) {
    const spreads = boxes.map(spreadOf);
    const widest = spreads.reduce((best, one, i) => (one.weight > (spreads[best]?.weight ?? 0) ? i : best), 0);
    const box = boxes[widest] ?? [];
    if ((spreads[widest]?.weight ?? 0) === 0) break;
    boxes.splice(widest, 1, ...halves(box, spreads[widest]?.shift ?? 0));
  }
  const places = new Map(boxes.flatMap((box, i) => box.map(({ colour }): [number, number] => [colour, i])));
  return { palette: boxes.map(commonest), places };
}

function channel(colour: number, shift: number): number {
  return (colour >> shift) & 255;
}

/** The channel in which a box spreads most, and how much that matters: spread times the root of its pixels; 0 for one colour. */
function spreadOf(box: readonly Coloured[]): { readonly shift: number; readonly weight: number } {
  const pixels = box.reduce((sum, { count }) => sum + count, 0);
  const options = [16, 8, 0].map((shift) => {
    const values = box.map(({ colour }) => channel(colour, shift));
    const spread = values.reduce((a, b) => Math.max(a, b), 0) - values.reduce((a, b) => Math.min(a, b), 255);
    return { shift, weight: spread * Math.sqrt(pixels) };
  });
  return options.reduce((a, b) => (b.weight > a.weight ? b : a));
}

/** Both halves of a box about the middle of its spread. */
function halves(box: readonly Coloured[], shift: number): Coloured[][] {
  const values = box.map(({ colour }) => channel(colour, shift));
  const middle = (Math.min(...values) + Math.max(...values)) / 2;
  const isLow = ({ colour }: Coloured): boolean => channel(colour, shift) <= middle;
  return [box.filter(isLow), box.filter((one) => !isLow(one))];
}

/** The colour of most pixels: large plain areas keep theirs exactly. */
function commonest(box: readonly Coloured[]): number {
  return box.reduce((best, one) => (one.count > best.count ? one : best), { colour: 0, count: 0 }).colour;
}
