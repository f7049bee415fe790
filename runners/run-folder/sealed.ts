/**
 * A file of binary parts under a JSON header, with a checksum over all of it, so that damage is found and never trusted.
 * Layout: magic line, length of the header (uint32, little-endian), header, the parts one after another, SHA-256.
 */
import { createHash } from 'node:crypto';

/** What a sealed file holds. */
export interface Sealed {
  /** Plain data. */
  readonly header: unknown;
  readonly parts: readonly Uint8Array[];
}

const SUM = 32;

/** The bytes of a sealed file of a kind, such as `checkpoint 1`. */
export function seal(kind: string, { header, parts }: Sealed): Uint8Array {
  const text = Buffer.from(JSON.stringify({ header, sizes: parts.map((part) => part.byteLength) }));
  const length = Buffer.alloc(4);
  length.writeUInt32LE(text.length);
  const file = Buffer.concat([magicOf(kind), length, text, ...parts, Buffer.alloc(SUM)]);
  const body = file.subarray(0, file.length - SUM);
  createHash('sha256').update(body).digest().copy(file, body.length);
  return file;
}

/** What those bytes hold; the parts are copies. Throws an `Error` that says what is wrong with them. */
export function unseal(kind: string, bytes: Uint8Array): Sealed {
  const file = Buffer.from(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const magic = magicOf(kind);
  if (file.length < magic.length + 4 + SUM) throw new Error('cut short');
  const body = file.subarray(0, file.length - SUM);
  const sum = createHash('sha256').update(body).digest();
  if (!sum.equals(file.subarray(file.length - SUM))) throw new Error('its checksum does not fit');
  if (!body.subarray(0, magic.length).equals(magic)) throw new Error(`not a ${kind}`);
  return unsealBody(body, magic.length);
}

function unsealBody(body: Buffer, start: number): Sealed {
  let at = start + 4 + body.readUInt32LE(start);
  const { header, sizes }: { header: unknown; sizes: number[] } = JSON.parse(body.toString('utf8', start + 4, at));
  const parts = sizes.map((size) => {
    const copy = new Uint8Array(body.subarray(at, at + size));
    at += size;
    return copy;
  });
  return { header, parts };
}

function magicOf(kind: string): Buffer {
  return Buffer.from(`chopfront ${kind}\n`);
}
