/**
 * Islands and designs as bytes, for threads and checkpoints. The layout: the letters CHOP, a version, a length, a JSON head of plain numbers and
 * array lengths, then the arrays as 64-bit or 32-bit little-endian numbers, each begun at a multiple of eight.
 */
import type { Designs } from './archive/index.ts';
import type { Island } from './island.ts';

/** Version of the layout; another one is refused. */
export const PACK_VERSION = 2;
const MAGIC = 0x504f4843;

type Numbers = Float64Array | Int32Array | Uint32Array;
type Kind = 'f' | 'i' | 'u';

/** Gives a buffer of at least so many bytes; what is in it does not matter. */
export type Room = (bytes: number) => ArrayBufferLike;

/** Packs an island, at the beginning of the buffer that `room` gives, by default a new one; `unpackIsland` gives back an equal one, to the bit. */
export function packIsland(island: Island, room: Room = newRoom): Uint8Array {
  return packValue(island, room);
}

/** The island in these bytes, which it goes on to read: they must not change. Throws an Error that says what is wrong with damaged or foreign bytes. */
export function unpackIsland(bytes: Uint8Array): Island {
  return unpackValue(bytes) as Island;
}

/** Packs a set of designs, such as immigrants. */
export function packDesigns(designs: Designs): Uint8Array {
  return packValue(designs, newRoom);
}

function newRoom(bytes: number): ArrayBuffer {
  return new ArrayBuffer(bytes);
}

/** The designs in these bytes; errors as `unpackIsland`. */
export function unpackDesigns(bytes: Uint8Array): Designs {
  return unpackValue(bytes) as Designs;
}

function packValue(value: unknown, room: Room): Uint8Array {
  const arrays: Numbers[] = [];
  const head = new TextEncoder().encode(
    JSON.stringify(value, (_, part) => {
      if (!isNumbers(part)) return part;
      arrays.push(part);
      return { [kindOf(part)]: part.length };
    }),
  );
  const start = align(16 + head.length);
  const size = arrays.reduce((sum, array) => sum + align(array.byteLength), start);
  const bytes = new Uint8Array(room(size), 0, size);
  const view = new DataView(bytes.buffer);
  view.setUint32(0, MAGIC, true);
  view.setUint32(4, PACK_VERSION, true);
  view.setUint32(8, head.length, true);
  view.setUint32(12, bytes.length, true);
  bytes.set(head, 16);
  bytes.fill(0, 16 + head.length, start);
  let at = start;
  for (const array of arrays) {
    writeNumbers(view, at, array);
    const end = at + align(array.byteLength);
    bytes.fill(0, at + array.byteLength, end);
    at = end;
  }
  return bytes;
}

function unpackValue(bytes: Uint8Array): unknown {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  if (bytes.length < 16 || view.getUint32(0, true) !== MAGIC) throw new Error('these bytes are no packed island');
  const version = view.getUint32(4, true);
  if (version !== PACK_VERSION) throw new Error(`packed by layout version ${version}, this one reads ${PACK_VERSION}`);
  if (view.getUint32(12, true) !== bytes.length) {
    throw new Error(`packed island cut short: ${bytes.length} of ${view.getUint32(12, true)} bytes`);
  }
  const length = view.getUint32(8, true);
  let at = align(16 + length);
  // The reviver visits parts in the order in which they were written.
  // Sliced: a decoder need not take bytes that threads share.
  return JSON.parse(new TextDecoder().decode(bytes.slice(16, 16 + length)), (_, part) => {
    const kind = arrayKind(part);
    if (kind === undefined) return part;
    const array = readNumbers(view, at, kind, part[kind]);
    at += align(array.byteLength);
    return array;
  });
}

function isNumbers(part: unknown): part is Numbers {
  return part instanceof Float64Array || part instanceof Int32Array || part instanceof Uint32Array;
}

function kindOf(array: Numbers): Kind {
  return array instanceof Float64Array ? 'f' : array instanceof Int32Array ? 'i' : 'u';
}

function arrayKind(part: unknown): Kind | undefined {
  if (typeof part !== 'object' || part === null) return undefined;
  const keys = Object.keys(part);
  const [key] = keys;
  return keys.length === 1 && (key === 'f' || key === 'i' || key === 'u') ? key : undefined;
}

function align(length: number): number {
  return Math.ceil(length / 8) * 8;
}

const LITTLE = new Uint8Array(new Uint16Array([1]).buffer)[0] === 1;

function writeNumbers(view: DataView, at: number, array: Numbers): void {
  if (LITTLE) {
    const from = new Uint8Array(array.buffer, array.byteOffset, array.byteLength);
    new Uint8Array(view.buffer, view.byteOffset + at, array.byteLength).set(from);
    return;
  }
  for (let i = 0; i < array.length; i++) {
    if (array instanceof Float64Array) view.setFloat64(at + 8 * i, array[i], true);
    else view.setUint32(at + 4 * i, array[i], true);
  }
}

/** A view of the bytes where they may be read in place, which costs no room; else a copy. */
function readNumbers(view: DataView, at: number, kind: Kind, length: number): Numbers {
  const size = kind === 'f' ? 8 : 4;
  if (at + length * size > view.byteLength) throw new Error('packed island names more than it holds');
  const start = view.byteOffset + at;
  if (LITTLE && start % size === 0) return numbersIn(view.buffer, start, kind, length);
  const array = numbersIn(new ArrayBuffer(length * size), 0, kind, length);
  if (LITTLE) {
    new Uint8Array(array.buffer).set(new Uint8Array(view.buffer, start, array.byteLength));
    return array;
  }
  for (let i = 0; i < length; i++) {
    array[i] = kind === 'f' ? view.getFloat64(at + 8 * i, true) : view.getUint32(at + 4 * i, true);
  }
  return array;
}

function numbersIn(buffer: ArrayBufferLike, start: number, kind: Kind, length: number): Numbers {
  if (kind === 'f') return new Float64Array(buffer, start, length);
  return kind === 'i' ? new Int32Array(buffer, start, length) : new Uint32Array(buffer, start, length);
}
